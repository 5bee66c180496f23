namespace Bittern.Diagnostics.Codes;

/// <summary>BT0110: this does not fit here.</summary>
public static class Unexpected
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0110",
            Severity.Error,
            "This does not fit here",
            "a line that is not understood cannot be calculated, and guessing could change its meaning"
        )
        {
            Explanation = """
                Every line is a declaration or a property with a fixed shape, which the message shows. Only this line is lost; the rest of the recipe is
                read, and every other mistake in it is reported in the same pass.
                """,
            Wrong = """
                use catalogue major
                liquor a { pH about 7 }
                """,
            Right = """
                use catalogue major
                liquor a { pH 7 }
                """,
        };

    public static Diagnostic At(SourceSpan span, string? found, string shape) =>
        Descriptor.At(
            span,
            found is null ? "this line ends too early" : $"'{found}' was not expected here",
            $"this is how it goes:  {shape}"
        );
}
