using Bittern.Chemistry;

namespace Bittern.Engine.Activity;

/// <summary>
/// Compiled models that derive everything from one excess Gibbs energy per kilogram of water, G^ex/(w R T) = g(q) over the molalities q of the groups:
/// ln γ_j = ∂g/∂q_group(j), ln a_w = -M_w (Σq + q·∇g - g). Gibbs-Duhem then holds in every direction, exactly.
/// </summary>
internal abstract class GroupedModel(MomentGroups groups) : CompiledActivity
{
    public sealed override int MomentCount => Groups.Count;

    public sealed override ReadOnlySpan<double> Weights => Groups.Weights;

    protected MomentGroups Groups { get; } = groups;

    /// <summary>
    /// Gradient of g, its Hessian with the row of group p starting at <c>FirstOf[p] * Count</c> of <paramref name="hessian"/>, and q·∇g - g. Both arrays
    /// arrive with arbitrary contents.
    /// </summary>
    protected abstract double Derive(
        ReadOnlySpan<double> q,
        Span<double> gradient,
        Span<double> hessian
    );

    public sealed override void Evaluate(
        ReadOnlySpan<double> moments,
        Span<double> lnGamma,
        out double lnWaterActivity,
        Span<double> gammaSlopes,
        Span<double> waterSlopes
    )
    {
        const double Mw = PhysicalConstants.WaterMolarMass;
        var count = Groups.Count;
        var firsts = Groups.FirstOf;
        Span<double> gradient = stackalloc double[count];
        var osmotic = Derive(moments, gradient, gammaSlopes);
        for (var p = 0; p < count; p++)
        {
            osmotic += moments[p];
            waterSlopes[p] = 1;
        }

        lnWaterActivity = -Mw * osmotic;
        for (var p = 0; p < count; p++)
        {
            var row = gammaSlopes.Slice(firsts[p] * count, count);
            for (var r = 0; r < count; r++)
            {
                waterSlopes[r] += moments[p] * row[r];
            }
        }

        for (var p = 0; p < count; p++)
        {
            waterSlopes[p] *= -Mw;
        }

        var groupOf = Groups.GroupOf;
        for (var j = 0; j < groupOf.Length; j++)
        {
            var group = groupOf[j];
            lnGamma[j] = gradient[group];
            if (firsts[group] != j)
            {
                gammaSlopes
                    .Slice(firsts[group] * count, count)
                    .CopyTo(gammaSlopes.Slice(j * count, count));
            }
        }
    }
}
