namespace Bittern.Diagnostics.Codes;

/// <summary>BT0164: a train without a feed.</summary>
public static class TrainWithoutFeed
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new("BT0164", Severity.Error, "A train without a feed", "a train treats a liquor")
        {
            Explanation = """
                A train starts with `feed`, a liquor and, if loads per day are wanted, a rate.
                """,
            Wrong = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                train t { stage s { settle 99 % } }
                """,
            Right = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                train t { feed pond; stage s { settle 99 % } }
                """,
        };

    public static Diagnostic At(SourceSpan span, string train) =>
        Descriptor.At(
            span,
            $"the train '{train}' has no feed",
            "begin it with: feed liquor at 40 m3/h"
        );
}
