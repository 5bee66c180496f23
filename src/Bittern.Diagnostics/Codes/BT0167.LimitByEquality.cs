namespace Bittern.Diagnostics.Codes;

/// <summary>BT0167: a limit that demands equality.</summary>
public static class LimitByEquality
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0167",
            Severity.Error,
            "A limit that demands equality",
            "no plant meets a number exactly"
        )
        {
            Explanation = """
                Equality is for targets, which are met when a quantity crosses the value.
                """,
            Wrong = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                train t { feed pond }
                limits "l" on t { pH = 7 }
                """,
            Right = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                train t { feed pond }
                limits "l" on t { pH within 6.5 .. 7.5 }
                """,
        };

    public static Diagnostic At(SourceSpan span) =>
        Descriptor.At(span, "a limit cannot be an equality", "write <=, >= or within a .. b");
}
