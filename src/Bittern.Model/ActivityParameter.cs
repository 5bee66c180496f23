using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;

namespace Bittern.Model;

/// <summary>What a parameter of an activity model is.</summary>
public enum ActivityParameterKind
{
    /// <summary>Closest approach of one ion, Å.</summary>
    IonSize,

    /// <summary>a (Å) and b (kg/mol) of one ion.</summary>
    TruesdellJones,

    /// <summary>ε of two species, kg/mol.</summary>
    Sit,

    /// <summary>β0, β1, β2 (kg/mol) and Cφ (kg²/mol²) of a cation and an anion; α1, α2 (kg^½ mol^-½) where they are not the usual.</summary>
    Pitzer,

    /// <summary>Their first temperature derivatives at 25 °C, per K.</summary>
    PitzerSlope,

    /// <summary>θ of two ions of like sign, kg/mol.</summary>
    Theta,

    /// <summary>ψ of two ions of like sign and one of the other, kg²/mol².</summary>
    Psi,

    /// <summary>λ of an uncharged species with another, kg/mol.</summary>
    Lambda,

    /// <summary>ζ of an uncharged species, a cation and an anion, kg²/mol².</summary>
    Zeta,
}

/// <summary>One declared parameter of an activity model. Immutable.</summary>
/// <param name="Kind">Which.</param>
/// <param name="Species">Of which species, in the order written.</param>
/// <param name="Values">By symbol (<c>a</c>, <c>b</c>, <c>beta0</c>, <c>Cphi</c>, …); the empty symbol where there is one value only.</param>
/// <param name="Uncertainty">Standard uncertainty of a single value, in its unit; null when none is stated.</param>
/// <param name="Source">Where it comes from; null when the recipe does not say.</param>
/// <param name="Recalled">Recalled without sight of the source.</param>
/// <param name="Doubt">What a reader must know.</param>
/// <param name="Span">Where.</param>
public sealed record ActivityParameter(
    ActivityParameterKind Kind,
    ImmutableArray<Formula> Species,
    ImmutableSortedDictionary<string, double> Values,
    double? Uncertainty,
    Citation? Source,
    bool Recalled,
    string? Doubt,
    SourceSpan Span
)
{
    /// <summary>A value by symbol; 0 when it is not given.</summary>
    public double Value(string symbol) => Values.GetValueOrDefault(symbol);
}

/// <summary>What a set of constants is made for, as its file declares it.</summary>
public enum ConstantSetKind
{
    /// <summary>Ion pairs are species; goes with Debye-Hückel-type models.</summary>
    IonAssociation,

    /// <summary>Ion pairing is in the parameters; goes with the Pitzer equations.</summary>
    IonInteraction,

    /// <summary>Goes with SIT coefficients.</summary>
    SpecificInteraction,
}
