using System.Globalization;
using System.Text.RegularExpressions;
using Bittern.Calculation;
using Bittern.Chemistry;
using Bittern.Reports.Tests.Samples;
using Bittern.Reports.Writing;
using Xunit;

namespace Bittern.Reports.Tests.Writing;

public sealed partial class SaturationArithmeticTests
{
    [Fact]
    public void A_reader_with_a_pocket_calculator_lands_on_the_printed_index()
    {
        var saturations = SampleRecipes
            .Run(SampleRecipes.Adit())
            .Trains[0]
            .Stages.SelectMany(s => s.Saturations)
            .ToArray();
        Assert.NotEmpty(saturations);
        foreach (var saturation in saturations)
        {
            var lines = SaturationArithmetic.Lines(saturation).Split('\n');
            var log10Q = Math.Log10(
                Evaluate(lines.First(l => l.StartsWith("    = ", StringComparison.Ordinal))[6..])
            );
            Assert.Equal(saturation.Index, log10Q - saturation.Log10K, 0.005);
        }
    }

    [Fact]
    public void Gypsum_is_written_as_a_chemist_would()
    {
        var lines = SaturationArithmetic.Lines(Gypsum());
        Assert.Equal(
            """
            CaSO4·2H2O = Ca^2+ + SO4^2- + 2 H2O
            Q   = a(Ca^2+) * a(SO4^2-) * a(H2O)^2
                = 5.000e-3 * 4.000e-3 * 0.9990^2
                = 1.996e-5
            Ksp = 10^-4.580 = 2.630e-5
            SI  = log10 Q - log10 Ksp = -4.700 + 4.580 = -0.12, Q/Ksp = 0.759 (undersaturated)
            """.ReplaceLineEndings("\n"),
            lines
        );
    }

    [Fact]
    public void Products_beyond_a_calculator_are_written_as_logarithms()
    {
        var solid = SampleChemistry
            .Build()
            .Solids.Single(s => string.Equals(s.Name, "schwertmannite", StringComparison.Ordinal));
        ActivityTerm[] terms =
        [
            new("H+", -20.8, 1e-3, 0.9, 9e-4),
            new("Fe^3+", 8, 1e-5, 0.4, 4e-6),
            new("SO4^2-", 1.6, 1e-2, 0.5, 5e-3),
            new("H2O", 12.8, double.NaN, double.NaN, 0.999),
        ];
        var log10Q = terms.Sum(t => t.Coefficient * Math.Log10(t.Activity));
        var lines = SaturationArithmetic.Lines(
            new SaturationResult
            {
                Solid = solid,
                Role = SaturationRole.Allowed,
                Terms = [.. terms],
                Log10Q = log10Q,
                Log10K = 18.8,
            }
        );
        // 10^-63 stays within a calculator's range, and so does 1e-3^20.8.
        Assert.Contains("9.0000e-4^20.8", lines, StringComparison.Ordinal);

        var far = terms.Select(t => t.Species is "H+" ? t with { Activity = 1e-9 } : t).ToArray();
        var logarithmic = SaturationArithmetic.Lines(
            new SaturationResult
            {
                Solid = solid,
                Role = SaturationRole.Allowed,
                Terms = [.. far],
                Log10Q = far.Sum(t => t.Coefficient * Math.Log10(t.Activity)),
                Log10K = 18.8,
            }
        );
        Assert.Contains("8 * log10 a(Fe^3+)", logarithmic, StringComparison.Ordinal);
        Assert.Contains("- 20.8 * (-9.0000)", logarithmic, StringComparison.Ordinal);
    }

    private static SaturationResult Gypsum() =>
        new()
        {
            Solid = SampleChemistry.Solid(
                "gypsum",
                "CaSO4·2H2O",
                "CaSO4·2H2O = Ca^2+ + SO4^2- + 2 H2O",
                -4.58,
                null,
                ConstantForm.LogKsp
            ),
            Role = SaturationRole.Allowed,
            Terms =
            [
                new ActivityTerm("Ca^2+", 1, 0.01, 0.5, 0.005),
                new ActivityTerm("SO4^2-", 1, 0.008, 0.5, 0.004),
                new ActivityTerm("H2O", 2, double.NaN, double.NaN, 0.999),
            ],
            Log10Q = Math.Log10(0.005 * 0.004 * 0.999 * 0.999),
            Log10K = -4.58,
        };

    // Products over a product, powers first: what the printed line says.
    private static double Evaluate(string line)
    {
        var sides = line.Split(" / ");
        Assert.InRange(sides.Length, 1, 2);
        return Product(sides[0]) / (sides.Length == 2 ? Product(sides[1].Trim('(', ')')) : 1);
    }

    private static double Product(string text) =>
        text.Split(" * ")
            .Select(factor => Factor().Match(factor))
            .Aggregate(
                1.0,
                (product, match) =>
                {
                    Assert.True(match.Success, text);
                    var value = double.Parse(match.Groups["a"].Value, CultureInfo.InvariantCulture);
                    var power = match.Groups["n"].Success
                        ? double.Parse(match.Groups["n"].Value, CultureInfo.InvariantCulture)
                        : 1;
                    return product * Math.Pow(value, power);
                }
            );

    [GeneratedRegex(@"^(?<a>[0-9.]+(e-?[0-9]+)?)(\^(?<n>[0-9.]+))?$", RegexOptions.ExplicitCapture)]
    private static partial Regex Factor();
}
