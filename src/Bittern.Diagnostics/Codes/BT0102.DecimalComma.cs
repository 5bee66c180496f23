namespace Bittern.Diagnostics.Codes;

/// <summary>BT0102: a comma inside a number.</summary>
public static class DecimalComma
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0102",
            Severity.Error,
            "A comma inside a number",
            "0,5 could be a list of two numbers or one number"
        )
        {
            Explanation = """
                Numbers are written with a decimal point on every computer, whatever its language. A list has a comma and a space between its entries.
                """,
            Wrong = """
                use catalogue major
                liquor a { Ca 0,5 mg/L }
                """,
            Right = """
                use catalogue major
                liquor a { Ca 0.5 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span) =>
        Descriptor.At(
            span,
            $"'{span.Text}' has a comma between digits",
            $"write {span.Text.Replace(',', '.')} for a decimal, or a comma and a space between two entries"
        );
}
