namespace Bittern.Diagnostics.Codes;

/// <summary>BT0131: a constant that is not positive.</summary>
public static class ConstantNotPositive
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0131",
            Severity.Error,
            "A constant that is not positive",
            "an equilibrium constant is a positive number; its logarithm may have any sign"
        )
        {
            Explanation = """
                `K` and `Ksp` are the constant itself, `log K` and `log Ksp` its logarithm, `pKsp` its negative logarithm.
                """,
            Wrong = """
                use catalogue major
                cite x "own"
                complex CaF+ from Ca^2+ + F-   K -0.94 [x]
                """,
            Right = """
                use catalogue major
                cite x "own"
                complex CaBr+ from Ca^2+ + Br-   log K -0.94 [x]
                ion Br-
                """,
        };

    public static Diagnostic At(SourceSpan span) =>
        Descriptor.At(
            span,
            "an equilibrium constant must be positive",
            "write log K or pKsp if the number is a logarithm"
        );
}
