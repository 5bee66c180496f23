using Bittern.Engine.Solving;

namespace Bittern.Engine;

/// <summary>
/// Solves problems of one system, one after another, without allocating. Not safe to share between threads: give each its own.
/// A cold solve starts from one canonical point, so its digits depend on the problem alone.
/// </summary>
public sealed class Solver
{
    /// <summary>Steps from an ideal to the real solution when the direct way fails.</summary>
    private const int HomotopySteps = 20;

    /// <summary>Barrier of the second attempt at the assemblage.</summary>
    private const double TightBarrier = 1e-11;

    /// <summary>Factor of water between attempts at a liquor dilute enough to be easy, and the most that is tried.</summary>
    private const double DilutionStep = 8;

    private const double MaxDilution = 4096;

    private readonly ReducedProblem _reduced;
    private readonly Iterate _iterate;
    private readonly BarrierPath _path;
    private readonly ActiveSetPolish _polish;
    private readonly Evaporation _evaporation;

    /// <summary>A solver with the buffers for one system.</summary>
    public Solver(EquilibriumSystem system)
    {
        System = system;
        _reduced = new ReducedProblem(system);
        _iterate = new Iterate(_reduced);
        _path = new BarrierPath(system, _reduced.Activity.MomentCount);
        _polish = new ActiveSetPolish(system, _reduced.Activity.MomentCount);
        _evaporation = new Evaporation(system);
    }

    /// <summary>The system that this solver knows.</summary>
    public EquilibriumSystem System { get; }

    /// <summary>Solves from the canonical start. See <see cref="Answer.Status"/>; only a solved and certified answer may be used.</summary>
    public SolveStatus Solve(Problem problem, Answer answer) =>
        Solve(problem, answer, fromPrevious: false);

    /// <summary>
    /// Solves starting from what <paramref name="answer"/> holds of a neighbouring problem, which is faster; falls back to the canonical start when that
    /// does not lead to an answer at once.
    /// </summary>
    public SolveStatus SolveNear(Problem problem, Answer answer) =>
        Solve(problem, answer, fromPrevious: true);

    private SolveStatus Solve(Problem problem, Answer answer, bool fromPrevious)
    {
        var iterations = 0;
        var status = _reduced.Build(problem, out var obstacle);
        if (status == SolveStatus.Solved)
        {
            _iterate.NonIdeality = 1;
            var solved =
                (
                    fromPrevious
                    && answer.Status == SolveStatus.Solved
                    && Continue(answer, ref iterations)
                )
                || Direct(ref iterations)
                || Evaporate(ref iterations)
                || Homotopy(ref iterations);
            if (!solved)
            {
                var dry =
                    _evaporation.EndedDry
                    || _iterate.Water
                        < 1e-6 * _reduced.TotalWater * Chemistry.PhysicalConstants.WaterMolarMass;
                status = dry ? SolveStatus.Dry : SolveStatus.NotConverged;
                obstacle = dry ? "H2O" : null;
            }
        }

        answer.Status = status;
        answer.Obstacle = obstacle;
        answer.Iterations = iterations;
        if (status == SolveStatus.Solved)
        {
            AnswerWriter.Write(problem, _reduced, _iterate, answer);
        }

        return status;
    }

    private bool Continue(Answer previous, ref int iterations)
    {
        _iterate.LnWater = Math.Log(previous.WaterKilograms);
        for (var c = 0; c < _reduced.ComponentCount; c++)
        {
            var y = previous.LnActivities[_reduced.Components[c]];
            if (double.IsInfinity(y) || double.IsNaN(y))
            {
                return false;
            }

            _iterate.Y[c] = y;
        }

        previous.LnGammas.CopyTo(_iterate.LnGamma, 0);
        _iterate.LnWaterActivity = previous.LnWaterActivity;
        _iterate.ComputeMoles();
        SolidScales.Set(_iterate);
        _polish.Clear();
        for (var s = 0; s < _reduced.SolidCount; s++)
        {
            _iterate.SolidAmounts[s] = previous.SolidAmounts[_reduced.Solids[s]];
            if (_iterate.SolidAmounts[s] > 0)
            {
                _polish.Keep(_iterate, s);
            }
        }

        return _polish.Finish(_iterate, ref iterations);
    }

    private bool Direct(ref int iterations)
    {
        StartingPoint.Find(_iterate);
        if (!_path.Follow(_iterate, ref iterations))
        {
            return false;
        }

        if (Finish(ref iterations))
        {
            return true;
        }

        StartingPoint.Find(_iterate);
        return _path.Follow(_iterate, TightBarrier, ref iterations) && Finish(ref iterations);
    }

    private bool Finish(ref int iterations)
    {
        _polish.Clear();
        var problem = _reduced;
        for (var s = 0; s < problem.SolidCount; s++)
        {
            if (_path.IsPresent(_iterate, s))
            {
                _polish.TryAdd(_iterate, s);
            }
        }

        return _polish.Finish(_iterate, ref iterations);
    }

    // Diluted enough, every liquor is easy; its water then leaves step by step.
    private bool Evaporate(ref int iterations)
    {
        var target = _reduced.TotalWater;
        _evaporation.Reset();
        for (
            var dilution = DilutionStep;
            dilution <= MaxDilution && target > 0;
            dilution *= DilutionStep
        )
        {
            _reduced.TotalWater = target * dilution;
            if (Direct(ref iterations))
            {
                var arrived = _evaporation.Run(_iterate, _polish, target, ref iterations);
                _reduced.TotalWater = target;
                return arrived;
            }
        }

        _reduced.TotalWater = target;
        return false;
    }

    // The ideal solution always has one answer; the activity model is then let in step by step.
    private bool Homotopy(ref int iterations)
    {
        _iterate.NonIdeality = 0;
        if (!Direct(ref iterations))
        {
            return false;
        }

        for (var step = 1; step <= HomotopySteps; step++)
        {
            _iterate.NonIdeality = (double)step / HomotopySteps;
            if (!_polish.Finish(_iterate, ref iterations))
            {
                return false;
            }
        }

        return true;
    }
}
