using System.Globalization;

namespace Bittern.Diagnostics.Codes;

/// <summary>BT0144: constants outside their range.</summary>
public static class OutOfRange
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0144",
            Severity.Note,
            "Constants outside their range",
            "outside the range of its measurements a constant is an extrapolation"
        )
        {
            Explanation = """
                A `valid` range is the range of the measurements behind the number; many constants are known at 25 °C only. The report marks what rests on a
                constant outside its range.
                """,
            Wrong = """
                recipe "x" { temperature 90 °C }
                cite x "own"
                ion Ca^2+, SO4^2-
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58, valid 0 .. 40 °C [x]
                liquor a { Ca 1 mmol/L; SO4 1 mmol/L }
                """,
            Right = """
                recipe "x" { temperature 30 °C }
                cite x "own"
                ion Ca^2+, SO4^2-
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58, valid 0 .. 40 °C [x]
                liquor a { Ca 1 mmol/L; SO4 1 mmol/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, double celsius, int count, string names) =>
        Descriptor.At(
            span,
            string.Create(
                CultureInfo.InvariantCulture,
                $"{count} of the constants in reach are not given for {celsius:0.#} °C: {names}"
            ),
            "the report lists those that mattered; compare them with a source for that temperature"
        );
}
