using System.Collections.Immutable;
using Bittern.Diagnostics;
using Bittern.Language.Binding;
using Bittern.Model;

namespace Bittern.Language;

/// <summary>All chemistry that a file and what it uses declare, with every mistake in it.</summary>
public sealed record ChemistryReading(
    ChemicalSystem Chemistry,
    ImmutableArray<Diagnostic> Diagnostics
);

/// <summary>Reads a file of constants by itself, without a recipe: nothing is left out because no liquor brings it.</summary>
public static class ChemistryText
{
    /// <summary>Reads <paramref name="file"/> and everything it uses. Never throws on what a text holds.</summary>
    public static ChemistryReading Read(SourceText file, IRecipeFiles files)
    {
        List<Diagnostic> diagnostics = [];
        var binder = new ChemistryBinder(files, diagnostics);
        binder.Bind(ChemistryReader.Read(file, isCatalogue: true));
        return new ChemistryReading(
            new ChemicalSystem
            {
                Basis = Of(SpeciesKind.Basis),
                Complexes = Of(SpeciesKind.Complex),
                Solids = Of(SpeciesKind.Solid),
                Gases = Of(SpeciesKind.Gas),
                HalfReactions = binder.HalfReactions,
                ActivityParameters = binder.ActivityParameters,
            },
            [.. diagnostics]
        );

        ImmutableArray<Species> Of(SpeciesKind kind) =>
            [.. binder.Species.Where(s => s.Kind == kind)];
    }
}
