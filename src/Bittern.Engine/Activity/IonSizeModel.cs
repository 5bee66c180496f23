using Bittern.Chemistry;

namespace Bittern.Engine.Activity;

/// <summary>
/// Compiled models with a size of their own for each ion: ln γ_j = z_j² F_j(I) + b_j I with F_j = -A √I/(1 + B a_j √I).
/// No function of the molalities has these γ as its derivatives unless all sizes are equal, so no water activity satisfies Gibbs-Duhem in every
/// direction. This one satisfies it exactly along dilution and evaporation (all molalities in proportion), hence exactly for any single salt:
/// ln a_w = -M_w (Σ m_j + Σ m_j z_j² ψ_j(I) + ½ I Σ b_j m_j), ψ_j = (1/I) ∫ I dF_j. What is left in other directions: docs/activity-models.md.
/// Moments: ionic strength, sum of molalities, Σ b m, and Σ m z² for each distinct size.
/// </summary>
internal sealed class IonSizeModel : CompiledActivity
{
    private const int FixedMoments = 3;
    private readonly double _slope;
    private readonly double[] _betas;
    private readonly int[] _sizeOf;
    private readonly double[] _squares;
    private readonly double[] _linears;
    private readonly double[] _weights;

    /// <summary>Compiles the model.</summary>
    /// <param name="system">The species.</param>
    /// <param name="slope">A ln 10, kg^½ mol^-½.</param>
    /// <param name="parameters">B a (kg^½ mol^-½) and b ln 10 (kg/mol) by index of the species.</param>
    public IonSizeModel(
        EquilibriumSystem system,
        double slope,
        Func<int, (double Beta, double Linear)> parameters
    )
    {
        var count = system.Species.Length;
        _slope = slope;
        _sizeOf = new int[count];
        _squares = new double[count];
        _linears = new double[count];
        var betas = new List<double>();
        for (var j = 0; j < count; j++)
        {
            var (beta, linear) = parameters(j);
            var charge = system.SpeciesCharges[j];
            _squares[j] = (double)charge * charge;
            _linears[j] = linear;
            _sizeOf[j] = charge == 0 ? -1 : betas.IndexOf(beta);
            if (charge != 0 && _sizeOf[j] < 0)
            {
                _sizeOf[j] = betas.Count;
                betas.Add(beta);
            }
        }

        _betas = [.. betas];
        MomentCount = FixedMoments + betas.Count;
        _weights = new double[MomentCount * count];
        for (var j = 0; j < count; j++)
        {
            _weights[j] = _squares[j] / 2;
            _weights[count + j] = 1;
            _weights[(2 * count) + j] = _linears[j];
            if (_sizeOf[j] >= 0)
            {
                _weights[((FixedMoments + _sizeOf[j]) * count) + j] = _squares[j];
            }
        }
    }

    public override int MomentCount { get; }

    public override ReadOnlySpan<double> Weights => _weights;

    public override void Evaluate(
        ReadOnlySpan<double> moments,
        Span<double> lnGamma,
        out double lnWaterActivity,
        Span<double> gammaSlopes,
        Span<double> waterSlopes
    )
    {
        const double Mw = PhysicalConstants.WaterMolarMass;
        var count = MomentCount;
        var ionicStrength = Math.Max(moments[0], LongRange.LeastIonicStrength);
        var root = Math.Sqrt(ionicStrength);
        Span<double> value = stackalloc double[_betas.Length];
        Span<double> slope = stackalloc double[_betas.Length];
        var osmotic = moments[1] + (ionicStrength * moments[2] / 2);
        var osmoticSlope = moments[2] / 2;
        waterSlopes[1] = -Mw;
        waterSlopes[2] = -Mw * ionicStrength / 2;
        for (var c = 0; c < _betas.Length; c++)
        {
            value[c] = -_slope * LongRange.Value(root, _betas[c]);
            slope[c] = -_slope * LongRange.Slope(root, _betas[c]);
            var psi = -_slope * LongRange.Integral(root, _betas[c]) / ionicStrength;
            osmotic += moments[FixedMoments + c] * psi;
            osmoticSlope += moments[FixedMoments + c] * (slope[c] - (psi / ionicStrength));
            waterSlopes[FixedMoments + c] = -Mw * psi;
        }

        waterSlopes[0] = -Mw * osmoticSlope;
        lnWaterActivity = -Mw * osmotic;
        gammaSlopes[..(_squares.Length * count)].Clear();
        for (var j = 0; j < _squares.Length; j++)
        {
            var size = _sizeOf[j];
            lnGamma[j] = _linears[j] * ionicStrength;
            gammaSlopes[j * count] = _linears[j];
            if (size >= 0)
            {
                lnGamma[j] += _squares[j] * value[size];
                gammaSlopes[j * count] += _squares[j] * slope[size];
            }
        }
    }
}
