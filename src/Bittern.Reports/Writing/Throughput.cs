using Bittern.Model;

namespace Bittern.Reports.Writing;

/// <summary>Turns amounts per m3 of feed into amounts per hour, per day or per batch of a train.</summary>
/// <param name="Feed">The train's feed.</param>
internal sealed record Throughput(Feed Feed)
{
    private const double SecondsPerHour = 3600;
    private const double SecondsPerDay = 86400;

    public bool IsFlow => Feed.CubicMetresPerSecond is > 0;

    public bool IsBatch => !IsFlow && Feed.CubicMetres is > 0;

    /// <summary>True when amounts per time or per batch can be given at all.</summary>
    public bool IsKnown => IsFlow || IsBatch;

    public double PerHour(double perCubicMetre) =>
        perCubicMetre * (Feed.CubicMetresPerSecond ?? double.NaN) * SecondsPerHour;

    /// <summary>Per day for a flow, per batch otherwise.</summary>
    public double PerPeriod(double perCubicMetre) =>
        IsFlow
            ? perCubicMetre * Feed.CubicMetresPerSecond!.Value * SecondsPerDay
            : perCubicMetre * (Feed.CubicMetres ?? double.NaN);

    /// <summary><c>d</c> for a flow, <c>batch</c> otherwise.</summary>
    public string Period => IsFlow ? "d" : "batch";

    /// <summary>
    /// One mass unit for a whole column: t, kg or g by the largest amount in it, with its value in kg.
    /// </summary>
    public static (string Unit, double Kilograms) MassUnit(IEnumerable<double> kilograms) =>
        kilograms.Select(Math.Abs).Where(double.IsFinite).DefaultIfEmpty(0).Max() switch
        {
            >= 1000 => ("t", 1000),
            >= 0.1 or 0 => ("kg", 1),
            _ => ("g", 1e-3),
        };

    /// <summary>One volume unit for a whole column: m3, L or mL.</summary>
    public static (string Unit, double CubicMetres) VolumeUnit(IEnumerable<double> cubicMetres) =>
        cubicMetres.Select(Math.Abs).Where(double.IsFinite).DefaultIfEmpty(0).Max() switch
        {
            >= 1 or 0 => ("m3", 1),
            >= 1e-4 => ("L", 1e-3),
            _ => ("mL", 1e-6),
        };

    /// <summary>The feed in words: <c>40 m3/h of 'adit'</c>.</summary>
    public string InWords()
    {
        var liquor = "'" + MarkdownText.Escape(Feed.Liquor.Name) + "'";
        return Feed.Rate is { } rate
            ? MarkdownText.Escape(rate) + " of " + liquor
            : "1 m3 of " + liquor + " (the recipe states no rate)";
    }
}
