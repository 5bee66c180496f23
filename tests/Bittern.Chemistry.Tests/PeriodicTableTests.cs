using Xunit;

namespace Bittern.Chemistry.Tests;

public sealed class PeriodicTableTests
{
    [Fact]
    public void There_are_118_elements_with_distinct_symbols_and_names()
    {
        Assert.Equal(118, PeriodicTable.Elements.Length);
        Assert.Equal(118, PeriodicTable.BySymbol.Count);
        Assert.Equal(
            118,
            PeriodicTable.Elements.Select(e => e.Name).Distinct(StringComparer.Ordinal).Count()
        );
        Assert.All(PeriodicTable.Elements, e => Assert.Matches("^[A-Z][a-z]?$", e.Symbol));
    }

    [Theory]
    [InlineData("H", 1)]
    [InlineData("Ne", 10)]
    [InlineData("Fe", 26)]
    [InlineData("Ag", 47)]
    [InlineData("La", 57)]
    [InlineData("Hf", 72)]
    [InlineData("Pb", 82)]
    [InlineData("U", 92)]
    [InlineData("Og", 118)]
    public void Atomic_numbers_follow_from_the_order(string symbol, int number) =>
        Assert.Equal(number, PeriodicTable.BySymbol[symbol].AtomicNumber);

    // The familiar exceptions to rising weight: a swapped row would show up here.
    [Fact]
    public void Standard_weights_rise_with_atomic_number_but_for_the_known_pairs()
    {
        var falls = PeriodicTable
            .Elements.Where(e => !e.IsMassNumber)
            .Zip(PeriodicTable.Elements.Where(e => !e.IsMassNumber).Skip(1))
            .Where(p => p.First.MolarMass > p.Second.MolarMass)
            .Select(p => $"{p.First.Symbol}-{p.Second.Symbol}");
        Assert.Equal("Ar-K Co-Ni Te-I Th-Pa", string.Join(' ', falls));
    }

    [Fact]
    public void Elements_without_a_standard_weight_say_so() =>
        Assert.Equal(
            "Tc Pm Po At Rn Fr Ra Ac Np Pu Am Cm Bk Cf Es Fm Md No Lr Rf Db Sg Bh Hs Mt Ds Rg Cn Nh Fl Mc Lv Ts Og",
            string.Join(
                ' ',
                PeriodicTable.Elements.Where(e => e.IsMassNumber).Select(e => e.Symbol)
            )
        );

    [Fact]
    public void Water_agrees_with_the_constant_that_the_engine_uses() =>
        Assert.Equal(
            PhysicalConstants.WaterMolarMass * 1000,
            FormulaReader.Standard.Read("H2O").MolarMass,
            1e-9
        );
}
