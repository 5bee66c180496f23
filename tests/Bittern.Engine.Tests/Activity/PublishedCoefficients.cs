using Bittern.Engine.Activity;
using Bittern.Reference;

namespace Bittern.Engine.Tests.Activity;

/// <summary>One published number and what a model says.</summary>
internal sealed record Point(double Molality, double Published, double Found)
{
    /// <summary>Found against published, relative.</summary>
    public double Deviation => (Found / Published) - 1;
}

/// <summary>The points of one salt in one published table with one model, inside the range in which the model is held to its tolerance.</summary>
internal sealed record Series(
    string Model,
    string Quantity,
    string Salt,
    string Table,
    double Tolerance,
    IReadOnlyList<Point> Points
)
{
    public Point Worst => Points.MaxBy(p => Math.Abs(p.Deviation))!;

    public bool Holds => Math.Abs(Worst.Deviation) <= Tolerance;

    public string Key => $"{Model}, {Quantity}, {Salt}, {Table}";
}

/// <summary>
/// The tables of mean activity and osmotic coefficients against every model. Pitzer's equations are held to 2 % up to each salt's fitted range, the models
/// of the Davies type to 1 % up to an ionic strength of 0.1 mol/kg. Where the table itself says that its absolute scale was assigned at 0.1 mol/kg, ratios to
/// that value are compared.
/// </summary>
internal static class PublishedCoefficients
{
    public const double PitzerTolerance = 0.02;

    public const double DiluteTolerance = 0.01;

    private const double DiluteLimit = 0.1;

    public static readonly IReadOnlyList<Series> All = [.. Build()];

    private static IEnumerable<Series> Build()
    {
        foreach (
            var model in new[] { "davies", "debye-hückel", "truesdell-jones", "sit", "pitzer" }
        )
        {
            foreach (
                var (file, quantity, column) in new[]
                {
                    ("mean-activity-coefficients.csv", "γ±", "gamma_pm"),
                    ("osmotic-coefficients.csv", "φ", "phi"),
                }
            )
            {
                foreach (
                    var rows in ReferenceTable
                        .Rows("activity/" + file)
                        .GroupBy(r => (Salt: r["salt"], Set: r["set"]))
                        .OrderBy(g => g.Key.Salt, StringComparer.Ordinal)
                )
                {
                    if (Of(model, quantity, column, [.. rows]) is { } series)
                    {
                        yield return series;
                    }
                }
            }
        }
    }

    private static Series? Of(
        string model,
        string quantity,
        string column,
        IReadOnlyList<IReadOnlyDictionary<string, string>> rows
    )
    {
        var (cation, anion, salt) = (rows[0]["cation"], rows[0]["anion"], rows[0]["salt"]);
        var (cations, anions) = Formula(cation, anion);
        var limit = Limit(model, cation, anion);
        if (limit == 0)
        {
            return null;
        }

        Func<double, (double Gamma, double Osmotic)> evaluate;
        if (salt is "H2SO4")
        {
            if (model is not "pitzer")
            {
                return null;
            }

            evaluate = SulfuricAcid;
        }
        else
        {
            var liquor = new Liquor(ModelOf(model), 298.15, cation, anion);
            evaluate = m =>
            {
                var at = liquor.At(cations * m, anions * m);
                return (
                    Math.Exp(
                        ((cations * at.LnGamma[0]) + (anions * at.LnGamma[1])) / (cations + anions)
                    ),
                    at.Osmotic
                );
            };
        }

        double Found(double m) => quantity is "φ" ? evaluate(m).Osmotic : evaluate(m).Gamma;

        // Where the publication assigned the value at 0.1 mol/kg, everything is relative to it.
        var scale = rows.FirstOrDefault(r =>
            quantity is "γ±"
            && (
                r["note"].Contains("ratios", StringComparison.Ordinal)
                || r["note"].Contains("scale at 0.1 m", StringComparison.Ordinal)
            )
            && r["molality"] is "0.1"
        );
        var factor = scale is null ? 1 : ParameterTables.Number(scale[column]) / Found(0.1);
        List<Point> points =
        [
            .. rows.Select(r =>
                    (
                        Molality: ParameterTables.Number(r["molality"]),
                        Published: ParameterTables.Number(r[column])
                    )
                )
                .Where(r => r.Molality <= limit + 1e-9)
                .OrderBy(r => r.Molality)
                .Select(r => new Point(r.Molality, r.Published, factor * Found(r.Molality))),
        ];
        return points.Count == 0
            ? null
            : new Series(
                model,
                scale is null ? quantity : "γ±/γ±(0.1)",
                salt,
                rows[0]["set"],
                model is "pitzer" ? PitzerTolerance : DiluteTolerance,
                points
            );
    }

    private static IActivityModel ModelOf(string name) =>
        name is "pitzer" ? new Pitzer(ParameterTables.SingleSalts) : Models.All[name];

    /// <summary>Largest molality to compare; 0 when the model has no parameters for the salt.</summary>
    private static double Limit(string model, string cation, string anion)
    {
        if (model is "pitzer")
        {
            return cation is "H+" && anion is "SO4^2-"
                ? 6
                : ParameterTables
                    .SingleSalts.Pairs.Where(p =>
                        string.Equals(p.Cation, cation, StringComparison.Ordinal)
                        && string.Equals(p.Anion, anion, StringComparison.Ordinal)
                    )
                    .Select(p => p.MaxMolality ?? 6)
                    .FirstOrDefault();
        }

        var system = new Liquor(Models.All[model], 298.15, cation, anion).System;
        var (zc, za) = (Liquor.Charge(cation), -Liquor.Charge(anion));
        var (cations, anions) = Formula(cation, anion);
        return Models.All[model].MissingFor(system).IsEmpty
            ? DiluteLimit * 2 / ((cations * zc * zc) + (anions * za * za))
            : 0;
    }

    private static (int Cations, int Anions) Formula(string cation, string anion)
    {
        var (zc, za) = (Liquor.Charge(cation), -Liquor.Charge(anion));
        var common = (int)System.Numerics.BigInteger.GreatestCommonDivisor(zc, za);
        return (za / common, zc / common);
    }

    /// <summary>Stoichiometric coefficients of 2 H+ + SO4^2- through HSO4-, with the bisulfate constant of the 1984 set.</summary>
    private static (double Gamma, double Osmotic) SulfuricAcid(double molality)
    {
        var system = new SystemBuilder()
            .Component("H+", 1)
            .Component("SO4^2-", -2)
            .Complex("HSO4-", -1, 1.979, ("H+", 1), ("SO4^2-", 1))
            .Build(new Pitzer(ParameterTables.Hmw84));
        var problem = new Problem(system);
        problem.Totals[0] = 2 * molality;
        problem.Totals[1] = molality;
        var answer = Solved.Certified(problem);
        var activity = (2 * answer.LnActivities[0]) + answer.LnActivities[1];
        return (
            Math.Exp((activity - Math.Log(4 * molality * molality * molality)) / 3),
            -answer.LnWaterActivity / (Chemistry.PhysicalConstants.WaterMolarMass * 3 * molality)
        );
    }
}
