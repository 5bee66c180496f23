using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;
using Bittern.Language.Lexing;
using Bittern.Language.Syntax;
using Bittern.Model;

namespace Bittern.Language.Binding;

/// <summary>Values with units.</summary>
internal static class Values
{
    /// <summary>The unit of a value; <see cref="Unit.One"/> when none is written. The lexer has accepted its text.</summary>
    public static Unit UnitOf(Token? unit) => unit is null ? Unit.One : UnitReader.Read(unit.Text);

    /// <summary>SI value of a value that must have one of the dimensions; a diagnostic and null otherwise.</summary>
    public static double? Si(
        ValueSyntax value,
        string what,
        string example,
        ICollection<Diagnostic> diagnostics,
        params ReadOnlySpan<Dimension> wanted
    )
    {
        var unit = UnitOf(value.Unit);
        foreach (var dimension in wanted)
        {
            if (unit.Dimension == dimension)
            {
                return unit.ToSi(value.Number.Number);
            }
        }

        diagnostics.Add(
            UnitMistakes.Wrong(
                (value.Unit ?? value.Number).Span,
                value.Unit?.Text ?? "",
                what,
                example
            )
        );
        return null;
    }

    /// <summary>A share of 1 from <c>93 %</c> or a pure number.</summary>
    public static double? Fraction(
        ValueSyntax value,
        string what,
        ICollection<Diagnostic> diagnostics
    )
    {
        if (Si(value, what, "a percentage", diagnostics, Dimension.None) is not { } share)
        {
            return null;
        }

        if (share is >= 0 and <= 1)
        {
            return share;
        }

        diagnostics.Add(OutOfBounds.At(value.Span, what, "between 0 and 100 %"));
        return null;
    }

    /// <summary>Standard uncertainty in the unit of the value (relative ones resolved), before conversion.</summary>
    public static double? Uncertainty(ValueSyntax value) =>
        value.Uncertainty switch
        {
            null => null,
            { Unit.Text: "%" } u => Math.Abs(value.Number.Number) * u.Number.Number / 100,
            { } u => u.Number.Number,
        };

    /// <summary>A concentration as laboratories write it.</summary>
    public static Concentration? Concentration(
        ValueSyntax value,
        string written,
        BelowDetection choice,
        ICollection<Diagnostic> diagnostics
    )
    {
        var unit = UnitOf(value.Unit);
        var kind = KindOf(unit);
        if (kind is null)
        {
            diagnostics.Add(
                UnitMistakes.Wrong(
                    (value.Unit ?? value.Number).Span,
                    value.Unit?.Text ?? "",
                    "a concentration",
                    "mg/L, mmol/L, meq/L, mol/kg or %"
                )
            );
            return null;
        }

        if (value.Number.Number < 0)
        {
            diagnostics.Add(OutOfBounds.At(value.Span, "a concentration", "zero or more"));
            return null;
        }

        var uncertainty = Uncertainty(value) * unit.SiFactor;
        return new Concentration(
            written,
            kind.Value,
            unit.ToSi(value.Number.Number),
            uncertainty,
            value.Below is null ? BelowDetection.No : choice
        );
    }

    private static ConcentrationKind? KindOf(Unit unit)
    {
        if (unit.Dimension == Dimension.MassPerVolume)
        {
            return ConcentrationKind.MassPerVolume;
        }

        if (unit.Dimension == Dimension.AmountPerVolume)
        {
            return ConcentrationKind.MolesPerVolume;
        }

        if (unit.Dimension == Dimension.EquivalentsPerVolume)
        {
            return ConcentrationKind.EquivalentsPerVolume;
        }

        if (unit.Dimension == Dimension.AmountPerMass)
        {
            return ConcentrationKind.Molality;
        }

        var isMassRatio =
            unit.Dimension == Dimension.None
            && unit.Symbol.Length > 0
            && (unit.RatioOf is null || unit.RatioOf == Dimension.OfMass);
        return isMassRatio ? ConcentrationKind.MassFraction : null;
    }
}
