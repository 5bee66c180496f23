using Markdig.Renderers.Html;
using Markdig.Syntax;
using Markdig.Syntax.Inlines;

namespace Bittern.Reports.Html;

/// <summary>Takes the teeth out of links and images in text that a recipe brought along.</summary>
internal static class UntrustedLinks
{
    private static readonly string[] Allowed =
    [
        "https:",
        "http:",
        "mailto:",
        "#",
        ReportFigures.Folder + "/",
    ];

    public static void Disarm(MarkdownDocument document)
    {
        foreach (var link in document.Descendants<LinkInline>())
        {
            link.GetDynamicUrl = null;
            var embedded =
                link.Url?.StartsWith("data:image/", StringComparison.OrdinalIgnoreCase) == true
                && link.IsImage;
            if (embedded)
            {
                continue;
            }

            // A picture from elsewhere would fetch something; its address stays readable as a link.
            link.IsImage = false;
            if (!IsAllowed(link.Url))
            {
                link.Url = "#_report";
            }
        }

        foreach (
            var link in document
                .Descendants<AutolinkInline>()
                .Where(l => !l.IsEmail && !IsAllowed(l.Url))
        )
        {
            link.Url = "#_report";
            link.GetAttributes().AddClass("disarmed");
        }
    }

    private static bool IsAllowed(string? url) =>
        url is not null
        && Allowed.Any(a => url.TrimStart().StartsWith(a, StringComparison.OrdinalIgnoreCase));
}
