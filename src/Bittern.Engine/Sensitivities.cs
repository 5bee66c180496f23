using Bittern.Engine.Solving;

namespace Bittern.Engine;

/// <summary>
/// Derivatives of a solved state with respect to every total, constant and activity coefficient, by the implicit function theorem on the equations
/// that the answer satisfies: J du = -∂F/∂θ dθ with the one factorised Jacobian J, never by solving again. The assemblage is held: a derivative says
/// nothing about what happens where a solid appears or vanishes.
/// </summary>
public sealed class Sensitivities
{
    private readonly EquilibriumSystem _system;
    private readonly ReducedProblem _reduced;
    private readonly Iterate _x;
    private readonly ActiveSetPolish _polish;
    private readonly double[] _lnK;
    private readonly double[] _solidLnK;
    private readonly double[] _ownSolidLnK;
    private readonly double[] _pivotShift;
    private readonly double[] _totals;

    private Sensitivities(EquilibriumSystem system)
    {
        _system = system;
        _reduced = new ReducedProblem(system);
        _x = new Iterate(_reduced);
        _polish = new ActiveSetPolish(system, _reduced.Activity.MomentCount);
        _lnK = new double[system.Species.Length];
        _solidLnK = new double[system.Solids.Length];
        _ownSolidLnK = new double[system.Solids.Length];
        _pivotShift = new double[system.Components.Length];
        _totals = new double[system.Components.Length];
    }

    /// <summary>
    /// Factorises the equations at a solved answer.
    /// </summary>
    /// <returns>Null when the equations are singular there: derivatives do not exist.</returns>
    /// <exception cref="ArgumentException">The answer is not solved.</exception>
    public static Sensitivities? At(Problem problem, Answer answer)
    {
        if (answer.Status != SolveStatus.Solved)
        {
            throw new ArgumentException(
                $"an answer with status {answer.Status} has no derivatives",
                nameof(answer)
            );
        }

        var sensitivities = new Sensitivities(problem.System);
        return sensitivities.Load(problem, answer) ? sensitivities : null;
    }

    /// <summary>Per mol of a component's total.</summary>
    public StateDerivative ToTotal(int component)
    {
        Clear();
        AddTotal(component, 1);
        return Respond(0, default, 0);
    }

    /// <summary>Per mol of total water.</summary>
    public StateDerivative ToTotalWater()
    {
        Clear();
        return Respond(1, default, 0);
    }

    /// <summary>Along a direction of totals (mol per unit of θ for each component) and water: a reagent's dose, for one.</summary>
    public StateDerivative ToDirection(ReadOnlySpan<double> totals, double water)
    {
        Clear();
        for (var i = 0; i < totals.Length; i++)
        {
            AddTotal(i, totals[i]);
        }

        return Respond(water, default, 0);
    }

    /// <summary>Per unit of log10 of a dissolved species' formation constant. A component's own constant is a shift of its standard state and is allowed.</summary>
    public StateDerivative ToSpeciesLog10K(int species)
    {
        Clear();
        _lnK[species] = Math.Log(10);
        return Respond(0, default, 0);
    }

    /// <summary>Per unit of log10 of a solid's formation constant (-log10 Ksp).</summary>
    public StateDerivative ToSolidLog10K(int solid)
    {
        Clear();
        _solidLnK[solid] = Math.Log(10);
        _ownSolidLnK[solid] = Math.Log(10);
        return Respond(0, default, 0);
    }

    /// <summary>Per unit of log10 of a fixed gas's pressure; a unit of log10 of its constant moves the state by the opposite.</summary>
    /// <exception cref="ArgumentException">The gas is not fixed in this problem.</exception>
    public StateDerivative ToGasLog10Pressure(int gas) => ToPivot(gas, -1);

    /// <summary>Per unit of log10 of a fixed component's activity (minus pH).</summary>
    /// <exception cref="ArgumentException">The component is not fixed in this problem.</exception>
    public StateDerivative ToFixedLog10Activity(int component) => ToPivot(-1, component);

    /// <summary>Per unit of θ when θ shifts the activity model itself: d ln γ_j/dθ and d ln a_w/dθ at fixed composition (an activity parameter).</summary>
    public StateDerivative ToActivity(ReadOnlySpan<double> lnGammas, double lnWaterActivity)
    {
        Clear();
        return Respond(0, lnGammas, lnWaterActivity);
    }

    private StateDerivative ToPivot(int gas, int component)
    {
        Clear();
        if (!_reduced.PivotShift(gas, component, Math.Log(10), _pivotShift))
        {
            throw new ArgumentException(
                "only a fixed gas or component has a pressure or activity to derive by",
                gas >= 0 ? nameof(gas) : nameof(component)
            );
        }

        for (var p = 0; p < _reduced.PivotCount; p++)
        {
            var pivot = _reduced.PivotOf[p];
            for (var j = 0; j < _lnK.Length; j++)
            {
                _lnK[j] += _system.Species[j].Coefficients[pivot] * _pivotShift[p];
            }

            for (var s = 0; s < _solidLnK.Length; s++)
            {
                _solidLnK[s] += _system.Solids[s].Coefficients[pivot] * _pivotShift[p];
            }
        }

        return Respond(0, default, 0);
    }

    private bool Load(Problem problem, Answer answer)
    {
        if (_reduced.Build(problem, out _) != SolveStatus.Solved)
        {
            return false;
        }

        _x.LnWater = Math.Log(answer.WaterKilograms);
        _x.LnWaterActivity = answer.LnWaterActivity;
        answer.LnGammas.CopyTo(_x.LnGamma, 0);
        for (var c = 0; c < _reduced.ComponentCount; c++)
        {
            _x.Y[c] = answer.LnActivities[_reduced.Components[c]];
        }

        _x.ComputeMoles();
        SolidScales.Set(_x);
        for (var s = 0; s < _reduced.SolidCount; s++)
        {
            _x.SolidAmounts[s] = answer.SolidAmounts[_reduced.Solids[s]];
            if (_x.SolidAmounts[s] > 0)
            {
                _polish.Keep(_x, s);
            }
        }

        return _polish.FactorAt(_x);
    }

    private void Clear()
    {
        Array.Clear(_lnK);
        Array.Clear(_solidLnK);
        Array.Clear(_ownSolidLnK);
        Array.Clear(_pivotShift);
        Array.Clear(_totals);
    }

    // A total of an eliminated component is a total of what replaced it in the basis.
    private void AddTotal(int component, double amount)
    {
        _totals[component] += amount;
        for (var p = 0; p < _reduced.PivotCount; p++)
        {
            if (_reduced.PivotOf[p] == component)
            {
                for (var k = 0; k < _totals.Length; k++)
                {
                    _totals[k] -= amount * _reduced.PivotRows[(p * _totals.Length) + k];
                }
            }
        }
    }

    private StateDerivative Respond(
        double water,
        ReadOnlySpan<double> lnGammas,
        double lnWaterActivity
    )
    {
        var result = new StateDerivative(_system);
        for (var p = 0; p < _reduced.PivotCount; p++)
        {
            water -= _totals[_reduced.PivotOf[p]] * _reduced.PivotWater[p];
        }

        // A shift of ln γ acts on mass action as the opposite shift of ln K; one of ln a_w through the water that a species or solid binds.
        for (var j = 0; j < _lnK.Length; j++)
        {
            _lnK[j] +=
                (_reduced.SpeciesWater[j] * lnWaterActivity) - (lnGammas.IsEmpty ? 0 : lnGammas[j]);
        }

        for (var s = 0; s < _solidLnK.Length; s++)
        {
            _solidLnK[s] += _reduced.SolidWater[s] * lnWaterActivity;
        }

        _polish.Respond(_x, _totals, water, _lnK, _solidLnK, result, lnGammas, lnWaterActivity);
        for (var p = 0; p < _reduced.PivotCount; p++)
        {
            var value = _pivotShift[p] - (_reduced.PivotWater[p] * result.LnWaterActivity);
            for (var k = 0; k < _totals.Length; k++)
            {
                value -= _reduced.PivotRows[(p * _totals.Length) + k] * result.LnActivities[k];
            }

            result.LnActivities[_reduced.PivotOf[p]] = value;
        }

        for (var s = 0; s < _system.Solids.Length; s++)
        {
            result.LnSaturations[s] = SaturationDerivative(s, result);
        }

        return result;
    }

    private double SaturationDerivative(int solid, StateDerivative result)
    {
        var sum = _ownSolidLnK[solid] + (_system.Solids[solid].Water * result.LnWaterActivity);
        for (var i = 0; i < _system.Components.Length; i++)
        {
            sum += _system.Solids[solid].Coefficients[i] * result.LnActivities[i];
        }

        return sum;
    }
}
