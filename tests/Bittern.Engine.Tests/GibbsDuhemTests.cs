using Bittern.Engine.Activity;
using Xunit;

namespace Bittern.Engine.Tests;

/// <summary>d ln a_w = -M_w (Σ dm + Σ m d ln γ) along a dilution, from the model's own γ (docs/activity-models.md).</summary>
public sealed class GibbsDuhemTests
{
    public static TheoryData<string, double> Cases
    {
        get
        {
            var data = new TheoryData<string, double>();
            foreach (var model in new[] { "ideal", "davies" })
            {
                foreach (var strength in new[] { 1e-6, 1e-3, 0.1, 0.5, 3 })
                {
                    data.Add(model, strength);
                }
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Cases))]
    public void Water_activity_belongs_to_the_activity_coefficients(
        string name,
        double ionicStrength
    )
    {
        var system = new SystemBuilder()
            .Component("Ca^2+", 2)
            .Component("Cl-", -1)
            .Component("B(OH)3(aq)", 0)
            .Build(name is "davies" ? new Davies() : new Ideal());
        var model = system.ActivityModel.Compile(system, 298.15);
        double[] molalities = [ionicStrength / 3, 2 * ionicStrength / 3, ionicStrength / 2];

        // Midpoint steps over s = t², which takes the square root of the limiting law out of the integrand.
        const int Steps = 2000;
        var (lnGammaBefore, _) = At(0);
        var integral = 0.0;
        for (var k = 1; k <= Steps; k++)
        {
            var middle = (k - 0.5) / Steps;
            var (lnGamma, _) = At(Square(k / (double)Steps));
            for (var j = 0; j < molalities.Length; j++)
            {
                // The molality at the middle of the step times the step of ln γ: second order in the step.
                integral += molalities[j] * Square(middle) * (lnGamma[j] - lnGammaBefore[j]);
            }

            lnGammaBefore = lnGamma;
        }

        var expected = -Chemistry.PhysicalConstants.WaterMolarMass * (molalities.Sum() + integral);
        Assert.InRange(At(1).LnWater / expected, 1 - 1e-6, 1 + 1e-6);

        (double[] LnGamma, double LnWater) At(double share)
        {
            var moments = new double[model.MomentCount];
            for (var p = 0; p < moments.Length; p++)
            {
                for (var j = 0; j < molalities.Length; j++)
                {
                    moments[p] +=
                        model.Weights[(p * molalities.Length) + j] * molalities[j] * share;
                }
            }

            var lnGamma = new double[molalities.Length];
            model.Evaluate(
                moments,
                lnGamma,
                out var lnWater,
                new double[molalities.Length * moments.Length],
                new double[moments.Length]
            );
            return (lnGamma, lnWater);
        }

        static double Square(double t) => t * t;
    }
}
