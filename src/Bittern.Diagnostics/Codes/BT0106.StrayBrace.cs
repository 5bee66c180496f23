namespace Bittern.Diagnostics.Codes;

/// <summary>BT0106: a closing brace too many.</summary>
public static class StrayBrace
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0106",
            Severity.Error,
            "A closing brace too many",
            "the block that you meant to close was closed earlier"
        )
        {
            Explanation = """
                Every `}` ends the block that the nearest open `{` began.
                """,
            Wrong = """
                use catalogue major
                }
                """,
            Right = """
                use catalogue major

                """,
        };

    public static Diagnostic At(SourceSpan span) =>
        Descriptor.At(
            span,
            "this } closes nothing",
            "delete it, or look for a brace too many above"
        );
}
