namespace Bittern.Diagnostics.Codes;

/// <summary>BT0141: a source that nothing declares.</summary>
public static class UnknownCitation
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0141",
            Severity.Error,
            "A source that nothing declares",
            "a source that cannot be looked up is none"
        )
        {
            Explanation = """
                A key in square brackets stands for a reference that a `cite` line gives in full, in the recipe, in a file that it uses or in a catalogue.
                """,
            Wrong = """
                use catalogue major
                cite own-lab "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58 [own-lap]
                """,
            Right = """
                use catalogue major
                cite own-lab "own"
                solid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58 [own-lab]
                """,
        };

    public static Diagnostic At(SourceSpan span, string key, string? near) =>
        Descriptor.At(
            span,
            $"there is no source '{key}'",
            near is null
                ? $"declare it: cite {key} \"the reference in full\""
                : $"did you mean '{near}'?"
        );
}
