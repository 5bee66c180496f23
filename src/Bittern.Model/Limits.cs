using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;

namespace Bittern.Model;

/// <summary>A set of numbers that the outcome must meet; failing one fails the run.</summary>
/// <param name="Name">As written, e.g. <c>Discharge consent</c>.</param>
/// <param name="Train">Whose outflow is judged.</param>
/// <param name="Limits">In the order written.</param>
/// <param name="Span">Where.</param>
public sealed record LimitSet(
    string Name,
    Train Train,
    ImmutableArray<Limit> Limits,
    SourceSpan Span
);

/// <summary>One limit.</summary>
/// <param name="Condition">What must hold.</param>
/// <param name="Note">Text beside it; null when none.</param>
/// <param name="Span">Where.</param>
public sealed record Limit(Condition Condition, string? Note, SourceSpan Span);

public enum Comparison
{
    AtMost,
    Below,
    AtLeast,
    Above,

    /// <summary>Equality, for targets only: met when the quantity crosses the value.</summary>
    Equal,

    /// <summary>Between two values, both included.</summary>
    Within,
}

/// <summary>A comparison of a quantity with a value, in the unit as written.</summary>
/// <param name="Quantity">What is compared.</param>
/// <param name="Comparison">How.</param>
/// <param name="Value">The bound (the lower one for <see cref="Comparison.Within"/>), in the quantity's SI unit.</param>
/// <param name="Upper">The upper bound for <see cref="Comparison.Within"/>.</param>
/// <param name="Written">As the recipe says it, e.g. <c>dissolved(Zn) &lt;= 0.5 mg/L</c>.</param>
/// <param name="DisplayUnit">Unit in which the recipe compares, e.g. <c>mg/L</c>; empty for pure numbers.</param>
/// <param name="DisplayFactor">SI value of one display unit.</param>
/// <param name="Span">Where.</param>
public sealed record Condition(
    Quantity Quantity,
    Comparison Comparison,
    double Value,
    double? Upper,
    string Written,
    string DisplayUnit,
    double DisplayFactor,
    SourceSpan Span
);

/// <summary>A named function of a solved state. Closed set.</summary>
public abstract record Quantity
{
    private Quantity() { }

    /// <summary>As written in recipes.</summary>
    public abstract string Name { get; }

    /// <summary>-log10 of the hydrogen-ion activity; a pure number.</summary>
    public sealed record PH : Quantity
    {
        public override string Name => "pH";
    }

    /// <summary>mol per kg of water.</summary>
    public sealed record IonicStrength : Quantity
    {
        public override string Name => "ionic-strength";
    }

    /// <summary>kg of dissolved matter per m3 of liquor.</summary>
    public sealed record TotalDissolved : Quantity
    {
        public override string Name => "TDS";
    }

    /// <summary>
    /// What is dissolved of a substance, kg per m3 of liquor (counted as <paramref name="MolarMass"/>) or, with mol units, mol per m3.
    /// </summary>
    /// <param name="Text">As written: <c>Zn</c>, <c>Fe(II)</c>, <c>SO4</c>, <c>NO3 as N</c>.</param>
    /// <param name="Basis">Basis species that are summed, with their weight per mole counted.</param>
    /// <param name="MolarMass">g per mol counted.</param>
    /// <param name="InMoles">Compared in mol/m3 instead of kg/m3.</param>
    /// <param name="WithSolids">True for <c>total(…)</c>: suspended solids count as well.</param>
    public sealed record Dissolved(
        string Text,
        ImmutableArray<Term> Basis,
        double MolarMass,
        bool InMoles,
        bool WithSolids
    ) : Quantity
    {
        public override string Name => $"{(WithSolids ? "total" : "dissolved")}({Text})";
    }

    /// <summary>log10 (Q/Ksp); a pure number.</summary>
    public sealed record SaturationIndex(Species Solid) : Quantity
    {
        public override string Name => $"SI({Solid.Name})";
    }

    /// <summary>kg of a solid formed in the stage or train per m3 of its feed.</summary>
    public sealed record Formed(Species Solid) : Quantity
    {
        public override string Name => $"formed({Solid.Name})";
    }
}
