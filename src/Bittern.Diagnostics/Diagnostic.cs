using System.Collections.Immutable;

namespace Bittern.Diagnostics;

public enum Severity
{
    /// <summary>Worth knowing; never fails a run.</summary>
    Note,

    /// <summary>The run goes on; the report repeats it.</summary>
    Warning,

    /// <summary>The recipe has no meaning as it stands.</summary>
    Error,
}

/// <summary>A second place that a diagnostic points to, with a few words ("declared here").</summary>
public sealed record RelatedSpan(SourceSpan Span, string Label);

/// <summary>
/// One mistake or doubt, ready to show: what, why, try. Immutable.
/// </summary>
/// <param name="Code">Stable code, <c>BT0123</c>; never reused.</param>
/// <param name="Severity">How serious.</param>
/// <param name="What">One sentence: what is wrong, with the values at hand.</param>
/// <param name="Why">One sentence: why it matters.</param>
/// <param name="Try">A suggestion; null when none is honest.</param>
/// <param name="Span">Where; null for a fault that has no place in a file.</param>
/// <param name="Related">Further places.</param>
public sealed record Diagnostic(
    string Code,
    Severity Severity,
    string What,
    string Why,
    string? Try,
    SourceSpan? Span,
    ImmutableArray<RelatedSpan> Related
);
