using System.Collections.Immutable;
using Bittern.Calculation;
using Bittern.Chemistry;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>Stage by stage: what was dosed, what formed, what is left, and Q against Ksp written out.</summary>
internal static class TreatmentSection
{
    public static void Write(MarkdownWriter writer, Outcome outcome)
    {
        foreach (var train in outcome.Trains)
        {
            var title = train.Train.IsMixture ? "Mixture" : "Treatment";
            writer.Heading(
                2,
                outcome.Trains.Length == 1
                    ? title
                    : title + ": " + MarkdownText.Escape(train.Train.Name)
            );
            var throughput = new Throughput(train.Train.Feed);
            if (!train.Train.IsMixture)
            {
                writer.Paragraph(
                    "The feed is "
                        + throughput.InWords()
                        + ". Amounts are per m3 of that feed; concentrations are of the liquor at that place."
                );
            }

            if (train.Failure is { } failure)
            {
                writer.Paragraph(
                    "**No certified answer from stage '"
                        + MarkdownText.Escape(failure.Stage)
                        + "' on:** "
                        + MarkdownText.Sentence(MarkdownText.Escape(failure.Reason))
                );
            }

            var entering = train.Feed;
            foreach (var stage in train.Stages)
            {
                WriteStage(writer, stage, entering, throughput, outcome.Recipe, train.Train);
                entering = stage.Outflow;
            }
        }
    }

    private static void WriteStage(
        MarkdownWriter writer,
        StageResult stage,
        SolvedState? entering,
        Throughput throughput,
        Recipe recipe,
        Train train
    )
    {
        if (!train.IsMixture)
        {
            writer.Heading(3, "Stage " + MarkdownText.Escape(stage.Stage.Name));
        }

        writer.Bullets(Conditions(stage, entering));
        Doses(writer, stage);
        Formed(writer, stage, throughput, train.IsMixture);
        Gases(writer, stage);
        LeftDissolved(writer, stage, entering, recipe.Chemistry.Basis, train);
        Saturations(writer, stage, train.IsMixture);
    }

    private static IEnumerable<string> Conditions(StageResult stage, SolvedState? entering)
    {
        yield return "pH "
            + (entering is null ? "" : Digits.PH(entering.PH) + " entering, ")
            + Digits.PH(stage.End.PH)
            + " at the end; ionic strength "
            + Digits.Significant(stage.End.IonicStrength)
            + " mol/kg; "
            + Digits.AsTyped(Math.Round(stage.End.TemperatureCelsius, 2))
            + " °C.";
        foreach (var conversion in stage.Conversions)
        {
            yield return "Carried out because the recipe says so: "
                + MarkdownText.Escape(conversion.Action.Reaction)
                + "; "
                + Digits.Amount(conversion.MolesPerFeed)
                + " mol of "
                + MarkdownText.Escape(conversion.Action.From.Text)
                + " per m3 of feed, which takes "
                + Digits.Amount(conversion.AgentPerFeed)
                + " mol of "
                + MarkdownText.Escape(conversion.Action.Agent)
                + (conversion.Action.AgentFromAir ? " out of the atmosphere." : ".");
        }

        foreach (var blend in stage.Stage.Actions.OfType<StageAction.Blend>())
        {
            yield return "Blended with "
                + Digits.AsTyped(blend.VolumesPerVolume)
                + " volumes of '"
                + MarkdownText.Escape(blend.Liquor.Name)
                + "' per volume entering.";
        }

        foreach (var contact in stage.Stage.Contacts)
        {
            yield return "Open to '" + MarkdownText.Escape(contact.Name) + "'.";
        }

        yield return stage.Stage.FormsAny
            ? "Allowed to form: every solid that the constants in use hold, unless held back."
        : stage.Stage.Forming.IsEmpty ? "No solid is allowed to form."
        : "Allowed to form: "
            + string.Join(", ", stage.Stage.Forming.Select(s => MarkdownText.Escape(s.Name)))
            + ".";
        if (stage.Stage.Settling is { } settling)
        {
            yield return Digits.Percent(settling.Fraction)
                + " of the suspended solids leave as '"
                + MarkdownText.Escape(settling.To)
                + "'"
                + (
                    settling.SolidsContent is { } content
                        ? " with " + Digits.Percent(content) + " of dry solids."
                        : ", counted dry."
                );
        }
    }

    private static void Doses(MarkdownWriter writer, StageResult stage)
    {
        var table = new MarkdownTable(
            "Dosed",
            "Asked for",
            MarkdownTable.Number("As delivered (L per m3 entering)"),
            MarkdownTable.Number("As delivered (kg/m3 of feed)"),
            MarkdownTable.Number("Dry (kg/m3 of feed)"),
            MarkdownTable.Number("Active (kg/m3 of feed)")
        );
        foreach (var dose in stage.Doses)
        {
            table.Row(
                DoseText.Name(dose.Reagent),
                DoseText.Asked(dose.Action),
                dose.Reagent.IsDry ? "dry" : Digits.Significant(dose.VolumePerStageVolume * 1000),
                Digits.Significant(dose.ProductPerFeed),
                Digits.Significant(dose.DryPerFeed),
                Digits.Significant(dose.ActivePerFeed)
            );
        }

        writer.Table(table);
    }

    private static void Formed(
        MarkdownWriter writer,
        StageResult stage,
        Throughput throughput,
        bool isMixture
    )
    {
        if (stage.Formed.IsEmpty)
        {
            writer.Paragraph(isMixture ? "Nothing formed." : "Nothing formed in this stage.");
            return;
        }

        var (unit, size) = Throughput.MassUnit(
            stage.Formed.Select(f => throughput.PerPeriod(f.MassPerFeed))
        );
        var columns = new List<MarkdownTable.Column> { "Formed", "Formula" };
        columns.AddRange(
            isMixture
                ?
                [
                    MarkdownTable.Number("mmol per L of mixture"),
                    MarkdownTable.Number("g per L of mixture"),
                ]
                : [MarkdownTable.Number("mol/m3 of feed"), MarkdownTable.Number("kg/m3 of feed")]
        );
        if (throughput.IsKnown)
        {
            columns.Add(
                MarkdownTable.Number(isMixture ? unit + " in all" : unit + "/" + throughput.Period)
            );
        }

        var volume = isMixture ? stage.End.Volume : 1;
        var table = new MarkdownTable([.. columns]);
        foreach (
            var solid in stage
                .Formed.OrderByDescending(f => f.MassPerFeed)
                .ThenBy(f => f.Solid.Name, StringComparer.Ordinal)
        )
        {
            Add(
                MarkdownText.Escape(solid.Solid.Name),
                MarkdownText.Escape(solid.Solid.Formula.Text),
                Digits.Amount(solid.MolesPerFeed / volume),
                solid.MassPerFeed
            );
        }

        if (stage.Formed.Length > 1)
        {
            Add("**all solids**", "", "", stage.Formed.Sum(f => f.MassPerFeed));
        }

        writer.Table(table);
        if (stage.Formed.Any(f => f.MassPerFeed < 0))
        {
            writer.Paragraph("Negative amounts redissolved in this stage.");
        }

        void Add(string name, string formula, string moles, double mass)
        {
            var cells = new List<string> { name, formula, moles, Digits.Amount(mass / volume) };
            if (throughput.IsKnown)
            {
                cells.Add(Digits.Amount(throughput.PerPeriod(mass) / size));
            }

            table.Row([.. cells]);
        }
    }

    private static void Gases(MarkdownWriter writer, StageResult stage)
    {
        var table = new MarkdownTable(
            "Gas",
            MarkdownTable.Number("Pressure (atm)"),
            "Exchange",
            MarkdownTable.Number("mol/m3 of feed"),
            MarkdownTable.Number("g/m3 of feed")
        );
        foreach (var gas in stage.GasExchanges)
        {
            var moles = Math.Abs(gas.MolesPerFeed);
            table.Row(
                MarkdownText.Escape(gas.Gas.Formula.Text),
                Digits.AsTyped(gas.Atmospheres),
                gas.MolesPerFeed < 0 ? "given off" : "taken up",
                Digits.Amount(moles),
                Digits.Amount(moles * gas.Gas.Formula.MolarMass)
            );
        }

        writer.Table(table);
    }

    private static void LeftDissolved(
        MarkdownWriter writer,
        StageResult stage,
        SolvedState? entering,
        ImmutableArray<Species> basis,
        Train train
    )
    {
        var afterSettling = !ReferenceEquals(stage.Outflow, stage.End);
        var table = new MarkdownTable(
            "Dissolved",
            MarkdownTable.Number(train.IsMixture ? "As mixed (mg/L)" : "Entering (mg/L)"),
            MarkdownTable.Number("Leaving (mg/L)"),
            MarkdownTable.Number("Leaving (mmol/L)"),
            "Mostly as"
        );
        foreach (var total in stage.Outflow.DissolvedTotals)
        {
            var left = total.Coefficient / stage.Outflow.Volume;
            var before =
                train.IsMixture ? Mixed(stage.End, total.Species)
                : entering is null ? double.NaN
                : entering.DissolvedPerCubicMetre(total.Species);
            if (left == 0 && before is 0 or double.NaN)
            {
                continue;
            }

            var label = DissolvedLabel.Of(total.Species, basis);
            table.Row(
                MarkdownText.Escape(label.Text),
                Digits.Amount(before * label.MolarMass),
                Digits.Amount(left * label.MolarMass),
                Digits.Amount(left),
                MarkdownText.Escape(Speciation.Mostly(stage.Outflow, total.Species))
            );
        }

        writer.Table(table);
        if (
            afterSettling
            && stage.Outflow.Suspended.Sum(s => s.MassPerFeed) is var suspended and > 0
        )
        {
            writer.Paragraph(
                "Suspended solids that pass the settler: "
                    + Digits.Amount(suspended / stage.Outflow.Volume * 1000)
                    + " mg/L; they are not part of the dissolved values."
            );
        }
    }

    // What a mixture holds before anything forms, mol per m3 of it: dissolved and in its solids.
    private static double Mixed(SolvedState state, Formula basis) =>
        state.DissolvedPerCubicMetre(basis)
        + (
            state.Suspended.Sum(s =>
                s.MolesPerFeed
                * s.Solid.FromBasis.Where(t => t.Species.Equals(basis)).Sum(t => t.Coefficient)
            ) / state.Volume
        );

    private static void Saturations(MarkdownWriter writer, StageResult stage, bool isMixture)
    {
        if (stage.Saturations.IsEmpty)
        {
            return;
        }

        writer.Heading(
            isMixture ? 3 : 4,
            isMixture
                ? "Q against Ksp in the mixture"
                : "Q against Ksp at the end of stage " + MarkdownText.Escape(stage.Stage.Name)
        );
        var ordered = stage
            .Saturations.OrderBy(s =>
                Mattering.IsSuspendedOnly(s) ? SaturationRole.NotListed : s.Role
            )
            .ThenBy(s => s.Role == SaturationRole.Present ? 0 : -s.Index)
            .ToArray();
        var table = new MarkdownTable(
            "Solid",
            "Reaction",
            "Role",
            MarkdownTable.Number("log10 Q"),
            MarkdownTable.Number("log10 K"),
            MarkdownTable.Number("SI"),
            MarkdownTable.Number("Q/K")
        );
        foreach (var saturation in ordered)
        {
            table.Row(
                MarkdownText.Escape(saturation.Solid.Name),
                MarkdownText.Escape(saturation.Solid.Written?.ToString() ?? ""),
                Role(saturation),
                SaturationArithmetic.Log(saturation.Log10Q),
                SaturationArithmetic.Log(saturation.Log10K),
                Digits.Index(saturation.Index),
                SaturationArithmetic.Ratio(saturation.Index)
            );
        }

        writer.Table(table);
        Activities(writer, stage);
        var written = ordered.Where(s => Mattering.IsWrittenOut(s, stage.Stage)).ToArray();
        if (written.Length < ordered.Length)
        {
            writer.Paragraph(
                "Written out for the solids that formed, may form, or are supersaturated by choice or oversight; the others follow from their reactions in the same way."
            );
        }

        foreach (var saturation in written)
        {
            writer.Paragraph(
                "**"
                    + MarkdownText.Escape(saturation.Solid.Name)
                    + "** ("
                    + Role(saturation)
                    + (
                        saturation.HeldBackBecause is { } because
                            ? ": " + MarkdownText.Escape(because)
                            : ""
                    )
                    + ")"
            );
            writer.Fenced(SaturationArithmetic.Lines(saturation));
        }
    }

    private static void Activities(MarkdownWriter writer, StageResult stage)
    {
        writer.Paragraph(
            "Activities a = m * γ that enter the quotients below (m in mol per kg of water):"
        );
        var table = new MarkdownTable(
            "Species",
            MarkdownTable.Number("m (mol/kg)"),
            MarkdownTable.Number("γ"),
            MarkdownTable.Number("a")
        );
        foreach (
            var term in stage
                .Saturations.SelectMany(s => s.Terms)
                .DistinctBy(t => t.Species, StringComparer.Ordinal)
                .OrderBy(t => t.Species is "H2O" or "H+")
                .ThenBy(t => t.Species, StringComparer.Ordinal)
        )
        {
            var water = double.IsNaN(term.Molality);
            table.Row(
                MarkdownText.Escape(term.Species),
                water ? "solvent" : Digits.Factor(term.Molality, 4),
                water ? "" : Digits.Significant(term.ActivityCoefficient, 4),
                Digits.Factor(term.Activity, 4)
            );
        }

        writer.Table(table);
    }

    private static string Role(SaturationResult saturation) =>
        saturation.Role switch
        {
            SaturationRole.Present when Mattering.IsSuspendedOnly(saturation) =>
                "suspended, not listed",
            SaturationRole.Present => "formed",
            SaturationRole.Allowed => "may form",
            SaturationRole.HeldBack => "held back",
            _ => "not listed",
        };
}
