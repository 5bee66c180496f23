using System.Collections.Immutable;
using Bittern.Engine.Water;

namespace Bittern.Engine.Activity;

/// <summary>One interaction coefficient of <see cref="SpecificIonInteraction"/>; the order of the two does not matter.</summary>
/// <param name="First">A species, by name; usually the cation.</param>
/// <param name="Second">Another species; usually the anion. An uncharged species may have coefficients too.</param>
/// <param name="Epsilon">ε, kg/mol.</param>
public sealed record InteractionCoefficient(string First, string Second, double Epsilon);

/// <summary>Parameters for <see cref="SpecificIonInteraction"/>.</summary>
/// <param name="Coefficients">What is not listed is zero.</param>
/// <param name="SlopeLog10">A at 25 °C that they belong to (0.509 for the NEA tables), kg^½ mol^-½; null takes water's own. At other temperatures it follows water's.</param>
public sealed record InteractionCoefficients(
    ImmutableArray<InteractionCoefficient> Coefficients,
    double? SlopeLog10 = null
);

/// <summary>
/// The specific ion interaction theory (SIT): log10 γ_j = -A z² √I/(1 + 1.5 √I) + Σ_k ε(j,k) m_k (Brønsted 1922, Guggenheim 1935, Scatchard 1936; the form and
/// the 1.5 of the NEA Thermochemical Database reviews, Grenthe et al. 1992, appendix B). Uncharged species: γ = 1 unless ε is given.
/// </summary>
public sealed class SpecificIonInteraction : IActivityModel
{
    private const double ClosestApproach = 1.5;
    private readonly InteractionCoefficients _parameters;
    private readonly HashSet<(string First, string Second)> _known = [];

    /// <summary>A model with one set of parameters.</summary>
    /// <exception cref="ArgumentException">A pair stands twice.</exception>
    public SpecificIonInteraction(InteractionCoefficients parameters)
    {
        _parameters = parameters;
        foreach (var c in parameters.Coefficients)
        {
            if (
                !_known.Add((c.First, c.Second))
                || (
                    _known.Contains((c.Second, c.First))
                    && !string.Equals(c.First, c.Second, StringComparison.Ordinal)
                )
            )
            {
                throw new ArgumentException(
                    $"ε({c.First}, {c.Second}) stands twice",
                    nameof(parameters)
                );
            }
        }
    }

    public string Name => "sit";

    /// <summary>3.5 mol/kg: the range that the NEA reviews give.</summary>
    public double TrustedIonicStrength => 3.5;

    public string UnchargedTreatment => "γ = 1 unless an interaction coefficient is given";

    /// <summary>Charged species without a coefficient with any ion of opposite charge of the system; they get the Debye-Hückel term alone.</summary>
    public ImmutableArray<string> MissingFor(EquilibriumSystem system) =>
        IonPair.Strangers(system, IsKnown);

    /// <summary>Every cation-anion pair of the system without a coefficient.</summary>
    public ImmutableArray<IonPair> MissingPairs(EquilibriumSystem system) =>
        IonPair.Unknown(system, IsKnown);

    public CompiledActivity Compile(EquilibriumSystem system, double kelvin)
    {
        var present = _parameters
            .Coefficients.Where(c =>
                system.SpeciesIndex(c.First) >= 0 && system.SpeciesIndex(c.Second) >= 0
            )
            .ToList();
        var groups = new MomentGroups(
            system,
            present.SelectMany(c => new[] { c.First, c.Second }).ToHashSet(StringComparer.Ordinal)
        );
        var epsilon = new double[groups.Count * groups.Count];
        foreach (var c in present)
        {
            var p = groups.GroupOf[system.SpeciesIndex(c.First)];
            var r = groups.GroupOf[system.SpeciesIndex(c.Second)];
            epsilon[(p * groups.Count) + r] = c.Epsilon * Math.Log(10);
            epsilon[(r * groups.Count) + p] = c.Epsilon * Math.Log(10);
        }

        return new Compiled(
            groups,
            DebyeHuckel.SlopeLog10(kelvin, _parameters.SlopeLog10) * Math.Log(10),
            epsilon
        );
    }

    private bool IsKnown(string first, string second) =>
        _known.Contains((first, second)) || _known.Contains((second, first));

    private sealed class Compiled(MomentGroups groups, double slope, double[] epsilon)
        : GroupedModel(groups)
    {
        protected override double Derive(
            ReadOnlySpan<double> q,
            Span<double> gradient,
            Span<double> hessian
        )
        {
            var charges = Groups.Charges;
            var count = charges.Length;
            var ionicStrength = 0.0;
            for (var p = 0; p < count; p++)
            {
                ionicStrength += 0.5 * charges[p] * charges[p] * q[p];
            }

            var root = Math.Sqrt(Math.Max(ionicStrength, 0));
            var f = -slope * LongRange.Value(root, ClosestApproach);
            var df = -slope * LongRange.Slope(root, ClosestApproach);
            var osmotic = -2 * slope * LongRange.Integral(root, ClosestApproach);
            for (var p = 0; p < count; p++)
            {
                var square = charges[p] * charges[p];
                var row = hessian.Slice(Groups.FirstOf[p] * count, count);
                var specific = 0.0;
                for (var r = 0; r < count; r++)
                {
                    var e = epsilon[(p * count) + r];
                    specific += e * q[r];
                    row[r] = e + (0.5 * square * charges[r] * charges[r] * df);
                }

                gradient[p] = (square * f) + specific;
                osmotic += 0.5 * q[p] * specific;
            }

            return osmotic;
        }
    }
}
