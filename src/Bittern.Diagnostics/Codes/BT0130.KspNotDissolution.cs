namespace Bittern.Diagnostics.Codes;

/// <summary>BT0130: ksp of something that is no dissolution into ions.</summary>
public static class KspNotDissolution
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0130",
            Severity.Error,
            "Ksp of something that is no dissolution into ions",
            "a solubility product is for a solid that dissolves alone; with H+ or others beside it the number means something else"
        )
        {
            Explanation = """
                Hydroxides are tabulated in two ways: `Mg(OH)2 to Mg^2+ + 2 OH-` with a Ksp, and `Mg(OH)2 + 2 H+ to Mg^2+ + 2 H2O` with a log K that is 28
                larger at 25 °C. The word before the number keeps them apart.
                """,
            Wrong = """
                use catalogue major
                cite x "own"
                solid own-brucite Mg(OH)2 + 2 H+ to Mg^2+ + 2 H2O   log Ksp 17.1 [x]
                """,
            Right = """
                use catalogue major
                cite x "own"
                solid own-brucite Mg(OH)2 + 2 H+ to Mg^2+ + 2 H2O   log K 17.1 [x]
                """,
        };

    public static Diagnostic At(SourceSpan span, string reaction) =>
        Descriptor.At(
            span,
            $"{reaction} is not the dissolution of a solid by itself",
            "write log K for it, or turn the reaction into one over ions and OH-"
        );
}
