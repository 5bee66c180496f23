namespace Bittern.Diagnostics;

/// <summary>
/// One kind of mistake: what its page, <c>bittern explain</c> and the editor say. A code is never reused.
/// </summary>
/// <param name="Id"><c>BT0123</c>.</param>
/// <param name="Severity">How serious.</param>
/// <param name="Title">A few words.</param>
/// <param name="Why">One sentence: why it matters.</param>
/// <param name="Wrong">The smallest recipe that triggers it; empty for codes that a calculation finds.</param>
/// <param name="Right">The same recipe mended.</param>
public sealed record DiagnosticCode(
    string Id,
    Severity Severity,
    string Title,
    string Why,
    string Wrong = "",
    string Right = ""
);
