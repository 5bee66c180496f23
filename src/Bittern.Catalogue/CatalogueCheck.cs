using System.Collections.Immutable;
using System.Globalization;
using Bittern.Chemistry;
using Bittern.Model;

namespace Bittern.Catalogue;

/// <summary>Something in a set of constants that its owner should look at.</summary>
/// <param name="Entry">Where.</param>
/// <param name="What">One sentence, with the numbers.</param>
public sealed record CatalogueFinding(CatalogueEntry Entry, string What);

/// <summary>
/// Consistency of constants beyond what binding proves (balance, species, citations): twins, forms that can never appear, constants that leave the number
/// range, and, for a user's own files, disagreement with the shipped catalogue.
/// </summary>
public static class CatalogueCheck
{
    /// <summary>Two constants of one solid closer than this (log10 units) are taken for one that was entered twice.</summary>
    private const double SameConstant = 0.005;

    /// <summary>Published constants of one species often differ by this much (log10 units); more is worth a look.</summary>
    private const double Disagreement = 0.3;

    /// <summary>Findings within one index, in its order.</summary>
    public static ImmutableArray<CatalogueFinding> Within(CatalogueIndex index) =>
        [.. index.Entries.SelectMany(e => Of(index, e))];

    /// <summary>Constants of <paramref name="own"/> that differ from the <paramref name="reference"/>'s for a species of the same kind and composition.</summary>
    public static ImmutableArray<CatalogueFinding> Against(
        CatalogueIndex own,
        CatalogueIndex reference
    ) =>
        [
            .. from entry in own.Entries
            where entry.Species is { Kind: not SpeciesKind.Basis }
            from other in reference.Entries
            where other.Kind == entry.Kind && other.Species is not null
            where
                SameBasis(entry.Species!, other.Species!)
                && other.Formula!.SameCompositionAs(entry.Formula!)
            let gap = entry.Species!.Log10FormationAt(25) - other.Species!.Log10FormationAt(25)
            where Math.Abs(gap) > Disagreement
            select new CatalogueFinding(
                entry,
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"{Stability(gap)} by {Math.Abs(gap):0.0} log10 units at 25 °C than {other.Name} of catalogue {other.Domain} ({ConstantWords.Source(other.Constant!)})"
                )
            ),
        ];

    private static IEnumerable<CatalogueFinding> Of(CatalogueIndex index, CatalogueEntry entry)
    {
        if (entry.Constant is { } constant && !IsFinite(constant))
        {
            yield return new CatalogueFinding(
                entry,
                "the constant is no number somewhere in its stated range"
            );
        }

        if (entry.Kind is not EntryKind.Solid)
        {
            yield break;
        }

        var forms = CatalogueSearch
            .Alternatives(index, entry)
            .Where(e => string.Equals(e.Domain, entry.Domain, StringComparison.Ordinal))
            .ToImmutableArray();
        foreach (var twin in forms)
        {
            if (
                string.CompareOrdinal(entry.Name, twin.Name) < 0
                && Math.Abs(
                    entry.Species!.Log10FormationAt(25) - twin.Species!.Log10FormationAt(25)
                ) < SameConstant
            )
            {
                yield return new CatalogueFinding(
                    entry,
                    $"has the composition and the constant of {twin.Name}: one of the two is enough"
                );
            }
        }

        if (
            entry.HeldBack is null
            && forms.FirstOrDefault(e => e.HeldBack is null && IsLessSoluble(e, entry))
                is { } winner
        )
        {
            yield return new CatalogueFinding(
                entry,
                $"never forms at 25 °C where {winner.Name} may form, which is less soluble"
            );
        }
    }

    private static bool IsLessSoluble(CatalogueEntry one, CatalogueEntry other) =>
        one.Species!.Log10FormationAt(25) > other.Species!.Log10FormationAt(25) + SameConstant;

    private static bool IsFinite(EquilibriumConstant constant)
    {
        var from = constant.ValidFromCelsius ?? 0;
        var to = constant.ValidToCelsius ?? Math.Max(from, 60);
        return Enumerable
            .Range(0, 11)
            .All(i => double.IsFinite(constant.Log10AtCelsius(from + ((to - from) * i / 10))));
    }

    // Only constants over one and the same basis can be compared.
    private static bool SameBasis(Species one, Species other) =>
        one.FromBasis.Length == other.FromBasis.Length
        && one.FromBasis.All(t =>
            other.FromBasis.Any(o =>
                o.Species.Equals(t.Species) && Math.Abs(o.Coefficient - t.Coefficient) < 1e-9
            )
        );

    private static string Stability(double gap) => gap > 0 ? "more stable" : "less stable";
}
