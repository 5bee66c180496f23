using System.Collections.Immutable;
using System.Globalization;

namespace Bittern.Chemistry;

/// <summary>Why a text is not a formula, and where in the text.</summary>
/// <param name="Offset">Zero-based character offset of the fault in the text given.</param>
/// <param name="Length">Characters at fault.</param>
/// <param name="Message">One sentence.</param>
/// <param name="UnknownSymbol">The symbol that is no element, when that is the fault.</param>
public sealed record FormulaFault(
    int Offset,
    int Length,
    string Message,
    string? UnknownSymbol = null
);

/// <summary>
/// Reads formulas as chemists write them in plain text: <c>Ca^2+</c>, <c>SO4^2-</c>, <c>Fe(OH)3</c>, <c>CaSO4·2H2O</c>
/// (<c>*</c> accepted for <c>·</c>), <c>CO2(g)</c>, <c>CaSO4·0.5H2O</c>, <c>e-</c>. An ion may carry <c>(aq)</c>, which is dropped: dissolved is
/// what ions are here. An oxidation state, <c>Fe(III)</c>, is no formula.
/// </summary>
public sealed class FormulaReader
{
    /// <summary>Nesting of brackets that is accepted.</summary>
    public const int MaxNesting = 12;

    /// <summary>Characters that a formula may have.</summary>
    public const int MaxLength = 200;

    /// <summary>Largest count after a symbol, a bracket or a dot.</summary>
    public const double MaxCount = 9999;

    private readonly ImmutableDictionary<string, Element> _elements;

    /// <summary>A reader that knows the periodic table.</summary>
    public static FormulaReader Standard { get; } = new(PeriodicTable.BySymbol);

    private FormulaReader(ImmutableDictionary<string, Element> elements) => _elements = elements;

    /// <summary>The same reader with one more (pseudo-)element.</summary>
    public FormulaReader With(Element element) => new(_elements.SetItem(element.Symbol, element));

    /// <summary>All symbols that are known, in ordinal order.</summary>
    public IEnumerable<string> Symbols => _elements.Keys.Order(StringComparer.Ordinal);

    /// <summary>Reads a formula; a text that is none throws <see cref="FormatException"/>. For code and tests; recipes use <see cref="TryRead"/>.</summary>
    public Formula Read(string text) =>
        TryRead(text, out var formula, out var fault)
            ? formula!
            : throw new FormatException($"'{text}': {fault!.Message}");

    /// <summary>Reads a formula, or says why the text is none.</summary>
    public bool TryRead(string text, out Formula? formula, out FormulaFault? fault)
    {
        formula = null;
        if (text.Length == 0 || text.Length > MaxLength)
        {
            fault = new FormulaFault(
                0,
                text.Length,
                text.Length == 0
                    ? "a formula is missing"
                    : $"a formula has at most {MaxLength} characters"
            );
            return false;
        }

        if (text is "e-")
        {
            formula = new Formula(
                "e-",
                ImmutableSortedDictionary<string, double>.Empty,
                -1,
                PhaseMark.None,
                0
            );
            fault = null;
            return true;
        }

        var scan = new FormulaScan(Plain(text), _elements);
        fault = scan.Run();
        if (fault is not null)
        {
            return false;
        }

        var mass = 0.0;
        var atoms = ImmutableSortedDictionary.CreateBuilder<string, double>(StringComparer.Ordinal);
        foreach (var (symbol, count) in scan.Atoms)
        {
            atoms[symbol] = count;
        }

        foreach (var (symbol, count) in atoms)
        {
            mass += count * _elements[symbol].MolarMass;
        }

        formula = new Formula(
            scan.CanonicalText,
            atoms.ToImmutable(),
            scan.Charge,
            scan.Phase,
            mass
        );
        return true;
    }

    // Look-alikes, one character for one, so that offsets stay.
    private static string Plain(string text) =>
        string.Create(
            text.Length,
            text,
            static (span, source) =>
            {
                for (var i = 0; i < span.Length; i++)
                {
                    span[i] = source[i] switch
                    {
                        '*' or '\u22C5' or '\u2219' or '\u2022' => '·',
                        '\u2212' => '-',
                        var other => other,
                    };
                }
            }
        );
}
