using System.Collections.Immutable;

namespace Bittern.Diagnostics;

/// <summary>
/// Everything about one code apart from the values at hand: what <c>explain</c>, the page in the documentation and the editor show. Immutable.
/// </summary>
/// <param name="Id">Stable code, <c>BT0123</c>; never reused.</param>
/// <param name="Severity">How serious.</param>
/// <param name="Title">A few words that name the mistake.</param>
/// <param name="Why">One sentence: why it matters. Printed with every message.</param>
public sealed record DiagnosticDescriptor(string Id, Severity Severity, string Title, string Why)
{
    /// <summary>What to know beyond the message, as Markdown.</summary>
    public required string Explanation { get; init; }

    /// <summary>The smallest recipe that shows the mistake; tests read it and must find this code.</summary>
    public required string Wrong { get; init; }

    /// <summary>The same recipe without the mistake; tests read it and must not find this code.</summary>
    public required string Right { get; init; }

    /// <summary>True when only a calculation can find it: reading the recipe alone does not show the code.</summary>
    public bool NeedsRun { get; init; }

    /// <summary>A diagnostic of this code.</summary>
    public Diagnostic At(
        SourceSpan? span,
        string what,
        string? @try = null,
        params ImmutableArray<RelatedSpan> related
    ) => new(Id, Severity, what, Why, @try, span, related.IsDefault ? [] : related);
}
