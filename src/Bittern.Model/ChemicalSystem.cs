using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;

namespace Bittern.Model;

/// <summary>All chemistry that a recipe may use, after overrides, rewritten to its basis. Immutable.</summary>
public sealed record ChemicalSystem
{
    /// <summary>Primary species, water left out; H+ is always there. The electron is here only when a recipe declares couples.</summary>
    public required ImmutableArray<Species> Basis { get; init; }

    public required ImmutableArray<Species> Complexes { get; init; }

    public required ImmutableArray<Species> Solids { get; init; }

    public required ImmutableArray<Species> Gases { get; init; }

    /// <summary>Redox couples as written; they do not tie the basis together unless a stage says that electrons are shared.</summary>
    public ImmutableArray<HalfReaction> HalfReactions { get; init; } = [];

    /// <summary>Parameters of activity models for species that are here, in the order declared.</summary>
    public ImmutableArray<ActivityParameter> ActivityParameters { get; init; } = [];

    /// <summary>Basis, complexes, solids and gases in that order.</summary>
    public IEnumerable<Species> All => Basis.Concat(Complexes).Concat(Solids).Concat(Gases);
}

public enum SpeciesKind
{
    /// <summary>Declared with <c>ion</c> or <c>solute</c>: a primary species.</summary>
    Basis,

    /// <summary>Dissolved, formed from others.</summary>
    Complex,

    Solid,

    Gas,
}

/// <summary>
/// A species. Its reaction over the basis is: Σ coefficient · basis species → one formula unit of this species,
/// with log10 K = Σ share · log10 K of the written reactions (see <see cref="Log10FormationAt"/>).
/// </summary>
public sealed record Species
{
    /// <summary>Solids: the declared name, <c>gypsum</c>. Others: the formula's text.</summary>
    public required string Name { get; init; }

    public required Formula Formula { get; init; }

    public required SpeciesKind Kind { get; init; }

    /// <summary>The reaction as its author wrote it; null for a basis species.</summary>
    public Reaction? Written { get; init; }

    /// <summary>The constant of <see cref="Written"/>; null for a basis species.</summary>
    public EquilibriumConstant? Constant { get; init; }

    /// <summary>Formation from the basis (water and H+ included under <c>H2O</c> and <c>H+</c>). For a basis species: itself, 1.</summary>
    public required ImmutableArray<Term> FromBasis { get; init; }

    /// <summary>The written constants whose weighted sum is the formation constant; empty for a basis species.</summary>
    public ImmutableArray<ConstantShare> FormationConstants { get; init; } = [];

    /// <summary>Set when a recipe replaced the catalogue's constant.</summary>
    public Override? Override { get; init; }

    /// <summary>Solids of the catalogue that do not form at ambient conditions in hours: why (with its source or "common practice"). Null for others.</summary>
    public string? HeldBackByDefault { get; init; }

    /// <summary>A doubt about the constant that the report shows when it matters.</summary>
    public string? Doubt { get; init; }

    public required SourceSpan Span { get; init; }

    /// <summary>log10 of the formation constant over the basis at a temperature (°C): log10 a(species) = this + Σ ν log10 a(basis).</summary>
    public double Log10FormationAt(double celsius) =>
        FormationConstants.Sum(s => s.Share * s.Constant.Log10AtCelsius(celsius));
}

/// <summary>One written constant in a species' formation from the basis.</summary>
/// <param name="SpeciesName">Whose written reaction.</param>
/// <param name="Constant">Its constant.</param>
/// <param name="Share">Weight; negative where the reaction runs backwards.</param>
public sealed record ConstantShare(string SpeciesName, EquilibriumConstant Constant, double Share);

/// <summary>An explicit, reasoned replacement of a catalogue constant.</summary>
public sealed record Override(EquilibriumConstant Replaced, string Because, SourceSpan Span);

/// <summary>A redox couple as written, n electrons on the left: <c>Fe^3+ + e- to Fe^2+</c>.</summary>
public sealed record HalfReaction(
    Reaction Written,
    double Electrons,
    EquilibriumConstant Constant,
    SourceSpan Span
);
