using System.Globalization;
using static Bittern.Calculation.Tests.Validation.Readings;

namespace Bittern.Calculation.Tests.Validation;

/// <summary>Solubilities, saturated solutions, gases and weak acids.</summary>
internal static class SaltChecks
{
    public static IEnumerable<PublishedCheck> All =>
        [.. Solubility(), .. Temperatures(), .. Brines()];

    private static IEnumerable<PublishedCheck> Solubility()
    {
        const string Ambient = "CO2 10^-3.5 atm";
        yield return Salt(
            "Ca(OH)2 - H2O",
            "25 C, saturated, no CO2",
            "pH",
            Recipes.Equilibrium("portlandite", "Ca(OH)2 0.05 mol/kg"),
            PH
        );
        yield return Salt(
            "Ca(OH)2 - H2O",
            "25 C, saturated, no CO2",
            "dissolved Ca",
            Recipes.Equilibrium("portlandite", "Ca(OH)2 0.05 mol/kg"),
            Molarity("Ca^2+")
        );
        yield return Salt(
            "Mg(OH)2 - H2O",
            "25 C, saturated with brucite, no CO2",
            "pH",
            Recipes.Equilibrium("brucite", "Mg(OH)2 0.001 mol/kg"),
            PH
        );
        yield return Salt(
            "Mg(OH)2 - H2O",
            "18 C, saturated with brucite, no CO2",
            "solubility as Mg(OH)2",
            Recipes.Equilibrium("brucite", "Mg(OH)2 0.001 mol/kg", 18),
            MilligramsPerLitre("Mg(OH)2", "Mg^2+")
        );
        yield return Salt(
            "CaCO3 - CO2 - H2O",
            "25 C, calcite, pCO2 10^-3.5 atm",
            "pH",
            Recipes.Equilibrium("calcite", "CaCO3 0.01 mol/kg", air: Ambient),
            PH
        );
        yield return Salt(
            "CaCO3 - CO2 - H2O",
            "25 C, calcite, pCO2 10^-3.5 atm",
            "dissolved Ca",
            Recipes.Equilibrium("calcite", "CaCO3 0.01 mol/kg", air: Ambient),
            MilligramsPerLitre("Ca", "Ca^2+")
        );
        yield return Salt(
            "CaCO3 - H2O",
            "25 C, calcite, closed to gas",
            "pH",
            Recipes.Equilibrium("calcite", "CaCO3 0.001 mol/kg"),
            PH
        );
        yield return Salt(
            "CaCO3 - H2O",
            "25 C, calcite, closed to gas",
            "solubility as CaCO3",
            Recipes.Equilibrium("calcite", "CaCO3 0.001 mol/kg"),
            MilligramsPerLitre("CaCO3", "Ca^2+")
        );
        yield return Salt(
            "CaCO3 - H2O",
            "25 C, aragonite, closed to gas",
            "solubility as CaCO3",
            Recipes.Equilibrium("aragonite", "CaCO3 0.001 mol/kg"),
            MilligramsPerLitre("CaCO3", "Ca^2+")
        );
        yield return Salt(
            "SrCO3 - H2O",
            "18 C, strontianite, closed to gas",
            "solubility as SrCO3",
            Recipes.Equilibrium("strontianite", "SrCO3 0.001 mol/kg", 18),
            MilligramsPerLitre("SrCO3", "Sr^2+")
        );
        yield return Salt(
            "BaCO3 - H2O",
            "25 C, witherite, closed to gas",
            "solubility as BaCO3",
            Recipes.Equilibrium("witherite", "BaCO3 0.001 mol/kg"),
            MilligramsPerLitre("BaCO3", "Ba^2+")
        );
        yield return Salt(
            "MgCO3 - H2O",
            "16-25 C, nesquehonite, closed to gas",
            "solubility as MgCO3.3H2O",
            Recipes.Equilibrium("nesquehonite", "MgCO3 0.05 mol/kg"),
            GramsPerLitre("MgCO3·3H2O", "Mg^2+")
        );
        yield return Salt(
            "CaSO4 - H2O",
            "25 C, gypsum",
            "dissolved CaSO4",
            Recipes.Equilibrium("gypsum", "CaSO4 0.05 mol/kg"),
            Molality("Ca^2+")
        );
        yield return Salt(
            "CaSO4 - H2O",
            "25 C, gypsum, spread of all published determinations",
            "dissolved CaSO4",
            Recipes.Equilibrium("gypsum", "CaSO4 0.05 mol/kg"),
            Molarity("Ca^2+")
        );
        yield return Salt(
            "CaSO4 - H2O",
            "100 C, gypsum (metastable)",
            "solubility as CaSO4",
            Recipes.Equilibrium("gypsum", "CaSO4 0.05 mol/kg", 100),
            GramsPerLitre("CaSO4", "Ca^2+")
        );
        yield return Salt(
            "SrSO4 - H2O",
            "25 C, celestite",
            "solubility as SrSO4",
            Recipes.Equilibrium("celestite", "SrSO4 0.002 mol/kg"),
            GramsPerLitre("SrSO4", "Sr^2+")
        );
        yield return Salt(
            "BaSO4 - H2O",
            "20-25 C, barite",
            "solubility as BaSO4",
            Recipes.Equilibrium("barite", "BaSO4 0.0001 mol/kg"),
            MilligramsPerLitre("BaSO4", "Ba^2+")
        );
        yield return Salt(
            "CaF2 - H2O",
            "25 C, fluorite",
            "solubility as CaF2",
            Recipes.Equilibrium("fluorite", "CaF2 0.001 mol/kg"),
            MilligramsPerLitre("CaF2", "Ca^2+")
        );
        yield return Salt(
            "MgF2 - H2O",
            "18 C, sellaite",
            "solubility as MgF2",
            Recipes.Equilibrium("sellaite", "MgF2 0.01 mol/kg", 18),
            MilligramsPerLitre("MgF2", "Mg^2+")
        );
        yield return Salt(
            "LiF - H2O",
            "25 C",
            "solubility as LiF",
            Recipes.Equilibrium("lithium-fluoride", "LiF 0.1 mol/kg"),
            GramsPerLitre("LiF", "Li+")
        );
        yield return Salt(
            "Li3PO4 - H2O",
            "25 C",
            "solubility as Li3PO4",
            Recipes.Equilibrium("lithium-phosphate", "Li3PO4 0.01 mol/kg"),
            GramsPerLitre("Li3PO4", "Li+", 3)
        );
        yield return Salt(
            "AgCl - H2O",
            "25 C",
            "solubility as AgCl",
            Recipes.Equilibrium("chlorargyrite", "AgCl 0.0001 mol/kg"),
            MilligramsPerLitre("AgCl", "Ag+")
        );
        yield return Salt(
            "AgBr - H2O",
            "25 C",
            "solubility as AgBr",
            Recipes.Equilibrium("bromargyrite", "AgBr 0.0001 mol/kg"),
            MilligramsPerLitre("AgBr", "Ag+")
        );
        yield return Salt(
            "MgNH4PO4 - H2O",
            "25 C, struvite, closed to gas",
            "solubility as struvite",
            Recipes.Equilibrium("struvite", "MgNH4PO4 0.01 mol/kg"),
            MilligramsPerLitre("MgNH4PO4·6H2O", "Mg^2+")
        );
        yield return Salt(
            "MgNH4PO4 - H2O",
            "35 C, struvite, closed to gas",
            "solubility as struvite",
            Recipes.Equilibrium("struvite", "MgNH4PO4 0.01 mol/kg", 35),
            MilligramsPerLitre("MgNH4PO4·6H2O", "Mg^2+")
        );
        yield return Salt(
            "SiO2 - H2O",
            "25 C, amorphous silica, pH below 9",
            "dissolved SiO2",
            Recipes.Equilibrium("amorphous-silica", "H4SiO4 0.01 mol/kg"),
            MilligramsPerLitre("SiO2", "H4SiO4(aq)")
        );
        yield return Salt(
            "CaC2O4 - H2O",
            "20-25 C, whewellite",
            "solubility as CaC2O4.H2O",
            Recipes.Equilibrium("whewellite", "CaC2O4 0.001 mol/kg"),
            MilligramsPerLitre("CaC2O4·H2O", "Ca^2+")
        );
        yield return Salt(
            "MgC2O4 - H2O",
            "25 C, dihydrate",
            "solubility as MgC2O4.2H2O",
            Recipes.Equilibrium("magnesium-oxalate", "MgC2O4 0.02 mol/kg"),
            GramsPerLitre("MgC2O4·2H2O", "Mg^2+")
        );
        yield return Salt(
            "Ca citrate - H2O",
            "18 C, tricalcium citrate tetrahydrate",
            "solubility as Ca3(C6H5O7)2.4H2O",
            Recipes.Equilibrium("calcium-citrate", "Ca3(C6H5O7)2 0.01 mol/kg", 18),
            GramsPerLitre("Ca3(C6H5O7)2·4H2O", "Ca^2+", 3)
        );
        yield return Salt(
            "B(OH)3 - H2O",
            "25 C, sassolite",
            "dissolved boric acid",
            Recipes.Equilibrium("boric-acid", "B(OH)3 2 mol/kg"),
            Molality("B(OH)3(aq)")
        );
        yield return Salt("H2O", "0 C", "pH", Recipes.Equilibrium("", "", 0), PH);
        yield return Salt("H2O", "25 C", "pH", Recipes.Equilibrium("", ""), PH);
        yield return Salt("H2O", "60 C", "pH", Recipes.Equilibrium("", "", 60), PH);
        yield return Salt(
            "CO2 - H2O",
            "25 C, pCO2 10^-3.5 atm",
            "pH",
            Recipes.Equilibrium("", "", air: Ambient),
            PH
        );
        yield return Salt(
            "CO2 - H2O",
            "25 C, pCO2 1 atm",
            "pH",
            Recipes.Equilibrium("", "", air: "CO2 1 atm"),
            PH
        );
        yield return Salt(
            "CO2 - H2O",
            "25 C, pCO2 1 atm",
            "dissolved CO2",
            Recipes.Equilibrium("", "", air: "CO2 1 atm"),
            Molality("CO3^2-")
        );

        // Moist air: 0.20946 of the dry air's pressure, which is 1 atm less the vapour pressure of water (0.0060, 0.0313, 0.0555 atm).
        yield return Salt(
            "O2 - H2O",
            "0 C, moist air at 1 atm",
            "dissolved O2",
            Recipes.Equilibrium("", "", 0, "O2 0.2082 atm"),
            MilligramsPerLitre("O2", "O2(aq)")
        );
        yield return Salt(
            "O2 - H2O",
            "25 C, moist air at 1 atm",
            "dissolved O2",
            Recipes.Equilibrium("", "", 25, "O2 0.2029 atm"),
            MilligramsPerLitre("O2", "O2(aq)")
        );
        yield return Salt(
            "O2 - H2O",
            "35 C, moist air at 1 atm",
            "dissolved O2",
            Recipes.Equilibrium("", "", 35, "O2 0.1978 atm"),
            MilligramsPerLitre("O2", "O2(aq)")
        );
        yield return Salt(
            "KH2PO4 - Na2HPO4 - H2O",
            "25 C, 0.025 + 0.025 mol/kg",
            "pH",
            Recipes.Equilibrium("", "KH2PO4 0.025 mol/kg; Na2HPO4 0.025 mol/kg"),
            PH
        );
        yield return Salt(
            "borax - H2O",
            "25 C, 0.01 mol/kg Na2B4O7.10H2O",
            "pH",
            Recipes.Equilibrium("", "Na2B4O7·10H2O 0.01 mol/kg"),
            PH
        );
        yield return Salt(
            "NaHCO3 - Na2CO3 - H2O",
            "25 C, 0.025 + 0.025 mol/kg",
            "pH",
            Recipes.Equilibrium("", "NaHCO3 0.025 mol/kg; Na2CO3 0.025 mol/kg"),
            PH
        );
        yield return Salt(
            "KH phthalate - H2O",
            "25 C, 0.05 mol/kg KHC8H4O4",
            "pH",
            Recipes.Equilibrium("", "KHC8H4O4 0.05 mol/kg"),
            PH
        );
        yield return Salt(
            "K tetroxalate - H2O",
            "25 C, 0.05 mol/kg KH3(C2O4)2.2H2O",
            "pH",
            Recipes.Equilibrium("", "KH3(C2O4)2·2H2O 0.05 mol/kg"),
            PH
        );
        yield return Salt(
            "KH tartrate - H2O",
            "25 C, 0.0341 mol/kg KHC4H4O6",
            "pH",
            Recipes.Equilibrium("", "KHC4H4O6 0.0341 mol/kg"),
            PH
        );
        yield return Salt(
            "KH2 citrate - H2O",
            "25 C, 0.05 mol/kg KH2C6H5O7",
            "pH",
            Recipes.Equilibrium("", "KH2C6H5O7 0.05 mol/kg"),
            PH
        );
        yield return Salt(
            "CH3COOH - H2O",
            "25 C, 0.1 mol/L",
            "pH",
            Recipes.Equilibrium("", "CH3COOH 0.1 mol/L"),
            PH
        );
        yield return Salt(
            "NH3 - H2O",
            "25 C, 0.1 mol/L",
            "pH",
            Recipes.Equilibrium("", "NH3 0.1 mol/L"),
            PH
        );
        yield return Salt(
            "H2SO4 - H2O",
            "25 C, 0.05 mol/L (0.1 N)",
            "pH",
            Recipes.Equilibrium("", "H2SO4 0.05 mol/L"),
            PH
        );
        yield return Salt(
            "H2SO4 - H2O",
            "25 C, 0.005 mol/L (0.01 N)",
            "pH",
            Recipes.Equilibrium("", "H2SO4 0.005 mol/L"),
            PH
        );
    }

    private static IEnumerable<PublishedCheck> Temperatures()
    {
        yield return Salt(
            "CaSO4 - H2O",
            "gypsum, pure water",
            "temperature of maximum solubility",
            Recipes.Temperatures("gypsum", "CaSO4 0.05 mol/kg", Grid(15, 75, 5)),
            TemperatureOfMaximum("Ca^2+")
        );
        yield return Salt(
            "CaSO4 - H2O",
            "pure water, 1 atm",
            "gypsum-anhydrite transition temperature",
            Recipes.Temperatures("gypsum", "CaSO4 0.05 mol/kg", Grid(30, 70, 2)),
            TemperatureOfSaturation("anhydrite")
        );
        yield return Salt(
            "Li2CO3 - H2O",
            "closed to gas",
            "ratio of solubility at 50 C to that at 0 C",
            Recipes.Temperatures("lithium-carbonate", "Li2CO3 0.5 mol/kg", 0, 50),
            LastOverFirst("Li+")
        );
    }

    private static IEnumerable<PublishedCheck> Brines()
    {
        yield return Salt(
            "NaCl - H2O",
            "25 C, halite (needs a Pitzer model)",
            "dissolved NaCl",
            Recipes.Equilibrium("halite", "NaCl 7 mol/kg"),
            Molality("Na+")
        );
        yield return Salt(
            "KCl - H2O",
            "25 C, sylvite (needs a Pitzer model)",
            "dissolved KCl",
            Recipes.Equilibrium("sylvite", "KCl 6 mol/kg"),
            Molality("K+")
        );
    }

    private static IEnumerable<double> Grid(double from, double to, double step) =>
        Enumerable.Range(0, (int)Math.Round((to - from) / step) + 1).Select(i => from + (i * step));

    private static PublishedCheck Salt(
        string system,
        string conditions,
        string quantity,
        string recipe,
        Func<Outcome, double> read
    ) => new(PublishedChecks.Salts, system, conditions, quantity, recipe, read);
}
