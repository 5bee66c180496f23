using Bittern.Model;

namespace Bittern.Reports.Writing;

/// <summary>Compares a value with a condition and says how far apart they are.</summary>
internal static class Judgement
{
    /// <summary>Relative slack of a printed number against a bound that went through a unit factor.</summary>
    private const double Slack = 1e-13;

    /// <summary>True when the value (SI) meets the condition.</summary>
    public static bool IsMet(Condition condition, double value)
    {
        var slack = Slack * Math.Max(Math.Abs(condition.Value), Math.Abs(condition.Upper ?? 0));
        return condition.Comparison switch
        {
            Comparison.AtMost => value <= condition.Value + slack,
            Comparison.Below => value < condition.Value - slack,
            Comparison.AtLeast => value >= condition.Value - slack,
            Comparison.Above => value > condition.Value + slack,
            Comparison.Within => value >= condition.Value - slack
                && value <= (condition.Upper ?? double.PositiveInfinity) + slack,
            _ => Math.Abs(value - condition.Value) <= 1e-6 * Math.Max(1, Math.Abs(condition.Value)),
        };
    }

    /// <summary>Distance to the nearest bound in SI, positive on the side that meets the condition.</summary>
    public static double Margin(Condition condition, double value) =>
        condition.Comparison switch
        {
            Comparison.AtMost or Comparison.Below => condition.Value - value,
            Comparison.AtLeast or Comparison.Above => value - condition.Value,
            Comparison.Within => Math.Min(
                value - condition.Value,
                (condition.Upper ?? double.PositiveInfinity) - value
            ),
            _ => -Math.Abs(value - condition.Value),
        };

    /// <summary>The bound that is nearest to a value, SI.</summary>
    public static double NearestBound(Condition condition, double value) =>
        condition is { Comparison: Comparison.Within, Upper: { } upper }
        && upper - value < value - condition.Value
            ? upper
            : condition.Value;

    /// <summary>True for quantities on a logarithmic scale, whose margins are differences and not shares.</summary>
    public static bool IsLogarithmic(Quantity quantity) =>
        quantity is Quantity.PH or Quantity.SaturationIndex;

    /// <summary>
    /// True when a met limit leaves less room than ordinary errors take: 0.2 units of pH or SI, 10 per cent of anything else (working rule of this report).
    /// </summary>
    public static bool IsThin(Condition condition, double value)
    {
        var margin = Margin(condition, value);
        return IsLogarithmic(condition.Quantity)
            ? margin < 0.2
            : margin < 0.1 * Math.Abs(NearestBound(condition, value));
    }

    /// <summary>The sign and bound as a reader writes them: <c>&lt;= 0.5 mg/L</c>, <c>6 to 9</c>.</summary>
    public static string Required(Condition condition)
    {
        var unit = condition.DisplayUnit.Length == 0 ? "" : " " + condition.DisplayUnit;
        var bound = Digits.AsTyped(condition.Value / condition.DisplayFactor);
        return condition.Comparison switch
        {
            Comparison.AtMost => "<= " + bound + unit,
            Comparison.Below => "< " + bound + unit,
            Comparison.AtLeast => ">= " + bound + unit,
            Comparison.Above => "> " + bound + unit,
            Comparison.Within => bound
                + " to "
                + Digits.AsTyped((condition.Upper ?? double.NaN) / condition.DisplayFactor)
                + unit,
            _ => "= " + bound + unit,
        };
    }

    /// <summary>A value with the condition's unit.</summary>
    public static string Found(Condition condition, double value) =>
        Digits.Judged(condition, value)
        + (
            condition.DisplayUnit.Length == 0 || !double.IsFinite(value)
                ? ""
                : " " + condition.DisplayUnit
        );
}
