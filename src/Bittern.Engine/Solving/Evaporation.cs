namespace Bittern.Engine.Solving;

/// <summary>
/// The way to a concentrated brine that the trade would take: solve it diluted, where activity coefficients are tame, then take the water away step by step, each
/// step starting from the one before and halved (in the logarithm) when it was too long. Buffers are reused.
/// </summary>
internal sealed class Evaporation(EquilibriumSystem system)
{
    /// <summary>Share of the water that the first step leaves.</summary>
    private const double FirstShare = 0.7;

    /// <summary>Share that the boldest step leaves.</summary>
    private const double BoldestShare = 0.3;

    /// <summary>A step that must leave more than this means that the liquor cannot lose more water: it is about to dry up, or no answer is near.</summary>
    private const double TimidShare = 0.999;

    /// <summary>Liquid water left, of all that solids hold and the liquor, below which the way ended because the liquor dries up.</summary>
    private const double NearlyDry = 0.1;

    private readonly double[] _y = new double[system.Components.Length];
    private readonly double[] _lnGamma = new double[system.Species.Length];
    private readonly double[] _solids = new double[system.Solids.Length];
    private double _lnWater;
    private double _lnWaterActivity;

    /// <summary>True when the last way ended because hydrates take the last water: their assemblage fixes the activities, and less water only means less liquor.</summary>
    public bool EndedDry { get; private set; }

    /// <summary>From an answer with more water than <paramref name="target"/> (mol) to the one with that; false when the way ends before.</summary>
    public bool Run(Iterate x, ActiveSetPolish polish, double target, ref int iterations)
    {
        var problem = x.Problem;
        var share = FirstShare;
        EndedDry = false;
        while (problem.TotalWater > target)
        {
            Save(x);
            var before = problem.TotalWater;
            problem.TotalWater = Math.Max(before * share, target);

            // The predictor: everything dissolved shares less water, nothing else changes.
            x.LnWater += Math.Log(problem.TotalWater / before);
            if (polish.Finish(x, ref iterations))
            {
                share = Math.Max(share * share, BoldestShare);
                continue;
            }

            problem.TotalWater = before;
            Restore(x, polish);
            share = Math.Sqrt(share);
            if (share > TimidShare)
            {
                var all = before * Chemistry.PhysicalConstants.WaterMolarMass;
                EndedDry = x.Water < NearlyDry * all;
                return false;
            }
        }

        return true;
    }

    /// <summary>Forgets how the last way ended.</summary>
    public void Reset() => EndedDry = false;

    private void Save(Iterate x)
    {
        x.Y.CopyTo(_y, 0);
        x.LnGamma.CopyTo(_lnGamma, 0);
        x.SolidAmounts.CopyTo(_solids, 0);
        _lnWater = x.LnWater;
        _lnWaterActivity = x.LnWaterActivity;
    }

    private void Restore(Iterate x, ActiveSetPolish polish)
    {
        _y.CopyTo(x.Y, 0);
        _lnGamma.CopyTo(x.LnGamma, 0);
        _solids.CopyTo(x.SolidAmounts, 0);
        x.LnWater = _lnWater;
        x.LnWaterActivity = _lnWaterActivity;
        polish.Clear();
        for (var s = 0; s < x.Problem.SolidCount; s++)
        {
            if (_solids[s] > 0)
            {
                polish.Keep(x, s);
            }
        }
    }
}
