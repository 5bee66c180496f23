namespace Bittern.Diagnostics.Codes;

/// <summary>BT0140: a constant without a source.</summary>
public static class NoCitation
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0140",
            Severity.Warning,
            "A constant without a source",
            "a reader must be able to trace every number"
        )
        {
            Explanation = """
                A `cite` line gives the reference in full once; its key stands in square brackets behind every number that comes from it.
                """,
            Wrong = """
                use catalogue major
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58
                """,
            Right = """
                use catalogue major
                cite x "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58 [x]
                """,
        };

    public static Diagnostic At(SourceSpan span) =>
        Descriptor.At(
            span,
            "this constant names no source",
            "declare one with cite key \"…\" and put [key] behind the constant"
        );
}
