namespace Bittern.Engine.Water;

/// <summary>
/// Volume of a solution from its ions, per kilogram of water:
/// V/w = 1/ρ_w + Σ m_j V°_j + A_V (I/b) ln(1 + b √I) + Σ_c Σ_a v_ca m_c m_a/(1 + 0.05 I), b = 1.2.
/// V° are conventional partial molal volumes at 25 °C (Millero 1972, in Horne, Water and Aqueous Solutions, ch. 13; recalled); the third term is the limiting
/// law with the slope of Redlich and Meyer 1964 in the form of Pitzer 1991. v_ca was fitted to handbook densities of single salts (a row each in
/// tests/reference/liquor-densities.csv); a pair without one takes the value of its charges. Accuracy near 20 °C: 0.2 % up to saturation
/// for the fitted salts, 1 % for others; sea water 0.05 % at 25 °C and 0.25 % at 0 °C, because the ions' own volumes do not follow the temperature. Ions without V°
/// add their mass alone.
/// </summary>
public sealed class LiquorVolume
{
    /// <summary>Redlich-Meyer limiting slope of volume at 25 °C, cm3 kg^½ mol^-3/2 (Redlich and Meyer 1964, Chem. Rev. 64, 221: 1.868).</summary>
    private const double LimitingSlope = 1.868;

    private const double ClosestApproach = 1.2;

    /// <summary>How the excess of a pair fades, kg/mol; one value serves all the fitted salts.</summary>
    private const double Fading = 0.05;

    private readonly double[] _volumes;
    private readonly double[] _halfSquares;
    private readonly (int Cation, int Anion, double Excess)[] _pairs;

    /// <summary>A liquor of given species.</summary>
    /// <param name="species">Name, charge number and partial molal volume (cm3/mol) of each.</param>
    public LiquorVolume(IReadOnlyList<(string Name, int Charge, double Volume)> species)
    {
        _volumes = [.. species.Select(s => s.Volume)];
        _halfSquares = [.. species.Select(s => 0.5 * s.Charge * s.Charge)];
        _pairs =
        [
            .. from c in Enumerable.Range(0, species.Count)
            where species[c].Charge > 0
            from a in Enumerable.Range(0, species.Count)
            where species[a].Charge < 0
            let excess = PairExcess(
                species[c].Name,
                species[c].Charge,
                species[a].Name,
                species[a].Charge
            )
            where excess != 0
            select (c, a, excess),
        ];
    }

    /// <summary>m3 of solution.</summary>
    /// <param name="molalities">mol/kg, in the order of the species.</param>
    /// <param name="waterKilograms">Liquid water, kg.</param>
    /// <param name="kelvin">Temperature, K.</param>
    public double CubicMetres(ReadOnlySpan<double> molalities, double waterKilograms, double kelvin)
    {
        var (sum, ionicStrength) = (0.0, 0.0);
        for (var j = 0; j < _volumes.Length; j++)
        {
            sum += molalities[j] * _volumes[j];
            ionicStrength += molalities[j] * _halfSquares[j];
        }

        var pairs = 0.0;
        foreach (var (c, a, excess) in _pairs)
        {
            pairs += excess * molalities[c] * molalities[a];
        }

        sum +=
            (
                LimitingSlope
                * ionicStrength
                / ClosestApproach
                * Math.Log(1 + (ClosestApproach * Math.Sqrt(Math.Max(ionicStrength, 0))))
            ) + (pairs / (1 + (Fading * ionicStrength)));
        return waterKilograms * ((1 / LiquidWater.Density(kelvin)) + (1e-6 * sum));
    }

    /// <summary>Conventional partial molal volume of a species, cm3/mol at 25 °C; null when the table has none.</summary>
    public static double? IonVolume(string species) =>
        Volumes.TryGetValue(species, out var value) ? value : null;

    // cm3 kg/mol². Without a fit: what salts of the same charges have in common, nothing for acids.
    private static double PairExcess(string cation, int cationCharge, string anion, int anionCharge)
    {
        if (Fitted.TryGetValue((cation, anion), out var value))
        {
            return value;
        }

        return (cationCharge, anionCharge) switch
        {
            _ when string.Equals(cation, "H+", StringComparison.Ordinal) => 0,
            (1, -1) => 0.6,
            (2, -1) => 0.8,
            (> 2, -1) => 2.7,
            (1, _) => 3.0,
            (2, _) => 6.2,
            _ => 10.0,
        };
    }

    private static readonly Dictionary<(string Cation, string Anion), double> Fitted = new()
    {
        [("Na+", "Cl-")] = 0.58,
        [("K+", "Cl-")] = 0.68,
        [("NH4+", "Cl-")] = 0.28,
        [("Mg^2+", "Cl-")] = 0.81,
        [("Ca^2+", "Cl-")] = 0.80,
        [("Na+", "NO3-")] = 0.62,
        [("Na+", "OH-")] = 1.39,
        [("Na+", "SO4^2-")] = 3.19,
        [("K+", "SO4^2-")] = 2.59,
        [("NH4+", "SO4^2-")] = 2.22,
        [("Mg^2+", "SO4^2-")] = 6.20,
        [("Na+", "CO3^2-")] = 3.64,
    };

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
        ["ClO4-"] = 44.12,
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
