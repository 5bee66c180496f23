using System.Globalization;

namespace Bittern.Diagnostics.Codes;

/// <summary>BT0122: a reaction does not balance.</summary>
public static class Unbalanced
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0122",
            Severity.Error,
            "A reaction does not balance",
            "an unbalanced reaction makes or loses matter in every calculation"
        )
        {
            Explanation = """
                Elements and charge are counted on both sides, with all coefficients; a term behind a minus counts on the other side. H+, OH- and water are
                often what is missing.
                """,
            Wrong = """
                use catalogue major
                cite x "own"
                complex CaF+ from Ca^2+ + 2 F-   log K 0.94 [x]
                """,
            Right = """
                use catalogue major
                cite x "own"
                complex CaF2(aq) from Ca^2+ + 2 F-   log K 0.94 [x]
                """,
        };

    public static Diagnostic At(
        SourceSpan span,
        string reaction,
        IReadOnlyDictionary<string, double> surplus
    ) =>
        Descriptor.At(
            span,
            $"{reaction} does not balance: the right side has {Surplus(surplus)}",
            "correct the coefficients or the formula"
        );

    private static string Surplus(IReadOnlyDictionary<string, double> surplus) =>
        string.Join(
            ", ",
            surplus.Select(s =>
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"{(s.Value > 0 ? "+" : "")}{s.Value:0.######} {s.Key}"
                )
            )
        );
}
