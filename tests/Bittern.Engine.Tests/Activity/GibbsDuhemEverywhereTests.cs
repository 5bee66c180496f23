using Bittern.Chemistry;
using Bittern.Engine.Activity;
using Xunit;

namespace Bittern.Engine.Tests.Activity;

/// <summary>
/// Gibbs-Duhem at constant temperature and pressure, d ln a_w + M_w Σ m_i d ln(γ_i m_i) = 0, along random directions that keep the solution electroneutral,
/// from the models' values alone.
/// </summary>
public sealed class GibbsDuhemEverywhereTests
{
    private const double Mw = PhysicalConstants.WaterMolarMass;

    public static TheoryData<string> Consistent => ["ideal", "davies", "sit", "pitzer"];

    public static TheoryData<string> WithIonSizes => ["debye-hückel", "truesdell-jones"];

    [Theory]
    [MemberData(nameof(Consistent))]
    public void It_holds_in_every_direction(string name)
    {
        var liquor = new Liquor(Models.All[name], 298.15, Models.Species);
        var random = new Random(3);
        for (var round = 0; round < 200; round++)
        {
            var m = Neutral(Models.Molalities(random, 0.5));
            var direction = Neutral([.. m.Select(v => v * (random.NextDouble() - 0.5))], m);
            var (gap, size) = Gap(liquor, m, direction);
            Assert.True(Math.Abs(gap) < 1e-8 * size, $"{gap} of {size}");
        }
    }

    [Theory]
    [MemberData(nameof(WithIonSizes))]
    public void With_ion_sizes_it_holds_along_dilution(string name)
    {
        var liquor = new Liquor(Models.All[name], 298.15, Models.Species);
        var random = new Random(5);
        for (var round = 0; round < 100; round++)
        {
            var m = Neutral(Models.Molalities(random, 0.3));
            var (gap, size) = Gap(liquor, m, m);
            Assert.True(Math.Abs(gap) < 1e-8 * size, $"{gap} of {size}");
        }
    }

    /// <summary>
    /// No water activity can do better with these γ (their cross derivatives differ), so the size of what is left is measured at the end of the trusted
    /// range: ions of a sea water (a tenfold diluted one for Debye-Hückel) replaced by others, the gap against the change of the ideal water activity that
    /// moving those ions makes. docs/activity-models.md quotes it.
    /// </summary>
    [Theory]
    [InlineData("debye-hückel", 0.1)]
    [InlineData("truesdell-jones", 1)]
    public void With_ion_sizes_exchanging_ions_leaves_little(string name, double strength)
    {
        string[] species = ["Na+", "K+", "Mg^2+", "Ca^2+", "Cl-", "SO4^2-", "HCO3-"];
        double[] m = [0.486, 0.0106, 0.0547, 0.0107, 0.5658, 0.0292, 0.0032];
        var liquor = new Liquor(Models.All[name], 298.15, species);
        double[][] exchanges =
        [
            [-0.10, 0.10, 0, 0, 0, 0, 0],
            [-0.10, 0, 0.05, 0, 0, 0, 0],
            [-0.10, 0, 0, 0.05, 0, 0, 0],
            [0, 0, 0, 0, -0.10, 0.05, 0],
            [0, 0, 0, 0, -0.10, 0, 0.10],
        ];
        foreach (var exchange in exchanges)
        {
            double[] moved = [.. exchange.Select(v => strength * v)];
            var (gap, _) = Gap(liquor, [.. m.Select(v => strength * v)], moved);
            Assert.InRange(Math.Abs(gap) / (Mw * moved.Sum(Math.Abs)), 0, 0.05);
        }
    }

    /// <summary>The gap and the sum of the sizes of its terms, per unit of direction.</summary>
    private static (double Gap, double Size) Gap(Liquor liquor, double[] m, double[] direction)
    {
        const double H = 1e-4;
        var (a, b) = (Moved(H), Moved(-H));
        var (c, d) = (Moved(2 * H), Moved(-2 * H));
        var water = Slope(a.LnWater, b.LnWater, c.LnWater, d.LnWater);
        var (gap, size) = (water, Math.Abs(water));
        for (var j = 0; j < m.Length; j++)
        {
            var term =
                Mw
                * (
                    direction[j]
                    + (m[j] * Slope(a.LnGamma[j], b.LnGamma[j], c.LnGamma[j], d.LnGamma[j]))
                );
            gap += term;
            size += Math.Abs(term);
        }

        return (gap, size);

        Evaluation Moved(double h) => liquor.At([.. m.Zip(direction, (v, s) => v + (h * s))]);

        static double Slope(double a, double b, double c, double d) =>
            ((8 * (a - b)) - (c - d)) / (12 * H);
    }

    // Scales the ions of one sign so that charges cancel; a direction is scaled with the solution's own shares.
    private static double[] Neutral(double[] m, double[]? solution = null)
    {
        var of = solution ?? m;
        var excess = m.Select((v, j) => v * Liquor.Charge(Models.Species[j])).Sum();
        var anions = of.Select((v, j) => v * Math.Min(Liquor.Charge(Models.Species[j]), 0)).Sum();
        if (anions == 0)
        {
            return new double[m.Length];
        }

        return
        [
            .. m.Select(
                (v, j) => Liquor.Charge(Models.Species[j]) < 0 ? v - (of[j] * excess / anions) : v
            ),
        ];
    }
}
