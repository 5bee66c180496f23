using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;
using Bittern.Language.Grammar;
using Bittern.Language.Lexing;
using Bittern.Language.Syntax;
using Sprache;

namespace Bittern.Language.Binding;

/// <summary>Parses the head of an item against what its first word announces.</summary>
internal static class HeadReader
{
    /// <summary>The node, or null with one diagnostic at the token where reading stopped.</summary>
    public static T? Read<T>(
        Parser<T> parser,
        Item item,
        string shape,
        ICollection<Diagnostic> diagnostics
    )
        where T : class
    {
        foreach (var token in item.Head)
        {
            // The lexer has said what is wrong with it.
            if (token.Kind == TokenKind.Fault)
            {
                return null;
            }
        }

        if (Suspicious(item) is { } known)
        {
            diagnostics.Add(known);
            return null;
        }

        var depth = 0;
        foreach (var token in item.Head)
        {
            depth += token.Kind switch
            {
                '(' => 1,
                ')' => -1,
                _ => 0,
            };
            if (depth > Constants.MaxNesting)
            {
                diagnostics.Add(NestedTooDeep.At(token.Span));
                return null;
            }
        }

        var result = parser.End().TryParse(item);
        if (result.WasSuccessful)
        {
            return result.Value;
        }

        var at = result.Remainder.Position;
        var found = at < item.Head.Length ? item.Head[at] : null;
        var span = found?.Span ?? new SourceSpan(item.Span.Source, item.Span.End, 0);
        diagnostics.Add(Unexpected.At(span, found?.Text, shape));
        return null;
    }

    private static IResult<T> TryParse<T>(this Parser<T> parser, Item item) =>
        parser(new TokenInput(item.Head));

    // Habits from elsewhere that deserve a better answer than "unexpected".
    private static Diagnostic? Suspicious(Item item)
    {
        for (var i = 0; i + 1 < item.Head.Length; i++)
        {
            var (first, second) = (item.Head[i], item.Head[i + 1]);
            if (
                first.Kind == TokenKind.Number
                && second.Kind == TokenKind.Number
                && second.SpaceBefore
                && !second.IsSigned
            )
            {
                return NumberWithGap.At(first.Span.To(second.Span), first.Text + second.Text);
            }

            if (
                first.Kind == TokenKind.Formula
                && second.Kind == TokenKind.Number
                && second.IsSigned
                && !second.SpaceBefore
            )
            {
                return ChargeOrder.At(
                    first.Span.To(second.Span),
                    $"{first.Text}^{second.Text[1..]}{second.Text[0]}"
                );
            }

            if (
                first.Kind == TokenKind.Formula
                && second is { Kind: '+' or '-', SpaceBefore: false }
                && i + 2 < item.Head.Length
                && item.Head[i + 2] is { Kind: TokenKind.Number, SpaceBefore: false } digits
            )
            {
                return ChargeOrder.At(
                    first.Span.To(digits.Span),
                    $"{first.Text}^{digits.Text}{second.Text}"
                );
            }

            if (first.Kind == TokenKind.Formula && second.Kind == ':' && !second.SpaceBefore)
            {
                return ColonHydrate.At(first.Span.To(second.Span), first.Text);
            }
        }

        return null;
    }
}
