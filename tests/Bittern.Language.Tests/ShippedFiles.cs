using Bittern.Catalogue;
using Bittern.Diagnostics;

namespace Bittern.Language.Tests;

/// <summary>The shipped catalogues, and files held in memory.</summary>
internal sealed class ShippedFiles(params (string Path, string Text)[] files) : IRecipeFiles
{
    public static ShippedFiles Only { get; } = new();

    public IEnumerable<string> CatalogueNames => ShippedCatalogue.Names;

    public SourceText? Catalogue(string name) => ShippedCatalogue.Open(name);

    public SourceText? Include(string path, out string? fault)
    {
        foreach (var (known, text) in files)
        {
            if (string.Equals(known, path, StringComparison.Ordinal))
            {
                fault = null;
                return new SourceText(known, text);
            }
        }

        fault = "there is no such file";
        return null;
    }
}
