using System.Collections.Immutable;
using System.Globalization;
using Bittern.Calculation;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Model;

namespace Bittern.Reports.Tests.Samples;

/// <summary>Bound recipes made without the language, for reports to be tried on. All data is invented.</summary>
internal static class SampleRecipes
{
    private static readonly SourceText Text = new(
        "adit.bittern",
        "// an invented recipe stands here\n"
    );
    private static readonly SourceSpan Span = new(Text, 0, 2);

    public static ReportStamp Stamp { get; } =
        new(
            "0.1.0",
            [
                FileHash.Of(Text),
                FileHash.Of(new SourceText("constants/site.bittern", "// constants\n")),
            ]
        );

    /// <summary>An invented adit discharge, limed in two stages; one limit is met, one fails, one depends on a detection limit.</summary>
    public static Recipe Adit()
    {
        var chemistry = SampleChemistry.Build();
        var adit = Adit(chemistry);
        var lime = Lime();
        var air = new Atmosphere
        {
            Name = "air",
            Pressures = [new PartialPressure(Formula("CO2(g)"), 4.2e-4, "4.2e-4 atm", Span)],
            Span = Span,
        };
        Species Solid(string name) =>
            chemistry.Solids.Single(s => string.Equals(s.Name, name, StringComparison.Ordinal));
        var primary = new Stage
        {
            Name = "primary",
            Actions =
            [
                new StageAction.Convert(
                    Formula("Fe^2+"),
                    [
                        new Term(1, Formula("Fe^3+")),
                        new Term(-1, Formula("H+")),
                        new Term(0.5, Formula("H2O")),
                    ],
                    "O2",
                    0.25,
                    AgentFromAir: true,
                    "4 Fe^2+ + O2 + 4 H+ = 4 Fe^3+ + 2 H2O",
                    Span
                ),
                new StageAction.AddUntil(
                    lime,
                    Condition(new Quantity.PH(), Comparison.Equal, 7.2, "pH = 7.2"),
                    null,
                    Span
                ),
            ],
            Forming = [Solid("ferrihydrite"), Solid("aluminium-hydroxide"), Solid("gypsum")],
            HeldBack = [new HeldBack(Solid("calcite"), "no nuclei in the first minutes", Span)],
            Contacts = [air],
            Settling = new Settling(0.99, "primary-sludge", 0.05, Span),
            Span = Span,
        };
        var zinc = new Quantity.Dissolved(
            "Zn",
            [new Term(1, Formula("Zn^2+"))],
            65.38,
            InMoles: false,
            WithSolids: false
        );
        var secondary = new Stage
        {
            Name = "secondary",
            Actions =
            [
                new StageAction.AddUntil(
                    lime,
                    Condition(
                        zinc,
                        Comparison.AtMost,
                        0.5e-3,
                        "dissolved(Zn) <= 0.5 mg/L",
                        "mg/L",
                        1e-3
                    ),
                    new Dose("5 g/L as Ca(OH)2", DoseKind.MassPerVolume, 5, Formula("Ca(OH)2")),
                    Span
                ),
            ],
            Forming =
            [
                Solid("zinc-hydroxide"),
                Solid("manganese-hydroxide"),
                Solid("gypsum"),
                Solid("calcite"),
                Solid("ferrihydrite"),
                Solid("aluminium-hydroxide"),
            ],
            Settling = new Settling(0.99, "secondary-sludge", null, Span),
            Span = Span,
        };
        var train = new Train
        {
            Name = "treatment",
            Feed = new Feed(adit, "40 m3/h", 40.0 / 3600, null, Span),
            Stages = [primary, secondary],
            Span = Span,
        };
        var limits = new LimitSet(
            "Discharge consent",
            train,
            [
                new Limit(
                    Condition(new Quantity.PH(), Comparison.Within, 6, "pH within 6.0 .. 9.0") with
                    {
                        Upper = 9,
                    },
                    null,
                    Span
                ),
                new Limit(
                    Condition(
                        zinc,
                        Comparison.AtMost,
                        0.5e-3,
                        "dissolved(Zn) <= 0.5 mg/L",
                        "mg/L",
                        1e-3
                    ),
                    null,
                    Span
                ),
                new Limit(
                    Condition(
                        Dissolved("Mn", "Mn^2+"),
                        Comparison.AtMost,
                        2e-3,
                        "dissolved(Mn) <= 2 mg/L",
                        "mg/L",
                        1e-3
                    ),
                    null,
                    Span
                ),
                new Limit(
                    Condition(
                        Dissolved("Cd", "Cd^2+"),
                        Comparison.AtMost,
                        4e-6,
                        "dissolved(Cd) <= 0.004 mg/L",
                        "mg/L",
                        1e-3
                    ),
                    null,
                    Span
                ),
                new Limit(
                    Condition(
                        new Quantity.SaturationIndex(Solid("gypsum")),
                        Comparison.AtMost,
                        0.3,
                        "SI(gypsum) <= 0.3"
                    ),
                    "scaling of the outfall",
                    Span
                ),
            ],
            Span
        );
        return new Recipe
        {
            Header = new RecipeHeader
            {
                Title = "Adit 4 discharge: two-stage lime treatment",
                Client = "Example client",
                Reference = "EX-0042",
                Revision = "B",
                TemperatureCelsius = 12,
                TemperatureAssumed = false,
                ActivityModel = "davies",
                ActivityModelAssumed = false,
            },
            Chemistry = chemistry,
            Liquors = [adit],
            Reagents = [lime],
            Atmospheres = [air],
            Trains = [train],
            LimitSets = [limits],
            ReportTexts =
            [
                new ReportText(
                    "The adit was sampled after a dry spell; **flows above 60 m3/h are not covered**.",
                    Span
                ),
            ],
            Sources = [Text],
        };
    }

    /// <summary>Two solutions mixed.</summary>
    public static Recipe Mixture(double calcium, double sulfate)
    {
        var chemistry = SampleChemistry.Build();
        var first = new Liquor
        {
            Name = "CaCl2 solution",
            Entries =
            [
                Entry(
                    "CaCl2",
                    calcium + " mol/L",
                    ConcentrationKind.MolesPerVolume,
                    calcium * 1000,
                    110.98,
                    ("Ca^2+", 1),
                    ("Cl-", 2)
                ),
            ],
            Span = Span,
        };
        var second = new Liquor
        {
            Name = "Na2SO4 solution",
            Entries =
            [
                Entry(
                    "Na2SO4",
                    sulfate + " mol/L",
                    ConcentrationKind.MolesPerVolume,
                    sulfate * 1000,
                    142.04,
                    ("Na+", 2),
                    ("SO4^2-", 1)
                ),
            ],
            Span = Span,
        };
        var train = new Train
        {
            Name = "mixture",
            IsMixture = true,
            Feed = new Feed(first, "250 mL", null, 250e-6, Span),
            Stages =
            [
                new Stage
                {
                    Name = "mixture",
                    FormsAny = true,
                    Forming = [.. chemistry.Solids.Where(s => s.HeldBackByDefault is null)],
                    Actions = [new StageAction.Blend(second, 0.6, Span)],
                    Span = Span,
                },
            ],
            Span = Span,
        };
        return new Recipe
        {
            Header = new RecipeHeader { Title = "Does it precipitate?" },
            Chemistry = chemistry,
            Liquors = [first, second],
            Trains = [train],
            Sources = [Text],
        };
    }

    public static Outcome Run(Recipe recipe) => RecipeRun.Execute(recipe, CancellationToken.None);

    public static Quantity Dissolved(string text, string basis) =>
        new Quantity.Dissolved(
            text,
            [new Term(1, Formula(basis))],
            Formula(basis).MolarMass,
            InMoles: false,
            WithSolids: false
        );

    public static Condition Condition(
        Quantity quantity,
        Comparison comparison,
        double value,
        string written,
        string unit = "",
        double factor = 1
    ) => new(quantity, comparison, value, null, written, unit, factor, Span);

    public static Formula Formula(string text) => FormulaReader.Standard.Read(text);

    private static Reagent Lime() =>
        new()
        {
            Name = "milk-of-lime",
            Entries =
            [
                Entry(
                    "Ca(OH)2",
                    "100 g/L",
                    ConcentrationKind.MassPerVolume,
                    100,
                    74.09,
                    ("Ca^2+", 1),
                    ("H2O", 2),
                    ("H+", -2)
                ),
            ],
            Purity = 0.93,
            Price = new ReagentPrice("0.14 EUR/kg", 0.14, "EUR", PerVolume: false),
            Span = Span,
        };

    private static Liquor Adit(ChemicalSystem chemistry)
    {
        _ = chemistry;
        var sulfate = Milligrams("SO4", "2350 mg/L", 2350, "SO4^2-");
        return new Liquor
        {
            Name = "adit",
            PH = 2.9,
            PHUncertainty = 0.05,
            Entries =
            [
                Milligrams("Fe(II)", "310 mg/L", 310, "Fe^2+"),
                Milligrams("Fe(III)", "95 mg/L", 95, "Fe^3+"),
                Milligrams("Al", "48 mg/L", 48, "Al^3+"),
                Milligrams("Zn", "41 mg/L ± 4 %", 41, "Zn^2+"),
                Milligrams("Mn", "12 mg/L", 12, "Mn^2+"),
                Milligrams("Cd", "< 0.01 mg/L", 0.01, "Cd^2+", BelowDetection.Half),
                Milligrams("Ca", "240 mg/L", 240, "Ca^2+"),
                Milligrams("Mg", "110 mg/L", 110, "Mg^2+"),
                Milligrams("Na", "35 mg/L", 35, "Na+"),
                sulfate,
                Milligrams("Cl", "22 mg/L", 22, "Cl-"),
            ],
            ChargeClosedBy = sulfate,
            Span = Span,
        };
    }

    private static AnalysisEntry Milligrams(
        string analyte,
        string written,
        double value,
        string ion,
        BelowDetection below = BelowDetection.No
    ) =>
        new(
            analyte,
            new Concentration(written, ConcentrationKind.MassPerVolume, value * 1e-3, null, below),
            Formula(ion).MolarMass,
            [new Term(1, Formula(ion))],
            Formula(ion).Charge,
            null,
            Span
        );

    private static AnalysisEntry Entry(
        string analyte,
        string written,
        ConcentrationKind kind,
        double si,
        double molarMass,
        params (string Ion, double Count)[] brings
    ) =>
        new(
            analyte,
            new Concentration(written, kind, si, null, BelowDetection.No),
            molarMass,
            [.. brings.Select(b => new Term(b.Count, Formula(b.Ion)))],
            null,
            null,
            Span
        );

    public static ImmutableArray<CultureInfo> Cultures { get; } =
    [
        CultureInfo.GetCultureInfo("de-DE"),
        CultureInfo.GetCultureInfo("tr-TR"),
        CultureInfo.GetCultureInfo("fa-IR"),
    ];
}
