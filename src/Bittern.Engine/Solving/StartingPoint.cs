using Bittern.Chemistry;

namespace Bittern.Engine.Solving;

/// <summary>
/// A first guess without solids: each balance in turn is brought close in logarithms, ln(what counts up) = ln(what counts down). Far from the
/// answer this converges where Newton's method on the plain balances crawls (an overshoot by a factor e^k costs it k steps).
/// </summary>
internal static class StartingPoint
{
    private const int Sweeps = 12;

    /// <summary>A sweep that moves no ln activity by more than this hands over to Newton's method.</summary>
    private const double GoodEnough = 0.2;

    public static void Find(Iterate x)
    {
        var problem = x.Problem;
        x.LnWater = Math.Log(problem.TotalWater * PhysicalConstants.WaterMolarMass);
        Array.Clear(x.LnGamma);
        Array.Clear(x.SolidAmounts);

        // What the last problem left here would steer the damping, or poison it for good if that problem ended in NaN.
        Array.Clear(x.Moments);
        x.LnWaterActivity = 0;
        for (var c = 0; c < problem.ComponentCount; c++)
        {
            x.Y[c] =
                problem.OneSigned[c] != 0
                    ? problem.OneSigned[c]
                        * Math.Max(Math.Log(Math.Abs(problem.Totals[c])) - x.LnWater, -700)
                    : Math.Log(1e-7);
        }

        x.ComputeMoles();
        for (var sweep = 0; sweep < Sweeps; sweep++)
        {
            if (Sweep(x) < GoodEnough)
            {
                break;
            }
        }

        x.ComputeMoles();
    }

    private static double Sweep(Iterate x)
    {
        var problem = x.Problem;
        var largest = 0.0;
        for (var c = 0; c < problem.ComponentCount; c++)
        {
            var step = LogStep(x, c);
            largest = Math.Max(largest, Math.Abs(step));
            x.Y[c] += step;
            for (var k = 0; k < problem.SpeciesCount; k++)
            {
                for (var e = problem.SpeciesStart[k]; e < problem.SpeciesStart[k + 1]; e++)
                {
                    if (problem.SpeciesColumn[e] == c)
                    {
                        x.Moles[k] = Math.Exp(Math.Min(x.LnMoles(k), 300));
                    }
                }
            }
        }

        return largest;
    }

    // One Newton step on f(y) = ln(up) - ln(down), which is monotone in y; at most 20 in ln a.
    private static double LogStep(Iterate x, int component)
    {
        var problem = x.Problem;
        var up = Math.Max(-problem.Totals[component], 0);
        var down = Math.Max(problem.Totals[component], 0);
        var upSlope = 0.0;
        var downSlope = 0.0;
        for (var k = 0; k < problem.SpeciesCount; k++)
        {
            for (var e = problem.SpeciesStart[k]; e < problem.SpeciesStart[k + 1]; e++)
            {
                if (problem.SpeciesColumn[e] != component)
                {
                    continue;
                }

                var v = problem.SpeciesValue[e];
                if (v > 0)
                {
                    up += v * x.Moles[k];
                    upSlope += v * v * x.Moles[k];
                }
                else
                {
                    down -= v * x.Moles[k];
                    downSlope += v * v * x.Moles[k];
                }
            }
        }

        if (up <= 0 || down <= 0)
        {
            return up > 0 ? -5
                : down > 0 ? 5
                : 0;
        }

        var slope = (upSlope / up) + (downSlope / down);
        return Math.Clamp((Math.Log(down) - Math.Log(up)) / Math.Max(slope, 0.25), -20, 20);
    }
}
