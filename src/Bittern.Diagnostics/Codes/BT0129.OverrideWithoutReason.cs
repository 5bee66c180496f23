namespace Bittern.Diagnostics.Codes;

/// <summary>BT0129: an override without a reason.</summary>
public static class OverrideWithoutReason
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0129",
            Severity.Warning,
            "An override without a reason",
            "whoever signs the report must see why a published constant was replaced"
        )
        {
            Explanation = """
                Replacing a published constant is a decision, and decisions are written down.
                """,
            Wrong = """
                use catalogue salts
                cite x "own"
                override solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x]
                """,
            Right = """
                use catalogue salts
                cite x "own"
                override solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x] because "own titration"
                """,
        };

    public static Diagnostic At(SourceSpan span, string name) =>
        Descriptor.At(
            span,
            $"the override of '{name}' gives no reason",
            "add because \"…\" at its end"
        );
}
