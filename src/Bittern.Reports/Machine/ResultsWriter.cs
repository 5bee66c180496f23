using System.Collections.Immutable;
using System.Text.Json;
using Bittern.Calculation;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Machine;

/// <summary>Writes the document of <see cref="JsonReport"/>, part by part in the order of the schema.</summary>
internal sealed class ResultsWriter(Utf8JsonWriter json)
{
    private ImmutableArray<Species> _basis = [];

    public void Write(Outcome outcome, ReportStamp stamp)
    {
        _basis = outcome.Recipe.Chemistry.Basis;
        json.WriteStartObject();
        json.WriteString("format", JsonReport.Format);
        json.WriteString("tool_version", stamp.ToolVersion);
        Header(outcome.Recipe.Header);
        Items("inputs", stamp.Inputs.IsDefault ? [] : stamp.Inputs, Input);
        json.WriteBoolean("all_certified", outcome.AllCertified);
        json.WriteBoolean("all_limits_met", outcome.AllLimitsMet);
        Items("limit_sets", outcome.LimitSets, Limits);
        Items("liquors", outcome.Liquors, Liquor);
        Items("trains", outcome.Trains, Train);
        Items(
            "constants",
            Mattering.Of(outcome),
            s => Constant(s, Mattering.Temperatures(outcome))
        );
        Items("diagnostics", outcome.Diagnostics, Found);
        json.WriteEndObject();
    }

    private void Header(RecipeHeader header)
    {
        json.WriteStartObject("recipe");
        json.WriteString("title", header.Title);
        json.WriteString("client", header.Client);
        json.WriteString("reference", header.Reference);
        json.WriteString("revision", header.Revision);
        json.WriteString("date", header.Date);
        Number("temperature_celsius", header.TemperatureCelsius);
        json.WriteString("activity_model", header.ActivityModel);
        json.WriteEndObject();
    }

    private void Input(FileHash input)
    {
        json.WriteString("file", input.Name);
        json.WriteString("sha256", input.Sha256);
    }

    private void Limits(LimitSetResult set)
    {
        json.WriteString("name", set.Set.Name);
        json.WriteString("train", set.Set.Train.Name);
        Items(
            "limits",
            set.Results,
            result =>
            {
                var condition = result.Limit.Condition;
                json.WriteString("quantity", condition.Quantity.Name);
                json.WriteString("written", condition.Written);
                json.WriteString("comparison", Words.Of(condition.Comparison));
                json.WriteString("unit", condition.DisplayUnit);
                Number("bound", condition.Value / condition.DisplayFactor);
                Number("upper_bound", condition.Upper / condition.DisplayFactor);
                Number("found", result.Value / condition.DisplayFactor);
                Number("margin", Margin(condition, result.Value));
                json.WriteString("verdict", Words.Of(result.Verdict));
                json.WriteString("below_detection", result.BelowDetectionNote);
                json.WriteString("note", result.Limit.Note);
            }
        );
    }

    // Root finding leaves a target a hair on the safe side; that hair is no margin.
    private static double Margin(Condition condition, double value)
    {
        var margin = Judgement.Margin(condition, value);
        var bound = Math.Abs(Judgement.NearestBound(condition, value));
        return Math.Abs(margin) <= Digits.RelativeNoise * bound
            ? 0
            : margin / condition.DisplayFactor;
    }

    private void Liquor(LiquorResult liquor)
    {
        json.WriteString("name", liquor.Liquor.Name);
        Items(
            "entries",
            liquor.Entries,
            entry =>
            {
                json.WriteString("analyte", entry.Entry.Analyte);
                json.WriteString("reported", entry.Entry.Amount.Written);
                json.WriteString("below_detection", Words.Of(entry.Entry.Amount.BelowDetection));
                Number("mg_per_l", entry.MolesPerCubicMetre * entry.Entry.MolarMass);
                Number("mmol_per_l", entry.MolesPerCubicMetre);
                Number("mol_per_kg_water", entry.Molality);
                json.WriteString("assumption", entry.Entry.Assumption);
            }
        );
        Number("measured_ph", liquor.Liquor.PH);
        Number("density_kg_per_m3", liquor.State is null ? null : liquor.Density);
        json.WriteString("density_from", liquor.DensityFromModel ? "model" : "recipe");
        Number("charge_imbalance_plain", Quiet(liquor.PlainChargeImbalance));
        Number("charge_imbalance_speciated", Quiet(liquor.SpeciatedChargeImbalance));
        Number("inert_charge_eq_per_m3", Quiet(liquor.InertCharge));
        if (liquor.Closure is { } closure)
        {
            json.WriteStartObject("charge_closed_by");
            json.WriteString("analyte", closure.Entry.Analyte);
            Number("before_mmol_per_l", closure.BeforeMolesPerCubicMetre);
            Number("after_mmol_per_l", closure.AfterMolesPerCubicMetre);
            json.WriteEndObject();
        }
        else
        {
            json.WriteNull("charge_closed_by");
        }

        State("state", liquor.State);
        json.WriteString("failure", liquor.Failure);
    }

    private void Train(TrainResult train)
    {
        json.WriteString("name", train.Train.Name);
        json.WriteBoolean("is_mixture", train.Train.IsMixture);
        json.WriteStartObject("feed");
        json.WriteString("liquor", train.Train.Feed.Liquor.Name);
        json.WriteString("rate", train.Train.Feed.Rate);
        Number("m3_per_s", train.Train.Feed.CubicMetresPerSecond);
        Number("m3", train.Train.Feed.CubicMetres);
        json.WriteEndObject();
        Items(
            "doses",
            train.Doses,
            dose =>
            {
                json.WriteString("reagent", dose.Reagent.Name);
                Number("product_kg_per_m3_feed", dose.ProductPerFeed);
                Number("dry_kg_per_m3_feed", dose.DryPerFeed);
                Number("product_m3_per_m3_feed", dose.ProductVolumePerFeed);
                Number("cost_per_m3_feed", dose.CostPerFeed);
                json.WriteString("currency", dose.Reagent.Price?.Currency);
            }
        );
        Items(
            "sludges",
            train.Sludges,
            sludge =>
            {
                json.WriteString("name", sludge.Name);
                json.WriteString("stage", sludge.Stage);
                Number("dry_kg_per_m3_feed", sludge.DryMassPerFeed);
                Number("inert_kg_per_m3_feed", sludge.InertPerFeed);
                Number("liquor_kg_per_m3_feed", sludge.LiquorPerFeed);
                Items("solids", sludge.Solids, Solid);
            }
        );
        State("feed_state", train.Feed);
        Items("stages", train.Stages, Stage);
        Residual("worst_plant_imbalance_below", train.WorstPlantImbalance);
        if (train.Failure is { } failure)
        {
            json.WriteStartObject("failure");
            json.WriteString("stage", failure.Stage);
            json.WriteString("reason", failure.Reason);
            json.WriteEndObject();
        }
        else
        {
            json.WriteNull("failure");
        }
    }

    private void Stage(StageResult stage)
    {
        json.WriteString("name", stage.Stage.Name);
        Items("doses", stage.Doses, Dose);
        Items(
            "conversions",
            stage.Conversions,
            conversion =>
            {
                json.WriteString("reaction", conversion.Action.Reaction);
                Number("mol_per_m3_feed", conversion.MolesPerFeed);
                json.WriteString("agent", conversion.Action.Agent);
                Number("agent_mol_per_m3_feed", conversion.AgentPerFeed);
            }
        );
        Items("formed", stage.Formed, Solid);
        Items(
            "gases",
            stage.GasExchanges,
            gas =>
            {
                json.WriteString("gas", gas.Gas.Name);
                Number("atm", gas.Atmospheres);
                Number("taken_up_mol_per_m3_feed", gas.MolesPerFeed);
            }
        );
        Items("saturations", stage.Saturations, Saturation);
        Items(
            "onsets",
            stage.Onsets,
            onset =>
            {
                json.WriteString("solid", onset.Solid.Name);
                json.WriteString("reagent", onset.Reagent.Name);
                Number(DoseField(onset.Reagent), onset.DosePerStageVolume);
                Number("ph", onset.PH);
            }
        );
        State("end", stage.End);
        State("outflow", stage.Outflow);
    }

    private void Dose(DoseResult dose)
    {
        json.WriteString("reagent", dose.Reagent.Name);
        json.WriteString("asked", DoseText.AskedPlain(dose.Action));
        Number("product_m3_per_m3_entering", dose.Reagent.IsDry ? null : dose.VolumePerStageVolume);
        Number("product_kg_per_m3_feed", dose.ProductPerFeed);
        Number("dry_kg_per_m3_feed", dose.DryPerFeed);
        Number("active_kg_per_m3_feed", dose.ActivePerFeed);
        Number("cost_per_m3_feed", dose.CostPerFeed);
        if (dose.Target is not { } target)
        {
            json.WriteNull("target");
            return;
        }

        var factor = target.Target.DisplayFactor;
        json.WriteStartObject("target");
        json.WriteString("written", target.Target.Written);
        json.WriteString("unit", target.Target.DisplayUnit);
        json.WriteBoolean("reached", target.Reached);
        json.WriteBoolean("held_already", target.HeldAlready);
        Number("value", target.Value / factor);
        Number("best_value", target.BestValue / factor);
        Number("best_" + DoseField(dose.Reagent), target.BestDose);
        Number("stops_holding_at_" + DoseField(dose.Reagent), target.StopsHoldingAt);
        Number("largest_" + DoseField(dose.Reagent), target.LargestDose);
        json.WriteEndObject();
    }

    private static string DoseField(Reagent reagent) =>
        reagent.IsDry ? "kg_per_m3_entering" : "m3_per_m3_entering";

    private void Solid(SolidAmount amount)
    {
        json.WriteString("solid", amount.Solid.Name);
        json.WriteString("formula", amount.Solid.Formula.Text);
        Number("mol_per_m3_feed", amount.MolesPerFeed);
        Number("kg_per_m3_feed", amount.MassPerFeed);
    }

    private void Saturation(SaturationResult saturation)
    {
        json.WriteString("solid", saturation.Solid.Name);
        json.WriteString("reaction", saturation.Solid.Written?.ToString());
        json.WriteString("role", Words.Of(saturation.Role));
        json.WriteString("because", saturation.HeldBackBecause);
        Number("log10_q", saturation.Log10Q);
        Number("log10_k", saturation.Log10K);
        Number("saturation_index", Math.Abs(saturation.Index) < 1e-6 ? 0 : saturation.Index);
        Items(
            "terms",
            saturation.Terms,
            term =>
            {
                json.WriteString("species", term.Species);
                Number("coefficient", term.Coefficient);
                Number("mol_per_kg", term.Molality);
                Number("activity_coefficient", term.ActivityCoefficient);
                Number("activity", term.Activity);
            }
        );
    }

    private void State(string name, SolvedState? state)
    {
        if (state is null)
        {
            json.WriteNull(name);
            return;
        }

        json.WriteStartObject(name);
        Number("temperature_celsius", Math.Round(state.TemperatureCelsius, 6));
        Number("ph", state.PH);
        Number("ionic_strength_mol_per_kg", state.IonicStrength);
        Number("water_activity", state.WaterActivity);
        Number("water_kg_per_m3_feed", state.WaterKilograms);
        Number("density_kg_per_m3", state.Density);
        Number("volume_m3_per_m3_feed", state.Volume);
        Items(
            "dissolved",
            state.DissolvedTotals,
            total =>
            {
                var label = DissolvedLabel.Of(total.Species, _basis);
                json.WriteString("name", label.Text);
                json.WriteString("basis_species", total.Species.Text);
                Number("mg_per_l", total.Coefficient / state.Volume * label.MolarMass);
                Number("mmol_per_l", total.Coefficient / state.Volume);
            }
        );
        Items(
            "species",
            state.Species.Where(s => s.Molality > 0),
            species =>
            {
                json.WriteString("name", species.Species.Name);
                Number("mol_per_kg", species.Molality);
                Number("activity_coefficient", species.ActivityCoefficient);
            }
        );
        Items("suspended", state.Suspended, Solid);
        Certificate(state.Certificate);
        json.WriteEndObject();
    }

    private void Certificate(CertificateResult certificate)
    {
        json.WriteStartObject("certificate");
        json.WriteBoolean("accepted", certificate.Accepted);
        Residual("worst_balance_below", certificate.WorstBalance);
        Residual("charge_below", certificate.ChargeResidual);
        Residual("worst_oversaturation_below", Math.Max(certificate.WorstSaturation, 0));
        Residual("worst_complementarity_below", certificate.WorstComplementarity);
        Residual("activity_below", certificate.ActivityResidual);
        json.WriteEndObject();
    }

    private void Constant(Species species, ImmutableArray<double> temperatures)
    {
        var constant = species.Constant!;
        json.WriteString("name", species.Name);
        json.WriteString("reaction", species.Written?.ToString());
        Items(
            "log10_k",
            temperatures,
            celsius =>
            {
                Number("celsius", celsius);
                Number("value", constant.Log10AtCelsius(celsius));
                json.WriteBoolean("in_range", constant.Covers(celsius));
            }
        );
        Number("uncertainty_log10", constant.UncertaintyLog10);
        json.WriteString("source", constant.Source?.Text);
        json.WriteBoolean("recalled", constant.Recalled);
        json.WriteString("override_because", species.Override?.Because);
    }

    private void Found(Diagnostic found)
    {
        json.WriteString("code", found.Code);
        json.WriteString("severity", Words.Of(found.Severity));
        json.WriteString("what", found.What);
        json.WriteString("why", found.Why);
        json.WriteString("try", found.Try);
        json.WriteString("at", found.Span?.ToString());
    }

    private void Items<T>(string name, IEnumerable<T> items, Action<T> fields)
    {
        json.WriteStartArray(name);
        foreach (var item in items)
        {
            json.WriteStartObject();
            fields(item);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private void Number(string name, double? value)
    {
        json.WritePropertyName(name);
        if (Digits.ForMachines(value ?? double.NaN) is { } text)
        {
            json.WriteRawValue(text);
        }
        else
        {
            json.WriteNullValue();
        }
    }

    private void Residual(string name, double value) => Number(name, Digits.ResidualBound(value));

    // Cancelled sums leave noise in their last place.
    private static double Quiet(double value) => Math.Abs(value) < 1e-9 ? 0 : value;
}
