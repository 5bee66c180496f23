namespace Bittern.Chemistry;

/// <summary>Oxidation states as chemists write them after an element, and as simple formulas imply them.</summary>
public static class OxidationState
{
    private static readonly string[] Numerals =
    [
        "0",
        "I",
        "II",
        "III",
        "IV",
        "V",
        "VI",
        "VII",
        "VIII",
    ];

    /// <summary>
    /// Reads <c>Fe(III)</c>, <c>As(V)</c>, <c>S(-II)</c>, <c>Se(0)</c>. False when the text is anything else or the symbol is no element.
    /// </summary>
    /// <param name="text">The whole token.</param>
    /// <param name="symbol">The element's symbol; empty on failure.</param>
    /// <param name="state">The oxidation state, -VIII to VIII.</param>
    public static bool TryRead(string text, out string symbol, out int state)
    {
        symbol = "";
        state = 0;
        var open = text.IndexOf('(', StringComparison.Ordinal);
        if (open < 1 || text[^1] != ')' || !PeriodicTable.BySymbol.ContainsKey(text[..open]))
        {
            return false;
        }

        var numeral = text.AsSpan(open + 1, text.Length - open - 2);
        var negative = numeral.Length > 1 && numeral[0] is '-' or '\u2212';
        if (negative)
        {
            numeral = numeral[1..];
        }

        for (var value = negative ? 1 : 0; value < Numerals.Length; value++)
        {
            if (numeral.SequenceEqual(Numerals[value]))
            {
                symbol = text[..open];
                state = negative ? -value : value;
                return true;
            }
        }

        return false;
    }

    /// <summary>The token for a state: <c>Fe(III)</c>.</summary>
    public static string Text(string symbol, int state) =>
        $"{symbol}({(state < 0 ? "-" : "")}{Numerals[Math.Abs(state)]})";

    /// <summary>
    /// Oxidation state of <paramref name="symbol"/> in a simple species: one element carries the charge; with others, H counts +1 and
    /// O −2 and the one remaining element takes the rest. Null when the element is absent, when two elements remain, or when the state is
    /// no whole number (mixed valence).
    /// </summary>
    public static int? In(Formula species, string symbol)
    {
        var atoms = species.AtomsOf(symbol);
        if (atoms <= 0)
        {
            return null;
        }

        if (
            species.Atoms.Keys.Any(e =>
                !string.Equals(e, symbol, StringComparison.Ordinal) && e is not ("H" or "O")
            )
        )
        {
            // Hydrogen and oxygen keep their usual states beside any one other element; others are ambiguous.
            var others = species.Atoms.Keys.Count(e => e is not ("H" or "O"));
            return (symbol, others) switch
            {
                ("H", 1) => 1,
                ("O", 1) => -2,
                _ => null,
            };
        }

        // In water-like species (OH-, H2O2) hydrogen is fixed and oxygen takes the rest.
        var hydrogen = symbol is "H" ? 0 : species.AtomsOf("H");
        var oxygen = symbol is "O" ? 0 : species.AtomsOf("O");
        if (symbol is "H" && oxygen > 0)
        {
            return 1;
        }

        var state = (species.Charge - hydrogen + (2 * oxygen)) / atoms;
        var whole = Math.Round(state);
        return Math.Abs(state - whole) < 1e-9 ? (int)whole : null;
    }
}
