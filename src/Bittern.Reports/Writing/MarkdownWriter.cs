using System.Text;

namespace Bittern.Reports.Writing;

/// <summary>Collects blocks of Markdown with one empty line between them. Mutable.</summary>
internal sealed class MarkdownWriter
{
    private readonly StringBuilder _text = new();

    public void Heading(int level, string text) => Block(new string('#', level) + " " + text);

    public void Paragraph(string text) => Block(text);

    /// <summary>A table, left out when it has no rows.</summary>
    public void Table(MarkdownTable table)
    {
        if (!table.IsEmpty)
        {
            Block(table.ToString());
        }
    }

    /// <summary>A list, left out when it is empty.</summary>
    public void Bullets(IEnumerable<string> items)
    {
        var list = string.Join('\n', items.Select(i => "- " + i));
        if (list.Length > 0)
        {
            Block(list);
        }
    }

    /// <summary>A fenced block of plain text.</summary>
    public void Fenced(string text) => Block("```text\n" + text.TrimEnd('\n') + "\n```");

    public override string ToString() => _text.ToString();

    private void Block(string text)
    {
        if (_text.Length > 0)
        {
            _text.Append('\n');
        }

        _text.Append(text.TrimEnd('\n')).Append('\n');
    }
}
