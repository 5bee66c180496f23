namespace Bittern.Diagnostics.Codes;

/// <summary>BT0150: a unit that does not fit.</summary>
public static class WrongUnit
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0150",
            Severity.Error,
            "A unit that does not fit",
            "a number in the wrong kind of unit is a different quantity"
        )
        {
            Explanation = """
                Every quantity has a dimension, and any unit of that dimension is converted. Mass and amount are different dimensions: between them stands a
                formula.
                """,
            Wrong = """
                use catalogue major
                liquor a { Ca 5 kg }
                """,
            Right = """
                use catalogue major
                liquor a { Ca 5 mg/L }
                """,
        };

    public static Diagnostic At(
        SourceSpan span,
        string unit,
        string dimension,
        string what,
        string example
    ) =>
        Descriptor.At(
            span,
            unit.Length == 0
                ? $"{what} needs a unit, and none is written"
                : $"{what} cannot have the unit {unit} ({dimension})",
            $"use {example}"
        );
}
