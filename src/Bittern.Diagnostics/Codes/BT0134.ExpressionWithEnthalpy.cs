namespace Bittern.Diagnostics.Codes;

/// <summary>BT0134: temperature dependence twice.</summary>
public static class ExpressionWithEnthalpy
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0134",
            Severity.Error,
            "Temperature dependence twice",
            "an expression in T already holds the enthalpy; with ΔH beside it, it is open which one counts"
        )
        {
            Explanation = """
                An expression in T is taken as published. ΔH belongs to a constant that is given at 25 °C (van 't Hoff).
                """,
            Wrong = """
                use catalogue major
                cite x "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp = 1 - 1660/T, ΔH 3 kJ/mol [x]
                """,
            Right = """
                use catalogue major
                cite x "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp = 1 - 1660/T [x]
                """,
        };

    public static Diagnostic At(SourceSpan span) =>
        Descriptor.At(
            span,
            "this constant is an expression in T and has a ΔH as well",
            "delete one of the two"
        );
}
