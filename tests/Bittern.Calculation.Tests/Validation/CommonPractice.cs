using System.Globalization;

namespace Bittern.Calculation.Tests.Validation;

/// <summary>Two facts of the trade that have no single source.</summary>
internal static class CommonPractice
{
    /// <summary>A fact beside what the tool finds.</summary>
    public sealed record Fact(string Statement, string Expected, string Found, bool Holds);

    /// <summary>Seawater's magnesium, mol/L.</summary>
    private const double SeawaterMagnesium = 0.0537;

    /// <summary>Manganese above about 0.1 mg/L stains laundry, mol/L.</summary>
    private const double StainingManganese = 1.8e-6;

    public static IReadOnlyList<Fact> All { get; } = [Brucite(), Manganese()];

    private static Fact Brucite()
    {
        // Magnesium chloride alone: sulfate and carbonate would complex part of the magnesium, and the rest of the salt would leave the Davies range.
        var outcome = Recipes.Run(
            Recipes.Titration(
                "",
                string.Create(CultureInfo.InvariantCulture, $"MgCl2 {SeawaterMagnesium} mol/L"),
                "SI(brucite) >= 0"
            )
        );
        var hydroxide = Readings.SpeciesMolality(outcome, "OH-");
        return new Fact(
            "Seawater carries about 0.0537 mol/L magnesium: in a liquor with that magnesium, brucite saturates long before free hydroxide reaches 0.001 mol/L",
            "free OH- at saturation below 0.0001 mol/kg",
            string.Create(
                CultureInfo.InvariantCulture,
                $"{hydroxide:0.0e0} mol/kg at pH {Readings.PH(outcome):0.00}"
            ),
            hydroxide < 1e-4
        );
    }

    private static Fact Manganese()
    {
        var outcome = Recipes.Run(
            Recipes.Titration(
                "manganese-hydroxide",
                "Mn(NO3)2 12 mg/L",
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"dissolved(Mn) <= {StainingManganese} mol/L"
                )
            )
        );
        var solid = outcome.Recipe.Chemistry.Solids.Single(s => s.Name is "manganese-hydroxide");

        // Mn(OH)2 + 2 H+ = Mn^2+ + 2 H2O. By hand: activity coefficients and water activity 1; all manganese is Mn^2+ and its hydroxide complexes.
        var complexes = outcome
            .Recipe.Chemistry.Complexes.Where(c =>
                c.FromBasis.All(t => t.Species.Text is "Mn^2+" or "H+" or "H2O")
                && c.Formula.AtomsOf("Mn") == 1
            )
            .Select(c =>
                (
                    Log10K: c.Log10FormationAt(25),
                    Hydroxides: -c
                        .FromBasis.Where(t => t.Species.IsHydrogenIon)
                        .Sum(t => t.Coefficient)
                )
            )
            .ToList();
        var free = (-solid.Log10FormationAt(25) - Math.Log10(StainingManganese)) / 2;
        var (low, high) = (free, free + 1);
        while (high - low > 1e-6)
        {
            var middle = (low + high) / 2;
            (low, high) = Total(middle) > StainingManganese ? (middle, high) : (low, middle);
        }

        var pH = Readings.PH(outcome);
        return new Fact(
            "Manganese above about 1.8e-6 mol/L (0.1 mg/L) stains laundry: the pH that manganese hydroxide alone needs to get there, without oxidation or carbonate",
            string.Create(
                CultureInfo.InvariantCulture,
                $"pH {low:0.00} within 0.1, by hand from the catalogue's constants at activity coefficients of 1 ({free:0.00} without hydroxide complexes)"
            ),
            string.Create(CultureInfo.InvariantCulture, $"pH {pH:0.00}"),
            Math.Abs(pH - low) <= 0.1
        );

        double Total(double at) =>
            Math.Pow(10, -solid.Log10FormationAt(25) - (2 * at))
            * (1 + complexes.Sum(c => Math.Pow(10, c.Log10K + (c.Hydroxides * at))));
    }
}
