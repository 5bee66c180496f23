using Bittern.Calculation;
using Bittern.Reports.Sections;
using Bittern.Reports.Writing;

namespace Bittern.Reports;

/// <summary>
/// The report as CommonMark with pipe tables: the answer first, then everything that a reader needs to check it.
/// </summary>
public static class MarkdownReport
{
    /// <summary>
    /// Renders an outcome. Pure: the same outcome and stamp give the same text under any culture. Lines end with a line feed.
    /// </summary>
    public static string Render(Outcome outcome, ReportStamp stamp)
    {
        var writer = new MarkdownWriter();
        TitleBlock.Write(writer, outcome, stamp);
        AnswerSection.Write(writer, outcome);
        NotesSection.Write(writer, outcome);
        BasisSection.Write(writer, outcome);
        TreatmentSection.Write(writer, outcome);
        OnsetSection.Write(writer, outcome);
        ConstantsSection.Write(writer, outcome);
        ValiditySection.Write(writer, outcome);
        CertificateSection.Write(writer, outcome, stamp);
        return writer.ToString();
    }
}
