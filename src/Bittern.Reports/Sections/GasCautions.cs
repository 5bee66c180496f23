using Bittern.Calculation;
using Bittern.Chemistry;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>
/// Compares the pressure of toxic gases at equilibrium with each liquor with published exposure limits, where the recipe's chemistry knows the gas.
/// </summary>
internal static class GasCautions
{
    /// <summary>
    /// Immediately dangerous concentrations (IDLH) and recommended limits, ppm by volume: NIOSH Pocket Guide to Chemical Hazards, recalled without sight of it;
    /// the lower number of the ceiling, short-term or time-weighted limit is the one to stay below.
    /// </summary>
    private static readonly (
        string Gas,
        string Name,
        double Recommended,
        double Dangerous
    )[] Limits =
    [
        ("H2S(g)", "hydrogen sulfide", 10, 100),
        ("HCN(g)", "hydrogen cyanide", 4.7, 50),
        ("NH3(g)", "ammonia", 25, 300),
        ("SO2(g)", "sulfur dioxide", 2, 100),
        ("HF(g)", "hydrogen fluoride", 3, 30),
        ("CO2(g)", "carbon dioxide", 5000, 40000),
    ];

    public static IEnumerable<Caution> Of(Outcome outcome)
    {
        foreach (var (gas, name, recommended, dangerous) in Limits)
        {
            var species = outcome.Recipe.Chemistry.Gases.FirstOrDefault(g =>
                string.Equals(g.Formula.Text, gas, StringComparison.Ordinal)
            );
            if (species is null)
            {
                continue;
            }

            var worst = Places(outcome)
                .Select(p => (p.Name, Ppm: Pressure(species, p.State) * 1e6))
                .Where(p => double.IsFinite(p.Ppm))
                .OrderByDescending(p => p.Ppm)
                .FirstOrDefault();
            if (worst.Name is null || worst.Ppm <= recommended)
            {
                continue;
            }

            var level =
                worst.Ppm > dangerous
                    ? "immediately dangerous to life (above " + Digits.AsTyped(dangerous) + " ppm)"
                    : "above the recommended limit at work of "
                        + Digits.AsTyped(recommended)
                        + " ppm";
            yield return new Caution(
                $"Air at equilibrium with {worst.Name} would hold {Digits.Significant(worst.Ppm, 2)} ppm of {name}.",
                $"That is {level}; NIOSH Pocket Guide to Chemical Hazards, recalled. Closed tanks and sumps come near this: ventilate, measure the air before anyone enters, and keep entry rules for confined spaces."
            );
        }
    }

    private static IEnumerable<(string Name, SolvedState State)> Places(Outcome outcome)
    {
        foreach (var liquor in outcome.Liquors)
        {
            if (liquor.State is { } state)
            {
                yield return ("liquor '" + MarkdownText.Escape(liquor.Liquor.Name) + "'", state);
            }
        }

        foreach (var stage in outcome.Trains.SelectMany(t => t.Stages))
        {
            yield return (
                "the liquor of stage '" + MarkdownText.Escape(stage.Stage.Name) + "'",
                stage.End
            );
        }
    }

    // log10 f = log10 K of formation + Σ ν log10 a(basis); NaN when a component is not there.
    private static double Pressure(Species gas, SolvedState state)
    {
        var log10 = gas.Log10FormationAt(state.TemperatureCelsius);
        foreach (var term in gas.FromBasis)
        {
            var activity = term.Species.IsWater
                ? state.WaterActivity
                : state
                    .Species.Where(s => s.Species.Formula.Equals(term.Species))
                    .Select(s => s.Activity)
                    .FirstOrDefault();
            if (activity <= 0)
            {
                return double.NaN;
            }

            log10 += term.Coefficient * Math.Log10(activity);
        }

        return Math.Pow(10, log10);
    }
}
