using System.Globalization;
using Bittern.Model;
using Bittern.Reports.Tests.Samples;
using Bittern.Reports.Writing;
using Xunit;

namespace Bittern.Reports.Tests.Writing;

public sealed class DigitsTests
{
    [Theory]
    [InlineData(0.0, "0")]
    [InlineData(2350.4, "2350")]
    [InlineData(0.5, "0.500")]
    [InlineData(2.4e-5, "2.40e-5")]
    [InlineData(-2.4e-5, "-2.40e-5")]
    [InlineData(0.001234, "0.00123")]
    [InlineData(0.00099996, "0.00100")]
    [InlineData(999.96, "1000")]
    [InlineData(123456.0, "123000")]
    [InlineData(1234567.0, "1.23e6")]
    [InlineData(1e-300, "1.00e-300")]
    [InlineData(double.NaN, "n/a")]
    [InlineData(double.NegativeInfinity, "n/a")]
    public void Three_significant_digits(double value, string expected) =>
        Assert.Equal(expected, Digits.Significant(value));

    [Theory]
    [InlineData(0.0, "0.00")]
    [InlineData(3e-10, "0.00")]
    [InlineData(-3e-10, "0.00")]
    [InlineData(0.003, "0.003")]
    [InlineData(-0.003, "-0.003")]
    [InlineData(-1.003, "-1.00")]
    [InlineData(2.787, "2.79")]
    [InlineData(double.NegativeInfinity, "n/a")]
    public void Saturation_index_has_two_decimals_but_no_false_zero(
        double value,
        string expected
    ) => Assert.Equal(expected, Digits.Index(value));

    [Theory]
    [InlineData(0.0, "0 %")]
    [InlineData(1e-17, "below 0.1 %")]
    [InlineData(-0.0262, "-2.6 %")]
    [InlineData(0.381, "38 %")]
    [InlineData(1.0, "100 %")]
    public void Percentages(double fraction, string expected) =>
        Assert.Equal(expected, Digits.Percent(fraction));

    [Theory]
    [InlineData(0.0, "< 1e-12")]
    [InlineData(-3e-17, "< 1e-12")]
    [InlineData(3.2e-11, "< 1e-10")]
    [InlineData(1e-9, "< 1e-9")]
    [InlineData(double.NaN, "n/a")]
    public void Residuals_are_powers_of_ten_above_the_noise(double value, string expected) =>
        Assert.Equal(expected, Digits.Residual(value));

    [Theory]
    [InlineData(0.5, "0.5")]
    [InlineData(0.1 + 0.2, "0.3")]
    [InlineData(6.0, "6")]
    [InlineData(1500.0, "1500")]
    [InlineData(4.2e-4, "4.2e-4")]
    public void Typed_numbers_keep_their_digits_and_no_more(double value, string expected) =>
        Assert.Equal(expected, Digits.AsTyped(value));

    [Theory]
    [InlineData(-202.97, 3, "1.07e-203")]
    [InlineData(0.0, 3, "1.00")]
    [InlineData(-0.00001, 3, "1.00")]
    [InlineData(5.0, 4, "100000")]
    [InlineData(400.5, 3, "3.16e400")]
    public void Powers_of_ten_beyond_the_range_of_a_double(
        double log10,
        int digits,
        string expected
    ) => Assert.Equal(expected, Digits.PowerOfTen(log10, digits));

    [Fact]
    public void No_number_reads_zero_or_minus_zero_unless_it_is_zero()
    {
        var random = new Random(20240501);
        for (var i = 0; i < 20_000; i++)
        {
            var value = (random.NextDouble() - 0.5) * Math.Pow(10, random.Next(-30, 12));
            foreach (
                var text in new[]
                {
                    Digits.Significant(value),
                    Digits.Factor(value, 4),
                    Digits.AsTyped(value),
                    Digits.Decimals(value, 2),
                    Digits.PH(value),
                }
            )
            {
                var read = double.Parse(text, CultureInfo.InvariantCulture);
                Assert.NotEqual(0, read);
                Assert.Equal(Math.Sign(value), Math.Sign(read));
                Assert.True(text.Length <= 20, text);
            }
        }
    }

    [Theory]
    [InlineData(0.5004e-3, "0.5004")]
    [InlineData(0.50000004e-3, "0.50000004")]
    [InlineData(0.4999999999e-3, "0.500")]
    [InlineData(0.5e-3, "0.500")]
    [InlineData(0.43e-3, "0.430")]
    public void Judged_value_never_contradicts_an_upper_limit(double value, string expected) =>
        Assert.Equal(expected, Digits.Judged(Zinc(Comparison.AtMost, 0.5e-3), value));

    [Theory]
    [InlineData(0.4999e-3, "0.4999")]
    [InlineData(0.5e-3, "0.500")]
    public void Judged_value_never_contradicts_a_strict_limit(double value, string expected) =>
        Assert.Equal(expected, Digits.Judged(Zinc(Comparison.Below, 0.5e-3), value));

    [Theory]
    [InlineData(5.997, "5.997")]
    [InlineData(9.0004, "9.0004")]
    [InlineData(6.004, "6.00")]
    public void Judged_pH_never_contradicts_its_window(double value, string expected) =>
        Assert.Equal(
            expected,
            Digits.Judged(
                SampleRecipes.Condition(
                    new Quantity.PH(),
                    Comparison.Within,
                    6,
                    "pH within 6 .. 9"
                ) with
                {
                    Upper = 9,
                },
                value
            )
        );

    [Fact]
    public void Judged_values_agree_with_their_verdict_at_random()
    {
        var random = new Random(7);
        foreach (
            var comparison in new[]
            {
                Comparison.AtMost,
                Comparison.AtLeast,
                Comparison.Below,
                Comparison.Above,
            }
        )
        {
            for (var i = 0; i < 5_000; i++)
            {
                var bound = Math.Round(random.NextDouble() * 10, 2) * 1e-3;
                var value =
                    bound * (1 + ((random.NextDouble() - 0.5) * Math.Pow(10, -random.Next(0, 9))));
                var condition = Zinc(comparison, bound);
                var shown =
                    double.Parse(Digits.Judged(condition, value), CultureInfo.InvariantCulture)
                    * 1e-3;
                Assert.Equal(Judgement.IsMet(condition, value), Judgement.IsMet(condition, shown));
            }
        }
    }

    private static Condition Zinc(Comparison comparison, double bound) =>
        SampleRecipes.Condition(
            SampleRecipes.Dissolved("Zn", "Zn^2+"),
            comparison,
            bound,
            "dissolved(Zn)",
            "mg/L",
            1e-3
        );
}
