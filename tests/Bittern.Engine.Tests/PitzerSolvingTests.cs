using Bittern.Engine.Activity;
using Xunit;

namespace Bittern.Engine.Tests;

/// <summary>The solver with an ion-interaction model, far into brines.</summary>
public sealed class PitzerSolvingTests
{
    private static EquilibriumSystem Chlorides() =>
        new SystemBuilder()
            .Component("H+", 1)
            .Component("Na+", 1)
            .Component("K+", 1)
            .Component("Cl-", -1)
            .Complex("OH-", -1, -13.997, ("H2O", 1), ("H+", -1))
            .Solid("halite", -1.570, ("Na+", 1), ("Cl-", 1))
            .Solid("sylvite", -0.900, ("K+", 1), ("Cl-", 1))
            .Build(
                new Pitzer(
                    new PitzerParameters([
                        new PitzerPair("Na+", "Cl-", 0.0765, 0.2644, 0, 0.00127),
                        new PitzerPair("K+", "Cl-", 0.04835, 0.2122, 0, -0.00084),
                    ])
                    {
                        Thetas = [new PitzerTheta("Na+", "K+", -0.012)],
                        Psis = [new PitzerPsi("Na+", "K+", "Cl-", -0.0018)],
                        APhi = 0.392,
                    }
                )
            );

    [Theory]
    [InlineData(0.1, 0)]
    [InlineData(6, 0)]
    [InlineData(8, 0)]
    [InlineData(15, 0)]
    [InlineData(6.5, 2.3)]
    [InlineData(5, 10)]
    public void A_brine_without_solids_is_speciated(double sodium, double potassium)
    {
        var system = Chlorides();
        var problem = new Problem(system);
        problem.Totals[1] = sodium;
        problem.Totals[2] = potassium;
        problem.Totals[3] = sodium + potassium;

        Solved.Certified(problem);
    }

    [Fact]
    public void Halite_and_sylvite_saturate_together_where_the_set_says()
    {
        var problem = new Problem(Chlorides());
        Array.Fill(problem.AllowedSolids, value: true);
        problem.Totals[1] = 8;
        problem.Totals[2] = 5;
        problem.Totals[3] = 13;

        var answer = Solved.Certified(problem);

        // 5.081 and 2.132 by an implementation of the same equations made apart from this one; measured 5.09 and 2.20 (Linke 1965, recalled): the
        // set of 1984 misses potassium by 3.0 %, which is the parameters' doing and is not tuned away.
        Assert.InRange(answer.Molalities[1], 5.081 * 0.998, 5.081 * 1.002);
        Assert.InRange(answer.Molalities[2], 2.132 * 0.998, 2.132 * 1.002);
    }
}
