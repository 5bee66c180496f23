using Xunit;

namespace Bittern.Chemistry.Tests;

public sealed class TemperatureFunctionTests
{
    [Fact]
    public void Vant_hoff_gives_its_value_at_25_degrees() =>
        Assert.Equal(-4.58, new TemperatureFunction.VantHoff(-4.58, -0.46).Log10At(298.15));

    [Fact]
    public void Without_enthalpy_a_constant_does_not_move() =>
        Assert.Equal(-4.58, new TemperatureFunction.VantHoff(-4.58, null).Log10At(350));

    // Water's pKw is 14.534 at 10 °C and 13.535 at 40 °C (Harned & Owen 1958, recalled). A constant ΔH of 55.91 kJ/mol cannot follow the
    // curvature: 0.04 covers it, and a wrong sign would be off by a whole unit.
    [Theory]
    [InlineData(283.15, -14.534)]
    [InlineData(313.15, -13.535)]
    public void Vant_hoff_follows_the_ionisation_of_water(double kelvin, double log10K) =>
        Assert.Equal(
            log10K,
            new TemperatureFunction.VantHoff(-13.995, 55.91).Log10At(kelvin),
            0.04
        );

    [Fact]
    public void A_published_expression_is_evaluated_in_kelvin()
    {
        // Plummer & Busenberg 1982: log10 KH of CO2 is -1.468 at 25 °C.
        var function = new TemperatureFunction.Published(
            "108.3865 + 0.01985076*T - 6919.53/T - 40.45154*log10(T) + 669365/T^2",
            t =>
                108.3865
                + (0.01985076 * t)
                - (6919.53 / t)
                - (40.45154 * Math.Log10(t))
                + (669365 / (t * t))
        );
        Assert.Equal(-1.468, function.Log10At(298.15), 0.001);
    }

    [Fact]
    public void The_stated_range_is_kept_with_half_a_kelvin_of_grace()
    {
        var constant = new EquilibriumConstant(
            new TemperatureFunction.VantHoff(1, null),
            ConstantForm.LogK,
            null,
            5,
            60,
            null,
            false
        );
        Assert.True(constant.Covers(4.5));
        Assert.False(constant.Covers(4.4));
        Assert.True(constant.Covers(60.5));
        Assert.False(constant.Covers(60.6));
        Assert.Equal(1, constant.Log10AtCelsius(25));
    }
}
