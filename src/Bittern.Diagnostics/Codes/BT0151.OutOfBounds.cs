namespace Bittern.Diagnostics.Codes;

/// <summary>BT0151: a value outside what is possible.</summary>
public static class OutOfBounds
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0151",
            Severity.Error,
            "A value outside what is possible",
            "the calculation would mean nothing"
        )
        {
            Explanation = """
                Bounds are wide enough for every real case; beyond them there is a slip of the keyboard or of the unit.
                """,
            Wrong = """
                use catalogue major
                liquor a { pH 40 }
                """,
            Right = """
                use catalogue major
                liquor a { pH 4 }
                """,
        };

    public static Diagnostic At(SourceSpan span, string what, string bounds) =>
        Descriptor.At(span, $"{what} must be {bounds}", "correct the value");
}
