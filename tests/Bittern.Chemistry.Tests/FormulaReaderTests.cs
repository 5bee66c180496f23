using CsCheck;
using Xunit;

namespace Bittern.Chemistry.Tests;

public sealed class FormulaReaderTests
{
    // Handbook molar masses (CRC Handbook, Physical Constants of Inorganic Compounds; recalled), two decimals; 5 in 100,000 covers the
    // weights revised since (S was 32.065).
    [Theory]
    [InlineData("H2O", 18.015)]
    [InlineData("CaSO4·2H2O", 172.17)]
    [InlineData("CaSO4*2H2O", 172.17)]
    [InlineData("CaSO4·0.5H2O", 145.15)]
    [InlineData("CaCO3", 100.09)]
    [InlineData("Ca(OH)2", 74.09)]
    [InlineData("Mg(OH)2", 58.32)]
    [InlineData("Fe(OH)3", 106.87)]
    [InlineData("NaCl", 58.44)]
    [InlineData("Na2CO3·10H2O", 286.14)]
    [InlineData("KAl(SO4)2·12H2O", 474.39)]
    [InlineData("Al2(SO4)3·18H2O", 666.43)]
    [InlineData("KFe3(SO4)2(OH)6", 500.81)]
    [InlineData("Ca6Al2(SO4)3(OH)12·26H2O", 1255.11)]
    [InlineData("Ca5(PO4)3OH", 502.31)]
    [InlineData("Mg(NH4)PO4·6H2O", 245.41)]
    [InlineData("Na2B4O7·10H2O", 381.37)]
    [InlineData("K4[Fe(CN)6]·3H2O", 422.39)]
    [InlineData("BaSO4", 233.39)]
    [InlineData("CO2(g)", 44.009)]
    [InlineData("SO4^2-", 96.06)]
    [InlineData("C10H12N2O8^4-", 288.21)]
    public void Molar_mass_agrees_with_the_handbook(string text, double gramsPerMole) =>
        Assert.Equal(
            gramsPerMole,
            FormulaReader.Standard.Read(text).MolarMass,
            0.005 + (5e-5 * gramsPerMole)
        );

    [Theory]
    [InlineData("Na+", 1)]
    [InlineData("Cl-", -1)]
    [InlineData("Ca^2+", 2)]
    [InlineData("SO4^2-", -2)]
    [InlineData("Zn(OH)4^2-", -2)]
    [InlineData("[Fe(CN)6]^4-", -4)]
    [InlineData("Al13O4(OH)24^7+", 7)]
    [InlineData("PW12O40^12-", -12)]
    [InlineData("CaSO4(aq)", 0)]
    [InlineData("e-", -1)]
    [InlineData("HCO3-", -1)]
    [InlineData("NH4+", 1)]
    public void Charge_is_read(string text, int charge) =>
        Assert.Equal(charge, FormulaReader.Standard.Read(text).Charge);

    [Theory]
    [InlineData("Na^1+", "Na+")]
    [InlineData("Cl^1-", "Cl-")]
    [InlineData("SO4^2\u2212", "SO4^2-")]
    [InlineData("Cl\u2212", "Cl-")]
    [InlineData("CaSO4*2H2O", "CaSO4·2H2O")]
    [InlineData("CaSO4\u22C52H2O", "CaSO4·2H2O")]
    [InlineData("Ca^2+(aq)", "Ca^2+")]
    [InlineData("Na^1+(aq)", "Na+")]
    [InlineData("H+(aq)", "H+")]
    [InlineData("CO2(aq)", "CO2(aq)")]
    public void Spellings_of_one_species_are_equal(string written, string canonical)
    {
        var formula = FormulaReader.Standard.Read(written);
        Assert.Equal(canonical, formula.Text);
        Assert.Equal(FormulaReader.Standard.Read(canonical), formula);
        Assert.Equal(FormulaReader.Standard.Read(canonical).GetHashCode(), formula.GetHashCode());
    }

    [Theory]
    [InlineData("CO2(aq)", PhaseMark.Aqueous)]
    [InlineData("CO2(g)", PhaseMark.Gas)]
    [InlineData("NaCl(s)", PhaseMark.Solid)]
    [InlineData("H2O(l)", PhaseMark.Liquid)]
    [InlineData("NaCl", PhaseMark.None)]
    [InlineData("Ca^2+(aq)", PhaseMark.None)]
    public void Phase_mark_is_read(string text, PhaseMark phase) =>
        Assert.Equal(phase, FormulaReader.Standard.Read(text).Phase);

    [Fact]
    public void Nested_brackets_multiply()
    {
        var formula = FormulaReader.Standard.Read("Co[Cr(C2O4)2(OH)2]3·1.5H2O");
        Assert.Equal(1, formula.AtomsOf("Co"));
        Assert.Equal(3, formula.AtomsOf("Cr"));
        Assert.Equal(12, formula.AtomsOf("C"));
        Assert.Equal((3 * (8 + 2)) + 1.5, formula.AtomsOf("O"));
        Assert.Equal(6 + 3, formula.AtomsOf("H"));
        Assert.Equal(0, formula.AtomsOf("N"));
    }

    [Theory]
    [InlineData("H2O", true)]
    [InlineData("H2O(l)", true)]
    [InlineData("H2O(g)", false)]
    [InlineData("H2O2", false)]
    [InlineData("OH-", false)]
    public void Water_is_known(string text, bool water) =>
        Assert.Equal(water, FormulaReader.Standard.Read(text).IsWater);

    [Theory]
    [InlineData("", 0, "a formula is missing")]
    [InlineData("Cz", 0, "'Cz' is no element")]
    [InlineData("CaXy2", 2, "'Xy' is no element")]
    [InlineData("ca", 0, "'c' does not start an element symbol")]
    [InlineData("Ca+2", 2, "a charge is written at the end, as ^2+ or ^3-")]
    [InlineData("SO4-2", 3, "a charge is written at the end, as ^2+ or ^3-")]
    [InlineData("Fe+++", 2, "a charge is written at the end, as ^2+ or ^3-")]
    [InlineData("Ca^2", 2, "a charge is written ^2+ or ^3-")]
    [InlineData("Ca^+", 2, "a charge is written ^2+ or ^3-")]
    [InlineData("Ca^0+", 2, "a charge is written ^2+ or ^3-")]
    [InlineData("Ca^02+", 2, "a charge is written ^2+ or ^3-")]
    [InlineData("Ca^2+X", 2, "a charge is written ^2+ or ^3-")]
    [InlineData("(OH-)2", 3, "'-' does not belong in a formula here")]
    [InlineData("Fe(OH", 2, "'(' is not closed")]
    [InlineData("Fe(O[H)2]", 4, "'[' is not closed")]
    [InlineData("FeOH)", 4, "')' does not belong in a formula here")]
    [InlineData("Fe()2", 2, "the brackets hold no element")]
    [InlineData("CaSO4·", 6, "the formula ends too early")]
    [InlineData("·H2O", 0, "'·' does not belong in a formula here")]
    [InlineData("2H2O", 0, "'2' does not start an element symbol")]
    [InlineData("H0", 1, "a count lies between 0 and 9999, zero left out")]
    [InlineData("CaSO4·0H2O", 6, "a count lies between 0 and 9999, zero left out")]
    [InlineData("C99999", 1, "a count lies between 0 and 9999, zero left out")]
    [InlineData("H02", 1, "a count has no leading zero")]
    [InlineData(
        "Fe(III)",
        2,
        "(III) is an oxidation state, which a formula does not carry: write the ion"
    )]
    [InlineData(
        "Cr(VI)",
        2,
        "(VI) is an oxidation state, which a formula does not carry: write the ion"
    )]
    [InlineData(
        "Na+(g)",
        3,
        "an ion is dissolved: a charge has no place on a gas, a solid or a pure liquid"
    )]
    [InlineData("+", 0, "no element symbol found")]
    [InlineData("(aq)", 1, "'a' does not start an element symbol")]
    [InlineData("CO2(aq)(g)", 4, "'a' does not start an element symbol")]
    [InlineData("Na Cl", 2, "' ' does not start an element symbol")]
    [InlineData("\uD83D\uDE00", 0, "'\uD83D\uDE00' does not start an element symbol")]
    public void A_text_that_is_no_formula_is_explained(string text, int offset, string message)
    {
        Assert.False(FormulaReader.Standard.TryRead(text, out var formula, out var fault));
        Assert.Null(formula);
        Assert.Equal((offset, message), (fault!.Offset, fault.Message));
    }

    [Fact]
    public void Half_a_surrogate_pair_does_not_garble_the_message()
    {
        FormulaReader.Standard.TryRead("\uD83D", out _, out var fault);
        Assert.Equal("'U+D83D' does not start an element symbol", fault!.Message);
    }

    [Fact]
    public void An_unknown_symbol_is_named_for_suggestions()
    {
        FormulaReader.Standard.TryRead("CaXy2", out _, out var fault);
        Assert.Equal("Xy", fault!.UnknownSymbol);
        Assert.Equal(2, fault.Length);
    }

    [Fact]
    public void A_pseudo_element_is_read_by_the_reader_that_knows_it()
    {
        var reader = FormulaReader.Standard.With(new Element("Hum", "humic ligand", 500));
        Assert.Equal(500 + 40.078, reader.Read("CaHum").MolarMass, 1e-9);
        Assert.False(FormulaReader.Standard.TryRead("CaHum", out _, out _));
    }

    [Fact]
    public void Deep_nesting_is_refused_and_does_not_overflow()
    {
        Assert.True(
            FormulaReader.Standard.TryRead(
                new string('(', 12) + "H" + new string(')', 12),
                out _,
                out _
            )
        );
        Assert.False(
            FormulaReader.Standard.TryRead(
                new string('(', 13) + "H" + new string(')', 13),
                out _,
                out _
            )
        );
        Assert.False(FormulaReader.Standard.TryRead(new string('(', 10_000), out _, out _));
    }

    [Fact]
    public void Any_string_is_read_or_explained() => Gen.String.Sample(Check, iter: 20_000);

    [Fact]
    public void Any_string_of_formula_characters_is_read_or_explained() =>
        Gen.String[Gen.Char["CaSOHe()[]^+-·*0123456789.2gaqls VIM"], 0, 24]
            .Sample(Check, iter: 50_000);

    [Fact]
    public void Reading_the_canonical_text_gives_the_same_formula() =>
        Gen.String[Gen.Char["CaSOH()^+-·23"], 1, 12]
            .Sample(
                text =>
                {
                    if (!FormulaReader.Standard.TryRead(text, out var formula, out _))
                    {
                        return;
                    }

                    var again = FormulaReader.Standard.Read(formula!.Text);
                    Assert.Equal(formula, again);
                    Assert.True(formula.SameCompositionAs(again));
                    Assert.Equal(formula.MolarMass, again.MolarMass);
                },
                iter: 50_000
            );

    private static void Check(string text)
    {
        var read = FormulaReader.Standard.TryRead(text, out var formula, out var fault);
        Assert.Equal(read, formula is not null);
        Assert.Equal(read, fault is null);
        if (formula is not null)
        {
            Assert.True(double.IsFinite(formula.MolarMass) && formula.MolarMass >= 0);
            Assert.All(formula.Atoms.Values, count => Assert.True(count > 0));
        }
        else
        {
            Assert.InRange(fault!.Offset, 0, text.Length);
            Assert.NotEmpty(fault.Message);
        }
    }
}
