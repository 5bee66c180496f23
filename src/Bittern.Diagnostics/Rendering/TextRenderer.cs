using System.Collections.Immutable;
using System.Globalization;
using System.Text;

namespace Bittern.Diagnostics.Rendering;

/// <summary>How text output looks.</summary>
/// <param name="Colour">ANSI colours; off unless a terminal asks for them.</param>
public sealed record TextOptions(bool Colour = false);

/// <summary>
/// Diagnostics as text: code and sentence, then the line with a caret, then why, try and related places.
/// </summary>
public static class TextRenderer
{
    private const int MaxLineWidth = 160;

    /// <summary>All diagnostics in the order given, and a line that counts them; empty when there is none.</summary>
    public static string Render(ImmutableArray<Diagnostic> diagnostics, TextOptions? options = null)
    {
        var text = new StringBuilder();
        foreach (var diagnostic in diagnostics)
        {
            Render(text, diagnostic, options ?? new TextOptions());
            text.Append('\n');
        }

        if (diagnostics.Length > 0)
        {
            text.Append(Summary(diagnostics)).Append('\n');
        }

        return text.ToString();
    }

    /// <summary>One diagnostic.</summary>
    public static string Render(Diagnostic diagnostic, TextOptions? options = null)
    {
        var text = new StringBuilder();
        Render(text, diagnostic, options ?? new TextOptions());
        return text.ToString();
    }

    private static void Render(StringBuilder text, Diagnostic diagnostic, TextOptions options)
    {
        var (word, colour) = diagnostic.Severity switch
        {
            Severity.Error => ("error", "31"),
            Severity.Warning => ("warning", "33"),
            _ => ("note", "36"),
        };
        text.Append(Paint($"{word} {diagnostic.Code}", $"1;{colour}", options))
            .Append(": ")
            .Append(Paint(Printable(diagnostic.What), "1", options))
            .Append('\n');
        if (diagnostic.Span is { } span)
        {
            Place(text, span, '^', null, colour, options);
        }

        foreach (var related in diagnostic.Related.OrderBy(r => r.Span.Start))
        {
            Place(text, related.Span, '-', related.Label, "34", options);
        }

        text.Append("  why: ").Append(Printable(diagnostic.Why)).Append('\n');
        if (diagnostic.Try is { } suggestion)
        {
            text.Append("  try: ").Append(Printable(suggestion)).Append('\n');
        }
    }

    private static void Place(
        StringBuilder text,
        SourceSpan span,
        char mark,
        string? label,
        string colour,
        TextOptions options
    )
    {
        var (line, column) = span.Source.Position(span.Start);
        var number = (line + 1).ToString(CultureInfo.InvariantCulture);
        text.Append(
            CultureInfo.InvariantCulture,
            $"  --> {Printable(span.Source.Name)}:{line + 1}:{column + 1}\n"
        );
        var content = span.Source.Line(line);
        var first = Math.Max(0, Math.Min(column, content.Length) - (MaxLineWidth * 3 / 4));
        var shown = content[first..Math.Min(content.Length, first + MaxLineWidth)];
        var length = Math.Clamp(Math.Min(span.Length, content.Length - column), 1, MaxLineWidth);
        length = Math.Max(1, Math.Min(length, first + MaxLineWidth - column));
        var before = shown[..Math.Clamp(column - first, 0, shown.Length)];
        var under = shown[before.Length..Math.Min(shown.Length, before.Length + length)];
        var gutter = new string(' ', number.Length);
        text.Append(
            CultureInfo.InvariantCulture,
            $" {gutter} |\n {number} | {Printable(shown)}\n {gutter} | "
        );
        text.Append(' ', Width(before))
            .Append(Paint(new string(mark, Math.Max(1, Width(under))), $"1;{colour}", options));
        if (label is not null)
        {
            text.Append(' ').Append(Printable(label));
        }

        text.Append('\n');
    }

    // Columns on a terminal: combining marks take none, surrogate pairs and east-asian wide characters count as they are drawn.
    private static int Width(string text)
    {
        var width = 0;
        foreach (var rune in text.EnumerateRunes())
        {
            width += Rune.GetUnicodeCategory(rune) switch
            {
                UnicodeCategory.NonSpacingMark or UnicodeCategory.EnclosingMark => 0,
                UnicodeCategory.Format => 1,
                _ when rune.Value
                        is (>= 0x1100 and <= 0x115F)
                            or (>= 0x2E80 and <= 0xA4CF)
                            or (>= 0xAC00 and <= 0xD7A3)
                            or (>= 0xF900 and <= 0xFAFF)
                            or (>= 0xFF00 and <= 0xFF60)
                            or (>= 0x1F300 and <= 0x1FAFF) => 2,
                _ => 1,
            };
        }

        return width;
    }

    // A recipe may hold any bytes; none of them may steer a terminal. Tabs become one space so that the caret fits.
    private static string Printable(string text)
    {
        var printable = new StringBuilder(text.Length);
        foreach (var rune in text.EnumerateRunes())
        {
            printable.Append(
                rune.Value == '\t' ? " "
                : Rune.IsControl(rune)
                || Rune.GetUnicodeCategory(rune)
                    is UnicodeCategory.Format
                        or UnicodeCategory.LineSeparator
                        or UnicodeCategory.ParagraphSeparator
                    ? "\uFFFD"
                : rune.ToString()
            );
        }

        return printable.ToString();
    }

    private static string Paint(string text, string style, TextOptions options) =>
        options.Colour ? $"\u001b[{style}m{text}\u001b[0m" : text;

    /// <summary>A count in words: <c>2 errors, 1 warning</c>.</summary>
    public static string Summary(ImmutableArray<Diagnostic> diagnostics)
    {
        var parts = new List<string>(3);
        Count(Severity.Error, "error");
        Count(Severity.Warning, "warning");
        Count(Severity.Note, "note");
        return string.Join(", ", parts);

        void Count(Severity severity, string word)
        {
            var count = diagnostics.Count(d => d.Severity == severity);
            if (count > 0)
            {
                parts.Add(
                    string.Create(
                        CultureInfo.InvariantCulture,
                        $"{count} {word}{(count == 1 ? "" : "s")}"
                    )
                );
            }
        }
    }
}
