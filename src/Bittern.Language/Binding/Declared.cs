using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Language.Syntax;
using Bittern.Model;

namespace Bittern.Language.Binding;

/// <summary>A species as declared, before it is rewritten to the basis.</summary>
internal sealed record Declared
{
    public required string Name { get; init; }

    public required Formula Formula { get; init; }

    public required SpeciesKind Kind { get; init; }

    /// <summary>As its author wrote it; null for a basis species.</summary>
    public Reaction? Written { get; init; }

    public EquilibriumConstant? Constant { get; init; }

    public ReactionSyntax? Syntax { get; init; }

    public Override? Override { get; init; }

    public string? HeldBack { get; init; }

    public string? Doubt { get; init; }

    public required SourceSpan Span { get; init; }

    public bool FromCatalogue { get; init; }
}

/// <summary>Everything that one file declares about chemistry; made once per file.</summary>
internal sealed record ChemistryFile(
    SourceText Source,
    ImmutableArray<Declared> Species,
    ImmutableArray<HalfReaction> HalfReactions,
    ImmutableArray<ActivityParameter> ActivityParameters,
    ConstantSetKind? Set,
    ImmutableArray<OverrideDeclaration> Overrides,
    ImmutableArray<(string Name, SourceSpan Span)> UsedCatalogues,
    ImmutableArray<(string Path, SourceSpan Span)> UsedFiles,
    ImmutableArray<Citation> Citations,
    ImmutableArray<(string Key, SourceSpan Span)> OpenCitations,
    ImmutableArray<Item> OtherItems,
    ImmutableArray<Diagnostic> Diagnostics
);

/// <summary>An override before it meets what it replaces.</summary>
internal sealed record OverrideDeclaration(Declared Replacement, string? Because, SourceSpan Span);
