using System.Globalization;
using System.Text;
using Bittern.Calculation;
using Bittern.Chemistry;

namespace Bittern.Reports.Writing;

/// <summary>
/// Q against Ksp with its numbers put in, so that a reader can repeat it with a pocket calculator and land on the same saturation index.
/// </summary>
internal static class SaturationArithmetic
{
    /// <summary>Pocket calculators hold powers of ten from -99 to 99.</summary>
    private const double CalculatorRange = 98;

    /// <summary>Plain text of four or five lines.</summary>
    public static string Lines(SaturationResult result)
    {
        // Rounding an activity moves log10 Q by its exponent times the rounding: more digits where exponents are large.
        var digits = result.Terms.Sum(t => Math.Abs(t.Coefficient)) > 6 ? 5 : 4;
        var text = new StringBuilder();
        text.Append(result.Solid.Written?.ToString() ?? result.Solid.Formula.Text).Append('\n');
        var products = result.Terms.Where(t => t.Coefficient > 0).ToArray();
        var reactants = result.Terms.Where(t => t.Coefficient < 0).ToArray();
        var name = ConstantName(result.Solid.Constant?.Form ?? ConstantForm.LogK);
        if (FitsCalculator(result))
        {
            text.Append("Q   = ")
                .Append(Quotient(products, reactants, t => "a(" + t.Species + ")"))
                .Append('\n');
            text.Append("    = ")
                .Append(Quotient(products, reactants, t => Digits.Factor(t.Activity, digits)))
                .Append('\n');
            text.Append("    = ").Append(Digits.PowerOfTen(result.Log10Q, 4)).Append('\n');
            text.Append(name.PadRight(4))
                .Append("= 10^")
                .Append(Log(result.Log10K))
                .Append(" = ")
                .Append(Digits.PowerOfTen(result.Log10K, 4))
                .Append('\n');
        }
        else
        {
            text.Append("log10 Q = ")
                .Append(Logarithms(result.Terms, t => "log10 a(" + t.Species + ")"))
                .Append('\n');
            text.Append("        = ")
                .Append(Logarithms(result.Terms, t => Parenthesised(Math.Log10(t.Activity))))
                .Append('\n');
            text.Append("        = ").Append(Log(result.Log10Q)).Append('\n');
            text.Append("log10 ")
                .Append(name)
                .Append(" = ")
                .Append(Log(result.Log10K))
                .Append('\n');
        }

        var comparison =
            Math.Abs(result.Index) < 1e-6 ? "saturated"
            : result.Index > 0 ? "supersaturated"
            : "undersaturated";
        text.Append("SI  = log10 Q - log10 ")
            .Append(name)
            .Append(" = ")
            .Append(Log(result.Log10Q))
            .Append(result.Log10K < 0 ? " + " : " - ")
            .Append(Log(Math.Abs(result.Log10K)))
            .Append(" = ")
            .Append(Digits.Index(result.Index))
            .Append(", Q/")
            .Append(name)
            .Append(" = ")
            .Append(Ratio(result.Index))
            .Append(" (")
            .Append(comparison)
            .Append(')');
        return text.ToString();
    }

    /// <summary>The saturation ratio Ω = Q/Ksp.</summary>
    public static string Ratio(double index) =>
        Math.Abs(index) < 1e-6 ? "1.00" : Digits.PowerOfTen(index);

    /// <summary>A logarithm to three decimals: what four digits of the number carry.</summary>
    public static string Log(double value) => Digits.Decimals(value, 3);

    /// <summary>Ksp is for dissolution into ions only; everything else is a K.</summary>
    public static string ConstantName(ConstantForm form) =>
        form switch
        {
            ConstantForm.Ksp or ConstantForm.LogKsp or ConstantForm.PKsp => "Ksp",
            ConstantForm.LogKH => "KH",
            _ => "K",
        };

    private static bool FitsCalculator(SaturationResult result) =>
        Math.Abs(result.Log10Q) < CalculatorRange
        && Math.Abs(result.Log10K) < CalculatorRange
        && result.Terms.All(t => Math.Abs(t.Coefficient * Math.Log10(t.Activity)) < CalculatorRange)
        && result
            .Terms.Where(t => t.Coefficient < 0)
            .Sum(t => Math.Abs(t.Coefficient * Math.Log10(t.Activity))) < CalculatorRange;

    private static string Quotient(
        ActivityTerm[] products,
        ActivityTerm[] reactants,
        Func<ActivityTerm, string> factor
    )
    {
        var over = products.Length == 0 ? "1" : Product(products, factor);
        if (reactants.Length == 0)
        {
            return over;
        }

        var under = Product(reactants, factor);
        return over + " / " + (reactants.Length > 1 ? "(" + under + ")" : under);
    }

    private static string Product(ActivityTerm[] terms, Func<ActivityTerm, string> factor) =>
        string.Join(
            " * ",
            terms.Select(t =>
                Math.Abs(t.Coefficient) == 1 ? factor(t) : factor(t) + "^" + Coefficient(t)
            )
        );

    private static string Logarithms(
        IEnumerable<ActivityTerm> terms,
        Func<ActivityTerm, string> factor
    )
    {
        var text = new StringBuilder();
        foreach (var term in terms.OrderByDescending(t => t.Coefficient > 0))
        {
            text.Append(
                (text.Length, term.Coefficient) switch
                {
                    (0, < 0) => "-",
                    (0, _) => "",
                    (_, < 0) => " - ",
                    _ => " + ",
                }
            );
            text.Append(Math.Abs(term.Coefficient) == 1 ? "" : Coefficient(term) + " * ")
                .Append(factor(term));
        }

        return text.ToString();
    }

    private static string Parenthesised(double log10) =>
        log10 < 0 ? "(" + Digits.Decimals(log10, 4) + ")" : Digits.Decimals(log10, 4);

    private static string Coefficient(ActivityTerm term) =>
        Math.Abs(term.Coefficient).ToString("0.######", CultureInfo.InvariantCulture);
}
