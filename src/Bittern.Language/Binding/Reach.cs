using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Model;

namespace Bittern.Language.Binding;

/// <summary>
/// Keeps what a recipe can contain: species whose whole basis is brought by a liquor, reagent, atmosphere or conversion (H+ and water always are).
/// A catalogue of hundreds of species then costs a small recipe nothing.
/// </summary>
internal static class Reach
{
    public static ChemicalSystem Restrict(
        ImmutableArray<Species> species,
        ImmutableArray<HalfReaction> halfReactions,
        ImmutableArray<ActivityParameter> parameters,
        ImmutableArray<Liquor> liquors,
        ImmutableArray<Reagent> reagents,
        ImmutableArray<Atmosphere> atmospheres,
        ImmutableArray<Train> trains
    )
    {
        var reached = new HashSet<string>(StringComparer.Ordinal) { "H+", "H2O" };
        foreach (
            var term in liquors
                .SelectMany(l => l.Entries)
                .Concat(reagents.SelectMany(r => r.Entries))
                .SelectMany(e => e.PerMole)
        )
        {
            reached.Add(term.Species.Text);
        }

        foreach (
            var term in trains
                .SelectMany(t => t.Stages)
                .SelectMany(s => s.Actions)
                .OfType<StageAction.Convert>()
                .SelectMany(c => c.Brings)
        )
        {
            reached.Add(term.Species.Text);
        }

        foreach (var pressure in atmospheres.SelectMany(a => a.Pressures))
        {
            foreach (
                var term in species
                    .Where(s => s.Kind == SpeciesKind.Gas && s.Formula.Equals(pressure.Gas))
                    .SelectMany(s => s.FromBasis)
            )
            {
                reached.Add(term.Species.Text);
            }
        }

        if (liquors.Any(l => l.Alkalinity is not null))
        {
            reached.Add("CO3^2-");
        }

        ImmutableArray<Species> kept =
        [
            .. species.Where(s => s.FromBasis.All(t => reached.Contains(t.Species.Text))),
        ];
        var dissolved = kept.Where(s => s.Kind is SpeciesKind.Basis or SpeciesKind.Complex)
            .Select(s => s.Formula.Text)
            .ToHashSet(StringComparer.Ordinal);
        return new ChemicalSystem
        {
            Basis = Of(kept, SpeciesKind.Basis),
            Complexes = Of(kept, SpeciesKind.Complex),
            Solids = Of(kept, SpeciesKind.Solid),
            Gases = Of(kept, SpeciesKind.Gas),
            ActivityParameters =
            [
                .. parameters.Where(p => p.Species.All(s => dissolved.Contains(s.Text))),
            ],
            HalfReactions =
            [
                .. halfReactions.Where(h =>
                    h.Written.Left.Concat(h.Written.Right)
                        .All(t =>
                            t.Species.IsElectron
                            || reached.Contains(t.Species.Text)
                            || kept.Any(k => k.Formula.Equals(t.Species))
                        )
                ),
            ],
        };
    }

    /// <summary>A train whose <c>form any</c> names only solids that are kept.</summary>
    public static Train Restrict(Train train, ChemicalSystem system)
    {
        var kept = system.Solids.Select(s => s.Name).ToHashSet(StringComparer.Ordinal);
        return train with
        {
            Stages =
            [
                .. train.Stages.Select(s =>
                    s.FormsAny
                        ? s with
                        {
                            Forming = [.. s.Forming.Where(f => kept.Contains(f.Name))],
                        }
                        : s
                ),
            ],
        };
    }

    private static ImmutableArray<Species> Of(ImmutableArray<Species> species, SpeciesKind kind) =>
        [.. species.Where(s => s.Kind == kind)];
}
