using Bittern.Calculation;
using Bittern.Chemistry;

namespace Bittern.Reports.Writing;

/// <summary>Which dissolved species hold a basis species.</summary>
internal static class Speciation
{
    /// <summary>
    /// Shares of a basis species' dissolved total, largest first; species without it are left out. Shares of components that count negatively (hydroxide in H+) do not occur here.
    /// </summary>
    public static IEnumerable<(string Species, double Share)> Shares(
        SolvedState state,
        Formula basis
    )
    {
        var held = state
            .Species.Select(s =>
                (
                    s.Species.Name,
                    Amount: s.Molality
                        * s.Species.FromBasis.Where(t => t.Species.Equals(basis))
                            .Sum(t => t.Coefficient)
                )
            )
            .Where(p => p.Amount > 0)
            .ToArray();
        var all = held.Sum(p => p.Amount);
        return held.OrderByDescending(p => p.Amount)
            .ThenBy(p => p.Name, StringComparer.Ordinal)
            .Select(p => (p.Name, p.Amount / all));
    }

    /// <summary>The species that hold most of it: <c>Zn^2+ 61 %, ZnSO4(aq) 35 %</c>.</summary>
    public static string Mostly(SolvedState state, Formula basis) =>
        string.Join(
            ", ",
            Shares(state, basis)
                .TakeWhile((p, i) => i == 0 || (i < 3 && p.Share >= 0.1))
                .Select(p => p.Species + " " + Digits.Percent(p.Share))
        );
}
