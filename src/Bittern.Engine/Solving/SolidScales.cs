namespace Bittern.Engine.Solving;

/// <summary>The natural unit of each solid's amount.</summary>
internal static class SolidScales
{
    /// <summary>Sets <see cref="Iterate.SolidScale"/>: the largest amount that the solid's scarcest component allows, mol.</summary>
    public static void Set(Iterate x)
    {
        var problem = x.Problem;
        for (var s = 0; s < problem.SolidCount; s++)
        {
            var scale = double.PositiveInfinity;
            for (var c = 0; c < problem.ComponentCount; c++)
            {
                var v = problem.SolidRows[(s * problem.ComponentCount) + c];
                if (v != 0 && problem.OneSigned[c] != 0)
                {
                    scale = Math.Min(scale, Math.Abs(problem.Totals[c] / v));
                }
            }

            // A solid over buffered components only (all its metal comes from a gas, say) is measured against the water.
            x.SolidScale[s] = double.IsInfinity(scale) ? x.Water : scale;
        }
    }
}
