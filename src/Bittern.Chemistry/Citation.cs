namespace Bittern.Chemistry;

/// <summary>Where a number comes from.</summary>
/// <param name="Key">Short key as written in square brackets, e.g. <c>nordstrom1990</c>.</param>
/// <param name="Text">The reference in full.</param>
public sealed record Citation(string Key, string Text);
