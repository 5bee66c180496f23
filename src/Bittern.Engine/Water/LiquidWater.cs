namespace Bittern.Engine.Water;

/// <summary>Properties of pure liquid water. Without a pressure: 0.1 MPa up to 110 °C, its own vapour pressure above.</summary>
public static class LiquidWater
{
    /// <summary>Upper end of <see cref="OrdinaryWater"/>, K.</summary>
    private const double OrdinaryLimit = 383.15;

    /// <summary>
    /// Density, kg/m3: IAPWS SR6-08(2011) to 110 °C (1e-6 relative below 100 °C), IAPWS R7-97(2012) region 1 at saturation above, to 350 °C.
    /// The two join within 3e-5.
    /// </summary>
    public static double Density(double kelvin) =>
        kelvin <= OrdinaryLimit
            ? OrdinaryWater.Density(kelvin)
            : CompressedWater.Density(kelvin, CompressedWater.VapourPressure(kelvin));

    /// <summary>Density, kg/m3, at a pressure in MPa: IAPWS R7-97(2012) region 1, 0 to 350 °C, up to 100 MPa.</summary>
    public static double Density(double kelvin, double megapascals) =>
        CompressedWater.Density(kelvin, megapascals);

    /// <summary>Vapour pressure, MPa: IAPWS R7-97(2012) region 4, 0 to 374 °C; 0.01 % of the reference formulation and better.</summary>
    public static double VapourPressure(double kelvin) => CompressedWater.VapourPressure(kelvin);

    /// <summary>Static dielectric constant (dimensionless) at the density of <see cref="Density(double)"/>.</summary>
    public static double DielectricConstant(double kelvin) =>
        DielectricConstant(kelvin, Density(kelvin));

    /// <summary>
    /// Static dielectric constant (dimensionless) of water at a density in kg/m3: Fernández, Goodwin, Lemmon, Levelt Sengers and Williams 1997,
    /// J. Phys. Chem. Ref. Data 26, 1125 (IAPWS R8-97), 238 to 873 K. Coefficients recalled, checked against the release's table in the tests.
    /// </summary>
    public static double DielectricConstant(double kelvin, double density)
    {
        // The constants of the release, not today's.
        const double MolarMass = 0.018015268;
        const double CriticalDensity = 322 / MolarMass;
        const double CriticalTemperature = 647.096;
        const double Boltzmann = 1.380658e-23;
        const double Avogadro = 6.0221367e23;
        const double Permittivity = 8.854187817620389e-12;
        const double Dipole = 6.138e-30;
        const double Polarizability = 1.636e-40;
        var molar = density / MolarMass;
        var delta = molar / CriticalDensity;
        var tau = CriticalTemperature / kelvin;
        var g = 1 + (0.196096504426e-2 * delta * Math.Pow((kelvin / 228) - 1, -1.2));
        foreach (var (n, i, j) in Correlation)
        {
            g += n * Math.Pow(delta, i) * Math.Pow(tau, j);
        }

        var a = Avogadro * Dipole * Dipole * molar * g / (Permittivity * Boltzmann * kelvin);
        var b = Avogadro * Polarizability * molar / (3 * Permittivity);
        return (
                1
                + a
                + (5 * b)
                + Math.Sqrt(9 + (2 * a) + (18 * b) + (a * a) + (10 * a * b) + (9 * b * b))
            ) / (4 - (4 * b));
    }

    /// <summary>pKw = -log10 of the ionization constant (molality scale) at the density of <see cref="Density(double)"/>.</summary>
    public static double PKw(double kelvin) => PKw(kelvin, Density(kelvin));

    /// <summary>
    /// pKw = -log10 of the ionization constant, molality scale, at a density in kg/m3: Bandura and Lvov 2006, J. Phys. Chem. Ref. Data 35, 15 (IAPWS R11-07 of
    /// 2007), 0 to 800 °C, up to 1250 kg/m3. Coefficients recalled, checked against the release's table in the tests.
    /// </summary>
    public static double PKw(double kelvin, double density)
    {
        const int Coordination = 6;
        const double MolarMass = 18.015268;
        var rho = density / 1000;
        var q =
            rho
            * Math.Exp(
                -0.864671
                    + (8659.19 / kelvin)
                    - (22786.2 / (kelvin * kelvin) * Math.Pow(rho, 2.0 / 3))
            );
        var hydration =
            Math.Log10(1 + q)
            - (q / (q + 1) * rho * (0.642044 - (56.8534 / kelvin) - (0.375754 * rho)));
        var gas = 0.61415 + ((48251.33 + ((-67707.93 + (10102100 / kelvin)) / kelvin)) / kelvin);
        return (-2 * Coordination * hydration) + gas + (2 * Math.Log10(MolarMass / 1000));
    }

    private static readonly (double N, double I, double J)[] Correlation =
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
