namespace Bittern.Engine.Activity;

/// <summary>
/// Which molalities a model of specific interactions must see one by one. Every species belongs to exactly one group: a species with parameters is
/// a group of its own, the others are grouped by charge. The moments are the groups' molalities, so that ln γ_j = ∂g/∂q_(group of j).
/// </summary>
internal sealed class MomentGroups
{
    private readonly int[] _groupOf;
    private readonly int[] _charges;
    private readonly int[] _firstOf;
    private readonly double[] _weights;

    public MomentGroups(EquilibriumSystem system, IReadOnlySet<string> takingPart)
    {
        var count = system.Species.Length;
        _groupOf = new int[count];
        var charges = new List<int>();
        var firsts = new List<int>();
        for (var j = 0; j < count; j++)
        {
            _groupOf[j] = -1;
            if (takingPart.Contains(system.Species[j].Name))
            {
                Open(j);
            }
        }

        var single = charges.Count;
        for (var j = 0; j < count; j++)
        {
            if (_groupOf[j] >= 0)
            {
                continue;
            }

            var group = charges.IndexOf(system.SpeciesCharges[j], single);
            if (group < 0)
            {
                Open(j);
            }
            else
            {
                _groupOf[j] = group;
            }
        }

        _charges = [.. charges];
        _firstOf = [.. firsts];
        _weights = new double[_charges.Length * count];
        for (var j = 0; j < count; j++)
        {
            _weights[(_groupOf[j] * count) + j] = 1;
        }

        void Open(int species)
        {
            _groupOf[species] = charges.Count;
            charges.Add(system.SpeciesCharges[species]);
            firsts.Add(species);
        }
    }

    /// <summary>Number of groups, which is the number of moments.</summary>
    public int Count => _charges.Length;

    /// <summary>Charge number that all species of a group share.</summary>
    public ReadOnlySpan<int> Charges => _charges;

    /// <summary>A species of each group.</summary>
    public ReadOnlySpan<int> FirstOf => _firstOf;

    /// <summary>Group of each species.</summary>
    public ReadOnlySpan<int> GroupOf => _groupOf;

    public ReadOnlySpan<double> Weights => _weights;
}
