using Bittern.Reference;
using Xunit;

namespace Bittern.Engine.Tests.Activity;

/// <summary>Solubilities that come out of solving the system of 1984, not of evaluating the model: the solver has to live with γ that change a thousandfold.</summary>
public sealed class BrineSolubilityTests
{
    public static TheoryData<string, double, double> Solubilities => Rows("solubility");

    public static TheoryData<string, double, double> WaterActivities => Rows("water_activity");

    private static TheoryData<string, double, double> Rows(string kind) =>
        [
            .. ReferenceTable
                .Rows("activity/solubility-25C.csv")
                .Where(r => string.Equals(r["kind"], kind, StringComparison.Ordinal))
                .Select(r => new TheoryDataRow<string, double, double>(
                    r["solid"],
                    ParameterTables.Number(r["value"]),
                    ParameterTables.Number(r["model_value"])
                )),
        ];

    [Theory]
    [MemberData(nameof(Solubilities))]
    public void A_salt_dissolves_to_its_solubility(string solid, double published, double model)
    {
        var (answer, formulas) = Saturated(solid);
        var found = formulas / answer.WaterKilograms;
        Assert.InRange(found / published, 0.97, 1.03);

        // The independent evaluation leaves the hydrolysis of carbonates out.
        var share = Brine1984.System.Solids[Brine1984.System.SolidIndex(solid)].Coefficients[^1];
        Assert.InRange(found / model, 0.999, share == 0 ? 1.001 : 1.02);
    }

    [Theory]
    [MemberData(nameof(WaterActivities))]
    public void Its_solution_has_the_published_water_activity(
        string solid,
        double published,
        double model
    )
    {
        var found = Math.Exp(Saturated(solid).Answer.LnWaterActivity);
        Assert.InRange(found - model, -2e-4, 2e-4);

        // Bischofite is 4 % low in water activity with this set; the others are within 0.3 %.
        Assert.InRange(found / published, 0.99, solid is "Bischofite" ? 1.045 : 1.01);
    }

    /// <summary>Where two salts saturate one solution: published 5.09 and 2.20, and 5.54 and 0.69 mol/kg (handbook).</summary>
    [Theory]
    [InlineData("Halite", "Sylvite", 5.081, 2.132)]
    [InlineData("Halite", "Thenardite", 5.499, 0.712)]
    public void Two_salts_share_an_invariant_point(
        string one,
        string other,
        double ofOne,
        double ofOther
    )
    {
        var system = Brine1984.System;
        var problem = new Problem(system);
        Add(problem, one, 12);
        Add(problem, other, 12);
        Array.Fill(problem.AllowedSolids, value: true);
        var answer = Solved.Certified(problem);
        Assert.InRange(Left(answer, one) / ofOne, 0.999, 1.001);
        Assert.InRange(Left(answer, other) / ofOther, 0.999, 1.001);

        double Left(Answer a, string solid) =>
            (12 - a.SolidAmounts[system.SolidIndex(solid)]) / a.WaterKilograms;
    }

    /// <summary>
    /// Sea water without carbonate, evaporated until bischofite is about to take its last water: the order of solids that Harvie, Weare, Hardie and Eugster
    /// (1980, Science 208, 498; recalled) find at equilibrium, and the invariant point at which it dries up, a_w = 0.338. Every tenth state is also reached from the
    /// canonical start.
    /// </summary>
    [Fact]
    public void Sea_water_drops_its_salts_in_the_known_order()
    {
        var system = Brine1984.System;
        var solver = new Solver(system);
        var answer = new Answer(system);
        var problem = new Problem(system);
        Array.Fill(problem.AllowedSolids, value: true);
        double[] totals = [0, 0.486, 0.0106, 0.0547, 0.0107, 0.5658, 0.0292, 0];
        totals[5] = totals[1] + totals[2] + (2 * (totals[3] + totals[4] - totals[6]));
        totals.CopyTo(problem.Totals, 0);
        var order = new List<string>();
        var cold = new Answer(system);
        var step = 0;
        for (var water = 1.0; water > 0.0044; water *= 0.97, step++)
        {
            problem.TotalWater = water / Chemistry.PhysicalConstants.WaterMolarMass;
            var status = solver.SolveNear(problem, answer);
            Assert.True(status == SolveStatus.Solved, $"{status} at {water} kg");
            Assert.True(Certificate.Check(problem, answer).Accepted);
            if (step % 10 == 0)
            {
                Assert.Equal(SolveStatus.Solved, solver.Solve(problem, cold));
                Assert.Equal(answer.WaterKilograms, cold.WaterKilograms, 1e-9);
            }

            for (var s = 0; s < answer.SolidAmounts.Length; s++)
            {
                if (
                    answer.SolidAmounts[s] > 0
                    && !order.Contains(system.Solids[s].Name, StringComparer.Ordinal)
                )
                {
                    order.Add(system.Solids[s].Name);
                }
            }
        }

        Assert.Equal(
            [
                "Gypsum",
                "Anhydrite",
                "Halite",
                "Glauberite",
                "Polyhalite",
                "Epsomite",
                "Hexahydrite",
                "Kieserite",
                "Carnallite",
                "Bischofite",
            ],
            order,
            StringComparer.Ordinal
        );
        Assert.InRange(Math.Exp(answer.LnWaterActivity), 0.337, 0.339);

        problem.TotalWater *= 0.9;
        Assert.Equal(SolveStatus.Dry, solver.Solve(problem, answer));
    }

    /// <summary>Hexahydrite and kieserite differ by water alone; over a range of water both are there and hold the activity of water between them.</summary>
    [Fact]
    public void Two_hydrates_hold_the_activity_of_water()
    {
        var system = Brine1984.System;
        var problem = new Problem(system);
        double[] totals = [0, 0.486, 0.0106, 0.0547, 0.0107, 0, 0.0292, 0];
        totals[5] = totals[1] + totals[2] + (2 * (totals[3] + totals[4] - totals[6]));
        totals.CopyTo(problem.Totals, 0);
        Array.Fill(problem.AllowedSolids, value: true);
        problem.TotalWater = 0.01057 / Chemistry.PhysicalConstants.WaterMolarMass;
        var answer = Solved.Certified(problem);
        Assert.True(answer.SolidAmounts[system.SolidIndex("Hexahydrite")] > 1e-4);
        Assert.True(answer.SolidAmounts[system.SolidIndex("Kieserite")] > 1e-4);
    }

    private static (Answer Answer, double Formulas) Saturated(string solid)
    {
        const double Amount = 20;
        var system = Brine1984.System;
        var problem = new Problem(system);
        Add(problem, solid, Amount);
        var index = system.SolidIndex(solid);
        problem.AllowedSolids[index] = true;

        // A hydrate brings water of its own; with little more than that some of it stays undissolved.
        problem.TotalWater = 5 + (Amount * system.Solids[index].Water);
        problem.TotalWater += system.Solids[index].Water > 0 ? 0 : 50;
        var answer = Solved.Certified(problem);
        return (answer, Amount - answer.SolidAmounts[index]);
    }

    private static void Add(Problem problem, string solid, double amount)
    {
        var formation = problem.System.Solids[problem.System.SolidIndex(solid)];
        for (var i = 0; i < problem.Totals.Length; i++)
        {
            problem.Totals[i] += amount * formation.Coefficients[i];
        }
    }
}
