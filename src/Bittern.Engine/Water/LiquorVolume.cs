using Bittern.Chemistry;

namespace Bittern.Engine.Water;

/// <summary>
/// Volume of a solution from the volumes of its ions: V = m_w/ρ_w + Σ n_i V°_i + n_w-kg A_V (I/b) ln(1 + b √I), b = 1.2 (Redlich and Meyer 1964 for the limiting
/// slope, in the form of Pitzer 1991). V° are conventional partial molal volumes at 25 °C (Millero 1972, in Horne, Water and Aqueous Solutions, ch. 13;
/// recalled). Expected accuracy of the density: 0.2 % to 1 mol/kg, 1 % to 4 mol/kg, 0 to 50 °C; ions without a value count none, so their mass alone adds.
/// </summary>
public static class LiquorVolume
{
    /// <summary>Redlich-Meyer limiting slope of volume at 25 °C, cm3 kg^½ mol^-3/2 (Redlich and Meyer 1964, Chem. Rev. 64, 221: 1.868).</summary>
    private const double LimitingSlope = 1.868;

    private const double ClosestApproach = 1.2;

    /// <summary>Conventional partial molal volume of an ion, cm3/mol at 25 °C; null when the table has none.</summary>
    public static double? IonVolume(string species) =>
        Volumes.TryGetValue(species, out var value) ? value : null;

    /// <summary>
    /// m3 of solution.
    /// </summary>
    /// <param name="waterKilograms">Liquid water, kg.</param>
    /// <param name="ionCubicCentimetres">Σ n V°, cm3.</param>
    /// <param name="ionicStrength">mol/kg.</param>
    /// <param name="kelvin">Temperature, K; only the water's own volume follows it.</param>
    public static double CubicMetres(
        double waterKilograms,
        double ionCubicCentimetres,
        double ionicStrength,
        double kelvin
    )
    {
        var excess =
            LimitingSlope
            * ionicStrength
            / ClosestApproach
            * Math.Log(1 + (ClosestApproach * Math.Sqrt(Math.Max(ionicStrength, 0))));
        return (waterKilograms / LiquidWater.Density(kelvin))
            + (1e-6 * (ionCubicCentimetres + (waterKilograms * excess)));
    }

    private static readonly Dictionary<string, double> Volumes = new(StringComparer.Ordinal)
    {
        ["H+"] = 0,
        ["Li+"] = -0.88,
        ["Na+"] = -1.21,
        ["K+"] = 9.02,
        ["Rb+"] = 14.07,
        ["Cs+"] = 21.34,
        ["Ag+"] = -0.7,
        ["NH4+"] = 17.86,
        ["Mg^2+"] = -21.17,
        ["Ca^2+"] = -17.85,
        ["Sr^2+"] = -18.16,
        ["Ba^2+"] = -12.47,
        ["Mn^2+"] = -17.7,
        ["Fe^2+"] = -24.7,
        ["Co^2+"] = -24.0,
        ["Ni^2+"] = -24.0,
        ["Cu^2+"] = -27.76,
        ["Zn^2+"] = -21.6,
        ["Cd^2+"] = -20.0,
        ["Pb^2+"] = -15.5,
        ["Al^3+"] = -42.2,
        ["Fe^3+"] = -43.7,
        ["Cr^3+"] = -39.5,
        ["OH-"] = -4.04,
        ["F-"] = -1.16,
        ["Cl-"] = 17.83,
        ["Br-"] = 24.71,
        ["I-"] = 36.22,
        ["NO3-"] = 29.00,
        ["HCO3-"] = 23.4,
        ["CO3^2-"] = -4.3,
        ["CO2(aq)"] = 32.8,
        ["HSO4-"] = 35.67,
        ["SO4^2-"] = 13.98,
        ["H2PO4-"] = 29.1,
        ["CH3COO-"] = 40.46,
        ["B(OH)3(aq)"] = 39.2,
        ["NH3(aq)"] = 24.4,
    };
}
