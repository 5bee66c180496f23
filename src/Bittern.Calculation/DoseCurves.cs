using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>Traces how a stage answers to its reagent, for figures.</summary>
internal static class DoseCurves
{
    /// <summary>Equal steps of the curve: two pixels of a printed figure each, and about a millisecond of solving together.</summary>
    private const int Steps = 160;

    /// <summary>How far past the dose given the curve goes, so that a reader sees what over-dosing does.</summary>
    private const double Beyond = 1.5;

    /// <summary>The place where a target stops holding is shown when it lies within so many times the dose given.</summary>
    private const double FarthestStop = 3;

    /// <summary>
    /// The curve from no dose to half as much again as is given, or to a little past where the target stops holding.
    /// </summary>
    /// <param name="search">Solves the stage at a dose.</param>
    /// <param name="reagent">What is dosed.</param>
    /// <param name="given">Dose given, units per m3 entering; the curve is empty at 0.</param>
    /// <param name="stopsHoldingAt">Where the target stops holding; null without one.</param>
    /// <param name="before">mol of each solid in suspension as the stage began, per m3 of feed.</param>
    /// <param name="cancellation">Stops between solves.</param>
    public static DoseCurve? Trace(
        DoseSearch search,
        Reagent reagent,
        double given,
        double? stopsHoldingAt,
        double[] before,
        CancellationToken cancellation
    )
    {
        if (given <= 0)
        {
            return null;
        }

        var extent = given * Beyond;
        if (stopsHoldingAt is { } stop && stop < FarthestStop * given)
        {
            extent = Math.Max(extent, stop * 1.1);
        }

        var points = ImmutableArray.CreateBuilder<DosePoint>();
        Stream? near = null;
        for (var k = 0; k <= Steps; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            var dose = extent * k / Steps;
            if (search.At(dose, near) is { } stream)
            {
                points.Add(Point(dose, stream, before));
                near = stream;
            }
        }

        return new DoseCurve(reagent, given, points.ToImmutable());
    }

    private static DosePoint Point(double dose, Stream stream, double[] before)
    {
        var system = stream.System;
        var volume = stream.Volume;
        var formed = new double[before.Length];
        for (var s = 0; s < formed.Length; s++)
        {
            formed[s] = States.Change(before[s], stream.Suspended[s]);
        }

        return new DosePoint(
            dose,
            -stream.Answer.LnActivities[system.HydrogenIndex] / Math.Log(10),
            [
                .. system
                    .Basis.Select((b, i) => (b, i))
                    .Where(p => p.i != system.HydrogenIndex)
                    .Select(p => new Term(
                        system.Dissolved(stream.Answer, p.i) / volume,
                        p.b.Formula
                    )),
            ],
            States.Amounts(system, formed)
        );
    }
}
