using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>
/// Everything that a run found, ready to be reported; the report never solves. Immutable.
/// Amounts of a train are per m3 of liquor entering the train ("per m3 of feed") unless a name says otherwise.
/// </summary>
public sealed record Outcome
{
    public required Recipe Recipe { get; init; }

    public required ImmutableArray<LiquorResult> Liquors { get; init; }

    public required ImmutableArray<TrainResult> Trains { get; init; }

    public required ImmutableArray<LimitSetResult> LimitSets { get; init; }

    /// <summary>Doubts found while calculating (model out of range, a target unreachable); errors mean that a train has no certified answer.</summary>
    public required ImmutableArray<Diagnostic> Diagnostics { get; init; }

    /// <summary>False when a limit failed or could not be judged.</summary>
    public bool AllLimitsMet => LimitSets.All(s => s.Results.All(r => r.Verdict == Verdict.Met));

    /// <summary>False when some state has no certificate.</summary>
    public bool AllCertified =>
        Trains.All(t => t.Failure is null) && Liquors.All(l => l.Failure is null);
}

/// <summary>A liquor as the laboratory gave it beside as it is used.</summary>
public sealed record LiquorResult
{
    public required Liquor Liquor { get; init; }

    public ImmutableArray<EntryResult> Entries { get; init; } = [];

    /// <summary>The speciated state; null when it could not be solved, see <see cref="Failure"/>.</summary>
    public SolvedState? State { get; init; }

    /// <summary>kg/m3 that the conversion to molality used.</summary>
    public double Density { get; init; }

    /// <summary>True when <see cref="Density"/> comes from the engine's model instead of the recipe.</summary>
    public bool DensityFromModel { get; init; }

    /// <summary>(Σ cations - Σ anions)/(Σ cations + Σ anions) of the analysis as plain ions at the stated pH, fraction.</summary>
    public double PlainChargeImbalance { get; init; }

    /// <summary>The same after speciation, before closing, fraction.</summary>
    public double SpeciatedChargeImbalance { get; init; }

    /// <summary>eq per m3 of liquor that ride along as inert charge; 0 when closed by an ion.</summary>
    public double InertCharge { get; init; }

    /// <summary>Set when the recipe closes the charge by an entry.</summary>
    public ChargeClosure? Closure { get; init; }

    /// <summary>Why there is no certified state; null when there is one.</summary>
    public string? Failure { get; init; }
}

/// <summary>One analysis line as used.</summary>
/// <param name="Entry">As the recipe says it.</param>
/// <param name="MolesPerCubicMetre">mol per m3 of liquor, after the below-detection choice, before closing the charge.</param>
/// <param name="Molality">mol per kg of water.</param>
public sealed record EntryResult(AnalysisEntry Entry, double MolesPerCubicMetre, double Molality);

/// <summary>How a charge balance was closed.</summary>
/// <param name="Entry">Adjusted entry.</param>
/// <param name="BeforeMolesPerCubicMetre">As analysed.</param>
/// <param name="AfterMolesPerCubicMetre">As used.</param>
public sealed record ChargeClosure(
    AnalysisEntry Entry,
    double BeforeMolesPerCubicMetre,
    double AfterMolesPerCubicMetre
);

/// <summary>What a train did.</summary>
public sealed record TrainResult
{
    public required Train Train { get; init; }

    /// <summary>The feed before the first stage; null when it could not be solved.</summary>
    public SolvedState? Feed { get; init; }

    public ImmutableArray<StageResult> Stages { get; init; } = [];

    /// <summary>What leaves the last stage; null when the train failed.</summary>
    public SolvedState? Outflow => Failure is null ? Stages.LastOrDefault()?.Outflow ?? Feed : null;

    /// <summary>Doses over all stages, by reagent, in order of first use.</summary>
    public ImmutableArray<DoseTotal> Doses { get; init; } = [];

    public ImmutableArray<SludgeResult> Sludges { get; init; } = [];

    /// <summary>Worst relative imbalance of a basis species between everything that entered and everything that left.</summary>
    public double WorstPlantImbalance { get; init; }

    /// <summary>Why the train has no certified answer, with the stage; null when it has one.</summary>
    public TrainFailure? Failure { get; init; }
}

/// <summary>The first thing that could not be answered.</summary>
public sealed record TrainFailure(string Stage, string Reason, SourceSpan Span);

/// <summary>What one stage did.</summary>
public sealed record StageResult
{
    public required Stage Stage { get; init; }

    public ImmutableArray<DoseResult> Doses { get; init; } = [];

    public ImmutableArray<ConversionResult> Conversions { get; init; } = [];

    /// <summary>At the end of the stage, before settling.</summary>
    public required SolvedState End { get; init; }

    /// <summary>After settling: what goes on.</summary>
    public required SolvedState Outflow { get; init; }

    /// <summary>Solids that formed (positive) or redissolved (negative) within the stage.</summary>
    public ImmutableArray<SolidAmount> Formed { get; init; } = [];

    /// <summary>Every solid that matters here (forming, or with Ω above 0.1, or held back), saturation written out at the end of the stage.</summary>
    public ImmutableArray<SaturationResult> Saturations { get; init; } = [];

    /// <summary>Gas taken up (positive) or given off (negative), mol per m3 of feed.</summary>
    public ImmutableArray<GasExchange> GasExchanges { get; init; } = [];

    /// <summary>In the order in which the solids first saturate while the stage's reagent is dosed; empty without a dose.</summary>
    public ImmutableArray<OnsetResult> Onsets { get; init; } = [];

    /// <summary>How the stage answers to each of its doses, past the dose given, for figures; empty without a dose.</summary>
    public ImmutableArray<DoseCurve> DoseCurves { get; init; } = [];
}

/// <summary>States along a reagent's dose, each at equilibrium; nothing is interpolated.</summary>
/// <param name="Reagent">What is dosed.</param>
/// <param name="Given">The dose that the stage gives: m3 of product (kg for a dry one) per m3 entering the stage.</param>
/// <param name="Points">By rising dose, the first at no dose.</param>
public sealed record DoseCurve(Reagent Reagent, double Given, ImmutableArray<DosePoint> Points);

/// <summary>One state of a dose curve.</summary>
/// <param name="Dose">m3 of product (kg for a dry one) per m3 entering the stage.</param>
/// <param name="PH">pH there.</param>
/// <param name="Dissolved">Dissolved total of each basis species (H+ and water left out), mol per m3 of the liquor there.</param>
/// <param name="Formed">What formed in the stage up to there, per m3 of feed; solids that are in suspension only.</param>
public sealed record DosePoint(
    double Dose,
    double PH,
    ImmutableArray<Term> Dissolved,
    ImmutableArray<SolidAmount> Formed
);

/// <summary>A dose that was given.</summary>
public sealed record DoseResult
{
    public required Reagent Reagent { get; init; }

    public required StageAction Action { get; init; }

    /// <summary>m3 of product as delivered per m3 entering the stage; 0 for a dry reagent.</summary>
    public double VolumePerStageVolume { get; init; }

    /// <summary>kg of product as delivered per m3 of feed.</summary>
    public double ProductPerFeed { get; init; }

    /// <summary>kg of the dry substance, impurities included, per m3 of feed.</summary>
    public double DryPerFeed { get; init; }

    /// <summary>kg of the substance after purity per m3 of feed.</summary>
    public double ActivePerFeed { get; init; }

    /// <summary>Currency units per m3 of feed; null without a price.</summary>
    public double? CostPerFeed { get; init; }

    /// <summary>For a target: how it was met.</summary>
    public TargetResult? Target { get; init; }
}

/// <summary>How a target was met, or not.</summary>
public sealed record TargetResult
{
    public required Condition Target { get; init; }

    public bool Reached { get; init; }

    /// <summary>Value at the dose given, SI of the quantity.</summary>
    public double Value { get; init; }

    /// <summary>True when the target held before any dose.</summary>
    public bool HeldAlready { get; init; }

    /// <summary>When unreachable: the best value that any allowed dose gives.</summary>
    public double? BestValue { get; init; }

    /// <summary>Dose at that best value, m3 of product (kg for a dry one) per m3 entering the stage.</summary>
    public double? BestDose { get; init; }

    /// <summary>First larger dose at which the target stops holding; null when it holds up to the largest dose looked at.</summary>
    public double? StopsHoldingAt { get; init; }

    /// <summary>Largest dose looked at.</summary>
    public double LargestDose { get; init; }

    /// <summary>d(quantity)/d(dose) at the dose, SI of the quantity per unit of dose.</summary>
    public double Slope { get; init; }
}

/// <summary>An oxidation or reduction that was carried out.</summary>
/// <param name="Action">As asked.</param>
/// <param name="MolesPerFeed">mol converted per m3 of feed.</param>
/// <param name="AgentPerFeed">mol of agent used per m3 of feed.</param>
public sealed record ConversionResult(
    StageAction.Convert Action,
    double MolesPerFeed,
    double AgentPerFeed
);

/// <summary>An amount of a solid.</summary>
/// <param name="Solid">Which.</param>
/// <param name="MolesPerFeed">mol per m3 of feed.</param>
/// <param name="MassPerFeed">kg per m3 of feed.</param>
public sealed record SolidAmount(Species Solid, double MolesPerFeed, double MassPerFeed);

/// <summary>Why a solid stands in the table of saturations.</summary>
public enum SaturationRole
{
    /// <summary>Allowed to form, and present: Ω = 1.</summary>
    Present,

    /// <summary>Allowed to form, but undersaturated.</summary>
    Allowed,

    /// <summary>Held back by the stage.</summary>
    HeldBack,

    /// <summary>Not listed by the stage, and known to the catalogue.</summary>
    NotListed,
}

/// <summary>
/// Q against Ksp written out: Q = Π a^ν over the written reaction, so that a reader can check it with a pocket calculator.
/// </summary>
public sealed record SaturationResult
{
    public required Species Solid { get; init; }

    public required SaturationRole Role { get; init; }

    public string? HeldBackBecause { get; init; }

    /// <summary>Species of the written reaction other than the solid: coefficient (negative on the solid's side), molality, activity coefficient, activity.</summary>
    public ImmutableArray<ActivityTerm> Terms { get; init; } = [];

    /// <summary>log10 Q of the written reaction.</summary>
    public double Log10Q { get; init; }

    /// <summary>log10 of the written reaction's constant at the stage's temperature.</summary>
    public double Log10K { get; init; }

    /// <summary>Saturation index, log10 Ω.</summary>
    public double Index => Log10Q - Log10K;
}

/// <summary>One factor of an ion activity product. Water has a molality of NaN and counts by its activity.</summary>
public sealed record ActivityTerm(
    string Species,
    double Coefficient,
    double Molality,
    double ActivityCoefficient,
    double Activity
);

/// <summary>Exchange with an atmosphere, mol per m3 of feed, positive into the liquor.</summary>
public sealed record GasExchange(Species Gas, double MolesPerFeed, double Atmospheres);

/// <summary>Where a solid first saturates while a reagent is dosed.</summary>
/// <param name="Solid">Which.</param>
/// <param name="DosePerStageVolume">m3 of product (kg for a dry one) per m3 entering the stage; 0: saturated before any dose.</param>
/// <param name="PH">pH there.</param>
/// <param name="Reagent">Which reagent.</param>
public sealed record OnsetResult(
    Species Solid,
    double DosePerStageVolume,
    double PH,
    Reagent Reagent
);

/// <summary>All doses of one reagent.</summary>
/// <param name="Reagent">Which.</param>
/// <param name="ProductPerFeed">kg as delivered per m3 of feed.</param>
/// <param name="DryPerFeed">kg dry, impurities included, per m3 of feed.</param>
/// <param name="ProductVolumePerFeed">m3 as delivered per m3 of feed; 0 for a dry one.</param>
/// <param name="CostPerFeed">Currency units per m3 of feed; null without a price.</param>
public sealed record DoseTotal(
    Reagent Reagent,
    double ProductPerFeed,
    double DryPerFeed,
    double ProductVolumePerFeed,
    double? CostPerFeed
);

/// <summary>A sludge or product stream.</summary>
/// <param name="Name">As the recipe says it.</param>
/// <param name="Stage">Where it leaves.</param>
/// <param name="Solids">What it holds.</param>
/// <param name="DryMassPerFeed">kg of dry solids per m3 of feed.</param>
/// <param name="InertPerFeed">kg of reagent impurities counted into the dry mass, per m3 of feed.</param>
/// <param name="LiquorPerFeed">kg of liquor that leaves with it per m3 of feed.</param>
public sealed record SludgeResult(
    string Name,
    string Stage,
    ImmutableArray<SolidAmount> Solids,
    double DryMassPerFeed,
    double InertPerFeed,
    double LiquorPerFeed
);

public enum Verdict
{
    Met,
    Failed,

    /// <summary>The verdict depends on how values below detection are counted.</summary>
    Undecided,

    /// <summary>The train has no certified answer.</summary>
    NotJudged,
}

public sealed record LimitSetResult(LimitSet Set, ImmutableArray<LimitResult> Results);

/// <summary>One limit judged.</summary>
/// <param name="Limit">As written.</param>
/// <param name="Verdict">Outcome.</param>
/// <param name="Value">Value reached, SI of the quantity; NaN when not judged.</param>
/// <param name="BelowDetectionNote">Which analyses flip the verdict; null when none does.</param>
public sealed record LimitResult(
    Limit Limit,
    Verdict Verdict,
    double Value,
    string? BelowDetectionNote
);
