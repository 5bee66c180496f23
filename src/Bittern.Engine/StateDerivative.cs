namespace Bittern.Engine;

/// <summary>
/// How a solved state moves with one parameter θ: derivatives at fixed assemblage of everything a reported quantity is made of.
/// Arrays follow the system's order. Components and species that are absent have a derivative of zero.
/// </summary>
public sealed class StateDerivative
{
    internal StateDerivative(EquilibriumSystem system)
    {
        LnActivities = new double[system.Components.Length];
        LnMolalities = new double[system.Species.Length];
        LnGammas = new double[system.Species.Length];
        SolidAmounts = new double[system.Solids.Length];
        LnSaturations = new double[system.Solids.Length];
    }

    /// <summary>d ln a_i/dθ of each component.</summary>
    public double[] LnActivities { get; }

    /// <summary>d ln m_j/dθ of each dissolved species.</summary>
    public double[] LnMolalities { get; }

    /// <summary>d ln γ_j/dθ.</summary>
    public double[] LnGammas { get; }

    /// <summary>d n_s/dθ of each solid, mol per unit of θ.</summary>
    public double[] SolidAmounts { get; }

    /// <summary>d ln Ω_s/dθ.</summary>
    public double[] LnSaturations { get; }

    /// <summary>d ln w/dθ of the kilograms of water.</summary>
    public double LnWater { get; internal set; }

    /// <summary>d ln a_w/dθ.</summary>
    public double LnWaterActivity { get; internal set; }
}
