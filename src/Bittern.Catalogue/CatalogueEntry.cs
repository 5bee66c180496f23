using Bittern.Chemistry;
using Bittern.Model;

namespace Bittern.Catalogue;

/// <summary>What kind of line declared an entry.</summary>
public enum EntryKind
{
    /// <summary>A primary species: it has no constant.</summary>
    Basis,

    Complex,
    Solid,
    Gas,
    HalfReaction,
}

/// <summary>One declaration of the catalogue with everything that is needed to judge it. Immutable.</summary>
public sealed record CatalogueEntry
{
    /// <summary>The file, as <c>use catalogue …</c> names it.</summary>
    public required string Domain { get; init; }

    public required EntryKind Kind { get; init; }

    /// <summary>Solids: their name. Half-reactions: the reaction. Others: the formula.</summary>
    public required string Name { get; init; }

    /// <summary>Null for a half-reaction.</summary>
    public Formula? Formula { get; init; }

    /// <summary>The reaction as its author wrote it; null for a primary species.</summary>
    public Reaction? Reaction { get; init; }

    /// <summary>The constant of <see cref="Reaction"/>; null for a primary species.</summary>
    public EquilibriumConstant? Constant { get; init; }

    /// <summary>Why the solid does not form unless a recipe asks for it; null when it does.</summary>
    public string? HeldBack { get; init; }

    public string? Doubt { get; init; }

    /// <summary>The comment lines right above the declaration: other published values, conversions, where a ΔH comes from. Empty when there are none.</summary>
    public required string Remark { get; init; }

    /// <summary>The species as bound; null for a half-reaction.</summary>
    public Species? Species { get; init; }

    /// <summary>Place in its file (zero-based line), which orders entries as their author did.</summary>
    public required int Line { get; init; }

    /// <summary>Elements of the entry, ordinal order; for a half-reaction those of both sides but H and O.</summary>
    public IEnumerable<string> Elements =>
        Formula is { } formula
            ? formula.Atoms.Keys
            : Reaction!
                .Left.Concat(Reaction.Right)
                .SelectMany(t => t.Species.Atoms.Keys)
                .Distinct(StringComparer.Ordinal)
                .Where(s => s is not ("H" or "O"))
                .Order(StringComparer.Ordinal);
}
