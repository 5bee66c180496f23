using System.Collections.Frozen;

namespace Bittern.Language.Lexing;

/// <summary>
/// The words of the language. Each has a character in the private-use area, so that the grammar tells them apart by one character;
/// wherever a name may stand, a keyword is a name too.
/// </summary>
public static class Keywords
{
    private const char First = '\uE000';

    /// <summary>All keywords, in ordinal order.</summary>
    public static IReadOnlyList<string> All { get; } =
    [
        .. new[]
        {
            "activity",
            "ion-size",
            "lambda",
            "pitzer",
            "pitzer-slope",
            "psi",
            "set",
            "sit",
            "theta",
            "truesdell-jones",
            "zeta",
            "add",
            "alkalinity",
            "any",
            "as",
            "at",
            "atmosphere",
            "because",
            "blend",
            "by",
            "catalogue",
            "charge",
            "cite",
            "client",
            "closed",
            "complex",
            "contact",
            "cool",
            "date",
            "density",
            "doubt",
            "element",
            "except",
            "feed",
            "form",
            "from",
            "gas",
            "half-reaction",
            "half",
            "heat",
            "held",
            "back",
            "hold",
            "ion",
            "limit",
            "limits",
            "liquor",
            "log",
            "mix",
            "most",
            "of",
            "on",
            "override",
            "oxidise",
            "price",
            "purity",
            "reagent",
            "recalled",
            "recipe",
            "reduce",
            "reference",
            "report",
            "revision",
            "settle",
            "solid",
            "solids",
            "solute",
            "stage",
            "temperature",
            "text",
            "to",
            "train",
            "until",
            "use",
            "valid",
            "which",
            "with",
            "within",
            "zero",
            "pH",
        }.Order(StringComparer.Ordinal),
    ];

    private static readonly FrozenDictionary<string, char> Kinds = All.Select(
            (word, index) => (word, Kind: (char)(First + index))
        )
        .ToFrozenDictionary(p => p.word, p => p.Kind, StringComparer.Ordinal);

    /// <summary>Kind of a word: its own when it is a keyword, else <see cref="TokenKind.Name"/>.</summary>
    public static char KindOf(string word) => Kinds.GetValueOrDefault(word, TokenKind.Name);

    /// <summary>Kind of a keyword; throws on a word that is none (a slip in the grammar).</summary>
    public static char Of(string word) => Kinds[word];

    /// <summary>True when a kind is a keyword's.</summary>
    public static bool IsKeyword(char kind) => kind >= First && kind < First + All.Count;
}
