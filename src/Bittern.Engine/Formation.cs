using System.Collections.Immutable;

namespace Bittern.Engine;

/// <summary>
/// How a species is formed from the components: Σ ν_i component_i + ν_w H2O → one mole of it.
/// ln a = ln K(T) + Σ ν_i ln a_i + ν_w ln a_w; for a solid this is ln Ω, for a gas the ln of its fugacity in atm.
/// </summary>
/// <param name="Name">Unique name.</param>
/// <param name="Charge">Charge number; 0 for solids and gases.</param>
/// <param name="Coefficients">ν_i over the components, in their order.</param>
/// <param name="Water">ν_w.</param>
/// <param name="Log10K">log10 K as a function of temperature in kelvin; pure.</param>
public sealed record Formation(
    string Name,
    int Charge,
    ImmutableArray<double> Coefficients,
    double Water,
    Func<double, double> Log10K
);
