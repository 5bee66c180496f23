using System.Collections.Immutable;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Figures;

/// <summary>Maps values to places along an axis, with its ticks. Immutable.</summary>
/// <param name="Low">Value at <paramref name="Start"/>.</param>
/// <param name="High">Value at <paramref name="End"/>.</param>
/// <param name="Start">Place of the low end, units.</param>
/// <param name="End">Place of the high end, units.</param>
/// <param name="IsLogarithmic">Values are mapped by their logarithm.</param>
/// <param name="Ticks">Values that get a label.</param>
internal sealed record Scale(
    double Low,
    double High,
    double Start,
    double End,
    bool IsLogarithmic,
    ImmutableArray<double> Ticks
)
{
    /// <summary>A linear axis from <paramref name="low"/> to at least <paramref name="high"/>, ending on a tick, with 4 to 8 ticks at 1, 2 or 5 times a power of ten.</summary>
    public static Scale Linear(
        double low,
        double high,
        double start,
        double end,
        bool endOnTick = true
    )
    {
        var span = Math.Max(high - low, 1e-12 * Math.Max(Math.Abs(high), 1));
        var step = Math.Pow(10, Math.Floor(Math.Log10(span / 4)));
        foreach (var factor in new[] { 1.0, 2, 5, 10 })
        {
            if (span / (step * factor) <= 8)
            {
                step *= factor;
                break;
            }
        }

        var first = Math.Ceiling((low / step) - 1e-9);
        var last = endOnTick
            ? Math.Ceiling((high / step) - 1e-9)
            : Math.Floor((high / step) + 1e-9);
        var ticks = Enumerable
            .Range(0, (int)(last - first) + 1)
            .Select(i => (first + i) * step)
            .ToImmutableArray();
        return new Scale(
            low,
            endOnTick ? last * step : high,
            start,
            end,
            IsLogarithmic: false,
            ticks
        );
    }

    /// <summary>A logarithmic axis over whole decades.</summary>
    public static Scale Decades(int low, int high, double start, double end) =>
        new(
            Math.Pow(10, low),
            Math.Pow(10, high),
            start,
            end,
            IsLogarithmic: true,
            [.. Enumerable.Range(low, high - low + 1).Select(e => Math.Pow(10, e))]
        );

    public double At(double value)
    {
        var share = IsLogarithmic
            ? (Math.Log10(value) - Math.Log10(Low)) / (Math.Log10(High) - Math.Log10(Low))
            : (value - Low) / (High - Low);
        return Start + (share * (End - Start));
    }

    /// <summary>A tick's label.</summary>
    public static string Label(double tick) =>
        Digits.AsTyped(Math.Abs(tick) < 1e-12 ? 0 : Math.Round(tick, 12));
}
