using System.Collections.Immutable;

namespace Bittern.Engine.Activity;

/// <summary>
/// A parameter set for <see cref="Pitzer"/>, at 25 °C. What is not listed is zero. Parameters of one set belong together: they were fitted with each other,
/// with one A_φ and with one list of explicit species.
/// </summary>
/// <param name="Pairs">Binary parameters, one row a cation and an anion.</param>
public sealed record PitzerParameters(ImmutableArray<PitzerPair> Pairs)
{
    /// <summary>θ of two ions of like sign.</summary>
    public ImmutableArray<PitzerTheta> Thetas { get; init; } = [];

    /// <summary>ψ of two ions of like sign and one of the other.</summary>
    public ImmutableArray<PitzerPsi> Psis { get; init; } = [];

    /// <summary>λ of an uncharged species with an ion or another uncharged species (itself included).</summary>
    public ImmutableArray<PitzerLambda> Lambdas { get; init; } = [];

    /// <summary>ζ of an uncharged species, a cation and an anion.</summary>
    public ImmutableArray<PitzerZeta> Zetas { get; init; } = [];

    /// <summary>A_φ at 25 °C that the set was fitted with (0.392 in the sets of 1973 to 1984), kg^½ mol^-½; null takes water's own. At other temperatures it follows water's.</summary>
    public double? APhi { get; init; }

    /// <summary>Ionic strength (mol/kg) up to which the set as a whole is trusted; single pairs may end earlier (<see cref="PitzerPair.MaxMolality"/>).</summary>
    public double TrustedIonicStrength { get; init; } = 6;
}

/// <summary>Binary parameters, kg/mol (C^φ kg²/mol²).</summary>
/// <param name="Cation">By species name.</param>
/// <param name="Anion">By species name.</param>
/// <param name="Beta0">β(0).</param>
/// <param name="Beta1">β(1).</param>
/// <param name="Beta2">β(2).</param>
/// <param name="CPhi">C^φ.</param>
public sealed record PitzerPair(
    string Cation,
    string Anion,
    double Beta0,
    double Beta1,
    double Beta2,
    double CPhi
)
{
    /// <summary>α1, kg^½ mol^-½; null follows the charges: 1.4 for 2-2 salts, else 2 (Pitzer and Mayorga 1973, 1974).</summary>
    public double? Alpha1 { get; init; }

    /// <summary>α2, kg^½ mol^-½; null follows the charges: 12 where an ion is univalent and for 2-2 salts, else 50 (Pitzer 1991).</summary>
    public double? Alpha2 { get; init; }

    /// <summary>Molality of the single salt up to which the row was fitted, mol/kg; null where unknown.</summary>
    public double? MaxMolality { get; init; }

    /// <summary>First temperature derivatives at 25 °C; null counts as zero.</summary>
    public PitzerPairSlopes? PerKelvin { get; init; }
}

/// <summary>Temperature derivatives of <see cref="PitzerPair"/> at 25 °C, per K: P(T) = P(25 °C) + (T - 298.15 K) dP/dT (Silvester and Pitzer 1978).</summary>
/// <param name="Beta0">dβ(0)/dT, kg/(mol K).</param>
/// <param name="Beta1">dβ(1)/dT, kg/(mol K).</param>
/// <param name="Beta2">dβ(2)/dT, kg/(mol K).</param>
/// <param name="CPhi">dC^φ/dT, kg²/(mol² K).</param>
public sealed record PitzerPairSlopes(double Beta0, double Beta1, double Beta2, double CPhi);

/// <summary>θ of two ions of like sign.</summary>
/// <param name="First">An ion, by name.</param>
/// <param name="Second">Another of the same sign.</param>
/// <param name="Value">θ at 25 °C, kg/mol.</param>
/// <param name="PerKelvin">dθ/dT at 25 °C, kg/mol/K.</param>
public sealed record PitzerTheta(string First, string Second, double Value, double PerKelvin = 0);

/// <summary>ψ of two ions of like sign and one of the other.</summary>
/// <param name="First">An ion, by name.</param>
/// <param name="Second">Another of the same sign.</param>
/// <param name="Opposite">The ion of the other sign.</param>
/// <param name="Value">ψ at 25 °C, kg²/mol².</param>
/// <param name="PerKelvin">dψ/dT at 25 °C, kg²/mol²/K.</param>
public sealed record PitzerPsi(
    string First,
    string Second,
    string Opposite,
    double Value,
    double PerKelvin = 0
);

/// <summary>λ of an uncharged species with another.</summary>
/// <param name="Uncharged">The uncharged species, by name.</param>
/// <param name="Other">An ion or an uncharged species.</param>
/// <param name="Value">λ at 25 °C, kg/mol.</param>
/// <param name="PerKelvin">dλ/dT at 25 °C, kg/mol/K.</param>
public sealed record PitzerLambda(
    string Uncharged,
    string Other,
    double Value,
    double PerKelvin = 0
);

/// <summary>ζ of an uncharged species, a cation and an anion.</summary>
/// <param name="Uncharged">The uncharged species, by name.</param>
/// <param name="Cation">By name.</param>
/// <param name="Anion">By name.</param>
/// <param name="Value">ζ at 25 °C, kg²/mol².</param>
/// <param name="PerKelvin">dζ/dT at 25 °C, kg²/mol²/K.</param>
public sealed record PitzerZeta(
    string Uncharged,
    string Cation,
    string Anion,
    double Value,
    double PerKelvin = 0
);
