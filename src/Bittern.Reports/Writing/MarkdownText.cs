using System.Text;

namespace Bittern.Reports.Writing;

/// <summary>Text from recipes made safe inside Markdown.</summary>
internal static class MarkdownText
{
    /// <summary>
    /// Escapes what CommonMark, pipe tables and the usual extensions of forges would read as markup; line breaks become spaces.
    /// </summary>
    public static string Escape(string text)
    {
        var result = new StringBuilder(text.Length + 8);
        for (var i = 0; i < text.Length; i++)
        {
            var c = text[i];
            var next = i + 1 < text.Length ? text[i + 1] : ' ';
            if (c is '\n' or '\r' or '\t')
            {
                result.Append(' ');
                continue;
            }

            var escape = c switch
            {
                '\\' or '*' or '_' or '`' or '[' or ']' or '|' or '~' or '$' => true,
                '<' => char.IsAsciiLetter(next) || next is '/' or '!' or '?',
                '&' => char.IsAsciiLetter(next) || next is '#',
                '#' or '>' or '+' or '-' => i == 0,
                _ => false,
            };
            if (escape)
            {
                result.Append('\\');
            }

            result.Append(c);
        }

        return result.ToString();
    }

    /// <summary>A formula or path as code, where the text allows it.</summary>
    public static string Code(string text) =>
        text.AsSpan().ContainsAny("`|\n\r") ? Escape(text) : "`" + text.Trim() + "`";

    /// <summary>A sentence from its parts: first letter large, full stop at the end.</summary>
    public static string Sentence(string text)
    {
        var trimmed = text.Trim();
        if (trimmed.Length == 0)
        {
            return "";
        }

        var first = char.ToUpperInvariant(trimmed[0]) + trimmed[1..];
        return first[^1] is '.' or '!' or '?' ? first : first + ".";
    }
}
