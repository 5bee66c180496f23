using System.Collections.Immutable;
using System.Globalization;

namespace Bittern.Chemistry;

/// <summary>One species of a reaction.</summary>
/// <param name="Coefficient">mol of the species per mol of reaction, without unit; positive on either side of a written reaction.</param>
/// <param name="Species">The species.</param>
public sealed record Term(double Coefficient, Formula Species);

/// <summary>
/// A reaction as written, reactants on the left and products on the right. Immutable.
/// </summary>
public sealed record Reaction(ImmutableArray<Term> Left, ImmutableArray<Term> Right)
{
    /// <summary>Element and charge surplus of the right side over the left, ordinal order, entries below 1e-9 left out; the charge stands under <c>charge</c>.</summary>
    public ImmutableSortedDictionary<string, double> Imbalance()
    {
        var sum = new SortedDictionary<string, double>(StringComparer.Ordinal);
        Add(Left, -1);
        Add(Right, 1);
        return sum.Where(p => Math.Abs(p.Value) > 1e-9)
            .ToImmutableSortedDictionary(StringComparer.Ordinal);

        void Add(ImmutableArray<Term> side, double sign)
        {
            foreach (var term in side)
            {
                foreach (var (symbol, count) in term.Species.Atoms)
                {
                    sum[symbol] = sum.GetValueOrDefault(symbol) + (sign * term.Coefficient * count);
                }

                sum["charge"] =
                    sum.GetValueOrDefault("charge")
                    + (sign * term.Coefficient * term.Species.Charge);
            }
        }
    }

    /// <summary>The reaction in plain text, e.g. <c>Mg(OH)2 + 2 H+ = Mg^2+ + 2 H2O</c>.</summary>
    public override string ToString() => $"{Side(Left)} = {Side(Right)}";

    private static string Side(ImmutableArray<Term> terms) =>
        string.Join(
            " + ",
            terms.Select(t =>
                t.Coefficient == 1
                    ? t.Species.Text
                    : string.Create(
                        CultureInfo.InvariantCulture,
                        $"{t.Coefficient:0.######} {t.Species.Text}"
                    )
            )
        );
}
