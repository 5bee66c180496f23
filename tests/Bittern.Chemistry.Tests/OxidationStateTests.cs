using Xunit;

namespace Bittern.Chemistry.Tests;

public sealed class OxidationStateTests
{
    [Theory]
    [InlineData("Fe(III)", "Fe", 3)]
    [InlineData("Fe(II)", "Fe", 2)]
    [InlineData("As(V)", "As", 5)]
    [InlineData("Cr(VI)", "Cr", 6)]
    [InlineData("Mn(VII)", "Mn", 7)]
    [InlineData("Os(VIII)", "Os", 8)]
    [InlineData("Mn(IV)", "Mn", 4)]
    [InlineData("Cu(I)", "Cu", 1)]
    [InlineData("S(-II)", "S", -2)]
    [InlineData("N(-III)", "N", -3)]
    [InlineData("Se(0)", "Se", 0)]
    public void A_token_is_read_and_written_back(string text, string symbol, int state)
    {
        Assert.True(OxidationState.TryRead(text, out var s, out var n));
        Assert.Equal((symbol, state), (s, n));
        Assert.Equal(text, OxidationState.Text(s, n));
    }

    [Theory]
    [InlineData("")]
    [InlineData("Fe")]
    [InlineData("Fe(3)")]
    [InlineData("Fe(iii)")]
    [InlineData("Fe(IIII)")]
    [InlineData("Fe()")]
    [InlineData("Fe(")]
    [InlineData("Fe(-)")]
    [InlineData("Fe(-0)")]
    [InlineData("Xx(II)")]
    [InlineData("(II)")]
    [InlineData("Fe(II) ")]
    [InlineData("Fe(OH)")]
    [InlineData(")")]
    public void Anything_else_is_not(string text) =>
        Assert.False(OxidationState.TryRead(text, out _, out _));

    [Theory]
    [InlineData("Fe^3+", "Fe", 3)]
    [InlineData("Fe^2+", "Fe", 2)]
    [InlineData("Hg2^2+", "Hg", 1)]
    [InlineData("Cl-", "Cl", -1)]
    [InlineData("SO4^2-", "S", 6)]
    [InlineData("SO3^2-", "S", 4)]
    [InlineData("HS-", "S", -2)]
    [InlineData("S2O3^2-", "S", 2)]
    [InlineData("CrO4^2-", "Cr", 6)]
    [InlineData("Cr2O7^2-", "Cr", 6)]
    [InlineData("MnO4-", "Mn", 7)]
    [InlineData("H3AsO3(aq)", "As", 3)]
    [InlineData("H2AsO4-", "As", 5)]
    [InlineData("NO3-", "N", 5)]
    [InlineData("NO2-", "N", 3)]
    [InlineData("NH4+", "N", -3)]
    [InlineData("HCO3-", "C", 4)]
    [InlineData("CH4(aq)", "C", -4)]
    [InlineData("H4SiO4(aq)", "Si", 4)]
    [InlineData("UO2^2+", "U", 6)]
    [InlineData("Fe(OH)2+", "Fe", 3)]
    [InlineData("FeOH+", "Fe", 2)]
    [InlineData("O2(aq)", "O", 0)]
    [InlineData("H2O", "O", -2)]
    [InlineData("H2O2(aq)", "O", -1)]
    [InlineData("OH-", "H", 1)]
    [InlineData("H2(g)", "H", 0)]
    [InlineData("SO4^2-", "O", -2)]
    [InlineData("HS-", "H", 1)]
    public void A_simple_species_implies_the_state(string formula, string symbol, int state) =>
        Assert.Equal(state, OxidationState.In(FormulaReader.Standard.Read(formula), symbol));

    [Theory]
    [InlineData("CN-", "C")]
    [InlineData("SCN-", "S")]
    [InlineData("CaSO4(aq)", "S")]
    [InlineData("Fe3O4", "Fe")]
    [InlineData("S4O6^2-", "S")]
    [InlineData("SO4^2-", "Fe")]
    [InlineData("CaSO4(aq)", "O")]
    [InlineData("e-", "O")]
    public void An_ambiguous_species_implies_none(string formula, string symbol) =>
        Assert.Null(OxidationState.In(FormulaReader.Standard.Read(formula), symbol));
}
