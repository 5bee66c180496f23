using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using Bittern.Chemistry;

namespace Bittern.Catalogue;

/// <summary>One domain as a Markdown page, for people who browse the catalogue on a forge.</summary>
public static class CataloguePage
{
    /// <summary>Renders a domain's page. Lines end in <c>\n</c>.</summary>
    public static string Render(CatalogueIndex index, string domain)
    {
        var entries = index
            .Entries.Where(e => string.Equals(e.Domain, domain, StringComparison.Ordinal))
            .ToImmutableArray();
        var text = new StringBuilder();
        text.Append(CultureInfo.InvariantCulture, $"# Catalogue: {domain}\n\n");
        text.Append(Introduction(domain));
        text.Append(
            "\nThis page is generated from the catalogue file. Constants hold at zero ionic strength on the molal scale, gases per atm. "
        );
        text.Append(
            "*recalled*: taken from memory of the source, not read in it. ± as published (several sources state 95 % intervals).\n"
        );

        var basis = entries.Where(e => e.Kind is EntryKind.Basis).ToImmutableArray();
        if (!basis.IsEmpty)
        {
            text.Append("\n## Primary species\n\n")
                .AppendJoin(", ", basis.Select(e => Code(e.Name)))
                .Append('\n');
        }

        Table("Dissolved species", EntryKind.Complex);
        Table("Solids", EntryKind.Solid);
        Table("Gases", EntryKind.Gas);
        Table("Half-reactions", EntryKind.HalfReaction);
        Notes(text, entries);
        var parameters = index
            .Parameters.Where(p => string.Equals(p.Domain, domain, StringComparison.Ordinal))
            .ToImmutableArray();
        ParameterTables.Append(text, parameters);
        Sources(
            text,
            entries
                .Select(e => e.Constant?.Source)
                .Concat(parameters.Select(p => p.Parameter.Source))
        );
        return text.ToString();

        void Table(string title, EntryKind kind)
        {
            var rows = entries.Where(e => e.Kind == kind).ToImmutableArray();
            if (rows.IsEmpty)
            {
                return;
            }

            var solids = kind is EntryKind.Solid;
            text.Append(CultureInfo.InvariantCulture, $"\n## {title}\n\n");
            text.Append(
                solids
                    ? "| solid | reaction | log K at 25 °C | ± | ΔH, kJ/mol | valid, °C | source | forms by default |\n"
                    : "| reaction | log K at 25 °C | ± | ΔH, kJ/mol | valid, °C | source |\n"
            );
            text.Append(
                solids ? "|---|---|---:|---:|---:|---|---|---|\n" : "|---|---:|---:|---:|---|---|\n"
            );
            foreach (var row in rows)
            {
                var c = row.Constant!;
                if (solids)
                {
                    text.Append("| ").Append(row.Name).Append(' ');
                }

                text.Append("| ").Append(Code(row.Reaction!.ToString()));
                text.Append(
                    CultureInfo.InvariantCulture,
                    $" | {c.Log10AtCelsius(25):0.00#}{(row.Doubt is null ? "" : " (?)")} | {Bare(c)} | {Enthalpy(c)} | {RangeCell(c)} | {SourceCell(c)} |"
                );
                text.Append(solids ? (row.HeldBack is null ? " yes |\n" : " no |\n") : "\n");
            }
        }
    }

    private static string Introduction(string domain)
    {
        var source = ShippedCatalogue.Open(domain);
        if (source is null)
        {
            return "";
        }

        var lines = source
            .Text.Split('\n')
            .TakeWhile(l => l.StartsWith("//", StringComparison.Ordinal))
            .Select(l => l[2..].Trim());
        return string.Join(' ', lines) + "\n";
    }

    private static void Notes(StringBuilder text, ImmutableArray<CatalogueEntry> entries)
    {
        var held = entries.Where(e => e.HeldBack is not null).ToImmutableArray();
        if (!held.IsEmpty)
        {
            text.Append("\n## Held back unless a recipe names them\n\n");
            foreach (var e in held)
            {
                text.Append(CultureInfo.InvariantCulture, $"- **{e.Name}**: {e.HeldBack}\n");
            }
        }

        var doubted = entries.Where(e => e.Doubt is not null).ToImmutableArray();
        if (!doubted.IsEmpty)
        {
            text.Append("\n## Doubts\n\n");
            foreach (var e in doubted)
            {
                text.Append(CultureInfo.InvariantCulture, $"- {Label(e)}: {e.Doubt}\n");
            }
        }

        var published = entries
            .Where(e => e.Constant?.Value is TemperatureFunction.Published)
            .ToImmutableArray();
        if (!published.IsEmpty)
        {
            text.Append("\n## Expressions in T (kelvin)\n\n");
            foreach (var e in published)
            {
                text.Append(
                    CultureInfo.InvariantCulture,
                    $"- {Label(e)}: {Code($"{ConstantWords.Form(e.Constant!)} = {ConstantWords.Value(e.Constant!)}")}\n"
                );
            }
        }

        var remarked = entries.Where(e => e.Remark.Length > 0).ToImmutableArray();
        if (!remarked.IsEmpty)
        {
            text.Append("\n## Remarks\n\n");
            foreach (var e in remarked)
            {
                text.Append(CultureInfo.InvariantCulture, $"- {Label(e)}: {e.Remark}\n");
            }
        }
    }

    private static void Sources(StringBuilder text, IEnumerable<Citation?> cited)
    {
        var sources = cited
            .OfType<Citation>()
            .Distinct()
            .OrderBy(s => s.Key, StringComparer.Ordinal)
            .ToImmutableArray();
        if (sources.IsEmpty)
        {
            return;
        }

        text.Append("\n## Sources\n\n");
        foreach (var s in sources)
        {
            text.Append(CultureInfo.InvariantCulture, $"- **{s.Key}**: {s.Text}\n");
        }
    }

    private static string Label(CatalogueEntry e) =>
        e.Kind is EntryKind.Solid ? $"**{e.Name}**" : Code(e.Name);

    private static string Code(string text) => $"`{text}`";

    private static string Bare(EquilibriumConstant c) =>
        c.UncertaintyLog10 is { } u
            ? string.Create(CultureInfo.InvariantCulture, $"{u:0.###}")
            : "";

    private static string Enthalpy(EquilibriumConstant c) =>
        c.Value switch
        {
            TemperatureFunction.VantHoff { EnthalpyKilojoules: { } h } => string.Create(
                CultureInfo.InvariantCulture,
                $"{h}"
            ),
            TemperatureFunction.Published => "f(T)",
            _ => "",
        };

    private static string RangeCell(EquilibriumConstant c) =>
        (c.ValidFromCelsius, c.ValidToCelsius) switch
        {
            ({ } from, { } to) when from == to => string.Create(
                CultureInfo.InvariantCulture,
                $"{from}"
            ),
            ({ } from, { } to) => string.Create(CultureInfo.InvariantCulture, $"{from} to {to}"),
            _ => "",
        };

    private static string SourceCell(EquilibriumConstant c) =>
        c.Source is { } s ? $"{s.Key}{(c.Recalled ? ", *recalled*" : "")}" : "";
}
