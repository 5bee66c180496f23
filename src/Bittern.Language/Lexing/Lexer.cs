using System.Collections.Immutable;
using System.Globalization;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;

namespace Bittern.Language.Lexing;

/// <summary>
/// Turns any text into tokens; never fails. What is no token becomes a fault token with a diagnostic, and reading goes on behind it.
/// </summary>
public sealed class Lexer
{
    private readonly SourceText _source;
    private readonly string _text;
    private readonly ImmutableArray<Token>.Builder _tokens = ImmutableArray.CreateBuilder<Token>();
    private readonly List<Diagnostic> _diagnostics = [];
    private int _at;
    private bool _space;

    private Lexer(SourceText source)
    {
        _source = source;
        _text = source.Text;
    }

    /// <summary>All tokens with comments and line breaks, ending in one <see cref="TokenKind.End"/>.</summary>
    public static (ImmutableArray<Token> Tokens, ImmutableArray<Diagnostic> Diagnostics) Read(
        SourceText source
    )
    {
        var lexer = new Lexer(source);
        lexer.Run();
        return (lexer._tokens.ToImmutable(), [.. lexer._diagnostics]);
    }

    private void Run()
    {
        while (_at < _text.Length)
        {
            var c = _text[_at];
            if (c == '\n')
            {
                Add(TokenKind.NewLine, _at, 1, "\n");
            }
            else if (char.IsWhiteSpace(c) || c == '\uFEFF')
            {
                _at++;
                _space = true;
            }
            else
            {
                Next(c);
            }
        }

        Add(TokenKind.End, _text.Length, 0, "");
    }

    private void Next(char c)
    {
        var start = _at;
        if (c == '/' && Peek(1) == '/')
        {
            while (_at < _text.Length && _text[_at] != '\n')
            {
                _at++;
            }

            Add(TokenKind.Comment, start, _at - start, _text[start.._at].TrimEnd());
        }
        else if (c == '"')
        {
            ReadText();
        }
        else if (char.IsAsciiDigit(c) || (c is '-' or '+' or '\u2212' && IsSignHere()))
        {
            ReadNumber();
        }
        else if (char.IsAsciiLetter(c) || c is 'Δ' or '∆' or 'α' or 'β' or 'ε')
        {
            ReadWord();
        }
        else if (c == '(' && StartsBracketedFormula(start))
        {
            ReadFormula();
        }
        else
        {
            ReadPunctuation(c);
        }
    }

    // (UO2)2OH^3+, (NH4)2SO4: an element behind the bracket, and something of the formula behind its close.
    private bool StartsBracketedFormula(int start)
    {
        if (!char.IsAsciiLetterUpper(Peek(1)) || !_space)
        {
            return false;
        }

        var close = start + 1;
        while (close < _text.Length && char.IsAsciiLetterOrDigit(_text[close]))
        {
            close++;
        }

        return close + 1 < _text.Length
            && _text[close] == ')'
            && char.IsAsciiLetterOrDigit(_text[close + 1]);
    }

    private char Peek(int ahead) => _at + ahead < _text.Length ? _text[_at + ahead] : '\0';

    private bool IsSignHere()
    {
        if (!char.IsAsciiDigit(Peek(1)))
        {
            return false;
        }

        // A sign belongs to a number where a value may start: after white space or an opening mark, never behind an operand without space.
        var previous = _tokens.Count == 0 ? TokenKind.NewLine : _tokens[^1].Kind;
        return _space
            || previous
                is '('
                    or '['
                    or '='
                    or '<'
                    or '>'
                    or TokenKind.AtMost
                    or TokenKind.AtLeast
                    or TokenKind.PlusMinus
                    or TokenKind.Range
                    or ','
                    or '*'
                    or '/'
                    or TokenKind.NewLine;
    }

    private void Add(
        char kind,
        int start,
        int length,
        string text,
        double number = 0,
        bool isPower = false,
        bool isSigned = false
    )
    {
        _tokens.Add(
            new Token(kind, new SourceSpan(_source, start, length), text, number)
            {
                IsPower = isPower,
                IsSigned = isSigned,
                SpaceBefore = _space,
            }
        );
        _at = start + length;
        _space = false;
    }

    private void Fault(Diagnostic diagnostic, int start, int length)
    {
        _diagnostics.Add(diagnostic);
        Add(TokenKind.Fault, start, length, _text.Substring(start, length));
    }

    private SourceSpan Span(int start, int length) => new(_source, start, length);

    private void ReadText()
    {
        var start = _at;
        if (string.CompareOrdinal(_text, _at, "\"\"\"", 0, 3) == 0)
        {
            var close = _text.IndexOf("\"\"\"", _at + 3, StringComparison.Ordinal);
            if (close < 0)
            {
                Fault(TextNotClosed.At(Span(start, 3), "\"\"\""), start, _text.Length - start);
                return;
            }

            Add(TokenKind.Block, start, close + 3 - start, Unindent(_text[(start + 3)..close]));
            return;
        }

        var end = start + 1;
        while (end < _text.Length && _text[end] is not ('"' or '\n'))
        {
            end++;
        }

        if (end >= _text.Length || _text[end] != '"')
        {
            Fault(
                TextNotClosed.At(Span(start, Math.Max(1, end - start)), "\""),
                start,
                Math.Max(1, end - start)
            );
            return;
        }

        Add(TokenKind.Text, start, end + 1 - start, _text[(start + 1)..end].TrimEnd('\r'));
    }

    private static string Unindent(string text)
    {
        var lines = text.Replace("\r", "", StringComparison.Ordinal).Split('\n').ToList();
        if (lines.Count > 0 && lines[0].Trim().Length == 0)
        {
            lines.RemoveAt(0);
        }

        if (lines.Count > 0 && lines[^1].Trim().Length == 0)
        {
            lines.RemoveAt(lines.Count - 1);
        }

        var indent = lines
            .Where(l => l.Trim().Length > 0)
            .Select(l => l.Length - l.TrimStart(' ', '\t').Length)
            .DefaultIfEmpty(0)
            .Min();
        return string.Join(
            '\n',
            lines.Select(l => l.Length >= indent ? l[indent..].TrimEnd() : l.Trim())
        );
    }

    private void ReadNumber()
    {
        var start = _at;
        if (TryReadDate(start))
        {
            return;
        }

        var signed = _text[_at] is '-' or '+' or '\u2212';
        var end = NumberEnd(signed ? start + 1 : start);
        var text = _text[start..end].Replace('\u2212', '-');
        if (
            end < _text.Length
            && _text[end] == ','
            && end + 1 < _text.Length
            && char.IsAsciiDigit(_text[end + 1])
        )
        {
            var tail = NumberEnd(end + 1);
            Fault(DecimalComma.At(Span(start, tail - start)), start, tail - start);
            return;
        }

        if (text is "10" && end < _text.Length && _text[end] == '^')
        {
            var powerStart = end + 1;
            var exponentSigned =
                powerStart < _text.Length && _text[powerStart] is '-' or '+' or '\u2212';
            var powerEnd = NumberEnd(exponentSigned ? powerStart + 1 : powerStart);
            if (
                double.TryParse(
                    _text[powerStart..powerEnd].Replace('\u2212', '-'),
                    NumberStyles.Float,
                    CultureInfo.InvariantCulture,
                    out var exponent
                )
            )
            {
                Add(
                    TokenKind.Number,
                    start,
                    powerEnd - start,
                    _text[start..powerEnd],
                    Math.Pow(10, exponent),
                    isPower: true
                );
                ReadUnit();
                return;
            }
        }

        if (
            !double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var value)
            || double.IsInfinity(value)
        )
        {
            Fault(NumberTooLarge.At(Span(start, end - start)), start, end - start);
            return;
        }

        Add(TokenKind.Number, start, end - start, text, value, isSigned: signed);
        ReadUnit();
    }

    private bool TryReadDate(int start)
    {
        if (
            start + 10 > _text.Length
            || !DateOnly.TryParseExact(
                _text.AsSpan(start, 10),
                "yyyy-MM-dd",
                CultureInfo.InvariantCulture,
                DateTimeStyles.None,
                out _
            )
        )
        {
            return false;
        }

        Add(TokenKind.Date, start, 10, _text.Substring(start, 10));
        return true;
    }

    private int NumberEnd(int at)
    {
        while (at < _text.Length && char.IsAsciiDigit(_text[at]))
        {
            at++;
        }

        if (at + 1 < _text.Length && _text[at] == '.' && char.IsAsciiDigit(_text[at + 1]))
        {
            at++;
            while (at < _text.Length && char.IsAsciiDigit(_text[at]))
            {
                at++;
            }
        }

        if (at < _text.Length && _text[at] is 'e' or 'E')
        {
            var exponent = at + 1;
            if (exponent < _text.Length && _text[exponent] is '-' or '+')
            {
                exponent++;
            }

            if (exponent < _text.Length && char.IsAsciiDigit(_text[exponent]))
            {
                at = exponent;
                while (at < _text.Length && char.IsAsciiDigit(_text[at]))
                {
                    at++;
                }
            }
        }

        return at;
    }

    // Behind a number, a run of characters that reads as a unit is one: mg/L, m3/h, °C, %.
    private void ReadUnit()
    {
        var start = _at;
        while (start < _text.Length && _text[start] == ' ')
        {
            start++;
        }

        var end = start;
        while (
            end < _text.Length
            && !char.IsWhiteSpace(_text[end])
            && _text[end] is not (',' or ';' or ')' or ']' or '{' or '}' or '[' or '(' or '"')
        )
        {
            end++;
        }

        if (end == start || end - start > 24)
        {
            return;
        }

        var text = _text[start..end];
        if (text is "Å" || (!char.IsAsciiDigit(text[0]) && UnitReader.TryRead(text, out _, out _)))
        {
            _space = start > _at;
            Add(TokenKind.Unit, start, end - start, text);
        }
    }

    private void ReadWord()
    {
        var start = _at;
        var c = _text[start];
        if (c == 'e' && Peek(1) == '-' && !(char.IsAsciiLetterOrDigit(Peek(2)) || Peek(2) == '-'))
        {
            Add(TokenKind.Formula, start, 2, "e-");
            return;
        }

        if (IsQuantityName(start, out var quantity))
        {
            Add(TokenKind.Name, start, quantity.Length, quantity is "Cφ" ? "Cphi" : quantity);
            return;
        }

        if (
            char.IsAsciiLetterUpper(c)
            && !(c == 'T' && !char.IsAsciiLetterOrDigit(Peek(1)) && Peek(1) != '(')
        )
        {
            ReadFormula();
            return;
        }

        var end = start + 1;
        while (
            end < _text.Length
            && (
                char.IsAsciiLetterOrDigit(_text[end])
                || (
                    _text[end] == '-'
                    && end + 1 < _text.Length
                    && char.IsAsciiLetterOrDigit(_text[end + 1])
                )
            )
        )
        {
            end++;
        }

        // Greek letters stand for names that ASCII can spell.
        var word = c switch
        {
            'Δ' or '∆' => "dH",
            'α' => "alpha" + _text[(start + 1)..end],
            'β' => "beta" + _text[(start + 1)..end],
            'ε' => "epsilon",
            _ => _text[start..end],
        };
        Add(Keywords.KindOf(word), start, end - start, word);
    }

    // Quantities whose names look like formulas.
    private bool IsQuantityName(int start, out string name)
    {
        foreach (var candidate in (ReadOnlySpan<string>)["SI", "TDS", "Eh", "Cφ", "Cphi"])
        {
            var end = start + candidate.Length;
            if (
                string.CompareOrdinal(_text, start, candidate, 0, candidate.Length) == 0
                && (end == _text.Length || !char.IsAsciiLetterOrDigit(_text[end]))
            )
            {
                name = candidate;
                return true;
            }
        }

        name = "";
        return false;
    }

    // Letters, digits, balanced brackets, hydrate dots and a charge that is attached.
    private void ReadFormula()
    {
        var start = _at;
        var end = start;
        var depth = 0;
        while (end < _text.Length)
        {
            var c = _text[end];
            var inBody =
                char.IsAsciiLetterOrDigit(c)
                || c is '·' or '⋅' or '•'
                || (
                    c == '*'
                    && end + 1 < _text.Length
                    && char.IsAsciiLetterOrDigit(_text[end + 1])
                    && end > start
                    && char.IsAsciiLetterOrDigit(_text[end - 1]) | _text[end - 1] == ')'
                )
                || (
                    c == '.'
                    && end + 1 < _text.Length
                    && char.IsAsciiDigit(_text[end + 1])
                    && char.IsAsciiDigit(_text[end - 1])
                );
            if (c == '(')
            {
                depth++;
            }
            else if (c == ')')
            {
                if (depth == 0)
                {
                    break;
                }

                depth--;
            }
            else if (!inBody)
            {
                break;
            }

            end++;
        }

        end = ChargeEnd(start, end);
        var text = _text[start..end].Replace('⋅', '·').Replace('•', '·').Replace('\u2212', '-');
        if (Nuclide(start, end, out var nuclideEnd))
        {
            Add(TokenKind.Nuclide, start, nuclideEnd - start, _text[start..nuclideEnd]);
            return;
        }

        Add(TokenKind.Formula, start, end - start, text);
    }

    private bool Nuclide(int start, int end, out int nuclideEnd)
    {
        nuclideEnd = end;
        if (
            end - start > 2
            || end + 1 >= _text.Length
            || _text[end] != '-'
            || !char.IsAsciiDigit(_text[end + 1])
        )
        {
            return false;
        }

        nuclideEnd = end + 1;
        while (nuclideEnd < _text.Length && char.IsAsciiDigit(_text[nuclideEnd]))
        {
            nuclideEnd++;
        }

        return true;
    }

    private int ChargeEnd(int start, int end)
    {
        if (end >= _text.Length)
        {
            return end;
        }

        var after = end;
        if (_text[end] == '^')
        {
            after++;
            while (after < _text.Length && char.IsAsciiDigit(_text[after]))
            {
                after++;
            }

            if (after < _text.Length && _text[after] is '+' or '-' or '\u2212')
            {
                after++;
            }
        }
        else if (
            _text[end] is '+' or '-' or '\u2212'
            && !(
                end + 1 < _text.Length
                && (
                    char.IsAsciiLetter(_text[end + 1])
                    || (char.IsAsciiDigit(_text[end + 1]) && end - start <= 2)
                )
            )
        )
        {
            after++;
        }

        // A state mark may follow a charge nowhere; (aq) before it was read with the brackets.
        return after;
    }

    private void ReadPunctuation(char c)
    {
        var start = _at;
        switch (c)
        {
            case '±':
                Add(TokenKind.PlusMinus, start, 1, "±");
                break;
            case '+' when Peek(1) == '-':
                Add(TokenKind.PlusMinus, start, 2, "±");
                break;
            case '.' when Peek(1) == '.':
                Add(TokenKind.Range, start, 2, "..");
                break;
            case '<' when Peek(1) == '=':
                Add(TokenKind.AtMost, start, 2, "<=");
                break;
            case '>' when Peek(1) == '=':
                Add(TokenKind.AtLeast, start, 2, ">=");
                break;
            case '≤':
                Add(TokenKind.AtMost, start, 1, "<=");
                break;
            case '≥':
                Add(TokenKind.AtLeast, start, 1, ">=");
                break;
            case '\u2212':
                Add('-', start, 1, "-");
                break;
            case '+'
            or '-'
            or '*'
            or '/'
            or '^'
            or '('
            or ')'
            or '{'
            or '}'
            or '['
            or ']'
            or ','
            or ';'
            or '='
            or '<'
            or '>'
            or ':':
                Add(c, start, 1, c.ToString());
                break;
            default:
                var length = char.IsHighSurrogate(c) && char.IsLowSurrogate(Peek(1)) ? 2 : 1;
                Fault(
                    StrangeCharacter.At(Span(start, length), _text.Substring(start, length)),
                    start,
                    length
                );
                break;
        }
    }
}
