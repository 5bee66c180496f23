using Bittern.Calculation;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>Where the numbers may be off, what can hurt somebody, and whose decision it is.</summary>
internal static class ValiditySection
{
    /// <summary>Supersaturated solids have a table of their own; their note would say the same twice.</summary>
    private const string SupersaturatedCode = "BT5005";

    /// <summary>A constant without temperature data is worth a word from this distance to 25 °C.</summary>
    private const double NoticeableKelvins = 3;

    public static void Write(MarkdownWriter writer, Outcome outcome)
    {
        writer.Heading(2, "Validity and cautions");
        Found(writer, outcome);
        NotFormed(writer, outcome);
        Constants(writer, outcome);
        Hazards(writer, outcome);
        writer.Paragraph(
            "This report supports a decision; it does not make one. It is an equilibrium calculation: it does not know mixing, settling rates or slow reactions. "
                + "Confirm doses with a jar test on the real liquor. Local codes, the discharge consent and the judgement of licensed practitioners come first."
        );
    }

    private static void Found(MarkdownWriter writer, Outcome outcome)
    {
        var found = outcome
            .Diagnostics.Where(d =>
                !string.Equals(d.Code, SupersaturatedCode, StringComparison.Ordinal)
            )
            .ToArray();
        if (found.Length == 0)
        {
            return;
        }

        writer.Heading(3, "What the run found");
        writer.Bullets(
            found
                .OrderByDescending(d => d.Severity)
                .Select(d =>
                    "**"
                    + Name(d.Severity)
                    + " "
                    + d.Code
                    + "**"
                    + (d.Span is { } span ? " (" + MarkdownText.Escape(span.ToString()) + ")" : "")
                    + ": "
                    + MarkdownText.Sentence(MarkdownText.Escape(d.What))
                    + " "
                    + MarkdownText.Sentence(MarkdownText.Escape(d.Why))
                    + (
                        d.Try is { } hint
                            ? " Try: " + MarkdownText.Escape(hint).TrimEnd('.') + "."
                            : ""
                    )
                )
        );
    }

    private static string Name(Severity severity) =>
        severity switch
        {
            Severity.Error => "Error",
            Severity.Warning => "Warning",
            _ => "Note",
        };

    private static void NotFormed(MarkdownWriter writer, Outcome outcome)
    {
        var found = outcome
            .Trains.SelectMany(t => t.Stages)
            .SelectMany(stage =>
                stage.Saturations.Select(s => (Stage: stage.Stage.Name, Saturation: s))
            )
            .Where(p => Mattering.IsKeptFromForming(p.Saturation) && p.Saturation.Index > 1e-6)
            .GroupBy(p => p.Saturation.Solid.Name, StringComparer.Ordinal)
            .OrderByDescending(g => g.Any(p => Mattering.IsUnexplained(p.Saturation)))
            .ThenByDescending(g => g.Max(p => p.Saturation.Index))
            .ToArray();
        if (found.Length == 0)
        {
            return;
        }

        var table = new MarkdownTable(
            "Supersaturated, not formed",
            "Stage (SI)",
            "Why it was kept from forming"
        );
        foreach (var solid in found)
        {
            table.Row(
                MarkdownText.Escape(solid.Key),
                string.Join(
                    ", ",
                    solid.Select(p =>
                        MarkdownText.Escape(p.Stage) + " (" + Digits.Index(p.Saturation.Index) + ")"
                    )
                ),
                string.Join(
                    "; ",
                    solid.Select(p => Reason(p.Saturation)).Distinct(StringComparer.Ordinal)
                )
            );
        }

        writer.Heading(3, "Solids that could form and were not allowed to");
        writer.Paragraph(
            "If one of these forms after all, less stays dissolved than reported and more sludge or scale is made. Watch pipes, weirs and aged sludge for them."
        );
        writer.Table(table);
    }

    private static string Reason(SaturationResult saturation) =>
        saturation.HeldBackBecause is { } because ? MarkdownText.Escape(because)
        : saturation.Role == SaturationRole.HeldBack ? "held back; the recipe gives no reason"
        : saturation.Role == SaturationRole.Present
            ? "**in suspension, not listed under `form`: it may redissolve but not grow**"
        : "**not listed under `form`, no reason known**";

    private static void Constants(MarkdownWriter writer, Outcome outcome)
    {
        var constants = Mattering.Of(outcome);
        var temperatures = Mattering.Temperatures(outcome);
        var items = new List<string>();
        var outside = constants.Where(s => !temperatures.All(s.Constant!.Covers)).ToArray();
        foreach (var group in outside.GroupBy(s => RangeText(s.Constant!), StringComparer.Ordinal))
        {
            items.Add(
                "Used outside the range of their sources ("
                    + group.Key
                    + "): "
                    + string.Join(", ", group.Select(Named))
                    + "."
                    + (
                        group.Any(HasNoEnthalpy)
                            ? " Those marked * have no temperature data: their values at 25 °C stand."
                            : ""
                    )
            );
        }

        var flat = constants
            .Except(outside)
            .Where(HasNoEnthalpy)
            .Select(s => MarkdownText.Escape(s.Name))
            .ToArray();
        if (flat.Length > 0 && temperatures.Any(t => Math.Abs(t - 25) > NoticeableKelvins))
        {
            items.Add(
                "No temperature data for "
                    + string.Join(", ", flat)
                    + ": their values at 25 °C are used as they stand."
            );
        }

        items.AddRange(
            constants
                .Where(s => s.Doubt is not null)
                .Select(s =>
                    "Doubt about "
                    + MarkdownText.Escape(s.Name)
                    + ": "
                    + MarkdownText.Sentence(MarkdownText.Escape(s.Doubt!))
                )
        );
        if (items.Count == 0)
        {
            return;
        }

        writer.Heading(3, "Constants to be careful with");
        writer.Bullets(items);
    }

    private static string Named(Species species) =>
        MarkdownText.Escape(species.Name) + (HasNoEnthalpy(species) ? "\\*" : "");

    private static bool HasNoEnthalpy(Species species) =>
        species.Constant!.Value is TemperatureFunction.VantHoff { EnthalpyKilojoules: null };

    private static string RangeText(EquilibriumConstant constant) =>
        (constant.ValidFromCelsius, constant.ValidToCelsius) switch
        {
            ({ } from, { } to) when from == to => "only at " + Digits.AsTyped(from) + " °C",
            ({ } from, { } to) => Digits.AsTyped(from) + " to " + Digits.AsTyped(to) + " °C",
            ({ } from, _) => "from " + Digits.AsTyped(from) + " °C",
            (_, { } to) => "to " + Digits.AsTyped(to) + " °C",
            _ => "none",
        };

    private static void Hazards(MarkdownWriter writer, Outcome outcome)
    {
        var cautions = Cautions.Of(outcome).ToArray();
        if (cautions.Length == 0)
        {
            return;
        }

        writer.Heading(3, "Cautions");
        writer.Bullets(cautions.Select(c => "**" + c.Trigger + "** " + c.Text));
    }
}
