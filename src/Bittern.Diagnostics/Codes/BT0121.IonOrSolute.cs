namespace Bittern.Diagnostics.Codes;

/// <summary>BT0121: ion for charged, solute for uncharged.</summary>
public static class IonOrSolute
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0121",
            Severity.Error,
            "ion for charged, solute for uncharged",
            "the charge decides how activity and charge balance count the species"
        )
        {
            Explanation = """
                `ion` and `solute` declare primary species, which other species are written over: an ion carries a charge, a solute does not.
                """,
            Wrong = """
                ion H4SiO4(aq)
                """,
            Right = """
                solute H4SiO4(aq)
                """,
        };

    public static Diagnostic At(SourceSpan span, string formula, int charge) =>
        Descriptor.At(
            span,
            $"{formula} has the charge {charge}",
            charge == 0 ? $"write: solute {formula}" : $"write: ion {formula}"
        );
}
