using System.Collections.Immutable;
using Bittern.Diagnostics;
using Bittern.Model;

namespace Bittern.Language;

/// <summary>Where named files come from. The language opens none itself; whoever implements this decides what may be read.</summary>
public interface IRecipeFiles
{
    /// <summary>Names that <c>use catalogue</c> knows, for suggestions.</summary>
    IEnumerable<string> CatalogueNames { get; }

    /// <summary>A catalogue file; null when there is none of that name.</summary>
    SourceText? Catalogue(string name);

    /// <summary>A file that a recipe names, relative to the recipe; null when it cannot be read, with the reason in <paramref name="fault"/>.</summary>
    SourceText? Include(string path, out string? fault);
}

/// <summary>What a recipe means, with every mistake in it. <see cref="Recipe"/> is null when an error stands in the way.</summary>
public sealed record ReadResult(Recipe? Recipe, ImmutableArray<Diagnostic> Diagnostics)
{
    public bool HasErrors => Diagnostics.Any(d => d.Severity == Severity.Error);
}
