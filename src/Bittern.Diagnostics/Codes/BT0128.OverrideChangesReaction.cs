namespace Bittern.Diagnostics.Codes;

/// <summary>BT0128: an override with another reaction.</summary>
public static class OverrideChangesReaction
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0128",
            Severity.Error,
            "An override with another reaction",
            "a constant belongs to its reaction; over another one the same number means something else"
        )
        {
            Explanation = """
                An override repeats the whole reaction, so that the new number cannot silently mean something else.
                """,
            Wrong = """
                use catalogue salts
                cite x "own"
                override solid gypsum CaSO4 to Ca^2+ + SO4^2-   log Ksp -4.6 [x] because "own"
                """,
            Right = """
                use catalogue salts
                cite x "own"
                override solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x] because "own"
                """,
        };

    public static Diagnostic At(SourceSpan span, string name, string original, SourceSpan first) =>
        Descriptor.At(
            span,
            $"the override of '{name}' has another reaction than what it replaces",
            $"repeat the reaction as it stands: {original}",
            new RelatedSpan(first, "what it replaces")
        );
}
