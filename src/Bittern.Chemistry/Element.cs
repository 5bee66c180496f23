namespace Bittern.Chemistry;

/// <summary>
/// A chemical element, or a pseudo-element that a recipe declares (a humic ligand, a tracer).
/// Immutable; equal by value.
/// </summary>
/// <param name="Symbol">Symbol as written in formulas, e.g. <c>Ca</c>.</param>
/// <param name="Name">IUPAC name, e.g. <c>calcium</c>.</param>
/// <param name="MolarMass">Standard atomic weight, g/mol.</param>
public sealed record Element(string Symbol, string Name, double MolarMass)
{
    /// <summary>Atomic number; 0 for a pseudo-element.</summary>
    public int AtomicNumber { get; init; }

    /// <summary>True when the element has no standard atomic weight and <see cref="MolarMass"/> is the mass number of a long-lived isotope.</summary>
    public bool IsMassNumber { get; init; }
}
