using Xunit;

namespace Bittern.Catalogue.Tests;

/// <summary>What the constants say away from 25 °C, against tables that the expressions were not copied from.</summary>
public sealed class PublishedValues
{
    // pKw at 0.1 MPa: Bandura & Lvov 2006, J. Phys. Chem. Ref. Data 35, 15, as tabulated in the CRC Handbook. The expression is older; 0.015 is their spread.
    [Theory]
    [InlineData(0, 14.946)]
    [InlineData(25, 13.995)]
    [InlineData(50, 13.264)]
    [InlineData(75, 12.696)]
    [InlineData(100, 12.252)]
    public void Ionisation_of_water(double celsius, double pKw) =>
        Assert.Equal(-pKw, Shipped.LogK("major", "OH-", celsius), 0.015);

    // Stumm & Morgan 1996, Aquatic Chemistry, carbonate constants by temperature (recalled, two decimals).
    [Theory]
    [InlineData(5, 6.52, 10.56, 8.39, 1.19)]
    [InlineData(10, 6.46, 10.49, 8.41, 1.27)]
    [InlineData(15, 6.42, 10.43, 8.43, 1.34)]
    [InlineData(20, 6.38, 10.38, 8.45, 1.41)]
    [InlineData(25, 6.35, 10.33, 8.48, 1.47)]
    public void Carbonate_system(
        double celsius,
        double pK1,
        double pK2,
        double pKsCalcite,
        double pKH
    )
    {
        Assert.Equal(pK1, Shipped.LogK("major", "CO2(aq)", celsius), 0.01);
        Assert.Equal(pK2, Shipped.LogK("major", "HCO3-", celsius), 0.01);
        Assert.Equal(-pKsCalcite, Shipped.LogK("major", "calcite", celsius), 0.01);
        Assert.Equal(-pKH, Shipped.LogK("major", "CO2(g)", celsius), 0.01);
    }

    // Dissolved oxygen under moist air of 1 atm: Benson & Krause as in APHA Standard Methods. Air holds 0.2095 O2; vapour pressures IAPWS SR1-86. The constants
    // come from an older compilation (Wilhelm et al. 1977); the two agree within 0.06 mg/L.
    [Theory]
    [InlineData(0, 0.00603, 14.62)]
    [InlineData(25, 0.03128, 8.26)]
    [InlineData(35, 0.05555, 6.95)]
    public void Oxygen_under_air(double celsius, double vapourAtm, double milligramsPerLitre)
    {
        var molal =
            Math.Pow(10, Shipped.LogK("major", "O2(g)", celsius)) * 0.2095 * (1 - vapourAtm);
        Assert.Equal(milligramsPerLitre, molal * 31.998e3, 0.06);
    }

    // Hardie 1967, Am. Mineral. 52, 171: gypsum and anhydrite in water meet at 58 ± 2 °C.
    [Fact]
    public void Gypsum_and_anhydrite_cross_at_58_degrees()
    {
        Assert.True(Shipped.LogK("major", "gypsum", 56) < Shipped.LogK("major", "anhydrite", 56));
        Assert.True(Shipped.LogK("major", "gypsum", 60) > Shipped.LogK("major", "anhydrite", 60));
    }

    // Alexander, Heston & Iler 1954, J. Phys. Chem. 58, 453: about 120 ± 15 mg/L SiO2 at 25 °C below pH 9.
    [Fact]
    public void Amorphous_silica_dissolves_to_120_milligrams_per_litre() =>
        Assert.Equal(
            120,
            Math.Pow(10, Shipped.LogK("silica-borate", "amorphous-silica")) * 60.084e3,
            15.0
        );

    // CRC Handbook, solubility of gases: mole fraction 6.15e-4 of CO2 at 25 °C and 1 atm, 0.0341 mol/kg.
    [Fact]
    public void Carbon_dioxide_at_one_atmosphere() =>
        Assert.Equal(0.0341, Math.Pow(10, Shipped.LogK("major", "CO2(g)")), 0.0006);

    // Bates & Pinching 1949: pKa of the ammonium ion (recalled).
    [Theory]
    [InlineData(0, 10.081)]
    [InlineData(50, 8.539)]
    public void Ammonium(double celsius, double pKa) =>
        Assert.Equal(-pKa, Shipped.LogK("major", "NH3(aq)", celsius), 0.005);

    // Blount 1977, Am. Mineral. 62, 942, and the handbook: barite dissolves to 2.45 ± 0.3 mg/L at 20 to 25 °C; at this dilution γ± = 0.95.
    [Fact]
    public void Barite_dissolves_to_two_and_a_half_milligrams_per_litre() =>
        Assert.Equal(
            2.45,
            Math.Sqrt(Math.Pow(10, Shipped.LogK("major", "barite"))) / 0.95 * 233.39e3,
            0.3
        );
}
