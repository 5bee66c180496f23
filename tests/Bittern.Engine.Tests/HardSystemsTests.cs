using Bittern.Engine.Activity;
using Xunit;

namespace Bittern.Engine.Tests;

/// <summary>Classes of problem that break solvers: traces, strong acid and base, redox, degenerate and large stoichiometry, too much of everything.</summary>
public sealed class HardSystemsTests
{
    [Theory]
    [InlineData(1e-30)]
    [InlineData(1e-200)]
    [InlineData(0)]
    public void A_trace_total_is_carried_exactly(double trace)
    {
        var system = SimpleSystemsTests.Carbonate();
        var problem = new Problem(system) { AllowedSolids = { [0] = true } };
        problem.Totals[0] = 1e-3;
        problem.Totals[1] = trace;
        problem.Totals[2] = 1e-3;

        var answer = Solved.Certified(problem);

        var calcium =
            answer.Molalities[1]
            + answer.Molalities[system.SpeciesIndex("CaCO3(aq)")]
            + answer.Molalities[system.SpeciesIndex("CaHCO3+")];
        Assert.Equal(trace, calcium * answer.WaterKilograms, trace * 1e-10);
    }

    [Theory]
    [InlineData(10)]
    [InlineData(-10)]
    [InlineData(0)]
    [InlineData(1e-9)]
    [InlineData(-1e-9)]
    public void Strong_acid_and_base(double acid)
    {
        var system = SimpleSystemsTests.Carbonate();
        foreach (var model in new IActivityModel[] { new Ideal(), new Davies() })
        {
            var problem = new Problem(SimpleSystemsTests.Carbonate(model));
            problem.Totals[0] = acid;
            problem.Totals[1] = 1e-4;
            problem.Totals[2] = 1e-4;

            Solved.Certified(problem);
        }

        Assert.NotNull(system);
    }

    [Theory]
    [InlineData(-40)]
    [InlineData(0)]
    [InlineData(40)]
    public void A_fixed_pe_over_eighty_decades(double pe)
    {
        var system = Redox(waterReacts: false);
        var problem = new Problem(system);
        problem.Totals[system.ComponentIndex("Fe^2+")] = 1e-3;
        problem.Totals[system.ComponentIndex("H+")] = 1e-2;
        problem.FixedLog10Activities[system.ComponentIndex("e-")] = -pe;
        Array.Fill(problem.AllowedSolids, value: true);

        Solved.Certified(problem);
    }

    [Theory]
    [InlineData(-40)]
    [InlineData(40)]
    public void A_pe_that_water_cannot_stand_has_no_answer(double pe)
    {
        // O2(aq) or H2(aq) would need some 10^66 mol/kg: all water is used up before.
        var system = Redox(waterReacts: true);
        var problem = new Problem(system);
        problem.Totals[system.ComponentIndex("Fe^2+")] = 1e-3;
        problem.Totals[system.ComponentIndex("H+")] = 1e-2;
        problem.FixedLog10Activities[system.ComponentIndex("e-")] = -pe;

        Assert.NotEqual(SolveStatus.Solved, new Solver(system).Solve(problem, new Answer(system)));
    }

    [Theory]
    [InlineData(-1e-4)]
    [InlineData(-1e-3)]
    [InlineData(-9.99e-4)]
    [InlineData(-2e-3)]
    [InlineData(-0.5)]
    [InlineData(1e-6)]
    [InlineData(0.02)]
    public void An_electron_balance_finds_its_pe(double electrons)
    {
        var system = Redox(waterReacts: true);
        var problem = new Problem(system);
        problem.Totals[system.ComponentIndex("Fe^2+")] = 1e-3;
        problem.Totals[system.ComponentIndex("H+")] = 1e-2;
        problem.Totals[system.ComponentIndex("e-")] = electrons;
        Array.Fill(problem.AllowedSolids, value: true);

        Solved.Certified(problem);
    }

    [Fact]
    public void The_same_solid_twice_is_degenerate_but_answered()
    {
        var system = new SystemBuilder()
            .Component("H+", 1)
            .Component("Ca^2+", 2)
            .Component("SO4^2-", -2)
            .Complex("OH-", -1, -14, ("H2O", 1), ("H+", -1))
            .Solid("gypsum", 4.58, ("Ca^2+", 1), ("SO4^2-", 1), ("H2O", 2))
            .Solid("gypsum-again", 4.58, ("Ca^2+", 1), ("SO4^2-", 1), ("H2O", 2))
            .Build(new Davies());
        var problem = new Problem(system);
        Array.Fill(problem.AllowedSolids, value: true);
        problem.Totals[1] = 0.1;
        problem.Totals[2] = 0.1;

        var answer = Solved.Certified(problem);

        Assert.InRange(answer.SolidAmounts.Sum(), 0.08, 0.1);

        // Neither has an amount of its own: the shortest split is half and half, whatever their order, and both are marked.
        Assert.Equal(answer.SolidAmounts[0], answer.SolidAmounts[1], 1e-12);
        Assert.All(answer.Degenerate, Assert.True);
    }

    [Fact]
    public void Large_coefficients_and_polynuclear_species()
    {
        var system = new SystemBuilder()
            .Component("H+", 1)
            .Component("Ca^2+", 2)
            .Component("Al^3+", 3)
            .Component("SO4^2-", -2)
            .Component("PO4^3-", -3)
            .Complex("OH-", -1, -14, ("H2O", 1), ("H+", -1))
            .Complex("AlOH^2+", 2, -4.98, ("Al^3+", 1), ("H2O", 1), ("H+", -1))
            .Complex("Al(OH)4-", -1, -22.88, ("Al^3+", 1), ("H2O", 4), ("H+", -4))
            .Complex("Al13", 7, -100.03, ("Al^3+", 13), ("H2O", 28), ("H+", -32))
            .Complex("HPO4^2-", -2, 12.35, ("PO4^3-", 1), ("H+", 1))
            .Complex("H2PO4-", -1, 19.55, ("PO4^3-", 1), ("H+", 2))
            .Complex("H3PO4", 0, 21.7, ("PO4^3-", 1), ("H+", 3))
            .Solid("hydroxyapatite", 44.52, ("Ca^2+", 5), ("PO4^3-", 3), ("H2O", 1), ("H+", -1))
            .Solid(
                "ettringite",
                -56.9,
                ("Ca^2+", 6),
                ("Al^3+", 2),
                ("SO4^2-", 3),
                ("H2O", 38),
                ("H+", -12)
            )
            .Solid("gibbsite", -7.75, ("Al^3+", 1), ("H2O", 3), ("H+", -3))
            .Solid("portlandite", -22.8, ("Ca^2+", 1), ("H2O", 2), ("H+", -2))
            .Solid("gypsum", 4.58, ("Ca^2+", 1), ("SO4^2-", 1), ("H2O", 2))
            .Build(new Davies());
        for (var alkali = -0.3; alkali < 0.3; alkali += 0.01)
        {
            foreach (var solids in new[] { true, false })
            {
                var problem = new Problem(system);
                Array.Fill(problem.AllowedSolids, solids);
                problem.Totals[0] = alkali;
                problem.Totals[1] = 0.1;
                problem.Totals[2] = 0.02;
                problem.Totals[3] = 0.05;
                problem.Totals[4] = 0.01;

                Solved.Certified(problem);
            }
        }
    }

    [Theory]
    [InlineData(0)]
    [InlineData(4)]
    [InlineData(7)]
    [InlineData(9)]
    [InlineData(11)]
    [InlineData(16)]
    public void Forty_competing_solids(int seed)
    {
        var random = new Random(seed);
        var builder = new SystemBuilder().Component("H+", 1);
        string[] metals = ["A", "B", "C", "D", "E"];
        string[] ligands = ["X", "Y", "Z"];
        foreach (var metal in metals)
        {
            builder.Component(metal, 2);
        }

        foreach (var ligand in ligands)
        {
            builder.Component(ligand, -2);
        }

        builder.Complex("OH-", -1, -14, ("H2O", 1), ("H+", -1));
        foreach (var metal in metals)
        {
            builder.Solid(
                metal + "-hydroxide",
                -8 - (8 * random.NextDouble()),
                (metal, 1),
                ("H2O", 2),
                ("H+", -2)
            );
            foreach (var ligand in ligands)
            {
                builder.Solid(
                    metal + ligand,
                    4 + (6 * random.NextDouble()),
                    (metal, 1),
                    (ligand, 1)
                );
                builder.Solid(
                    metal + ligand + "-basic",
                    -4 + (10 * random.NextDouble()),
                    (metal, 2),
                    (ligand, 1),
                    ("H2O", 2),
                    ("H+", -2)
                );
            }
        }

        for (var d = 0; d < 5; d++)
        {
            builder.Solid(
                $"double{d}",
                10 + (6 * random.NextDouble()),
                (metals[d], 1),
                (metals[(d + 1) % 5], 1),
                (ligands[d % 3], 2)
            );
        }

        var system = builder.Build(new Davies());
        Assert.Equal(40, system.Solids.Length);
        for (var trial = 0; trial < 200; trial++)
        {
            var problem = new Problem(system);
            Array.Fill(problem.AllowedSolids, value: true);
            for (var i = 1; i < problem.Totals.Length; i++)
            {
                problem.Totals[i] = Math.Pow(10, -6 * random.NextDouble());
            }

            problem.Totals[0] = 0.4 * (random.NextDouble() - 0.5);
            Solved.Certified(problem);
        }
    }

    [Fact]
    public void A_total_that_no_species_can_carry_is_refused_by_name()
    {
        var problem = new Problem(SimpleSystemsTests.Carbonate());
        problem.Totals[1] = -1e-3;
        var answer = new Answer(problem.System);

        Assert.Equal(SolveStatus.NegativeTotal, new Solver(problem.System).Solve(problem, answer));
        Assert.Equal("Ca^2+", answer.Obstacle);
    }

    [Fact]
    public void Two_pressures_of_one_gas_contradict()
    {
        var system = new SystemBuilder()
            .Component("H+", 1)
            .Component("CO3^2-", -2)
            .Complex("OH-", -1, -14, ("H2O", 1), ("H+", -1))
            .Gas("CO2(g)", 18.149, ("CO3^2-", 1), ("H+", 2), ("H2O", -1))
            .Gas("CO2(g)-again", 18.149, ("CO3^2-", 1), ("H+", 2), ("H2O", -1))
            .Build(new Ideal());
        var problem = new Problem(system);
        problem.FixedGasPressures[0] = 1;
        problem.FixedGasPressures[1] = 0.5;
        var answer = new Answer(system);

        Assert.Equal(
            SolveStatus.ConflictingFixedActivities,
            new Solver(system).Solve(problem, answer)
        );
    }

    private static EquilibriumSystem Redox(bool waterReacts)
    {
        var builder = new SystemBuilder()
            .Component("H+", 1)
            .Component("e-", -1, isDissolved: false)
            .Component("Fe^2+", 2)
            .Complex("OH-", -1, -14, ("H2O", 1), ("H+", -1))
            .Complex("Fe^3+", 3, -13.02, ("Fe^2+", 1), ("e-", -1))
            .Complex("FeOH^2+", 2, -15.21, ("Fe^2+", 1), ("e-", -1), ("H2O", 1), ("H+", -1))
            .Solid("ferrihydrite", -16.5, ("Fe^2+", 1), ("e-", -1), ("H2O", 3), ("H+", -3))
            .Solid("iron", -15.9, ("Fe^2+", 1), ("e-", 2));
        if (waterReacts)
        {
            builder
                .Complex("O2(aq)", 0, -85.98, ("H2O", 2), ("H+", -4), ("e-", -4))
                .Complex("H2(aq)", 0, -3.1, ("H+", 2), ("e-", 2));
        }

        return builder.Build(new Davies());
    }
}
