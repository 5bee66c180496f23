using Bittern.Diagnostics;

namespace Bittern.Language.Lexing;

/// <summary>
/// Kind of a token. Its value is the character that stands for the token in the string that the Sprache grammar reads.
/// Keywords have characters of their own from <see cref="Keywords"/>.
/// </summary>
public static class TokenKind
{
    public const char Name = 'w';
    public const char Formula = 'F';
    public const char Nuclide = 'R';
    public const char Number = 'n';
    public const char Unit = 'u';
    public const char Date = 'd';
    public const char Text = 's';
    public const char Block = 'b';
    public const char PlusMinus = '±';
    public const char Range = '…';
    public const char AtMost = '≤';
    public const char AtLeast = '≥';
    public const char NewLine = '\n';
    public const char End = '\0';
    public const char Fault = '?';
    public const char Comment = '#';
}

/// <summary>One token. Immutable.</summary>
/// <param name="Kind">See <see cref="TokenKind"/>; punctuation is itself.</param>
/// <param name="Span">Where.</param>
/// <param name="Text">As meant: look-alikes mapped, quotes and indentation of texts removed.</param>
/// <param name="Number">Value of a number token.</param>
public sealed record Token(char Kind, SourceSpan Span, string Text, double Number = 0)
{
    /// <summary>True for a number written as a power of ten, <c>10^-4.58</c>.</summary>
    public bool IsPower { get; init; }

    /// <summary>True for a number written with a sign.</summary>
    public bool IsSigned { get; init; }

    /// <summary>True when white space stands before it.</summary>
    public bool SpaceBefore { get; init; }
}
