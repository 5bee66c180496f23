using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;

namespace Bittern.Model;

/// <summary>How an entry counts its substance.</summary>
public enum ConcentrationKind
{
    /// <summary>kg per m3 of liquor.</summary>
    MassPerVolume,

    /// <summary>mol per m3 of liquor.</summary>
    MolesPerVolume,

    /// <summary>mol of charge per m3 of liquor.</summary>
    EquivalentsPerVolume,

    /// <summary>mol per kg of water.</summary>
    Molality,

    /// <summary>kg per kg of liquor.</summary>
    MassFraction,
}

/// <summary>What a laboratory says about a value below its detection limit.</summary>
public enum BelowDetection
{
    /// <summary>The value is above detection.</summary>
    No,

    /// <summary>Counted at half the limit (the default).</summary>
    Half,

    /// <summary>Counted as zero.</summary>
    Zero,

    /// <summary>Counted at the limit itself.</summary>
    Limit,
}

/// <summary>A concentration as written and in SI.</summary>
/// <param name="Written">As the recipe says it, e.g. <c>41 mg/L as N</c>.</param>
/// <param name="Kind">What <paramref name="Si"/> counts.</param>
/// <param name="Si">Value in the SI unit of <paramref name="Kind"/>, before the choice for below-detection values.</param>
/// <param name="UncertaintySi">Standard uncertainty in the same unit; null when none is stated.</param>
/// <param name="BelowDetection">Whether <paramref name="Si"/> is a detection limit, and how it counts.</param>
public sealed record Concentration(
    string Written,
    ConcentrationKind Kind,
    double Si,
    double? UncertaintySi,
    BelowDetection BelowDetection
)
{
    /// <summary>The value that the calculation uses, SI.</summary>
    public double UsedSi =>
        BelowDetection switch
        {
            BelowDetection.Half => Si / 2,
            BelowDetection.Zero => 0,
            _ => Si,
        };
}

/// <summary>
/// One line of an analysis or of a reagent's make-up.
/// </summary>
/// <param name="Analyte">As written: <c>Fe(II)</c>, <c>SO4</c>, <c>Ca</c>, <c>NaCl</c>.</param>
/// <param name="Amount">How much.</param>
/// <param name="MolarMass">g per mol of what <paramref name="PerMole"/> describes: the formula that the mass counts (<c>as N</c> gives nitrogen's).</param>
/// <param name="PerMole">Basis species (water and H+ included) that one mole of it brings.</param>
/// <param name="ChargePerMole">Charge that one mole counts for in eq/L; null where equivalents have no meaning.</param>
/// <param name="Assumption">What the binder took for granted (<c>Fe taken as Fe(II)</c>); null when nothing.</param>
/// <param name="Span">Where.</param>
public sealed record AnalysisEntry(
    string Analyte,
    Concentration Amount,
    double MolarMass,
    ImmutableArray<Term> PerMole,
    double? ChargePerMole,
    string? Assumption,
    SourceSpan Span
);

/// <summary>A solution of known analysis.</summary>
public sealed record Liquor
{
    public required string Name { get; init; }

    public ImmutableArray<AnalysisEntry> Entries { get; init; } = [];

    /// <summary>Measured pH; null means that H+ follows from the entries (made-up solutions).</summary>
    public double? PH { get; init; }

    public double? PHUncertainty { get; init; }

    /// <summary>°C; null: the recipe's.</summary>
    public double? TemperatureCelsius { get; init; }

    /// <summary>kg/m3; null: from the engine's own density model.</summary>
    public double? Density { get; init; }

    /// <summary>The entry that is adjusted until charges balance; null leaves the residual as an inert charge, reported.</summary>
    public AnalysisEntry? ChargeClosedBy { get; init; }

    public string? ChargeClosedBecause { get; init; }

    /// <summary>Titratable alkalinity to pH 4.5, eq/m3 of liquor, which sets inorganic carbon; null when not given.</summary>
    public double? Alkalinity { get; init; }

    public string? AlkalinityWritten { get; init; }

    public required SourceSpan Span { get; init; }
}

/// <summary>What is dosed.</summary>
public sealed record Reagent
{
    public required string Name { get; init; }

    /// <summary>Make-up per volume or mass of the product as delivered; strength is before <see cref="Purity"/>.</summary>
    public ImmutableArray<AnalysisEntry> Entries { get; init; } = [];

    /// <summary>Fraction of the stated dry product that counts, 0 to 1.</summary>
    public double Purity { get; init; } = 1;

    /// <summary>kg/m3; null: the recipe gave none. Slurries and solutions then count 1000 plus the dry mass per m3 less the volume that solids of 2,400 kg/m3 displace.</summary>
    public double? Density { get; init; }

    /// <summary>Pure dry substance dosed by mass (no water of its own).</summary>
    public bool IsDry { get; init; }

    public ReagentPrice? Price { get; init; }

    public required SourceSpan Span { get; init; }
}

/// <summary>Price of a reagent.</summary>
/// <param name="Written">As the recipe says it.</param>
/// <param name="PerUnit">Currency units per kg of dry product (<paramref name="PerVolume"/> false) or per m3 as delivered.</param>
/// <param name="Currency">As written, e.g. EUR.</param>
/// <param name="PerVolume">Per m3 instead of per kg.</param>
public sealed record ReagentPrice(string Written, double PerUnit, string Currency, bool PerVolume);

/// <summary>Fixed partial pressures.</summary>
public sealed record Atmosphere
{
    public required string Name { get; init; }

    public ImmutableArray<PartialPressure> Pressures { get; init; } = [];

    public required SourceSpan Span { get; init; }
}

/// <summary>One gas of an atmosphere, with its partial pressure in atm (the constants' unit); fugacity is taken as equal.</summary>
public sealed record PartialPressure(
    Formula Gas,
    double Atmospheres,
    string Written,
    SourceSpan Span
);
