using System.Collections.Immutable;

namespace Bittern.Engine.Activity;

/// <summary>A cation and an anion of a system, by name.</summary>
public sealed record IonPair(string Cation, string Anion)
{
    /// <summary>Pairs of a system for which <paramref name="isKnown"/> answers no, in the system's order.</summary>
    internal static ImmutableArray<IonPair> Unknown(
        EquilibriumSystem system,
        Func<string, string, bool> isKnown
    ) =>
        [
            .. from cation in system.Species
            where cation.Charge > 0
            from anion in system.Species
            where anion.Charge < 0 && !isKnown(cation.Name, anion.Name)
            select new IonPair(cation.Name, anion.Name),
        ];

    /// <summary>Charged species that are known with no ion of opposite charge of the system.</summary>
    internal static ImmutableArray<string> Strangers(
        EquilibriumSystem system,
        Func<string, string, bool> isKnown
    ) =>
        [
            .. system
                .Species.Where(s =>
                    s.Charge != 0
                    && !system.Species.Any(o =>
                        o.Charge * s.Charge < 0
                        && (s.Charge > 0 ? isKnown(s.Name, o.Name) : isKnown(o.Name, s.Name))
                    )
                )
                .Select(s => s.Name),
        ];
}
