namespace Bittern.Diagnostics.Codes;

/// <summary>BT0114: a hydrate written with a colon.</summary>
public static class ColonHydrate
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0114",
            Severity.Error,
            "A hydrate written with a colon",
            "a colon has no meaning in a formula"
        )
        {
            Explanation = """
                Water of crystallisation stands behind a raised dot or a star: `CaSO4·2H2O`, `CaSO4*2H2O`.
                """,
            Wrong = """
                use catalogue major
                solid plaster CaSO4:2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58
                """,
            Right = """
                use catalogue major
                cite x "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58 [x]
                """,
        };

    public static Diagnostic At(SourceSpan span, string formula) =>
        Descriptor.At(
            span,
            $"'{formula}:' is not how a hydrate is written here",
            "write the water behind a dot or a star: CaSO4·2H2O or CaSO4*2H2O"
        );
}
