namespace Bittern.Diagnostics.Codes;

/// <summary>BT0104: a character that the language does not use.</summary>
public static class StrangeCharacter
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0104",
            Severity.Error,
            "A character that the language does not use",
            "invisible or look-alike characters make two recipes look the same that are not"
        )
        {
            Explanation = """
                Outside texts and comments a recipe is letters, digits and the signs of the language. Long dashes, curly quotation marks and arrows that a
                word processor puts in are not guessed at. A few look-alikes are taken silently because they can mean only one thing: µ, °, ·, the minus
                sign U+2212, ≤ and ≥.
                """,
            Wrong = """
                use catalogue major @
                """,
            Right = """
                use catalogue major
                """,
        };

    public static Diagnostic At(SourceSpan span, string character) =>
        Descriptor.At(
            span,
            $"the character U+{char.ConvertToUtf32(Safe(character), 0):X4} has no meaning here",
            "delete it, or put it inside a text"
        );

    // A lone surrogate has no code point of its own.
    private static string Safe(string character) =>
        char.IsSurrogate(character[0]) && character.Length < 2 ? "\uFFFD" : character;
}
