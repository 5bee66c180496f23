namespace Bittern.Diagnostics.Codes;

/// <summary>BT0123: a species that nothing declares.</summary>
public static class UnknownSpecies
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0123",
            Severity.Error,
            "A species that nothing declares",
            "a reaction over an unknown species has no constant to calculate with"
        )
        {
            Explanation = """
                Everything in a reaction is an `ion`, a `solute`, or a species with a reaction of its own, here or in a catalogue that the recipe uses.
                Water, H+ and the electron are always there.
                """,
            Wrong = """
                cite x "own"
                ion Ca^2+
                complex CaF+ from Ca^2+ + F-   log K 0.94 [x]
                """,
            Right = """
                cite x "own"
                ion Ca^2+, F-
                complex CaF+ from Ca^2+ + F-   log K 0.94 [x]
                """,
        };

    public static Diagnostic At(SourceSpan span, string species, string? near) =>
        Descriptor.At(
            span,
            $"{species} is not declared",
            near is null
                ? "declare it with ion, solute or complex, or use a catalogue that has it"
                : $"did you mean {near}? Else declare it with ion, solute or complex"
        );
}
