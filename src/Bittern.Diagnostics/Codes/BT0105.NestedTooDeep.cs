namespace Bittern.Diagnostics.Codes;

/// <summary>BT0105: nested too deep.</summary>
public static class NestedTooDeep
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0105",
            Severity.Error,
            "Nested too deep",
            "nothing that a chemist writes needs it, and unlimited nesting could exhaust the machine"
        )
        {
            Explanation = """
                Blocks may be nested twenty deep and brackets a hundred, and a line may have a few thousand words. Only generated or damaged files go
                beyond.
                """,
            Wrong = """
                cite x "own"
                ion Na+, Cl-
                solid halite NaCl to Na+ + Cl-   log Ksp (((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((((1.57))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))))) [x]
                """,
            Right = """
                cite x "own"
                ion Na+, Cl-
                solid halite NaCl to Na+ + Cl-   log Ksp 1.57 [x]
                """,
        };

    public static Diagnostic At(SourceSpan span) =>
        Descriptor.At(
            span,
            "this is nested deeper than the language allows",
            "take the inner parts apart"
        );
}
