using Bittern.Calculation;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Machine;

/// <summary>The numbers behind each dose figure: one row a dose, one column a curve.</summary>
internal static class DoseCurveTables
{
    public static IEnumerable<CsvTable> Of(Outcome outcome) =>
        from train in outcome.Trains
        from stage in train.Stages
        from index in Enumerable.Range(0, stage.DoseCurves.Length)
        let table = Table(
            ReportFigures.NameOf(train, stage, index) + ".csv",
            stage.DoseCurves[index],
            outcome
        )
        where table is not null
        select table;

    private static CsvTable? Table(string name, DoseCurve curve, Outcome outcome)
    {
        if (curve.Points.IsEmpty)
        {
            return null;
        }

        var dissolved = curve
            .Points[0]
            .Dissolved.Select(
                (t, i) => (Label: DissolvedLabel.Of(t.Species, outcome.Recipe.Chemistry.Basis), i)
            )
            .Where(d => curve.Points.Any(p => p.Dissolved[d.i].Coefficient > 0))
            .ToArray();
        var solids = curve
            .Points.SelectMany(p => p.Formed)
            .Select(f => f.Solid.Name)
            .Distinct(StringComparer.Ordinal)
            .Order(StringComparer.Ordinal)
            .ToArray();
        string[] header =
        [
            curve.Reagent.IsDry ? "dose_kg_per_m3_entering" : "dose_m3_per_m3_entering",
            "ph",
            .. dissolved.Select(d => $"dissolved_{d.Label.Text}_mg_per_l"),
            .. solids.Select(s => $"formed_{s}_kg_per_m3_feed"),
        ];
        return CsvTables.Table(
            "dose-" + name,
            header,
            curve.Points.Select(p =>
                (object?[])
                    [
                        new CsvTables.Coarse(p.Dose),
                        new CsvTables.Coarse(p.PH),
                        .. dissolved.Select(d =>
                            (object)
                                new CsvTables.Coarse(
                                    p.Dissolved[d.i].Coefficient * d.Label.MolarMass
                                )
                        ),
                        .. solids.Select(s =>
                            (object)
                                new CsvTables.Coarse(
                                    p.Formed.Where(f =>
                                            string.Equals(f.Solid.Name, s, StringComparison.Ordinal)
                                        )
                                        .Sum(f => f.MassPerFeed)
                                )
                        ),
                    ]
            )
        );
    }
}
