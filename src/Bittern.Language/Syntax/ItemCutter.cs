using System.Collections.Frozen;
using System.Collections.Immutable;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;
using Bittern.Language.Lexing;

namespace Bittern.Language.Syntax;

/// <summary>Cuts tokens into items by line breaks, semicolons and braces.</summary>
internal sealed class ItemCutter
{
    /// <summary>Blocks inside blocks that are accepted; a recipe needs three.</summary>
    private const int MaxDepth = 20;

    private static readonly FrozenSet<string> TopWords = new[]
    {
        "recipe",
        "use",
        "cite",
        "override",
        "liquor",
        "reagent",
        "atmosphere",
        "train",
        "limits",
        "report",
        "mix",
    }.ToFrozenSet(StringComparer.Ordinal);

    private readonly ImmutableArray<Token> _tokens;
    private readonly List<Diagnostic> _diagnostics;
    private int _at;

    private ItemCutter(ImmutableArray<Token> tokens, List<Diagnostic> diagnostics)
    {
        _tokens = tokens;
        _diagnostics = diagnostics;
    }

    public static ImmutableArray<Item> Cut(
        ImmutableArray<Token> tokens,
        List<Diagnostic> diagnostics
    )
    {
        var cutter = new ItemCutter(
            [.. tokens.Where(t => t.Kind != TokenKind.Comment)],
            diagnostics
        );
        var items = ImmutableArray.CreateBuilder<Item>();
        while (cutter._tokens[cutter._at].Kind != TokenKind.End)
        {
            cutter.Items(items, 0);
            if (cutter._tokens[cutter._at].Kind == '}')
            {
                diagnostics.Add(StrayBrace.At(cutter._tokens[cutter._at].Span));
                cutter._at++;
            }
        }

        return items.ToImmutable();
    }

    private void Items(ImmutableArray<Item>.Builder items, int depth)
    {
        while (true)
        {
            var token = _tokens[_at];
            switch (token.Kind)
            {
                case TokenKind.End or '}':
                    return;
                case TokenKind.NewLine or ';':
                    _at++;
                    break;
                case var _
                    when depth > 0
                        && TopWords.Contains(token.Text)
                        && token.Kind is not TokenKind.Text:
                    // No block holds such a line: the brace before it is missing.
                    return;
                default:
                    items.Add(One(depth));
                    break;
            }
        }
    }

    private Item One(int depth)
    {
        var head = ImmutableArray.CreateBuilder<Token>();
        while (true)
        {
            var token = _tokens[_at];
            if (token.Kind == TokenKind.NewLine && head.Count > 0 && GoesOn(head[^1]))
            {
                _at++;
                continue;
            }

            if (token.Kind is TokenKind.End or TokenKind.NewLine or ';' or '{' or '}')
            {
                break;
            }

            head.Add(token);
            _at++;
        }

        var start = head.Count > 0 ? head[0].Span : _tokens[_at].Span;
        var span = head.Count > 0 ? start.To(head[^1].Span) : start;
        if (_tokens[_at].Kind != '{')
        {
            return new Item(head.ToImmutable(), default, span, span);
        }

        var open = _tokens[_at++];
        var block = ImmutableArray.CreateBuilder<Item>();
        if (depth >= MaxDepth)
        {
            _diagnostics.Add(NestedTooDeep.At(open.Span));
            SkipBlock();
        }
        else
        {
            Items(block, depth + 1);
        }

        var close = _tokens[_at];
        if (close.Kind == '}')
        {
            _at++;
        }
        else
        {
            _diagnostics.Add(BlockNotClosed.At(open.Span, close.Span));
        }

        return new Item(head.ToImmutable(), block.ToImmutable(), span, start.To(close.Span));
    }

    private void SkipBlock()
    {
        for (var open = 1; _tokens[_at].Kind != TokenKind.End; _at++)
        {
            open += _tokens[_at].Kind switch
            {
                '{' => 1,
                '}' => -1,
                _ => 0,
            };
            if (open == 0)
            {
                return;
            }
        }
    }

    // A line that ends in an operator or a comma goes on.
    private static bool GoesOn(Token last) =>
        last.Kind
            is ','
                or '+'
                or '-'
                or '*'
                or '/'
                or '='
                or TokenKind.PlusMinus
                or TokenKind.Range
                or '<'
                or '>'
                or TokenKind.AtMost
                or TokenKind.AtLeast;
}
