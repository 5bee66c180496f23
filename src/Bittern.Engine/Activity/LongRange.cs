namespace Bittern.Engine.Activity;

/// <summary>
/// The Debye-Hückel term with a closest approach, f(x) = x/(1 + βx) with x = √I, and the integral by which it enters the activity of water:
/// ∫ I df = σ(βx)/β³, σ(y) = (1 + y) - 2 ln(1 + y) - 1/(1 + y).
/// </summary>
internal static class LongRange
{
    /// <summary>Ionic strength below which slopes, unbounded at I = 0, are held; it changes nothing that a double can show.</summary>
    public const double LeastIonicStrength = 1e-24;

    /// <summary>f, mol^½ kg^-½.</summary>
    public static double Value(double root, double beta) => root / (1 + (beta * root));

    /// <summary>df/dI.</summary>
    public static double Slope(double root, double beta) =>
        1
        / (
            2
            * Math.Max(root, Math.Sqrt(LeastIonicStrength))
            * (1 + (beta * root))
            * (1 + (beta * root))
        );

    /// <summary>∫ I df from 0 to I, finite for β = 0 (the limiting law) too.</summary>
    public static double Integral(double root, double beta)
    {
        var y = beta * root;

        // A series where the closed form would lose digits: σ(y)/y³ = Σ (-1)^k (k + 1) y^k/(k + 3).
        if (y < 0.05)
        {
            var sum = 0.0;
            for (var k = 9; k >= 0; k--)
            {
                sum = ((k + 1) / (k + 3.0)) - (y * sum);
            }

            return root * root * root * sum;
        }

        var sigma = 1 + y - (2 * Math.Log(1 + y)) - (1 / (1 + y));
        return sigma / (beta * beta * beta);
    }
}
