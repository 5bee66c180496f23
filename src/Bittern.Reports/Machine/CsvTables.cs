using System.Collections.Immutable;
using System.Text;
using Bittern.Calculation;
using Bittern.Reports.Machine;
using Bittern.Reports.Writing;

namespace Bittern.Reports;

/// <summary>One table as comma-separated text.</summary>
/// <param name="Name">File name, e.g. <c>dissolved.csv</c>.</param>
/// <param name="Text">UTF-8 text by RFC 4180 with line feeds; the first line names the columns and their units.</param>
public sealed record CsvTable(string Name, string Text);

/// <summary>The report's tables for spreadsheets and scripts. Numbers have six significant digits; what is not known is empty.</summary>
public static class CsvTables
{
    /// <summary>All tables that have rows, in a fixed order. Pure.</summary>
    public static ImmutableArray<CsvTable> Render(Outcome outcome)
    {
        CsvTable?[] tables =
        [
            Limits(outcome),
            Doses(outcome),
            Sludges(outcome),
            Solids(outcome),
            Dissolved(outcome),
            SpeciesTable(outcome),
            Saturations(outcome),
            Onsets(outcome),
            Constants(outcome),
        ];
        return [.. tables.OfType<CsvTable>(), .. DoseCurveTables.Of(outcome)];
    }

    private static CsvTable? Limits(Outcome outcome) =>
        Table(
            "limits.csv",
            [
                "set",
                "train",
                "quantity",
                "comparison",
                "bound",
                "upper_bound",
                "found",
                "unit",
                "verdict",
            ],
            outcome.LimitSets.SelectMany(s =>
                s.Results.Select(r =>
                {
                    var c = r.Limit.Condition;
                    return new object?[]
                    {
                        s.Set.Name,
                        s.Set.Train.Name,
                        c.Quantity.Name,
                        Words.Of(c.Comparison),
                        c.Value / c.DisplayFactor,
                        c.Upper / c.DisplayFactor,
                        r.Value / c.DisplayFactor,
                        c.DisplayUnit,
                        Words.Of(r.Verdict),
                    };
                })
            )
        );

    private static CsvTable? Doses(Outcome outcome) =>
        Table(
            "doses.csv",
            [
                "train",
                "stage",
                "reagent",
                "asked",
                "product_m3_per_m3_entering",
                "product_kg_per_m3_feed",
                "dry_kg_per_m3_feed",
                "active_kg_per_m3_feed",
                "cost_per_m3_feed",
                "currency",
            ],
            Stages(outcome)
                .SelectMany(p =>
                    p.Stage.Doses.Select(d =>
                        new object?[]
                        {
                            p.Train,
                            p.Stage.Stage.Name,
                            d.Reagent.Name,
                            DoseText.AskedPlain(d.Action),
                            d.Reagent.IsDry ? null : d.VolumePerStageVolume,
                            d.ProductPerFeed,
                            d.DryPerFeed,
                            d.ActivePerFeed,
                            d.CostPerFeed,
                            d.Reagent.Price?.Currency,
                        }
                    )
                )
        );

    private static CsvTable? Sludges(Outcome outcome) =>
        Table(
            "sludges.csv",
            [
                "train",
                "stage",
                "sludge",
                "dry_kg_per_m3_feed",
                "inert_kg_per_m3_feed",
                "liquor_kg_per_m3_feed",
            ],
            outcome.Trains.SelectMany(t =>
                t.Sludges.Select(s =>
                    new object?[]
                    {
                        t.Train.Name,
                        s.Stage,
                        s.Name,
                        s.DryMassPerFeed,
                        s.InertPerFeed,
                        s.LiquorPerFeed,
                    }
                )
            )
        );

    private static CsvTable? Solids(Outcome outcome) =>
        Table(
            "solids.csv",
            [
                "train",
                "stage",
                "solid",
                "formula",
                "formed_mol_per_m3_feed",
                "formed_kg_per_m3_feed",
            ],
            Stages(outcome)
                .SelectMany(p =>
                    p.Stage.Formed.Select(f =>
                        new object?[]
                        {
                            p.Train,
                            p.Stage.Stage.Name,
                            f.Solid.Name,
                            f.Solid.Formula.Text,
                            f.MolesPerFeed,
                            f.MassPerFeed,
                        }
                    )
                )
        );

    private static CsvTable? Dissolved(Outcome outcome) =>
        Table(
            "dissolved.csv",
            ["place", "name", "basis_species", "mg_per_l", "mmol_per_l"],
            Places(outcome)
                .SelectMany(p =>
                    p.State.DissolvedTotals.Select(t =>
                    {
                        var label = DissolvedLabel.Of(t.Species, outcome.Recipe.Chemistry.Basis);
                        var moles = t.Coefficient / p.State.Volume;
                        return new object?[]
                        {
                            p.Name,
                            label.Text,
                            t.Species.Text,
                            moles * label.MolarMass,
                            moles,
                        };
                    })
                )
        );

    private static CsvTable? SpeciesTable(Outcome outcome) =>
        Table(
            "species.csv",
            ["place", "species", "mol_per_kg", "activity_coefficient", "activity"],
            Places(outcome)
                .SelectMany(p =>
                    p.State.Species.Where(s => s.Molality > 0)
                        .Select(s =>
                            new object?[]
                            {
                                p.Name,
                                s.Species.Name,
                                s.Molality,
                                s.ActivityCoefficient,
                                s.Activity,
                            }
                        )
                )
        );

    private static CsvTable? Saturations(Outcome outcome) =>
        Table(
            "saturations.csv",
            ["train", "stage", "solid", "role", "log10_q", "log10_k", "saturation_index"],
            Stages(outcome)
                .SelectMany(p =>
                    p.Stage.Saturations.Select(s =>
                        new object?[]
                        {
                            p.Train,
                            p.Stage.Stage.Name,
                            s.Solid.Name,
                            Words.Of(s.Role),
                            s.Log10Q,
                            s.Log10K,
                            Math.Abs(s.Index) < 1e-6 ? 0.0 : s.Index,
                        }
                    )
                )
        );

    private static CsvTable? Onsets(Outcome outcome) =>
        Table(
            "onsets.csv",
            ["train", "stage", "solid", "reagent", "dose_per_m3_entering", "dose_unit", "ph"],
            Stages(outcome)
                .SelectMany(p =>
                    p.Stage.Onsets.Select(o =>
                        new object?[]
                        {
                            p.Train,
                            p.Stage.Stage.Name,
                            o.Solid.Name,
                            o.Reagent.Name,
                            o.DosePerStageVolume,
                            o.Reagent.IsDry ? "kg" : "m3",
                            o.PH,
                        }
                    )
                )
        );

    private static CsvTable? Constants(Outcome outcome) =>
        Table(
            "constants.csv",
            [
                "name",
                "reaction",
                "celsius",
                "log10_k",
                "uncertainty_log10",
                "in_range",
                "source",
                "recalled",
            ],
            Mattering
                .Of(outcome)
                .SelectMany(s =>
                    Mattering
                        .Temperatures(outcome)
                        .Select(t =>
                            new object?[]
                            {
                                s.Name,
                                s.Written?.ToString(),
                                t,
                                s.Constant!.Log10AtCelsius(t),
                                s.Constant.UncertaintyLog10,
                                s.Constant.Covers(t),
                                s.Constant.Source?.Text,
                                s.Constant.Recalled,
                            }
                        )
                )
        );

    private static IEnumerable<(string Train, StageResult Stage)> Stages(Outcome outcome) =>
        outcome.Trains.SelectMany(t => t.Stages.Select(s => (t.Train.Name, s)));

    private static IEnumerable<(string Name, SolvedState State)> Places(Outcome outcome) =>
        outcome
            .Liquors.Where(l => l.State is not null)
            .Select(l => ("liquor " + l.Liquor.Name, l.State!))
            .Concat(
                Stages(outcome).Select(p => (p.Train + "/" + p.Stage.Stage.Name, p.Stage.Outflow))
            );

    /// <summary>A table of texts, numbers and flags; null without rows.</summary>
    internal static CsvTable? Table(string name, string[] header, IEnumerable<object?[]> rows)
    {
        var text = new StringBuilder();
        text.AppendJoin(',', header).Append('\n');
        var any = false;
        foreach (var row in rows)
        {
            any = true;
            text.AppendJoin(',', row.Select(Cell)).Append('\n');
        }

        return any ? new CsvTable(name, text.ToString()) : null;
    }

    private static string Cell(object? value) =>
        value switch
        {
            null => "",
            double number => Digits.ForMachines(number) ?? "",
            Coarse coarse => Digits.ForMachines(coarse.Value, 4) ?? "",
            bool flag => flag ? "true" : "false",
            _ => Quoted((string)value),
        };

    // A text that starts like a formula would be run by a spreadsheet: a leading apostrophe keeps it text.
    private static string Quoted(string text)
    {
        var safe =
            text.Length > 0 && text[0] is '=' or '+' or '-' or '@' or '\t' or '\r'
                ? "'" + text
                : text;
        return safe.AsSpan().ContainsAny(",\"\n\r")
            ? "\"" + safe.Replace("\"", "\"\"", StringComparison.Ordinal) + "\""
            : safe;
    }

    /// <summary>A number that needs no more than four digits.</summary>
    internal readonly record struct Coarse(double Value);
}
