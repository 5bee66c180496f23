using Bittern.Engine.Activity;
using Bittern.Reference;

namespace Bittern.Engine.Tests.Activity;

/// <summary>The whole system of Harvie, Møller and Weare 1984 at 25 °C: 15 dissolved species, 42 solids, their Pitzer parameters.</summary>
internal static class Brine1984
{
    private static readonly Dictionary<string, (string Of, double Coefficient)[]> Composed = new(
        StringComparer.Ordinal
    )
    {
        ["OH-"] = [("H2O", 1), ("H+", -1)],
        ["HSO4-"] = [("SO4^2-", 1), ("H+", 1)],
        ["HCO3-"] = [("CO3^2-", 1), ("H+", 1)],
        ["CO2(aq)"] = [("CO3^2-", 1), ("H+", 2), ("H2O", -1)],
        ["MgOH+"] = [("Mg^2+", 1), ("H2O", 1), ("H+", -1)],
        ["CaCO3(aq)"] = [("Ca^2+", 1), ("CO3^2-", 1)],
        ["MgCO3(aq)"] = [("Mg^2+", 1), ("CO3^2-", 1)],
    };

    private static readonly Dictionary<string, double> Potentials = ReferenceTable
        .Rows("activity/hmw-solids.csv")
        .ToDictionary(
            r => r["name"],
            r => ParameterTables.Number(r["mu0_over_RT"]),
            StringComparer.Ordinal
        );

    public static readonly string[] Basis =
    [
        "H+",
        "Na+",
        "K+",
        "Mg^2+",
        "Ca^2+",
        "Cl-",
        "SO4^2-",
        "CO3^2-",
    ];

    public static readonly EquilibriumSystem System = Build(new Pitzer(ParameterTables.Hmw84));

    public static EquilibriumSystem Build(IActivityModel model)
    {
        var builder = new SystemBuilder();
        foreach (var name in Basis)
        {
            builder.Component(name, Liquor.Charge(name));
        }

        foreach (var (name, from) in Composed)
        {
            builder.Complex(name, Liquor.Charge(name), Log10K(name, from), from);
        }

        foreach (
            var row in ReferenceTable
                .Rows("activity/hmw-solids.csv")
                .Where(r => r["kind"] is "solid")
        )
        {
            var from = row["dissolution_products"].Split(" + ").SelectMany(Term).ToArray();
            builder.Solid(row["name"], Log10K(row["name"], from), from);
        }

        return builder.Build(model);
    }

    // Formation from the basis: ln K = Σ ν μ°/RT of what it is formed from - μ°/RT of the thing itself.
    private static double Log10K(string name, (string Of, double Coefficient)[] from) =>
        (from.Sum(t => t.Coefficient * Potentials[t.Of]) - Potentials[name]) / Math.Log(10);

    private static IEnumerable<(string Of, double Coefficient)> Term(string text)
    {
        var parts = text.Split(' ');
        var (coefficient, species) =
            parts.Length == 1 ? (1, parts[0]) : (ParameterTables.Number(parts[0]), parts[1]);
        return Composed.TryGetValue(species, out var from)
            ? from.Select(t => (t.Of, coefficient * t.Coefficient))
            : [(species, coefficient)];
    }
}
