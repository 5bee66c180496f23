using Bittern.Chemistry;
using Bittern.Engine;

namespace Bittern.Calculation;

/// <summary>What a stage lets happen at every one of its equilibria.</summary>
/// <param name="MayForm">By solid index.</param>
/// <param name="GasPressures">atm by gas index; NaN where not in contact.</param>
internal sealed record StageConditions(bool[] MayForm, double[] GasPressures)
{
    public static StageConditions Closed(EngineSystem system)
    {
        var gases = new double[system.Gases.Length];
        Array.Fill(gases, double.NaN);
        return new StageConditions(new bool[system.Solids.Length], gases);
    }
}

/// <summary>
/// Brings a stream to equilibrium under a stage's conditions. Suspended solids that the stage does not list may dissolve but not grow.
/// </summary>
internal sealed class Equilibrator
{
    private readonly EngineSystem _system;
    private readonly Solver _solver;
    private readonly Problem _problem;
    private readonly bool[] _frozen;
    private readonly double[] _before;

    public Equilibrator(EngineSystem system)
    {
        _system = system;
        _solver = new Solver(system.System);
        _problem = new Problem(system.System);
        _frozen = new bool[system.Solids.Length];
        _before = new double[system.Solids.Length];
        GasTaken = new double[system.Gases.Length];
    }

    /// <summary>The problem of the last equilibrium, for its certificate.</summary>
    public Problem Problem => _problem;

    /// <summary>mol of each gas taken up at the last equilibrium.</summary>
    public double[] GasTaken { get; }

    /// <summary>
    /// Equilibrates; on success the stream's totals, solids and water are those of the answer. <paramref name="near"/> starts from the stream's own last answer.
    /// </summary>
    public SolveStatus Run(Stream stream, StageConditions conditions, bool near)
    {
        stream.Suspended.CopyTo(_before, 0);
        Array.Clear(_frozen);
        for (var attempt = 0; ; attempt++)
        {
            Load(stream, conditions);
            var status = near
                ? _solver.SolveNear(_problem, stream.Answer)
                : _solver.Solve(_problem, stream.Answer);
            if (status != SolveStatus.Solved)
            {
                return status;
            }

            if (!FreezeGrown(stream, conditions) || attempt > _frozen.Length)
            {
                break;
            }
        }

        Store(stream);
        return SolveStatus.Solved;
    }

    /// <summary>Speciates a liquor without solids, H+ from a measured pH (null: from its total), and stores the H+ total that follows.</summary>
    public SolveStatus RunFixedPH(Stream stream, double? pH, bool near)
    {
        var closed = StageConditions.Closed(_system);
        Array.Clear(_before);
        Array.Clear(_frozen);
        Load(stream, closed);
        _problem.FixedLog10Activities[_system.HydrogenIndex] = pH is { } value
            ? -value
            : double.NaN;
        var status = near
            ? _solver.SolveNear(_problem, stream.Answer)
            : _solver.Solve(_problem, stream.Answer);
        if (status == SolveStatus.Solved)
        {
            Store(stream);
        }

        return status;
    }

    private void Load(Stream stream, StageConditions conditions)
    {
        var engine = _system.System;
        stream.Totals.CopyTo(_problem.Totals, 0);
        _problem.TotalWater = stream.Water;
        _problem.Kelvin = stream.Kelvin;
        conditions.GasPressures.CopyTo(_problem.FixedGasPressures, 0);
        for (var s = 0; s < _before.Length; s++)
        {
            _problem.AllowedSolids[s] = (conditions.MayForm[s] || _before[s] > 0) && !_frozen[s];
            if (_before[s] > 0 && _problem.AllowedSolids[s])
            {
                for (var i = 0; i < _problem.Totals.Length; i++)
                {
                    _problem.Totals[i] += engine.Solids[s].Coefficients[i] * _before[s];
                }

                _problem.TotalWater += engine.Solids[s].Water * _before[s];
            }
        }
    }

    private bool FreezeGrown(Stream stream, StageConditions conditions)
    {
        var any = false;
        for (var s = 0; s < _before.Length; s++)
        {
            if (
                !conditions.MayForm[s]
                && !_frozen[s]
                && stream.Answer.SolidAmounts[s] > _before[s] * (1 + 1e-12)
            )
            {
                _frozen[s] = true;
                any = true;
            }
        }

        return any;
    }

    // The liquor's own species say what is left in it: what solids took would be a difference of large numbers.
    private void Store(Stream stream)
    {
        var answer = stream.Answer;
        var water = answer.WaterKilograms / PhysicalConstants.WaterMolarMass;
        for (var j = 0; j < _system.Aqueous.Length; j++)
        {
            water += _system.System.Species[j].Water * answer.Molalities[j] * answer.WaterKilograms;
        }

        stream.Water = water;
        for (var i = 0; i < stream.Totals.Length; i++)
        {
            stream.Totals[i] = _system.Dissolved(answer, i);
        }

        answer.GasAmounts.CopyTo(GasTaken, 0);
        for (var s = 0; s < _before.Length; s++)
        {
            stream.Suspended[s] = _frozen[s] ? _before[s] : answer.SolidAmounts[s];
        }
    }
}
