namespace Bittern.Diagnostics.Codes;

/// <summary>BT0145: catalogues that do not belong together.</summary>
public static class SetsDoNotMix
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0145",
            Severity.Error,
            "Catalogues that do not belong together",
            "sets fitted apart describe the same interaction twice, once as an ion pair and once in the activity model"
        )
        {
            Explanation = """
                A constant belongs to the activity model that it was fitted with. Where one catalogue has an ion pair and another an interaction parameter
                for the same two ions, using both counts the interaction twice.
                """,
            Wrong = """
                use catalogue major, brine
                """,
            Right = """
                use catalogue major
                """,
        };

    public static Diagnostic At(SourceSpan span, string one, string other, string example) =>
        Descriptor.At(
            span,
            $"the catalogues {one} and {other} both describe {example}, and differently",
            $"use one of the two: brine goes with an ion-interaction model, the others with ion pairs"
        );
}
