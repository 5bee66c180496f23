using Bittern.Chemistry;
using Bittern.Engine.Numerics;

namespace Bittern.Engine.Solving;

/// <summary>
/// Finishes on an identified assemblage with Newton's method on everything at once: balances, Ω = 1 of the present solids, the water balance and the
/// activity model's moments. Then the assemblage is corrected one solid at a time (a negative amount leaves, the most supersaturated enters) until the
/// conditions of equilibrium hold.
/// </summary>
internal sealed class ActiveSetPolish
{
    private const int MaxNewton = 40;

    /// <summary>Balance residual, relative to gross amounts, that ends Newton's method; a hundredth of what the certificate asks.</summary>
    private const double BalanceTolerance = 1e-12;

    /// <summary>ln Ω above which a solid that may form is missing; a tenth of what the certificate asks.</summary>
    private const double SaturationTolerance = 1e-10;

    /// <summary>ln Ω up to which a second hydrate is let in beside the first rather than in its place.</summary>
    private const double JustPossible = 0.1;

    private readonly double[] _matrix;
    private readonly double[] _rhs;
    private readonly double[] _rowScale;
    private readonly int[] _pivots;
    private readonly double[] _moments;
    private readonly double[] _momentSlopes;
    private readonly int[] _present;
    private readonly bool[] _isPresent;
    private readonly double[] _basis;
    private readonly int _stride;
    private int _presentCount;
    private int _lastLeft = -1;

    public ActiveSetPolish(EquilibriumSystem system, int momentCount)
    {
        var n = system.Components.Length;
        _stride = n + 1 + momentCount + n;
        _matrix = new double[_stride * _stride];
        _rhs = new double[_stride];
        _rowScale = new double[_stride];
        _pivots = new int[_stride];
        _moments = new double[momentCount];
        _momentSlopes = new double[momentCount];
        _present = new int[system.Solids.Length];
        _isPresent = new bool[system.Solids.Length];
        _basis = new double[n * (n + 1)];
    }

    /// <summary>Solids in the assemblage, positions in <see cref="ReducedProblem.Solids"/>.</summary>
    public ReadOnlySpan<int> Present => _present.AsSpan(0, _presentCount);

    /// <summary>Starts with an empty assemblage.</summary>
    public void Clear()
    {
        _presentCount = 0;
        Array.Clear(_isPresent);
    }

    /// <summary>Adds a solid by position when its reaction is independent of those already present.</summary>
    public bool TryAdd(Iterate x, int position)
    {
        if (
            _isPresent[position]
            || _presentCount >= x.Problem.ComponentCount
            || !IsIndependent(x, position, water: 0)
        )
        {
            return false;
        }

        Add(position);
        return true;
    }

    /// <summary>Adds a solid of an assemblage that was an answer nearby: hydrates that hold the activity of water between them come back together.</summary>
    public void Keep(Iterate x, int position)
    {
        if (
            !_isPresent[position]
            && _presentCount < x.Problem.ComponentCount
            && IsIndependent(x, position, water: 1)
        )
        {
            Add(position);
        }
    }

    // Two hydrates of one salt depend on each other at a given activity of water. Where the second has only just become possible, or each drives the other out,
    // they set that activity between them and stay both.
    private bool TryAddHydrate(Iterate x, int position)
    {
        if (
            (position != _lastLeft && x.LnSaturation(position) > JustPossible)
            || _presentCount >= x.Problem.ComponentCount
            || !IsIndependent(x, position, water: 1)
        )
        {
            return false;
        }

        Add(position);
        return true;
    }

    private void Add(int position)
    {
        _isPresent[position] = true;
        _present[_presentCount++] = position;
    }

    /// <summary>Finishes; false when Newton's method or the exchange of solids does not settle.</summary>
    public bool Finish(Iterate x, ref int iterations)
    {
        var problem = x.Problem;
        var rounds = (3 * problem.SolidCount) + 10;
        _lastLeft = -1;
        for (var round = 0; round < rounds; round++)
        {
            for (var s = 0; s < problem.SolidCount; s++)
            {
                if (!_isPresent[s])
                {
                    x.SolidAmounts[s] = 0;
                }
            }

            if (!Newton(x, ref iterations))
            {
                return false;
            }

            var negative = MostNegative(x);
            if (negative >= 0)
            {
                Remove(negative);
                continue;
            }

            for (var k = 0; k < _presentCount; k++)
            {
                x.SolidAmounts[_present[k]] = Math.Max(x.SolidAmounts[_present[k]], 0);
            }

            var missing = MostSupersaturated(x);
            if (missing < 0)
            {
                return true;
            }

            if (!TryAdd(x, missing) && !TryAddHydrate(x, missing) && !Exchange(x, missing))
            {
                return false;
            }
        }

        return false;
    }

    /// <summary>Factorises the equations at a converged point, for <see cref="Respond"/>; false when they are singular.</summary>
    public bool FactorAt(Iterate x)
    {
        x.ComputeMoles();
        x.ComputeMoments(x.Moments);
        x.EvaluateActivity();
        x.ComputeMoles();
        x.ComputeMoments(_moments);
        Assemble(x);
        return Lu.Factor(
            _matrix,
            x.Problem.ComponentCount + 1 + x.Moments.Length + _presentCount,
            _stride,
            _pivots,
            _rowScale
        );
    }

    /// <summary>
    /// Linear response of the point to shifts of totals (by component of the system), total water, ln K of species and of solids (by index of the system).
    /// <paramref name="lnGammas"/> and <paramref name="lnWaterActivity"/> are shifts of the activity model that the caller has already put into ln K;
    /// they are added to what the result reports of γ and a_w.
    /// </summary>
    public void Respond(
        Iterate x,
        ReadOnlySpan<double> totals,
        double water,
        ReadOnlySpan<double> lnK,
        ReadOnlySpan<double> solidLnK,
        StateDerivative result,
        ReadOnlySpan<double> lnGammas,
        double lnWaterActivity
    )
    {
        var problem = x.Problem;
        var n = problem.ComponentCount;
        var p = x.Moments.Length;
        var size = n + 1 + p + _presentCount;
        Array.Clear(_rhs, 0, size);
        for (var c = 0; c < n; c++)
        {
            _rhs[c] = totals[problem.Components[c]];
        }

        _rhs[n] = water;
        var speciesCount = problem.System.Species.Length;
        var weights = problem.Activity.Weights;
        for (var k = 0; k < problem.SpeciesCount; k++)
        {
            var j = problem.Species[k];
            var shift = lnK[j] * x.Moles[k];
            if (shift == 0)
            {
                continue;
            }

            for (var e = problem.SpeciesStart[k]; e < problem.SpeciesStart[k + 1]; e++)
            {
                _rhs[problem.SpeciesColumn[e]] -= problem.SpeciesValue[e] * shift;
            }

            _rhs[n] -= problem.SpeciesWater[j] * shift;
            for (var q = 0; q < p; q++)
            {
                _rhs[n + 1 + q] += weights[(q * speciesCount) + j] * shift / x.Water;
            }
        }

        for (var k = 0; k < _presentCount; k++)
        {
            _rhs[n + 1 + p + k] = -solidLnK[problem.Solids[_present[k]]];
        }

        Lu.Solve(_matrix, size, _stride, _pivots, _rowScale, _rhs);
        result.LnWater = _rhs[n];
        result.LnWaterActivity =
            lnWaterActivity + Iterate.Dot(x.WaterSlopes, _rhs.AsSpan(n + 1, p));
        for (var c = 0; c < n; c++)
        {
            result.LnActivities[problem.Components[c]] = _rhs[c];
        }

        for (var k = 0; k < problem.SpeciesCount; k++)
        {
            var j = problem.Species[k];
            var gamma = Iterate.Dot(x.GammaSlopes.AsSpan(j * p, p), _rhs.AsSpan(n + 1, p));
            var molality =
                lnK[j]
                + (problem.SpeciesWater[j] * (result.LnWaterActivity - lnWaterActivity))
                - gamma;
            for (var e = problem.SpeciesStart[k]; e < problem.SpeciesStart[k + 1]; e++)
            {
                molality += problem.SpeciesValue[e] * _rhs[problem.SpeciesColumn[e]];
            }

            result.LnMolalities[j] = molality;
            result.LnGammas[j] = gamma + (lnGammas.IsEmpty ? 0 : lnGammas[j]);
        }

        for (var k = 0; k < _presentCount; k++)
        {
            result.SolidAmounts[problem.Solids[_present[k]]] = _rhs[n + 1 + p + k];
        }
    }

    private int MostNegative(Iterate x)
    {
        var worst = -1;
        var least = -1e-13;
        for (var k = 0; k < _presentCount; k++)
        {
            var relative = x.SolidAmounts[_present[k]] / x.SolidScale[_present[k]];
            if (relative < least)
            {
                least = relative;
                worst = k;
            }
        }

        return worst;
    }

    private int MostSupersaturated(Iterate x)
    {
        var worst = -1;
        var most = SaturationTolerance;
        for (var s = 0; s < x.Problem.SolidCount; s++)
        {
            if (_isPresent[s])
            {
                continue;
            }

            var ln = x.LnSaturation(s);
            if (ln > most)
            {
                most = ln;
                worst = s;
            }
        }

        return worst;
    }

    private void Remove(int index)
    {
        _isPresent[_present[index]] = false;
        for (var k = index; k + 1 < _presentCount; k++)
        {
            _present[k] = _present[k + 1];
        }

        _presentCount--;
    }

    // The entering solid is a combination of those present: it takes the place of the one that its growth uses up first.
    private bool Exchange(Iterate x, int entering)
    {
        var problem = x.Problem;
        var n = problem.ComponentCount;
        Span<double> normal = _matrix.AsSpan(0, _presentCount * _presentCount);
        Span<double> share = _rhs.AsSpan(0, _presentCount);
        var row = problem.SolidRows.AsSpan(entering * n, n);
        for (var a = 0; a < _presentCount; a++)
        {
            var ra = problem.SolidRows.AsSpan(_present[a] * n, n);
            share[a] = Iterate.Dot(ra, row);
            for (var b = 0; b < _presentCount; b++)
            {
                normal[(a * _presentCount) + b] = Iterate.Dot(
                    ra,
                    problem.SolidRows.AsSpan(_present[b] * n, n)
                );
            }
        }

        if (!Lu.Factor(normal, _presentCount, _presentCount, _pivots, _rowScale))
        {
            return false;
        }

        Lu.Solve(normal, _presentCount, _presentCount, _pivots, _rowScale, share);
        var leaving = -1;
        var least = double.PositiveInfinity;
        for (var a = 0; a < _presentCount; a++)
        {
            if (share[a] > 1e-9 && x.SolidAmounts[_present[a]] / share[a] < least)
            {
                least = x.SolidAmounts[_present[a]] / share[a];
                leaving = a;
            }
        }

        if (leaving < 0)
        {
            return false;
        }

        // The matter changes hands, so that only the water of the reaction is left for Newton's method to settle.
        for (var a = 0; a < _presentCount; a++)
        {
            x.SolidAmounts[_present[a]] -= least * share[a];
        }

        x.SolidAmounts[entering] = least;
        _lastLeft = _present[leaving];
        x.SolidAmounts[_lastLeft] = 0;
        Remove(leaving);
        return TryAdd(x, entering);
    }

    // Modified Gram-Schmidt over the reactions present; their water counts with the given weight.
    private bool IsIndependent(Iterate x, int position, double water)
    {
        var problem = x.Problem;
        var n = problem.ComponentCount;
        var width = n + 1;
        var count = 0;
        for (var k = 0; k <= _presentCount; k++)
        {
            var source = k < _presentCount ? _present[k] : position;
            if (count >= n)
            {
                return false;
            }

            var target = _basis.AsSpan(count * width, width);
            problem.SolidRows.AsSpan(source * n, n).CopyTo(target);
            target[n] = water * problem.SolidWater[problem.Solids[source]];
            var before = Math.Sqrt(Iterate.Dot(target, target));
            for (var b = 0; b < count; b++)
            {
                var other = _basis.AsSpan(b * width, width);
                var projection = Iterate.Dot(target, other);
                for (var c = 0; c < width; c++)
                {
                    target[c] -= projection * other[c];
                }
            }

            var norm = Math.Sqrt(Iterate.Dot(target, target));
            if (norm <= 1e-9 * before || before == 0)
            {
                if (k == _presentCount)
                {
                    return false;
                }

                continue;
            }

            for (var c = 0; c < width; c++)
            {
                target[c] /= norm;
            }

            count++;
        }

        return true;
    }

    private bool Newton(Iterate x, ref int iterations)
    {
        var problem = x.Problem;
        var n = problem.ComponentCount;
        var p = x.Moments.Length;
        x.ComputeMoles();
        x.ComputeMoments(x.Moments);
        x.EvaluateActivity();
        for (var step = 0; step < MaxNewton; step++)
        {
            x.ComputeMoles();
            x.ComputeMoments(_moments);
            Assemble(x);
            var converged = Converged(x);
            if (!Lu.Factor(_matrix, n + 1 + p + _presentCount, _stride, _pivots, _rowScale))
            {
                return false;
            }

            iterations++;
            Lu.Solve(_matrix, n + 1 + p + _presentCount, _stride, _pivots, _rowScale, _rhs);
            var full = Apply(x);

            // One more step after the residuals are met: quadratic convergence makes the answer as good as a double can hold.
            if (converged && full)
            {
                x.ComputeMoles();
                return true;
            }

            if (x.LnWater < -40)
            {
                return false;
            }
        }

        return false;
    }

    // Unknowns: dy (n), d ln water (1), dq (p), changes of the amounts of the solids present. Changes, not new amounts: each step then refines the one before,
    // where new amounts would carry the round-off of the largest into the balance of the scarcest component.
    private void Assemble(Iterate x)
    {
        var problem = x.Problem;
        var n = problem.ComponentCount;
        var p = x.Moments.Length;
        var size = n + 1 + p + _presentCount;
        for (var i = 0; i < size; i++)
        {
            Array.Clear(_matrix, i * _stride, size);
        }

        var speciesCount = problem.System.Species.Length;
        var weights = problem.Activity.Weights;
        var perKilogram = 1 / x.Water;
        for (var c = 0; c < n; c++)
        {
            _rhs[c] = -x.Balance[c];
        }

        var waterRow = n * _stride;
        var kilograms = x.Water;
        _matrix[waterRow + n] = kilograms / PhysicalConstants.WaterMolarMass;
        _rhs[n] = problem.TotalWater - (kilograms / PhysicalConstants.WaterMolarMass);
        for (var q = 0; q < p; q++)
        {
            _rhs[n + 1 + q] = _moments[q] - x.Moments[q];
            _matrix[((n + 1 + q) * _stride) + n + 1 + q] = 1;
        }

        for (var k = 0; k < problem.SpeciesCount; k++)
        {
            var j = problem.Species[k];
            var moles = x.Moles[k];
            var bound = problem.SpeciesWater[j];
            for (var q = 0; q < p; q++)
            {
                // d ln m / dq at fixed y
                _momentSlopes[q] = (bound * x.WaterSlopes[q]) - x.GammaSlopes[(j * p) + q];
            }

            for (var e = problem.SpeciesStart[k]; e < problem.SpeciesStart[k + 1]; e++)
            {
                AddSpecies(
                    problem,
                    problem.SpeciesColumn[e] * _stride,
                    moles * problem.SpeciesValue[e],
                    k,
                    n,
                    p,
                    1
                );
            }

            if (bound != 0)
            {
                _rhs[n] -= bound * moles;
                AddSpecies(problem, waterRow, moles * bound, k, n, p, 1);
            }

            for (var q = 0; q < p; q++)
            {
                var weight = weights[(q * speciesCount) + j];
                if (weight != 0)
                {
                    AddSpecies(
                        problem,
                        (n + 1 + q) * _stride,
                        -weight * moles * perKilogram,
                        k,
                        n,
                        p,
                        0
                    );
                }
            }
        }

        AssembleSolids(x, n, p, waterRow);
    }

    private void AddSpecies(
        ReducedProblem problem,
        int row,
        double weight,
        int species,
        int n,
        int p,
        double waterShare
    )
    {
        for (var f = problem.SpeciesStart[species]; f < problem.SpeciesStart[species + 1]; f++)
        {
            _matrix[row + problem.SpeciesColumn[f]] += weight * problem.SpeciesValue[f];
        }

        _matrix[row + n] += weight * waterShare;
        for (var q = 0; q < p; q++)
        {
            _matrix[row + n + 1 + q] += weight * _momentSlopes[q];
        }
    }

    private void AssembleSolids(Iterate x, int n, int p, int waterRow)
    {
        var problem = x.Problem;
        for (var k = 0; k < _presentCount; k++)
        {
            var position = _present[k];
            var solid = problem.Solids[position];
            var column = n + 1 + p + k;
            var row = column * _stride;
            for (var c = 0; c < n; c++)
            {
                var v = problem.SolidRows[(position * n) + c];
                _matrix[(c * _stride) + column] = v;
                _matrix[row + c] = v;
                _rhs[c] -= v * x.SolidAmounts[position];
            }

            _matrix[waterRow + column] = problem.SolidWater[solid];
            _rhs[n] -= problem.SolidWater[solid] * x.SolidAmounts[position];
            for (var q = 0; q < p; q++)
            {
                _matrix[row + n + 1 + q] = problem.SolidWater[solid] * x.WaterSlopes[q];
            }

            _rhs[column] = -x.LnSaturation(position);
        }
    }

    private bool Converged(Iterate x)
    {
        var problem = x.Problem;
        var n = problem.ComponentCount;
        for (var c = 0; c < n; c++)
        {
            var residual = x.Balance[c];
            var gross = x.Gross[c];
            for (var k = 0; k < _presentCount; k++)
            {
                var amount = problem.SolidRows[(_present[k] * n) + c] * x.SolidAmounts[_present[k]];
                residual += amount;
                gross += Math.Abs(amount);
            }

            if (!(Math.Abs(residual) <= BalanceTolerance * gross))
            {
                return false;
            }
        }

        for (var k = 0; k < _presentCount; k++)
        {
            if (!(Math.Abs(x.LnSaturation(_present[k])) <= SaturationTolerance / 10))
            {
                return false;
            }
        }

        for (var q = 0; q < _moments.Length; q++)
        {
            if (!(Math.Abs(_moments[q] - x.Moments[q]) <= 1e-11 * (Math.Abs(_moments[q]) + 1e-12)))
            {
                return false;
            }
        }

        return Math.Abs(x.WaterFromBalance() - x.Water) <= 1e-12 * x.Water;
    }

    // Damped so that no significant species grows by more than e² at a time; true when the step was taken whole.
    private bool Apply(Iterate x)
    {
        var problem = x.Problem;
        var n = problem.ComponentCount;
        var p = x.Moments.Length;
        var share = 1.0;
        for (var k = 0; k < problem.SpeciesCount; k++)
        {
            var growth = 0.0;
            var room = double.PositiveInfinity;
            for (var e = problem.SpeciesStart[k]; e < problem.SpeciesStart[k + 1]; e++)
            {
                var c = problem.SpeciesColumn[e];
                growth += problem.SpeciesValue[e] * _rhs[c];
                room = Math.Min(room, x.Gross[c] / Math.Abs(problem.SpeciesValue[e]));
            }

            if (growth > 2)
            {
                share = Math.Min(share, (2 + Math.Max(0, Math.Log(room / x.Moles[k]))) / growth);
            }
        }

        share = Math.Min(share, 1 / Math.Max(1, Math.Abs(_rhs[n])));
        for (var c = 0; c < n; c++)
        {
            x.Y[c] += share * _rhs[c];
        }

        x.LnWater += share * _rhs[n];
        for (var q = 0; q < p; q++)
        {
            x.Moments[q] += share * _rhs[n + 1 + q];
        }

        for (var k = 0; k < _presentCount; k++)
        {
            var s = _present[k];
            x.SolidAmounts[s] += share * _rhs[n + 1 + p + k];
        }

        x.EvaluateActivity();
        return share == 1;
    }
}
