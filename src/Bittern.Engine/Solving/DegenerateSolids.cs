using Bittern.Engine.Numerics;

namespace Bittern.Engine.Solving;

/// <summary>
/// Solids whose reactions depend on each other and that are saturated at once have no amounts of their own: any split that takes the same matter is an equilibrium. The
/// split with the least sum of squares is chosen, so that the answer does not depend on the order of the solids, and the solids are marked.
/// </summary>
internal static class DegenerateSolids
{
    /// <summary>|ln Ω| within which an absent solid counts as saturated; the polish leaves present ones within a tenth of it.</summary>
    private const double Saturated = 1e-9;

    /// <summary>Largest relative gap between what the split takes and what the answer had taken.</summary>
    private const double MatterTolerance = 1e-13;

    /// <summary>Most solids that share one split.</summary>
    private const int Most = 16;

    public static void Share(Problem problem, Answer answer)
    {
        Array.Clear(answer.Degenerate);
        Span<int> tied = stackalloc int[Most];
        var count = Tied(problem, answer, tied);
        if (count == 0)
        {
            return;
        }

        Span<double> amounts = stackalloc double[Most];
        while (count > 0 && !LeastSquares(problem.System, answer, tied[..count], amounts))
        {
            // A negative share leaves; the rest is split anew.
            var worst = 0;
            for (var k = 1; k < count; k++)
            {
                worst = amounts[k] < amounts[worst] ? k : worst;
            }

            if (amounts[worst] >= 0)
            {
                return;
            }

            for (var k = worst; k + 1 < count; k++)
            {
                tied[k] = tied[k + 1];
            }

            count--;
        }

        for (var k = 0; k < count; k++)
        {
            answer.SolidAmounts[tied[k]] = amounts[k];
            answer.Degenerate[tied[k]] = count > 1;
        }
    }

    // An absent saturated solid, with the present ones that share a component with it; no tie without such an absent one.
    private static int Tied(Problem problem, Answer answer, Span<int> tied)
    {
        var solids = problem.System.Solids;
        var any = false;
        for (var s = 0; s < solids.Length; s++)
        {
            any |= IsAbsentSaturated(problem, answer, s);
        }

        if (!any)
        {
            return 0;
        }

        var count = 0;
        for (var s = 0; s < solids.Length && count < tied.Length; s++)
        {
            if (answer.SolidAmounts[s] > 0 || IsAbsentSaturated(problem, answer, s))
            {
                tied[count++] = s;
            }
        }

        return count;
    }

    private static bool IsAbsentSaturated(Problem problem, Answer answer, int solid) =>
        problem.AllowedSolids[solid]
        && answer.SolidAmounts[solid] == 0
        && Math.Abs(answer.LnSaturations[solid]) < Saturated;

    // n = A λ with (AᵀA) λ = Aᵀ-image of the present amounts: the shortest n that takes the same matter, water included. False when the amounts are not usable:
    // one is negative, or the matter is not met.
    private static bool LeastSquares(
        EquilibriumSystem system,
        Answer answer,
        ReadOnlySpan<int> tied,
        Span<double> amounts
    )
    {
        var n = system.Components.Length + 1;
        var matrix = new double[n * n];
        var matter = new double[n];
        var scale = new double[n];
        for (var s = 0; s < system.Solids.Length; s++)
        {
            for (var c = 0; c < n && answer.SolidAmounts[s] > 0; c++)
            {
                matter[c] += Row(system, s, c) * answer.SolidAmounts[s];
            }
        }

        foreach (var s in tied)
        {
            for (var c = 0; c < n; c++)
            {
                for (var d = 0; d <= c; d++)
                {
                    matrix[(c * n) + d] += Row(system, s, c) * Row(system, s, d);
                }
            }
        }

        var lambda = (double[])matter.Clone();
        Cholesky.Factor(matrix, n, n, scale);
        Cholesky.Solve(matrix, n, n, scale, lambda);
        var usable = true;
        for (var k = 0; k < tied.Length; k++)
        {
            amounts[k] = 0;
            for (var c = 0; c < n; c++)
            {
                amounts[k] += Row(system, tied[k], c) * lambda[c];
            }

            usable &= amounts[k] >= 0;
        }

        for (var c = 0; c < n && usable; c++)
        {
            var taken = 0.0;
            var gross = 0.0;
            for (var k = 0; k < tied.Length; k++)
            {
                taken += Row(system, tied[k], c) * amounts[k];
                gross += Math.Abs(Row(system, tied[k], c) * amounts[k]);
            }

            usable =
                Math.Abs(taken - matter[c])
                <= MatterTolerance * Math.Max(gross, Math.Abs(matter[c]));
        }

        return usable;
    }

    private static double Row(EquilibriumSystem system, int solid, int component) =>
        component < system.Components.Length
            ? system.Solids[solid].Coefficients[component]
            : system.Solids[solid].Water;
}
