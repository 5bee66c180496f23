namespace Bittern.Diagnostics.Codes;

/// <summary>BT5002: no allowed dose meets a target.</summary>
public static class TargetUnreachable
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT5002",
            Severity.Warning,
            "Target out of reach",
            "the stage goes on with the closest dose, so that everything after it is a best case"
        )
        {
            Explanation = """
                The search follows the quantity from no dose to the largest dose allowed. Some targets lie below what the chemistry lets any dose reach: the
                least solubility of an amphoteric hydroxide is a floor, and a complex can hold a metal in solution whatever the pH. The message gives the best
                value and its dose.
                """,
            Wrong = """
                recipe "Below the floor" { activity davies }
                use catalogue major, metals, redox
                liquor rinse { pH 3.0; Zn 40 mg/L; Cl 45 mg/L; charge closed by Cl }
                reagent caustic { NaOH 50 g/L }
                train t {
                    feed rinse
                    stage one {
                        add caustic until dissolved(Zn) <= 0.000001 mg/L
                        form zinc-hydroxide
                    }
                }
                """,
            Right = """
                recipe "Above the floor" { activity davies }
                use catalogue major, metals, redox
                liquor rinse { pH 3.0; Zn 40 mg/L; Cl 45 mg/L; charge closed by Cl }
                reagent caustic { NaOH 50 g/L }
                train t {
                    feed rinse
                    stage one {
                        add caustic until dissolved(Zn) <= 2 mg/L
                        form zinc-hydroxide
                    }
                }
                """,
            NeedsRun = true,
        };

    /// <summary>The diagnostic at a place.</summary>
    /// <param name="span">The action.</param>
    /// <param name="reagent">Name of the reagent.</param>
    /// <param name="largestDose">Largest dose looked at, with its unit.</param>
    /// <param name="target">The condition as written.</param>
    /// <param name="bestValue">Best value, with its unit.</param>
    /// <param name="bestDose">The dose that gives it, with its unit.</param>
    public static Diagnostic At(
        SourceSpan? span,
        string reagent,
        string largestDose,
        string target,
        string bestValue,
        string bestDose
    ) =>
        Descriptor.At(
            span,
            $"no dose of '{reagent}' up to {largestDose} meets '{target}'; the closest is {bestValue}, at {bestDose}",
            "raise the bound, choose another reagent, or look at which solid or complex holds the substance in solution"
        );
}
