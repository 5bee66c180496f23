namespace Bittern.Engine;

/// <summary>
/// What one solve is given. Mutable on purpose: a study changes a number and solves again without allocating.
/// </summary>
public sealed class Problem
{
    /// <summary>A problem with all totals zero, one kilogram of water, 25 °C, no solid allowed and nothing fixed.</summary>
    public Problem(EquilibriumSystem system)
    {
        System = system;
        Totals = new double[system.Components.Length];
        AllowedSolids = new bool[system.Solids.Length];
        FixedGasPressures = new double[system.Gases.Length];
        FixedLog10Activities = new double[system.Components.Length];
        Array.Fill(FixedGasPressures, double.NaN);
        Array.Fill(FixedLog10Activities, double.NaN);
    }

    /// <summary>The system that is solved.</summary>
    public EquilibriumSystem System { get; }

    /// <summary>Total of each component, mol; negative is meaningful where species count it negatively (H+ through OH-).</summary>
    public double[] Totals { get; }

    /// <summary>Total water, mol, counting what species and solids bind or release through their water coefficient. Default: 1 kg.</summary>
    public double TotalWater { get; set; } = 1 / Chemistry.PhysicalConstants.WaterMolarMass;

    /// <summary>Temperature, K.</summary>
    public double Kelvin { get; set; } = Chemistry.PhysicalConstants.ReferenceKelvin;

    /// <summary>Which solids may form.</summary>
    public bool[] AllowedSolids { get; }

    /// <summary>Fugacity (atm) at which a gas is held; NaN where it is not. Its amount is exchanged without limit.</summary>
    public double[] FixedGasPressures { get; }

    /// <summary>log10 activity at which a component is held (-pH for H+, -pe for e-); NaN where it is not. Its total is then an outcome.</summary>
    public double[] FixedLog10Activities { get; }

    /// <summary>Copies every number of another problem of the same system.</summary>
    public void CopyFrom(Problem other)
    {
        other.Totals.CopyTo(Totals, 0);
        other.AllowedSolids.CopyTo(AllowedSolids, 0);
        other.FixedGasPressures.CopyTo(FixedGasPressures, 0);
        other.FixedLog10Activities.CopyTo(FixedLog10Activities, 0);
        TotalWater = other.TotalWater;
        Kelvin = other.Kelvin;
    }
}
