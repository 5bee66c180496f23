using System.Collections.Immutable;
using Bittern.Language.Lexing;
using Sprache;

namespace Bittern.Language.Grammar;

/// <summary>Sprache's input over tokens: one character a token, the token itself at hand. Positions are token indices.</summary>
internal sealed class TokenInput : IInput
{
    private readonly ImmutableArray<Token> _tokens;

    public TokenInput(ImmutableArray<Token> tokens)
        : this(
            tokens,
            string.Create(
                tokens.Length,
                tokens,
                static (span, all) =>
                {
                    for (var i = 0; i < span.Length; i++)
                    {
                        span[i] = all[i].Kind;
                    }
                }
            ),
            0
        ) { }

    private TokenInput(ImmutableArray<Token> tokens, string kinds, int position)
    {
        _tokens = tokens;
        Source = kinds;
        Position = position;
    }

    public string Source { get; }

    public int Position { get; }

    public bool AtEnd => Position >= Source.Length;

    public char Current => Source[Position];

    public Token Token => _tokens[Position];

    public int Line => 1;

    public int Column => Position + 1;

    // Sprache writes here for recursive rules only; most positions never need one.
    public IDictionary<object, object> Memos => field ??= new Dictionary<object, object>();

    public IInput Advance() =>
        AtEnd
            ? throw new InvalidOperationException("the tokens are used up")
            : new TokenInput(_tokens, Source, Position + 1);

    public bool Equals(IInput? other) =>
        other is TokenInput input
        && ReferenceEquals(Source, input.Source)
        && Position == input.Position;

    public override bool Equals(object? obj) => Equals(obj as IInput);

    public override int GetHashCode() => Position;
}
