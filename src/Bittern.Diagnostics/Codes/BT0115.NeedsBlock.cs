namespace Bittern.Diagnostics.Codes;

/// <summary>BT0115: the braces are missing.</summary>
public static class NeedsBlock
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0115",
            Severity.Error,
            "The braces are missing",
            "without a block there is nothing to calculate with"
        )
        {
            Explanation = """
                A liquor, reagent, atmosphere, train, stage or set of limits is a name and a block: `liquor pond { Ca 5 mg/L }`.
                """,
            Wrong = """
                use catalogue major
                liquor a
                """,
            Right = """
                use catalogue major
                liquor a { Ca 5 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, string word) =>
        Descriptor.At(span, $"'{word}' needs a block", "put what belongs to it between { and }");
}
