using System.Collections.Immutable;
using Bittern.Calculation;
using Bittern.Chemistry;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Figures;

/// <summary>
/// A stage's answer to its reagent in three panels over one dose axis: what stays dissolved (logarithmic), pH, and what has formed (stacked), with the dose given marked.
/// </summary>
internal static class DoseCurveFigure
{
    private const double Width = 760;
    private const double Left = 70;

    /// <summary>The plot keeps this much room however long the names of solids are.</summary>
    private const double NarrowestRight = 460;

    /// <summary>Between the plot and the names beside it, and to the edge.</summary>
    private const double LabelGap = 22;

    private const double DissolvedTop = 44;
    private const double DissolvedBottom = 264;
    private const double PHTop = 284;
    private const double PHBottom = 394;
    private const double FormedTop = 414;
    private const double FormedBottom = 554;
    private const double Height = 604;

    /// <summary>mg/L below which nothing regulated is measured; curves leave the panel there.</summary>
    private const int LowestDecade = -4;

    /// <summary>A component that changes by less than this factor over the curve says nothing in the figure.</summary>
    private const double NoticeableChange = 1.3;

    private static readonly Stroke Frame = new("#7b8790", 0.8);
    private static readonly Stroke Grid = new("#e3e8eb", 0.8);
    private static readonly TextStyle Tick = new(11, Fill: "#4d5963");

    public static Figure? Draw(
        string name,
        TrainResult train,
        StageResult stage,
        DoseCurve curve,
        Outcome outcome
    )
    {
        if (curve.Points.Length < 3)
        {
            return null;
        }

        var reagent = curve.Reagent;
        var canvas = new SvgCanvas(Width, Height);
        var series = Dissolved(curve, outcome.Recipe.Chemistry.Basis, Wanted(train, outcome));
        var solids = Solids(curve);
        var names = series.Concat(solids).Select(n => n.Name);
        var right = Math.Max(
            NarrowestRight,
            Width - names.Select(SvgCanvas.WidthOf).DefaultIfEmpty(0).Max() - LabelGap
        );
        var x = Scale.Linear(
            0,
            DoseText.Number(reagent, curve.Points[^1].Dose),
            Left,
            right,
            endOnTick: false
        );
        var title = $"Stage {stage.Stage.Name}: answer to {reagent.Name}";
        canvas.Text(Left, 24, title, new TextStyle(14, Bold: true));

        DissolvedPanel(canvas, x, series, curve, stage);
        PHPanel(canvas, x, curve);
        FormedPanel(canvas, x, solids, curve);
        DoseAxis(canvas, x, reagent);
        Given(
            canvas,
            x.At(DoseText.Number(reagent, curve.Given)),
            DoseText.PerStageVolume(reagent, curve.Given)
        );

        var first = curve.Points[0];
        var last = curve.Points[^1];
        var description =
            $"Over a dose of 0 to {DoseText.PerStageVolume(reagent, last.Dose)} the pH goes from {Digits.PH(first.PH)} to {Digits.PH(last.PH)}; dissolved {string.Join(", ", series.Select(s => s.Name))} in mg/L on a logarithmic axis"
            + (
                solids.IsEmpty
                    ? ""
                    : $"; formed {string.Join(", ", solids.Select(s => s.Name))} in kg per m3 of feed, stacked"
            )
            + $". The dose given is {DoseText.PerStageVolume(reagent, curve.Given)}.";
        var caption =
            $"Answer of stage {stage.Stage.Name} to {reagent.Name}: dissolved, pH and formed solids at equilibrium; the upright line is the dose given.";
        return new Figure(name, canvas.Document(title, description), caption);
    }

    private sealed record Series(string Name, ImmutableArray<double> Values);

    // Names that limits of this train or targets of its stages ask for.
    private static HashSet<string> Wanted(TrainResult train, Outcome outcome) =>
        outcome
            .Recipe.LimitSets.Where(s => s.Train.Equals(train.Train))
            .SelectMany(s => s.Limits.Select(l => l.Condition))
            .Concat(
                train
                    .Stages.SelectMany(s => s.Doses)
                    .Select(d => d.Target?.Target)
                    .OfType<Condition>()
            )
            .Select(c => c.Quantity)
            .OfType<Quantity.Dissolved>()
            .SelectMany(q => q.Basis.Select(t => t.Species.Text))
            .ToHashSet(StringComparer.Ordinal);

    private static ImmutableArray<Series> Dissolved(
        DoseCurve curve,
        ImmutableArray<Species> basis,
        HashSet<string> wanted
    )
    {
        var lowest = Math.Pow(10, LowestDecade);
        var candidates = new List<(Series Series, bool Wanted, double Change)>();
        for (var i = 0; i < curve.Points[0].Dissolved.Length; i++)
        {
            var species = curve.Points[0].Dissolved[i].Species;
            var label = DissolvedLabel.Of(species, basis);
            var values = curve
                .Points.Select(p => p.Dissolved[i].Coefficient * label.MolarMass)
                .ToImmutableArray();
            var low = Math.Max(values.Min(), lowest);
            var change = values.Max() / low;
            if (values.Max() > lowest && !IsGas(species))
            {
                candidates.Add(
                    (new Series(label.Text, values), wanted.Contains(species.Text), change)
                );
            }
        }

        return
        [
            .. candidates
                .Where(c => c.Wanted || c.Change > NoticeableChange)
                .OrderByDescending(c => c.Wanted)
                .ThenByDescending(c => c.Change)
                .Take(CurveStyle.Most)
                .OrderByDescending(c => c.Series.Values.Max())
                .Select(c => c.Series),
        ];
    }

    // Dissolved air is set by the atmosphere, not by the dose.
    private static bool IsGas(Formula species) => species.Text is "O2(aq)" or "N2(aq)";

    private static ImmutableArray<Series> Solids(DoseCurve curve) =>
        [
            .. curve
                .Points.SelectMany(p => p.Formed)
                .Select(f => f.Solid.Name)
                .Distinct(StringComparer.Ordinal)
                .Select(n => new Series(
                    n,
                    [
                        .. curve.Points.Select(p =>
                            Math.Max(
                                0,
                                p.Formed.Where(f =>
                                        string.Equals(f.Solid.Name, n, StringComparison.Ordinal)
                                    )
                                    .Sum(f => f.MassPerFeed)
                            )
                        ),
                    ]
                ))
                .Where(s => s.Values.Max() > 0)
                .OrderByDescending(s => s.Values[^1])
                .ThenBy(s => s.Name, StringComparer.Ordinal)
                .Take(CurveStyle.Most),
        ];

    private static void DissolvedPanel(
        SvgCanvas canvas,
        Scale x,
        ImmutableArray<Series> series,
        DoseCurve curve,
        StageResult stage
    )
    {
        var lowest = Math.Pow(10, LowestDecade);
        var top = series.IsEmpty
            ? 1
            : (int)Math.Ceiling(Math.Log10(series.Max(s => s.Values.Max())) - 1e-9);
        var least = series.IsEmpty ? 0.1 : series.Min(s => Math.Max(s.Values.Min(), lowest));
        var bottom = Math.Min((int)Math.Floor(Math.Log10(least) + 1e-9), top - 1);
        var y = Scale.Decades(bottom, top, DissolvedBottom, DissolvedTop);
        Panel(canvas, x, y, "Dissolved (mg/L)");
        TargetLine(canvas, x, y, stage, curve);
        var ends = new List<(double, string, string)>();
        for (var i = 0; i < series.Length; i++)
        {
            var line = new List<(double X, double Y)>();
            (double X, double Y)? left = null;
            for (var k = 0; k < curve.Points.Length; k++)
            {
                var value = series[i].Values[k];
                var at = x.At(DoseText.Number(curve.Reagent, curve.Points[k].Dose));
                if (value >= y.Low)
                {
                    if (line.Count == 0 && k > 0)
                    {
                        line.Add((at, DissolvedBottom));
                    }

                    line.Add((at, y.At(value)));
                    left = null;
                }
                else if (line.Count > 0 && left is null)
                {
                    left = (at, DissolvedBottom);
                    line.Add(left.Value);
                    canvas.Polyline([.. line], CurveStyle.Line(i));
                    line.Clear();
                }
            }

            canvas.Polyline(line, CurveStyle.Line(i));
            if (left is { } exit)
            {
                canvas.Text(
                    exit.X + 4,
                    DissolvedBottom - 5,
                    series[i].Name,
                    new TextStyle(12, Fill: CurveStyle.Colour(i))
                );
            }
            else if (line.Count > 0)
            {
                ends.Add((line[^1].Y, series[i].Name, CurveStyle.Colour(i)));
            }
        }

        EndLabels.Draw(canvas, ends, x.End, DissolvedTop + 8, DissolvedBottom);
    }

    // The level that the dose was to reach, where the target is a concentration in mass per volume.
    private static void TargetLine(
        SvgCanvas canvas,
        Scale x,
        Scale y,
        StageResult stage,
        DoseCurve curve
    )
    {
        foreach (var dose in stage.Doses.Where(d => ReferenceEquals(d.Reagent, curve.Reagent)))
        {
            if (dose.Target?.Target is { Quantity: Quantity.Dissolved { InMoles: false } } target)
            {
                var level = target.Value * 1000;
                if (level > y.Low && level < y.High)
                {
                    canvas.Line(
                        Left,
                        y.At(level),
                        x.End,
                        y.At(level),
                        new Stroke("#4d5963", 0.9, "5 4")
                    );
                    canvas.Text(
                        Left + 5,
                        y.At(level) - 4,
                        target.Written,
                        new TextStyle(11, Fill: "#4d5963")
                    );
                }
            }
        }
    }

    private static void PHPanel(SvgCanvas canvas, Scale x, DoseCurve curve)
    {
        var low = Math.Floor(curve.Points.Min(p => p.PH));
        var high = Math.Ceiling(curve.Points.Max(p => p.PH));
        var y = Scale.Linear(low, Math.Max(high, low + 2), PHBottom, PHTop);
        Panel(canvas, x, y, "pH");
        canvas.Polyline(
            [
                .. curve.Points.Select(p =>
                    (x.At(DoseText.Number(curve.Reagent, p.Dose)), y.At(p.PH))
                ),
            ],
            new Stroke("#1b2126", 1.8)
        );
    }

    private static void FormedPanel(
        SvgCanvas canvas,
        Scale x,
        ImmutableArray<Series> solids,
        DoseCurve curve
    )
    {
        var totals = curve.Points.Select((_, k) => solids.Sum(s => s.Values[k])).ToArray();
        var (unit, size) = Throughput.MassUnit([totals.Max()]);
        var y = Scale.Linear(
            0,
            totals.Max() > 0 ? totals.Max() / size : 1,
            FormedBottom,
            FormedTop
        );
        Panel(canvas, x, y, $"Formed ({unit}/m3)");
        var below = new double[totals.Length];
        var ends = new List<(double, string, string)>();
        var edges = new List<List<(double X, double Y)>>();
        for (var i = 0; i < solids.Length; i++)
        {
            var lower = Edge();
            var start = below[^1];
            for (var k = 0; k < below.Length; k++)
            {
                below[k] += solids[i].Values[k] / size;
            }

            edges.Add(Edge());
            canvas.Area([.. edges[i], .. Enumerable.Reverse(lower)], CurveStyle.Tint(i));
            ends.Add((y.At((start + below[^1]) / 2), solids[i].Name, CurveStyle.Colour(i)));
        }

        for (var i = 0; i < edges.Count; i++)
        {
            canvas.Polyline(edges[i], CurveStyle.Line(i));
        }

        Box(canvas, x, FormedTop, FormedBottom);
        EndLabels.Draw(canvas, ends, x.End, FormedTop + 8, FormedBottom);

        List<(double X, double Y)> Edge() =>
            [
                .. curve.Points.Select(
                    (p, k) => (x.At(DoseText.Number(curve.Reagent, p.Dose)), y.At(below[k]))
                ),
            ];
    }

    private static void Panel(SvgCanvas canvas, Scale x, Scale y, string title)
    {
        foreach (var tick in x.Ticks)
        {
            canvas.Line(x.At(tick), y.Start, x.At(tick), y.End, Grid);
        }

        foreach (var tick in y.Ticks)
        {
            canvas.Line(Left, y.At(tick), x.End, y.At(tick), Grid);
            canvas.Text(Left - 6, y.At(tick) + 4, Scale.Label(tick), Tick with { Anchor = "end" });
        }

        Box(canvas, x, y.End, y.Start);
        canvas.Text(18, (y.Start + y.End) / 2, title, new TextStyle(12, "middle", Upright: true));
    }

    private static void Box(SvgCanvas canvas, Scale x, double top, double bottom) =>
        canvas.Polyline(
            [(Left, top), (x.End, top), (x.End, bottom), (Left, bottom), (Left, top)],
            Frame
        );

    private static void DoseAxis(SvgCanvas canvas, Scale x, Reagent reagent)
    {
        foreach (var tick in x.Ticks)
        {
            canvas.Line(x.At(tick), FormedBottom, x.At(tick), FormedBottom + 4, Frame);
            canvas.Text(
                x.At(tick),
                FormedBottom + 17,
                Scale.Label(tick),
                Tick with
                {
                    Anchor = "middle",
                }
            );
        }

        canvas.Text(
            (Left + x.End) / 2,
            FormedBottom + 38,
            $"Dose of {reagent.Name} ({(reagent.IsDry ? "kg" : "L as delivered")} per m3 entering the stage)",
            new TextStyle(12, "middle")
        );
    }

    private static void Given(SvgCanvas canvas, double at, string dose)
    {
        foreach (
            var (top, bottom) in new[]
            {
                (DissolvedTop, DissolvedBottom),
                (PHTop, PHBottom),
                (FormedTop, FormedBottom),
            }
        )
        {
            canvas.Line(at, top, at, bottom, new Stroke("#1b2126", 1.2, "3 2"));
        }

        canvas.Text(at, DissolvedTop - 5, "given " + dose, new TextStyle(11, "middle"));
    }
}
