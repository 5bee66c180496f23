namespace Bittern.Diagnostics.Codes;

/// <summary>BT0101: a text is not closed.</summary>
public static class TextNotClosed
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0101",
            Severity.Error,
            "A text is not closed",
            "everything behind it would be read as text"
        )
        {
            Explanation = """"
                Texts between `"` end on their own line; longer ones, which may hold Markdown, stand between `"""`.
                """",
            Wrong = """
                recipe "Pond water
                """,
            Right = """
                recipe "Pond water"
                """,
        };

    public static Diagnostic At(SourceSpan span, string quote) =>
        Descriptor.At(
            span,
            $"this text has no closing {quote}",
            $"close it with {quote} on the same line"
        );
}
