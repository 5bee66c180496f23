namespace Bittern.Engine.Water;

/// <summary>
/// Liquid water at 0.1 MPa, 253.15 to 383.15 K: IAPWS SR6-08(2011), equation for the specific volume (Pátek, Hrubý, Klomfar, Součková and Harvey 2009,
/// J. Phys. Chem. Ref. Data 38, 21). Coefficients recalled, checked against the release's table in the tests.
/// </summary>
internal static class OrdinaryWater
{
    /// <summary>kg/m3.</summary>
    public static double Density(double kelvin)
    {
        const double GasConstant = 461.51805;
        const double Reference = 10;
        const double Pressure = 1e5;
        var alpha = Reference / (593 - kelvin);
        var beta = Reference / (kelvin - 232);
        var sum = 1.93763157e-2;
        foreach (var (a, n) in Upper)
        {
            sum += a * Math.Pow(alpha, n);
        }

        foreach (var (b, m) in Lower)
        {
            sum += b * Math.Pow(beta, m);
        }

        return Pressure / (GasConstant * Reference * sum);
    }

    private static readonly (double A, int N)[] Upper =
    [
        (6.74458446e3, 4),
        (-2.22521604e5, 5),
        (1.00231247e8, 7),
        (-1.63552118e9, 8),
        (8.32299658e9, 9),
    ];

    private static readonly (double B, int M)[] Lower =
    [
        (5.78545292e-3, 1),
        (-1.53195665e-2, 2),
        (3.11337859e-2, 3),
        (-4.23546241e-2, 4),
        (3.38713507e-2, 5),
        (-1.19946761e-2, 6),
    ];
}
