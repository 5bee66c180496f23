using Bittern.Calculation;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>The activity model in one line, its parameters that mattered with their sources, and the ions that have none.</summary>
internal static class ActivityParametersSection
{
    public static void Write(MarkdownWriter writer, Outcome outcome)
    {
        writer.Heading(3, "Activity coefficients");
        var model = outcome.Recipe.Header.ActivityModel;
        writer.Paragraph(Equation(model));
        var table = new MarkdownTable("Parameter", "Of", "Value", "Source");
        foreach (var parameter in MatteringParameters.Of(outcome))
        {
            table.Row(
                Name(parameter.Kind),
                string.Join(", ", parameter.Species.Select(s => MarkdownText.Escape(s.Text))),
                Values(parameter),
                ConstantsSection.Source(parameter.Source, parameter.Recalled)
            );
        }

        writer.Table(table);
        var without = MatteringParameters.IonsWithout(outcome);
        if (!without.IsEmpty)
        {
            writer.Paragraph(
                "Without a parameter of their own: "
                    + string.Join(", ", without.Select(MarkdownText.Escape))
                    + ". "
                    + Instead(model)
            );
        }
    }

    private static string Equation(string model) =>
        model switch
        {
            ActivityModelNames.Ideal => "Ideal: every activity coefficient is 1.",
            ActivityModelNames.Davies =>
                "Davies equation: log10 γ = -A z² (√I/(1 + √I) - 0.3 I); uncharged species γ = 1. Davies 1962, Ion Association, Butterworths. "
                    + "Trusted to I = 0.5 mol/kg (common practice; fitted to about 0.1).",
            ActivityModelNames.DebyeHuckel =>
                "Debye-Hückel equation with ion sizes: log10 γ = -A z² √I/(1 + B a √I); uncharged species γ = 1. Debye and Hückel 1923; Kielland 1937, J. Am. Chem. Soc. 59, 1675. "
                    + "Trusted to I = 0.1 mol/kg.",
            ActivityModelNames.TruesdellJones =>
                "Truesdell-Jones equation: log10 γ = -A z² √I/(1 + B a √I) + b I; uncharged species log10 γ = 0.1 I. Truesdell and Jones 1974, J. Res. USGS 2, 233. "
                    + "Trusted to I = 1 mol/kg where sodium chloride dominates (common practice).",
            ActivityModelNames.Sit =>
                "Specific ion interaction (SIT): log10 γ = -A z² √I/(1 + 1.5 √I) + Σ ε m. Grenthe et al. 1992 (NEA), appendix B. Trusted to I = 3.5 mol/kg.",
            ActivityModelNames.Pitzer =>
                "Pitzer equations with unsymmetrical mixing. Pitzer 1973, J. Phys. Chem. 77, 268; Pitzer 1975, J. Solution Chem. 4, 249; Harvie, Møller and Weare 1984, Geochim. Cosmochim. Acta 48, 723.",
            _ => "Model: " + MarkdownText.Escape(model) + ".",
        };

    private static string Instead(string model) =>
        model switch
        {
            ActivityModelNames.DebyeHuckel =>
                "They take B a = 1 (Güntelberg 1926), a size near 3 Å.",
            ActivityModelNames.TruesdellJones => "They follow the Davies equation.",
            _ =>
                "They get the long-range term alone, which may be far off for an ion that is not a trace.",
        };

    private static string Name(ActivityParameterKind kind) =>
        kind switch
        {
            ActivityParameterKind.IonSize => "a (Å)",
            ActivityParameterKind.TruesdellJones => "a (Å), b (kg/mol)",
            ActivityParameterKind.Sit => "ε (kg/mol)",
            ActivityParameterKind.Pitzer => "β (kg/mol), Cφ (kg²/mol²)",
            ActivityParameterKind.PitzerSlope => "their slopes (per K)",
            ActivityParameterKind.Theta => "θ (kg/mol)",
            ActivityParameterKind.Psi => "ψ (kg²/mol²)",
            ActivityParameterKind.Lambda => "λ (kg/mol)",
            _ => "ζ (kg²/mol²)",
        };

    private static string Values(ActivityParameter parameter) =>
        string.Join(
            ", ",
            parameter
                .Values.OrderBy(v => Order.IndexOf(v.Key))
                .Select(v =>
                    (parameter.Values.Count == 1 ? "" : Symbol(v.Key) + " ")
                    + Digits.AsTyped(v.Value)
                )
        ) + (parameter.Uncertainty is { } u ? " ± " + Digits.Trimmed(u, 2) : "");

    // As papers list them.
    private static readonly List<string> Order =
    [
        "",
        "a",
        "b",
        "epsilon",
        "beta0",
        "beta1",
        "beta2",
        "Cphi",
        "alpha1",
        "alpha2",
    ];

    private static string Symbol(string key) =>
        key switch
        {
            "beta0" => "β0",
            "beta1" => "β1",
            "beta2" => "β2",
            "Cphi" => "Cφ",
            "alpha1" => "α1",
            "alpha2" => "α2",
            _ => key,
        };
}
