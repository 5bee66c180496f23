namespace Bittern.Diagnostics.Codes;

/// <summary>BT0136: a half-reaction without electrons.</summary>
public static class HalfReactionWithoutElectrons
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0136",
            Severity.Error,
            "A half-reaction without electrons",
            "a couple gains its electrons on the left side"
        )
        {
            Explanation = """
                A couple is written as a reduction, `half-reaction Fe^3+ + e- to Fe^2+`, and its log K belongs to that direction.
                """,
            Wrong = """
                cite x "own"
                ion Fe^2+
                half-reaction Fe^2+ to Fe^2+   log K 0 [x]
                """,
            Right = """
                cite x "own"
                ion Fe^2+, Fe^3+
                half-reaction Fe^3+ + e- to Fe^2+   log K 13.02 [x]
                """,
        };

    public static Diagnostic At(SourceSpan span) =>
        Descriptor.At(
            span,
            "this half-reaction has no electrons on its left side",
            "write it as a reduction: Fe^3+ + e- to Fe^2+"
        );
}
