using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Model;

namespace Bittern.Reports.Writing;

/// <summary>
/// The name and mass under which a basis species' dissolved total is reported, as laboratories do: <c>Zn</c>, <c>Fe(II)</c>, <c>SO4</c>, <c>CO3</c>.
/// </summary>
/// <param name="Text">Label.</param>
/// <param name="MolarMass">g/mol that mg/L counts.</param>
internal sealed record DissolvedLabel(string Text, double MolarMass)
{
    public static DissolvedLabel Of(Formula basis, ImmutableArray<Species> allBasis)
    {
        if (basis.Atoms.Count == 1)
        {
            var (symbol, count) = basis.Atoms.First();
            var shared = allBasis.Count(b => b.Formula.AtomsOf(symbol) > 0) > 1;
            return count == 1 && symbol is not ("O" or "H" or "N")
                ? new DissolvedLabel(
                    shared && OxidationState.In(basis, symbol) is { } state
                        ? OxidationState.Text(symbol, state)
                        : symbol,
                    basis.MolarMass
                )
                : new DissolvedLabel(WithoutCharge(basis.Text), basis.MolarMass);
        }

        return new DissolvedLabel(WithoutCharge(basis.Text), basis.MolarMass);
    }

    private static string WithoutCharge(string text)
    {
        var caret = text.IndexOf('^', StringComparison.Ordinal);
        var bare = caret > 0 ? text[..caret] : text.TrimEnd('+', '-');
        return bare.EndsWith("(aq)", StringComparison.Ordinal) ? bare[..^4] : bare;
    }
}
