namespace Bittern.Chemistry;

/// <summary>
/// log10 of an equilibrium constant as a function of temperature (kelvin). Closed set: a van 't Hoff line or an expression as published.
/// </summary>
public abstract record TemperatureFunction
{
    private TemperatureFunction() { }

    /// <summary>log10 K at <paramref name="kelvin"/>.</summary>
    public abstract double Log10At(double kelvin);

    /// <summary>
    /// log10 K(T) = log10 K(298.15) - ΔH/(R ln 10) (1/T - 1/298.15), the van 't Hoff equation with constant ΔH.
    /// </summary>
    /// <param name="Log10At25">log10 K at 25 °C.</param>
    /// <param name="EnthalpyKilojoules">ΔH of the reaction, kJ/mol; null means that none is known and K is taken as constant.</param>
    public sealed record VantHoff(double Log10At25, double? EnthalpyKilojoules)
        : TemperatureFunction
    {
        public override double Log10At(double kelvin) =>
            EnthalpyKilojoules is not { } h
                ? Log10At25
                : Log10At25
                    - (
                        h
                        * 1000
                        / (PhysicalConstants.GasConstant * Math.Log(10))
                        * ((1 / kelvin) - (1 / PhysicalConstants.ReferenceKelvin))
                    );
    }

    /// <summary>An expression in T exactly as published.</summary>
    /// <param name="Text">The expression as written, for reports.</param>
    /// <param name="Evaluate">log10 K from T in kelvin; pure.</param>
    public sealed record Published(string Text, Func<double, double> Evaluate) : TemperatureFunction
    {
        public override double Log10At(double kelvin) => Evaluate(kelvin);
    }
}
