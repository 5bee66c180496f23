using System.Globalization;
using Bittern.Chemistry;
using Bittern.Engine.Activity;

namespace Bittern.Engine.Tests.Activity;

/// <summary>A list of species and a model compiled for it, evaluated at given molalities.</summary>
internal sealed class Liquor
{
    private readonly CompiledActivity _model;
    private readonly string[] _species;

    public Liquor(IActivityModel model, double kelvin, params string[] species)
    {
        var builder = new SystemBuilder();
        foreach (var name in species)
        {
            builder.Component(name, Charge(name));
        }

        System = builder.Build(model);
        _model = model.Compile(System, kelvin);
        _species = species;
    }

    public EquilibriumSystem System { get; }

    public int MomentCount => _model.MomentCount;

    /// <summary>Charge number from a name such as <c>SO4^2-</c>, <c>Cl-</c>, <c>CO2(aq)</c>.</summary>
    public static int Charge(string name)
    {
        if (name[^1] is not ('+' or '-'))
        {
            return 0;
        }

        var caret = name.IndexOf('^', StringComparison.Ordinal);
        var size = caret < 0 ? 1 : int.Parse(name[(caret + 1)..^1], CultureInfo.InvariantCulture);
        return name[^1] == '+' ? size : -size;
    }

    public Evaluation At(params double[] molalities)
    {
        var moments = new double[_model.MomentCount];
        for (var p = 0; p < moments.Length; p++)
        {
            for (var j = 0; j < molalities.Length; j++)
            {
                moments[p] += _model.Weights[(p * molalities.Length) + j] * molalities[j];
            }
        }

        return AtMoments(moments, molalities.Sum());
    }

    public Evaluation AtMoments(double[] moments, double sum = double.NaN)
    {
        var lnGamma = new double[_species.Length];
        var slopes = new double[_species.Length * moments.Length];
        var waterSlopes = new double[moments.Length];

        // What is in the buffers before must not matter.
        Array.Fill(lnGamma, 7);
        Array.Fill(slopes, 7);
        Array.Fill(waterSlopes, 7);
        _model.Evaluate(moments, lnGamma, out var lnWater, slopes, waterSlopes);
        return new Evaluation(_species, moments, lnGamma, lnWater, slopes, waterSlopes, sum);
    }
}

/// <summary>What a model says at one composition.</summary>
internal sealed record Evaluation(
    string[] Species,
    double[] Moments,
    double[] LnGamma,
    double LnWater,
    double[] Slopes,
    double[] WaterSlopes,
    double Sum
)
{
    public double Osmotic => -LnWater / (PhysicalConstants.WaterMolarMass * Sum);

    public double Gamma(string species) => Math.Exp(LnGamma[Array.IndexOf(Species, species)]);
}
