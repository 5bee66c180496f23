using System.Collections.Frozen;
using System.Collections.Immutable;
using System.Text;
using Bittern.Diagnostics;
using Bittern.Language;

namespace Bittern.Catalogue;

/// <summary>
/// The constants shipped with the tool: one file a domain, in the recipe language, embedded in this assembly.
/// </summary>
public static class ShippedCatalogue
{
    private const string Extension = ".bittern";

    // One instance a file for the life of the process: what is parsed once is kept with it.
    private static readonly FrozenDictionary<string, Lazy<SourceText>> Resources =
        typeof(ShippedCatalogue)
            .Assembly.GetManifestResourceNames()
            .Where(n => n.EndsWith(Extension, StringComparison.Ordinal))
            .ToFrozenDictionary(
                n => n[..^Extension.Length],
                n => new Lazy<SourceText>(() => Load(n)),
                StringComparer.Ordinal
            );

    /// <summary>Names that <c>use catalogue …</c> accepts, in ordinal order.</summary>
    public static ImmutableArray<string> Names { get; } =
    [.. Resources.Keys.Order(StringComparer.Ordinal)];

    /// <summary>
    /// The domains that may stand in one recipe: constants for ion-association models. The brine sets are a whole of their own, whose
    /// ion-interaction parameters already hold what these declare as ion pairs.
    /// </summary>
    public static ImmutableArray<string> IonAssociation { get; } =
    [.. Names.Where(n => !n.StartsWith("brine", StringComparison.Ordinal))];

    /// <summary>The file of that name, shown in messages as <c>catalogue/NAME.bittern</c>; null when there is none.</summary>
    public static SourceText? Open(string name) =>
        Resources.TryGetValue(name, out var file) ? file.Value : null;

    /// <summary>The catalogue for texts that name no file of their own.</summary>
    public static IRecipeFiles Files { get; } = new CatalogueOnly();

    private static SourceText Load(string resource)
    {
        using var stream = typeof(ShippedCatalogue).Assembly.GetManifestResourceStream(resource)!;
        using var reader = new StreamReader(stream, Encoding.UTF8);
        return new SourceText($"catalogue/{resource}", reader.ReadToEnd());
    }

    private sealed class CatalogueOnly : IRecipeFiles
    {
        public IEnumerable<string> CatalogueNames => Names;

        public SourceText? Catalogue(string name) => Open(name);

        public SourceText? Include(string path, out string? fault)
        {
            fault = "a catalogue names no files outside itself";
            return null;
        }
    }
}
