using Bittern.Catalogue;
using Xunit;

namespace Bittern.Catalogue.Tests;

public sealed class SearchAndCards
{
    [Fact]
    public void An_element_finds_what_contains_it()
    {
        var found = CatalogueSearch.Find(Shipped.Index, "Zn");
        Assert.NotEmpty(found);
        Assert.All(found, e => Assert.Contains("Zn", e.Elements, StringComparer.Ordinal));
    }

    [Fact]
    public void Words_narrow_down()
    {
        var found = CatalogueSearch.Find(Shipped.Index, "Zn hydroxide");
        Assert.Contains(found, e => e.Name is "zinc-hydroxide");
        Assert.DoesNotContain(found, e => e.Name is "smithsonite");
    }

    [Fact]
    public void A_source_finds_its_constants() =>
        Assert.All(
            CatalogueSearch.Find(Shipped.Index, "plummer1982"),
            e => Assert.Equal("plummer1982", e.Constant!.Source!.Key)
        );

    [Fact]
    public void A_formula_may_be_written_with_an_asterisk() =>
        Assert.Contains(
            CatalogueSearch.Named(Shipped.Index, "CaSO4*2H2O"),
            e => e.Name is "gypsum"
        );

    [Fact]
    public void Nothing_fits_a_word_that_is_nowhere() =>
        Assert.Empty(CatalogueSearch.Find(Shipped.Index, "phlogiston"));

    [Fact]
    public void Fresh_and_aged_forms_are_each_other_s_alternatives()
    {
        var fresh = Shipped.Entry("metals", "nickel-hydroxide");
        Assert.Contains(
            CatalogueSearch.Alternatives(Shipped.Index, fresh),
            e => e.Name is "nickel-hydroxide-beta"
        );
    }

    [Fact]
    public void A_card_says_all_that_is_known()
    {
        var card = CatalogueCard.Render(Shipped.Index, Shipped.Entry("major", "gypsum"));
        Assert.Contains("CaSO4·2H2O = Ca^2+ + SO4^2- + 2 H2O", card, StringComparison.Ordinal);
        Assert.Contains(
            "[nordstrom1990], recalled without sight of it",
            card,
            StringComparison.Ordinal
        );
        Assert.Contains("valid        0 to 100 °C", card, StringComparison.Ordinal);
        Assert.Contains("forms        by default", card, StringComparison.Ordinal);
        Assert.Contains(
            "doubt        belongs to the set with anhydrite",
            card,
            StringComparison.Ordinal
        );
        Assert.Contains("alternative  gypsum (catalogue brine)", card, StringComparison.Ordinal);
        Assert.Contains("\n     25    -4.58", card, StringComparison.Ordinal);
    }
}
