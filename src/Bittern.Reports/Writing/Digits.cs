using System.Globalization;
using Bittern.Model;

namespace Bittern.Reports.Writing;

/// <summary>
/// Every number of a report as text: plain ASCII, invariant, no more digits than mean something, never a zero for a non-zero, never <c>-0</c>.
/// </summary>
internal static class Digits
{
    /// <summary>Digits shown when no uncertainty says otherwise: analyses and constants rarely carry more.</summary>
    public const int Usual = 3;

    /// <summary>Digits past which two doubles say nothing more to a reader.</summary>
    private const int Most = 12;

    /// <summary>A saturation index smaller than this is zero within the certificate's tolerance.</summary>
    private const double IndexNoise = 1e-6;

    /// <summary>Relative gaps below this come from root finding, not from chemistry.</summary>
    public const double RelativeNoise = 1e-8;

    /// <summary>Residuals at or below this are rounding noise.</summary>
    public const double ResidualFloor = 1e-12;

    /// <summary>Amounts (kg/m3, mg/L) below this are shown as an upper bound: no analysis or balance reaches it.</summary>
    private const double SmallestAmount = 1e-9;

    private const string Missing = "n/a";

    /// <summary>
    /// A number to so many significant digits: fixed notation from 0.001 to 999999, otherwise <c>2.4e-5</c>. NaN and infinities give <c>n/a</c>.
    /// </summary>
    public static string Significant(double value, int digits = Usual)
    {
        if (!double.IsFinite(value))
        {
            return Missing;
        }

        if (value == 0)
        {
            return "0";
        }

        var (negative, mantissa, exponent) = Split(value, digits);
        var sign = negative ? "-" : "";
        return exponent is >= -3 and < 6
            ? sign + Fixed(mantissa, exponent)
            : sign + Scientific(mantissa, exponent);
    }

    /// <summary>The same in scientific notation whatever the size, for arithmetic that a reader follows.</summary>
    public static string Factor(double value, int digits)
    {
        if (!double.IsFinite(value))
        {
            return Missing;
        }

        if (value == 0)
        {
            return "0";
        }

        var (negative, mantissa, exponent) = Split(value, digits);
        return (negative ? "-" : "")
            + (
                exponent is >= -2 and < 3
                    ? Fixed(mantissa, exponent)
                    : Scientific(mantissa, exponent)
            );
    }

    /// <summary>10 to a power that may lie outside what a double holds.</summary>
    public static string PowerOfTen(double log10, int digits = Usual)
    {
        if (!double.IsFinite(log10))
        {
            return Missing;
        }

        var exponent = (int)Math.Floor(log10);
        var (_, mantissa, carry) = Split(Math.Pow(10, log10 - exponent), digits);
        exponent += carry;
        return exponent is >= -3 and < 6
            ? Fixed(mantissa, exponent)
            : Scientific(mantissa, exponent);
    }

    /// <summary>An amount or concentration; what no balance resolves is shown as an upper bound.</summary>
    public static string Amount(double value, int digits = Usual) =>
        value != 0 && Math.Abs(value) < SmallestAmount ? "< 1e-9" : Significant(value, digits);

    /// <summary>Two decimals: pH electrodes and activity models carry no more.</summary>
    public static string PH(double value) => Decimals(value, 2);

    /// <summary>A saturation index or log10 of a constant: two decimals, more where two would read zero.</summary>
    public static string Index(double value) =>
        Math.Abs(value) < IndexNoise ? "0.00" : Decimals(value, 2);

    /// <summary>Fixed decimals; a non-zero that would read zero keeps one significant digit instead.</summary>
    public static string Decimals(double value, int decimals)
    {
        if (!double.IsFinite(value))
        {
            return Missing;
        }

        var text = value.ToString(
            "F" + decimals.ToString(CultureInfo.InvariantCulture),
            CultureInfo.InvariantCulture
        );
        if (!text.AsSpan().ContainsAnyInRange('1', '9'))
        {
            return value == 0 ? text.TrimStart('-') : Significant(value, 1);
        }

        return text;
    }

    /// <summary>A fraction as per cent to one decimal, or an upper bound below that.</summary>
    public static string Percent(double fraction)
    {
        if (!double.IsFinite(fraction))
        {
            return Missing;
        }

        var percent = fraction * 100;
        return Math.Abs(percent) switch
        {
            0 => "0 %",
            < 0.05 => "below 0.1 %",
            < 10 => Decimals(percent, 1) + " %",
            < 1e6 => Decimals(percent, 0) + " %",
            _ => Significant(percent) + " %",
        };
    }

    /// <summary>A number that somebody typed: as many digits as it has, up to twelve.</summary>
    public static string AsTyped(double value)
    {
        if (!double.IsFinite(value))
        {
            return Missing;
        }

        if (value == 0)
        {
            return "0";
        }

        var (negative, mantissa, exponent) = Split(value, Most);
        mantissa = mantissa.TrimEnd('0');
        return (negative ? "-" : "")
            + (
                exponent is >= -3 and < 7
                    ? Fixed(mantissa, exponent)
                    : Scientific(mantissa, exponent)
            );
    }

    /// <summary>A value that stands beside what somebody typed: up to so many digits, trailing zeros left out.</summary>
    public static string Trimmed(double value, int digits)
    {
        if (!double.IsFinite(value) || value == 0 || Math.Abs(value) < SmallestAmount)
        {
            return Amount(value, digits);
        }

        var (negative, mantissa, exponent) = Split(value, digits);
        mantissa = mantissa.TrimEnd('0');
        return (negative ? "-" : "")
            + (
                exponent is >= -3 and < 7
                    ? Fixed(mantissa, exponent)
                    : Scientific(mantissa, exponent)
            );
    }

    /// <summary>
    /// A number for machines: six significant digits, valid as JSON and CSV. More would differ between machines in the last place and mean nothing; NaN and
    /// infinities give null.
    /// </summary>
    public static string? ForMachines(double value, int digits = 6)
    {
        if (!double.IsFinite(value))
        {
            return null;
        }

        if (value == 0)
        {
            return "0";
        }

        var (negative, mantissa, exponent) = Split(value, digits);
        mantissa = mantissa.TrimEnd('0');
        return (negative ? "-" : "")
            + (
                exponent is >= -4 and < 9
                    ? Fixed(mantissa, exponent)
                    : Scientific(mantissa, exponent)
            );
    }

    /// <summary>
    /// A residual as the next power of ten above it, with a floor: digits of rounding noise differ between machines and mean nothing.
    /// </summary>
    public static string Residual(double value)
    {
        var bound = ResidualBound(value);
        return double.IsNaN(bound)
            ? Missing
            : string.Create(
                CultureInfo.InvariantCulture,
                $"< 1e{(int)Math.Round(Math.Log10(bound))}"
            );
    }

    /// <summary>The power of ten of <see cref="Residual"/> as a number; NaN for what is none.</summary>
    public static double ResidualBound(double value)
    {
        var size = Math.Abs(value);
        return !double.IsFinite(size) ? double.NaN
            : size <= ResidualFloor ? ResidualFloor
            : Math.Pow(10, Math.Ceiling(Math.Log10(size)));
    }

    /// <summary>
    /// A judged value in the unit of its condition, with as many digits as it takes for the printed number to give the same verdict as the exact one.
    /// </summary>
    public static string Judged(Condition condition, double siValue)
    {
        if (!double.IsFinite(siValue))
        {
            return Missing;
        }

        var factor = condition.DisplayFactor;
        var met = Judgement.IsMet(condition, siValue);
        for (var digits = Usual; digits <= Most; digits++)
        {
            var text = condition.Quantity switch
            {
                Quantity.PH or Quantity.SaturationIndex => digits == Usual
                && Math.Abs(siValue) < IndexNoise
                    ? "0.00"
                    : Decimals(siValue / factor, digits - 1),
                _ => Significant(siValue / factor, digits),
            };
            if (Judgement.IsMet(condition, Parse(text) * factor) == met)
            {
                return text;
            }
        }

        return Significant(siValue / factor, Most);
    }

    private static double Parse(string text) =>
        double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);

    private static (bool Negative, string Mantissa, int Exponent) Split(double value, int digits)
    {
        var text = Math.Abs(value)
            .ToString(
                "E" + (digits - 1).ToString(CultureInfo.InvariantCulture),
                CultureInfo.InvariantCulture
            );
        var e = text.IndexOf('E', StringComparison.Ordinal);
        return (
            value < 0,
            text[..e].Replace(".", "", StringComparison.Ordinal),
            int.Parse(
                text.AsSpan(e + 1),
                NumberStyles.AllowLeadingSign,
                CultureInfo.InvariantCulture
            )
        );
    }

    private static string Fixed(string mantissa, int exponent)
    {
        if (exponent < 0)
        {
            return "0." + new string('0', -exponent - 1) + mantissa;
        }

        return mantissa.Length <= exponent + 1
            ? mantissa.PadRight(exponent + 1, '0')
            : mantissa[..(exponent + 1)] + "." + mantissa[(exponent + 1)..];
    }

    private static string Scientific(string mantissa, int exponent) =>
        (mantissa.Length == 1 ? mantissa : mantissa[..1] + "." + mantissa[1..])
        + "e"
        + exponent.ToString(CultureInfo.InvariantCulture);
}
