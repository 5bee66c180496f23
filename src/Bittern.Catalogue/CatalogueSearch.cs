using System.Collections.Immutable;
using Bittern.Chemistry;

namespace Bittern.Catalogue;

/// <summary>Finds entries by element, formula, name or source.</summary>
public static class CatalogueSearch
{
    /// <summary>
    /// Entries that every word of the query fits. A word that is an element symbol (case counts) asks for entries with that element;
    /// any other word is looked for in name, formula, domain and source, whatever its case. An empty query finds everything.
    /// </summary>
    public static ImmutableArray<CatalogueEntry> Find(CatalogueIndex index, string query)
    {
        var words = query.Split(
            ' ',
            StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries
        );
        return [.. index.Entries.Where(e => words.All(w => Fits(e, w)))];
    }

    /// <summary>The entries called exactly so: a solid's name, or a formula however it is written (<c>CaSO4*2H2O</c>). Every set's own is there.</summary>
    public static ImmutableArray<CatalogueEntry> Named(CatalogueIndex index, string name)
    {
        var byName = index
            .Entries.Where(e => string.Equals(e.Name, name, StringComparison.OrdinalIgnoreCase))
            .ToImmutableArray();
        if (!byName.IsEmpty || !FormulaReader.Standard.TryRead(name, out var formula, out _))
        {
            return byName;
        }

        return [.. index.Entries.Where(e => formula!.Equals(e.Formula))];
    }

    /// <summary>Other entries of one kind and composition: aged and fresh forms, polymorphs, another set's value.</summary>
    public static ImmutableArray<CatalogueEntry> Alternatives(
        CatalogueIndex index,
        CatalogueEntry entry
    ) =>
        entry.Formula is { } formula && entry.Kind is not EntryKind.Basis
            ?
            [
                .. index.Entries.Where(e =>
                    !ReferenceEquals(e, entry)
                    && e.Kind == entry.Kind
                    && e.Formula!.SameCompositionAs(formula)
                ),
            ]
            : [];

    private static bool Fits(CatalogueEntry entry, string word)
    {
        if (PeriodicTable.BySymbol.ContainsKey(word))
        {
            return entry.Elements.Contains(word, StringComparer.Ordinal);
        }

        var source = entry.Constant?.Source;
        return Has(entry.Name, word)
            || (entry.Formula is { } f && Has(f.Text, word.Replace('*', '·')))
            || Has(entry.Domain, word)
            || (source is not null && (Has(source.Key, word) || Has(source.Text, word)));
    }

    private static bool Has(string text, string word) =>
        text.Contains(word, StringComparison.OrdinalIgnoreCase);
}
