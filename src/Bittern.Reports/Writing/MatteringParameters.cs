using System.Collections.Immutable;
using Bittern.Calculation;
using Bittern.Chemistry;
using Bittern.Model;

namespace Bittern.Reports.Writing;

/// <summary>Which parameters of the activity model an outcome rests on, and which ions had to do without.</summary>
internal static class MatteringParameters
{
    /// <summary>An ion is one of the medium from this share of the ionic strength on, in any state.</summary>
    private const double MediumShare = 1e-3;

    /// <summary>
    /// Parameters that the recipe's model uses, between species that matter, at least one of them part of the medium; in the order declared.
    /// </summary>
    public static ImmutableArray<ActivityParameter> Of(Outcome outcome)
    {
        var kinds = Kinds(outcome.Recipe.Header.ActivityModel);
        if (kinds.IsEmpty)
        {
            return [];
        }

        var matter = Species(outcome);
        var medium = Medium(outcome);
        var slopesMatter = Mattering.Temperatures(outcome).Any(t => Math.Abs(t - 25) > 0.05);
        return
        [
            .. outcome.Recipe.Chemistry.ActivityParameters.Where(p =>
                kinds.Contains(p.Kind)
                && (p.Kind != ActivityParameterKind.PitzerSlope || slopesMatter)
                && p.Species.All(s => matter.Contains(s.Text))
                && (p.Species.Length == 1 || p.Species.Any(s => medium.Contains(s.Text)))
            ),
        ];
    }

    /// <summary>Ions that matter and for which the model has no parameter of its own, in the order of the chemistry; none for models without parameters.</summary>
    public static ImmutableArray<string> IonsWithout(Outcome outcome)
    {
        var kinds = Kinds(outcome.Recipe.Header.ActivityModel);
        if (kinds.IsEmpty)
        {
            return [];
        }

        var known = outcome
            .Recipe.Chemistry.ActivityParameters.Where(p => kinds.Contains(p.Kind))
            .SelectMany(p => p.Species)
            .Select(s => s.Text)
            .ToHashSet(StringComparer.Ordinal);
        var matter = Species(outcome);
        return
        [
            .. outcome
                .Recipe.Chemistry.Basis.Concat(outcome.Recipe.Chemistry.Complexes)
                .Where(s =>
                    s.Formula.Charge != 0
                    && matter.Contains(s.Formula.Text)
                    && !known.Contains(s.Formula.Text)
                )
                .Select(s => s.Formula.Text),
        ];
    }

    private static ImmutableArray<ActivityParameterKind> Kinds(string model) =>
        model switch
        {
            ActivityModelNames.DebyeHuckel => [ActivityParameterKind.IonSize],
            ActivityModelNames.TruesdellJones => [ActivityParameterKind.TruesdellJones],
            ActivityModelNames.Sit => [ActivityParameterKind.Sit],
            ActivityModelNames.Pitzer =>
            [
                ActivityParameterKind.Pitzer,
                ActivityParameterKind.PitzerSlope,
                ActivityParameterKind.Theta,
                ActivityParameterKind.Psi,
                ActivityParameterKind.Lambda,
                ActivityParameterKind.Zeta,
            ],
            _ => [],
        };

    // Dissolved species that hold a noticeable share of a component or stand in a quotient that is shown.
    private static HashSet<string> Species(Outcome outcome)
    {
        var names = outcome
            .Trains.SelectMany(t => t.Stages)
            .SelectMany(s => s.Saturations)
            .SelectMany(s => s.Terms)
            .Select(t => t.Species)
            .ToHashSet(StringComparer.Ordinal);
        names.UnionWith(Mattering.DissolvedSpecies(outcome));
        return names;
    }

    private static HashSet<string> Medium(Outcome outcome) =>
        Mattering
            .States(outcome)
            .SelectMany(state =>
                state
                    .Species.Where(s =>
                        s.Species.Formula.Charge != 0
                        && s.Molality >= MediumShare * state.IonicStrength
                    )
                    .Select(s => s.Species.Formula.Text)
            )
            .ToHashSet(StringComparer.Ordinal);
}
