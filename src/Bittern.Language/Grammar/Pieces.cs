using System.Collections.Immutable;
using Bittern.Language.Lexing;
using Bittern.Language.Syntax;
using Sprache;

namespace Bittern.Language.Grammar;

/// <summary>The small parts that declarations are made of.</summary>
internal static class Pieces
{
    /// <summary>One token of a kind.</summary>
    public static Parser<Token> Kind(char kind) => Where(t => t.Kind == kind);

    /// <summary>A keyword.</summary>
    public static Parser<Token> Word(string keyword) => Kind(Keywords.Of(keyword));

    /// <summary>A name; keywords count.</summary>
    public static readonly Parser<Token> Name = Where(t =>
        t.Kind == TokenKind.Name || Keywords.IsKeyword(t.Kind)
    );

    public static readonly Parser<Token> Formula = Kind(TokenKind.Formula);

    public static readonly Parser<Token> Text = Kind(TokenKind.Text);

    public static readonly Parser<Token> Number = Kind(TokenKind.Number);

    public static readonly Parser<Token> Unit = Kind(TokenKind.Unit);

    public static readonly Parser<Token> Comma = Kind(',');

    public static Parser<Token> Where(Func<Token, bool> accepts) =>
        input =>
            !input.AtEnd && accepts(((TokenInput)input).Token)
                ? Result.Success(((TokenInput)input).Token, input.Advance())
                : Result.Failure<Token>(input, "unexpected", []);

    /// <summary>The parser or null.</summary>
    public static Parser<T?> Maybe<T>(Parser<T> parser)
        where T : class => parser.Optional().Select(o => o.IsDefined ? o.Get() : null);

    public static readonly Parser<UncertaintySyntax> Uncertainty =
        from sign in Kind(TokenKind.PlusMinus)
        from number in Number
        from unit in Maybe(Unit)
        select new UncertaintySyntax(number, unit);

    public static readonly Parser<ValueSyntax> Value =
        from number in Number
        from unit in Maybe(Unit)
        from uncertainty in Maybe(Uncertainty)
        select new ValueSyntax(null, number, unit, uncertainty);

    public static readonly Parser<ValueSyntax> MeasuredValue =
        from below in Maybe(Kind('<'))
        from value in Value
        select value with
        {
            Below = below,
        };

    private static readonly Parser<TermSyntax> Term =
        from number in Maybe(Number)
        from species in Formula
        select new TermSyntax(number?.Number ?? 1, species);

    public static readonly Parser<ImmutableArray<TermSyntax>> Side =
        from first in Term
        from rest in (
            from sign in Kind('+').Or(Kind('-'))
            from term in Term
            select sign.Kind == '+' ? term : term with { Coefficient = -term.Coefficient }
        ).Many()
        select ImmutableArray.CreateRange(rest.Prepend(first));

    public static readonly Parser<ReactionSyntax> Dissolution =
        from left in Side
        from to in Word("to")
        from right in Side
        select new ReactionSyntax(left, right);

    public static readonly Parser<ImmutableArray<Token>> Names =
        from first in Name
        from rest in (from comma in Comma from name in Name select name).Many()
        select ImmutableArray.CreateRange(rest.Prepend(first));

    private static readonly Parser<Token> AsFormula =
        from word in Word("as")
        from formula in Formula
        select formula;

    private static readonly Parser<Token> AsDetection =
        from word in Word("as")
        from choice in Word("zero").Or(Word("half")).Or(Word("limit"))
        select choice;

    public static readonly Parser<EntrySyntax> PlainEntry =
        from analyte in Formula.Or(Kind(TokenKind.Nuclide))
        from value in MeasuredValue
        from asFormula in Maybe(AsFormula)
        from late in Maybe(Uncertainty)
        from detection in Maybe(AsDetection)
        select new EntrySyntax(
            analyte,
            late is null ? value : value with { Uncertainty = late },
            asFormula,
            detection,
            []
        );

    public static readonly Parser<EntrySyntax> Entry =
        from whole in PlainEntry
        from parts in (
            from comma in Comma
            from of in Word("of")
            from which in Word("which")
            from part in PlainEntry
            select part
        ).Many()
        select whole with
        {
            OfWhich = [.. parts],
        };

    public static readonly Parser<DoseSyntax> Dose =
        from value in Value
        from asFormula in Maybe(AsFormula)
        select new DoseSyntax(value, asFormula);

    private static readonly Parser<(Token Argument, Token? As)> Argument =
        from open in Kind('(')
        from argument in Formula.Or(Name)
        from asFormula in Maybe(AsFormula)
        from close in Kind(')')
        select (argument, asFormula);

    public static readonly Parser<QuantitySyntax> Quantity =
        from name in Name
        from argument in Argument.Optional()
        select argument.IsDefined
            ? new QuantitySyntax(name, argument.Get().Argument, argument.Get().As)
            : new QuantitySyntax(name, null, null);

    public static readonly Parser<ConditionSyntax> Condition = (
        from quantity in Quantity
        from comparison in Where(t =>
            t.Kind is '<' or '>' or '=' or TokenKind.AtMost or TokenKind.AtLeast
        )
        from value in Value
        select new ConditionSyntax(quantity, comparison, value, null)
    ).Or(
        from quantity in Quantity
        from within in Word("within")
        from low in Value
        from range in Kind(TokenKind.Range)
        from high in Value
        select new ConditionSyntax(quantity, within, low, high)
    );
}
