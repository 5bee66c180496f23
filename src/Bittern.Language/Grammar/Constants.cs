using System.Collections.Immutable;
using Bittern.Language.Lexing;
using Bittern.Language.Syntax;
using Sprache;

namespace Bittern.Language.Grammar;

/// <summary>Equilibrium constants: <c>log K 2.30 ± 0.05, ΔH 6.9 kJ/mol [key]</c>, or an expression in T.</summary>
internal static class Constants
{
    /// <summary>Brackets inside brackets that an expression may have; deeper ones are refused before the grammar sees them.</summary>
    public const int MaxNesting = 100;

    private static readonly Parser<ExpressionSyntax> Expression = Parse.Ref(() => Sum!);

    private static readonly Parser<ExpressionSyntax> Primary = (
        from number in Pieces.Number
        select (ExpressionSyntax)new ExpressionSyntax.Literal(number, number.Number)
    )
        .XOr(
            from open in Pieces.Kind('(')
            from inner in Expression
            from close in Pieces.Kind(')')
            select inner
        )
        .XOr(
            from name in Pieces.Name
            from argument in (
                from open in Pieces.Kind('(')
                from inner in Expression
                from close in Pieces.Kind(')')
                select inner
            ).Optional()
            select argument.IsDefined
                ? new ExpressionSyntax.Call(name, argument.Get())
                : (ExpressionSyntax)new ExpressionSyntax.Variable(name)
        )
        .XOr(
            from minus in Pieces.Kind('-')
            from operand in Parse.Ref(() => Power!)
            select (ExpressionSyntax)new ExpressionSyntax.Negation(operand)
        );

    private static readonly Parser<ExpressionSyntax> Power =
        from baseExpression in Primary
        from exponent in (from hat in Pieces.Kind('^') from e in Primary select e).Optional()
        select exponent.IsDefined
            ? new ExpressionSyntax.Binary('^', baseExpression, exponent.Get())
            : baseExpression;

    private static readonly Parser<ExpressionSyntax> Product = Parse.ChainOperator(
        Pieces.Kind('*').Or(Pieces.Kind('/')),
        Power,
        (op, left, right) => new ExpressionSyntax.Binary(op.Kind, left, right)
    );

    private static readonly Parser<ExpressionSyntax> Sum = Parse.ChainOperator(
        Pieces.Kind('+').Or(Pieces.Kind('-')),
        Product,
        (op, left, right) => new ExpressionSyntax.Binary(op.Kind, left, right)
    );

    private static readonly Parser<ConstantOption> Option = (
        from word in Pieces.Where(t => t.Kind == TokenKind.Name && t.Text is "dH")
        from value in Pieces.Value
        select (ConstantOption)new ConstantOption.Enthalpy(value)
    )
        .XOr(
            from word in Pieces.Word("valid")
            from low in Pieces.Number
            from range in Pieces.Kind(TokenKind.Range)
            from high in Pieces.Number
            from unit in Pieces.Maybe(Pieces.Unit)
            select (ConstantOption)new ConstantOption.Valid(low, high, unit)
        )
        .XOr(
            from open in Pieces.Kind('[')
            from key in Pieces.Name
            from close in Pieces.Kind(']')
            select (ConstantOption)new ConstantOption.Cited(key)
        )
        .XOr(
            from word in Pieces.Word("recalled")
            select (ConstantOption)new ConstantOption.Recalled(word)
        )
        .XOr(
            from word in Pieces.Word("doubt")
            from text in Pieces.Text
            select (ConstantOption)new ConstantOption.Doubt(text)
        )
        .XOr(
            from held in Pieces.Word("held")
            from back in Pieces.Word("back")
            from because in Pieces.Word("because")
            from text in Pieces.Text
            select (ConstantOption)new ConstantOption.HeldBack(text)
        )
        .XOr(
            from word in Pieces.Word("because")
            from text in Pieces.Text
            select (ConstantOption)new ConstantOption.Reason(text)
        );

    /// <summary>One option that may follow a constant or a parameter.</summary>
    public static Parser<ConstantOption> AnyOption => Option;

    private static readonly Parser<Token> Name = Pieces.Where(t =>
        (t.Kind == TokenKind.Formula && t.Text is "K" or "Ksp" or "KH")
        || (t.Kind == TokenKind.Name && t.Text is "pKsp" or "pK")
    );

    /// <summary>A constant and all that is said about it.</summary>
    public static readonly Parser<ConstantSyntax> Constant =
        from log in Pieces.Maybe(Pieces.Word("log"))
        from name in Name
        from equalsSign in Pieces.Maybe(Pieces.Kind('='))
        from value in Spanned(Expression)
        from uncertainty in Pieces.Maybe(Pieces.Uncertainty)
        from options in (
            from comma in Pieces.Maybe(Pieces.Comma)
            from option in Option
            select option
        ).Many()
        select new ConstantSyntax(log, name, value.Node, uncertainty, [.. options])
        {
            ValueSpan = value.Span,
        };

    private static Parser<(ExpressionSyntax Node, Diagnostics.SourceSpan Span)> Spanned(
        Parser<ExpressionSyntax> parser
    ) =>
        input =>
        {
            var result = parser(input);
            if (!result.WasSuccessful)
            {
                return Result.Failure<(ExpressionSyntax, Diagnostics.SourceSpan)>(
                    result.Remainder,
                    result.Message,
                    result.Expectations
                );
            }

            var start = ((TokenInput)input).Token.Span;
            var end = start;
            for (
                var at = (TokenInput)input;
                at.Position < result.Remainder.Position;
                at = (TokenInput)at.Advance()
            )
            {
                end = at.Token.Span;
            }

            return Result.Success((result.Value, start.To(end)), result.Remainder);
        };
}
