using System.Collections.Immutable;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;

namespace Bittern.Diagnostics.Rendering;

/// <summary>
/// Diagnostics as JSON: one object with a list and counts. Lines and columns start at 1; columns count UTF-16 code units, as editors do.
/// </summary>
public static class JsonRenderer
{
    /// <summary>Member names do not change; new ones may come.</summary>
    public const int FormatVersion = 1;

    private static readonly JsonWriterOptions Options = new()
    {
        Indented = true,
        NewLine = "\n",
        // Texts hold chemistry (±, °, ·), not markup.
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    public static string Render(ImmutableArray<Diagnostic> diagnostics)
    {
        using var stream = new MemoryStream();
        using (var json = new Utf8JsonWriter(stream, Options))
        {
            json.WriteStartObject();
            json.WriteNumber("formatVersion", FormatVersion);
            json.WriteNumber("errors", diagnostics.Count(d => d.Severity == Severity.Error));
            json.WriteNumber("warnings", diagnostics.Count(d => d.Severity == Severity.Warning));
            json.WriteNumber("notes", diagnostics.Count(d => d.Severity == Severity.Note));
            json.WriteStartArray("diagnostics");
            foreach (var diagnostic in diagnostics)
            {
                Write(json, diagnostic);
            }

            json.WriteEndArray();
            json.WriteEndObject();
        }

        return Encoding.UTF8.GetString(stream.ToArray()) + "\n";
    }

    private static void Write(Utf8JsonWriter json, Diagnostic diagnostic)
    {
        json.WriteStartObject();
        json.WriteString("code", diagnostic.Code);
        json.WriteString("severity", diagnostic.Severity.ToString().ToLowerInvariant());
        json.WriteString("what", Whole(diagnostic.What));
        json.WriteString("why", Whole(diagnostic.Why));
        if (diagnostic.Try is { } suggestion)
        {
            json.WriteString("try", Whole(suggestion));
        }

        if (diagnostic.Span is { } span)
        {
            Place(json, "at", span);
        }

        if (!diagnostic.Related.IsEmpty)
        {
            json.WriteStartArray("related");
            foreach (var related in diagnostic.Related)
            {
                json.WriteStartObject();
                json.WriteString("label", Whole(related.Label));
                Place(json, "at", related.Span);
                json.WriteEndObject();
            }

            json.WriteEndArray();
        }

        json.WriteEndObject();
    }

    private static void Place(Utf8JsonWriter json, string name, SourceSpan span)
    {
        var (line, column) = span.Source.Position(span.Start);
        var (endLine, endColumn) = span.Source.Position(span.End);
        json.WriteStartObject(name);
        json.WriteString("file", Whole(span.Source.Name));
        json.WriteNumber("line", line + 1);
        json.WriteNumber("column", column + 1);
        json.WriteNumber("endLine", endLine + 1);
        json.WriteNumber("endColumn", endColumn + 1);
        json.WriteEndObject();
    }

    /// <summary>The text with half surrogate pairs replaced: a recipe may hold any characters, JSON may not.</summary>
    internal static string Whole(string text)
    {
        for (var i = 0; i < text.Length; i++)
        {
            if (!char.IsSurrogate(text[i]))
            {
                continue;
            }

            if (i + 1 < text.Length && char.IsSurrogatePair(text[i], text[i + 1]))
            {
                i++;
                continue;
            }

            return string.Concat(text.EnumerateRunes().Select(r => r.ToString()));
        }

        return text;
    }
}
