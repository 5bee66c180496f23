using Bittern.Catalogue;
using Xunit;

namespace Bittern.Catalogue.Tests;

/// <summary>The shipped catalogue, read once for all tests.</summary>
internal static class Shipped
{
    private static readonly Lazy<CatalogueIndex> All = new(CatalogueIndex.Shipped);

    public static CatalogueIndex Index => All.Value;

    public static IEnumerable<CatalogueEntry> WithConstant =>
        Index.Entries.Where(e => e.Constant is not null);

    /// <summary>The one entry of that name in that domain.</summary>
    public static CatalogueEntry Entry(string domain, string name) =>
        Assert.Single(
            Index.Entries,
            e =>
                string.Equals(e.Domain, domain, StringComparison.Ordinal)
                && string.Equals(e.Name, name, StringComparison.Ordinal)
        );

    /// <summary>log10 of the written constant at a temperature (°C).</summary>
    public static double LogK(string domain, string name, double celsius = 25) =>
        Entry(domain, name).Constant!.Log10AtCelsius(celsius);
}
