namespace Bittern.Diagnostics.Codes;

/// <summary>BT0103: a number that cannot be held.</summary>
public static class NumberTooLarge
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0103",
            Severity.Error,
            "A number that cannot be held",
            "beyond about 1e308 a number has no value"
        )
        {
            Explanation = """
                A number is digits, a point and digits, and an exponent if need be: `12`, `0.5`, `2.4e-5`. A power of ten may be written out: `10^-4.58`.
                """,
            Wrong = """
                use catalogue major
                liquor a { Ca 1e999 mg/L }
                """,
            Right = """
                use catalogue major
                liquor a { Ca 1e2 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span) =>
        Descriptor.At(
            span,
            $"'{span.Text}' is no number that can be calculated with",
            "use a power of ten of ordinary size"
        );
}
