using Bittern.Chemistry;

namespace Bittern.Engine.Solving;

/// <summary>
/// The point that the solver moves: ln activities y of the remaining components, ln of the kilograms of water, the activity model's moments and what follows
/// from them. Positions follow <see cref="ReducedProblem"/>. No allocation after construction.
/// </summary>
internal sealed class Iterate
{
    private readonly double[] _modelGamma;

    public Iterate(ReducedProblem problem)
    {
        var system = problem.System;
        var n = system.Components.Length;
        var m = system.Species.Length;
        var p = problem.Activity.MomentCount;
        Problem = problem;
        Y = new double[n];
        LnGamma = new double[m];
        _modelGamma = new double[m];
        GammaSlopes = new double[m * p];
        Moments = new double[p];
        WaterSlopes = new double[p];
        Moles = new double[m];
        Gross = new double[n];
        Balance = new double[n];
        SolidAmounts = new double[system.Solids.Length];
        SolidScale = new double[system.Solids.Length];
    }

    public ReducedProblem Problem { get; }

    /// <summary>ln activity of each remaining component.</summary>
    public double[] Y { get; }

    /// <summary>ln of kg of water.</summary>
    public double LnWater { get; set; }

    /// <summary>ln γ by species index of the system.</summary>
    public double[] LnGamma { get; }

    public double LnWaterActivity { get; set; }

    /// <summary>∂ln γ_j/∂q_p by species index, and ∂ln a_w/∂q_p.</summary>
    public double[] GammaSlopes { get; }

    public double[] WaterSlopes { get; }

    /// <summary>Moments q of the activity model that γ were evaluated at.</summary>
    public double[] Moments { get; }

    /// <summary>mol of each dissolved species, by position in <see cref="ReducedProblem.Species"/>.</summary>
    public double[] Moles { get; }

    /// <summary>Σ|ν|n + |total| of each remaining component: what residuals are relative to.</summary>
    public double[] Gross { get; }

    /// <summary>Σ ν n - total of each remaining component, solids left out.</summary>
    public double[] Balance { get; }

    /// <summary>mol of each solid by position in <see cref="ReducedProblem.Solids"/>.</summary>
    public double[] SolidAmounts { get; }

    /// <summary>Largest amount of each solid that its scarcest component allows, mol: the natural unit of its amount.</summary>
    public double[] SolidScale { get; }

    /// <summary>Share of the activity model's ln γ that counts, 0 to 1; below 1 only on the way from ideal to real.</summary>
    public double NonIdeality { get; set; } = 1;

    public double Water => Math.Exp(LnWater);

    /// <summary>Moles of all species from y, γ and water; then balances and gross amounts.</summary>
    public void ComputeMoles()
    {
        var problem = Problem;
        for (var k = 0; k < problem.SpeciesCount; k++)
        {
            Moles[k] = Math.Exp(Math.Min(LnMoles(k), 300));
        }

        ComputeBalances();
    }

    /// <summary>ln of the moles of one species by mass action.</summary>
    public double LnMoles(int position)
    {
        var problem = Problem;
        var j = problem.Species[position];
        var sum =
            problem.SpeciesLnK[j]
            + (problem.SpeciesWater[j] * LnWaterActivity)
            - LnGamma[j]
            + LnWater;
        for (var e = problem.SpeciesStart[position]; e < problem.SpeciesStart[position + 1]; e++)
        {
            sum += problem.SpeciesValue[e] * Y[problem.SpeciesColumn[e]];
        }

        return sum;
    }

    /// <summary>Balances and gross amounts from the present moles.</summary>
    public void ComputeBalances()
    {
        var problem = Problem;
        for (var c = 0; c < problem.ComponentCount; c++)
        {
            Balance[c] = -problem.Totals[c];
            Gross[c] = Math.Abs(problem.Totals[c]);
        }

        for (var k = 0; k < problem.SpeciesCount; k++)
        {
            for (var e = problem.SpeciesStart[k]; e < problem.SpeciesStart[k + 1]; e++)
            {
                var amount = problem.SpeciesValue[e] * Moles[k];
                Balance[problem.SpeciesColumn[e]] += amount;
                Gross[problem.SpeciesColumn[e]] += Math.Abs(amount);
            }
        }
    }

    /// <summary>Moments of the present molalities into <paramref name="moments"/>.</summary>
    public void ComputeMoments(Span<double> moments)
    {
        var problem = Problem;
        var weights = problem.Activity.Weights;
        var count = problem.System.Species.Length;
        var perKilogram = Math.Exp(-LnWater);
        for (var p = 0; p < moments.Length; p++)
        {
            var row = weights.Slice(p * count, count);
            var sum = 0.0;
            for (var k = 0; k < problem.SpeciesCount; k++)
            {
                sum += row[problem.Species[k]] * Moles[k];
            }

            moments[p] = sum * perKilogram;
        }
    }

    /// <summary>Evaluates the activity model at <see cref="Moments"/>.</summary>
    public void EvaluateActivity()
    {
        if (NonIdeality == 1)
        {
            Problem.Activity.Evaluate(
                Moments,
                LnGamma,
                out var lnWaterActivity,
                GammaSlopes,
                WaterSlopes
            );
            LnWaterActivity = lnWaterActivity;
            return;
        }

        Problem.Activity.Evaluate(Moments, _modelGamma, out var full, GammaSlopes, WaterSlopes);
        LnWaterActivity = full;
        for (var j = 0; j < _modelGamma.Length; j++)
        {
            LnGamma[j] = NonIdeality * _modelGamma[j];
        }

        for (var i = 0; i < GammaSlopes.Length; i++)
        {
            GammaSlopes[i] *= NonIdeality;
        }
    }

    /// <summary>Total water less what species and solids bind, as kg; may be negative.</summary>
    public double WaterFromBalance()
    {
        var problem = Problem;
        var moles = problem.TotalWater;
        for (var k = 0; k < problem.SpeciesCount; k++)
        {
            moles -= problem.SpeciesWater[problem.Species[k]] * Moles[k];
        }

        for (var s = 0; s < problem.SolidCount; s++)
        {
            moles -= problem.SolidWater[problem.Solids[s]] * SolidAmounts[s];
        }

        return moles * PhysicalConstants.WaterMolarMass;
    }

    /// <summary>ln Ω of a solid by position in <see cref="ReducedProblem.Solids"/>.</summary>
    public double LnSaturation(int position)
    {
        var problem = Problem;
        var solid = problem.Solids[position];
        return problem.SolidLnK[solid]
            + (problem.SolidWater[solid] * LnWaterActivity)
            + Dot(
                problem.SolidRows.AsSpan(position * problem.ComponentCount, problem.ComponentCount),
                Y
            );
    }

    public static double Dot(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        var sum = 0.0;
        for (var i = 0; i < a.Length; i++)
        {
            sum += a[i] * b[i];
        }

        return sum;
    }
}
