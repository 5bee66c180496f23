namespace Bittern.Diagnostics.Codes;

/// <summary>BT0133: an uncertainty on a power of ten.</summary>
public static class UncertaintyOfPower
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0133",
            Severity.Error,
            "An uncertainty on a power of ten",
            "± on 10^-4.58 could mean the number or its exponent"
        )
        {
            Explanation = """
                The uncertainty of a solubility product is that of its logarithm nearly always; the log form says so.
                """,
            Wrong = """
                use catalogue major
                cite x "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   Ksp 10^-4.58 ± 0.02 [x]
                """,
            Right = """
                use catalogue major
                cite x "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58 ± 0.02 [x]
                """,
        };

    public static Diagnostic At(SourceSpan span) =>
        Descriptor.At(
            span,
            "an uncertainty on a power of ten is ambiguous",
            "write log Ksp -4.58 ± 0.02"
        );
}
