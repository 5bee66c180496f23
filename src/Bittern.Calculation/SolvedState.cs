using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>
/// An equilibrium in reportable terms. Amounts are mol per m3 of the train's feed; concentrations are of the liquor itself.
/// </summary>
public sealed record SolvedState
{
    public required double TemperatureCelsius { get; init; }

    public required double PH { get; init; }

    /// <summary>mol per kg of water.</summary>
    public required double IonicStrength { get; init; }

    public required double WaterActivity { get; init; }

    /// <summary>kg of water per m3 of feed.</summary>
    public required double WaterKilograms { get; init; }

    /// <summary>kg/m3 of the liquor without suspended solids.</summary>
    public required double Density { get; init; }

    /// <summary>m3 of liquor per m3 of feed.</summary>
    public required double Volume { get; init; }

    /// <summary>All dissolved species, basis first, in the recipe's order.</summary>
    public required ImmutableArray<SpeciesAmount> Species { get; init; }

    /// <summary>Dissolved total of each basis species (H+ and water left out), mol per m3 of feed.</summary>
    public required ImmutableArray<Term> DissolvedTotals { get; init; }

    /// <summary>Solids in suspension.</summary>
    public required ImmutableArray<SolidAmount> Suspended { get; init; }

    /// <summary>eq per m3 of feed of inert charge that the analysis left open.</summary>
    public required double InertCharge { get; init; }

    public required CertificateResult Certificate { get; init; }

    /// <summary>Dissolved total of a basis species, mol per m3 of this liquor; 0 when absent.</summary>
    public double DissolvedPerCubicMetre(Formula basis) =>
        DissolvedTotals.Where(t => t.Species.Equals(basis)).Sum(t => t.Coefficient) / Volume;
}

/// <summary>One dissolved species.</summary>
/// <param name="Species">Which.</param>
/// <param name="Molality">mol per kg of water.</param>
/// <param name="ActivityCoefficient">Molal scale.</param>
public sealed record SpeciesAmount(Species Species, double Molality, double ActivityCoefficient)
{
    public double Activity => Molality * ActivityCoefficient;
}

/// <summary>The numbers that prove an answer is an equilibrium, recomputed from the answer by code apart from the solver.</summary>
/// <param name="WorstBalance">Largest balance residual relative to the gross amount of that component.</param>
/// <param name="WorstBalanceOf">Which component.</param>
/// <param name="ChargeResidual">Net charge of the liquor less its inert charge, relative to the gross charge.</param>
/// <param name="WorstSaturation">Largest Ω - 1 of a solid that may form.</param>
/// <param name="WorstSaturationOf">Which solid; null when none may form.</param>
/// <param name="WorstComplementarity">Largest |ln Ω| of a solid that is present.</param>
/// <param name="SmallestAmount">Smallest amount of a solid, mol per m3 of feed (never negative).</param>
/// <param name="ActivityResidual">Largest change of an ln γ when the activity model is evaluated afresh at the answer.</param>
/// <param name="Iterations">Newton systems solved.</param>
/// <param name="Accepted">True when every number lies within its tolerance.</param>
public sealed record CertificateResult(
    double WorstBalance,
    string WorstBalanceOf,
    double ChargeResidual,
    double WorstSaturation,
    string? WorstSaturationOf,
    double WorstComplementarity,
    double SmallestAmount,
    double ActivityResidual,
    int Iterations,
    bool Accepted
);
