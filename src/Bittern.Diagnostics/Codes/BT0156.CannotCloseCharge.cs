namespace Bittern.Diagnostics.Codes;

/// <summary>BT0156: cannot close the charge.</summary>
public static class CannotCloseCharge
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0156",
            Severity.Error,
            "Cannot close the charge",
            "the balance is closed by adjusting an analysed ion"
        )
        {
            Explanation = """
                `charge closed by SO4` adjusts the analysed sulfate until the charges balance; best the ion whose analysis is least certain.
                """,
            Wrong = """
                use catalogue major
                liquor a { Ca 5 mg/L; charge closed by SO4 }
                """,
            Right = """
                use catalogue major
                liquor a { Ca 5 mg/L; SO4 10 mg/L; charge closed by SO4 }
                """,
        };

    public static Diagnostic At(SourceSpan span, string analyte, string? near) =>
        Descriptor.At(
            span,
            $"the charge cannot be closed by '{analyte}'",
            near is null ? "name a charged entry of this liquor" : $"did you mean '{near}'?"
        );
}
