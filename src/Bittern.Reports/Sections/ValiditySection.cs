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
        var table = new MarkdownTable(
            "Supersaturated, not formed",
            "Stage",
            MarkdownTable.Number("SI"),
            "Why it was kept from forming"
        );
        foreach (var stage in outcome.Trains.SelectMany(t => t.Stages))
        {
            foreach (
                var s in stage.Saturations.Where(s =>
                    s.Role is SaturationRole.HeldBack or SaturationRole.NotListed && s.Index > 1e-6
                )
            )
            {
                table.Row(
                    MarkdownText.Escape(s.Solid.Name),
                    MarkdownText.Escape(stage.Stage.Name),
                    Digits.Index(s.Index),
                    s.HeldBackBecause is { } because ? MarkdownText.Escape(because)
                        : s.Role == SaturationRole.HeldBack
                            ? "held back; the recipe gives no reason"
                        : "not listed under `form`"
                );
            }
        }

        if (table.IsEmpty)
        {
            return;
        }

        writer.Heading(3, "Solids that could form and were not allowed to");
        writer.Paragraph(
            "If one of these forms after all, less stays dissolved than reported and more sludge or scale is made. Watch pipes, weirs and aged sludge for them."
        );
        writer.Table(table);
    }

    private static void Constants(MarkdownWriter writer, Outcome outcome)
    {
        var constants = Mattering.Of(outcome);
        var temperatures = Mattering.Temperatures(outcome);
        var items = new List<string>();
        foreach (var species in constants)
        {
            foreach (var celsius in temperatures.Where(t => !species.Constant!.Covers(t)))
            {
                items.Add(
                    "The constant of "
                        + MarkdownText.Escape(species.Name)
                        + " is used at "
                        + Digits.AsTyped(celsius)
                        + " °C, outside the range its source gives ("
                        + RangeText(species.Constant!)
                        + ")."
                );
            }
        }

        var flat = constants
            .Where(s =>
                s.Constant!.Value is TemperatureFunction.VantHoff { EnthalpyKilojoules: null }
            )
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

    private static string RangeText(EquilibriumConstant constant) =>
        (constant.ValidFromCelsius, constant.ValidToCelsius) switch
        {
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
