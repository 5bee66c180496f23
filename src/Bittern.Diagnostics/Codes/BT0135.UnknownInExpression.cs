namespace Bittern.Diagnostics.Codes;

/// <summary>BT0135: an unknown name in an expression.</summary>
public static class UnknownInExpression
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0135",
            Severity.Error,
            "An unknown name in an expression",
            "a constant may depend on the temperature T and on nothing else"
        )
        {
            Explanation = """
                An expression has T (kelvin), numbers, `+ - * / ^`, `log10`, `ln`, `exp` and `sqrt`. `log` alone is not used: it means base 10 to some and
                base e to others.
                """,
            Wrong = """
                use catalogue major
                cite x "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp = 1 - 1660/t [x]
                """,
            Right = """
                use catalogue major
                cite x "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp = 1 - 1660/T [x]
                """,
        };

    public static Diagnostic At(SourceSpan span, string name, string? near) =>
        Descriptor.At(
            span,
            $"'{name}' means nothing in an expression",
            near is null
                ? "use T (kelvin), numbers, + - * / ^, log10, ln, exp and sqrt"
                : $"did you mean '{near}'?"
        );
}
