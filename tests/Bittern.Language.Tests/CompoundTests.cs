using System.Globalization;
using Bittern.Catalogue;
using Bittern.Diagnostics;
using Xunit;

namespace Bittern.Language.Tests;

/// <summary>What a compound in a liquor brings, in mol of each primary species.</summary>
public sealed class CompoundTests
{
    [Theory]
    [InlineData("FeSO4", "1 Fe^2+, 1 SO4^2-")]
    [InlineData("FeSO4·7H2O", "1 Fe^2+, 7 H2O, 1 SO4^2-")]
    [InlineData("FeCl2", "2 Cl-, 1 Fe^2+")]
    [InlineData("FeCl3", "3 Cl-, 1 Fe^3+")]
    [InlineData("Fe(OH)2", "1 Fe^2+, -2 H+, 2 H2O")]
    [InlineData("Fe(OH)3", "1 Fe^3+, -3 H+, 3 H2O")]
    [InlineData("Fe2(SO4)3", "2 Fe^3+, 3 SO4^2-")]
    [InlineData("AlF3", "1 Al^3+, 3 F-")]
    [InlineData("CuCl2", "2 Cl-, 1 Cu^2+")]
    [InlineData("CuCl", "1 Cl-, 1 Cu+")]
    [InlineData("Ca(OH)2", "1 Ca^2+, -2 H+, 2 H2O")]
    [InlineData("CaO", "1 Ca^2+, -2 H+, 1 H2O")]
    [InlineData("H2SO4", "2 H+, 1 SO4^2-")]
    [InlineData("NaHCO3", "1 CO3^2-, 1 H+, 1 Na+")]
    [InlineData("Na2S", "-2 H+, 1 H2S(aq), 2 Na+")]
    [InlineData("NH3", "-1 H+, 1 NH4+")]
    [InlineData("CO2", "1 CO3^2-, 2 H+, -1 H2O")]
    [InlineData("KH3(C2O4)2·2H2O", "2 C2O4^2-, 3 H+, 2 H2O, 1 K+")]
    [InlineData("KHC8H4O4", "1 C8H4O4^2-, 1 H+, 1 K+")]
    [InlineData("SO4", "1 SO4^2-")]
    [InlineData("HCO3", "1 CO3^2-, 1 H+")]
    [InlineData("HSO4", "1 H+, 1 SO4^2-")]
    [InlineData("NH4", "1 NH4+")]
    [InlineData("Fe(II)", "1 Fe^2+")]
    [InlineData("Fe(III)", "1 Fe^3+")]
    [InlineData("As(V)", "1 AsO4^3-")]
    [InlineData("SiO2", "-2 H2O, 1 H4SiO4(aq)")]
    public void A_name_brings_what_a_chemist_means_by_it(string name, string expected)
    {
        var text =
            $"recipe \"check\" {{\n    temperature 25 °C\n}}\n\nuse catalogue {string.Join(", ", ShippedCatalogue.IonAssociation)}\n\n"
            + $"liquor water {{\n    {name} 0.001 mol/kg\n}}\n\ntrain check {{\n    feed water\n    stage nothing {{\n    }}\n}}\n";
        var read = RecipeReader.Read(new SourceText("check.bittern", text), ShippedFiles.Only);
        Assert.True(
            read.Recipe is not null,
            string.Join('\n', read.Diagnostics.Select(d => d.What))
        );
        var terms = read.Recipe!.Liquors[0]
            .Entries[0]
            .PerMole.OrderBy(t => t.Species.Text, StringComparer.Ordinal)
            .Select(t =>
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"{t.Coefficient:0.####} {t.Species.Text}"
                )
            );
        Assert.Equal(expected, string.Join(", ", terms));
    }
}
