namespace Bittern.Diagnostics.Codes;

/// <summary>BT0163: a quantity that nothing declares.</summary>
public static class UnknownQuantity
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0163",
            Severity.Error,
            "A quantity that nothing declares",
            "a condition on an unknown quantity cannot be judged"
        )
        {
            Explanation = """
                Conditions compare a quantity of a solved state with a number.
                """,
            Wrong = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                train t { feed pond }
                limits "l" on t { disolved(Ca) <= 5 mg/L }
                """,
            Right = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                train t { feed pond }
                limits "l" on t { dissolved(Ca) <= 5 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, string name, string? near) =>
        Descriptor.At(
            span,
            $"there is no quantity '{name}' like this",
            near is null
                ? "known: pH, dissolved(X), total(X), SI(solid), formed(solid), ionic-strength, TDS"
                : $"did you mean '{near}'? (pH, dissolved(X), total(X), SI(solid), formed(solid), ionic-strength, TDS)"
        );
}
