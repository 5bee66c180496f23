using System.Collections.Immutable;

namespace Bittern.Chemistry;

/// <summary>The state mark that a formula may carry.</summary>
public enum PhaseMark
{
    /// <summary>No mark: an ion, a solid named by its formula, or water.</summary>
    None,

    /// <summary><c>(aq)</c>: an uncharged dissolved species.</summary>
    Aqueous,

    /// <summary><c>(g)</c>.</summary>
    Gas,

    /// <summary><c>(s)</c>.</summary>
    Solid,

    /// <summary><c>(l)</c>.</summary>
    Liquid,
}

/// <summary>
/// A chemical formula as written in plain text: composition, charge and phase mark. Immutable.
/// Equality is by canonical text, so <c>CaSO4*2H2O</c> equals <c>CaSO4·2H2O</c> but <c>Fe(OH)3</c> and <c>FeO3H3</c> differ.
/// </summary>
public sealed class Formula : IEquatable<Formula>
{
    internal Formula(
        string text,
        ImmutableSortedDictionary<string, double> atoms,
        int charge,
        PhaseMark phase,
        double molarMass
    )
    {
        Text = text;
        Atoms = atoms;
        Charge = charge;
        Phase = phase;
        MolarMass = molarMass;
    }

    /// <summary>Canonical text: <c>SO4^2-</c>, <c>Na+</c>, <c>CaSO4·2H2O</c>, <c>CO2(g)</c>, <c>e-</c>.</summary>
    public string Text { get; }

    /// <summary>Atoms of each element per formula unit, by symbol (ordinal order). Empty for the electron.</summary>
    public ImmutableSortedDictionary<string, double> Atoms { get; }

    /// <summary>Charge number (dimensionless, signed).</summary>
    public int Charge { get; }

    /// <summary>The phase mark that was written.</summary>
    public PhaseMark Phase { get; }

    /// <summary>Molar mass, g/mol, from the standard atomic weights. The mass of gained or lost electrons is left out.</summary>
    public double MolarMass { get; }

    /// <summary>True for <c>e-</c>.</summary>
    public bool IsElectron => Atoms.IsEmpty;

    /// <summary>True for <c>H2O</c> with or without <c>(l)</c>.</summary>
    public bool IsWater =>
        Charge == 0 && Phase is PhaseMark.None or PhaseMark.Liquid && Text is "H2O" or "H2O(l)";

    /// <summary>True for the hydrogen ion, <c>H+</c>.</summary>
    public bool IsHydrogenIon => string.Equals(Text, "H+", StringComparison.Ordinal);

    /// <summary>Atoms of one element per formula unit; 0 when absent.</summary>
    public double AtomsOf(string symbol) => Atoms.GetValueOrDefault(symbol);

    /// <summary>True when both have the same atoms and charge, however they are written.</summary>
    public bool SameCompositionAs(Formula other) => Charge == other.Charge && SameAtomsAs(other);

    /// <summary>True when both have the same atoms, whatever their charge.</summary>
    public bool SameAtomsAs(Formula other) =>
        Atoms.Count == other.Atoms.Count
        && Atoms.All(a => Math.Abs(other.AtomsOf(a.Key) - a.Value) < 1e-9);

    public bool Equals(Formula? other) =>
        other is not null && string.Equals(Text, other.Text, StringComparison.Ordinal);

    public override bool Equals(object? obj) => Equals(obj as Formula);

    public override int GetHashCode() => StringComparer.Ordinal.GetHashCode(Text);

    public override string ToString() => Text;
}
