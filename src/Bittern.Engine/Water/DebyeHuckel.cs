using Bittern.Chemistry;

namespace Bittern.Engine.Water;

/// <summary>The Debye-Hückel limiting slope and length parameter of water.</summary>
public static class DebyeHuckel
{
    private const double ElementaryCharge = 1.602176634e-19;
    private const double Permittivity = 8.8541878128e-12;
    private const double Boltzmann = 1.380649e-23;

    /// <summary>e²/(4π ε0 k), m K: Bjerrum's length times ε T.</summary>
    private const double Bjerrum =
        ElementaryCharge * ElementaryCharge / (4 * Math.PI * Permittivity * Boltzmann);

    /// <summary>A in log10 γ = -A z² √I, kg^½ mol^-½: A = (2π N_A ρ)^½ (e²/(4π ε0 ε k T))^(3/2)/ln 10 (Debye and Hückel 1923). ρ and ε from <see cref="LiquidWater"/>.</summary>
    public static double SlopeLog10(double kelvin)
    {
        var density = LiquidWater.Density(kelvin);
        var length = Bjerrum / (LiquidWater.DielectricConstant(kelvin, density) * kelvin);
        return Math.Sqrt(2 * Math.PI * PhysicalConstants.Avogadro * density)
            * Math.Pow(length, 1.5)
            / Math.Log(10);
    }

    /// <summary>A_φ = A ln 10/3, the slope of Pitzer's equations, kg^½ mol^-½.</summary>
    public static double SlopePhi(double kelvin) => SlopeLog10(kelvin) * Math.Log(10) / 3;

    /// <summary>B in 1 + B a √I, Å^-1 kg^½ mol^-½: B = (8π N_A ρ e²/(4π ε0 ε k T))^½.</summary>
    public static double LengthParameter(double kelvin)
    {
        const double Angstrom = 1e-10;
        var density = LiquidWater.Density(kelvin);
        var length = Bjerrum / (LiquidWater.DielectricConstant(kelvin, density) * kelvin);
        return Angstrom * Math.Sqrt(8 * Math.PI * PhysicalConstants.Avogadro * density * length);
    }

    /// <summary>
    /// A at a temperature for parameters that were fitted with their own A at 25 °C: that value, times how water's own A changes from 25 °C.
    /// Null takes water's own.
    /// </summary>
    public static double SlopeLog10(double kelvin, double? at25) =>
        at25 is { } a
            ? a * SlopeLog10(kelvin) / SlopeLog10(PhysicalConstants.ReferenceKelvin)
            : SlopeLog10(kelvin);

    /// <summary>B at a temperature for parameters with their own B at 25 °C; as <see cref="SlopeLog10(double, double?)"/>.</summary>
    public static double LengthParameter(double kelvin, double? at25) =>
        at25 is { } b
            ? b * LengthParameter(kelvin) / LengthParameter(PhysicalConstants.ReferenceKelvin)
            : LengthParameter(kelvin);
}
