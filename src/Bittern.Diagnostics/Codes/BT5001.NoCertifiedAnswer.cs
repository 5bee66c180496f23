namespace Bittern.Diagnostics.Codes;

/// <summary>BT5001: the solver returned no answer that its certificate accepts.</summary>
public static class NoCertifiedAnswer
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT5001",
            Severity.Error,
            "No certified answer",
            "a number without a certificate must not be used"
        )
        {
            Explanation = """
                Every equilibrium is checked by code apart from the solver: balances, charge and the saturation of every solid that may form. When no state
                passes, the run stops there and says which balance or solid stood in the way. The usual causes are a liquor with almost no water, an analysis
                whose charges cannot be balanced, or constants that contradict each other.
                """,
            Wrong = """
                recipe "No water left" { activity davies }
                use catalogue major, salts
                liquor crust { pH 7.0; density 1200 kg/m3; Na 700 g/L; Cl 1080 g/L }
                train try {
                    feed crust
                    stage one { form halite }
                }
                """,
            Right = """
                recipe "A brine" { activity davies }
                use catalogue major, salts
                liquor brine { pH 7.0; Na 20 g/L; Cl 30.8 g/L; charge closed by Cl }
                train try {
                    feed brine
                    stage one { form halite }
                }
                """,
            NeedsRun = true,
        };

    /// <summary>The diagnostic at a place.</summary>
    /// <param name="span">The liquor or the action that has no answer.</param>
    /// <param name="where">In words: <c>stage 'primary' of train 'treatment'</c>, <c>liquor 'adit'</c>.</param>
    /// <param name="reason">One clause.</param>
    public static Diagnostic At(SourceSpan? span, string where, string reason) =>
        Descriptor.At(
            span,
            $"there is no certified answer for {where}: {reason}",
            "check the analysis and the constants of what is named here; the report's basis section shows what went in"
        );
}
