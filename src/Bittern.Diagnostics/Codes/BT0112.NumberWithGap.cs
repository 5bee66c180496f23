namespace Bittern.Diagnostics.Codes;

/// <summary>BT0112: a gap inside a number.</summary>
public static class NumberWithGap
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new("BT0112", Severity.Error, "A gap inside a number", "10 250 could be one number or two")
        {
            Explanation = """
                Write large numbers without gaps, or with an exponent: `10250` or `1.025e4`.
                """,
            Wrong = """
                use catalogue major
                liquor a { Ca 1 250 mg/L }
                """,
            Right = """
                use catalogue major
                liquor a { Ca 1250 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, string joined) =>
        Descriptor.At(
            span,
            $"'{span.Text}' looks like one number with a gap",
            $"write {joined}, or a comma and a space between two entries"
        );
}
