using Xunit;

namespace Bittern.Engine.Tests;

/// <summary>Derivatives against central differences of the solver itself; the assemblage stays the same on both sides.</summary>
public sealed class SensitivitiesTests
{
    private const double Step = 1e-5;

    [Theory]
    [InlineData(11, false)]
    [InlineData(12, true)]
    [InlineData(13, true)]
    public void Derivatives_to_totals_and_constants_agree_with_differences(int seed, bool real)
    {
        for (var i = 0; i < 40; i++)
        {
            var problem = RandomSystemsTests.RandomProblem(new Random((seed * 1000) + i), real);
            var answer = Solved.Certified(problem);
            if (
                Math.Abs(
                    answer
                        .LnSaturations.Where((ln, s) => answer.SolidAmounts[s] == 0)
                        .Append(-1)
                        .Max()
                ) < 1e-3
            )
            {
                continue;
            }

            var sensitivities = Sensitivities.At(problem, answer)!;
            for (var c = 0; c < problem.Totals.Length; c++)
            {
                if (problem.Totals[c] != 0)
                {
                    var size = Step * Math.Abs(problem.Totals[c]);
                    var component = c;
                    Compare(
                        problem,
                        answer,
                        sensitivities.ToTotal(c),
                        size,
                        (p, d) => p.Totals[component] += d
                    );
                }
            }

            Compare(
                problem,
                answer,
                sensitivities.ToTotalWater(),
                Step * problem.TotalWater,
                (p, d) => p.TotalWater += d
            );
        }
    }

    [Fact]
    public void Derivatives_to_fixed_pressure_and_activity_agree_with_differences()
    {
        var problem = new Problem(SimpleSystemsTests.Carbonate())
        {
            AllowedSolids = { [0] = true },
        };
        problem.Totals[1] = 0.01;
        problem.Totals[2] = 0.01;
        problem.FixedGasPressures[0] = 1e-3;
        var answer = Solved.Certified(problem);
        Compare(
            problem,
            answer,
            Sensitivities.At(problem, answer)!.ToGasLog10Pressure(0),
            Step,
            (p, d) => p.FixedGasPressures[0] = Math.Pow(10, -3 + d)
        );

        problem.FixedGasPressures[0] = double.NaN;
        problem.FixedLog10Activities[0] = -8;
        answer = Solved.Certified(problem);
        Compare(
            problem,
            answer,
            Sensitivities.At(problem, answer)!.ToFixedLog10Activity(0),
            Step,
            (p, d) => p.FixedLog10Activities[0] = -8 + d
        );
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    public void Derivatives_to_constants_agree_with_differences(int solidOrSpecies)
    {
        static Problem At(double shift, double solidShift)
        {
            var system = new SystemBuilder()
                .Component("H+", 1)
                .Component("Ca^2+", 2)
                .Component("CO3^2-", -2)
                .Complex("OH-", -1, -13.997, ("H2O", 1), ("H+", -1))
                .Complex("HCO3-", -1, 10.329 + shift, ("CO3^2-", 1), ("H+", 1))
                .Complex("CaCO3(aq)", 0, 3.22, ("Ca^2+", 1), ("CO3^2-", 1))
                .Solid("calcite", 8.48 + solidShift, ("Ca^2+", 1), ("CO3^2-", 1))
                .Build(new Engine.Activity.Davies());
            var problem = new Problem(system) { AllowedSolids = { [0] = true } };
            problem.Totals[0] = 0.004;
            problem.Totals[1] = 0.01;
            problem.Totals[2] = 0.01;
            return problem;
        }

        var problem = At(0, 0);
        var answer = Solved.Certified(problem);
        var sensitivities = Sensitivities.At(problem, answer)!;
        var derivative =
            solidOrSpecies == 0
                ? sensitivities.ToSpeciesLog10K(problem.System.SpeciesIndex("HCO3-"))
                : sensitivities.ToSolidLog10K(0);
        var up = Solved.Certified(solidOrSpecies == 0 ? At(Step, 0) : At(0, Step));
        var down = Solved.Certified(solidOrSpecies == 0 ? At(-Step, 0) : At(0, -Step));
        Agree(answer, derivative, up, down, Step);
    }

    private static void Compare(
        Problem problem,
        Answer answer,
        StateDerivative derivative,
        double size,
        Action<Problem, double> change
    )
    {
        Agree(answer, derivative, Moved(size), Moved(-size), size);

        Answer Moved(double by)
        {
            var moved = new Problem(problem.System);
            moved.CopyFrom(problem);
            change(moved, by);
            return Solved.Certified(moved);
        }
    }

    private static void Agree(
        Answer answer,
        StateDerivative derivative,
        Answer up,
        Answer down,
        double size
    )
    {
        for (var s = 0; s < answer.SolidAmounts.Length; s++)
        {
            if (
                (up.SolidAmounts[s] > 0) != (down.SolidAmounts[s] > 0)
                || (up.SolidAmounts[s] > 0) != (answer.SolidAmounts[s] > 0)
            )
            {
                return;
            }
        }

        // Central differences of step h carry an error of order h² of the third derivative and of rounding over h.
        for (var i = 0; i < answer.LnActivities.Length; i++)
        {
            if (!double.IsInfinity(answer.LnActivities[i]))
            {
                Near(
                    (up.LnActivities[i] - down.LnActivities[i]) / 2,
                    derivative.LnActivities[i] * size,
                    answer.System.Components[i].Name
                );
            }
        }

        for (var j = 0; j < answer.Molalities.Length; j++)
        {
            if (answer.Molalities[j] > 1e-250)
            {
                Near(
                    (Math.Log(up.Molalities[j]) - Math.Log(down.Molalities[j])) / 2,
                    derivative.LnMolalities[j] * size,
                    answer.System.Species[j].Name
                );
                Near(
                    (up.LnGammas[j] - down.LnGammas[j]) / 2,
                    derivative.LnGammas[j] * size,
                    "γ " + answer.System.Species[j].Name
                );
            }
        }

        for (var s = 0; s < answer.SolidAmounts.Length; s++)
        {
            var scale = answer.SolidAmounts.Max() + 1e-12;
            Near(
                (up.SolidAmounts[s] - down.SolidAmounts[s]) / 2 / scale,
                derivative.SolidAmounts[s] * size / scale,
                answer.System.Solids[s].Name
            );
            if (!double.IsInfinity(answer.LnSaturations[s]))
            {
                Near(
                    (up.LnSaturations[s] - down.LnSaturations[s]) / 2,
                    derivative.LnSaturations[s] * size,
                    "Ω " + answer.System.Solids[s].Name
                );
            }
        }

        Near(
            (Math.Log(up.WaterKilograms) - Math.Log(down.WaterKilograms)) / 2,
            derivative.LnWater * size,
            "water"
        );
    }

    private static void Near(double difference, double derivative, string what) =>
        Assert.True(
            Math.Abs(difference - derivative) <= (1e-5 * Math.Abs(derivative)) + 2e-11,
            $"{what}: difference {difference:e6}, derivative {derivative:e6}"
        );
}
