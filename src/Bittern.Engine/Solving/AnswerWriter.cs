using Bittern.Engine.Numerics;

namespace Bittern.Engine.Solving;

/// <summary>Takes the solved point back to the system's own components.</summary>
internal static class AnswerWriter
{
    public static void Write(Problem problem, ReducedProblem reduced, Iterate x, Answer answer)
    {
        var system = problem.System;
        Array.Fill(answer.LnActivities, double.NegativeInfinity);
        for (var c = 0; c < reduced.ComponentCount; c++)
        {
            answer.LnActivities[reduced.Components[c]] = x.Y[c];
        }

        answer.LnWaterActivity = x.LnWaterActivity;
        answer.WaterKilograms = x.Water;
        WritePivots(reduced, x, answer);
        Array.Clear(answer.Molalities);
        for (var k = 0; k < reduced.SpeciesCount; k++)
        {
            answer.Molalities[reduced.Species[k]] = x.Moles[k] / answer.WaterKilograms;
        }

        x.LnGamma.CopyTo(answer.LnGammas, 0);
        Array.Clear(answer.SolidAmounts);
        for (var s = 0; s < reduced.SolidCount; s++)
        {
            answer.SolidAmounts[reduced.Solids[s]] = x.SolidAmounts[s];
        }

        for (var s = 0; s < system.Solids.Length; s++)
        {
            answer.LnSaturations[s] = reduced.LnSaturation(s, x.Y, x.LnWaterActivity);
        }

        DegenerateSolids.Share(problem, answer);
        WriteExchanges(problem, reduced, answer);
    }

    private static void WritePivots(ReducedProblem reduced, Iterate x, Answer answer)
    {
        var n = answer.LnActivities.Length;
        for (var p = 0; p < reduced.PivotCount; p++)
        {
            var value = reduced.PivotLnActivity[p] - (reduced.PivotWater[p] * x.LnWaterActivity);
            for (var k = 0; k < n; k++)
            {
                var v = reduced.PivotRows[(p * n) + k];
                if (v != 0)
                {
                    value -= v * answer.LnActivities[k];
                }
            }

            answer.LnActivities[reduced.PivotOf[p]] = value;
        }
    }

    // What the outside supplied: the residuals of the balances that the fixed activities replaced.
    private static void WriteExchanges(Problem problem, ReducedProblem reduced, Answer answer)
    {
        var system = problem.System;
        Array.Clear(answer.GasAmounts);
        Array.Clear(answer.FixedAmounts);
        var gases = 0;
        for (var p = 0; p < reduced.PivotCount; p++)
        {
            gases += reduced.PivotGas[p] >= 0 ? 1 : 0;
        }

        if (reduced.PivotCount == 0)
        {
            return;
        }

        const int Most = 16;
        if (gases > Most)
        {
            throw new InvalidOperationException($"at most {Most} gases can be fixed at a time");
        }

        Span<double> matrix = stackalloc double[Most * Most];
        Span<double> rhs = stackalloc double[Most];
        Span<double> scale = stackalloc double[Most];
        Span<int> pivots = stackalloc int[Most];
        Span<int> gasOf = stackalloc int[Most];
        var row = 0;
        for (var p = 0; p < reduced.PivotCount; p++)
        {
            if (reduced.PivotGas[p] < 0)
            {
                continue;
            }

            gasOf[row] = reduced.PivotGas[p];
            rhs[row] = Shortfall(problem, answer, reduced.PivotOf[p]);
            var column = 0;
            for (var q = 0; q < reduced.PivotCount; q++)
            {
                if (reduced.PivotGas[q] >= 0)
                {
                    matrix[(row * Most) + column++] = system
                        .Gases[reduced.PivotGas[q]]
                        .Coefficients[reduced.PivotOf[p]];
                }
            }

            row++;
        }

        if (gases > 0 && Lu.Factor(matrix, gases, Most, pivots, scale))
        {
            Lu.Solve(matrix, gases, Most, pivots, scale, rhs);
            for (var g = 0; g < gases; g++)
            {
                answer.GasAmounts[gasOf[g]] = rhs[g];
            }
        }

        for (var p = 0; p < reduced.PivotCount; p++)
        {
            if (reduced.PivotGas[p] < 0)
            {
                var i = reduced.PivotOf[p];
                var amount = Shortfall(problem, answer, i);
                for (var g = 0; g < gases; g++)
                {
                    amount -= system.Gases[gasOf[g]].Coefficients[i] * rhs[g];
                }

                answer.FixedAmounts[i] = amount;
            }
        }
    }

    // What is in the liquor and the solids of a component beyond its total.
    private static double Shortfall(Problem problem, Answer answer, int component)
    {
        var system = problem.System;
        var sum = -problem.Totals[component];
        for (var j = 0; j < system.Species.Length; j++)
        {
            sum +=
                system.Species[j].Coefficients[component]
                * answer.Molalities[j]
                * answer.WaterKilograms;
        }

        for (var s = 0; s < system.Solids.Length; s++)
        {
            sum += system.Solids[s].Coefficients[component] * answer.SolidAmounts[s];
        }

        return sum;
    }
}
