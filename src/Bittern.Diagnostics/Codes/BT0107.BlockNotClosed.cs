namespace Bittern.Diagnostics.Codes;

/// <summary>BT0107: a block is not closed.</summary>
public static class BlockNotClosed
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0107",
            Severity.Error,
            "A block is not closed",
            "everything below it would belong to it"
        )
        {
            Explanation = """
                Where braces do not match, a declaration that can only stand outside of blocks ends the blocks that are open, so that the rest of the recipe
                is read as it was meant.
                """,
            Wrong = """
                use catalogue major
                liquor a { Ca 5 mg/L
                """,
            Right = """
                use catalogue major
                liquor a { Ca 5 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, SourceSpan end) =>
        Descriptor.At(
            span,
            "this { has no closing }",
            "close the block with } on a line of its own",
            new RelatedSpan(end, "expected before this")
        );
}
