using System.Collections.Immutable;
using Bittern.Diagnostics;
using Bittern.Language;
using Bittern.Model;

namespace Bittern.Catalogue;

/// <summary>Every declaration of some catalogue files, bound. Immutable.</summary>
/// <param name="Entries">In the order of the files, then as declared.</param>
/// <param name="Parameters">Parameters of activity models, in the same order.</param>
/// <param name="Diagnostics">What the language found wrong in the files; none in the shipped ones.</param>
public sealed record CatalogueIndex(
    ImmutableArray<CatalogueEntry> Entries,
    ImmutableArray<CatalogueParameter> Parameters,
    ImmutableArray<Diagnostic> Diagnostics
)
{
    /// <summary>The files that the tool ships.</summary>
    public static CatalogueIndex Shipped() =>
        Read(ShippedCatalogue.Names.Select(n => ShippedCatalogue.Open(n)!), ShippedCatalogue.Files);

    /// <summary>
    /// Reads each file by itself, with what it uses, so that sets which must not be mixed can stand in one index.
    /// Entries that a file takes over from another one are listed once, under the file that declares them; a file's domain is its name without folder and ending.
    /// </summary>
    public static CatalogueIndex Read(IEnumerable<SourceText> texts, IRecipeFiles files)
    {
        var entries = ImmutableArray.CreateBuilder<CatalogueEntry>();
        var parameters = ImmutableArray.CreateBuilder<CatalogueParameter>();
        var diagnostics = ImmutableArray.CreateBuilder<Diagnostic>();
        foreach (var text in texts)
        {
            var reading = ChemistryText.Read(text, files);
            diagnostics.AddRange(reading.Diagnostics);
            var domain = Path.GetFileNameWithoutExtension(text.Name);
            entries.AddRange(Of(domain, text.Name, reading.Chemistry));
            parameters.AddRange(
                reading
                    .Chemistry.ActivityParameters.Where(p => IsIn(p.Span, text.Name))
                    .Select(p => new CatalogueParameter(domain, p, Remarks.Above(p.Span)))
            );
        }

        return new CatalogueIndex(
            entries.ToImmutable(),
            parameters.ToImmutable(),
            diagnostics.ToImmutable()
        );
    }

    private static IEnumerable<CatalogueEntry> Of(
        string domain,
        string file,
        ChemicalSystem chemistry
    )
    {
        var species = chemistry
            // H+ is there without being declared: its span is empty.
            .All.Where(s => s.Span.Length > 0 && IsIn(s.Span, file))
            .Select(s => new CatalogueEntry
            {
                Domain = domain,
                Kind = KindOf(s.Kind),
                Name = s.Name,
                Formula = s.Formula,
                Reaction = s.Written,
                Constant = s.Constant,
                HeldBack = s.HeldBackByDefault,
                Doubt = s.Doubt,
                Remark = Remarks.Above(s.Span),
                Species = s,
                Line = s.Span.Source.Position(s.Span.Start).Line,
            });
        var couples = chemistry
            .HalfReactions.Where(h => IsIn(h.Span, file))
            .Select(h => new CatalogueEntry
            {
                Domain = domain,
                Kind = EntryKind.HalfReaction,
                Name = h.Written.ToString(),
                Reaction = h.Written,
                Constant = h.Constant,
                Remark = Remarks.Above(h.Span),
                Line = h.Span.Source.Position(h.Span.Start).Line,
            });
        return species.Concat(couples).OrderBy(e => e.Line);
    }

    private static bool IsIn(SourceSpan span, string file) =>
        string.Equals(span.Source.Name, file, StringComparison.Ordinal);

    private static EntryKind KindOf(SpeciesKind kind) =>
        kind switch
        {
            SpeciesKind.Basis => EntryKind.Basis,
            SpeciesKind.Complex => EntryKind.Complex,
            SpeciesKind.Solid => EntryKind.Solid,
            SpeciesKind.Gas => EntryKind.Gas,
            _ => throw new ArgumentOutOfRangeException(nameof(kind), kind, message: null),
        };
}
