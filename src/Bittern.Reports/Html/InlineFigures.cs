using System.Collections.Immutable;
using System.Net;
using Markdig.Helpers;
using Markdig.Parsers;
using Markdig.Syntax;
using Markdig.Syntax.Inlines;

namespace Bittern.Reports.Html;

/// <summary>Sets the report's own figures into the page, so that it stays one file.</summary>
internal static class InlineFigures
{
    /// <summary>Replaces every paragraph that is nothing but an image of one of the figures; a figure's caption is its image's text.</summary>
    public static void Set(MarkdownDocument document, ImmutableArray<Figure> figures)
    {
        var byUrl = figures.ToDictionary(
            f => ReportFigures.Folder + "/" + f.Name,
            StringComparer.Ordinal
        );
        foreach (var paragraph in document.Descendants<ParagraphBlock>().ToArray())
        {
            if (
                paragraph.Inline is { FirstChild: LinkInline { IsImage: true, Url: { } url } image }
                && ReferenceEquals(paragraph.Inline.LastChild, image)
                && byUrl.TryGetValue(url, out var figure)
                && paragraph.Parent is { } parent
            )
            {
                parent[parent.IndexOf(paragraph)] = Html(figure);
            }
        }
    }

    private static HtmlBlock Html(Figure figure)
    {
        var text =
            "<figure>\n"
            + figure.Svg
            + "<figcaption>"
            + WebUtility.HtmlEncode(figure.Caption)
            + "</figcaption>\n</figure>";
        return new HtmlBlock(new HtmlBlockParser()) { Lines = new StringLineGroup(text) };
    }
}
