using System.Globalization;
using Bittern.Engine.Water;
using Bittern.Reference;
using Xunit;

namespace Bittern.Engine.Tests;

/// <summary>Water's properties against the published tables of <c>tests/reference/water-properties.csv</c>.</summary>
public sealed class WaterPropertiesTests
{
    /// <summary>
    /// What each set can prove: its own last digit, and the 1 atm to saturation difference below 100 °C (5e-6 in density). Sets other than the
    /// formulation that the engine follows measure the spread between formulations.
    /// </summary>
    private static readonly Dictionary<(string Property, string Set), double> RelativeTolerance =
        new()
        {
            [("density", "SR6-08")] = 1e-5,
            [("density", "IAPWS-95")] = 2e-5,
            [("density", "SR1-86")] = 1e-4,
            [("density", "Perry9")] = 5e-5,
            [("dielectric_constant", "R8-97")] = 2e-5,
            [("dielectric_constant", "AW90")] = 1e-3,
            [("A_phi", "R8-97")] = 5e-5,
            [("A_phi", "BP79")] = 2e-3,
            [("A_phi", "AW90")] = 2e-3,
            [("A_phi", "HMW84")] = 2e-3,
            [("A_log10", "NEA")] = 4e-3,
            [("A_log10", "F&C79")] = 6e-3,
            [("B_debye_huckel", "NEA")] = 1.5e-3,
            [("B_debye_huckel", "F&C79")] = 2.5e-3,
        };

    public static TheoryData<string, double, double, string> Rows =>
        [
            .. ReferenceTable
                .Rows("water-properties.csv")
                .Where(r => !r["note"].Contains("out of line", StringComparison.Ordinal))
                .Select(r => new TheoryDataRow<string, double, double, string>(
                    r["property"],
                    Number(r["T_C"]),
                    Number(r["value"]),
                    r["set"]
                )),
        ];

    [Theory]
    [MemberData(nameof(Rows))]
    public void A_published_value_is_met(string property, double celsius, double value, string set)
    {
        var kelvin = celsius + Chemistry.PhysicalConstants.ZeroCelsius;
        var found = property switch
        {
            "density" => LiquidWater.Density(kelvin),
            "dielectric_constant" => LiquidWater.DielectricConstant(kelvin),
            "A_phi" => DebyeHuckel.SlopeLog10(kelvin) * Math.Log(10) / 3,
            "A_log10" => DebyeHuckel.SlopeLog10(kelvin),
            "B_debye_huckel" => DebyeHuckel.LengthParameter(kelvin),
            _ => throw new InvalidOperationException(property),
        };
        var tolerance = RelativeTolerance[(property, set)];
        Assert.True(
            Math.Abs((found / value) - 1) <= tolerance,
            string.Create(
                CultureInfo.InvariantCulture,
                $"{found} against {value}: {(found / value) - 1:0.0e0}"
            )
        );
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
