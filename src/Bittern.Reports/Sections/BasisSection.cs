using System.Collections.Immutable;
using Bittern.Calculation;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>Each liquor as the laboratory reported it beside as it was used.</summary>
internal static class BasisSection
{
    /// <summary>Imbalance that needs a warning, fraction.</summary>
    private const double AcceptedImbalance = 0.05;

    public static void Write(MarkdownWriter writer, Outcome outcome)
    {
        if (outcome.Liquors.IsEmpty)
        {
            return;
        }

        writer.Heading(2, "Basis");
        foreach (var liquor in outcome.Liquors)
        {
            WriteLiquor(writer, liquor, outcome);
        }

        Reagents(writer, outcome.Recipe.Reagents);
        Atmospheres(writer, outcome.Recipe.Atmospheres);
    }

    private static void WriteLiquor(MarkdownWriter writer, LiquorResult result, Outcome outcome)
    {
        var liquor = result.Liquor;
        writer.Heading(3, "Liquor " + MarkdownText.Escape(liquor.Name));
        if (result.Failure is { } failure)
        {
            writer.Paragraph(
                "**No certified speciation:** "
                    + MarkdownText.Sentence(MarkdownText.Escape(failure))
            );
        }

        var anyRemark = result.Entries.Any(e => Remark(e.Entry, result).Length > 0);
        var columns = new List<MarkdownTable.Column>
        {
            "Analyte",
            "As reported",
            MarkdownTable.Number("Used (mg/L)"),
            MarkdownTable.Number("Used (mmol/L)"),
            MarkdownTable.Number("Used (mol/kg water)"),
        };
        if (anyRemark)
        {
            columns.Add("Remark");
        }

        var table = new MarkdownTable([.. columns]);
        foreach (var entry in result.Entries)
        {
            var used = Used(entry, result);
            var molality =
                entry.MolesPerCubicMetre == 0
                    ? entry.Molality
                    : entry.Molality * used / entry.MolesPerCubicMetre;
            var cells = new List<string>
            {
                MarkdownText.Escape(entry.Entry.Analyte),
                MarkdownText.Escape(entry.Entry.Amount.Written),
                Digits.Trimmed(used * entry.Entry.MolarMass, 4),
                Digits.Trimmed(used, 4),
                Digits.Trimmed(molality, 4),
            };
            if (anyRemark)
            {
                cells.Add(Remark(entry.Entry, result));
            }

            table.Row([.. cells]);
        }

        writer.Table(table);
        writer.Bullets(Facts(result, outcome.Recipe));
    }

    private static double Used(EntryResult entry, LiquorResult result) =>
        result.Closure is { } closure && closure.Entry.Equals(entry.Entry)
            ? closure.AfterMolesPerCubicMetre
            : entry.MolesPerCubicMetre;

    private static string Remark(AnalysisEntry entry, LiquorResult result)
    {
        var parts = new List<string>();
        switch (entry.Amount.BelowDetection)
        {
            case BelowDetection.Half:
                parts.Add("below detection, counted at half");
                break;
            case BelowDetection.Zero:
                parts.Add("below detection, counted as zero");
                break;
            case BelowDetection.Limit:
                parts.Add("below detection, counted at the limit");
                break;
            default:
                break;
        }

        if (entry.Assumption is { } assumption)
        {
            parts.Add(MarkdownText.Escape(assumption));
        }

        if (result.Closure is { } closure && closure.Entry.Equals(entry))
        {
            parts.Add("adjusted to close the charge");
        }

        return string.Join("; ", parts);
    }

    private static IEnumerable<string> Facts(LiquorResult result, Recipe recipe)
    {
        var liquor = result.Liquor;
        if (liquor.PH is { } measured)
        {
            yield return "pH "
                + Digits.AsTyped(measured)
                + (liquor.PHUncertainty is { } u ? " ± " + Digits.Trimmed(u, 2) : "")
                + " as measured; it fixes the hydrogen ion of the liquor once.";
        }
        else if (result.State is { } made)
        {
            yield return "pH " + Digits.PH(made.PH) + ", calculated: the recipe gives none.";
        }

        if (liquor.AlkalinityWritten is { } alkalinity)
        {
            yield return "Alkalinity "
                + MarkdownText.Escape(alkalinity)
                + " to pH 4.5 sets the inorganic carbon"
                + (
                    result.State is { } carbonate && InorganicCarbon(carbonate) is { } carbon
                        ? ": " + Digits.Amount(carbon) + " mmol/L"
                        : ""
                )
                + ".";
        }

        if (result.State is { } state)
        {
            yield return "Temperature "
                + Digits.AsTyped(Math.Round(state.TemperatureCelsius, 6))
                + " °C; ionic strength "
                + Digits.Significant(state.IonicStrength)
                + " mol/kg.";
            yield return "Density "
                + Digits.Significant(result.Density, 4)
                + " kg/m3, "
                + (
                    result.DensityFromModel
                        ? "from the tool's own density model: the recipe gives none."
                        : "as the recipe states."
                );
            yield return ChargeBalance(result);
            if (result.Closure is { } closure)
            {
                yield return Closure(closure, liquor);
            }
            else if (
                result.InertCharge != 0
                && Math.Abs(result.SpeciatedChargeImbalance) > Digits.RelativeNoise
            )
            {
                yield return "The residual charge of "
                    + Digits.Amount(result.InertCharge)
                    + " meq/L rides along as an inert charge; no analysed value was changed.";
            }

            if (Math.Max(Math.Abs(result.PlainChargeImbalance), 0) > AcceptedImbalance)
            {
                yield return "**Warning:** the plain imbalance is above 5 %. Laboratories usually accept +- 5 % for an anion sum of 10 to 800 meq/L "
                    + "(+- 2 % from 3 to 10 meq/L, +- 0.2 meq/L below 3): Standard Methods for the Examination of Water and Wastewater, section 1030 E, "
                    + "checking correctness of analyses (common practice). Have the analysis checked, or name what is missing from it, before its numbers are relied on.";
            }
        }
    }

    private static double? InorganicCarbon(SolvedState state)
    {
        var moles = state
            .DissolvedTotals.Where(t => t.Species.Text is "CO3^2-" or "HCO3-" or "CO2(aq)")
            .Sum(t => t.Coefficient);
        return moles > 0 ? moles / state.Volume : null;
    }

    private static string ChargeBalance(LiquorResult result) =>
        "Charge balance of the analysis, (cations - anions)/(cations + anions): "
        + Digits.Percent(result.PlainChargeImbalance)
        + " with plain ions at the stated pH, "
        + Digits.Percent(result.SpeciatedChargeImbalance)
        + " after speciation.";

    private static string Closure(ChargeClosure closure, Liquor liquor)
    {
        var before = closure.BeforeMolesPerCubicMetre * closure.Entry.MolarMass;
        var after = closure.AfterMolesPerCubicMetre * closure.Entry.MolarMass;
        var change =
            before == 0
                ? ""
                : " ("
                    + (after >= before ? "+" : "")
                    + Digits.Percent((after - before) / before)
                    + ")";
        return "The charge is closed by "
            + MarkdownText.Escape(closure.Entry.Analyte)
            + ": "
            + Digits.Amount(before, 4)
            + " mg/L as analysed, "
            + Digits.Amount(after, 4)
            + " mg/L as used"
            + change
            + (
                liquor.ChargeClosedBecause is { } because
                    ? ", because \"" + MarkdownText.Escape(because) + "\""
                    : ""
            )
            + ". No independent check of the charge is left.";
    }

    private static void Reagents(MarkdownWriter writer, ImmutableArray<Reagent> reagents)
    {
        var table = new MarkdownTable(
            "Reagent",
            "Make-up",
            MarkdownTable.Number("Purity (%)"),
            "Density (kg/m3)",
            "Price"
        );
        foreach (var reagent in reagents)
        {
            table.Row(
                DoseText.Name(reagent),
                string.Join(
                    ", ",
                    reagent.Entries.Select(e =>
                        MarkdownText.Escape(e.Analyte + " " + e.Amount.Written)
                    )
                ) + (reagent.IsDry ? " (dry)" : ""),
                Digits.AsTyped(Math.Round(reagent.Purity * 100, 6)),
                reagent.Density is { } density ? Digits.Significant(density, 4)
                    : reagent.IsDry ? "dry"
                    : "estimated from the dry content",
                reagent.Price is { } price ? MarkdownText.Escape(price.Written) : "not stated"
            );
        }

        if (!table.IsEmpty)
        {
            writer.Heading(3, "Reagents");
            writer.Table(table);
        }
    }

    private static void Atmospheres(MarkdownWriter writer, ImmutableArray<Atmosphere> atmospheres)
    {
        var table = new MarkdownTable(
            "Atmosphere",
            "Gas",
            MarkdownTable.Number("Partial pressure")
        );
        foreach (var atmosphere in atmospheres)
        {
            foreach (var pressure in atmosphere.Pressures)
            {
                table.Row(
                    MarkdownText.Escape(atmosphere.Name),
                    MarkdownText.Escape(pressure.Gas.Text),
                    MarkdownText.Escape(pressure.Written)
                );
            }
        }

        if (!table.IsEmpty)
        {
            writer.Heading(3, "Atmospheres");
            writer.Table(table);
        }
    }
}
