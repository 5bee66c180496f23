using System.Collections.Immutable;
using System.Net;
using System.Text;
using Bittern.Reports.Html;
using Markdig;
using Markdig.Extensions.AutoIdentifiers;
using Markdig.Renderers;
using Markdig.Renderers.Html;
using Markdig.Syntax;

namespace Bittern.Reports;

/// <summary>The Markdown report as one HTML file that needs nothing else: no network, no script.</summary>
public static class HtmlReport
{
    private static readonly MarkdownPipeline Pipeline = new MarkdownPipelineBuilder()
        .UsePipeTables()
        .UseAutoIdentifiers(AutoIdentifierOptions.GitHub)
        .DisableHtml()
        .Build();

    /// <summary>
    /// Renders Markdown as a page with a table of contents, landmarks and its own style for screen (light and dark) and print. HTML inside the Markdown is
    /// shown as text, links that are no web or mail address lose their target, and images from elsewhere become links: a recipe's text cannot run or fetch anything.
    /// </summary>
    /// <param name="markdown">As <see cref="MarkdownReport.Render"/> makes it.</param>
    /// <param name="title">Title of the page, plain text.</param>
    public static string Render(string markdown, string title) => Render(markdown, title, []);

    /// <summary>The same with figures set into the page where the Markdown refers to them as <c>figures/NAME</c>.</summary>
    public static string Render(string markdown, string title, ImmutableArray<Figure> figures)
    {
        var document = Markdown.Parse(markdown, Pipeline);
        InlineFigures.Set(document, figures);
        UntrustedLinks.Disarm(document);
        FormulaTypesetting.Apply(document);
        using var body = new StringWriter(System.Globalization.CultureInfo.InvariantCulture)
        {
            NewLine = "\n",
        };
        var renderer = new HtmlRenderer(body);
        Pipeline.Setup(renderer);
        renderer.ObjectRenderers.Replace<Markdig.Extensions.Tables.HtmlTableRenderer>(
            new AccessibleTableRenderer()
        );
        renderer.Render(document);
        body.Flush();
        return Page(title, Contents(document), body.ToString());
    }

    private static string Page(string title, string contents, string body)
    {
        var page = new StringBuilder();
        page.Append("<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n");
        page.Append("<meta name=\"viewport\" content=\"width=device-width, initial-scale=1\">\n");
        page.Append("<meta name=\"color-scheme\" content=\"light dark\">\n");
        page.Append(
            "<meta http-equiv=\"Content-Security-Policy\" content=\"default-src 'none'; style-src 'unsafe-inline'; img-src data:\">\n"
        );
        page.Append("<title>").Append(WebUtility.HtmlEncode(title)).Append("</title>\n<style>\n");
        page.Append(PageStyle.Text);
        page.Append(
            "</style>\n</head>\n<body>\n<a class=\"skip\" href=\"#_report\">Skip to the report</a>\n"
        );
        page.Append("<nav class=\"contents\" aria-label=\"Contents\">\n")
            .Append(contents)
            .Append("</nav>\n");
        page.Append("<main id=\"_report\">\n").Append(body).Append("</main>\n</body>\n</html>\n");
        return page.ToString();
    }

    private static string Contents(MarkdownDocument document)
    {
        var list = new StringBuilder("<p>Contents</p>\n<ul>\n");
        var inner = false;
        foreach (var heading in document.OfType<HeadingBlock>().Where(h => h.Level is 2 or 3))
        {
            if (heading.Level == 3 && !inner)
            {
                list.Append("<ul>\n");
                inner = true;
            }
            else if (heading.Level == 2 && inner)
            {
                list.Append("</ul>\n</li>\n");
                inner = false;
            }
            else if (heading.Level == 2 && list.Length > "<p>Contents</p>\n<ul>\n".Length)
            {
                list.Append("</li>\n");
            }

            list.Append("<li><a href=\"#")
                .Append(WebUtility.HtmlEncode(heading.GetAttributes().Id ?? ""))
                .Append("\">")
                .Append(WebUtility.HtmlEncode(PlainText.Of(heading.Inline)))
                .Append("</a>")
                .Append(heading.Level == 3 ? "</li>\n" : "\n");
        }

        list.Append(inner ? "</ul>\n</li>\n</ul>\n" : "</li>\n</ul>\n");
        return list.ToString();
    }
}
