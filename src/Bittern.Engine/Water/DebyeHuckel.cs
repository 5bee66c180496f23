using Bittern.Chemistry;

namespace Bittern.Engine.Water;

/// <summary>The Debye-Hückel limiting slope and length parameter of water.</summary>
public static class DebyeHuckel
{
    /// <summary>
    /// A in log10 γ = -A z² √I, kg^½ mol^-½: A = (2π N_A ρ)^½ (e²/(4π ε0 ε k T))^(3/2)/ln 10 (Debye and Hückel 1923), which with the
    /// fundamental constants is 1.824829e6 (ρ/1000)^½ (εT)^(-3/2). ρ and ε from <see cref="LiquidWater"/>.
    /// </summary>
    public static double SlopeLog10(double kelvin) =>
        1.824829e6
        * Math.Sqrt(LiquidWater.Density(kelvin) / 1000)
        * Math.Pow(LiquidWater.DielectricConstant(kelvin) * kelvin, -1.5);

    /// <summary>B in 1 + B a √I, Å^-1 kg^½ mol^-½: 50.2916 (ρ/1000)^½ (εT)^(-1/2).</summary>
    public static double LengthParameter(double kelvin) =>
        50.2916
        * Math.Sqrt(LiquidWater.Density(kelvin) / 1000)
        / Math.Sqrt(LiquidWater.DielectricConstant(kelvin) * kelvin);

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
