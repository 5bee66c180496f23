namespace Bittern.Engine;

/// <summary>How a solve ended. A closed set; only <see cref="Solved"/> carries numbers that may be used.</summary>
public enum SolveStatus
{
    /// <summary>Converged; certify before use.</summary>
    Solved,

    /// <summary>A total is negative that no species can carry: there is no answer.</summary>
    NegativeTotal,

    /// <summary>Two fixed activities contradict each other, or fix something that is not there.</summary>
    ConflictingFixedActivities,

    /// <summary>No liquor is left: solids and reactions take all the water.</summary>
    Dry,

    /// <summary>The iteration did not converge; nothing may be concluded.</summary>
    NotConverged,
}

/// <summary>The result of a solve, in arrays that are reused from solve to solve.</summary>
public sealed class Answer
{
    /// <summary>Space for the answers of one system.</summary>
    public Answer(EquilibriumSystem system)
    {
        System = system;
        LnActivities = new double[system.Components.Length];
        Molalities = new double[system.Species.Length];
        LnGammas = new double[system.Species.Length];
        SolidAmounts = new double[system.Solids.Length];
        LnSaturations = new double[system.Solids.Length];
        Degenerate = new bool[system.Solids.Length];
        GasAmounts = new double[system.Gases.Length];
        FixedAmounts = new double[system.Components.Length];
    }

    /// <summary>The system that was solved.</summary>
    public EquilibriumSystem System { get; }

    /// <summary>How it ended.</summary>
    public SolveStatus Status { get; internal set; } = SolveStatus.NotConverged;

    /// <summary>What stood in the way, by name; null when solved.</summary>
    public string? Obstacle { get; internal set; }

    /// <summary>ln activity of each component; negative infinity for one whose total is zero.</summary>
    public double[] LnActivities { get; }

    /// <summary>mol per kg of water of each dissolved species.</summary>
    public double[] Molalities { get; }

    /// <summary>ln of each activity coefficient, molal scale.</summary>
    public double[] LnGammas { get; }

    /// <summary>ln of the water activity.</summary>
    public double LnWaterActivity { get; internal set; }

    /// <summary>Liquid water, kg.</summary>
    public double WaterKilograms { get; internal set; }

    /// <summary>Amount of each solid, mol; never negative.</summary>
    public double[] SolidAmounts { get; }

    /// <summary>ln Ω of every solid, allowed or not; negative infinity where a component is absent.</summary>
    public double[] LnSaturations { get; }

    /// <summary>
    /// True for solids whose amounts are not determined one by one (their reactions depend on each other and all are saturated): the split with the least sum of
    /// squares is given. A report must say so.
    /// </summary>
    public bool[] Degenerate { get; }

    /// <summary>mol of each fixed gas taken up (positive) or given off to hold its pressure.</summary>
    public double[] GasAmounts { get; }

    /// <summary>mol of each fixed component added (positive) or removed to hold its activity.</summary>
    public double[] FixedAmounts { get; }

    /// <summary>Newton systems that were solved.</summary>
    public int Iterations { get; internal set; }

    /// <summary>Ionic strength, mol per kg of water: I = ½ Σ m z².</summary>
    public double IonicStrength
    {
        get
        {
            var sum = 0.0;
            for (var j = 0; j < Molalities.Length; j++)
            {
                sum += Molalities[j] * System.SpeciesCharges[j] * System.SpeciesCharges[j];
            }

            return sum / 2;
        }
    }

    /// <summary>Copies another answer of the same system.</summary>
    public void CopyFrom(Answer other)
    {
        Status = other.Status;
        Obstacle = other.Obstacle;
        other.LnActivities.CopyTo(LnActivities, 0);
        other.Molalities.CopyTo(Molalities, 0);
        other.LnGammas.CopyTo(LnGammas, 0);
        other.SolidAmounts.CopyTo(SolidAmounts, 0);
        other.LnSaturations.CopyTo(LnSaturations, 0);
        other.Degenerate.CopyTo(Degenerate, 0);
        other.GasAmounts.CopyTo(GasAmounts, 0);
        other.FixedAmounts.CopyTo(FixedAmounts, 0);
        LnWaterActivity = other.LnWaterActivity;
        WaterKilograms = other.WaterKilograms;
        Iterations = other.Iterations;
    }
}
