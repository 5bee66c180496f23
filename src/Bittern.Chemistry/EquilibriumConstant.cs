namespace Bittern.Chemistry;

/// <summary>How an equilibrium constant was written, so that a report can show it as its author gave it.</summary>
public enum ConstantForm
{
    LogK,
    LogKsp,
    PKsp,
    K,
    Ksp,
    LogKH,
}

/// <summary>
/// An equilibrium constant with everything a reader needs to trust it. Thermodynamic (zero ionic strength), molal scale, gases in atm.
/// </summary>
/// <param name="Value">log10 K as a function of temperature.</param>
/// <param name="Form">How it was written.</param>
/// <param name="UncertaintyLog10">Standard uncertainty in log10 units; null when none is stated.</param>
/// <param name="ValidFromCelsius">Lower end of the stated range, °C; null when none is stated.</param>
/// <param name="ValidToCelsius">Upper end, °C.</param>
/// <param name="Source">Citation; null in scratch recipes.</param>
/// <param name="Recalled">True when the number was recalled without sight of its source: reports mark it.</param>
public sealed record EquilibriumConstant(
    TemperatureFunction Value,
    ConstantForm Form,
    double? UncertaintyLog10,
    double? ValidFromCelsius,
    double? ValidToCelsius,
    Citation? Source,
    bool Recalled
)
{
    /// <summary>log10 K at <paramref name="celsius"/> °C.</summary>
    public double Log10AtCelsius(double celsius) =>
        Value.Log10At(celsius + PhysicalConstants.ZeroCelsius);

    /// <summary>False when <paramref name="celsius"/> lies outside the stated range, with 0.5 K of grace.</summary>
    public bool Covers(double celsius) =>
        (ValidFromCelsius is not { } from || celsius >= from - 0.5)
        && (ValidToCelsius is not { } to || celsius <= to + 0.5);
}
