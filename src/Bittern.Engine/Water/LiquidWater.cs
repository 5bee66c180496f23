using Bittern.Chemistry;

namespace Bittern.Engine.Water;

/// <summary>Properties of pure liquid water near atmospheric pressure, 0 to 100 °C.</summary>
public static class LiquidWater
{
    /// <summary>
    /// Density, kg/m3, at 1 atm (Kell 1975, J. Chem. Eng. Data 20, 97, eq. 16; stated accuracy 1e-5 relative up to 100 °C; coefficients recalled).
    /// </summary>
    public static double Density(double kelvin)
    {
        var t = kelvin - PhysicalConstants.ZeroCelsius;
        var numerator =
            999.83952
            + (
                t
                * (
                    16.945176
                    + (
                        t
                        * (
                            -7.9870401e-3
                            + (t * (-46.170461e-6 + (t * (105.56302e-9 - (280.54253e-12 * t)))))
                        )
                    )
                )
            );
        return numerator / (1 + (16.879850e-3 * t));
    }

    /// <summary>
    /// Static dielectric constant (dimensionless) at the density of <see cref="Density"/>: the formulation of Fernández, Goodwin, Lemmon, Levelt Sengers and
    /// Williams 1997, J. Phys. Chem. Ref. Data 26, 1125 (IAPWS R8-97); coefficients recalled, checked against the release's table in the tests.
    /// </summary>
    public static double DielectricConstant(double kelvin)
    {
        const double MolarMass = 0.018015268;
        const double CriticalDensity = 322 / MolarMass;
        const double CriticalTemperature = 647.096;
        const double Boltzmann = 1.380658e-23;
        const double Avogadro = 6.0221367e23;
        const double Permittivity = 8.854187817620389e-12;
        const double Dipole = 6.138e-30;
        const double Polarizability = 1.636e-40;
        var density = Density(kelvin) / MolarMass;
        var delta = density / CriticalDensity;
        var tau = CriticalTemperature / kelvin;
        var g = 1 + (0.196096504426e-2 * delta * Math.Pow((kelvin / 228) - 1, -1.2));
        foreach (var (n, i, j) in Terms)
        {
            g += n * Math.Pow(delta, i) * Math.Pow(tau, j);
        }

        var a = Avogadro * Dipole * Dipole * density * g / (Permittivity * Boltzmann * kelvin);
        var b = Avogadro * Polarizability * density / (3 * Permittivity);
        return (
                1
                + a
                + (5 * b)
                + Math.Sqrt(9 + (2 * a) + (18 * b) + (a * a) + (10 * a * b) + (9 * b * b))
            ) / (4 - (4 * b));
    }

    private static readonly (double N, double I, double J)[] Terms =
    [
        (0.978224486826, 1, 0.25),
        (-0.957771379375, 1, 1),
        (0.237511794148, 1, 2.5),
        (0.714692244396, 2, 1.5),
        (-0.298217036956, 3, 1.5),
        (-0.108863472196, 3, 2.5),
        (0.949327488264e-1, 4, 2),
        (-0.980469816509e-2, 5, 2),
        (0.165167634970e-4, 6, 5),
        (0.937359795772e-4, 7, 0.5),
        (-0.123179218720e-9, 10, 10),
    ];
}
