using Bittern.Engine.Activity;
using Xunit;

namespace Bittern.Engine.Tests.Activity;

/// <summary>Analytic derivatives in the moments against central differences of the values.</summary>
public sealed class SlopesTests
{
    public static TheoryData<string> Names => [.. Models.All.Keys];

    [Theory]
    [MemberData(nameof(Names))]
    public void Slopes_are_the_derivatives_of_the_values(string name)
    {
        var random = new Random(20240611);
        foreach (var kelvin in new[] { 298.15, 313.15 })
        {
            var liquor = new Liquor(Models.All[name], kelvin, Models.Species);
            for (var round = 0; round < 40; round++)
            {
                var largest = Math.Pow(10, (4 * random.NextDouble()) - 4);
                var at = liquor.At(Models.Molalities(random, largest));
                for (var p = 0; p < liquor.MomentCount; p++)
                {
                    Check(liquor, at, p, 1e-5 * Math.Max(at.Moments[p], 0.01 * largest));
                }
            }
        }
    }

    // Central differences of order h⁴; the tolerance is what is left of the square-root law and of round-off in them.
    private static void Check(Liquor liquor, Evaluation at, int p, double h)
    {
        var (one, minusOne) = (Moved(h), Moved(-h));
        var (two, minusTwo) = (Moved(2 * h), Moved(-2 * h));
        for (var j = 0; j < at.LnGamma.Length; j++)
        {
            Near(
                Difference(
                    one.LnGamma[j],
                    minusOne.LnGamma[j],
                    two.LnGamma[j],
                    minusTwo.LnGamma[j]
                ),
                at.Slopes[(j * at.Moments.Length) + p],
                Math.Max(Math.Abs(at.LnGamma[j]), 1e-3),
                at.Species[j]
            );
        }

        Near(
            Difference(one.LnWater, minusOne.LnWater, two.LnWater, minusTwo.LnWater),
            at.WaterSlopes[p],
            Math.Abs(at.LnWater),
            "water"
        );

        Evaluation Moved(double by)
        {
            var moments = (double[])at.Moments.Clone();
            moments[p] += by;
            return liquor.AtMoments(moments);
        }

        double Difference(double a, double b, double c, double d) =>
            ((8 * (a - b)) - (c - d)) / (12 * h);

        void Near(double expected, double found, double value, string what) =>
            Assert.True(
                Math.Abs(expected - found) <= (2e-6 * Math.Abs(found)) + (1e-14 * value / h) + 1e-9,
                $"{what}, moment {p}: {found} against {expected}, q = {string.Join(' ', at.Moments)}"
            );
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Pure_water_is_the_limit(string name)
    {
        var liquor = new Liquor(Models.All[name], 298.15, Models.Species);
        foreach (var molality in new[] { 0, 1e-30, 1e-16 })
        {
            var at = liquor.At([.. Models.Species.Select(_ => molality)]);
            Assert.All(at.LnGamma, g => Assert.InRange(g, -2e-6, 2e-6));
            Assert.InRange(at.LnWater, -1e-15, 1e-30);
            Assert.All(at.Slopes, s => Assert.True(double.IsFinite(s)));
            Assert.All(at.WaterSlopes, s => Assert.True(double.IsFinite(s)));
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Evaluating_allocates_nothing(string name)
    {
        var liquor = new Liquor(Models.All[name], 298.15, Models.Species);
        var model = liquor.System.ActivityModel.Compile(liquor.System, 298.15);
        var moments = Enumerable.Repeat(0.1, model.MomentCount).ToArray();
        var lnGamma = new double[Models.Species.Length];
        var slopes = new double[lnGamma.Length * moments.Length];
        var waterSlopes = new double[moments.Length];
        model.Evaluate(moments, lnGamma, out _, slopes, waterSlopes);
        var before = GC.GetAllocatedBytesForCurrentThread();
        for (var k = 0; k < 100; k++)
        {
            model.Evaluate(moments, lnGamma, out _, slopes, waterSlopes);
        }

        Assert.Equal(0, GC.GetAllocatedBytesForCurrentThread() - before);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Order_of_the_species_does_not_matter(string name)
    {
        var random = new Random(7);
        var m = Models.Molalities(random, 1);
        var order = Enumerable.Range(0, m.Length).ToArray();
        random.Shuffle(order);
        var plain = new Liquor(Models.All[name], 298.15, Models.Species).At(m);
        var shuffled = new Liquor(
            Models.All[name],
            298.15,
            [.. order.Select(k => Models.Species[k])]
        ).At([.. order.Select(k => m[k])]);
        Assert.Equal(plain.LnWater, shuffled.LnWater, 1e-12);
        for (var k = 0; k < order.Length; k++)
        {
            Assert.Equal(plain.LnGamma[order[k]], shuffled.LnGamma[k], 1e-11);
        }
    }

    [Fact]
    public void An_absent_species_changes_nothing()
    {
        foreach (var model in Models.All.Values)
        {
            var all = new Liquor(model, 298.15, Models.Species);
            var at = all.At([.. Models.Species.Select(s => s is "Na+" or "Cl-" ? 1.0 : 0)]);
            var alone = new Liquor(model, 298.15, "Na+", "Cl-").At(1, 1);
            Assert.Equal(alone.LnWater, at.LnWater, 1e-13);
            Assert.Equal(alone.Gamma("Na+"), at.Gamma("Na+"), 1e-12);
            Assert.Equal(alone.Gamma("Cl-"), at.Gamma("Cl-"), 1e-12);
        }
    }
}
