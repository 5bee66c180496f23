using System.Collections.Immutable;

namespace Bittern.Engine.Activity;

/// <summary>A model of activity coefficients, before it knows the species and the temperature. Immutable.</summary>
public interface IActivityModel
{
    /// <summary>Name as recipes write it.</summary>
    string Name { get; }

    /// <summary>Ionic strength (mol/kg) up to which its authors or common practice trust it.</summary>
    double TrustedIonicStrength { get; }

    /// <summary>Temperatures (K) in which the model with these parameters may be trusted; 0 to 100 °C unless a model says otherwise.</summary>
    (double From, double To) TrustedKelvin => (273.15, 373.15);

    /// <summary>What the model does with uncharged species, in half a sentence.</summary>
    string UnchargedTreatment { get; }

    /// <summary>
    /// Names of charged species of a system for which the model has no parameter of their own, so that a general rule stands in (docs/activity-models.md says which).
    /// Empty for models without parameters by species.
    /// </summary>
    ImmutableArray<string> MissingFor(EquilibriumSystem system) => [];

    /// <summary>The model for one list of species at one temperature.</summary>
    CompiledActivity Compile(EquilibriumSystem system, double kelvin);
}

/// <summary>
/// An activity model for one list of species. It sees the solution through a few linear moments q = W m of the molalities
/// (ionic strength, sum of molalities, single molalities), so that Newton's method needs derivatives in q only.
/// </summary>
public abstract class CompiledActivity
{
    /// <summary>Number of moments.</summary>
    public abstract int MomentCount { get; }

    /// <summary>Weights W, one row of species a moment: <c>W[p * speciesCount + j]</c>.</summary>
    public abstract ReadOnlySpan<double> Weights { get; }

    /// <summary>
    /// Evaluates the model. Allocates nothing.
    /// </summary>
    /// <param name="moments">q, length <see cref="MomentCount"/>, mol/kg.</param>
    /// <param name="lnGamma">ln γ of every species, out.</param>
    /// <param name="lnWaterActivity">ln a_w, out; it belongs to the γ by Gibbs-Duhem (docs/activity-models.md says how closely).</param>
    /// <param name="gammaSlopes">∂ln γ_j/∂q_p at <c>[j * MomentCount + p]</c>, out.</param>
    /// <param name="waterSlopes">∂ln a_w/∂q_p, out.</param>
    public abstract void Evaluate(
        ReadOnlySpan<double> moments,
        Span<double> lnGamma,
        out double lnWaterActivity,
        Span<double> gammaSlopes,
        Span<double> waterSlopes
    );
}
