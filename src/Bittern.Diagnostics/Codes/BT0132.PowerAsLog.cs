namespace Bittern.Diagnostics.Codes;

/// <summary>BT0132: a power of ten as a logarithm.</summary>
public static class PowerAsLog
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0132",
            Severity.Error,
            "A power of ten as a logarithm",
            "log K 10^-4 would mean a logarithm of 0.0001"
        )
        {
            Explanation = """
                Either the constant as a power of ten, `Ksp 10^-4.58`, or its logarithm, `log Ksp -4.58`.
                """,
            Wrong = """
                use catalogue major
                cite x "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp 10^-4.58 [x]
                """,
            Right = """
                use catalogue major
                cite x "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   Ksp 10^-4.58 [x]
                """,
        };

    public static Diagnostic At(SourceSpan span, string text) =>
        Descriptor.At(
            span,
            $"{text} is written where a logarithm is expected",
            $"write K {text}, or the exponent alone behind log K"
        );
}
