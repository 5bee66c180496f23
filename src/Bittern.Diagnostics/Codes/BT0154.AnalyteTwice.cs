namespace Bittern.Diagnostics.Codes;

/// <summary>BT0154: an analyte twice in one liquor.</summary>
public static class AnalyteTwice
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0154",
            Severity.Error,
            "An analyte twice in one liquor",
            "it is open whether the values add up or one is a slip"
        )
        {
            Explanation = """
                Each substance stands once in an analysis. States of one element are different substances: `Fe(II)` and `Fe(III)`.
                """,
            Wrong = """
                use catalogue major
                liquor a { Ca 5 mg/L; Ca 6 mg/L }
                """,
            Right = """
                use catalogue major
                liquor a { Ca 5 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, string analyte, SourceSpan first) =>
        Descriptor.At(
            span,
            $"'{analyte}' stands twice in this liquor",
            "keep one of the two lines",
            new RelatedSpan(first, "first here")
        );
}
