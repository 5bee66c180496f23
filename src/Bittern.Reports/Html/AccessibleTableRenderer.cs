using System.Net;
using Markdig.Extensions.Tables;
using Markdig.Renderers;
using Markdig.Renderers.Html;
using Markdig.Syntax;

namespace Bittern.Reports.Html;

/// <summary>
/// Tables with a scope on every header, the first column as row headers, and a frame that scrolls sideways on narrow screens and can be reached by keyboard.
/// </summary>
internal sealed class AccessibleTableRenderer : HtmlObjectRenderer<Table>
{
    protected override void Write(HtmlRenderer renderer, Table table)
    {
        renderer.EnsureLine();
        renderer.Write("<div class=\"table\" role=\"group\" tabindex=\"0\" aria-label=\"");
        renderer.Write(WebUtility.HtmlEncode("Table: " + Caption(table)));
        renderer.WriteLine("\">");
        renderer.WriteLine("<table>");
        var inBody = false;
        foreach (var row in table.OfType<TableRow>())
        {
            if (row.IsHeader)
            {
                renderer.WriteLine("<thead>");
            }
            else if (!inBody)
            {
                renderer.WriteLine("<tbody>");
                inBody = true;
            }

            renderer.WriteLine("<tr>");
            for (var i = 0; i < row.Count; i++)
            {
                Cell(renderer, table, (TableCell)row[i], row.IsHeader, i);
            }

            renderer.WriteLine("</tr>");
            if (row.IsHeader)
            {
                renderer.WriteLine("</thead>");
            }
        }

        if (inBody)
        {
            renderer.WriteLine("</tbody>");
        }

        renderer.WriteLine("</table>");
        renderer.WriteLine("</div>");
    }

    private static void Cell(
        HtmlRenderer renderer,
        Table table,
        TableCell cell,
        bool isHeader,
        int column
    )
    {
        var tag = isHeader || column == 0 ? "th" : "td";
        renderer.Write("<").Write(tag);
        if (isHeader)
        {
            renderer.Write(" scope=\"col\"");
        }
        else if (column == 0)
        {
            renderer.Write(" scope=\"row\"");
        }

        var classes = Classes(table, cell, column);
        if (classes.Length > 0)
        {
            renderer.Write(" class=\"").Write(classes).Write("\"");
        }

        renderer.Write(">");
        var before = renderer.ImplicitParagraph;
        renderer.ImplicitParagraph = true;
        renderer.WriteChildren(cell);
        renderer.ImplicitParagraph = before;
        renderer.Write("</").Write(tag).WriteLine(">");
    }

    private static string Classes(Table table, TableCell cell, int column)
    {
        var number =
            column < table.ColumnDefinitions.Count
            && table.ColumnDefinitions[column].Alignment == TableColumnAlign.Right
                ? "number"
                : "";
        var verdict = Text(cell) switch
        {
            "PASS" => "verdict pass",
            "FAIL" or "NO" => "verdict fail",
            "UNDECIDED" or "NOT JUDGED" => "verdict open",
            _ => "",
        };
        return (number + " " + verdict).Trim();
    }

    private static string Text(TableCell cell) =>
        cell.Count == 1 && cell[0] is LeafBlock leaf ? PlainText.Of(leaf.Inline) : "";

    // The first header cell says what a row is; the heading above says of what.
    private static string Caption(Table table)
    {
        var header = table.OfType<TableRow>().FirstOrDefault();
        var columns = header is null
            ? ""
            : string.Join(", ", header.OfType<TableCell>().Select(Text).Where(t => t.Length > 0));
        var heading = table
            .Parent?.TakeWhile(b => !ReferenceEquals(b, table))
            .OfType<HeadingBlock>()
            .LastOrDefault();
        return heading is null ? columns : PlainText.Of(heading.Inline) + ": " + columns;
    }
}
