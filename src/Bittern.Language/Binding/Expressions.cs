using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;
using Bittern.Language.Syntax;

namespace Bittern.Language.Binding;

/// <summary>Expressions in T, the temperature in kelvin.</summary>
internal static class Expressions
{
    private static readonly string[] Functions = ["log10", "ln", "exp", "sqrt"];

    /// <summary>True when every name in it is known; else a diagnostic for each.</summary>
    public static bool Check(ExpressionSyntax expression, ICollection<Diagnostic> diagnostics)
    {
        switch (expression)
        {
            case ExpressionSyntax.Variable { Name: var name } when name.Text is not "T":
                diagnostics.Add(
                    UnknownInExpression.At(
                        name.Span,
                        name.Text,
                        Chemistry.EditDistance.Closest(name.Text, Functions)
                    )
                );
                return false;
            case ExpressionSyntax.Call call
                when !Functions.Contains(call.Function.Text, StringComparer.Ordinal):
                diagnostics.Add(
                    UnknownInExpression.At(
                        call.Function.Span,
                        call.Function.Text,
                        Chemistry.EditDistance.Closest(call.Function.Text, Functions)
                    )
                );
                return false;
            case ExpressionSyntax.Call call:
                return Check(call.Argument, diagnostics);
            case ExpressionSyntax.Negation negation:
                return Check(negation.Operand, diagnostics);
            case ExpressionSyntax.Binary binary:
                return Check(binary.Left, diagnostics) & Check(binary.Right, diagnostics);
            default:
                return true;
        }
    }

    /// <summary>True when T does not occur.</summary>
    public static bool IsConstant(ExpressionSyntax expression) =>
        expression switch
        {
            ExpressionSyntax.Variable => false,
            ExpressionSyntax.Call call => IsConstant(call.Argument),
            ExpressionSyntax.Negation negation => IsConstant(negation.Operand),
            ExpressionSyntax.Binary binary => IsConstant(binary.Left) && IsConstant(binary.Right),
            _ => true,
        };

    /// <summary>Value at a temperature in kelvin; the expression was checked.</summary>
    public static double Evaluate(ExpressionSyntax expression, double kelvin) =>
        expression switch
        {
            ExpressionSyntax.Literal literal => literal.Value,
            ExpressionSyntax.Variable => kelvin,
            ExpressionSyntax.Negation negation => -Evaluate(negation.Operand, kelvin),
            ExpressionSyntax.Call call => Apply(
                call.Function.Text,
                Evaluate(call.Argument, kelvin)
            ),
            ExpressionSyntax.Binary binary => Apply(
                binary.Operator,
                Evaluate(binary.Left, kelvin),
                Evaluate(binary.Right, kelvin)
            ),
            _ => throw new InvalidOperationException("unknown expression"),
        };

    private static double Apply(string function, double x) =>
        function switch
        {
            "log10" => Math.Log10(x),
            "ln" => Math.Log(x),
            "exp" => Math.Exp(x),
            _ => Math.Sqrt(x),
        };

    private static double Apply(char op, double a, double b) =>
        op switch
        {
            '+' => a + b,
            '-' => a - b,
            '*' => a * b,
            '/' => a / b,
            _ => Math.Pow(a, b),
        };
}
