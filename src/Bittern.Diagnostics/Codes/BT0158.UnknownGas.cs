namespace Bittern.Diagnostics.Codes;

/// <summary>BT0158: a gas that nothing declares.</summary>
public static class UnknownGas
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0158",
            Severity.Error,
            "A gas that nothing declares",
            "a pressure needs a gas with a constant"
        )
        {
            Explanation = """
                An atmosphere holds gases that a recipe or a catalogue declares with their solubility.
                """,
            Wrong = """
                use catalogue major
                atmosphere air { Ar 0.009 atm }
                """,
            Right = """
                use catalogue major
                atmosphere air { CO2 4.2e-4 atm }
                """,
        };

    public static Diagnostic At(SourceSpan span, string gas, IEnumerable<string> gases) =>
        Descriptor.At(
            span,
            $"{gas} is not declared",
            $"declared gases: {string.Join(", ", gases)}"
        );
}
