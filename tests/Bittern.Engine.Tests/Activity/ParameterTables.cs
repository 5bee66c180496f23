using System.Collections.Immutable;
using System.Globalization;
using Bittern.Engine.Activity;
using Bittern.Reference;

namespace Bittern.Engine.Tests.Activity;

/// <summary>Parameter records from the tables of <c>tests/reference/activity</c>.</summary>
internal static class ParameterTables
{
    /// <summary>Kielland's sizes, with water's own A and B.</summary>
    public static readonly IonSizes Kielland = new(
        Rows("debye-huckel-ion-parameters.csv", "model", "Kielland")
            .ToImmutableDictionary(
                r => r["ion"],
                r => Number(r["a_angstrom"]),
                StringComparer.Ordinal
            )
    );

    /// <summary>a and b of Truesdell and Jones 1974.</summary>
    public static readonly TruesdellJonesParameters TruesdellJones = new(
        Rows("debye-huckel-ion-parameters.csv", "set", "TJ74")
            .ToImmutableDictionary(
                r => r["ion"],
                r => new TruesdellJonesIon(Number(r["a_angstrom"]), Number(r["b"])),
                StringComparer.Ordinal
            ),
        0.5092,
        0.3283
    );

    /// <summary>The NEA coefficients; of several values for a pair the last review's.</summary>
    public static readonly InteractionCoefficients Nea = new(
        [
            .. ReferenceTable
                .Rows("activity/sit-epsilon.csv")
                .GroupBy(r => (r["cation"], r["anion"]))
                .Select(g => g.MaxBy(r => r["set"], StringComparer.Ordinal)!)
                .Select(r => new InteractionCoefficient(
                    r["cation"],
                    r["anion"],
                    Number(r["epsilon_kg_per_mol"])
                )),
        ],
        0.509
    );

    /// <summary>The set of Harvie, Møller and Weare 1984 alone.</summary>
    public static readonly PitzerParameters Hmw84 = Pitzer(
        r => r["set"] is "HMW84",
        r => r["set"] is "HMW84"
    );

    /// <summary>The preferred binary row of every pair, without mixing parameters: for single salts.</summary>
    public static readonly PitzerParameters SingleSalts = Pitzer(
        r => r["preferred"] is "yes",
        _ => false
    );

    /// <summary>Everything preferred, with all mixing parameters and temperature derivatives: for tests of form, not of numbers.</summary>
    public static readonly PitzerParameters Everything = Pitzer(
        r => r["preferred"] is "yes",
        _ => true
    );

    public static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    private static IEnumerable<IReadOnlyDictionary<string, string>> Rows(
        string file,
        string column,
        string value
    ) =>
        ReferenceTable
            .Rows("activity/" + file)
            .Where(r => string.Equals(r[column], value, StringComparison.Ordinal));

    private static PitzerParameters Pitzer(
        Func<IReadOnlyDictionary<string, string>, bool> binary,
        Func<IReadOnlyDictionary<string, string>, bool> mixing
    )
    {
        var slopes = ReferenceTable
            .Rows("activity/pitzer-temperature.csv")
            .GroupBy(r => (r["cation"], r["anion"]))
            .ToDictionary(g => g.Key, g => g.First());
        var mixed = ReferenceTable
            .Rows("activity/pitzer-mixing.csv")
            .Where(mixing)
            .ToLookup(r => r["kind"], StringComparer.Ordinal);
        return new PitzerParameters([
            .. ReferenceTable.Rows("activity/pitzer-binary.csv").Where(binary).Select(Pair),
        ])
        {
            APhi = 0.392,
            Thetas =
            [
                .. mixed["theta"].Select(r => new PitzerTheta(r["i"], r["j"], Number(r["value"]))),
            ],
            Psis =
            [
                .. mixed["psi"]
                    .Select(r => new PitzerPsi(r["i"], r["j"], r["k"], Number(r["value"]))),
            ],
            Lambdas =
            [
                .. mixed["lambda"]
                    .Select(r => new PitzerLambda(r["i"], r["j"], Number(r["value"]))),
            ],
            Zetas =
            [
                .. mixed["zeta"]
                    .Select(r => new PitzerZeta(r["i"], r["j"], r["k"], Number(r["value"]))),
            ],
        };

        PitzerPair Pair(IReadOnlyDictionary<string, string> r) =>
            new(
                r["cation"],
                r["anion"],
                Number(r["beta0"]),
                Number(r["beta1"]),
                Number(r["beta2"]),
                Number(r["Cphi"])
            )
            {
                Alpha1 = Number(r["alpha1"]),
                Alpha2 = Number(r["alpha2"]),
                MaxMolality = r["m_max"].Length > 0 ? Number(r["m_max"]) : null,
                PerKelvin = slopes.TryGetValue((r["cation"], r["anion"]), out var s)
                    ? new PitzerPairSlopes(
                        Number(s["dbeta0_dT"]),
                        Number(s["dbeta1_dT"]),
                        Number(s["dbeta2_dT"]),
                        Number(s["dCphi_dT"])
                    )
                    : null,
            };
    }
}
