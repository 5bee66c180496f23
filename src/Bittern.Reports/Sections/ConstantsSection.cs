using System.Collections.Immutable;
using System.Globalization;
using Bittern.Calculation;
using Bittern.Chemistry;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>Every constant that mattered, overrides first, with where it comes from.</summary>
internal static class ConstantsSection
{
    /// <summary>More temperature columns than this would not fit a page.</summary>
    private const int MostTemperatures = 3;

    public static void Write(MarkdownWriter writer, Outcome outcome)
    {
        var constants = Mattering.Of(outcome);
        var overridden = outcome.Recipe.Chemistry.All.Where(s => s.Override is not null).ToArray();
        if (constants.IsEmpty && overridden.Length == 0)
        {
            return;
        }

        writer.Heading(2, "Constants");
        Overrides(writer, overridden);
        var temperatures = Temperatures(outcome);
        writer.Paragraph(
            "Constants that entered a number of this report: of complexes that hold at least 1 % of a component in some state, of solids that formed or could, "
                + "and of gases exchanged. Thermodynamic (zero ionic strength), molal, gases in atm."
        );
        foreach (var (title, kinds) in Groups)
        {
            var group = constants.Where(c => kinds.Contains(c.Kind)).ToArray();
            if (group.Length > 0)
            {
                writer.Heading(3, title);
                writer.Table(Table(group, temperatures));
            }
        }

        var kept = Mattering.KeptFromForming(outcome);
        if (!kept.IsEmpty)
        {
            writer.Heading(3, "Solids not allowed to form");
            writer.Paragraph(
                "These only say how far the liquor is supersaturated with what was kept from forming."
            );
            writer.Table(Table([.. kept], temperatures));
        }

        ActivityParametersSection.Write(writer, outcome);
        Sources(
            writer,
            [
                .. constants
                    .Concat(kept)
                    .Concat(overridden)
                    .Select(s => s.Constant)
                    .Concat(overridden.Select(s => s.Override?.Replaced))
                    .OfType<EquilibriumConstant>()
                    .Select(c => (c.Source, c.Recalled)),
                .. MatteringParameters.Of(outcome).Select(p => (p.Source, p.Recalled)),
            ]
        );
    }

    private static readonly (string Title, SpeciesKind[] Kinds)[] Groups =
    [
        ("Solids", [SpeciesKind.Solid]),
        ("Dissolved species", [SpeciesKind.Basis, SpeciesKind.Complex]),
        ("Gases", [SpeciesKind.Gas]),
    ];

    private static ImmutableArray<double> Temperatures(Outcome outcome)
    {
        var all = Mattering.Temperatures(outcome);
        return all.Length <= MostTemperatures ? all : [all[0], all[^1]];
    }

    private static void Overrides(MarkdownWriter writer, Species[] overridden)
    {
        if (overridden.Length == 0)
        {
            return;
        }

        writer.Heading(3, "Overrides");
        writer.Paragraph(
            "The recipe replaces these constants; everything else in this report rests on the new values."
        );
        var table = new MarkdownTable("Species", "Reaction", "Replaced", "Used", "Because");
        foreach (var species in overridden)
        {
            table.Row(
                MarkdownText.Escape(species.Name),
                MarkdownText.Escape(species.Written?.ToString() ?? ""),
                AsWritten(species.Override!.Replaced),
                species.Constant is { } used ? AsWritten(used) : "",
                MarkdownText.Escape(species.Override.Because)
            );
        }

        writer.Table(table);
    }

    private static MarkdownTable Table(Species[] species, ImmutableArray<double> temperatures)
    {
        var columns = new List<MarkdownTable.Column> { "Name", "Reaction" };
        columns.AddRange(
            temperatures.Select(t =>
                MarkdownTable.Number("log10 K at " + Digits.AsTyped(t) + " °C")
            )
        );
        columns.AddRange([MarkdownTable.Number("±"), "As given", "Range (°C)", "Source"]);
        var table = new MarkdownTable([.. columns]);
        foreach (var one in species)
        {
            var constant = one.Constant!;
            var cells = new List<string>
            {
                MarkdownText.Escape(one.Name),
                MarkdownText.Escape(one.Written?.ToString() ?? ""),
            };
            cells.AddRange(
                temperatures.Select(t => Digits.Decimals(constant.Log10AtCelsius(t), 3))
            );
            cells.AddRange([
                constant.UncertaintyLog10 is { } u ? Digits.Trimmed(u, 2) : "not given",
                AsWritten(constant),
                Range(constant) + (temperatures.All(constant.Covers) ? "" : ", exceeded"),
                Source(constant.Source, constant.Recalled),
            ]);
            table.Row([.. cells]);
        }

        return table;
    }

    /// <summary>A constant as its author gave it: form, value at 25 °C, temperature dependence.</summary>
    private static string AsWritten(EquilibriumConstant constant)
    {
        var (name, sign, power) = constant.Form switch
        {
            ConstantForm.LogKsp => ("log Ksp", 1, false),
            ConstantForm.PKsp => ("pKsp", -1, false),
            ConstantForm.K => ("K", 1, true),
            ConstantForm.Ksp => ("Ksp", 1, true),
            ConstantForm.LogKH => ("log KH", 1, false),
            _ => ("log K", 1, false),
        };
        if (constant.Value is TemperatureFunction.Published published)
        {
            return name + " = " + MarkdownText.Code(published.Text);
        }

        var line = (TemperatureFunction.VantHoff)constant.Value;
        var value = power
            ? Digits.PowerOfTen(line.Log10At25, 4)
            : Digits.AsTyped(Math.Round(sign * line.Log10At25, 6));
        return name
            + " "
            + value
            + (constant.UncertaintyLog10 is { } u ? " ± " + Digits.Trimmed(u, 2) : "")
            + " at 25 °C, "
            + (
                line.EnthalpyKilojoules is { } h
                    ? "ΔH " + Digits.AsTyped(h) + " kJ/mol"
                    : "no temperature data"
            );
    }

    private static string Range(EquilibriumConstant constant) =>
        (constant.ValidFromCelsius, constant.ValidToCelsius) switch
        {
            (null, null) => "not given",
            ({ } from, { } to) when from == to => "only " + Digits.AsTyped(from),
            ({ } from, { } to) => string.Create(
                CultureInfo.InvariantCulture,
                $"{Digits.AsTyped(from)} to {Digits.AsTyped(to)}"
            ),
            ({ } from, null) => "from " + Digits.AsTyped(from),
            (null, { } to) => "to " + Digits.AsTyped(to),
        };

    /// <summary>A citation as a table shows it.</summary>
    public static string Source(Citation? source, bool recalled) =>
        source is null
            ? "**none**"
            : "\\[" + MarkdownText.Escape(source.Key) + "\\]" + (recalled ? " recalled" : "");

    private static void Sources(
        MarkdownWriter writer,
        ImmutableArray<(Citation? Source, bool Recalled)> used
    )
    {
        writer.Heading(3, "Sources");
        if (used.Any(c => c.Recalled))
        {
            writer.Paragraph(
                "**recalled** marks a constant that was written down without sight of the source it names. Compare it with the source before a decision rests on it."
            );
        }

        if (used.Any(c => c.Source is null))
        {
            writer.Paragraph(
                "**none** marks a constant for which the recipe names no source: nobody can check it."
            );
        }

        writer.Bullets(
            used.Select(c => c.Source)
                .OfType<Citation>()
                .DistinctBy(c => c.Key, StringComparer.Ordinal)
                .OrderBy(c => c.Key, StringComparer.Ordinal)
                .Select(c =>
                    "\\[" + MarkdownText.Escape(c.Key) + "\\] " + MarkdownText.Escape(c.Text)
                )
        );
    }
}
