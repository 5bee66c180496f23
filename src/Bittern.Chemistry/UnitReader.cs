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

    private static readonly ImmutableDictionary<string, Atom> Atoms = BuildAtoms();

    // Spellings that turn up in laboratory reports, too far from ours for the edit distance.
    private static readonly ImmutableDictionary<string, string> Familiar = new Dictionary<
        string,
        string
    >(StringComparer.Ordinal)
    {
        ["gr"] = "g",
        ["gm"] = "g",
        ["mgr"] = "mg",
        ["mcg"] = "µg",
        ["kilo"] = "kg",
        ["ton"] = "t",
        ["tonne"] = "t",
        ["tonnes"] = "t",
        ["lt"] = "L",
        ["ltr"] = "L",
        ["liter"] = "L",
        ["litre"] = "L",
        ["cc"] = "cm3",
        ["sec"] = "s",
        ["mins"] = "min",
        ["minute"] = "min",
        ["hr"] = "h",
        ["hrs"] = "h",
        ["hour"] = "h",
        ["day"] = "d",
        ["days"] = "d",
        ["year"] = "a",
        ["yr"] = "a",
        ["mEq"] = "meq",
        ["mval"] = "meq",
        ["C"] = "°C",
        ["Celsius"] = "°C",
    }.ToImmutableDictionary(StringComparer.Ordinal);

    /// <summary>Units to suggest from when a text is none; every one reads without fault.</summary>
    public static ImmutableArray<string> Common { get; } =
    [
        "mg/L",
        "µg/L",
        "ng/L",
        "g/L",
        "g/m3",
        "kg/m3",
        "t/m3",
        "mmol/L",
        "mol/L",
        "mol/m3",
        "µmol/L",
        "meq/L",
        "eq/L",
        "mol/kg",
        "mmol/kg",
        "mg/kg",
        "g/kg",
        "%",
        "ppm",
        "ppb",
        "mL/L",
        "L/m3",
        "m3/h",
        "L/s",
        "L/h",
        "ML/d",
        "m3/d",
        "kg/h",
        "t/d",
        "kg",
        "g",
        "mg",
        "t",
        "L",
        "mL",
        "m3",
        "s",
        "min",
        "h",
        "d",
        "°C",
        "K",
        "atm",
        "bar",
        "mbar",
        "kPa",
        "Pa",
        "mV",
        "V",
        "EUR/kg",
        "EUR/t",
        "EUR/m3",
        "USD/t",
        "kJ/mol",
        "kcal/mol",
        "cm3/mol",
        "Bq/L",
        "mS/cm",
        "µS/cm",
        "kWh/m3",
    ];

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
        var total = new Product();
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
        Product total,
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

        if (Atoms.TryGetValue(name, out var atom))
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
            atom = new Atom(name, new Dimension(Currency: 1), 1, 0);
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

        var suggestion = Familiar.TryGetValue(name, out var ours)
            ? text.Replace(name, ours, StringComparison.Ordinal)
            : EditDistance.Closest(text, Common)
                ?? (
                    string.Equals(text, name, StringComparison.Ordinal)
                        ? EditDistance.Closest(name, Atoms.Keys.Order(StringComparer.Ordinal))
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

    private static ImmutableDictionary<string, Atom> BuildAtoms()
    {
        var atoms = ImmutableDictionary.CreateBuilder<string, Atom>(StringComparer.Ordinal);
        var charge = new Dimension(Equivalents: 1);
        var current = new Dimension(Current: 1);
        var conductance = Dimension.Conductivity * new Dimension(Length: 1);
        Add("g", Dimension.OfMass, 1, -3, "kmµnp");
        Add("t", Dimension.OfMass, 1, 3, "k");
        Add("L", Dimension.Volume, 1, -3, "Mkmµ", alias: "l");
        Add("m", new Dimension(Length: 1), 1, 0, "kcdmµ");
        Add("s", Dimension.OfTime, 1, 0, "m");
        Add("min", Dimension.OfTime, 60, 0, "");
        Add("h", Dimension.OfTime, 3600, 0, "");
        Add("d", Dimension.OfTime, 86400, 0, "");
        Add("a", Dimension.OfTime, 31_557_600, 0, "");
        Add("mol", Dimension.OfAmount, 1, 0, "kmµnp");
        Add("eq", charge, 1, 0, "kmµ");
        Add("K", Dimension.OfTemperature, 1, 0, "");
        Add("Pa", Dimension.Pressure, 1, 0, "hkM");
        Add("bar", Dimension.Pressure, 1, 5, "m");
        Add("atm", Dimension.Pressure, PhysicalConstants.Atmosphere, 0, "mµ");
        Add("V", Dimension.Voltage, 1, 0, "mµ");
        Add("A", current, 1, 0, "mk");
        Add("S", conductance, 1, 0, "mµ");
        Add("J", Dimension.Energy, 1, 0, "kM");
        Add("cal", Dimension.Energy, 4.184, 0, "k");
        Add("W", Dimension.Energy / Dimension.OfTime, 1, 0, "kM");
        Add("Wh", Dimension.Energy, 3600, 0, "kM");
        Add("Bq", Dimension.None / Dimension.OfTime, 1, 0, "mkMG");
        Add("Ci", Dimension.None / Dimension.OfTime, 3.7, 10, "pnµm");
        AddRatio("%", -2, null);
        AddRatio("ppm", -6, Dimension.OfMass);
        AddRatio("ppb", -9, Dimension.OfMass);
        return atoms.ToImmutable();

        void Add(
            string name,
            Dimension dimension,
            double mantissa,
            int power,
            string prefixes,
            string? alias = null
        )
        {
            foreach (var prefix in prefixes.Prepend(' '))
            {
                var mark = prefix == ' ' ? "" : prefix.ToString();
                var atom = new Atom(mark + name, dimension, mantissa, power + PowerOf(prefix));
                atoms[mark + name] = atom;
                if (alias is not null)
                {
                    atoms[mark + alias] = atom;
                }

                if (prefix == 'µ')
                {
                    atoms["u" + name] = atom;
                    if (alias is not null)
                    {
                        atoms["u" + alias] = atom;
                    }
                }
            }
        }

        void AddRatio(string name, int power, Dimension? of) =>
            atoms[name] = new Atom(name, Dimension.None, 1, power) { Alone = true, RatioOf = of };
    }

    private static int PowerOf(char prefix) =>
        prefix switch
        {
            'G' => 9,
            'M' => 6,
            'k' => 3,
            'h' => 2,
            'd' => -1,
            'c' => -2,
            'm' => -3,
            'µ' => -6,
            'n' => -9,
            'p' => -12,
            _ => 0,
        };

    // One named unit with its prefix: mantissa · 10^power SI units.
    private sealed record Atom(string Symbol, Dimension Dimension, double Mantissa, int Power)
    {
        public bool Alone { get; init; }

        public Dimension? RatioOf { get; init; }
    }

    // Mantissa and power of ten are kept apart so that mg/L is 0.001 to the last bit.
    private sealed class Product
    {
        private readonly List<(Atom Atom, int Exponent)> _atoms = [];

        public int Factors { get; set; }

        public string? Currency { get; set; }

        public void Multiply(Atom atom, int exponent)
        {
            _atoms.Add((atom, exponent));
            Factors++;
        }

        public string? Finish(string text, string symbol, out Unit? unit)
        {
            unit = null;
            var above = 1.0;
            var below = 1.0;
            var power = 0;
            var dimension = Dimension.None;
            foreach (var (atom, exponent) in _atoms)
            {
                var mantissa = Math.Pow(atom.Mantissa, Math.Abs(exponent));
                above *= exponent > 0 ? mantissa : 1;
                below *= exponent < 0 ? mantissa : 1;
                power += atom.Power * exponent;
                dimension *= atom.Dimension.Power(exponent);
            }

            // Powers of ten up to 10^22 are exact, so that multiplying or dividing by one rounds once.
            var factor =
                power < 0
                    ? above / below / Math.Pow(10, -power)
                    : above / below * Math.Pow(10, power);
            if (!double.IsNormal(factor))
            {
                return $"'{text}' is no unit: its size is out of range";
            }

            Dimension? ratio = _atoms[0].Atom.RatioOf;
            if (dimension == Dimension.None && _atoms.Count > 1)
            {
                ratio = _atoms[0].Atom.Dimension.Power(_atoms[0].Exponent);
            }

            unit = new Unit(symbol, dimension, factor, 0) { RatioOf = ratio, Currency = Currency };
            return null;
        }
    }
}
