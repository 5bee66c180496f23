using System.Collections.Immutable;
using System.Globalization;

namespace Bittern.Chemistry;

/// <summary>One pass over the text of a formula, left to right.</summary>
internal sealed class FormulaScan(string text, ImmutableDictionary<string, Element> elements)
{
    private static readonly HashSet<string> Numerals = new(
        ["I", "II", "III", "IV", "V", "VI", "VII", "VIII"],
        StringComparer.Ordinal
    );

    private int _at;
    private string? _canonical;

    public Dictionary<string, double> Atoms { get; } = new(StringComparer.Ordinal);

    public int Charge { get; private set; }

    public PhaseMark Phase { get; private set; }

    public string CanonicalText => _canonical ?? text;

    public FormulaFault? Run()
    {
        var body = text.Length;
        foreach (var (mark, phase) in Marks)
        {
            if (text.EndsWith(mark, StringComparison.Ordinal) && text.Length > mark.Length)
            {
                Phase = phase;
                body = text.Length - mark.Length;
            }
        }

        var first = true;
        while (_at < body && !IsChargeStart(_at, body))
        {
            if (!first)
            {
                if (text[_at] != '·')
                {
                    return Misplaced();
                }

                _at++;
            }

            var factor = 1.0;
            if (!first && ReadCount(body, out factor) is { } badFactor)
            {
                return badFactor;
            }

            var part = Group(body, factor, 0, out var fault);
            if (fault is not null)
            {
                return fault;
            }

            if (!part)
            {
                return _at < body ? Misplaced() : Fault(_at, 1, "the formula ends too early");
            }

            first = false;
        }

        return Atoms.Count == 0
            ? Fault(0, text.Length, "no element symbol found")
            : ReadCharge(body);
    }

    private FormulaFault Misplaced() =>
        Fault(_at, 1, $"'{CharacterAt(_at)}' does not belong in a formula here");

    // A whole character even where it is a surrogate pair; half of one would garble the message.
    private string CharacterAt(int at) =>
        char.IsHighSurrogate(text[at]) && at + 1 < text.Length && char.IsLowSurrogate(text[at + 1])
            ? text.Substring(at, 2)
        : char.IsSurrogate(text[at]) || char.IsControl(text[at])
            ? string.Create(CultureInfo.InvariantCulture, $"U+{(int)text[at]:X4}")
        : text[at].ToString();

    private static readonly (string Mark, PhaseMark Phase)[] Marks =
    [
        ("(aq)", PhaseMark.Aqueous),
        ("(g)", PhaseMark.Gas),
        ("(s)", PhaseMark.Solid),
        ("(l)", PhaseMark.Liquid),
    ];

    private bool IsChargeStart(int at, int body) =>
        text[at] == '^' || (text[at] is '+' or '-' && at == body - 1);

    private FormulaFault? ReadCharge(int body)
    {
        if (_at >= body)
        {
            return null;
        }

        var start = _at;
        if (text[_at] == '^')
        {
            _at++;
            var digits = _at;
            while (_at < body && char.IsAsciiDigit(text[_at]))
            {
                _at++;
            }

            if (
                _at == digits
                || text[digits] == '0'
                || _at - digits > 2
                || _at >= body
                || text[_at] is not ('+' or '-')
                || _at != body - 1
            )
            {
                return Fault(start, body - start, "a charge is written ^2+ or ^3-");
            }

            Charge =
                int.Parse(text.AsSpan(digits, _at - digits), CultureInfo.InvariantCulture)
                * (text[_at] == '+' ? 1 : -1);
            if (Math.Abs(Charge) == 1)
            {
                _canonical = string.Concat(
                    text.AsSpan(0, start),
                    text.AsSpan(_at, 1),
                    text.AsSpan(body)
                );
            }
        }
        else
        {
            Charge = text[_at] == '+' ? 1 : -1;
        }

        switch (Phase)
        {
            case PhaseMark.Aqueous:
                Phase = PhaseMark.None;
                _canonical = CanonicalText[..^"(aq)".Length];
                return null;
            case PhaseMark.None:
                return null;
            default:
                return Fault(
                    body,
                    text.Length - body,
                    "an ion is dissolved: a charge has no place on a gas, a solid or a pure liquid"
                );
        }
    }

    // Adds the atoms of a run of elements and bracketed groups; stops at a dot, a charge, a closing bracket or the end.
    private bool Group(int body, double factor, int depth, out FormulaFault? fault)
    {
        fault = null;
        var any = false;
        while (_at < body && text[_at] is not ('·' or ')' or ']') && !IsChargeStart(_at, body))
        {
            var start = _at;
            if (text[_at] is '(' or '[')
            {
                if (any && OxidationStateAt(_at, body) is { } state)
                {
                    fault = Fault(
                        _at,
                        state.Length + 2,
                        $"({state}) is an oxidation state, which a formula does not carry: write the ion"
                    );
                    return false;
                }

                if (depth >= FormulaReader.MaxNesting)
                {
                    fault = Fault(
                        _at,
                        1,
                        $"brackets are nested more than {FormulaReader.MaxNesting} deep"
                    );
                    return false;
                }

                var close = text[_at] == '(' ? ')' : ']';
                var end = MatchingClose(_at, body, close);
                if (end < 0)
                {
                    fault = Fault(_at, 1, $"'{text[_at]}' is not closed");
                    return false;
                }

                var after = end + 1;
                var resume = after;
                fault = CountAt(ref resume, body, out var count);
                if (fault is not null)
                {
                    return false;
                }

                _at++;
                if (!Group(end, factor * count, depth + 1, out fault))
                {
                    fault ??= Fault(start, end - start + 1, "the brackets hold no element");
                    return false;
                }

                if (_at != end)
                {
                    fault = Misplaced();
                    return false;
                }

                _at = resume;
                any = true;
                continue;
            }

            if (!char.IsAsciiLetterUpper(text[_at]))
            {
                fault = text[_at] is '+' or '-' or '\u207A' or '\u207B'
                    ? Fault(_at, body - _at, "a charge is written at the end, as ^2+ or ^3-")
                    : Fault(_at, 1, $"'{CharacterAt(_at)}' does not start an element symbol");
                return false;
            }

            _at++;
            while (_at < body && char.IsAsciiLetterLower(text[_at]))
            {
                _at++;
            }

            var symbol = text[start.._at];
            if (!elements.ContainsKey(symbol))
            {
                fault = new FormulaFault(start, symbol.Length, $"'{symbol}' is no element", symbol);
                return false;
            }

            fault = ReadCount(body, out var number);
            if (fault is not null)
            {
                return false;
            }

            Atoms[symbol] = Atoms.GetValueOrDefault(symbol) + (factor * number);
            any = true;
        }

        return any;
    }

    private int MatchingClose(int open, int body, char close)
    {
        var depth = 0;
        var opening = text[open];
        for (var i = open; i < body; i++)
        {
            if (text[i] == opening)
            {
                depth++;
            }
            else if (text[i] == close && --depth == 0)
            {
                return i;
            }
        }

        return -1;
    }

    private string? OxidationStateAt(int open, int body)
    {
        var close = text.IndexOf(')', open, body - open);
        var inner = close < 0 ? "" : text[(open + 1)..close];
        return text[open] == '(' && Numerals.Contains(inner) ? inner : null;
    }

    private FormulaFault? ReadCount(int body, out double count) =>
        CountAt(ref _at, body, out count);

    private FormulaFault? CountAt(ref int at, int body, out double count)
    {
        count = 1;
        var start = at;
        while (at < body && char.IsAsciiDigit(text[at]))
        {
            at++;
        }

        if (at == start)
        {
            return null;
        }

        var whole = at - start;
        if (at + 1 < body && text[at] == '.' && char.IsAsciiDigit(text[at + 1]))
        {
            at++;
            while (at < body && char.IsAsciiDigit(text[at]))
            {
                at++;
            }
        }

        count = double.Parse(
            text.AsSpan(start, at - start),
            NumberStyles.AllowDecimalPoint,
            CultureInfo.InvariantCulture
        );
        if (count is <= 0 or > FormulaReader.MaxCount)
        {
            return Fault(
                start,
                at - start,
                $"a count lies between 0 and {FormulaReader.MaxCount.ToString(CultureInfo.InvariantCulture)}, zero left out"
            );
        }

        return whole > 1 && text[start] == '0'
            ? Fault(start, at - start, "a count has no leading zero")
            : null;
    }

    private static FormulaFault Fault(int offset, int length, string message) =>
        new(offset, Math.Max(1, length), message);
}
