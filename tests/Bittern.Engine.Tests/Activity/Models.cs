using Bittern.Engine.Activity;

namespace Bittern.Engine.Tests.Activity;

/// <summary>The models under test by name, each with the largest parameter set there is for it.</summary>
internal static class Models
{
    public static readonly IReadOnlyDictionary<string, IActivityModel> All = new Dictionary<
        string,
        IActivityModel
    >(StringComparer.Ordinal)
    {
        ["ideal"] = new Ideal(),
        ["davies"] = new Davies(),
        ["debye-hückel"] = new ExtendedDebyeHuckel(ParameterTables.Kielland),
        ["truesdell-jones"] = new TruesdellJones(ParameterTables.TruesdellJones),
        ["sit"] = new SpecificIonInteraction(ParameterTables.Nea),
        ["pitzer"] = new Pitzer(ParameterTables.Everything),
    };

    /// <summary>
    /// Ions with and without parameters, charges 1 to 4, neutrals with and without: enough for every term of every model. The two ions of charge +3 and
    /// the pair of neutrals share moments in some models.
    /// </summary>
    public static readonly string[] Species =
    [
        "Na+",
        "K+",
        "Mg^2+",
        "Ca^2+",
        "Al^3+",
        "La^3+",
        "Xx^3+",
        "Yy^3+",
        "Th^4+",
        "Cl-",
        "SO4^2-",
        "HCO3-",
        "CO3^2-",
        "PO4^3-",
        "OH-",
        "Zz-",
        "CO2(aq)",
        "B(OH)3(aq)",
        "Nn(aq)",
        "Mm(aq)",
    ];

    /// <summary>Random molalities over four decades, some of them zero.</summary>
    public static double[] Molalities(Random random, double largest)
    {
        var m = new double[Species.Length];
        for (var j = 0; j < m.Length; j++)
        {
            m[j] = random.Next(5) == 0 ? 0 : largest * Math.Pow(10, -4 * random.NextDouble());
        }

        return m;
    }
}
