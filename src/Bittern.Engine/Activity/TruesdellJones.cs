using System.Collections.Immutable;
using Bittern.Engine.Water;

namespace Bittern.Engine.Activity;

/// <summary>The two numbers of one ion in <see cref="TruesdellJones"/>.</summary>
/// <param name="Angstrom">a, Å; a fitted number, not a size.</param>
/// <param name="Linear">b, kg/mol.</param>
public sealed record TruesdellJonesIon(double Angstrom, double Linear);

/// <summary>Parameters for <see cref="TruesdellJones"/>.</summary>
/// <param name="Ions">By species name.</param>
/// <param name="SlopeLog10">A at 25 °C that they belong to, kg^½ mol^-½; null takes water's own. At other temperatures it follows water's.</param>
/// <param name="LengthParameter">B at 25 °C, Å^-1 kg^½ mol^-½; null takes water's own.</param>
/// <param name="Uncharged">log10 γ of an uncharged species per unit of ionic strength, kg/mol; 0.1 by common practice.</param>
public sealed record TruesdellJonesParameters(
    ImmutableDictionary<string, TruesdellJonesIon> Ions,
    double? SlopeLog10 = null,
    double? LengthParameter = null,
    double Uncharged = 0.1
);

/// <summary>
/// log10 γ = -A z² √I/(1 + B a √I) + b I with a and b fitted to mean activity coefficients of each ion's salts (Truesdell and Jones 1974, J. Res. USGS 2, 233);
/// uncharged species log10 γ = 0.1 I. An ion without parameters follows the Davies equation, which is this one with B a = 1 and b = 0.3 A z².
/// </summary>
public sealed class TruesdellJones(TruesdellJonesParameters parameters) : IActivityModel
{
    private const double DaviesLinear = 0.3;

    public string Name => "truesdell-jones";

    /// <summary>1 mol/kg: common practice for waters in which sodium chloride dominates; ions on the Davies rule are good to half of it.</summary>
    public double TrustedIonicStrength => 1;

    public string UnchargedTreatment => "log γ = 0.1 I";

    public ImmutableArray<string> MissingFor(EquilibriumSystem system) =>
        [
            .. system
                .Species.Where(s => s.Charge != 0 && !parameters.Ions.ContainsKey(s.Name))
                .Select(s => s.Name),
        ];

    public CompiledActivity Compile(EquilibriumSystem system, double kelvin)
    {
        var ln10 = Math.Log(10);
        var slope = ln10 * DebyeHuckel.SlopeLog10(kelvin, parameters.SlopeLog10);
        var length = DebyeHuckel.LengthParameter(kelvin, parameters.LengthParameter);
        return new IonSizeModel(system, slope, Of);

        (double Beta, double Linear) Of(int j)
        {
            var species = system.Species[j];
            if (species.Charge == 0)
            {
                return (0, parameters.Uncharged * ln10);
            }

            return parameters.Ions.TryGetValue(species.Name, out var ion)
                ? (length * ion.Angstrom, ion.Linear * ln10)
                : (1, DaviesLinear * slope * species.Charge * species.Charge);
        }
    }
}
