namespace Bittern.Chemistry;

/// <summary>
/// A unit of measurement. Immutable, equal by value: SI value = value · <see cref="SiFactor"/> + <see cref="SiOffset"/>.
/// </summary>
/// <param name="Symbol">As reports print it, e.g. <c>µg/L</c>, <c>m³/h</c>, <c>°C</c>; one spelling whatever the recipe wrote.</param>
/// <param name="Dimension">What it measures.</param>
/// <param name="SiFactor">SI units (kg, m, s, mol, K, eq, A, money) in one of this.</param>
/// <param name="SiOffset">SI value of zero; 273.15 for °C, 0 for all others.</param>
public sealed record Unit(string Symbol, Dimension Dimension, double SiFactor, double SiOffset)
{
    /// <summary>A pure number.</summary>
    public static Unit One { get; } = new("", Dimension.None, 1, 0);

    /// <summary>
    /// For a pure number that divides like by like: what it divides (mass for <c>mg/kg</c> and <c>ppm</c>, volume for <c>mL/L</c>).
    /// Null for <c>%</c>, which may be either, and for every unit with a dimension.
    /// </summary>
    public Dimension? RatioOf { get; init; }

    /// <summary>The currency code in it, e.g. <c>EUR</c>; null without one.</summary>
    public string? Currency { get; init; }

    /// <summary>The SI value of <paramref name="value"/> of this unit.</summary>
    public double ToSi(double value) => (value * SiFactor) + SiOffset;

    /// <summary>How many of this unit an SI value is.</summary>
    public double FromSi(double si) => (si - SiOffset) / SiFactor;

    public override string ToString() => Symbol;
}
