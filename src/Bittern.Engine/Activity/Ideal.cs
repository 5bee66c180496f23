namespace Bittern.Engine.Activity;

/// <summary>γ = 1 for every species; the water activity follows from Gibbs-Duhem, ln a_w = -M_w Σm. For textbook comparisons.</summary>
public sealed class Ideal : IActivityModel
{
    public string Name => "ideal";

    /// <summary>0.001 mol/kg: beyond it the error of γ exceeds a few per cent (limiting law).</summary>
    public double TrustedIonicStrength => 0.001;

    public string UnchargedTreatment => "γ = 1";

    public CompiledActivity Compile(EquilibriumSystem system, double kelvin) =>
        new Compiled(system);

    private sealed class Compiled(EquilibriumSystem system) : ChargeModel(system)
    {
        protected override (double F, double Slope, double G) At(double ionicStrength) => (0, 0, 0);
    }
}
