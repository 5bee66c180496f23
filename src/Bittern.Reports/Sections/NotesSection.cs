using Bittern.Calculation;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>Text that the recipe adds, as its author wrote it.</summary>
internal static class NotesSection
{
    public static void Write(MarkdownWriter writer, Outcome outcome)
    {
        if (outcome.Recipe.ReportTexts.IsEmpty)
        {
            return;
        }

        writer.Heading(2, "Notes of the author");
        foreach (var text in outcome.Recipe.ReportTexts)
        {
            writer.Paragraph(
                text.Markdown.Replace("\r\n", "\n", StringComparison.Ordinal).Trim('\n')
            );
        }
    }
}
