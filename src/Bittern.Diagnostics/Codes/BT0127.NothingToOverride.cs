namespace Bittern.Diagnostics.Codes;

/// <summary>BT0127: nothing to override.</summary>
public static class NothingToOverride
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0127",
            Severity.Error,
            "Nothing to override",
            "an override that hits nothing would be lost without a word"
        )
        {
            Explanation = """
                `override` replaces a declaration of a catalogue or of another file.
                """,
            Wrong = """
                use catalogue salts
                cite x "own"
                override solid gypsun CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x] because "own"
                """,
            Right = """
                use catalogue salts
                cite x "own"
                override solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x] because "own"
                """,
        };

    public static Diagnostic At(SourceSpan span, string name, string? near) =>
        Descriptor.At(
            span,
            $"there is no '{name}' to override",
            near is null
                ? "declare it without override, or use the catalogue that has it"
                : $"did you mean '{near}'?"
        );
}
