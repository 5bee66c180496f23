using System.Collections.Immutable;
using Bittern.Diagnostics;
using Bittern.Language.Lexing;

namespace Bittern.Language.Syntax;

/// <summary>
/// One line of a recipe (or what stands between two semicolons) with the block that follows it. The cut into items never fails, so that a mistake
/// costs one item.
/// </summary>
/// <param name="Head">Tokens of the line, comments left out.</param>
/// <param name="Block">Items between braces; default when there are none.</param>
/// <param name="Span">From the first token of the head to its last.</param>
/// <param name="Whole">The same with the block.</param>
public sealed record Item(
    ImmutableArray<Token> Head,
    ImmutableArray<Item> Block,
    SourceSpan Span,
    SourceSpan Whole
)
{
    /// <summary>True when braces follow, even empty ones.</summary>
    public bool HasBlock => !Block.IsDefault;
}
