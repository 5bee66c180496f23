namespace Bittern.Diagnostics.Codes;

/// <summary>BT0165: a dose counted as something that is not in the reagent.</summary>
public static class DoseAsOther
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0165",
            Severity.Error,
            "A dose counted as something that is not in the reagent",
            "grams of one substance say nothing about another"
        )
        {
            Explanation = """
                `5 g/L as Ca(OH)2` counts the substance instead of the product as delivered; the reagent must hold it.
                """,
            Wrong = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                reagent soda { Na2CO3 100 g/L }
                train t { feed pond; stage s { add soda 5 g/L as Mg(OH)2 } }
                """,
            Right = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                reagent soda { Na2CO3 100 g/L }
                train t { feed pond; stage s { add soda 5 g/L as Na2CO3 } }
                """,
        };

    public static Diagnostic At(SourceSpan span, string reagent, string entries) =>
        Descriptor.At(
            span,
            $"the reagent '{reagent}' holds nothing of this",
            $"count the dose as one of its substances: {entries}"
        );
}
