namespace Bittern.Engine.Activity;

/// <summary>
/// Base of the models whose coefficients depend on charge and ionic strength alone: ln γ = z² F(I), uncharged species γ = 1.
/// Water follows from Gibbs-Duhem: ln a_w = -M_w (Σm + G(I)) with dG = 2 I dF.
/// Moments: ionic strength, sum of molalities.
/// </summary>
public abstract class ChargeModel : CompiledActivity
{
    private readonly double[] _weights;
    private readonly double[] _squares;

    protected ChargeModel(EquilibriumSystem system)
    {
        var count = system.Species.Length;
        _weights = new double[2 * count];
        _squares = new double[count];
        for (var j = 0; j < count; j++)
        {
            _squares[j] = (double)system.SpeciesCharges[j] * system.SpeciesCharges[j];
            _weights[j] = _squares[j] / 2;
            _weights[count + j] = 1;
        }
    }

    public sealed override int MomentCount => 2;

    public sealed override ReadOnlySpan<double> Weights => _weights;

    /// <summary>F(I), its derivative, and G(I) = ∫ 2 I dF from 0.</summary>
    protected abstract (double F, double Slope, double G) At(double ionicStrength);

    public sealed override void Evaluate(
        ReadOnlySpan<double> moments,
        Span<double> lnGamma,
        out double lnWaterActivity,
        Span<double> gammaSlopes,
        Span<double> waterSlopes
    )
    {
        var ionicStrength = Math.Max(moments[0], 0);
        var (f, slope, g) = At(ionicStrength);
        for (var j = 0; j < _squares.Length; j++)
        {
            lnGamma[j] = _squares[j] * f;
            gammaSlopes[2 * j] = _squares[j] * slope;
            gammaSlopes[(2 * j) + 1] = 0;
        }

        const double Mw = Chemistry.PhysicalConstants.WaterMolarMass;
        lnWaterActivity = -Mw * (moments[1] + g);
        waterSlopes[0] = -Mw * 2 * ionicStrength * slope;
        waterSlopes[1] = -Mw;
    }
}
