using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using Bittern.Calculation;

namespace Bittern.Reports;

/// <summary>
/// <c>results.json</c>: what a report says, for machines. Field names carry their unit and are stable under <see cref="Format"/>; the JSON Schema is
/// <c>docs/results.schema.json</c>. Numbers have six significant digits; what is not known is null.
/// </summary>
public static class JsonReport
{
    /// <summary>Name and version of the format; the version grows when a field changes meaning or goes.</summary>
    public const string Format = "bittern-results/1";

    /// <summary>Renders an outcome as indented UTF-8 JSON text with line feeds. Pure.</summary>
    public static string Render(Outcome outcome, ReportStamp stamp)
    {
        using var buffer = new MemoryStream();
        var options = new JsonWriterOptions
        {
            Indented = true,
            NewLine = "\n",
            Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
        };
        using (var writer = new Utf8JsonWriter(buffer, options))
        {
            new Machine.ResultsWriter(writer).Write(outcome, stamp);
        }

        return Encoding.UTF8.GetString(buffer.ToArray()) + "\n";
    }
}
