using System.Text.RegularExpressions;
using Bittern.Chemistry;
using Markdig.Syntax;
using Markdig.Syntax.Inlines;

namespace Bittern.Reports.Html;

/// <summary>
/// Sets chemical formulas in running text with their subscripts and superscripts: <c>SO4^2-</c> as SO₄²⁻. Code stays as it is, and so does every word that is
/// not plainly a formula.
/// </summary>
internal static partial class FormulaTypesetting
{
    /// <summary>Ions whose text has neither digit nor caret; any other word with a plus or hyphen at its end may be a word.</summary>
    private static readonly HashSet<string> ShortIons = new(StringComparer.Ordinal)
    {
        "H+",
        "Li+",
        "Na+",
        "K+",
        "Rb+",
        "Cs+",
        "Ag+",
        "Cu+",
        "F-",
        "Cl-",
        "Br-",
        "I-",
        "OH-",
        "HS-",
        "CN-",
    };

    /// <summary>A hyphen set as a superscript is a speck; the minus sign is what is meant.</summary>
    private const char Minus = '\u2212';

    public static void Apply(MarkdownDocument document)
    {
        foreach (var literal in document.Descendants<LiteralInline>().ToArray())
        {
            var text = literal.Content.ToString();
            var at = 0;
            Inline last = literal;
            foreach (Match word in Word().Matches(text))
            {
                var formula = WithoutStrayBrackets(word.Value);
                if (IsFormula(formula))
                {
                    last = Add(last, text[at..word.Index]);
                    last = Set(last, formula);
                    at = word.Index + formula.Length;
                }
            }

            if (at > 0)
            {
                Add(last, text[at..]);
                literal.Remove();
            }
        }
    }

    // In 'dissolved(SO4)' the last bracket belongs to the words around.
    private static string WithoutStrayBrackets(string word)
    {
        while (word.EndsWith(')') && word.Count(c => c == ')') > word.Count(c => c == '('))
        {
            word = word[..^1];
        }

        return word;
    }

    // A formula of one element without charge or state (B2, C3) may be a revision or a room: only compounds and marked species count.
    private static bool IsFormula(string word)
    {
        if (
            !FormulaReader.Standard.TryRead(word, out var formula, out _)
            || formula is null
            || formula.IsElectron
        )
        {
            return false;
        }

        var hasDigit = word.AsSpan().ContainsAnyInRange('0', '9');
        return ShortIons.Contains(word)
            || (hasDigit && (formula.Charge != 0 || formula.Phase != PhaseMark.None))
            || (hasDigit && formula.Atoms.Count > 1);
    }

    private static Inline Set(Inline after, string formula)
    {
        var last = after;
        var at = 0;
        foreach (Match part in Part().Matches(formula))
        {
            last = Add(last, formula[at..part.Index]);
            var charge = part.Groups["charge"];
            last = charge.Success
                ? Wrap(last, "sup", charge.Value.Replace('-', Minus))
                : Wrap(last, "sub", part.Value);
            at = part.Index + part.Length;
        }

        return Add(last, formula[at..]);
    }

    private static Inline Wrap(Inline after, string tag, string text)
    {
        var open = new HtmlInline($"<{tag}>");
        after.InsertAfter(open);
        var inner = new LiteralInline(text);
        open.InsertAfter(inner);
        var close = new HtmlInline($"</{tag}>");
        inner.InsertAfter(close);
        return close;
    }

    private static Inline Add(Inline after, string text)
    {
        if (text.Length == 0)
        {
            return after;
        }

        var literal = new LiteralInline(text);
        after.InsertAfter(literal);
        return literal;
    }

    [GeneratedRegex(
        @"(?<![\w^./-])[A-Z][A-Za-z0-9()\[\].·]*(\^[0-9]{1,2})?[+-]?(\((aq|g|s|l)\))?(?![\w^/])",
        RegexOptions.ExplicitCapture
    )]
    private static partial Regex Word();

    // Digits after an element or bracket are subscripts, those after the dot of a hydrate are not; a charge stands at the end or before the state.
    [GeneratedRegex(
        @"(?<=[A-Za-z)\]])[0-9]+(\.[0-9]+)?|\^?(?<charge>((?<=\^)[0-9]+)?[+-])(?=$|\()",
        RegexOptions.ExplicitCapture
    )]
    private static partial Regex Part();
}
