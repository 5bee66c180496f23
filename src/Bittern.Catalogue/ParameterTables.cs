using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using Bittern.Model;

namespace Bittern.Catalogue;

/// <summary>Tables of activity parameters for a domain's page, one a kind.</summary>
internal static class ParameterTables
{
    public static void Append(StringBuilder text, ImmutableArray<CatalogueParameter> parameters)
    {
        foreach (var kind in parameters.GroupBy(p => p.Parameter.Kind).OrderBy(g => g.Key))
        {
            var symbols = Symbols(kind.Key)
                .Where(s => kind.Any(p => p.Parameter.Values.ContainsKey(s.Key)))
                .ToImmutableArray();
            var uncertain = kind.Any(p => p.Parameter.Uncertainty is not null);
            text.Append(CultureInfo.InvariantCulture, $"\n## {Title(kind.Key)}\n\n| of |");
            text.Append(string.Concat(symbols.Select(s => $" {s.Heading} |")))
                .Append(uncertain ? " ± |" : "")
                .Append(" source | remark |\n|---|");
            text.Append(
                    string.Concat(Enumerable.Repeat("---:|", symbols.Length + (uncertain ? 1 : 0)))
                )
                .Append("---|---|\n");
            foreach (var (_, parameter, remark) in kind)
            {
                text.Append("| ")
                    .Append(string.Join(", ", parameter.Species.Select(s => $"`{s.Text}`")))
                    .Append(" |");
                foreach (var (key, _) in symbols)
                {
                    text.Append(' ')
                        .Append(
                            parameter.Values.TryGetValue(key, out var value) ? Number(value) : ""
                        )
                        .Append(" |");
                }

                if (uncertain)
                {
                    text.Append(' ')
                        .Append(parameter.Uncertainty is { } u ? Number(u) : "")
                        .Append(" |");
                }

                text.Append(
                    CultureInfo.InvariantCulture,
                    $" {parameter.Source?.Key}{(parameter.Recalled ? ", *recalled*" : "")} | {string.Join(' ', new[] { remark, parameter.Doubt }.OfType<string>().Where(t => t.Length > 0))} |\n"
                );
            }
        }
    }

    // The decimal type keeps small numbers out of exponent notation.
    private static string Number(double value) =>
        ((decimal)value).ToString("0.##########", CultureInfo.InvariantCulture);

    private static string Title(ActivityParameterKind kind) =>
        kind switch
        {
            ActivityParameterKind.IonSize => "Ion sizes",
            ActivityParameterKind.TruesdellJones => "a and b of Truesdell and Jones",
            ActivityParameterKind.Sit => "Specific ion interaction coefficients",
            ActivityParameterKind.Pitzer => "Cation-anion parameters (Pitzer)",
            ActivityParameterKind.PitzerSlope => "Their slopes at 25 °C, per K",
            ActivityParameterKind.Theta => "Mixing of two like ions, θ",
            ActivityParameterKind.Psi => "Mixing of three ions, ψ",
            ActivityParameterKind.Lambda => "Uncharged species with an ion, λ",
            ActivityParameterKind.Zeta => "Uncharged species with a salt, ζ",
            _ => throw new ArgumentOutOfRangeException(nameof(kind), kind, message: null),
        };

    private static ImmutableArray<(string Key, string Heading)> Symbols(
        ActivityParameterKind kind
    ) =>
        kind switch
        {
            ActivityParameterKind.IonSize => [("", "Å")],
            ActivityParameterKind.TruesdellJones => [("a", "a, Å"), ("b", "b, kg/mol")],
            ActivityParameterKind.Sit => [("epsilon", "ε, kg/mol"), ("", "ε, kg/mol")],
            ActivityParameterKind.Pitzer or ActivityParameterKind.PitzerSlope =>
            [
                ("beta0", "β0"),
                ("beta1", "β1"),
                ("beta2", "β2"),
                ("Cphi", "Cφ"),
                ("alpha1", "α1"),
                ("alpha2", "α2"),
            ],
            _ => [("", "value")],
        };
}
