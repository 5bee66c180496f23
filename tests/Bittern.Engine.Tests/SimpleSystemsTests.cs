using Bittern.Engine.Activity;
using Xunit;

namespace Bittern.Engine.Tests;

public sealed class SimpleSystemsTests
{
    [Fact]
    public void Gypsum_dissolves_in_water_to_its_ion_product()
    {
        var system = new SystemBuilder()
            .Component("H+", 1)
            .Component("Ca^2+", 2)
            .Component("SO4^2-", -2)
            .Complex("OH-", -1, -14, ("H2O", 1), ("H+", -1))
            .Complex("CaSO4(aq)", 0, 2.30, ("Ca^2+", 1), ("SO4^2-", 1))
            .Solid("gypsum", 4.58, ("Ca^2+", 1), ("SO4^2-", 1), ("H2O", 2))
            .Build(new Davies());
        var problem = new Problem(system) { AllowedSolids = { [0] = true } };
        problem.Totals[1] = 0.1;
        problem.Totals[2] = 0.1;
        problem.TotalWater += 0.2;

        var answer = Solved.Certified(problem);

        // 16.1 mmol/kg with Davies and this ion pair; measured 15.2 (Marshall and Slusher 1966): the model's error, not the solver's.
        var dissolved = answer.Molalities[1] + answer.Molalities[4];
        Assert.InRange(dissolved, 0.0158, 0.0164);
        Assert.InRange(answer.SolidAmounts[0], 0.0836, 0.0842);
    }

    [Fact]
    public void Calcite_under_a_fixed_carbon_dioxide_pressure()
    {
        var system = Carbonate();
        var problem = new Problem(system) { AllowedSolids = { [0] = true } };
        problem.Totals[1] = 0.01;
        problem.Totals[2] = 0.01;
        problem.FixedGasPressures[0] = Math.Pow(10, -3.5);

        var answer = Solved.Certified(problem);

        // Stumm and Morgan 1996: pH 8.3, about 20 mg/L Ca.
        Assert.InRange(-answer.LnActivities[0] / Math.Log(10), 8.2, 8.35);
        Assert.InRange((0.01 - answer.SolidAmounts[0]) * 40.08 * 1000, 18, 22);
    }

    [Fact]
    public void A_fixed_pH_tells_how_much_acid_it_takes()
    {
        var system = Carbonate();
        var problem = new Problem(system);
        problem.Totals[1] = 0.001;
        problem.Totals[2] = 0.001;
        problem.FixedLog10Activities[0] = -4;

        var answer = Solved.Certified(problem);

        Assert.InRange(answer.FixedAmounts[0], 0.0019, 0.0022);
    }

    [Fact]
    public void A_component_without_total_leaves()
    {
        var system = Carbonate();
        var problem = new Problem(system) { AllowedSolids = { [0] = true } };
        problem.Totals[2] = 1e-3;
        problem.Totals[0] = 1e-3;

        var answer = Solved.Certified(problem);

        Assert.Equal(0, answer.SolidAmounts[0]);
        Assert.Equal(double.NegativeInfinity, answer.LnSaturations[0]);
    }

    internal static EquilibriumSystem Carbonate(IActivityModel? model = null) =>
        new SystemBuilder()
            .Component("H+", 1)
            .Component("Ca^2+", 2)
            .Component("CO3^2-", -2)
            .Complex("OH-", -1, -13.997, ("H2O", 1), ("H+", -1))
            .Complex("HCO3-", -1, 10.329, ("CO3^2-", 1), ("H+", 1))
            .Complex("CO2(aq)", 0, 16.681, ("CO3^2-", 1), ("H+", 2), ("H2O", -1))
            .Complex("CaCO3(aq)", 0, 3.22, ("Ca^2+", 1), ("CO3^2-", 1))
            .Complex("CaHCO3+", 1, 11.44, ("Ca^2+", 1), ("CO3^2-", 1), ("H+", 1))
            .Solid("calcite", 8.48, ("Ca^2+", 1), ("CO3^2-", 1))
            .Gas("CO2(g)", 18.149, ("CO3^2-", 1), ("H+", 2), ("H2O", -1))
            .Build(model ?? new Davies());
}

internal static class Solved
{
    public static Answer Certified(Problem problem)
    {
        var answer = new Answer(problem.System);
        var status = new Solver(problem.System).Solve(problem, answer);
        Assert.True(
            status == SolveStatus.Solved,
            $"{status} {answer.Obstacle} after {answer.Iterations}"
        );
        var certificate = Certificate.Check(problem, answer);
        Assert.True(certificate.Accepted, certificate.ToString());
        return answer;
    }
}
