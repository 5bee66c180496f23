using CsCheck;
using Xunit;

namespace Bittern.Chemistry.Tests;

public sealed class EditDistanceTests
{
    private static readonly string[] Solids =
    [
        "gypsum",
        "calcite",
        "aragonite",
        "brucite",
        "barite",
        "halite",
    ];

    [Theory]
    [InlineData("gypsun", "gypsum")]
    [InlineData("gpysum", "gypsum")]
    [InlineData("Gypsum", "gypsum")]
    [InlineData("GYPSUM", "gypsum")]
    [InlineData("calcit", "calcite")]
    [InlineData("brucitee", "brucite")]
    [InlineData("arragonit", "aragonite")]
    [InlineData("quartz", null)]
    [InlineData("", null)]
    [InlineData("x", null)]
    public void The_nearest_word_is_found_or_none(string text, string? expected) =>
        Assert.Equal(expected, EditDistance.Closest(text, Solids));

    [Theory]
    [InlineData("", "", 0)]
    [InlineData("abc", "", 3)]
    [InlineData("ca", "ac", 1)]
    [InlineData("kitten", "sitting", 3)]
    [InlineData("Zn", "zn", 1)]
    public void Distances_are_as_defined(string one, string other, int distance) =>
        Assert.Equal(distance, EditDistance.Between(one, other));

    [Fact]
    public void Distance_is_symmetric_and_zero_only_for_equals() =>
        Gen.Select(Gen.String["abc"], Gen.String["abc"])
            .Sample(
                (a, b) =>
                {
                    Assert.Equal(EditDistance.Between(a, b), EditDistance.Between(b, a));
                    Assert.Equal(
                        string.Equals(a, b, StringComparison.Ordinal),
                        EditDistance.Between(a, b) == 0
                    );
                }
            );

    [Fact]
    public void A_very_long_text_has_no_neighbour() =>
        Assert.Null(EditDistance.Closest(new string('a', 100_000), [new string('a', 100_000)]));

    [Fact]
    public void Element_symbols_are_suggested() =>
        Assert.Equal(
            "Zn",
            EditDistance.Closest("ZN", PeriodicTable.Elements.Select(e => e.Symbol))
        );
}
