using System.Collections.Immutable;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;

namespace Bittern.Diagnostics.Rendering;

/// <summary>
/// Diagnostics as SARIF 2.1.0 (OASIS Standard, 27 March 2020), which forges show beside the lines of a change.
/// </summary>
public static class SarifRenderer
{
    private static readonly JsonWriterOptions Options = new()
    {
        Indented = true,
        NewLine = "\n",
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    /// <param name="diagnostics">In the order given.</param>
    /// <param name="toolVersion">Version of the tool.</param>
    /// <summary>One run with its rules and results.</summary>
    public static string Render(ImmutableArray<Diagnostic> diagnostics, string toolVersion)
    {
        var rules = diagnostics
            .Select(d => d.Code)
            .Distinct(StringComparer.Ordinal)
            .Order(StringComparer.Ordinal)
            .ToImmutableArray();
        using var stream = new MemoryStream();
        using (var json = new Utf8JsonWriter(stream, Options))
        {
            json.WriteStartObject();
            json.WriteString(
                "$schema",
                "https://docs.oasis-open.org/sarif/sarif/v2.1.0/errata01/os/schemas/sarif-schema-2.1.0.json"
            );
            json.WriteString("version", "2.1.0");
            json.WriteStartArray("runs");
            json.WriteStartObject();
            json.WriteStartObject("tool");
            json.WriteStartObject("driver");
            json.WriteString("name", "bittern");
            json.WriteString("version", toolVersion);
            json.WriteStartArray("rules");
            foreach (var rule in rules)
            {
                Rule(json, rule);
            }

            json.WriteEndArray();
            json.WriteEndObject();
            json.WriteEndObject();
            json.WriteString("columnKind", "utf16CodeUnits");
            json.WriteStartArray("results");
            foreach (var diagnostic in diagnostics)
            {
                Result(json, diagnostic, rules.IndexOf(diagnostic.Code, StringComparer.Ordinal));
            }

            json.WriteEndArray();
            json.WriteEndObject();
            json.WriteEndArray();
            json.WriteEndObject();
        }

        return Encoding.UTF8.GetString(stream.ToArray()) + "\n";
    }

    private static void Rule(Utf8JsonWriter json, string id)
    {
        json.WriteStartObject();
        json.WriteString("id", id);
        if (DiagnosticCatalogue.Find(id) is { } code)
        {
            Text(json, "shortDescription", code.Title);
            Text(json, "fullDescription", code.Why);
            json.WriteStartObject("help");
            json.WriteString("text", code.Explanation);
            json.WriteString("markdown", code.Explanation);
            json.WriteEndObject();
            json.WriteStartObject("defaultConfiguration");
            json.WriteString("level", Level(code.Severity));
            json.WriteEndObject();
        }

        json.WriteEndObject();
    }

    private static void Result(Utf8JsonWriter json, Diagnostic diagnostic, int rule)
    {
        var message = $"{diagnostic.What}. Why: {diagnostic.Why}.";
        if (diagnostic.Try is { } suggestion)
        {
            message += $" Try: {suggestion}{(suggestion.EndsWith('?') ? "" : ".")}";
        }

        json.WriteStartObject();
        json.WriteString("ruleId", diagnostic.Code);
        json.WriteNumber("ruleIndex", rule);
        json.WriteString("level", Level(diagnostic.Severity));
        Text(json, "message", message);
        if (diagnostic.Span is { } span)
        {
            json.WriteStartArray("locations");
            json.WriteStartObject();
            Place(json, span);
            json.WriteEndObject();
            json.WriteEndArray();
        }

        if (!diagnostic.Related.IsEmpty)
        {
            json.WriteStartArray("relatedLocations");
            for (var i = 0; i < diagnostic.Related.Length; i++)
            {
                json.WriteStartObject();
                json.WriteNumber("id", i);
                Place(json, diagnostic.Related[i].Span);
                Text(json, "message", diagnostic.Related[i].Label);
                json.WriteEndObject();
            }

            json.WriteEndArray();
        }

        json.WriteEndObject();
    }

    private static void Place(Utf8JsonWriter json, SourceSpan span)
    {
        var (line, column) = span.Source.Position(span.Start);
        var (endLine, endColumn) = span.Source.Position(span.End);
        json.WriteStartObject("physicalLocation");
        json.WriteStartObject("artifactLocation");
        json.WriteString("uri", Address(span.Source.Name));
        json.WriteEndObject();
        json.WriteStartObject("region");
        json.WriteNumber("startLine", line + 1);
        json.WriteNumber("startColumn", column + 1);
        json.WriteNumber("endLine", endLine + 1);
        json.WriteNumber("endColumn", endColumn + 1);
        json.WriteEndObject();
        json.WriteEndObject();
    }

    private static void Text(Utf8JsonWriter json, string name, string text)
    {
        json.WriteStartObject(name);
        json.WriteString("text", JsonRenderer.Whole(text));
        json.WriteEndObject();
    }

    // Relative addresses keep their slashes; everything else that a URI reserves is escaped.
    private static string Address(string path) =>
        string.Join(
            '/',
            JsonRenderer.Whole(path).Replace('\\', '/').Split('/').Select(Uri.EscapeDataString)
        );

    private static string Level(Severity severity) =>
        severity switch
        {
            Severity.Error => "error",
            Severity.Warning => "warning",
            _ => "note",
        };
}
