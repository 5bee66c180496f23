using System.Globalization;
using static Bittern.Calculation.Tests.Validation.Readings;

namespace Bittern.Calculation.Tests.Validation;

/// <summary>Metal hydroxides, treatment, and catalogue constants beside other publications.</summary>
internal static class MetalChecks
{
    public static IEnumerable<PublishedCheck> All =>
        [.. Hydroxides(), .. Treatment(), .. Constants()];

    private static IEnumerable<PublishedCheck> Hydroxides()
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

    private static IEnumerable<PublishedCheck> Treatment()
    {
        // Manganese stays in solution here: the tool does not oxidise it to a solid without a manganese(IV) species, 2 % of the acidity.
        const string Acid =
            "pH 2.90; Fe(II) 310 mg/L; Fe(III) 95 mg/L; Mn 12 mg/L; Al 48 mg/L; SO4 1000 mg/L; charge closed by SO4";
        yield return Metal(
            "full neutralisation against the formula",
            "the second acidity row as a liquor, oxidised and titrated to pH 8.3 with ferrihydrite, Al(OH)3 and MnO2 formed, CO2 driven off",
            "base demand over formula acidity",
            Recipes.Neutralisation("ferrihydrite, aluminium-hydroxide", Acid, "pH = 8.3"),
            BaseOver(1159.5)
        );
        yield return Metal(
            "scorodite",
            "22 C; pH 5; incongruent with ferrihydrite",
            "dissolved As",
            Recipes.Titration(22, "scorodite, ferrihydrite", "FeAsO4·2H2O 0.01 mol/kg", "pH = 5"),
            MilligramsPerLitre("As", "AsO4^3-")
        );
        yield return Metal(
            "cerussite + hydrocerussite",
            "25 C",
            "log10 p(CO2)/bar where both coexist",
            Recipes.Equilibrium("cerussite, hydrocerussite", "PbCO3 0.01 mol/kg; PbO 0.002 mol/kg"),
            Log10Bar("CO2(g)")
        );
    }

    // Catalogue constants beside publications other than their own source.
    private static IEnumerable<PublishedCheck> Constants()
    {
        const string Irons = "FeSO4 0.001 mol/kg; Fe2(SO4)3 0.0005 mol/kg";
        yield return Metal(
            "siderite",
            "25 C",
            "log Ksp",
            Recipes.Equilibrium("", "FeCO3 0.0001 mol/kg"),
            Constant("siderite")
        );
        yield return Metal(
            "calcite-rhodochrosite end members",
            "25 C",
            "log Ksp of MnCO3, precipitated",
            Recipes.Equilibrium("", "MnCO3 0.0001 mol/kg"),
            Constant("rhodochrosite-precipitated")
        );
        yield return Metal(
            "schwertmannite",
            "acid pit lakes; pH near 3",
            "log K for x near 1.6",
            Recipes.Equilibrium("", Irons),
            Constant("schwertmannite")
        );
        yield return Metal(
            "Cr(VI)",
            "25 C; I = 0; dilute",
            "pH where HCrO4- and CrO4^2- are equal",
            Recipes.Equilibrium("", "K2CrO4 0.0001 mol/kg"),
            Formation("HCrO4-")
        );
        yield return Metal(
            "Fe3+/Fe2+",
            "25 C; I = 0; equal activities",
            "Eh",
            Recipes.Equilibrium("", Irons),
            StandardPotential("Fe^3+", "Fe^2+")
        );
        yield return Metal(
            "Fe3+/Fe2+",
            "25 C; I = 0; equal activities",
            "pe",
            Recipes.Equilibrium("", Irons),
            StandardPe("Fe^3+", "Fe^2+")
        );
    }

    private static PublishedCheck Metal(
        string system,
        string conditions,
        string quantity,
        string recipe,
        Func<Outcome, double> read
    ) => new(PublishedChecks.Metals, system, conditions, quantity, recipe, read);

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
