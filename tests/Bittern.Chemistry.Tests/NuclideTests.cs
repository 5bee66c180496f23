using CsCheck;
using Xunit;

namespace Bittern.Chemistry.Tests;

public sealed class NuclideTests
{
    [Theory]
    [InlineData("Ra-226", "Ra", 226)]
    [InlineData("U-238", "U", 238)]
    [InlineData("Pb-210", "Pb", 210)]
    public void A_token_is_read(string text, string symbol, int mass)
    {
        Assert.True(Nuclide.TryRead(text, out var nuclide));
        Assert.Equal((symbol, mass, text), (nuclide!.Symbol, nuclide.MassNumber, nuclide.Name));
    }

    [Theory]
    [InlineData("Ra226")]
    [InlineData("Ra-227")]
    [InlineData("ra-226")]
    [InlineData("")]
    [InlineData("gypsum-1")]
    public void Anything_else_is_not(string text) => Assert.False(Nuclide.TryRead(text, out _));

    // One gram of radium-226 is 0.989 Ci (the old curie fell just short of its definition); uranium-238 has 12.44 Bq/mg and thorium-232
    // 4.06 Bq/mg: radiochemistry handbooks, recalled.
    [Theory]
    [InlineData("Ra-226", 0.989 * 3.7e10, 0.003)]
    [InlineData("U-238", 12440, 0.003)]
    [InlineData("Th-232", 4060, 0.004)]
    public void Specific_activity_agrees_with_the_handbook(
        string text,
        double becquerelPerGram,
        double tolerance
    )
    {
        Assert.True(Nuclide.TryRead(text, out var nuclide));
        Assert.InRange(
            nuclide!.BecquerelPerMole / nuclide.MassNumber / becquerelPerGram,
            1 - tolerance,
            1 + tolerance
        );
        Assert.Equal(1, nuclide.Moles(nuclide.BecquerelPerMole));
    }

    [Fact]
    public void Every_nuclide_belongs_to_an_element_and_stands_once()
    {
        Assert.All(Nuclide.All, n => Assert.True(PeriodicTable.BySymbol.ContainsKey(n.Symbol)));
        Assert.Equal(
            Nuclide.All.Length,
            Nuclide.All.Select(n => n.Name).Distinct(StringComparer.Ordinal).Count()
        );
        Assert.All(Nuclide.All, n => Assert.True(Nuclide.LooksLikeOne(n.Name)));
    }

    [Theory]
    [InlineData("Ra-227", true)]
    [InlineData("Ra-", false)]
    [InlineData("Xx-12", false)]
    [InlineData("Ra-2266", false)]
    [InlineData("Ra-2x", false)]
    public void The_shape_of_a_nuclide_is_known(string text, bool expected) =>
        Assert.Equal(expected, Nuclide.LooksLikeOne(text));

    [Fact]
    public void Any_string_is_read_or_not() =>
        Gen.String.Sample(text =>
        {
            Nuclide.TryRead(text, out _);
            Nuclide.LooksLikeOne(text);
            OxidationState.TryRead(text, out _, out _);
        });
}
