using System.Globalization;

namespace Bittern.Diagnostics.Codes;

/// <summary>BT0157: a number that looks like the wrong unit.</summary>
public static class UnitSuspected
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0157",
            Severity.Warning,
            "A number that looks like the wrong unit",
            "a charge balance this far off is rarely an analysis and often a unit"
        )
        {
            Explanation = """
                The charges of cations and anions differ by a factor of eight or more. No laboratory is that far off; an entry in g/L typed as mg/L, or a
                main ion left out, is the usual cause.
                """,
            Wrong = """
                use catalogue major
                liquor a { Na 10 g/L; Cl 15 mg/L }
                """,
            Right = """
                use catalogue major
                liquor a { Na 10 g/L; Cl 15 g/L }
                """,
        };

    public static Diagnostic At(SourceSpan span, string liquor, double cations, double anions) =>
        Descriptor.At(
            span,
            string.Create(
                CultureInfo.InvariantCulture,
                $"the analysis of '{liquor}' has {cations:0.###} eq/m3 of cations and {anions:0.###} eq/m3 of anions"
            ),
            "look for an entry in g/L typed as mg/L, or a missing main ion"
        );
}
