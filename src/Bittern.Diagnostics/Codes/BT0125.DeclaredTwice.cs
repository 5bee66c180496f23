namespace Bittern.Diagnostics.Codes;

/// <summary>BT0125: declared twice.</summary>
public static class DeclaredTwice
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0125",
            Severity.Error,
            "Declared twice",
            "with two declarations it is open which one counts"
        )
        {
            Explanation = """
                Each name has one declaration.
                """,
            Wrong = """
                use catalogue major
                liquor a { Ca 5 mg/L }
                liquor a { Ca 6 mg/L }
                """,
            Right = """
                use catalogue major
                liquor a { Ca 5 mg/L }
                liquor b { Ca 6 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, string name, SourceSpan? first) =>
        Descriptor.At(
            span,
            $"'{name}' is declared twice",
            "delete one, or give it a name of its own",
            first is { } f ? [new RelatedSpan(f, "first declared here")] : []
        );
}
