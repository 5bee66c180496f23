namespace Bittern.Diagnostics.Codes;

/// <summary>BT0160: a name that nothing declares.</summary>
public static class UnknownName
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0160",
            Severity.Error,
            "A name that nothing declares",
            "a misspelt name would otherwise calculate something else"
        )
        {
            Explanation = """
                Names are matched letter by letter.
                """,
            Wrong = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                train t { feed pont }
                """,
            Right = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                train t { feed pond }
                """,
        };

    public static Diagnostic At(
        SourceSpan span,
        string name,
        string kind,
        string? near,
        IEnumerable<string>? all = null
    ) =>
        Descriptor.At(
            span,
            $"there is no {kind} '{name}'",
            near is not null ? $"did you mean '{near}'?"
                : all is not null ? $"known: {string.Join(", ", all)}"
                : $"declare it: {kind} {name} {{ … }}"
        );
}
