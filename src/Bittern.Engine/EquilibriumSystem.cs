using System.Collections.Immutable;
using Bittern.Engine.Activity;

namespace Bittern.Engine;

/// <summary>
/// A chemical system compiled for repeated solving: stoichiometry as flat arrays. Immutable and safe to share between threads;
/// each thread solves with its own <see cref="Solver"/>.
/// </summary>
public sealed class EquilibriumSystem
{
    private EquilibriumSystem(
        ImmutableArray<Component> components,
        ImmutableArray<Formation> complexes,
        ImmutableArray<Formation> solids,
        ImmutableArray<Formation> gases,
        IActivityModel activityModel
    )
    {
        Components = components;
        Complexes = complexes;
        Solids = solids;
        Gases = gases;
        ActivityModel = activityModel;
        Species =
        [
            .. components
                .Select((c, i) => (Component: c, Index: i))
                .Where(c => c.Component.IsDissolved)
                .Select(c => new Formation(
                    c.Component.Name,
                    c.Component.Charge,
                    Unit(components.Length, c.Index),
                    0,
                    static _ => 0
                )),
            .. complexes,
        ];
        SpeciesCharges = [.. Species.Select(s => s.Charge)];
    }

    /// <summary>Components in the order of every vector of totals.</summary>
    public ImmutableArray<Component> Components { get; }

    /// <summary>Dissolved species beyond the components, as given.</summary>
    public ImmutableArray<Formation> Complexes { get; }

    /// <summary>All dissolved species: the dissolved components first, then the complexes.</summary>
    public ImmutableArray<Formation> Species { get; }

    /// <summary>Charge number of every entry of <see cref="Species"/>.</summary>
    public ImmutableArray<int> SpeciesCharges { get; }

    /// <summary>Solids in the order of every vector of solid amounts.</summary>
    public ImmutableArray<Formation> Solids { get; }

    /// <summary>Gases whose fugacity may be fixed.</summary>
    public ImmutableArray<Formation> Gases { get; }

    /// <summary>The activity model that every solve uses.</summary>
    public IActivityModel ActivityModel { get; }

    /// <summary>Compiles a system. Names must be unique and coefficient vectors as long as the components.</summary>
    /// <exception cref="ArgumentException">A vector has the wrong length, or a name stands twice.</exception>
    public static EquilibriumSystem Compile(
        IEnumerable<Component> components,
        IEnumerable<Formation> complexes,
        IEnumerable<Formation> solids,
        IEnumerable<Formation> gases,
        IActivityModel activityModel
    )
    {
        var system = new EquilibriumSystem(
            [.. components],
            [.. complexes],
            [.. solids],
            [.. gases],
            activityModel
        );
        foreach (var formation in system.Complexes.Concat(system.Solids).Concat(system.Gases))
        {
            if (formation.Coefficients.Length != system.Components.Length)
            {
                throw new ArgumentException(
                    $"'{formation.Name}' has {formation.Coefficients.Length} coefficients over {system.Components.Length} components",
                    nameof(complexes)
                );
            }
        }

        Unique(system.Species, "species");
        Unique(system.Solids, "solid");
        Unique(system.Gases, "gas");
        return system;
    }

    /// <summary>Index of a component by name; -1 when there is none.</summary>
    public int ComponentIndex(string name) => IndexOf(Components, c => c.Name, name);

    /// <summary>Index of a dissolved species by name; -1 when there is none.</summary>
    public int SpeciesIndex(string name) => IndexOf(Species, s => s.Name, name);

    /// <summary>Index of a solid by name; -1 when there is none.</summary>
    public int SolidIndex(string name) => IndexOf(Solids, s => s.Name, name);

    /// <summary>Index of a gas by name; -1 when there is none.</summary>
    public int GasIndex(string name) => IndexOf(Gases, s => s.Name, name);

    private static int IndexOf<T>(ImmutableArray<T> items, Func<T, string> nameOf, string name)
    {
        for (var i = 0; i < items.Length; i++)
        {
            if (string.Equals(nameOf(items[i]), name, StringComparison.Ordinal))
            {
                return i;
            }
        }

        return -1;
    }

    private static void Unique(ImmutableArray<Formation> formations, string kind)
    {
        var twice = formations
            .GroupBy(f => f.Name, StringComparer.Ordinal)
            .FirstOrDefault(g => g.Skip(1).Any());
        if (twice is not null)
        {
            throw new ArgumentException(
                $"the {kind} '{twice.Key}' stands twice",
                nameof(formations)
            );
        }
    }

    private static ImmutableArray<double> Unit(int length, int index)
    {
        var unit = new double[length];
        unit[index] = 1;
        return [.. unit];
    }
}
