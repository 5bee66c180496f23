using System.Globalization;
using System.Text;

namespace Bittern.Catalogue;

/// <summary>Entries as a plain list for a terminal, one a line.</summary>
public static class CatalogueListing
{
    /// <summary>Name, formula where it differs, constant at 25 °C, source, domain, and what a reader should know before using it. Lines end in <c>\n</c>.</summary>
    public static string Render(IEnumerable<CatalogueEntry> entries)
    {
        var rows = entries.Select(Cells).ToList();
        if (rows.Count == 0)
        {
            return "nothing found\n";
        }

        var widths = Enumerable
            .Range(0, rows[0].Length - 1)
            .Select(i => rows.Max(r => r[i].Length))
            .ToArray();
        var text = new StringBuilder();
        foreach (var row in rows)
        {
            var line = new StringBuilder();
            for (var i = 0; i < widths.Length; i++)
            {
                line.Append(row[i].PadRight(widths[i] + 2));
            }

            text.Append(line.Append(row[^1]).ToString().TrimEnd()).Append('\n');
        }

        return text.ToString();
    }

    private static string[] Cells(CatalogueEntry entry)
    {
        var constant = entry.Constant;
        List<string> marks = [];
        if (constant is { Recalled: true })
        {
            marks.Add("recalled");
        }

        if (entry.HeldBack is not null)
        {
            marks.Add("held back");
        }

        if (entry.Doubt is not null)
        {
            marks.Add("doubt");
        }

        return
        [
            entry.Name,
            entry.Kind is EntryKind.Solid ? entry.Formula!.Text : "",
            constant is null
                ? ConstantWords.Kind(entry.Kind)
                : string.Create(
                    CultureInfo.InvariantCulture,
                    $"{ConstantWords.Form(constant)} {constant.Log10AtCelsius(25):0.00}"
                ),
            constant?.Source?.Key ?? "",
            entry.Domain,
            string.Join(", ", marks),
        ];
    }
}
