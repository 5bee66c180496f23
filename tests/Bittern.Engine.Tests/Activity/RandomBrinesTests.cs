using Bittern.Engine.Activity;
using Xunit;

namespace Bittern.Engine.Tests.Activity;

/// <summary>Random brines of the whole 1984 system with all its solids, from the canonical start: every one is answered and certified, or dry (its hydrates take
/// all the water). Compositions go to some 15 mol/kg of ionic strength, past what the parameters were fitted to, and no further: where the
/// equations give an activity of water below 0.01 nothing is to be learnt.</summary>
public sealed class RandomBrinesTests
{
    [Fact]
    public void Every_brine_is_answered()
    {
        var system = Brine1984.System;
        var solver = new Solver(system);
        var answer = new Answer(system);
        var random = new Random(1984);
        (double Most, string[] Ions)[] salts =
        [
            (8, ["Na+", "Cl-"]),
            (5, ["K+", "Cl-"]),
            (6, ["Mg^2+", "Cl-", "Cl-"]),
            (4, ["Ca^2+", "Cl-", "Cl-"]),
            (3, ["Na+", "Na+", "SO4^2-"]),
            (3, ["Mg^2+", "SO4^2-"]),
            (2, ["Na+", "Na+", "CO3^2-"]),
            (1, ["H+", "Cl-"]),
            (1, ["Na+", "H+", "CO3^2-"]),
        ];
        var failures = new List<string>();
        var dry = 0;
        for (var trial = 0; trial < 1500; trial++)
        {
            var problem = new Problem(system);
            Array.Fill(problem.AllowedSolids, value: true);
            foreach (var (most, ions) in salts)
            {
                if (random.Next(3) > 0)
                {
                    continue;
                }

                var amount = most * Math.Pow(10, -3 * random.NextDouble());
                foreach (var ion in ions)
                {
                    problem.Totals[system.ComponentIndex(ion)] += amount;
                }
            }

            problem.TotalWater *= 0.3 + (0.7 * random.NextDouble());
            var status = solver.Solve(problem, answer);
            if (status is SolveStatus.Dry)
            {
                dry++;
                continue;
            }

            if (status is not SolveStatus.Solved || !Certificate.Check(problem, answer).Accepted)
            {
                failures.Add(
                    $"{trial} {status} {answer.Iterations}: {string.Join(' ', problem.Totals.Select(t => t.ToString("0.####")))}"
                );
            }
        }

        Assert.True(failures.Count == 0, string.Join('\n', failures));
        Assert.InRange(dry, 0, 30);
    }

    /// <summary>25 mol/kg of calcium and hydrogen chloride is beyond the equations; whatever it leaves in the solver must not reach the next answer.</summary>
    [Fact]
    public void What_was_solved_before_changes_no_digit()
    {
        var system = Brine1984.System;
        var wild = new Problem(system);
        wild.Totals[0] = 10;
        wild.Totals[4] = 30;
        wild.Totals[5] = 70;
        wild.TotalWater *= 0.3;
        var tame = new Problem(system);
        double[] totals = [0.001, 3, 0.2, 0.5, 0.02, 4.141, 0.05, 0.01];
        totals.CopyTo(tame.Totals, 0);
        Array.Fill(tame.AllowedSolids, value: true);
        Array.Fill(wild.AllowedSolids, value: true);
        var fresh = new Answer(system);
        Assert.Equal(SolveStatus.Solved, new Solver(system).Solve(tame, fresh));

        var solver = new Solver(system);
        var used = new Answer(system);
        solver.Solve(wild, used);
        Assert.Equal(SolveStatus.Solved, solver.Solve(tame, used));
        Assert.Equal(fresh.Molalities, used.Molalities);
        Assert.Equal(fresh.SolidAmounts, used.SolidAmounts);
    }
}
