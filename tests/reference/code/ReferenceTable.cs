using System.Text;

namespace Bittern.Reference;

/// <summary>Reads the CSV files of <c>tests/reference</c>, which test projects copy beside their assembly.</summary>
internal static class ReferenceTable
{
    /// <summary>Folder with the copied tables.</summary>
    public static string Folder => Path.Combine(AppContext.BaseDirectory, "reference");

    /// <summary>All rows, as values by column name.</summary>
    public static IReadOnlyList<IReadOnlyDictionary<string, string>> Rows(string file)
    {
        var lines = File.ReadAllLines(Path.Combine(Folder, file))
            .Where(l => l.Length > 0)
            .Select(Fields)
            .ToList();
        return [.. lines.Skip(1).Select(line => Row(lines[0], line, file))];
    }

    private static IReadOnlyDictionary<string, string> Row(
        List<string> names,
        List<string> values,
        string file
    ) =>
        names.Count == values.Count
            ? names.Zip(values).ToDictionary(p => p.First, p => p.Second, StringComparer.Ordinal)
            : throw new FormatException(
                $"{file}: a row has {values.Count} fields for {names.Count} columns: {string.Join('|', values)}"
            );

    private static List<string> Fields(string line)
    {
        var fields = new List<string>();
        var field = new StringBuilder();
        var quoted = false;
        for (var i = 0; i < line.Length; i++)
        {
            if (line[i] == '"' && quoted && i + 1 < line.Length && line[i + 1] == '"')
            {
                field.Append('"');
                i++;
            }
            else if (line[i] == '"')
            {
                quoted = !quoted;
            }
            else if (line[i] == ',' && !quoted)
            {
                fields.Add(field.ToString());
                field.Clear();
            }
            else
            {
                field.Append(line[i]);
            }
        }

        fields.Add(field.ToString());
        return fields;
    }
}
