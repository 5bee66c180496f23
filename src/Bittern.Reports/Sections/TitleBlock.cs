using Bittern.Calculation;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>What the report is about and which input made it.</summary>
internal static class TitleBlock
{
    public static void Write(MarkdownWriter writer, Outcome outcome, ReportStamp stamp)
    {
        var header = outcome.Recipe.Header;
        writer.Heading(1, MarkdownText.Escape(header.Title));
        var table = new MarkdownTable("Item", "Value");
        Add("Client", header.Client);
        Add("Reference", header.Reference);
        Add("Revision", header.Revision);
        Add("Date", header.Date);
        Add(
            "Temperature",
            Digits.AsTyped(header.TemperatureCelsius)
                + " °C"
                + (header.TemperatureAssumed ? " (assumed: the recipe states none)" : "")
        );
        Add(
            "Activity model",
            header.ActivityModel
                + (header.ActivityModelAssumed ? " (the default: the recipe names none)" : "")
        );
        if (!stamp.Inputs.IsDefaultOrEmpty)
        {
            table.Row("Recipe", MarkdownText.Escape(stamp.Inputs[0].Name));
            table.Row("Recipe SHA-256", "`" + stamp.Inputs[0].Sha256 + "`");
        }

        table.Row("Made with", "Bittern " + MarkdownText.Escape(stamp.ToolVersion));
        writer.Table(table);

        void Add(string name, string? value)
        {
            if (!string.IsNullOrWhiteSpace(value))
            {
                table.Row(name, MarkdownText.Escape(value));
            }
        }
    }
}
