using Xunit;

namespace Bittern.Catalogue.Tests;

/// <summary>Constants of different origin that must agree where they meet. Each tolerance is that of the looser source.</summary>
public sealed class Cycles
{
    [Fact]
    public void Water_ionises_alike_in_the_main_set_and_in_the_brine_set() =>
        Assert.Equal(Shipped.LogK("brine", "OH-"), Shipped.LogK("major", "OH-"), 0.005);

    [Fact]
    public void Brucite_with_hydrogen_ions_and_with_hydroxide_gives_the_ionisation_of_water() =>
        // Mg(OH)2 + 2 H+ = Mg^2+ + 2 H2O less Mg(OH)2 = Mg^2+ + 2 OH- is twice H+ + OH- = H2O; brucite itself is known to ± 0.1.
        Assert.Equal(
            -Shipped.LogK("major", "OH-"),
            (Shipped.LogK("major", "brucite") - Shipped.LogK("brine", "brucite")) / 2,
            0.1
        );

    [Fact]
    public void Portlandite_does_so_too() =>
        Assert.Equal(
            -Shipped.LogK("major", "OH-"),
            (Shipped.LogK("major", "portlandite") - Shipped.LogK("brine", "portlandite")) / 2,
            0.02
        );

    [Fact]
    public void Carbonic_acid_agrees_between_the_sets()
    {
        Assert.Equal(Shipped.LogK("brine", "HCO3-"), Shipped.LogK("major", "HCO3-"), 0.02);
        Assert.Equal(Shipped.LogK("brine", "CO2(aq)"), Shipped.LogK("major", "CO2(aq)"), 0.02);
        Assert.Equal(Shipped.LogK("brine", "CO2(g)"), Shipped.LogK("major", "CO2(g)"), 0.02);
    }

    [Fact]
    public void Dissolved_oxygen_reaches_the_potential_of_the_oxygen_electrode() =>
        // E° 1.229 V for O2(g) + 4 H+ + 4 e- (handbooks): log K = 4 × 1.229 / 0.05916.
        Assert.Equal(
            4 * 1.229 / 0.05916,
            Couple("redox", "O2(aq) + 4 H+") + Shipped.LogK("major", "O2(g)"),
            0.1
        );

    [Fact]
    public void Dissolved_hydrogen_closes_on_the_hydrogen_electrode() =>
        Assert.Equal(
            0,
            Couple("redox", "2 H+ + 2 e- = H2(aq)") - Shipped.LogK("major", "H2(g)"),
            0.005
        );

    [Fact]
    public void Copper_takes_up_its_electrons_one_by_one_or_at_once() =>
        // Cu+ + e- = Cu: 0.521 V, log K 8.81 (handbooks).
        Assert.Equal(
            -Shipped.LogK("redox", "native-copper"),
            Couple("redox", "Cu^2+ + e-") + 8.81,
            0.05
        );

    [Fact]
    public void Permanganate_goes_to_manganese_through_its_dioxide() =>
        // MnO4- + 4 H+ + 3 e- = MnO2 + 2 H2O: 1.695 V (handbooks), log K 85.95; potentials of that time agree within 0.01 V.
        Assert.Equal(
            Couple("redox", "MnO4- + 8 H+"),
            85.95 + Shipped.LogK("redox", "pyrolusite"),
            0.5
        );

    [Fact]
    public void Dichromate_and_chromate_have_one_potential() =>
        // Cr2O7^2- + 14 H+ + 6 e- = 2 Cr^3+ + 7 H2O: 1.33 V (textbooks), log K 134.9; 0.005 V of slack is 0.5 in log K.
        Assert.Equal(
            134.89,
            (2 * Couple("oxyanions", "HCrO4- + 7 H+"))
                + (2 * Shipped.LogK("oxyanions", "HCrO4-"))
                - Shipped.LogK("oxyanions", "Cr2O7^2-"),
            0.5
        );

    [Fact]
    public void Ferro_and_ferricyanide_keep_their_potential() =>
        // Fe(CN)6^3- + e- = Fe(CN)6^4-: 0.36 V (textbooks), log K 6.09.
        Assert.Equal(
            6.09,
            Couple("redox", "Fe^3+ + e-")
                + Shipped.LogK("cyanides", "Fe(CN)6^4-")
                - Shipped.LogK("cyanides", "Fe(CN)6^3-"),
            0.05
        );

    [Fact]
    public void Mackinawite_agrees_between_two_studies() =>
        // FeS + H+ = Fe^2+ + HS- of one, FeS + 2 H+ = Fe^2+ + H2S(aq) of the other.
        Assert.Equal(
            Shipped.LogK("sulfides", "mackinawite"),
            Shipped.LogK("sulfides", "mackinawite-benning") + Shipped.LogK("major", "HS-"),
            0.25
        );

    [Fact]
    public void Malachite_and_azurite_meet_at_the_known_pressure_of_carbon_dioxide()
    {
        // 3 malachite + CO2(g) = 2 azurite + H2O at 10^-0.2 bar (Preis & Gamsjäger 2002), ± 0.3 from the constants.
        var co2 =
            -Shipped.LogK("major", "HCO3-")
            - Shipped.LogK("major", "CO2(aq)")
            + Shipped.LogK("major", "CO2(g)");
        var pressure =
            (2 * Shipped.LogK("metals", "azurite"))
            - (3 * Shipped.LogK("metals", "malachite"))
            - co2;
        Assert.Equal(-0.2, pressure, 0.3);
    }

    private static double Couple(string domain, string startsWith) =>
        Assert
            .Single(
                Shipped.Index.Entries,
                e =>
                    e.Kind is EntryKind.HalfReaction
                    && string.Equals(e.Domain, domain, StringComparison.Ordinal)
                    && e.Name.StartsWith(startsWith, StringComparison.Ordinal)
            )
            .Constant!.Log10AtCelsius(25);
}
