using System.Collections.Immutable;
using System.Globalization;
using System.Text;

namespace Bittern.Chemistry;

/// <summary>
/// Reads units as laboratories write them: <c>mg/L</c>, <c>µg/L</c> (or <c>ug/L</c>), <c>g/m3</c>, <c>meq/L</c>, <c>mol/kg</c>, <c>m³/h</c>,
/// <c>EUR/t</c>, <c>L/m2/h</c>. Products are joined by <c>·</c>; each <c>/</c> divides by the one factor after it. Case matters, but
/// <c>l</c> may stand for <c>L</c>. Three capitals are a currency.
/// </summary>
public static class UnitReader
{
    private const int MaxLength = 40;
    private const int MaxFactors = 6;
    private const int MaxExponent = 4;

    /// <summary>Units to suggest from when a text is none; every one reads without fault.</summary>
    public static ImmutableArray<string> Common => UnitNames.Common;

    /// <summary>Reads a unit; a text that is none throws <see cref="FormatException"/>. For code and tests; recipes use <see cref="TryRead"/>.</summary>
    public static Unit Read(string text) =>
        TryRead(text, out var unit, out var fault) ? unit! : throw new FormatException(fault);

    /// <summary>Reads a unit, or says in one sentence why the text is none, with a suggestion where one is near.</summary>
    public static bool TryRead(string text, out Unit? unit, out string? fault)
    {
        unit = null;
        if (text.Length is 0 or > MaxLength)
        {
            fault =
                text.Length == 0
                    ? "a unit is missing"
                    : string.Create(
                        CultureInfo.InvariantCulture,
                        $"a unit has at most {MaxLength} characters"
                    );
            return false;
        }

        var plain = Normalise(text);
        if (plain is "°C")
        {
            unit = new Unit("°C", Dimension.OfTemperature, 1, PhysicalConstants.ZeroCelsius);
            fault = null;
            return true;
        }

        fault = Parse(text, plain, out unit);
        return fault is null;
    }

    private static string? Parse(string text, string plain, out Unit? unit)
    {
        unit = null;
        var symbol = new StringBuilder();
        var total = new UnitProduct();
        var at = 0;
        while (true)
        {
            var divide = false;
            if (total.Factors > 0)
            {
                divide = plain[at] == '/';
                symbol.Append(plain[at]);
                at++;
            }

            var end = plain.AsSpan(at).IndexOfAny('/', '·');
            end = end < 0 ? plain.Length : at + end;
            var word = plain[at..end];
            if (word.Length == 0)
            {
                return $"'{text}' is no unit: something is missing beside '{(at > 0 ? plain[at - 1] : plain[at])}'";
            }

            if (!(word is "1" && total.Factors == 0 && end < plain.Length && plain[end] == '/'))
            {
                if (Factor(text, word, total, divide, symbol) is { } fault)
                {
                    return fault;
                }
            }
            else
            {
                symbol.Append('1');
                total.Factors++;
            }

            if (end == plain.Length)
            {
                return total.Finish(text, symbol.ToString(), out unit);
            }

            at = end;
        }
    }

    private static string? Factor(
        string text,
        string word,
        UnitProduct total,
        bool divide,
        StringBuilder symbol
    )
    {
        var (name, exponent) = SplitExponent(word);
        if (exponent is 0 || Math.Abs(exponent) > MaxExponent)
        {
            return $"'{text}' is no unit: '{word}' has no usable exponent";
        }

        if (total.Factors == MaxFactors)
        {
            return string.Create(
                CultureInfo.InvariantCulture,
                $"'{text}' is no unit: it has more than {MaxFactors} factors"
            );
        }

        if (UnitNames.Atoms.TryGetValue(name, out var atom))
        {
            if (atom.Alone && text.Length != name.Length)
            {
                return $"'{text}' is no unit: '{name}' stands alone";
            }
        }
        else if (name.Length == 3 && name.All(char.IsAsciiLetterUpper))
        {
            if (
                total.Currency is not null
                && !string.Equals(total.Currency, name, StringComparison.Ordinal)
            )
            {
                return $"'{text}' is no unit: it mixes the currencies {total.Currency} and {name}";
            }

            total.Currency = name;
            atom = new UnitAtom(name, new Dimension(Currency: 1), 1, 0);
        }
        else
        {
            return Unknown(text, name);
        }

        total.Multiply(atom, divide ? -exponent : exponent);
        symbol.Append(atom.Symbol).Append(Superscript(exponent));
        return null;
    }

    private static string Unknown(string text, string name)
    {
        switch (name)
        {
            case "M" or "mM" or "µM":
                return $"'{name}' is not used for a concentration: write {name[..^1]}mol/L";
            case "N" or "mN":
                return $"'{name}' is not used for a concentration: write {name[..^1]}eq/L";
            case "°C":
                return $"'{text}' is no unit: °C stands alone; a difference in temperature is in K";
            case "ppt":
                return "'ppt' is not used: it means parts per thousand to some and per trillion to others; write g/kg or ng/kg";
            default:
                break;
        }

        var suggestion = UnitNames.Familiar.TryGetValue(name, out var ours)
            ? text.Replace(name, ours, StringComparison.Ordinal)
            : EditDistance.Closest(text, UnitNames.Common)
                ?? (
                    string.Equals(text, name, StringComparison.Ordinal)
                        ? EditDistance.Closest(
                            name,
                            UnitNames.Atoms.Keys.Order(StringComparer.Ordinal)
                        )
                        : null
                );
        var what = string.Equals(text, name, StringComparison.Ordinal)
            ? $"'{name}' is no unit"
            : $"'{name}' in '{text}' is no unit";
        return suggestion is null ? what : $"{what}: did you mean '{suggestion}'?";
    }

    private static (string Name, int Exponent) SplitExponent(string word)
    {
        // m3, m³ and m^3 are the same; a negative exponent needs the caret.
        var caret = word.IndexOf('^', StringComparison.Ordinal);
        if (caret > 0)
        {
            var ok = int.TryParse(
                word.AsSpan(caret + 1),
                NumberStyles.AllowLeadingSign,
                CultureInfo.InvariantCulture,
                out var exponent
            );
            return (word[..caret], ok ? exponent : 0);
        }

        return word.Length > 1 && char.IsAsciiDigit(word[^1])
            ? (word[..^1], word[^1] - '0')
            : (word, 1);
    }

    private static string Superscript(int exponent)
    {
        const string Digits = "⁰¹²³⁴";
        return exponent == 1 ? "" : $"{(exponent < 0 ? "⁻" : "")}{Digits[Math.Abs(exponent)]}";
    }

    private static string Normalise(string text)
    {
        var plain = new StringBuilder(text.Length);
        foreach (var c in text)
        {
            plain.Append(
                c switch
                {
                    '\u03BC' => 'µ',
                    '²' => '2',
                    '³' => '3',
                    '*' or '\u22C5' or '\u2219' or '\u2022' => '·',
                    '\u2212' => '-',
                    _ => c,
                }
            );
        }

        return plain.ToString() switch
        {
            "degC" or "ºC" or "\u2103" => "°C",
            var other => other,
        };
    }
}
