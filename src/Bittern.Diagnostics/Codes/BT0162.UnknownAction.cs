namespace Bittern.Diagnostics.Codes;

/// <summary>BT0162: no action of a stage.</summary>
public static class UnknownAction
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0162",
            Severity.Error,
            "No action of a stage",
            "a step that is not understood would be left out"
        )
        {
            Explanation = """
                A stage has doses (`add`), other liquors (`blend`), atmospheres (`contact`), oxidation and reduction, what may `form`, what is held back, a
                temperature, and `settle` at its end.
                """,
            Wrong = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                train t { feed pond; stage s { settel 99 % } }
                """,
            Right = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                train t { feed pond; stage s { settle 99 % } }
                """,
        };

    public static Diagnostic At(SourceSpan span, string word, string? near) =>
        Descriptor.At(
            span,
            $"a stage does not know '{word}'",
            near is null
                ? "a stage knows add, blend, contact, oxidise, reduce, form, hold back, settle, heat to and cool to"
                : $"did you mean '{near}'?"
        );
}
