namespace Bittern.Diagnostics.Codes;

/// <summary>BT0161: a solid that nothing declares.</summary>
public static class UnknownSolid
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0161",
            Severity.Error,
            "A solid that nothing declares",
            "a solid that is left out silently would change every dose"
        )
        {
            Explanation = """
                A solid's name comes from a declaration in the recipe, in a file that it uses, or in a catalogue; `bittern catalogue` searches them.
                """,
            Wrong = """
                use catalogue major, salts
                liquor pond { Ca 5 mg/L }
                train t { feed pond; stage s { form gipsum } }
                """,
            Right = """
                use catalogue major, salts
                liquor pond { Ca 5 mg/L }
                train t { feed pond; stage s { form gypsum } }
                """,
        };

    public static Diagnostic At(SourceSpan span, string name, string? near) =>
        Descriptor.At(
            span,
            $"there is no solid '{name}'",
            near is null
                ? "declare it with solid, or use the catalogue that has it"
                : $"did you mean '{near}'?"
        );
}
