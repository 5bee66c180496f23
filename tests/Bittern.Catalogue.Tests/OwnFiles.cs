using Bittern.Catalogue;
using Bittern.Diagnostics;
using Xunit;

namespace Bittern.Catalogue.Tests;

/// <summary>A user's own file of constants is listed and checked like the shipped ones.</summary>
public sealed class OwnFiles
{
    [Fact]
    public void Own_constants_stand_beside_the_shipped_ones()
    {
        var own = Read(
            """
            use catalogue major
            cite notebook "laboratory notebook 7"
            // Third series, aged for a week.
            solid own-gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -5.1 ± 0.1 [notebook]
            """
        );
        Assert.Empty(own.Diagnostics);
        var entry = Assert.Single(own.Entries);
        Assert.Equal("site", entry.Domain);
        Assert.Equal("Third series, aged for a week.", entry.Remark);
        var finding = Assert.Single(
            CatalogueCheck.Against(own, Shipped.Index),
            f => f.What.Contains("catalogue major", StringComparison.Ordinal)
        );
        Assert.StartsWith(
            "more stable by 0.5 log10 units at 25 °C than gypsum",
            finding.What,
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void A_constant_entered_twice_is_found()
    {
        var own = Read(
            """
            use catalogue major
            cite notebook "laboratory notebook 7"
            solid floc-a Mg(OH)2 + 2 H+ to Mg^2+ + 2 H2O   log K 16.80 [notebook]
            solid floc-b Mg(OH)2 + 2 H+ to Mg^2+ + 2 H2O   log K 16.80 [notebook]
            """
        );
        var finding = Assert.Single(CatalogueCheck.Within(own));
        Assert.Equal("floc-a", finding.Entry.Name);
        Assert.Contains("floc-b", finding.What, StringComparison.Ordinal);
    }

    [Fact]
    public void A_form_that_another_one_always_beats_is_found()
    {
        var own = Read(
            """
            use catalogue major
            cite notebook "laboratory notebook 7"
            solid fresh Mg(OH)2 + 2 H+ to Mg^2+ + 2 H2O   log K 18.0 [notebook]
            solid aged Mg(OH)2 + 2 H+ to Mg^2+ + 2 H2O   log K 16.8 [notebook]
            """
        );
        var finding = Assert.Single(CatalogueCheck.Within(own));
        Assert.Equal("fresh", finding.Entry.Name);
        Assert.StartsWith(
            "never forms at 25 °C where aged may form",
            finding.What,
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void A_list_shows_constant_source_domain_and_marks()
    {
        var list = CatalogueListing.Render(CatalogueSearch.Find(Shipped.Index, "quartz"));
        Assert.Equal(
            "quartz  SiO2  log K -3.74  rimstidt1997  silica-borate  recalled, held back, doubt\n",
            list
        );
    }

    [Fact]
    public void An_empty_list_says_so() =>
        Assert.Equal("nothing found\n", CatalogueListing.Render([]));

    private static CatalogueIndex Read(string text) =>
        CatalogueIndex.Read(
            [new SourceText("constants/site.bittern", text)],
            ShippedCatalogue.Files
        );
}
