using Bittern.Engine.Activity;
using Xunit;

namespace Bittern.Engine.Tests;

/// <summary>Random systems of every shape: an answer that is returned as solved is certified, and nearly all are solved.</summary>
public sealed class RandomSystemsTests
{
    [Theory]
    [InlineData(1, false)]
    [InlineData(2, false)]
    [InlineData(3, true)]
    [InlineData(4, true)]
    public void Every_answer_is_certified(int seed, bool real)
    {
        var failures = new List<string>();
        var iterations = 0;
        const int Count = 500;
        for (var i = 0; i < Count; i++)
        {
            var problem = RandomProblem(new Random((seed * 100_000) + i), real);
            var answer = new Answer(problem.System);
            var status = new Solver(problem.System).Solve(problem, answer);
            iterations += answer.Iterations;
            if (status != SolveStatus.Solved)
            {
                failures.Add($"{i}: {status} {answer.Obstacle} {answer.Iterations}");
                continue;
            }

            var certificate = Certificate.Check(problem, answer);
            if (!certificate.Accepted)
            {
                failures.Add($"{i}: {certificate}");
            }
        }

        TestContext.Current.TestOutputHelper?.WriteLine(
            $"iterations {(double)iterations / Count:0.0}"
        );
        Assert.True(
            failures.Count == 0,
            $"{failures.Count} of {Count}, mean iterations {(double)iterations / Count:0.0}\n"
                + string.Join("\n", failures.Take(20))
        );
    }

    internal static Problem RandomProblem(Random random, bool real)
    {
        var builder = new SystemBuilder().Component("H+", 1);
        var metals = random.Next(1, 6);
        var ligands = random.Next(1, 5);
        var charges = new int[1 + metals + ligands];
        for (var m = 1; m <= metals; m++)
        {
            charges[m] = random.Next(1, 4);
            builder.Component($"M{m}", charges[m]);
        }

        for (var l = 1; l <= ligands; l++)
        {
            charges[metals + l] = -random.Next(1, 4);
            builder.Component($"L{l}", charges[metals + l]);
        }

        builder.Component("Na+", 1).Component("Cl-", -1);
        builder.Complex("OH-", -1, -14, ("H2O", 1), ("H+", -1));
        for (var m = 1; m <= metals; m++)
        {
            var z = charges[m];
            for (var h = 1; h <= random.Next(0, 5); h++)
            {
                builder.Complex(
                    $"M{m}(OH){h}",
                    z - h,
                    -h * (3 + (8 * random.NextDouble())),
                    ($"M{m}", 1),
                    ("H2O", h),
                    ("H+", -h)
                );
            }

            if (random.Next(3) > 0)
            {
                builder.Solid(
                    $"m{m}-hydroxide",
                    -z * (2 + (7 * random.NextDouble())),
                    ($"M{m}", 1),
                    ("H2O", z),
                    ("H+", -z)
                );
            }

            for (var l = 1; l <= ligands; l++)
            {
                var zl = charges[metals + l];
                if (random.Next(2) == 0)
                {
                    builder.Complex(
                        $"M{m}L{l}",
                        z + zl,
                        (8 * random.NextDouble()) - 0.5,
                        ($"M{m}", 1),
                        ($"L{l}", 1)
                    );
                }

                if (random.Next(2) == 0)
                {
                    builder.Solid(
                        $"m{m}l{l}",
                        (z - zl) * (0.5 + (3.5 * random.NextDouble())),
                        ($"M{m}", -zl),
                        ($"L{l}", z)
                    );
                    if (random.Next(4) == 0)
                    {
                        builder.Solid(
                            $"m{m}l{l}-other",
                            (z - zl) * (0.5 + (3.5 * random.NextDouble())),
                            ($"M{m}", -zl),
                            ($"L{l}", z),
                            ("H2O", 2)
                        );
                    }
                }
            }
        }

        for (var l = 1; l <= ligands; l++)
        {
            var k = 0.0;
            for (var h = 1; h <= Math.Min(3, -charges[metals + l] + 1) && random.Next(3) > 0; h++)
            {
                k += 1 + (10 * random.NextDouble());
                builder.Complex($"H{h}L{l}", charges[metals + l] + h, k, ($"L{l}", 1), ("H+", h));
            }
        }

        var system = builder.Build(real ? new Davies() : new Ideal());
        var problem = new Problem(system);
        Array.Fill(problem.AllowedSolids, value: true);
        var charge = 0.0;
        for (var i = 1; i < 1 + metals + ligands; i++)
        {
            problem.Totals[i] =
                random.Next(8) == 0
                    ? 0
                    : Math.Pow(10, -(random.Next(5) == 0 ? 20 : 6) * random.NextDouble()) * 0.3;
            charge += problem.Totals[i] * charges[i];
        }

        var acid = (random.NextDouble() - 0.5) * Math.Pow(10, -4 * random.NextDouble());
        problem.Totals[0] = acid;
        charge += acid;
        problem.Totals[^1] = 0.01 + Math.Max(charge, 0);
        problem.Totals[^2] = 0.01 + Math.Max(-charge, 0);
        return problem;
    }
}
