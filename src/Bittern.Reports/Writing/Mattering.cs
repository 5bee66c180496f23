using System.Collections.Immutable;
using Bittern.Calculation;
using Bittern.Model;

namespace Bittern.Reports.Writing;

/// <summary>Which constants an outcome rests on.</summary>
internal static class Mattering
{
    /// <summary>A complex matters from this share of any component it is made of, in any state.</summary>
    private const double Share = 0.01;

    /// <summary>
    /// Species whose own constant entered a number of this report, in the order of the chemistry: complexes that hold at least 1 % of a component
    /// somewhere, the ion product of water, solids that formed, could form or were held back, gases that were exchanged, and whatever their reactions were written over.
    /// </summary>
    public static ImmutableArray<Species> Of(Outcome outcome)
    {
        var names = DissolvedSpecies(outcome);
        foreach (var stage in outcome.Trains.SelectMany(t => t.Stages))
        {
            names.UnionWith(
                stage.Saturations.Where(s => !IsKeptFromForming(s)).Select(s => s.Solid.Name)
            );
            names.UnionWith(stage.GasExchanges.Select(g => g.Gas.Name));
        }

        foreach (var limit in outcome.Recipe.LimitSets.SelectMany(s => s.Limits))
        {
            if (limit.Condition.Quantity is Quantity.SaturationIndex judged)
            {
                names.Add(judged.Solid.Name);
            }
        }

        if (outcome.Liquors.Any(l => l.State is not null))
        {
            names.Add("OH-");
        }

        var chemistry = outcome.Recipe.Chemistry;
        names.UnionWith(
            chemistry
                .All.Where(s => names.Contains(s.Name))
                .SelectMany(s => s.FormationConstants.Select(f => f.SpeciesName))
                .ToArray()
        );
        return [.. chemistry.All.Where(s => s.Constant is not null && names.Contains(s.Name))];
    }

    /// <summary>Names of dissolved species that hold a noticeable share of a component in some state.</summary>
    public static HashSet<string> DissolvedSpecies(Outcome outcome)
    {
        var names = new HashSet<string>(StringComparer.Ordinal);
        foreach (var state in States(outcome))
        {
            foreach (var total in state.DissolvedTotals)
            {
                names.UnionWith(
                    Speciation
                        .Shares(state, total.Species)
                        .Where(p => p.Share >= Share)
                        .Select(p => p.Species)
                );
            }
        }

        return names;
    }

    /// <summary>Solids that were supersaturated and not allowed to form, in the order of the chemistry, those of <see cref="Of"/> left out.</summary>
    public static ImmutableArray<Species> KeptFromForming(Outcome outcome)
    {
        var others = Of(outcome).Select(s => s.Name).ToHashSet(StringComparer.Ordinal);
        var names = outcome
            .Trains.SelectMany(t => t.Stages)
            .SelectMany(s => s.Saturations)
            .Where(s => IsKeptFromForming(s) && s.Index > 0)
            .Select(s => s.Solid.Name)
            .ToHashSet(StringComparer.Ordinal);
        return
        [
            .. outcome.Recipe.Chemistry.Solids.Where(s =>
                s.Constant is not null && names.Contains(s.Name) && !others.Contains(s.Name)
            ),
        ];
    }

    /// <summary>A saturation index above this is real, below it the noise of the certificate's tolerance.</summary>
    private const double Supersaturated = 1e-6;

    /// <summary>
    /// True for a solid that the stage does not list or holds back, and for one that came in as suspended matter and may not grow there.
    /// </summary>
    public static bool IsKeptFromForming(SaturationResult saturation) =>
        saturation.Role is SaturationRole.NotListed or SaturationRole.HeldBack
        || IsSuspendedOnly(saturation);

    /// <summary>In suspension without being listed: it may redissolve but not grow, so that Ω can exceed 1.</summary>
    public static bool IsSuspendedOnly(SaturationResult saturation) =>
        saturation is { Role: SaturationRole.Present, Index: > Supersaturated };

    /// <summary>True for a solid that the stage does not list although it is supersaturated and nothing says that it is slow: an oversight, likely.</summary>
    public static bool IsUnexplained(SaturationResult saturation) =>
        saturation
            is { Role: SaturationRole.NotListed, HeldBackBecause: null, Index: > Supersaturated }
        || IsSuspendedOnly(saturation);

    /// <summary>Where a recipe lets any solid form, those further from saturation than this are only listed.</summary>
    private const double NearSaturation = -1;

    /// <summary>True when Q against Ksp is worth writing out: what formed or may form, and what is supersaturated by the recipe's own choice.</summary>
    public static bool IsWrittenOut(SaturationResult saturation, Stage stage) =>
        saturation.Role switch
        {
            SaturationRole.Present => true,
            SaturationRole.Allowed => !stage.FormsAny || saturation.Index > NearSaturation,
            SaturationRole.HeldBack => saturation.Index > Supersaturated,
            _ => IsUnexplained(saturation),
        };

    /// <summary>Every solved state of an outcome.</summary>
    public static IEnumerable<SolvedState> States(Outcome outcome) =>
        outcome
            .Liquors.Select(l => l.State)
            .Concat(
                outcome.Trains.SelectMany(t =>
                    t.Stages.SelectMany(s => new[] { s.End, s.Outflow }).Prepend(t.Feed)
                )
            )
            .OfType<SolvedState>();

    /// <summary>Temperatures at which states were solved, °C, ascending; the recipe's own when there are none.</summary>
    public static ImmutableArray<double> Temperatures(Outcome outcome)
    {
        var found = States(outcome)
            .Select(s => Math.Round(s.TemperatureCelsius, 1))
            .Distinct()
            .Order()
            .ToImmutableArray();
        return found.IsEmpty ? [outcome.Recipe.Header.TemperatureCelsius] : found;
    }
}
