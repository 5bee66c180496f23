using Bittern.Engine.Water;

namespace Bittern.Engine.Activity;

/// <summary>
/// The Davies equation: log10 γ = -A z² (√I/(1 + √I) - 0.3 I) (Davies 1962, Ion Association, Butterworths; his coefficient was 0.2
/// in 1938 and 0.3 in 1962). Uncharged species: γ = 1.
/// </summary>
/// <param name="slopeLog10">A, kg^½ mol^-½, the same at every temperature; null takes water's own at each temperature (<see cref="DebyeHuckel"/>).</param>
public sealed class Davies(double? slopeLog10 = null) : IActivityModel
{
    private const double Linear = 0.3;

    public string Name => "davies";

    /// <summary>0.5 mol/kg: common practice; the equation was fitted up to about 0.1.</summary>
    public double TrustedIonicStrength => 0.5;

    public string UnchargedTreatment => "γ = 1";

    public CompiledActivity Compile(EquilibriumSystem system, double kelvin) =>
        new Compiled(system, (slopeLog10 ?? DebyeHuckel.SlopeLog10(kelvin)) * Math.Log(10));

    private sealed class Compiled(EquilibriumSystem system, double slope) : ChargeModel(system)
    {
        private readonly double _slope = slope;

        protected override (double F, double Slope, double G) At(double ionicStrength)
        {
            var root = Math.Sqrt(ionicStrength);
            var f = -_slope * ((root / (1 + root)) - (Linear * ionicStrength));

            // At I = 0 the derivative is unbounded; the floor changes nothing that a double can show.
            var derivative =
                -_slope * ((1 / (2 * Math.Max(root, 1e-12) * (1 + root) * (1 + root))) - Linear);
            var g = (-2 * _slope * Sigma(root)) + (_slope * Linear * ionicStrength * ionicStrength);
            return (f, derivative, g);
        }

        // ∫ x²/(1+x)² dx = (1 + x) - 2 ln(1 + x) - 1/(1 + x); a series where cancellation would eat the digits.
        private static double Sigma(double x) =>
            x < 1e-3
                ? x * x * x * ((1.0 / 3) - (x / 2) + (3 * x * x / 5))
                : 1 + x - (2 * Math.Log(1 + x)) - (1 / (1 + x));
    }
}
