namespace Bittern.Diagnostics.Codes;

/// <summary>BT0111: no declaration starts like this.</summary>
public static class UnknownDeclaration
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0111",
            Severity.Error,
            "No declaration starts like this",
            "a line that is not understood cannot be calculated"
        )
        {
            Explanation = """
                The first word of a line says what it is.
                """,
            Wrong = """
                use catalogue major
                liqour a { Ca 5 mg/L }
                """,
            Right = """
                use catalogue major
                liquor a { Ca 5 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, string word, string? near) =>
        Descriptor.At(
            span,
            word.Length == 0
                ? "a declaration is missing before this"
                : $"no declaration starts with '{word}'",
            near is null
                ? "a recipe consists of recipe, use, cite, liquor, reagent, atmosphere, train, limits, report, mix and declarations of species"
                : $"did you mean '{near}'?"
        );
}
