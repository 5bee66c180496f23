using System.Collections.Immutable;
using System.Globalization;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Model;

namespace Bittern.Reports.Tests.Samples;

/// <summary>
/// A small bound chemistry for reports to be tried on. Constants are plausible and serve the layout only: nothing here checks them, and the citations are invented.
/// </summary>
internal static class SampleChemistry
{
    private static readonly SourceSpan Nowhere = new(new SourceText("sample.bittern", ""), 0, 0);

    public static Citation Handbook { get; } =
        new("handbook", "Invented handbook of constants, 3rd edition, table 4");

    public static Citation Review { get; } =
        new("review1999", "Invented review of hydroxides, J. Inv. Chem. 12, 34 (1999)");

    public static ChemicalSystem Build() =>
        new()
        {
            Basis =
            [
                .. "H+ Ca^2+ Mg^2+ Na+ Fe^2+ Fe^3+ Al^3+ Zn^2+ Mn^2+ Cd^2+ SO4^2- Cl- CO3^2-"
                    .Split(' ')
                    .Select(Ion),
            ],
            Complexes =
            [
                Complex("OH-", "H2O = OH- + H+", -14.0, 55.8),
                Complex("HSO4-", "SO4^2- + H+ = HSO4-", 1.988, 16.11),
                Complex("HCO3-", "CO3^2- + H+ = HCO3-", 10.329, -14.9),
                Complex("CO2(aq)", "CO3^2- + 2 H+ = CO2(aq) + H2O", 16.681, -24.0),
                Complex("CaSO4(aq)", "Ca^2+ + SO4^2- = CaSO4(aq)", 2.30, 6.9, recalled: true),
                Complex("CaOH+", "Ca^2+ + H2O = CaOH+ + H+", -12.78, 60.8),
                Complex("MgSO4(aq)", "Mg^2+ + SO4^2- = MgSO4(aq)", 2.37, 19.0),
                Complex("MgOH+", "Mg^2+ + H2O = MgOH+ + H+", -11.44, 66.7),
                Complex("FeSO4(aq)", "Fe^2+ + SO4^2- = FeSO4(aq)", 2.25, 13.5),
                Complex("FeSO4+", "Fe^3+ + SO4^2- = FeSO4+", 4.04, 16.4),
                Complex("FeOH^2+", "Fe^3+ + H2O = FeOH^2+ + H+", -2.19, 43.5),
                Complex("Fe(OH)2+", "Fe^3+ + 2 H2O = Fe(OH)2+ + 2 H+", -5.67, 71.5),
                Complex("Fe(OH)4-", "Fe^3+ + 4 H2O = Fe(OH)4- + 4 H+", -21.6, null),
                Complex("AlOH^2+", "Al^3+ + H2O = AlOH^2+ + H+", -5.0, 48.1),
                Complex("Al(OH)2+", "Al^3+ + 2 H2O = Al(OH)2+ + 2 H+", -10.1, null),
                Complex("Al(OH)4-", "Al^3+ + 4 H2O = Al(OH)4- + 4 H+", -22.7, 177),
                Complex("AlSO4+", "Al^3+ + SO4^2- = AlSO4+", 3.5, 9.6),
                Complex("ZnSO4(aq)", "Zn^2+ + SO4^2- = ZnSO4(aq)", 2.37, 5.6),
                Complex("ZnOH+", "Zn^2+ + H2O = ZnOH+ + H+", -8.96, 55.8),
                Complex("Zn(OH)2(aq)", "Zn^2+ + 2 H2O = Zn(OH)2(aq) + 2 H+", -16.9, null),
                Complex("Zn(OH)3-", "Zn^2+ + 3 H2O = Zn(OH)3- + 3 H+", -28.4, null),
                Complex("Zn(OH)4^2-", "Zn^2+ + 4 H2O = Zn(OH)4^2- + 4 H+", -41.2, null),
                Complex("MnSO4(aq)", "Mn^2+ + SO4^2- = MnSO4(aq)", 2.25, 14.1),
                Complex("MnOH+", "Mn^2+ + H2O = MnOH+ + H+", -10.59, 60.3),
                Complex("CdSO4(aq)", "Cd^2+ + SO4^2- = CdSO4(aq)", 2.46, 9.6),
            ],
            Solids =
            [
                Solid(
                    "gypsum",
                    "CaSO4·2H2O",
                    "CaSO4·2H2O = Ca^2+ + SO4^2- + 2 H2O",
                    -4.58,
                    -0.5,
                    ConstantForm.LogKsp
                ) with
                { },
                WithOverride(
                    Solid(
                        "ferrihydrite",
                        "Fe(OH)3",
                        "Fe(OH)3 + 3 H+ = Fe^3+ + 3 H2O",
                        3.6,
                        null,
                        ConstantForm.LogK
                    )
                ),
                Solid(
                    "aluminium-hydroxide",
                    "Al(OH)3",
                    "Al(OH)3 + 3 H+ = Al^3+ + 3 H2O",
                    9.7,
                    -105,
                    ConstantForm.LogK
                ),
                Solid(
                    "zinc-hydroxide",
                    "Zn(OH)2",
                    "Zn(OH)2 + 2 H+ = Zn^2+ + 2 H2O",
                    12.45,
                    null,
                    ConstantForm.LogK,
                    from: 20,
                    to: 30
                ),
                Solid(
                    "manganese-hydroxide",
                    "Mn(OH)2",
                    "Mn(OH)2 + 2 H+ = Mn^2+ + 2 H2O",
                    15.2,
                    -97,
                    ConstantForm.LogK
                ),
                Solid(
                    "calcite",
                    "CaCO3",
                    "CaCO3 = Ca^2+ + CO3^2-",
                    -8.48,
                    -9.6,
                    ConstantForm.LogKsp
                ),
                Solid(
                    "goethite",
                    "FeOOH",
                    "FeOOH + 3 H+ = Fe^3+ + 2 H2O",
                    0.33,
                    -60,
                    ConstantForm.LogK
                ) with
                {
                    HeldBackByDefault = "months to years at ambient temperature (common practice)",
                },
                Solid(
                    "schwertmannite",
                    "Fe8O8(OH)4.8(SO4)1.6",
                    "Fe8O8(OH)4.8(SO4)1.6 + 20.8 H+ = 8 Fe^3+ + 1.6 SO4^2- + 12.8 H2O",
                    18.8,
                    null,
                    ConstantForm.LogK
                ) with
                {
                    Doubt = "published values span eight decades",
                },
            ],
            Gases = [Gas("CO2(g)", "CO2(g) + H2O = CO3^2- + 2 H+", -18.149, 4.0)],
        };

    public static Species Ion(string formula) =>
        new()
        {
            Name = formula,
            Formula = FormulaReader.Standard.Read(formula),
            Kind = SpeciesKind.Basis,
            FromBasis = [new Term(1, FormulaReader.Standard.Read(formula))],
            Span = Nowhere,
        };

    private static Species Complex(
        string formula,
        string reaction,
        double log10K,
        double? enthalpy,
        bool recalled = false
    ) =>
        Make(
            formula,
            formula,
            reaction,
            SpeciesKind.Complex,
            Constant(log10K, enthalpy, ConstantForm.LogK, recalled),
            1
        );

    public static Species Solid(
        string name,
        string formula,
        string reaction,
        double log10K,
        double? enthalpy,
        ConstantForm form,
        double? from = null,
        double? to = null
    ) =>
        Make(
            name,
            formula,
            reaction,
            SpeciesKind.Solid,
            Constant(log10K, enthalpy, form, false) with
            {
                ValidFromCelsius = from,
                ValidToCelsius = to,
            },
            -1
        );

    private static Species Gas(string formula, string reaction, double log10K, double? enthalpy) =>
        Make(
            formula,
            formula,
            reaction,
            SpeciesKind.Gas,
            Constant(log10K, enthalpy, ConstantForm.LogK, false),
            -1
        );

    private static EquilibriumConstant Constant(
        double log10K,
        double? enthalpy,
        ConstantForm form,
        bool recalled
    ) =>
        new(
            new TemperatureFunction.VantHoff(log10K, enthalpy),
            form,
            0.05,
            0,
            90,
            recalled ? Review : Handbook,
            recalled
        );

    private static Species WithOverride(Species species) =>
        species with
        {
            Override = new Override(
                Constant(4.3, null, ConstantForm.LogK, recalled: true),
                "fresh floc, own titrations | notebook 22",
                Nowhere
            ),
        };

    private static Species Make(
        string name,
        string formula,
        string reaction,
        SpeciesKind kind,
        EquilibriumConstant constant,
        double share
    )
    {
        var sides = reaction.Split(" = ");
        var written = new Reaction(Side(sides[0]), Side(sides[1]));
        var own = FormulaReader.Standard.Read(formula);
        var dissolves = written.Left.Any(t => t.Species.Equals(own));
        var (with, against) = dissolves
            ? (written.Right, written.Left)
            : (written.Left, written.Right);
        return new Species
        {
            Name = name,
            Formula = own,
            Kind = kind,
            Written = written,
            Constant = constant,
            FromBasis =
            [
                .. with,
                .. against
                    .Where(t => !t.Species.Equals(own))
                    .Select(t => t with { Coefficient = -t.Coefficient }),
            ],
            FormationConstants = [new ConstantShare(name, constant, share)],
            Span = Nowhere,
        };
    }

    private static ImmutableArray<Term> Side(string text) =>
        [
            .. text.Split(" + ")
                .Select(part =>
                {
                    var space = part.IndexOf(' ', StringComparison.Ordinal);
                    return space < 0
                        ? new Term(1, FormulaReader.Standard.Read(part))
                        : new Term(
                            double.Parse(part.AsSpan(0, space), CultureInfo.InvariantCulture),
                            FormulaReader.Standard.Read(part[(space + 1)..])
                        );
                }),
        ];
}
