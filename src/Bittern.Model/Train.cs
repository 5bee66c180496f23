using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;

namespace Bittern.Model;

/// <summary>A sequence of treatment stages.</summary>
public sealed record Train
{
    public required string Name { get; init; }

    /// <summary>What enters the first stage. Null when the feed could not be resolved.</summary>
    public required Feed Feed { get; init; }

    public ImmutableArray<Stage> Stages { get; init; } = [];

    /// <summary>True for a <c>mix</c> line: the report asks the plain question, does it precipitate and how much.</summary>
    public bool IsMixture { get; init; }

    public required SourceSpan Span { get; init; }
}

/// <summary>A liquor entering a train.</summary>
/// <param name="Liquor">Which.</param>
/// <param name="Rate">As written, e.g. <c>40 m3/h</c>; null when none is stated (results are then per m3).</param>
/// <param name="CubicMetresPerSecond">A flow, m3/s; null for a batch or when no rate is stated.</param>
/// <param name="CubicMetres">A batch volume, m3; null for a flow.</param>
/// <param name="Span">Where.</param>
public sealed record Feed(
    Liquor Liquor,
    string? Rate,
    double? CubicMetresPerSecond,
    double? CubicMetres,
    SourceSpan Span
);

/// <summary>One step of a train. Actions run as written, equilibrium after each; forming, held-back solids and contact hold for the whole stage.</summary>
public sealed record Stage
{
    public required string Name { get; init; }

    public ImmutableArray<StageAction> Actions { get; init; } = [];

    /// <summary>Solids that may form, in the order written (default order for <c>form any</c>).</summary>
    public ImmutableArray<Species> Forming { get; init; } = [];

    /// <summary>True for <c>form any</c>: every solid that the catalogue lets form by default.</summary>
    public bool FormsAny { get; init; }

    public ImmutableArray<HeldBack> HeldBack { get; init; } = [];

    /// <summary>Atmospheres that the stage is open to.</summary>
    public ImmutableArray<Atmosphere> Contacts { get; init; } = [];

    /// <summary>Last of all: solid-liquid separation. Null: solids go on with the liquor.</summary>
    public Settling? Settling { get; init; }

    /// <summary>°C of the stage; null: that of what enters.</summary>
    public double? TemperatureCelsius { get; init; }

    public required SourceSpan Span { get; init; }
}

/// <summary>A solid that may not form though it is known, with the reason given.</summary>
public sealed record HeldBack(Species Solid, string? Because, SourceSpan Span);

/// <summary>Solid-liquid separation.</summary>
/// <param name="Fraction">Share of suspended solids that leaves with the sludge, 0 to 1.</param>
/// <param name="To">Name of the sludge or product stream.</param>
/// <param name="SolidsContent">Mass of dry solids per mass of sludge; null: the sludge is counted dry and no liquor leaves with it.</param>
/// <param name="Span">Where.</param>
public sealed record Settling(double Fraction, string To, double? SolidsContent, SourceSpan Span);

/// <summary>One action of a stage. Closed set.</summary>
public abstract record StageAction(SourceSpan Span)
{
    /// <summary>A fixed dose.</summary>
    public sealed record AddAmount(Reagent Reagent, Dose Dose, SourceSpan Span) : StageAction(Span);

    /// <summary>The first dose that meets a condition.</summary>
    /// <param name="Reagent">What is dosed.</param>
    /// <param name="Target">The condition.</param>
    /// <param name="AtMost">Largest dose that is allowed; null: the solver's own cap, reported.</param>
    /// <param name="Span">Where.</param>
    public sealed record AddUntil(Reagent Reagent, Condition Target, Dose? AtMost, SourceSpan Span)
        : StageAction(Span);

    /// <summary>Another liquor joins.</summary>
    /// <param name="Liquor">Which.</param>
    /// <param name="VolumesPerVolume">Volumes of it per volume of what enters the stage.</param>
    /// <param name="Span">Where.</param>
    public sealed record Blend(Liquor Liquor, double VolumesPerVolume, SourceSpan Span)
        : StageAction(Span);

    /// <summary>
    /// One oxidation state is turned into another by an agent, by stoichiometric need.
    /// </summary>
    /// <param name="From">Basis species that is consumed, one mole.</param>
    /// <param name="Brings">What one mole of it turns into, over the basis: products positive, co-reactants (H+) negative. Electrons cancel.</param>
    /// <param name="Agent">The agent as written, e.g. <c>O2</c>.</param>
    /// <param name="AgentPerMole">mol of agent per mol of <paramref name="From"/>.</param>
    /// <param name="AgentFromAir">True when the agent is a gas of a contacted atmosphere and is not counted in the liquor.</param>
    /// <param name="Reaction">The whole reaction in plain text, for the report.</param>
    /// <param name="Span">Where.</param>
    public sealed record Convert(
        Formula From,
        ImmutableArray<Term> Brings,
        string Agent,
        double AgentPerMole,
        bool AgentFromAir,
        string Reaction,
        SourceSpan Span
    ) : StageAction(Span);
}

/// <summary>What a dose counts.</summary>
public enum DoseKind
{
    /// <summary>m3 of product as delivered per m3 entering the stage.</summary>
    VolumePerVolume,

    /// <summary>kg per m3 entering the stage.</summary>
    MassPerVolume,

    /// <summary>mol per m3 entering the stage.</summary>
    MolesPerVolume,
}

/// <summary>A dose per volume of liquor entering the stage.</summary>
/// <param name="Written">As the recipe says it, e.g. <c>5 g/L as Ca(OH)2</c>.</param>
/// <param name="Kind">What <paramref name="Si"/> counts.</param>
/// <param name="Si">SI value.</param>
/// <param name="As">The substance that a mass or amount counts; null: the product as delivered.</param>
public sealed record Dose(string Written, DoseKind Kind, double Si, Formula? As);
