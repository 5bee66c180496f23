using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;
using Bittern.Language.Grammar;
using Bittern.Language.Lexing;
using Bittern.Language.Syntax;
using Bittern.Model;

namespace Bittern.Language.Binding;

/// <summary>Reads the declarations of activity parameters.</summary>
internal static class ActivityParameters
{
    private sealed record Rule(
        ActivityParameterKind Kind,
        int Species,
        string Shape,
        params string[] Symbols
    );

    private static Rule RuleOf(string keyword) =>
        keyword switch
        {
            "ion-size" => new(ActivityParameterKind.IonSize, 1, "ion-size Ca^2+ 6 Å [source]", ""),
            "truesdell-jones" => new(
                ActivityParameterKind.TruesdellJones,
                1,
                "truesdell-jones Ca^2+ a 5.0 Å, b 0.165 kg/mol [source]",
                "a",
                "b"
            ),
            "sit" => new(
                ActivityParameterKind.Sit,
                2,
                "sit Na+ Cl- ε 0.03 ± 0.01 kg/mol [source]",
                "epsilon",
                ""
            ),
            "pitzer" => new(
                ActivityParameterKind.Pitzer,
                2,
                "pitzer Na+ Cl- β0 0.0765, β1 0.2664, Cφ 0.00127 [source]",
                "beta0",
                "beta1",
                "beta2",
                "Cphi",
                "alpha1",
                "alpha2"
            ),
            "pitzer-slope" => new(
                ActivityParameterKind.PitzerSlope,
                2,
                "pitzer-slope Na+ Cl- β0 0.00072, β1 0.00070, Cφ -0.00011 per K [source]",
                "beta0",
                "beta1",
                "beta2",
                "Cphi"
            ),
            "theta" => new(ActivityParameterKind.Theta, 2, "theta Na+ K+ -0.012 [source]", ""),
            "psi" => new(ActivityParameterKind.Psi, 3, "psi Na+ K+ Cl- -0.0018 [source]", ""),
            "lambda" => new(ActivityParameterKind.Lambda, 2, "lambda CO2(aq) Na+ 0.1 [source]", ""),
            _ => new(
                ActivityParameterKind.Zeta,
                3,
                "zeta B(OH)3(aq) Na+ SO4^2- 0.046 [source]",
                ""
            ),
        };

    /// <summary>The parameter of an item; null with a diagnostic when it is not understood.</summary>
    public static ActivityParameter? Read(
        Item item,
        FormulaReader formulas,
        IReadOnlyDictionary<string, Citation> citations,
        ICollection<(string, SourceSpan)> open,
        ICollection<Diagnostic> diagnostics
    )
    {
        var keyword = item.Head[0].Text;
        var rule = RuleOf(keyword);
        if (
            HeadReader.Read(ActivityDeclarations.After(keyword), item, rule.Shape, diagnostics)
            is not { } syntax
        )
        {
            return null;
        }

        if (syntax.Species.Length != rule.Species)
        {
            diagnostics.Add(
                Unexpected.At(syntax.Species[^1].Span, syntax.Species[^1].Text, rule.Shape)
            );
            return null;
        }

        var species = ImmutableArray.CreateBuilder<Formula>();
        foreach (var token in syntax.Species)
        {
            if (!formulas.TryRead(token.Text, out var formula, out var fault))
            {
                diagnostics.Add(NotAFormula.At(token.Span, token.Text, fault!.Message, null));
                return null;
            }

            species.Add(formula!);
        }

        var values = ImmutableSortedDictionary.CreateBuilder<string, double>(
            StringComparer.Ordinal
        );
        foreach (var value in syntax.Values)
        {
            var symbol = value.Symbol?.Text ?? "";
            if (
                !rule.Symbols.Contains(symbol, StringComparer.Ordinal) || values.ContainsKey(symbol)
            )
            {
                diagnostics.Add(
                    Unexpected.At((value.Symbol ?? value.Value.Number).Span, symbol, rule.Shape)
                );
                return null;
            }

            values.Add(symbol, value.Value.Number.Number);
        }

        return WithOptions(
            syntax,
            rule.Kind,
            species.ToImmutable(),
            values.ToImmutable(),
            item.Span,
            citations,
            open,
            diagnostics
        );
    }

    private static ActivityParameter WithOptions(
        ParameterSyntax syntax,
        ActivityParameterKind kind,
        ImmutableArray<Formula> species,
        ImmutableSortedDictionary<string, double> values,
        SourceSpan span,
        IReadOnlyDictionary<string, Citation> citations,
        ICollection<(string, SourceSpan)> open,
        ICollection<Diagnostic> diagnostics
    )
    {
        Citation? source = null;
        var recalled = false;
        string? doubt = null;
        foreach (var option in syntax.Options)
        {
            switch (option)
            {
                case ConstantOption.Cited cited:
                    source =
                        citations.GetValueOrDefault(cited.Key.Text)
                        ?? new Citation(cited.Key.Text, "");
                    if (source.Text.Length == 0)
                    {
                        open.Add((cited.Key.Text, cited.Key.Span));
                    }

                    break;
                case ConstantOption.Recalled:
                    recalled = true;
                    break;
                case ConstantOption.Doubt text:
                    doubt = text.Text.Text;
                    break;
            }
        }

        if (source is null)
        {
            diagnostics.Add(NoCitation.At(span));
        }

        var uncertainty =
            syntax.Values.Length == 1 ? syntax.Values[0].Value.Uncertainty?.Number.Number : null;
        return new ActivityParameter(
            kind,
            species,
            values,
            uncertainty,
            source,
            recalled,
            doubt,
            span
        );
    }
}
