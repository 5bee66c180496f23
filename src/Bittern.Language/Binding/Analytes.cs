using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Model;

namespace Bittern.Language.Binding;

/// <summary>What a name in an analysis stands for.</summary>
/// <param name="PerMole">Basis species, H+ and water that one mole brings.</param>
/// <param name="Formula">What one mole weighs as.</param>
/// <param name="Charge">Charge number of what is counted, 0 for a compound.</param>
/// <param name="Assumption">What was taken for granted; null when nothing.</param>
internal sealed record Analyte(
    ImmutableArray<Term> PerMole,
    Formula Formula,
    int Charge,
    string? Assumption
);

/// <summary>Finds what the names of laboratories mean over a recipe's basis.</summary>
internal sealed class Analytes
{
    private readonly ImmutableArray<Species> _dissolved;
    private readonly ImmutableArray<Species> _basis;

    public Analytes(ImmutableArray<Species> species)
    {
        _dissolved =
        [
            .. species.Where(s =>
                s.Kind is SpeciesKind.Basis or SpeciesKind.Complex
                && !s.FromBasis.Any(t => t.Species.IsElectron)
            ),
        ];
        _basis = [.. _dissolved.Where(s => s.Kind == SpeciesKind.Basis)];
    }

    /// <summary>Names that could have been meant, for suggestions.</summary>
    public IEnumerable<string> Names =>
        _basis
            .SelectMany(b => b.Formula.Atoms.Keys.Append(b.Formula.Text.TrimEnd('+', '-')))
            .Distinct(StringComparer.Ordinal);

    /// <summary>The analyte of a token; null when nothing in the recipe's chemistry fits.</summary>
    public Analyte? Resolve(string text)
    {
        if (OxidationState.TryRead(text, out var symbol, out var state))
        {
            var found =
                _basis.FirstOrDefault(b => OxidationState.In(b.Formula, symbol) == state)
                ?? _dissolved.FirstOrDefault(b => OxidationState.In(b.Formula, symbol) == state);
            return found is null ? null : PerAtom(found, symbol, null);
        }

        if (!FormulaReader.Standard.TryRead(text, out var formula, out _))
        {
            return null;
        }

        return Exact(formula!) ?? SingleElement(formula!) ?? Compound(formula!) ?? Ion(formula!);
    }

    // The very species, or a primary one whose charge an analysis leaves out: SO4, NH4.
    private Analyte? Exact(Formula formula)
    {
        if (formula.Charge == 0 && formula.Atoms.Count == 1 && formula.Atoms.First().Value == 1)
        {
            return null;
        }

        var found =
            _dissolved.FirstOrDefault(s => s.Formula.Equals(formula))
            ?? (
                formula.Phase == PhaseMark.None && formula.Charge == 0
                    ? _basis.FirstOrDefault(s => s.Formula.SameAtomsAs(formula))
                    : null
            );
        return found is null
            ? null
            : new Analyte(found.FromBasis, found.Formula, found.Formula.Charge, null);
    }

    // An ion that is no primary species and whose charge is left out: HCO3, HSO4. A formula that balances as a compound never gets here, because FeSO4
    // is ferrous sulfate and not the ferric complex FeSO4+.
    private Analyte? Ion(Formula formula)
    {
        var found =
            formula.Phase == PhaseMark.None && formula.Charge == 0
                ? _dissolved.FirstOrDefault(s =>
                    s.Formula.Charge != 0 && s.Formula.SameAtomsAs(formula)
                )
                : null;
        return found is null
            ? null
            : new Analyte(found.FromBasis, found.Formula, found.Formula.Charge, null);
    }

    private Analyte? SingleElement(Formula formula)
    {
        if (
            formula.Charge != 0
            || formula.Atoms.Count != 1
            || formula.Atoms.First() is not { Value: 1, Key: var symbol }
            || symbol is "H" or "O"
        )
        {
            return null;
        }

        var candidates = _basis.Where(b => b.Formula.AtomsOf(symbol) > 0).ToList();
        if (candidates.Count == 0)
        {
            return null;
        }

        var states = candidates
            .Select(c => OxidationState.In(c.Formula, symbol))
            .OfType<int>()
            .Distinct()
            .ToList();
        // Two simple ions (Fe^2+, Fe^3+) leave the state open; oxyanions beside one simple ion (MnO4- beside Mn^2+) do not.
        var isOpen =
            states.Count > 1
            && (
                candidates[0].Formula.Atoms.Count > 1
                || candidates.Skip(1).Any(c => c.Formula.Atoms.Count == 1)
            );
        var assumption =
            isOpen && OxidationState.In(candidates[0].Formula, symbol) is { } first
                ? $"{symbol} without an oxidation state is taken as {OxidationState.Text(symbol, first)}"
            : candidates[0].Formula.Atoms.Count > 1
                ? $"{symbol} is taken as {candidates[0].Formula.Text}"
            : null;
        return PerAtom(candidates[0], symbol, assumption);
    }

    private static Analyte PerAtom(Species species, string symbol, string? assumption)
    {
        var atoms = species.Formula.AtomsOf(symbol);
        return new Analyte(
            [.. species.FromBasis.Select(t => t with { Coefficient = t.Coefficient / atoms })],
            FormulaReader.Standard.Read(symbol),
            (int)Math.Round(species.Formula.Charge / atoms),
            assumption
        );
    }

    // A salt, acid, base or oxide: each element through one basis species, the rest by H+ and water, so that elements and charge balance.
    private Analyte? Compound(Formula formula)
    {
        if (formula.Charge != 0)
        {
            return null;
        }

        var elements = formula.Atoms.Keys.Where(e => e is not ("H" or "O")).ToList();
        if (elements.Count == 0 && formula.IsWater)
        {
            return new Analyte([new Term(1, formula)], formula, 0, null);
        }

        var choices = elements.ConvertAll(e =>
            _basis
                .Where(b =>
                    b.Formula.AtomsOf(e) > 0
                    && b.Formula.Atoms.Keys.All(k => k is "H" or "O" || formula.AtomsOf(k) > 0)
                )
                .ToList()
        );
        return choices.Exists(c => c.Count == 0)
            ? null
            : Combine(formula, elements, choices, 0, []);
    }

    private static Analyte? Combine(
        Formula formula,
        List<string> elements,
        List<List<Species>> choices,
        int index,
        List<(string Element, Species Species)> chosen
    )
    {
        if (index == elements.Count)
        {
            return Balance(formula, chosen);
        }

        foreach (var choice in choices[index])
        {
            chosen.Add((elements[index], choice));
            if (Combine(formula, elements, choices, index + 1, chosen) is { } found)
            {
                return found;
            }

            chosen.RemoveAt(chosen.Count - 1);
        }

        return null;
    }

    private static Analyte? Balance(Formula formula, List<(string Element, Species Species)> chosen)
    {
        var terms = new Dictionary<string, Term>(StringComparer.Ordinal);
        double hydrogen = formula.AtomsOf("H"),
            oxygen = formula.AtomsOf("O"),
            charge = 0;
        foreach (var (element, species) in chosen)
        {
            var coefficient = formula.AtomsOf(element) / species.Formula.AtomsOf(element);
            if (terms.ContainsKey(species.Formula.Text))
            {
                if (Math.Abs(terms[species.Formula.Text].Coefficient - coefficient) > 1e-9)
                {
                    return null;
                }

                continue;
            }

            terms.Add(species.Formula.Text, new Term(coefficient, species.Formula));
            hydrogen -= coefficient * species.Formula.AtomsOf("H");
            oxygen -= coefficient * species.Formula.AtomsOf("O");
            charge += coefficient * species.Formula.Charge;
        }

        // H2O takes the oxygen, H+ the rest of the hydrogen; the charge must then close.
        var water = oxygen;
        var protons = hydrogen - (2 * water);
        if (Math.Abs(charge + protons) > 1e-9)
        {
            return null;
        }

        var result = terms.Values.ToList();
        if (Math.Abs(protons) > 1e-12)
        {
            result.Add(new Term(protons, FormulaReader.Standard.Read("H+")));
        }

        if (Math.Abs(water) > 1e-12)
        {
            result.Add(new Term(water, FormulaReader.Standard.Read("H2O")));
        }

        return new Analyte([.. result], formula, 0, null);
    }

    /// <summary>
    /// g of a substance that one mole of an analyte counts as: by shared atoms (<c>NO3 as N</c>), else by equivalents (<c>Mg as CaCO3</c>). Null when neither applies.
    /// </summary>
    public static double? MassAs(Analyte analyte, Formula counted)
    {
        var shared = counted.Atoms.Keys.FirstOrDefault(e =>
            e is not ("H" or "O") && analyte.Formula.AtomsOf(e) > 0
        );
        if (shared is not null)
        {
            return counted.MolarMass * analyte.Formula.AtomsOf(shared) / counted.AtomsOf(shared);
        }

        return counted.Text is "CaCO3" && analyte.Charge != 0
            ? counted.MolarMass * Math.Abs(analyte.Charge) / 2
            : null;
    }
}
