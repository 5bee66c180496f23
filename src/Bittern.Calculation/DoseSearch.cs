using Bittern.Engine;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>
/// Finds the first dose that meets a target. The dose axis is scanned from small to large (logarithmically, with every place where a solid appears or
/// vanishes refined between the points), so that a narrow window is not stepped over; the first crossing is then closed in on from the safe side.
/// </summary>
internal sealed class DoseSearch
{
    /// <summary>Points of the scan; each costs one warm solve.</summary>
    private const int ScanPoints = 240;

    /// <summary>Smallest dose of the scan relative to the largest.</summary>
    private const double ScanFloor = 1e-6;

    /// <summary>Relative width at which a crossing counts as found: far below what any pump or printed digit resolves.</summary>
    private const double DoseTolerance = 1e-11;

    private readonly Stream _start;
    private readonly StageConditions _conditions;
    private readonly ReagentMakeUp _makeUp;
    private readonly double _entering;
    private readonly Equilibrator _equilibrator;
    private readonly Action<Stream> _convert;

    /// <summary>A search along one reagent's dose.</summary>
    /// <param name="start">The stream before the dose, equilibrated.</param>
    /// <param name="conditions">Of the stage.</param>
    /// <param name="makeUp">What is dosed.</param>
    /// <param name="entering">m3 entering the stage per m3 of feed: what doses are per.</param>
    /// <param name="equilibrator">To solve with.</param>
    /// <param name="convert">Oxidations and reductions that hold for the stage, applied to the totals before equilibrium.</param>
    public DoseSearch(
        Stream start,
        StageConditions conditions,
        ReagentMakeUp makeUp,
        double entering,
        Equilibrator equilibrator,
        Action<Stream> convert
    )
    {
        _start = start;
        _conditions = conditions;
        _makeUp = makeUp;
        _entering = entering;
        _equilibrator = equilibrator;
        _convert = convert;
    }

    /// <summary>A scanned dose and the stream there; null where no equilibrium was found.</summary>
    public sealed record Point(double Dose, Stream? Stream);

    /// <summary>The stream at a dose, solved from a neighbour (null: from the canonical start); null without an answer.</summary>
    public Stream? At(double dose, Stream? near)
    {
        var stream = _start.Copy();
        _makeUp.AddTo(stream, dose * _entering);
        _convert(stream);
        if (near is not null)
        {
            stream.Answer.CopyFrom(near.Answer);
        }

        return _equilibrator.Run(stream, _conditions, near is not null) == SolveStatus.Solved
            ? stream
            : null;
    }

    /// <summary>The scan from no dose to the largest.</summary>
    public List<Point> Scan(double largest)
    {
        var points = new List<Point>(ScanPoints + 1);
        var previous = At(0, null);
        points.Add(new Point(0, previous));
        for (var k = 0; k < ScanPoints; k++)
        {
            var dose = largest * Math.Pow(ScanFloor, 1 - ((double)k / (ScanPoints - 1)));
            var stream = At(dose, previous);
            points.Add(new Point(dose, stream));
            previous = stream ?? previous;
        }

        return points;
    }

    /// <summary>The target's search over a scan.</summary>
    public TargetSearch Find(Condition target, List<Point> scan, Func<Stream, double> value)
    {
        var gaps = scan.ConvertAll(p =>
            p.Stream is null ? double.NaN : Quantities.Gap(target, value(p.Stream))
        );
        var equal = target.Comparison == Comparison.Equal;
        var best = 0;
        for (var k = 0; k < scan.Count; k++)
        {
            var size = equal ? Math.Abs(gaps[k]) : gaps[k];
            var bestSize = equal ? Math.Abs(gaps[best]) : gaps[best];
            if (size < bestSize || double.IsNaN(bestSize))
            {
                best = k;
            }
        }

        for (var k = 0; k < scan.Count; k++)
        {
            if (double.IsNaN(gaps[k]))
            {
                continue;
            }

            if (gaps[k] == 0 || (!equal && gaps[k] < 0))
            {
                var found = k == 0 ? 0 : Close(target, scan[k - 1], scan[k], value);
                return new TargetSearch(
                    true,
                    found,
                    k == 0,
                    Leaves(target, scan, gaps, k, value),
                    scan[best].Dose
                );
            }

            if (equal && k > 0 && gaps[k - 1] * gaps[k] < 0)
            {
                return new TargetSearch(
                    true,
                    Close(target, scan[k - 1], scan[k], value),
                    false,
                    null,
                    scan[best].Dose
                );
            }
        }

        // Never met on the scan: the best point may hide a narrow window beside it.
        return Refine(target, scan, best, value, equal);
    }

    // Golden-section search around the best scanned point; a window that it opens is then closed in on.
    private TargetSearch Refine(
        Condition target,
        List<Point> scan,
        int best,
        Func<Stream, double> value,
        bool equal
    )
    {
        var low = scan[Math.Max(best - 1, 0)].Dose;
        var high = scan[Math.Min(best + 1, scan.Count - 1)].Dose;
        var near = scan[best].Stream;
        var bestDose = scan[best].Dose;
        if (near is null)
        {
            return new TargetSearch(false, 0, false, null, bestDose);
        }

        const double Golden = 0.6180339887498949;
        var a = high - (Golden * (high - low));
        var b = low + (Golden * (high - low));
        var ga = Size(a);
        var gb = Size(b);
        for (var i = 0; i < 80 && high - low > 1e-9 * high; i++)
        {
            if (ga <= gb)
            {
                (high, b, gb) = (b, a, ga);
                a = high - (Golden * (high - low));
                ga = Size(a);
            }
            else
            {
                (low, a, ga) = (a, b, gb);
                b = low + (Golden * (high - low));
                gb = Size(b);
            }
        }

        bestDose = ga <= gb ? a : b;
        if (!equal && Math.Min(ga, gb) < 0)
        {
            var left = scan[Math.Max(best - 1, 0)];
            var inside = new Point(bestDose, At(bestDose, near));
            return new TargetSearch(
                true,
                Close(target, left, inside, value),
                false,
                null,
                bestDose
            );
        }

        return new TargetSearch(false, 0, false, null, bestDose);

        double Size(double dose)
        {
            var stream = At(dose, near);
            var gap = stream is null
                ? double.PositiveInfinity
                : Quantities.Gap(target, value(stream));
            return equal ? Math.Abs(gap) : gap;
        }
    }

    private double? Leaves(
        Condition target,
        List<Point> scan,
        List<double> gaps,
        int from,
        Func<Stream, double> value
    )
    {
        for (var k = from + 1; k < scan.Count; k++)
        {
            if (gaps[k] > 0)
            {
                return Close(target, scan[k], scan[k - 1], value);
            }
        }

        return null;
    }

    /// <summary>Closes in on the crossing between a dose outside and one inside; returns the inner end.</summary>
    private double Close(Condition target, Point outside, Point inside, Func<Stream, double> value)
    {
        var outer = outside.Dose;
        var inner = inside.Dose;
        var near = inside.Stream;
        var equal = target.Comparison == Comparison.Equal;
        var outerSign = outside.Stream is null
            ? 1
            : Math.Sign(Quantities.Gap(target, value(outside.Stream)));
        for (
            var i = 0;
            i < 100 && Math.Abs(inner - outer) > DoseTolerance * Math.Max(inner, outer);
            i++
        )
        {
            var middle = (inner + outer) / 2;
            var stream = At(middle, near);
            var gap = stream is null ? double.NaN : Quantities.Gap(target, value(stream));
            var isInside = equal ? Math.Sign(gap) != outerSign : gap <= 0;
            if (!double.IsNaN(gap) && isInside)
            {
                inner = middle;
            }
            else
            {
                outer = middle;
            }

            near = stream ?? near;
        }

        return inner;
    }

    /// <summary>First dose at which a solid saturates, by root finding between scanned points; null when it never does.</summary>
    public (double Dose, double PH)? Onset(int solid, List<Point> scan)
    {
        const double Saturated = -1e-9;
        for (var k = 0; k < scan.Count; k++)
        {
            if (scan[k].Stream is not { } stream || stream.Answer.LnSaturations[solid] < Saturated)
            {
                continue;
            }

            if (k == 0 || scan[k - 1].Stream is null)
            {
                return (scan[k].Dose, PH(stream));
            }

            var (low, high, near) = (scan[k - 1].Dose, scan[k].Dose, stream);
            for (var i = 0; i < 60 && high - low > 1e-9 * high; i++)
            {
                var middle = (low + high) / 2;
                var trial = At(middle, near);
                if (trial is not null && trial.Answer.LnSaturations[solid] >= Saturated)
                {
                    (high, near) = (middle, trial);
                }
                else
                {
                    low = middle;
                }
            }

            return (high, PH(near));
        }

        return null;
    }

    private static double PH(Stream stream) =>
        -stream.Answer.LnActivities[stream.System.HydrogenIndex] / Math.Log(10);
}

/// <summary>What a search for a dose found.</summary>
/// <param name="Reached">Whether any dose meets the target.</param>
/// <param name="Dose">The first one, units per m3 entering the stage.</param>
/// <param name="HeldAlready">Met without a dose.</param>
/// <param name="StopsHoldingAt">Larger dose at which it stops holding.</param>
/// <param name="BestDose">Dose that comes closest.</param>
internal sealed record TargetSearch(
    bool Reached,
    double Dose,
    bool HeldAlready,
    double? StopsHoldingAt,
    double BestDose
);
