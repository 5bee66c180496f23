using Bittern.Engine.Activity;

namespace Bittern.Engine;

/// <summary>
/// Builds a system in code, a line a species. Reactions list what one mole is formed from; water goes by the name <c>H2O</c>.
/// </summary>
/// <example>
/// <code>
/// var system = new SystemBuilder()
///     .Component("Ca^2+", 2).Component("SO4^2-", -2)
///     .Complex("CaSO4(aq)", 0, 2.30, ("Ca^2+", 1), ("SO4^2-", 1))
///     .Solid("gypsum", 4.58, ("Ca^2+", 1), ("SO4^2-", 1), ("H2O", 2))
///     .Build(new Davies());
/// </code>
/// </example>
public sealed class SystemBuilder
{
    private readonly List<Component> _components = [];
    private readonly List<(
        string Name,
        int Charge,
        Func<double, double> Log10K,
        (string Of, double Coefficient)[] From
    )> _complexes = [];
    private readonly List<(
        string Name,
        int Charge,
        Func<double, double> Log10K,
        (string Of, double Coefficient)[] From
    )> _solids = [];
    private readonly List<(
        string Name,
        int Charge,
        Func<double, double> Log10K,
        (string Of, double Coefficient)[] From
    )> _gases = [];

    /// <summary>Adds a primary species.</summary>
    public SystemBuilder Component(string name, int charge, bool isDissolved = true)
    {
        _components.Add(new Component(name, charge, isDissolved));
        return this;
    }

    /// <summary>Adds a dissolved species with log10 of its formation constant, the same at every temperature.</summary>
    public SystemBuilder Complex(
        string name,
        int charge,
        double log10K,
        params (string Of, double Coefficient)[] from
    )
    {
        _complexes.Add((name, charge, _ => log10K, from));
        return this;
    }

    /// <summary>Adds a solid with log10 of its formation constant (-log Ksp).</summary>
    public SystemBuilder Solid(
        string name,
        double log10K,
        params (string Of, double Coefficient)[] from
    )
    {
        _solids.Add((name, 0, _ => log10K, from));
        return this;
    }

    /// <summary>Adds a gas with log10 of its formation constant, fugacity in atm.</summary>
    public SystemBuilder Gas(
        string name,
        double log10K,
        params (string Of, double Coefficient)[] from
    )
    {
        _gases.Add((name, 0, _ => log10K, from));
        return this;
    }

    /// <summary>Compiles the system.</summary>
    /// <exception cref="ArgumentException">A reaction names something that is no component, or a name stands twice.</exception>
    public EquilibriumSystem Build(IActivityModel activityModel) =>
        EquilibriumSystem.Compile(
            _components,
            _complexes.Select(Formation),
            _solids.Select(Formation),
            _gases.Select(Formation),
            activityModel
        );

    private Formation Formation(
        (
            string Name,
            int Charge,
            Func<double, double> Log10K,
            (string Of, double Coefficient)[] From
        ) entry
    )
    {
        var coefficients = new double[_components.Count];
        var water = 0.0;
        foreach (var (of, coefficient) in entry.From)
        {
            var index = _components.FindIndex(c =>
                string.Equals(c.Name, of, StringComparison.Ordinal)
            );
            if (index >= 0)
            {
                coefficients[index] += coefficient;
            }
            else if (string.Equals(of, "H2O", StringComparison.Ordinal))
            {
                water += coefficient;
            }
            else
            {
                throw new ArgumentException(
                    $"'{entry.Name}' is formed from '{of}', which is no component",
                    nameof(entry)
                );
            }
        }

        return new Formation(entry.Name, entry.Charge, [.. coefficients], water, entry.Log10K);
    }
}
