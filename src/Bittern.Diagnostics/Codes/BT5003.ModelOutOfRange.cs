using System.Globalization;

namespace Bittern.Diagnostics.Codes;

/// <summary>BT5003: a state lies outside the range in which the activity model is trusted.</summary>
public static class ModelOutOfRange
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT5003",
            Severity.Warning,
            "Activity model out of its range",
            "activity coefficients, and with them every solubility there, may be off by tens of per cent"
        )
        {
            Explanation = """
                Each activity model was fitted to solutions up to some ionic strength. Beyond it the equations still give numbers, but nobody has shown that they
                are right. The report marks every number of such a state.
                """,
            Wrong = """
                recipe "Brine with a model for dilute water" { activity davies }
                use catalogue major, salts
                liquor brine { pH 7.0; Na 60 g/L; Cl 92.5 g/L; charge closed by Cl }
                train t {
                    feed brine
                    stage one { form halite }
                }
                """,
            Right = """
                recipe "Dilute water" { activity davies }
                use catalogue major, salts
                liquor brackish { pH 7.0; Na 2 g/L; Cl 3.08 g/L; charge closed by Cl }
                train t {
                    feed brackish
                    stage one { form halite }
                }
                """,
            NeedsRun = true,
        };

    /// <summary>The diagnostic at a place.</summary>
    /// <param name="span">The liquor or stage.</param>
    /// <param name="where">In words: <c>stage 'primary'</c>.</param>
    /// <param name="ionicStrength">mol/kg.</param>
    /// <param name="model">The activity model's name.</param>
    /// <param name="trustedUpTo">mol/kg.</param>
    public static Diagnostic At(
        SourceSpan? span,
        string where,
        double ionicStrength,
        string model,
        double trustedUpTo
    ) =>
        Descriptor.At(
            span,
            string.Create(
                CultureInfo.InvariantCulture,
                $"the ionic strength in {where} is {ionicStrength:0.00} mol/kg; the activity model '{model}' is trusted up to {trustedUpTo:0.###} mol/kg"
            ),
            "treat the numbers as indicative, or use a model made for brines"
        );
}
