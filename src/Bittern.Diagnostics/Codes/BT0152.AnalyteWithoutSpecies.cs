namespace Bittern.Diagnostics.Codes;

/// <summary>BT0152: nothing in the recipe holds this.</summary>
public static class AnalyteWithoutSpecies
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0152",
            Severity.Error,
            "Nothing in the recipe holds this",
            "what has no species cannot be calculated with"
        )
        {
            Explanation = """
                An analysis names elements (`Ca`), states (`Fe(II)`), groups (`SO4`, `HCO3`) or compounds (`NaCl`, `Ca(OH)2`). Each must be made up of
                declared ions and solutes, H+ and water, without oxidising or reducing anything.
                """,
            Wrong = """
                use catalogue major
                liquor a { Zn 5 mg/L }
                """,
            Right = """
                use catalogue major, metals
                liquor a { Zn 5 mg/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, string analyte) =>
        Descriptor.At(
            span,
            $"no species of this recipe holds '{analyte}'",
            "use the catalogue that has it (bittern catalogue lists them), or declare its ion"
        );
}
