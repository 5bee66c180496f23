using System.Globalization;
using System.Text;

namespace Bittern.Reports.Writing;

/// <summary>
/// A pipe table whose columns line up in the source, so that a diff of two reports is readable. Mutable while it is filled.
/// </summary>
internal sealed class MarkdownTable(params MarkdownTable.Column[] columns)
{
    private readonly List<string[]> _rows = [];

    /// <summary>A column: its header (with the unit) and whether it holds numbers, which line up on the right.</summary>
    internal readonly record struct Column(string Header, bool IsNumber)
    {
        public static implicit operator Column(string header) => new(header, IsNumber: false);
    }

    public static Column Number(string header) => new(header, IsNumber: true);

    public bool IsEmpty => _rows.Count == 0;

    /// <summary>One row; cells are Markdown already.</summary>
    public void Row(params string[] cells)
    {
        if (cells.Length != columns.Length)
        {
            throw new ArgumentException(
                $"a row of {cells.Length} cells in a table of {columns.Length} columns",
                nameof(cells)
            );
        }

        _rows.Add(cells);
    }

    public override string ToString()
    {
        var headers = columns.Select(c => c.Header).ToArray();
        var widths = headers.Select(Width).ToArray();
        foreach (var row in _rows)
        {
            for (var i = 0; i < widths.Length; i++)
            {
                widths[i] = Math.Max(widths[i], Width(row[i]));
            }
        }

        var text = new StringBuilder();
        Append(text, headers, widths);
        text.Append('|');
        for (var i = 0; i < widths.Length; i++)
        {
            text.Append(
                    columns[i].IsNumber
                        ? new string('-', widths[i] + 1) + ":"
                        : new string('-', widths[i] + 2)
                )
                .Append('|');
        }

        text.Append('\n');
        foreach (var row in _rows)
        {
            Append(text, row, widths);
        }

        return text.ToString();
    }

    private void Append(StringBuilder text, string[] cells, int[] widths)
    {
        text.Append('|');
        for (var i = 0; i < cells.Length; i++)
        {
            var fill = new string(' ', widths[i] - Width(cells[i]));
            text.Append(' ')
                .Append(columns[i].IsNumber ? fill + cells[i] : cells[i] + fill)
                .Append(" |");
        }

        text.Append('\n');
    }

    // Text elements, so that a degree sign or a combining accent counts as one place.
    private static int Width(string cell) => new StringInfo(cell).LengthInTextElements;
}
