namespace Bittern.Diagnostics.Codes;

/// <summary>BT0153: cannot be counted as that.</summary>
public static class CannotCountAs
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0153",
            Severity.Error,
            "Cannot be counted as that",
            "a basis must share an element with what it counts, or be CaCO3 for equivalents"
        )
        {
            Explanation = """
                `as N`, `as SiO2`, `as CaO` say which formula a mass counts; it must share an element with the substance. `as CaCO3` counts equivalents,
                50.04 mg each, for every ion.
                """,
            Wrong = """
                use catalogue major
                liquor a { Na 5 mg/L as N }
                """,
            Right = """
                use catalogue major
                liquor a { NO3 5 mg/L as N }
                """,
        };

    public static Diagnostic At(SourceSpan span, string analyte, string basis) =>
        Descriptor.At(
            span,
            $"'{analyte}' cannot be counted as {basis}",
            "use a formula that shares the element, as in NO3 12 mg/L as N"
        );
}
