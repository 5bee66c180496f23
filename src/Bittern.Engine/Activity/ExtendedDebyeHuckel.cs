using System.Collections.Immutable;
using Bittern.Engine.Water;

namespace Bittern.Engine.Activity;

/// <summary>Sizes for <see cref="ExtendedDebyeHuckel"/>.</summary>
/// <param name="Angstrom">Closest approach a of each ion, Å, by species name (Kielland 1937 gives 130 of them).</param>
/// <param name="SlopeLog10">A at 25 °C that the sizes belong to, kg^½ mol^-½; null takes water's own. At other temperatures it follows water's.</param>
/// <param name="LengthParameter">B at 25 °C, Å^-1 kg^½ mol^-½; null takes water's own.</param>
public sealed record IonSizes(
    ImmutableDictionary<string, double> Angstrom,
    double? SlopeLog10 = null,
    double? LengthParameter = null
);

/// <summary>
/// The Debye-Hückel equation with ion sizes: log10 γ = -A z² √I/(1 + B a √I) (Debye and Hückel 1923; sizes of Kielland 1937, J. Am. Chem. Soc. 59, 1675).
/// An ion without a size takes B a = 1 (Güntelberg 1926: a near 3 Å). Uncharged species: γ = 1.
/// </summary>
public sealed class ExtendedDebyeHuckel(IonSizes sizes) : IActivityModel
{
    public string Name => "debye-hückel";

    /// <summary>0.1 mol/kg: Kielland's own range.</summary>
    public double TrustedIonicStrength => 0.1;

    public string UnchargedTreatment => "γ = 1";

    public ImmutableArray<string> MissingFor(EquilibriumSystem system) =>
        [
            .. system
                .Species.Where(s => s.Charge != 0 && !sizes.Angstrom.ContainsKey(s.Name))
                .Select(s => s.Name),
        ];

    public CompiledActivity Compile(EquilibriumSystem system, double kelvin)
    {
        var length = DebyeHuckel.LengthParameter(kelvin, sizes.LengthParameter);
        return new IonSizeModel(
            system,
            DebyeHuckel.SlopeLog10(kelvin, sizes.SlopeLog10) * Math.Log(10),
            j =>
                (
                    sizes.Angstrom.TryGetValue(system.Species[j].Name, out var size)
                        ? length * size
                        : 1,
                    0
                )
        );
    }
}
