using System.Globalization;
using static Bittern.Calculation.Tests.Validation.Readings;

namespace Bittern.Calculation.Tests.Validation;

/// <summary>
/// Every published row that a dilute-solution model can be asked for, with its recipe. Rows are chosen by whether the catalogue has the
/// substances, never by the outcome.
/// </summary>
internal static class PublishedChecks
{
    /// <summary>The table of pH standards.</summary>
    public const string Buffers = "ph-standards.csv";

    private const string Salts = "solubility-checks.csv";
    private const string MetalTable = "metal-checks.csv";

    public static IReadOnlyList<PublishedCheck> All { get; } =
    [.. Solubility(), .. Metals(), .. Standards()];

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

    private static IEnumerable<PublishedCheck> Metals()
    {
        const string Low = "25 C; low ionic strength";
        const string Start = "25 C; metal 0.01 mol/L; low ionic strength";
        const string Falls = "pH where dissolved metal falls below 1e-5 mol/L";
        (string Row, string Solid, string Salt, string Metal)[] hydroxides =
        [
            (
                "ferrous-hydroxide",
                "ferrous-hydroxide",
                "Fe(II) 0.01 mol/L; NO3 0.02 mol/L",
                "Fe(II)"
            ),
            ("manganese-hydroxide", "manganese-hydroxide", "Mn(NO3)2 0.01 mol/L", "Mn"),
            ("zinc-hydroxide-epsilon", "zinc-hydroxide-epsilon", "Zn(NO3)2 0.01 mol/L", "Zn"),
            ("cobalt-hydroxide", "cobalt-hydroxide", "Co(NO3)2 0.01 mol/L", "Co"),
            ("nickel-hydroxide-fresh", "nickel-hydroxide", "Ni(NO3)2 0.01 mol/L", "Ni"),
            ("cadmium-hydroxide", "cadmium-hydroxide", "Cd(NO3)2 0.01 mol/L", "Cd"),
            ("silver-oxide", "silver-oxide", "AgNO3 0.01 mol/L", "Ag"),
        ];
        foreach (var (row, solid, salt, metal) in hydroxides)
        {
            yield return Metal(
                row,
                Start,
                "pH where precipitation starts",
                Recipes.Titration(solid, salt, "pH = 11"),
                OnsetPH(solid)
            );
            yield return Metal(
                row,
                Low,
                Falls,
                Recipes.Titration(solid, salt, $"dissolved({metal}) <= 1e-5 mol/L"),
                PH
            );
        }

        yield return Metal(
            "aluminium-hydroxide-amorphous",
            "25 C; metal 0.01 mol/L; without the Al13 Keggin ion",
            "pH where precipitation starts",
            Recipes.Titration("aluminium-hydroxide", "Al(NO3)3 0.01 mol/L", "pH = 7"),
            OnsetPH("aluminium-hydroxide")
        );
        yield return Metal(
            "ferrihydrite-field",
            "25 C; Fe(III) 0.01 mol/L",
            "pH where precipitation starts",
            Recipes.Titration("ferrihydrite-field", "Fe(III) 0.01 mol/L; NO3 0.08 mol/L", "pH = 5"),
            OnsetPH("ferrihydrite-field")
        );

        const string NoCarbonate = "25 C; no carbonate";
        yield return Minimum(
            "zinc-hydroxide-epsilon",
            "zinc-hydroxide-epsilon",
            NoCarbonate,
            "Zn(NO3)2 0.001 mol/L",
            8.25,
            10.5,
            "Zn^2+"
        );
        yield return Minimum(
            "copper-hydroxide",
            "copper-hydroxide",
            NoCarbonate,
            "Cu(NO3)2 0.001 mol/L",
            7.75,
            10.5,
            "Cu^2+"
        );
        yield return Minimum(
            "nickel-hydroxide",
            "nickel-hydroxide-beta",
            NoCarbonate,
            "Ni(NO3)2 0.001 mol/L",
            9.5,
            11.25,
            "Ni^2+"
        );
        yield return Minimum(
            "cadmium-hydroxide",
            "cadmium-hydroxide",
            NoCarbonate,
            "Cd(NO3)2 0.001 mol/L",
            9.5,
            13,
            "Cd^2+"
        );
        yield return Minimum(
            "gibbsite",
            "gibbsite",
            "25 C",
            "Al(NO3)3 0.001 mol/L",
            5.25,
            7.25,
            "Al^3+"
        );
        yield return Minimum(
            "ferrihydrite",
            "ferrihydrite",
            "25 C",
            "Fe(III) 0.001 mol/L; NO3 0.004 mol/L",
            7,
            9.25,
            "Fe^3+"
        );
        yield return Minimum(
            "litharge",
            "litharge",
            NoCarbonate,
            "Pb(NO3)2 0.001 mol/L",
            9,
            11.5,
            "Pb^2+"
        );
        yield return Metal(
            "mercury-oxide",
            "25 C; pure water",
            "solubility of HgO",
            Recipes.Equilibrium("mercury-oxide", "HgO 0.001 mol/kg"),
            MilligramsPerLitre("HgO", "Hg^2+")
        );
        yield return Metal(
            "chlorargyrite",
            "25 C; pure water",
            "solubility of AgCl",
            Recipes.Equilibrium("chlorargyrite", "AgCl 0.0001 mol/kg"),
            MilligramsPerLitre("AgCl", "Ag+")
        );
        yield return Metal(
            "anglesite",
            "25 C; pure water",
            "solubility of PbSO4",
            Recipes.Equilibrium("anglesite", "PbSO4 0.001 mol/kg"),
            MilligramsPerLitre("PbSO4", "Pb^2+")
        );
        yield return Metal(
            "cotunnite",
            "25 C; pure water",
            "solubility of PbCl2",
            Recipes.Equilibrium("cotunnite", "PbCl2 0.06 mol/kg"),
            GramsPerKilogram("PbCl2", "Pb^2+")
        );
    }

    private static IEnumerable<PublishedCheck> Standards()
    {
        const string Iupac = "NBS=IUPAC2002";
        const string ToFifty = "NBS=IUPAC2002 to 50 C";
        (string Standard, string Set, string Entries)[] buffers =
        [
            ("tetroxalate", "NBS", "KH3(C2O4)2·2H2O 0.05 mol/kg"),
            ("phthalate", "IUPAC2002", "KHC8H4O4 0.05 mol/kg"),
            ("citrate", "NBS", "KH2C6H5O7 0.05 mol/kg"),
            ("phosphate", ToFifty, "KH2PO4 0.025 mol/kg; Na2HPO4 0.025 mol/kg"),
            ("phosphate 1:3.5", Iupac, "KH2PO4 0.008695 mol/kg; Na2HPO4 0.03043 mol/kg"),
            ("borax", ToFifty, "Na2B4O7·10H2O 0.01 mol/kg"),
            ("carbonate", Iupac, "NaHCO3 0.025 mol/kg; Na2CO3 0.025 mol/kg"),
            ("calcium hydroxide", "NBS", "Ca(OH)2 0.0203 mol/kg"),
        ];
        foreach (var (standard, set, entries) in buffers)
        {
            foreach (var celsius in new[] { 10, 25, 40 })
            {
                yield return new PublishedCheck(
                    Buffers,
                    standard,
                    string.Create(CultureInfo.InvariantCulture, $"{celsius} C"),
                    $"pH(S), {set}",
                    Recipes.Equilibrium("", entries, celsius),
                    PH
                );
            }
        }
    }

    private static PublishedCheck Salt(
        string system,
        string conditions,
        string quantity,
        string recipe,
        Func<Outcome, double> read
    ) => new(Salts, system, conditions, quantity, recipe, read);

    private static PublishedCheck Metal(
        string system,
        string conditions,
        string quantity,
        string recipe,
        Func<Outcome, double> read
    ) => new(MetalTable, system, conditions, quantity, recipe, read);

    // Located on a grid of a quarter of a pH unit, well inside the tolerance of every row.
    private static PublishedCheck Minimum(
        string row,
        string solid,
        string conditions,
        string salt,
        double from,
        double to,
        string basis
    )
    {
        var targets = Enumerable
            .Range(0, (int)Math.Round((to - from) * 4) + 1)
            .Select(i =>
                string.Create(CultureInfo.InvariantCulture, $"pH = {from + (0.25 * i):0.00}")
            );
        return Metal(
            row,
            conditions,
            "pH of minimum solubility",
            Recipes.Titration(solid, salt, targets),
            PHOfMinimum(basis)
        );
    }
}
