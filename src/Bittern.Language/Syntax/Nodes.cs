using System.Collections.Immutable;
using Bittern.Diagnostics;
using Bittern.Language.Lexing;

namespace Bittern.Language.Syntax;

/// <summary>A value as written: <c>41 mg/L ± 4 %</c>, <c>&lt; 0.01 mg/L</c>.</summary>
public sealed record ValueSyntax(
    Token? Below,
    Token Number,
    Token? Unit,
    UncertaintySyntax? Uncertainty
)
{
    public SourceSpan Span =>
        (Below ?? Number).Span.To(
            (Uncertainty?.Unit ?? Uncertainty?.Number ?? Unit ?? Number).Span
        );
}

/// <summary><c>± 0.05</c> or <c>± 4 %</c>.</summary>
public sealed record UncertaintySyntax(Token Number, Token? Unit);

/// <summary>A term of a reaction; the coefficient is negative behind a minus.</summary>
public sealed record TermSyntax(double Coefficient, Token Species);

/// <summary>A reaction: what stands on each side of <c>to</c>, or of <c>from</c> turned round.</summary>
public sealed record ReactionSyntax(
    ImmutableArray<TermSyntax> Left,
    ImmutableArray<TermSyntax> Right
);

/// <summary>An expression in T. Closed set.</summary>
public abstract record ExpressionSyntax
{
    public sealed record Literal(Token Number, double Value) : ExpressionSyntax;

    public sealed record Variable(Token Name) : ExpressionSyntax;

    public sealed record Negation(ExpressionSyntax Operand) : ExpressionSyntax;

    public sealed record Binary(char Operator, ExpressionSyntax Left, ExpressionSyntax Right)
        : ExpressionSyntax;

    public sealed record Call(Token Function, ExpressionSyntax Argument) : ExpressionSyntax;
}

/// <summary>A constant with everything said about it.</summary>
/// <param name="IsLog">Written as <c>log K</c>.</param>
/// <param name="Name"><c>K</c>, <c>Ksp</c>, <c>KH</c>, <c>pKsp</c>.</param>
/// <param name="Value">Number or expression.</param>
/// <param name="Uncertainty">Behind the value.</param>
/// <param name="Options">In the order written.</param>
public sealed record ConstantSyntax(
    Token? IsLog,
    Token Name,
    ExpressionSyntax Value,
    UncertaintySyntax? Uncertainty,
    ImmutableArray<ConstantOption> Options
)
{
    /// <summary>First and last token of the value, for its text.</summary>
    public required SourceSpan ValueSpan { get; init; }
}

/// <summary>What may follow a constant. Closed set.</summary>
public abstract record ConstantOption
{
    public sealed record Enthalpy(ValueSyntax Value) : ConstantOption;

    public sealed record Valid(Token From, Token To, Token? Unit) : ConstantOption;

    public sealed record Cited(Token Key) : ConstantOption;

    public sealed record Recalled(Token Word) : ConstantOption;

    public sealed record Doubt(Token Text) : ConstantOption;

    public sealed record HeldBack(Token Text) : ConstantOption;

    public sealed record Reason(Token Text) : ConstantOption;
}

/// <summary>A species declaration with its reaction and constant.</summary>
public sealed record SpeciesSyntax(
    Token Kind,
    Token? Name,
    Token? Formula,
    ReactionSyntax Reaction,
    ConstantSyntax Constant
);

/// <summary>One analysis line.</summary>
public sealed record EntrySyntax(
    Token Analyte,
    ValueSyntax Value,
    Token? As,
    Token? BelowAs,
    ImmutableArray<EntrySyntax> OfWhich
)
{
    public SourceSpan Span => Analyte.Span.To((BelowAs ?? As)?.Span ?? Value.Span);
}

/// <summary>A dose: a value, per volume entering, of the product or <c>as</c> a substance.</summary>
public sealed record DoseSyntax(ValueSyntax Value, Token? As);

/// <summary>A quantity: <c>pH</c>, <c>dissolved(Zn)</c>, <c>dissolved(NO3 as N)</c>, <c>SI(gypsum)</c>.</summary>
public sealed record QuantitySyntax(Token Name, Token? Argument, Token? As)
{
    public SourceSpan Span => Argument is null ? Name.Span : Name.Span.To((As ?? Argument).Span);
}

/// <summary>A comparison.</summary>
public sealed record ConditionSyntax(
    QuantitySyntax Quantity,
    Token Comparison,
    ValueSyntax Value,
    ValueSyntax? Upper
)
{
    public SourceSpan Span => Quantity.Span.To((Upper ?? Value).Span);
}

/// <summary>One part of a <c>mix</c>.</summary>
public sealed record MixPartSyntax(
    ValueSyntax Volume,
    Token? Liquor,
    ImmutableArray<EntrySyntax> Entries
);

/// <summary>A value of an activity parameter with its symbol, where it has one.</summary>
public sealed record ParameterValueSyntax(Token? Symbol, ValueSyntax Value);

/// <summary>A parameter of an activity model.</summary>
public sealed record ParameterSyntax(
    Token Keyword,
    ImmutableArray<Token> Species,
    ImmutableArray<ParameterValueSyntax> Values,
    ImmutableArray<ConstantOption> Options
);
