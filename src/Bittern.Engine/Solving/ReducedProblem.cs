using Bittern.Chemistry;
using Bittern.Engine.Activity;

namespace Bittern.Engine.Solving;

/// <summary>
/// A problem with every fixed activity eliminated: a fixed gas or a fixed component takes the place of one component of the basis, so that
/// the solver proper knows totals and solids only. The change of basis is exact (a row operation on the stoichiometry), the amount exchanged
/// with the outside is the multiplier of the eliminated balance. Components whose total is zero leave, with their species and solids.
/// Buffers are reused from solve to solve.
/// </summary>
internal sealed class ReducedProblem
{
    private readonly EquilibriumSystem _system;
    private readonly double[] _speciesCoefficients;
    private readonly double[] _solidCoefficients;
    private readonly double[] _baseSpeciesLnK;
    private readonly double[] _baseSolidLnK;
    private readonly double[] _baseGasLnK;
    private readonly double[] _fixedRow;
    private readonly bool[] _componentLeft;
    private readonly bool[] _speciesLeft;
    private double _kelvin = double.NaN;

    public ReducedProblem(EquilibriumSystem system)
    {
        _system = system;
        var n = system.Components.Length;
        var m = system.Species.Length;
        var s = system.Solids.Length;
        _speciesCoefficients = new double[m * n];
        _solidCoefficients = new double[s * n];
        _baseSpeciesLnK = new double[m];
        _baseSolidLnK = new double[s];
        _baseGasLnK = new double[system.Gases.Length];
        _fixedRow = new double[n];
        _componentLeft = new bool[n];
        _speciesLeft = new bool[m];
        Totals = new double[n];
        SpeciesLnK = new double[m];
        SpeciesWater = new double[m];
        SolidLnK = new double[s];
        SolidWater = new double[s];
        Components = new int[n];
        Species = new int[m];
        Solids = new int[s];
        PivotOf = new int[n];
        PivotGas = new int[n];
        PivotLnActivity = new double[n];
        PivotRows = new double[n * n];
        PivotWater = new double[n];
        OneSigned = new int[n];
        SpeciesStart = new int[m + 1];
        SpeciesColumn = new int[m * n];
        SpeciesValue = new double[m * n];
        SolidRows = new double[s * n];
        Activity = system.ActivityModel.Compile(system, PhysicalConstants.ReferenceKelvin);
    }

    /// <summary>The activity model at this problem's temperature.</summary>
    public CompiledActivity Activity { get; private set; }

    public EquilibriumSystem System => _system;

    /// <summary>Indices into the system's components that remain, <see cref="ComponentCount"/> of them.</summary>
    public int[] Components { get; }

    public int ComponentCount { get; private set; }

    /// <summary>Indices of the dissolved species that take part, <see cref="SpeciesCount"/> of them.</summary>
    public int[] Species { get; }

    public int SpeciesCount { get; private set; }

    /// <summary>Indices of the solids that may form and whose components are there, <see cref="SolidCount"/> of them.</summary>
    public int[] Solids { get; }

    public int SolidCount { get; private set; }

    /// <summary>Reduced totals, mol, by position in <see cref="Components"/>.</summary>
    public double[] Totals { get; }

    /// <summary>Reduced total water, mol; <see cref="Evaporation"/> changes it on its way.</summary>
    public double TotalWater { get; set; }

    /// <summary>+1 or -1 when all coefficients of a component (by position) have that sign; 0 when mixed.</summary>
    public int[] OneSigned { get; }

    /// <summary>ln K and water coefficient by species index of the system.</summary>
    public double[] SpeciesLnK { get; }

    public double[] SpeciesWater { get; }

    /// <summary>ln K and water coefficient by solid index of the system.</summary>
    public double[] SolidLnK { get; }

    public double[] SolidWater { get; }

    /// <summary>Sparse rows of the species in <see cref="Species"/> order: columns are positions in <see cref="Components"/>.</summary>
    public int[] SpeciesStart { get; }

    public int[] SpeciesColumn { get; }

    public double[] SpeciesValue { get; }

    /// <summary>Dense rows of the solids in <see cref="Solids"/> order, <see cref="ComponentCount"/> numbers a row.</summary>
    public double[] SolidRows { get; }

    /// <summary>Eliminated components in order of elimination: index, gas that replaced it (-1: fixed itself), ln activity, and the row used.</summary>
    public int PivotCount { get; private set; }

    public int[] PivotOf { get; }

    public int[] PivotGas { get; }

    public double[] PivotLnActivity { get; }

    public double[] PivotRows { get; }

    public double[] PivotWater { get; }

    /// <summary>Sets the problem up. <see cref="SolveStatus.Solved"/> when there is something to solve, else why there is no answer.</summary>
    public SolveStatus Build(Problem problem, out string? obstacle)
    {
        obstacle = null;
        SetTemperature(problem.Kelvin);
        LoadFull(problem);
        var status = EliminateFixed(problem, ref obstacle);
        return status == SolveStatus.Solved ? Compact(problem, ref obstacle) : status;
    }

    private void SetTemperature(double kelvin)
    {
        if (kelvin == _kelvin)
        {
            return;
        }

        _kelvin = kelvin;
        var ln10 = Math.Log(10);
        for (var j = 0; j < _baseSpeciesLnK.Length; j++)
        {
            _baseSpeciesLnK[j] = ln10 * _system.Species[j].Log10K(kelvin);
        }

        for (var s = 0; s < _baseSolidLnK.Length; s++)
        {
            _baseSolidLnK[s] = ln10 * _system.Solids[s].Log10K(kelvin);
        }

        for (var g = 0; g < _baseGasLnK.Length; g++)
        {
            _baseGasLnK[g] = ln10 * _system.Gases[g].Log10K(kelvin);
        }

        Activity = _system.ActivityModel.Compile(_system, kelvin);
    }

    private void LoadFull(Problem problem)
    {
        var n = _system.Components.Length;
        for (var j = 0; j < _system.Species.Length; j++)
        {
            _system.Species[j].Coefficients.AsSpan().CopyTo(_speciesCoefficients.AsSpan(j * n, n));
            SpeciesLnK[j] = _baseSpeciesLnK[j];
            SpeciesWater[j] = _system.Species[j].Water;
        }

        for (var s = 0; s < _system.Solids.Length; s++)
        {
            _system.Solids[s].Coefficients.AsSpan().CopyTo(_solidCoefficients.AsSpan(s * n, n));
            SolidLnK[s] = _baseSolidLnK[s];
            SolidWater[s] = _system.Solids[s].Water;
        }

        problem.Totals.CopyTo(Totals, 0);
        TotalWater = problem.TotalWater;
        Array.Clear(_componentLeft);
        Array.Clear(_speciesLeft);
        PivotCount = 0;
    }

    private SolveStatus EliminateFixed(Problem problem, ref string? obstacle)
    {
        var n = _system.Components.Length;
        var ln10 = Math.Log(10);
        for (var i = 0; i < n; i++)
        {
            if (double.IsNaN(problem.FixedLog10Activities[i]))
            {
                continue;
            }

            Array.Clear(_fixedRow);
            _fixedRow[i] = 1;
            if (!Eliminate(ln10 * problem.FixedLog10Activities[i], 0, -1, i))
            {
                obstacle = _system.Components[i].Name;
                return SolveStatus.ConflictingFixedActivities;
            }
        }

        for (var g = 0; g < _system.Gases.Length; g++)
        {
            if (double.IsNaN(problem.FixedGasPressures[g]))
            {
                continue;
            }

            _system.Gases[g].Coefficients.AsSpan().CopyTo(_fixedRow);
            if (
                problem.FixedGasPressures[g] <= 0
                || !Eliminate(
                    Math.Log(problem.FixedGasPressures[g]) - _baseGasLnK[g],
                    _system.Gases[g].Water,
                    g,
                    -1
                )
            )
            {
                obstacle = _system.Gases[g].Name;
                return SolveStatus.ConflictingFixedActivities;
            }
        }

        return SolveStatus.Solved;
    }

    // Makes Σ row_i ln a_i + water ln a_w = lnActivity hold by expressing one component through the others.
    private bool Eliminate(double lnActivity, double water, int gas, int wantedPivot)
    {
        var n = _system.Components.Length;
        for (var p = 0; p < PivotCount; p++)
        {
            var done = PivotOf[p];
            var factor = _fixedRow[done];
            if (factor == 0)
            {
                continue;
            }

            // ln a_done = PivotLnActivity - Σ PivotRows_k ln a_k - PivotWater ln a_w, already solved for the pivot.
            lnActivity -= factor * PivotLnActivity[p];
            water -= factor * PivotWater[p];
            for (var k = 0; k < n; k++)
            {
                _fixedRow[k] -= factor * PivotRows[(p * n) + k];
            }

            _fixedRow[done] = 0;
        }

        var pivot =
            wantedPivot >= 0 && Math.Abs(_fixedRow[wantedPivot]) > 1e-12
                ? wantedPivot
                : ChoosePivot();
        if (pivot < 0)
        {
            return false;
        }

        var scale = 1 / _fixedRow[pivot];
        var row = PivotRows.AsSpan(PivotCount * n, n);
        for (var k = 0; k < n; k++)
        {
            row[k] = k == pivot ? 0 : _fixedRow[k] * scale;
        }

        PivotOf[PivotCount] = pivot;
        PivotGas[PivotCount] = gas;
        PivotLnActivity[PivotCount] = lnActivity * scale;
        PivotWater[PivotCount] = water * scale;
        _componentLeft[pivot] = true;

        // Earlier pivots may have used this component.
        for (var p = 0; p < PivotCount; p++)
        {
            Substitute(
                PivotRows.AsSpan(p * n, n),
                pivot,
                row,
                lnActivity * scale,
                water * scale,
                ref PivotLnActivity[p],
                ref PivotWater[p],
                -1
            );
        }

        for (var j = 0; j < _system.Species.Length; j++)
        {
            Substitute(
                _speciesCoefficients.AsSpan(j * n, n),
                pivot,
                row,
                lnActivity * scale,
                water * scale,
                ref SpeciesLnK[j],
                ref SpeciesWater[j],
                1
            );
        }

        for (var s = 0; s < _system.Solids.Length; s++)
        {
            Substitute(
                _solidCoefficients.AsSpan(s * n, n),
                pivot,
                row,
                lnActivity * scale,
                water * scale,
                ref SolidLnK[s],
                ref SolidWater[s],
                1
            );
        }

        var total = Totals[pivot];
        for (var k = 0; k < n; k++)
        {
            Totals[k] -= total * row[k];
        }

        TotalWater -= total * water * scale;
        PivotCount++;
        return true;
    }

    // x = Σ c_k ln a_k + c_w ln a_w + constant, with ln a_pivot = lnActivity - Σ row ln a - water ln a_w put in. Pivot rows carry the opposite sign of c.
    private static void Substitute(
        Span<double> coefficients,
        int pivot,
        ReadOnlySpan<double> row,
        double lnActivity,
        double water,
        ref double constant,
        ref double waterCoefficient,
        double sign
    )
    {
        var c = coefficients[pivot];
        if (c == 0)
        {
            return;
        }

        constant += sign * c * lnActivity;
        waterCoefficient -= c * water;
        for (var k = 0; k < coefficients.Length; k++)
        {
            coefficients[k] -= c * row[k];
            if (Math.Abs(coefficients[k]) < 1e-12)
            {
                coefficients[k] = 0;
            }
        }

        coefficients[pivot] = 0;
    }

    // A component that only ever counts upwards is the natural one to hand over to the gas; among those, the one with the least total.
    private int ChoosePivot()
    {
        var n = _system.Components.Length;
        var best = -1;
        var bestKey = double.PositiveInfinity;
        for (var i = 0; i < n; i++)
        {
            if (Math.Abs(_fixedRow[i]) < 1e-12)
            {
                continue;
            }

            var key = Math.Abs(Totals[i]) + (SignOf(i) == 0 ? 1e6 : 0);
            if (key < bestKey)
            {
                bestKey = key;
                best = i;
            }
        }

        return best;
    }

    private int SignOf(int component)
    {
        var n = _system.Components.Length;
        var positive = false;
        var negative = false;
        for (var j = 0; j < _system.Species.Length; j++)
        {
            if (!_speciesLeft[j])
            {
                positive |= _speciesCoefficients[(j * n) + component] > 0;
                negative |= _speciesCoefficients[(j * n) + component] < 0;
            }
        }

        return (positive, negative) switch
        {
            (true, false) => 1,
            (false, true) => -1,
            _ => 0,
        };
    }

    private SolveStatus Compact(Problem problem, ref string? obstacle)
    {
        var n = _system.Components.Length;
        var changed = true;
        while (changed)
        {
            changed = false;
            for (var i = 0; i < n; i++)
            {
                if (_componentLeft[i])
                {
                    continue;
                }

                var sign = SignOf(i);
                if (sign != 0 && Totals[i] * sign < 0)
                {
                    obstacle = _system.Components[i].Name;
                    return SolveStatus.NegativeTotal;
                }

                // A component in no species at all (every one has left) cannot hold a total.
                var absent = sign == 0 && !Occurs(i);
                if ((sign != 0 && Totals[i] == 0) || absent)
                {
                    _componentLeft[i] = true;
                    changed = true;
                    for (var j = 0; j < _system.Species.Length; j++)
                    {
                        _speciesLeft[j] |= _speciesCoefficients[(j * n) + i] != 0;
                    }
                }
            }
        }

        ComponentCount = 0;
        for (var i = 0; i < n; i++)
        {
            if (!_componentLeft[i])
            {
                Components[ComponentCount] = i;
                OneSigned[ComponentCount] = SignOf(i);
                Totals[ComponentCount] = Totals[i];
                ComponentCount++;
            }
        }

        CompactSpecies();
        SolidCount = 0;
        for (var s = 0; s < _system.Solids.Length; s++)
        {
            if (!problem.AllowedSolids[s] || !HasAllComponents(_solidCoefficients.AsSpan(s * n, n)))
            {
                continue;
            }

            for (var c = 0; c < ComponentCount; c++)
            {
                SolidRows[(SolidCount * ComponentCount) + c] = _solidCoefficients[
                    (s * n) + Components[c]
                ];
            }

            Solids[SolidCount++] = s;
        }

        if (TotalWater <= 0)
        {
            obstacle = "H2O";
            return SolveStatus.Dry;
        }

        return SolveStatus.Solved;
    }

    private bool Occurs(int component)
    {
        var n = _system.Components.Length;
        for (var j = 0; j < _system.Species.Length; j++)
        {
            if (!_speciesLeft[j] && _speciesCoefficients[(j * n) + component] != 0)
            {
                return true;
            }
        }

        return false;
    }

    private void CompactSpecies()
    {
        var n = _system.Components.Length;
        SpeciesCount = 0;
        var entries = 0;
        for (var j = 0; j < _system.Species.Length; j++)
        {
            if (_speciesLeft[j])
            {
                continue;
            }

            SpeciesStart[SpeciesCount] = entries;
            Species[SpeciesCount++] = j;
            for (var c = 0; c < ComponentCount; c++)
            {
                var value = _speciesCoefficients[(j * n) + Components[c]];
                if (value != 0)
                {
                    SpeciesColumn[entries] = c;
                    SpeciesValue[entries++] = value;
                }
            }
        }

        SpeciesStart[SpeciesCount] = entries;
    }

    // A component that left because its total is zero forbids the solid; one that was eliminated is at a fixed activity and has no column any more.
    private bool HasAllComponents(ReadOnlySpan<double> coefficients)
    {
        for (var i = 0; i < coefficients.Length; i++)
        {
            if (coefficients[i] != 0 && _componentLeft[i])
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>ln Ω of any solid of the system at the given ln activities of the remaining components; negative infinity when a component is absent.</summary>
    public double LnSaturation(int solid, ReadOnlySpan<double> lnActivities, double lnWaterActivity)
    {
        var n = _system.Components.Length;
        var row = _solidCoefficients.AsSpan(solid * n, n);
        if (!HasAllComponents(row))
        {
            return double.NegativeInfinity;
        }

        var sum = SolidLnK[solid] + (SolidWater[solid] * lnWaterActivity);
        for (var c = 0; c < ComponentCount; c++)
        {
            sum += row[Components[c]] * lnActivities[c];
        }

        return sum;
    }

    /// <summary>
    /// How the constants of all pivots' expressions move when the ln activity of one fixed gas or component moves by <paramref name="shift"/>.
    /// False when that one is not fixed.
    /// </summary>
    public bool PivotShift(int gas, int component, double shift, Span<double> pivotShift)
    {
        const int Most = 32;
        if (PivotCount > Most)
        {
            throw new InvalidOperationException(
                $"at most {Most} activities can be fixed at a time"
            );
        }

        Span<double> matrix = stackalloc double[Most * Most];
        Span<double> scale = stackalloc double[Most];
        Span<int> pivots = stackalloc int[Most];
        var found = false;
        for (var p = 0; p < PivotCount; p++)
        {
            var isThis = gas >= 0 ? PivotGas[p] == gas : PivotGas[p] < 0 && PivotOf[p] == component;
            found |= isThis;
            pivotShift[p] = isThis ? shift : 0;
            for (var q = 0; q < PivotCount; q++)
            {
                matrix[(p * Most) + q] =
                    PivotGas[p] >= 0 ? _system.Gases[PivotGas[p]].Coefficients[PivotOf[q]]
                    : PivotOf[p] == PivotOf[q] ? 1
                    : 0;
            }
        }

        if (!found || !Numerics.Lu.Factor(matrix, PivotCount, Most, pivots, scale))
        {
            return false;
        }

        Numerics.Lu.Solve(matrix, PivotCount, Most, pivots, scale, pivotShift);
        return true;
    }
}
