using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Engine;
using Bittern.Engine.Activity;
using Bittern.Engine.Water;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>A recipe's chemistry compiled for the engine, with the way back from indices to species.</summary>
internal sealed class EngineSystem
{
    private readonly Dictionary<string, int> _basisIndex;
    private readonly LiquorVolume _volume;

    private EngineSystem(
        ChemicalSystem chemistry,
        EquilibriumSystem system,
        ImmutableArray<Species> basis,
        ImmutableArray<Species> aqueous,
        ImmutableArray<Species> solids,
        ImmutableArray<Species> gases
    )
    {
        Chemistry = chemistry;
        System = system;
        Basis = basis;
        Aqueous = aqueous;
        Solids = solids;
        Gases = gases;
        _basisIndex = basis
            .Select((b, i) => (b.Formula.Text, i))
            .ToDictionary(p => p.Text, p => p.i, StringComparer.Ordinal);
        HydrogenIndex = _basisIndex["H+"];
        _volume = new LiquorVolume([
            .. aqueous.Select(a => (a.Name, a.Formula.Charge, MolarVolume(a))),
        ]);

        // A complex without a volume of its own counts what it is formed from.
        static double MolarVolume(Species species) =>
            LiquorVolume.IonVolume(species.Name)
            ?? species.FromBasis.Sum(t =>
                t.Coefficient
                * (t.Species.IsWater ? 18.07 : LiquorVolume.IonVolume(t.Species.Text) ?? 0)
            );
    }

    public ChemicalSystem Chemistry { get; }

    public EquilibriumSystem System { get; }

    /// <summary>Basis species in the engine's component order.</summary>
    public ImmutableArray<Species> Basis { get; }

    /// <summary>Dissolved species in the engine's order.</summary>
    public ImmutableArray<Species> Aqueous { get; }

    public ImmutableArray<Species> Solids { get; }

    public ImmutableArray<Species> Gases { get; }

    public int HydrogenIndex { get; }

    public static EngineSystem Build(ChemicalSystem chemistry, IActivityModel model)
    {
        // Without shared electrons a species formed over e- cannot be placed: oxidation states stand side by side.
        ImmutableArray<Species> basis =
        [
            .. chemistry.Basis.Where(b => !b.Formula.IsElectron && !b.Formula.IsWater),
        ];
        var names = basis
            .Select((b, i) => (b.Formula.Text, i))
            .ToDictionary(p => p.Text, p => p.i, StringComparer.Ordinal);
        bool CanPlace(Species s) =>
            s.FromBasis.All(t => t.Species.IsWater || names.ContainsKey(t.Species.Text));
        ImmutableArray<Species> complexes = [.. chemistry.Complexes.Where(CanPlace)];
        ImmutableArray<Species> solids = [.. chemistry.Solids.Where(CanPlace)];
        ImmutableArray<Species> gases = [.. chemistry.Gases.Where(CanPlace)];
        var system = EquilibriumSystem.Compile(
            basis.Select(b => new Component(b.Formula.Text, b.Formula.Charge)),
            complexes.Select(Formation),
            solids.Select(Formation),
            gases.Select(Formation),
            model
        );
        return new EngineSystem(chemistry, system, basis, [.. basis, .. complexes], solids, gases);

        Formation Formation(Species species)
        {
            var coefficients = new double[basis.Length];
            var water = 0.0;
            foreach (var term in species.FromBasis)
            {
                if (term.Species.IsWater)
                {
                    water += term.Coefficient;
                }
                else
                {
                    coefficients[names[term.Species.Text]] += term.Coefficient;
                }
            }

            return new Formation(
                species.Name,
                species.Kind is SpeciesKind.Complex ? species.Formula.Charge : 0,
                [.. coefficients],
                water,
                kelvin => species.Log10FormationAt(kelvin - PhysicalConstants.ZeroCelsius)
            );
        }
    }

    /// <summary>Index of a basis species; -1 when the engine does not carry it.</summary>
    public int IndexOf(Formula basis) => _basisIndex.GetValueOrDefault(basis.Text, -1);

    /// <summary>Adds amount · terms to totals (mol) and water (mol).</summary>
    public void AddTerms(
        ImmutableArray<Term> terms,
        double amount,
        double[] totals,
        ref double water
    )
    {
        foreach (var term in terms)
        {
            if (term.Species.IsWater)
            {
                water += amount * term.Coefficient;
            }
            else
            {
                var index = IndexOf(term.Species);
                totals[
                    index >= 0
                        ? index
                        : throw new InvalidOperationException(
                            $"{term.Species.Text} is no basis species of this recipe"
                        )
                ] += amount * term.Coefficient;
            }
        }
    }

    /// <summary>m3 of the liquor of an answer.</summary>
    public double Volume(Answer answer, double kelvin) =>
        _volume.CubicMetres(answer.Molalities, answer.WaterKilograms, kelvin);

    /// <summary>kg of the liquor of an answer, suspended solids left out.</summary>
    public double LiquorMass(Answer answer)
    {
        var grams = 0.0;
        for (var j = 0; j < Aqueous.Length; j++)
        {
            grams += Aqueous[j].Formula.MolarMass * answer.Molalities[j];
        }

        return answer.WaterKilograms * (1 + (grams / 1000));
    }

    /// <summary>Dissolved mol of a basis species in an answer.</summary>
    public double Dissolved(Answer answer, int basis)
    {
        var sum = 0.0;
        for (var j = 0; j < Aqueous.Length; j++)
        {
            sum += System.Species[j].Coefficients[basis] * answer.Molalities[j];
        }

        return sum * answer.WaterKilograms;
    }
}
