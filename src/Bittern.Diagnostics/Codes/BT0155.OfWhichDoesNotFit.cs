namespace Bittern.Diagnostics.Codes;

/// <summary>BT0155: parts that do not fit the whole.</summary>
public static class OfWhichDoesNotFit
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0155",
            Severity.Error,
            "Parts that do not fit the whole",
            "the rest must be positive and belong to one other oxidation state, in the same kind of unit"
        )
        {
            Explanation = """
                `Fe 1420 mg/L, of which Fe(II) 640 mg/L` gives the rest, Fe(III), by difference.
                """,
            Wrong = """
                use catalogue major, metals
                liquor a { Fe 5 mg/L, of which Fe(II) 6 mg/L }
                """,
            Right = """
                use catalogue major, metals
                liquor a { Fe 7 mg/L, of which Fe(II) 6 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, string analyte) =>
        Descriptor.At(
            span,
            $"the parts of '{analyte}' do not fit its total",
            "check the numbers; parts are oxidation states, as in Fe 1420 mg/L, of which Fe(II) 640 mg/L"
        );
}
