namespace Bittern.Diagnostics.Codes;

/// <summary>BT0124: reactions in a circle.</summary>
public static class Cycle
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0124",
            Severity.Error,
            "Reactions in a circle",
            "a species that is formed from itself has no constant over the basis"
        )
        {
            Explanation = """
                A reaction may be written over any declared species, in any order, but following the reactions must end at primary species.
                """,
            Wrong = """
                cite x "own"
                ion CO3^2-
                complex HCO3- from CO2(aq) + H2O - H+   log K -6.35 [x]
                complex CO2(aq) from HCO3- + H+ - H2O   log K 6.35 [x]
                """,
            Right = """
                cite x "own"
                ion CO3^2-
                complex HCO3- from CO3^2- + H+   log K 10.33 [x]
                complex CO2(aq) from HCO3- + H+ - H2O   log K 6.35 [x]
                """,
        };

    public static Diagnostic At(SourceSpan span, string name) =>
        Descriptor.At(
            span,
            $"the reaction of {name} leads back to itself",
            "write one of the reactions over basis species"
        );
}
