using Bittern.Catalogue;
using Xunit;

namespace Bittern.Catalogue.Tests;

public sealed class ShippedFiles
{
    [Theory]
    [InlineData("major")]
    [InlineData("metals")]
    [InlineData("redox")]
    [InlineData("salts")]
    public void Each_domain_is_a_file(string name)
    {
        Assert.Contains(name, ShippedCatalogue.Names, StringComparer.Ordinal);
        var file = ShippedCatalogue.Open(name);
        Assert.NotNull(file);
        Assert.Equal($"catalogue/{name}.bittern", file.Name);
    }

    [Fact]
    public void An_unknown_name_opens_nothing() =>
        Assert.Null(ShippedCatalogue.Open("no-such-domain"));

    [Fact]
    public void A_catalogue_file_that_is_used_exists()
    {
        foreach (var name in ShippedCatalogue.Names)
        {
            var uses = ShippedCatalogue
                .Open(name)!
                .Text.Split('\n')
                .Where(l => l.StartsWith("use catalogue ", StringComparison.Ordinal))
                .SelectMany(l => l["use catalogue ".Length..].Split(", "));
            Assert.All(
                uses,
                used => Assert.Contains(used, ShippedCatalogue.Names, StringComparer.Ordinal)
            );
        }
    }
}
