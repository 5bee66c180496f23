using System.Globalization;
using System.Text;
using Bittern.Chemistry;

namespace Bittern.Catalogue;

/// <summary>All that is known of one entry, as plain text for a terminal.</summary>
public static class CatalogueCard
{
    /// <summary>Temperatures of the small table, °C; those outside the stated range are left out.</summary>
    private static readonly double[] TableCelsius =
    [
        0,
        5,
        10,
        15,
        20,
        25,
        30,
        40,
        50,
        60,
        75,
        90,
        100,
        150,
        200,
        250,
    ];

    /// <summary>Renders one entry. Lines end in <c>\n</c>.</summary>
    public static string Render(CatalogueIndex index, CatalogueEntry entry)
    {
        var text = new StringBuilder();
        var formula = entry.Kind is EntryKind.Solid ? $"  {entry.Formula}" : "";
        text.Append(
            CultureInfo.InvariantCulture,
            $"{entry.Name}{formula}  ({ConstantWords.Kind(entry.Kind)}, catalogue {entry.Domain})\n"
        );
        if (entry.Formula is { MolarMass: > 0 } f)
        {
            Line(
                "molar mass",
                string.Create(CultureInfo.InvariantCulture, $"{f.MolarMass:0.###} g/mol")
            );
        }

        if (entry.Constant is { } constant)
        {
            Line("reaction", entry.Reaction!.ToString());
            Line(ConstantWords.Form(constant), ConstantWords.Value(constant));
            Line(
                "at 25 °C",
                string.Create(CultureInfo.InvariantCulture, $"{constant.Log10AtCelsius(25):0.00}")
            );
            Line(
                "uncertainty",
                ConstantWords.Uncertainty(constant) is { Length: > 0 } u
                    ? $"{u} in log10 units"
                    : "none stated"
            );
            Line("valid", ConstantWords.Range(constant));
            Line("source", ConstantWords.Source(constant));
        }

        if (entry.Kind is EntryKind.Solid)
        {
            Line(
                "forms",
                entry.HeldBack is { } why ? $"only when a recipe names it: {why}" : "by default"
            );
        }

        if (entry.Doubt is { } doubt)
        {
            Line("doubt", doubt);
        }

        if (entry.Remark.Length > 0)
        {
            Line("remark", entry.Remark);
        }

        foreach (var other in CatalogueSearch.Alternatives(index, entry))
        {
            Line("alternative", Alternative(other));
        }

        if (entry.Constant is { } tabled)
        {
            Table(tabled);
        }

        return text.ToString();

        void Line(string label, string value) =>
            text.Append("  ").Append(label.PadRight(12)).Append(' ').Append(value).Append('\n');

        void Table(EquilibriumConstant c)
        {
            text.Append("\n     °C   ").Append(ConstantWords.Form(c)).Append('\n');
            foreach (var t in TableCelsius.Where(t => InTable(c, t)))
            {
                text.Append(
                    CultureInfo.InvariantCulture,
                    $"  {t, 5:0}  {c.Log10AtCelsius(t), 8:0.000}\n"
                );
            }
        }
    }

    // A constant without a stated range is tabled where van 't Hoff can be trusted.
    private static bool InTable(EquilibriumConstant c, double celsius) =>
        c.Covers(celsius)
        && (
            c.ValidFromCelsius is not null
            || c.ValidToCelsius is not null
            || celsius is >= 0 and <= 60
        );

    private static string Alternative(CatalogueEntry other)
    {
        var held = other.HeldBack is null ? "" : ", held back";
        return string.Create(
            CultureInfo.InvariantCulture,
            $"{other.Name} (catalogue {other.Domain}): {other.Reaction}, {ConstantWords.Form(other.Constant!)} {other.Constant!.Log10AtCelsius(25):0.00} at 25 °C{held}"
        );
    }
}
