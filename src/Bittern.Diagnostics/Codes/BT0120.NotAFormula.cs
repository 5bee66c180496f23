namespace Bittern.Diagnostics.Codes;

/// <summary>BT0120: not a chemical formula.</summary>
public static class NotAFormula
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0120",
            Severity.Error,
            "Not a chemical formula",
            "elements and charge are computed from the formula, so every symbol must be known"
        )
        {
            Explanation = """
                Formulas are written in plain text: symbols and counts, brackets, `·` before water, a charge at the end, and `(aq)`, `(g)`, `(s)` or `(l)`
                where the state must be said. A symbol that is no element is an error, unless the recipe declares it: `element Hu 1000 g/mol`.
                """,
            Wrong = """
                use catalogue major
                liquor a { Xq 5 mg/L }
                """,
            Right = """
                use catalogue major
                liquor a { Ca 5 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, string text, string fault, string? near) =>
        Descriptor.At(
            span,
            $"'{text}' is no formula: {fault}",
            near is null
                ? "element symbols start with a capital; brackets and charges as in Fe(OH)3 and SO4^2-"
                : $"did you mean '{near}'?"
        );
}
