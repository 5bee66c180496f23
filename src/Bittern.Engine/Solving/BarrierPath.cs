using Bittern.Engine.Numerics;

namespace Bittern.Engine.Solving;

/// <summary>
/// Finds which solids form. At fixed γ, a_w and water the equilibrium minimises the convex Φ(y) = Σ n_j(y) - Σ T_i y_i subject to ln Ω_s(y) ≤ 0;
/// a primal-dual barrier method follows the central path n_s · (-ln Ω_s) = t · scale_s down to small t. The barrier of a solid is measured in the scarcest
/// component's total, so that a trace component is not drowned by its neighbours' barriers. γ, a_w and water are renewed between the steps.
/// The result identifies the assemblage; <see cref="ActiveSetPolish"/> finishes.
/// </summary>
internal sealed class BarrierPath
{
    private const int MaxSteps = 120;

    /// <summary>Relative balance residual at which the polish, which has all derivatives, takes over.</summary>
    private const double GoodEnough = 0.02;

    /// <summary>Barrier at which the assemblage is read off.</summary>
    private const double FinalBarrier = 1e-7;

    /// <summary>No species may grow past e^this times what its scarcest component allows in one step.</summary>
    private const double GrowthRoom = 2;

    private readonly double[] _matrix;
    private readonly double[] _gradient;
    private readonly double[] _step;
    private readonly double[] _scale;
    private readonly double[] _trialY;
    private readonly double[] _amountStep;
    private readonly double[] _slackStep;
    private readonly double[] _slack;
    private readonly double[] _shift;
    private readonly double[] _freshMoments;
    private readonly double[] _momentShare;
    private readonly double[] _lastChange;
    private readonly int _stride;

    public BarrierPath(EquilibriumSystem system, int momentCount)
    {
        _freshMoments = new double[momentCount];
        _momentShare = new double[momentCount];
        _lastChange = new double[momentCount];
        var n = system.Components.Length;
        var s = system.Solids.Length;
        _stride = n;
        _matrix = new double[n * n];
        _gradient = new double[n];
        _step = new double[n];
        _scale = new double[n];
        _trialY = new double[n];
        _amountStep = new double[s];
        _slackStep = new double[s];
        _slack = new double[s];
        _shift = new double[s];
    }

    /// <summary>
    /// Follows the path from the iterate's present y. True when it arrived with the balances met to a few per cent;
    /// false leaves a usable but unfinished point.
    /// </summary>
    public bool Follow(Iterate x, double finalBarrier, ref int iterations)
    {
        var problem = x.Problem;
        x.ComputeMoles();
        SolidScales.Set(x);
        MoveInside(x);
        var t = problem.SolidCount == 0 ? 0 : 1.0;
        for (var s = 0; s < problem.SolidCount; s++)
        {
            x.SolidAmounts[s] = Math.Min(x.SolidScale[s], t * x.SolidScale[s] / _slack[s]);
        }

        for (var step = 0; step < MaxSteps; step++)
        {
            RenewActivity(x, step);
            UpdateSlack(x);
            Assemble(x, t);
            Cholesky.Factor(_matrix, problem.ComponentCount, _stride, _scale);
            for (var c = 0; c < problem.ComponentCount; c++)
            {
                _step[c] = -_gradient[c];
            }

            Cholesky.Solve(_matrix, problem.ComponentCount, _stride, _scale, _step);
            iterations++;
            var taken = Advance(x, t);
            var residual = WorstResidual(x);
            if (taken > 0.5 && t > finalBarrier)
            {
                t = Math.Max(t * (residual < 0.1 ? 0.05 : 0.2), finalBarrier);
            }
            else if (taken > 0.5 && residual < GoodEnough)
            {
                return true;
            }
        }

        return false;
    }

    /// <inheritdoc cref="Follow(Iterate, double, ref int)"/>
    public bool Follow(Iterate x, ref int iterations) => Follow(x, FinalBarrier, ref iterations);

    /// <summary>True when a solid, by position, is present on the path's end: its amount outweighs its distance from saturation.</summary>
    public bool IsPresent(Iterate x, int position) =>
        x.SolidAmounts[position] / x.SolidScale[position] > _slack[position];

    // A strictly undersaturated start: the most supersaturated solid is undersaturated again by the move that costs Φ least, over and over.
    private void MoveInside(Iterate x)
    {
        const double Margin = 0.5;
        var problem = x.Problem;
        var n = problem.ComponentCount;
        Array.Clear(_shift);
        for (var c = 0; c < n; c++)
        {
            _gradient[c] = 1 / Math.Max(x.Gross[c], 1e-300);
        }

        for (var pass = 0; pass < 30 * (problem.SolidCount + 1); pass++)
        {
            var worst = -1;
            var excess = -Margin / 2;
            for (var s = 0; s < problem.SolidCount; s++)
            {
                var ln = x.LnSaturation(s);
                if (ln > excess)
                {
                    excess = ln;
                    worst = s;
                }
            }

            if (worst < 0)
            {
                break;
            }

            var row = problem.SolidRows.AsSpan(worst * n, n);
            var norm = 0.0;
            for (var c = 0; c < n; c++)
            {
                norm += row[c] * row[c] * _gradient[c];
            }

            if (norm <= 0)
            {
                break;
            }

            var move = (excess + Margin) / norm;
            for (var c = 0; c < n; c++)
            {
                x.Y[c] -= move * row[c] * _gradient[c];
            }
        }

        x.ComputeMoles();
        for (var s = 0; s < problem.SolidCount; s++)
        {
            _slack[s] = -x.LnSaturation(s);
            if (_slack[s] < Margin / 4)
            {
                // Still supersaturated: its constraint starts relaxed and is tightened on the way.
                _shift[s] = (Margin / 4) - _slack[s];
                _slack[s] = Margin / 4;
            }
        }
    }

    private void RenewActivity(Iterate x, int step)
    {
        var before = x.Water;
        var water = Math.Clamp(x.WaterFromBalance(), before / 2, before * 2);
        x.LnWater = Math.Log(water);
        x.ComputeMoles();
        x.ComputeMoments(_freshMoments);

        // Early guesses may hold absurd molalities, where no activity model means anything.
        var room = step < 3 ? 2 : 60;

        // Where γ answers strongly to the moments (high charges near 1 mol/kg) plain substitution oscillates: a change of sign halves the share taken.
        for (var p = 0; p < x.Moments.Length; p++)
        {
            var change = Math.Clamp(_freshMoments[p], -room, room) - x.Moments[p];
            if (step > 0)
            {
                _momentShare[p] =
                    change * _lastChange[p] < 0
                        ? Math.Max(_momentShare[p] / 2, 0.05)
                        : Math.Min(_momentShare[p] * 1.3, 1);
            }
            else
            {
                _momentShare[p] = 1;
            }

            _lastChange[p] = change;
            x.Moments[p] += _momentShare[p] * change;
        }

        x.EvaluateActivity();
        x.ComputeMoles();
    }

    private void UpdateSlack(Iterate x)
    {
        var problem = x.Problem;
        for (var s = 0; s < problem.SolidCount; s++)
        {
            var previous = _slack[s];
            var plain = -x.LnSaturation(s);

            // The shift falls as fast as half of the slack allows; renewed activities may ask for it again.
            _shift[s] = Math.Max(0, Math.Max((previous / 2) - plain, 0));
            _slack[s] = plain + _shift[s];
            if (!(_slack[s] > 1e-14))
            {
                _shift[s] += 1e-14 - _slack[s];
                _slack[s] = 1e-14;
            }
        }
    }

    private void Assemble(Iterate x, double t)
    {
        var problem = x.Problem;
        var n = problem.ComponentCount;
        for (var c = 0; c < n; c++)
        {
            _gradient[c] = x.Balance[c];
            Array.Clear(_matrix, c * _stride, n);
        }

        for (var k = 0; k < problem.SpeciesCount; k++)
        {
            var moles = x.Moles[k];
            for (var e = problem.SpeciesStart[k]; e < problem.SpeciesStart[k + 1]; e++)
            {
                var row = problem.SpeciesColumn[e] * _stride;
                var weight = moles * problem.SpeciesValue[e];
                for (var f = problem.SpeciesStart[k]; f <= e; f++)
                {
                    _matrix[row + problem.SpeciesColumn[f]] += weight * problem.SpeciesValue[f];
                }
            }
        }

        for (var s = 0; s < problem.SolidCount; s++)
        {
            var row = problem.SolidRows.AsSpan(s * n, n);
            var central = t * x.SolidScale[s] / _slack[s];

            // Keeps the primal-dual curvature within sight of the barrier's own (Wächter and Biegler 2006, eq. 16).
            x.SolidAmounts[s] = Math.Clamp(x.SolidAmounts[s], central / 1e8, central * 1e8);
            var curvature = x.SolidAmounts[s] / _slack[s];
            for (var c = 0; c < n; c++)
            {
                if (row[c] == 0)
                {
                    continue;
                }

                _gradient[c] += row[c] * central;
                for (var d = 0; d <= c; d++)
                {
                    _matrix[(c * _stride) + d] += curvature * row[c] * row[d];
                }
            }
        }
    }

    // Takes as much of the step as growth, the constraints and the line search allow; returns that share.
    private double Advance(Iterate x, double t)
    {
        var problem = x.Problem;
        var n = problem.ComponentCount;
        var share = GrowthShare(x);
        for (var s = 0; s < problem.SolidCount; s++)
        {
            _slackStep[s] = -Iterate.Dot(problem.SolidRows.AsSpan(s * n, n), _step);
            if (_slackStep[s] < 0)
            {
                share = Math.Min(share, 0.99 * _slack[s] / -_slackStep[s]);
            }

            var amount = x.SolidAmounts[s];
            _amountStep[s] =
                (t * x.SolidScale[s] / _slack[s]) - amount - (amount / _slack[s] * _slackStep[s]);
        }

        var slope = Iterate.Dot(_gradient.AsSpan(0, n), _step.AsSpan(0, n));
        x.Y.AsSpan(0, n).CopyTo(_trialY);
        for (var attempt = 0; ; attempt++)
        {
            for (var c = 0; c < n; c++)
            {
                x.Y[c] = _trialY[c] + (share * _step[c]);
            }

            x.ComputeMoles();
            if (attempt >= 30 || SlopeAfter(x, t, share) <= Math.Max(0.9 * Math.Abs(slope), 1e-30))
            {
                break;
            }

            share /= 2;
        }

        var dualShare = 1.0;
        for (var s = 0; s < problem.SolidCount; s++)
        {
            _slack[s] += share * _slackStep[s];
            if (_amountStep[s] < 0)
            {
                dualShare = Math.Min(dualShare, 0.99 * x.SolidAmounts[s] / -_amountStep[s]);
            }
        }

        for (var s = 0; s < problem.SolidCount; s++)
        {
            x.SolidAmounts[s] += dualShare * _amountStep[s];
        }

        return share;
    }

    private double GrowthShare(Iterate x)
    {
        var problem = x.Problem;
        var share = 1.0;
        for (var k = 0; k < problem.SpeciesCount; k++)
        {
            var growth = 0.0;
            var room = double.PositiveInfinity;
            for (var e = problem.SpeciesStart[k]; e < problem.SpeciesStart[k + 1]; e++)
            {
                var c = problem.SpeciesColumn[e];
                growth += problem.SpeciesValue[e] * _step[c];
                room = Math.Min(room, x.Gross[c] / Math.Abs(problem.SpeciesValue[e]));
            }

            if (growth > GrowthRoom)
            {
                var allowed = GrowthRoom + Math.Max(0, Math.Log(room / x.Moles[k]));
                share = Math.Min(share, allowed / growth);
            }
        }

        return share;
    }

    // Directional derivative of the barrier function at the trial point: convexity makes a negative or small value a safe step.
    private double SlopeAfter(Iterate x, double t, double share)
    {
        var problem = x.Problem;
        var n = problem.ComponentCount;
        var slope = Iterate.Dot(x.Balance.AsSpan(0, n), _step.AsSpan(0, n));
        for (var s = 0; s < problem.SolidCount; s++)
        {
            slope -= t * x.SolidScale[s] / (_slack[s] + (share * _slackStep[s])) * _slackStep[s];
        }

        return slope;
    }

    private static double WorstResidual(Iterate x)
    {
        var problem = x.Problem;
        var n = problem.ComponentCount;
        var worst = 0.0;
        for (var c = 0; c < n; c++)
        {
            var residual = x.Balance[c];
            for (var s = 0; s < problem.SolidCount; s++)
            {
                residual += problem.SolidRows[(s * n) + c] * x.SolidAmounts[s];
            }

            worst = Math.Max(worst, Math.Abs(residual) / x.Gross[c]);
        }

        return worst;
    }
}
