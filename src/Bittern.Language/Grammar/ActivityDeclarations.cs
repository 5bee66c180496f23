using System.Collections.Immutable;
using Bittern.Language.Lexing;
using Bittern.Language.Syntax;
using Sprache;

namespace Bittern.Language.Grammar;

/// <summary>Parameters of activity models: <c>pitzer Na+ Cl- β0 0.0765, β1 0.2664, Cφ 0.00127 [key]</c>.</summary>
internal static class ActivityDeclarations
{
    private static readonly Parser<ParameterValueSyntax> Value =
        from symbol in Pieces.Maybe(
            Pieces.Where(t =>
                t.Kind == TokenKind.Name && !string.Equals(t.Text, "per", StringComparison.Ordinal)
            )
        )
        from value in Pieces.Value
        select new ParameterValueSyntax(symbol, value);

    private static readonly Parser<Token> PerKelvin =
        from per in Pieces.Where(t =>
            t.Kind == TokenKind.Name && string.Equals(t.Text, "per", StringComparison.Ordinal)
        )
        from kelvin in Pieces.Where(t =>
            t.Kind == TokenKind.Formula && string.Equals(t.Text, "K", StringComparison.Ordinal)
        )
        select kelvin;

    /// <summary>One parameter line behind its keyword.</summary>
    public static Parser<ParameterSyntax> After(string keyword) =>
        from word in Pieces.Word(keyword)
        from species in Pieces.Formula.AtLeastOnce()
        from first in Value
        from rest in (from comma in Pieces.Comma from v in Value select v).Many()
        from per in Pieces.Maybe(PerKelvin)
        from options in (
            from comma in Pieces.Maybe(Pieces.Comma)
            from option in Constants.AnyOption
            select option
        ).Many()
        select new ParameterSyntax(word, [.. species], [.. rest.Prepend(first)], [.. options]);
}
