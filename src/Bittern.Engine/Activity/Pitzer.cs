using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Engine.Water;

namespace Bittern.Engine.Activity;

/// <summary>
/// Pitzer's ion-interaction equations in the form of Harvie, Møller and Weare 1984, Geochim. Cosmochim. Acta 48, 723: binary β(0), β(1), β(2), C^φ; mixing
/// θ, ψ with the unsymmetrical term Eθ and its derivative in I; λ and ζ of uncharged species. Equations with symbols: docs/activity-models.md.
/// An ion without parameters feels the Debye-Hückel and the Eθ term, like every other.
/// </summary>
public sealed class Pitzer : IActivityModel
{
    private readonly PitzerParameters _parameters;
    private readonly HashSet<(string Cation, string Anion)> _known;

    /// <summary>A model with one set of parameters.</summary>
    /// <exception cref="ArgumentException">A combination of species stands twice.</exception>
    public Pitzer(PitzerParameters parameters)
    {
        _parameters = parameters;
        _known = [.. parameters.Pairs.Select(p => (p.Cation, p.Anion))];
        Once(parameters.Pairs.Select(p => Key("β", p.Cation, p.Anion)));
        Once(parameters.Thetas.Select(t => Key("θ", t.First, t.Second)));
        Once(parameters.Psis.Select(t => Key("ψ", t.First, t.Second, t.Opposite)));
        Once(parameters.Lambdas.Select(t => Key("λ", t.Uncharged, t.Other)));
        Once(parameters.Zetas.Select(t => Key("ζ", t.Uncharged, t.Cation, t.Anion)));
    }

    public string Name => "pitzer";

    /// <summary>What the parameter set says of itself, mol/kg (<see cref="PitzerParameters.TrustedIonicStrength"/>).</summary>
    public double TrustedIonicStrength => _parameters.TrustedIonicStrength;

    /// <summary>25 ± 15 °C without temperature derivatives, 0 to 50 °C with them: a linear change is all that they describe.</summary>
    public (double From, double To) TrustedKelvin =>
        _parameters.Pairs.Any(p => p.PerKelvin is not null) ? (273.15, 323.15) : (283.15, 313.15);

    public string UnchargedTreatment => "λ and ζ where given, else γ = 1";

    /// <summary>Charged species without binary parameters with any ion of opposite charge of the system.</summary>
    public ImmutableArray<string> MissingFor(EquilibriumSystem system) =>
        IonPair.Strangers(system, IsKnown);

    /// <summary>Every cation-anion pair of the system without binary parameters.</summary>
    public ImmutableArray<IonPair> MissingPairs(EquilibriumSystem system) =>
        IonPair.Unknown(system, IsKnown);

    /// <summary>Pairs of the system that were fitted up to less than the set as a whole, with that molality, mol/kg.</summary>
    public ImmutableArray<(IonPair Pair, double MaxMolality)> ShortRanges(
        EquilibriumSystem system
    ) =>
        [
            .. _parameters
                .Pairs.Where(p =>
                    p.MaxMolality < TrustedIonicStrength
                    && system.SpeciesIndex(p.Cation) >= 0
                    && system.SpeciesIndex(p.Anion) >= 0
                )
                .Select(p => (new IonPair(p.Cation, p.Anion), p.MaxMolality!.Value)),
        ];

    public CompiledActivity Compile(EquilibriumSystem system, double kelvin)
    {
        var aPhi = DebyeHuckel.SlopeLog10(
            kelvin,
            _parameters.APhi is { } given ? 3 * given / Math.Log(10) : null
        );
        return PitzerCompiler.Compile(
            _parameters,
            system,
            kelvin - PhysicalConstants.ReferenceKelvin,
            aPhi * Math.Log(10) / 3
        );
    }

    private bool IsKnown(string cation, string anion) => _known.Contains((cation, anion));

    private static string Key(string symbol, params string[] names) =>
        $"{symbol}({string.Join(", ", names.Order(StringComparer.Ordinal))})";

    private static void Once(IEnumerable<string> keys)
    {
        var seen = new HashSet<string>(StringComparer.Ordinal);
        foreach (var key in keys)
        {
            if (!seen.Add(key))
            {
                throw new ArgumentException($"{key} stands twice", nameof(keys));
            }
        }
    }
}
