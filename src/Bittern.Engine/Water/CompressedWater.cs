namespace Bittern.Engine.Water;

/// <summary>
/// Liquid water at a pressure and its vapour pressure: IAPWS R7-97(2012), regions 1 and 4 (Wagner et al. 2000, J. Eng. Gas Turbines Power 122, 150).
/// Coefficients recalled, checked against the release's tables in the tests.
/// </summary>
internal static class CompressedWater
{
    /// <summary>Density, kg/m3, from p v = π ∂γ/∂π R T (eq. 7), 273.15 to 623.15 K, from the vapour pressure to 100 MPa.</summary>
    public static double Density(double kelvin, double megapascals)
    {
        const double GasConstant = 461.526;
        const double ReferencePressure = 16.53;
        var pi = 7.1 - (megapascals / ReferencePressure);
        var tau = (1386 / kelvin) - 1.222;
        var slope = 0.0;
        foreach (var (n, i, j) in Gibbs)
        {
            slope -= n * i * Math.Pow(pi, i - 1) * Math.Pow(tau, j);
        }

        return ReferencePressure * 1e6 / (GasConstant * kelvin * slope);
    }

    /// <summary>Vapour pressure, MPa (eq. 30), 273.15 to 647.096 K.</summary>
    public static double VapourPressure(double kelvin)
    {
        var theta = kelvin - (0.23855557567849 / (kelvin - 0.65017534844798e3));
        var a = (theta * (theta + 0.11670521452767e4)) - 0.72421316703206e6;
        var b = (theta * ((-0.17073846940092e2 * theta) + 0.12020824702470e5)) - 0.32325550322333e7;
        var c = (theta * ((0.14915108613530e2 * theta) - 0.48232657361591e4)) + 0.40511340542057e6;
        return Math.Pow(2 * c / (-b + Math.Sqrt((b * b) - (4 * a * c))), 4);
    }

    // The terms of γ that depend on pressure; those with I = 0 drop out of the volume.
    private static readonly (double N, int I, int J)[] Gibbs =
    [
        (0.28319080123804e-3, 1, -9),
        (-0.60706301565874e-3, 1, -7),
        (-0.18990068218419e-1, 1, -1),
        (-0.32529748770505e-1, 1, 0),
        (-0.21841717175414e-1, 1, 1),
        (-0.52838357969930e-4, 1, 3),
        (-0.47184321073267e-3, 2, -3),
        (-0.30001780793026e-3, 2, 0),
        (0.47661393906987e-4, 2, 1),
        (-0.44141845330846e-5, 2, 3),
        (-0.72694996297594e-15, 2, 17),
        (-0.31679644845054e-4, 3, -4),
        (-0.28270797985312e-5, 3, 0),
        (-0.85205128120103e-9, 3, 6),
        (-0.22425281908000e-5, 4, -5),
        (-0.65171222895601e-6, 4, -2),
        (-0.14341729937924e-12, 4, 10),
        (-0.40516996860117e-6, 5, -8),
        (-0.12734301741641e-8, 8, -11),
        (-0.17424871230634e-9, 8, -6),
        (-0.68762131295531e-18, 21, -29),
        (0.14478307828521e-19, 23, -31),
        (0.26335781662795e-22, 29, -38),
        (-0.11947622640071e-22, 30, -39),
        (0.18228094581404e-23, 31, -40),
        (-0.93537087292458e-25, 32, -41),
    ];
}
