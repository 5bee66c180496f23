namespace Bittern.Diagnostics.Codes;

/// <summary>BT0166: formed and held back at once.</summary>
public static class FormedAndHeldBack
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0166",
            Severity.Error,
            "Formed and held back at once",
            "the two lines contradict each other"
        )
        {
            Explanation = """
                `form` lists what may precipitate, `hold back` what may not.
                """,
            Wrong = """
                use catalogue major, salts
                liquor pond { Ca 5 mg/L }
                train t { feed pond; stage s { form gypsum; hold back gypsum } }
                """,
            Right = """
                use catalogue major, salts
                liquor pond { Ca 5 mg/L }
                train t { feed pond; stage s { hold back gypsum } }
                """,
        };

    public static Diagnostic At(SourceSpan span, string solid) =>
        Descriptor.At(
            span,
            $"'{solid}' is to form and to be held back in the same stage",
            "delete one of the two"
        );
}
