namespace Bittern.Chemistry;

/// <summary>
/// A chemical element, or a pseudo-element that a recipe declares (a humic ligand, a tracer).
/// Immutable; two elements are the same when symbol and molar mass agree.
/// </summary>
/// <param name="Symbol">Symbol as written in formulas, e.g. <c>Ca</c>.</param>
/// <param name="Name">IUPAC name, e.g. <c>calcium</c>.</param>
/// <param name="MolarMass">Standard atomic weight, g/mol.</param>
public sealed record Element(string Symbol, string Name, double MolarMass);
