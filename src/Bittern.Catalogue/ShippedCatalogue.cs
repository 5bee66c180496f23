using System.Collections.Immutable;
using System.Text;
using Bittern.Diagnostics;

namespace Bittern.Catalogue;

/// <summary>
/// The constants shipped with the tool: one file a domain, in the recipe language, embedded in this assembly.
/// </summary>
public static class ShippedCatalogue
{
    private const string Extension = ".bittern";

    /// <summary>Names that <c>use catalogue …</c> accepts, in ordinal order.</summary>
    public static ImmutableArray<string> Names { get; } =
    [
        .. typeof(ShippedCatalogue)
            .Assembly.GetManifestResourceNames()
            .Where(n => n.EndsWith(Extension, StringComparison.Ordinal))
            .Select(n => n[..^Extension.Length])
            .Order(StringComparer.Ordinal),
    ];

    /// <summary>The file of that name, shown in messages as <c>catalogue/NAME.bittern</c>; null when there is none.</summary>
    public static SourceText? Open(string name)
    {
        using var stream = typeof(ShippedCatalogue).Assembly.GetManifestResourceStream(
            name + Extension
        );
        if (stream is null)
        {
            return null;
        }

        using var reader = new StreamReader(stream, Encoding.UTF8);
        return new SourceText($"catalogue/{name}{Extension}", reader.ReadToEnd());
    }
}
