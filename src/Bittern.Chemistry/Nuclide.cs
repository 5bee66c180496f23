using System.Collections.Immutable;
using System.Globalization;

namespace Bittern.Chemistry;

/// <summary>
/// A radionuclide that laboratories report by its activity. Immutable. Half-lives: Kondev et al. 2021, Chin. Phys. C 45, 030001
/// (NUBASE2020) and the ENSDF evaluations, recalled.
/// </summary>
/// <param name="Symbol">Element symbol, e.g. <c>Ra</c>.</param>
/// <param name="MassNumber">Mass number, e.g. 226.</param>
/// <param name="HalfLifeSeconds">Half-life, s.</param>
public sealed record Nuclide(string Symbol, int MassNumber, double HalfLifeSeconds)
{
    private const double Day = 86400;

    // The tropical year of 365.2422 d, as the evaluations define it.
    private const double Year = 31_556_926;

    /// <summary>Where the half-lives come from.</summary>
    public static Citation HalfLifeSource { get; } =
        new(
            "nubase2020",
            "Kondev, F. G. et al. 2021, The NUBASE2020 evaluation of nuclear physics properties, Chin. Phys. C 45, 030001 (recalled)"
        );

    /// <summary>All nuclides that are known, by symbol and mass number.</summary>
    public static ImmutableArray<Nuclide> All { get; } =
    [
        new("Am", 241, 432.6 * Year),
        new("C", 14, 5700 * Year),
        new("Co", 60, 5.271 * Year),
        new("Cs", 134, 2.065 * Year),
        new("Cs", 137, 30.04 * Year),
        new("H", 3, 12.32 * Year),
        new("I", 129, 1.614e7 * Year),
        new("I", 131, 8.0252 * Day),
        new("K", 40, 1.248e9 * Year),
        new("Pb", 210, 22.20 * Year),
        new("Po", 210, 138.376 * Day),
        new("Ra", 223, 11.43 * Day),
        new("Ra", 224, 3.632 * Day),
        new("Ra", 226, 1600 * Year),
        new("Ra", 228, 5.75 * Year),
        new("Rn", 222, 3.8215 * Day),
        new("Sr", 90, 28.91 * Year),
        new("Tc", 99, 2.111e5 * Year),
        new("Th", 228, 1.9125 * Year),
        new("Th", 230, 7.54e4 * Year),
        new("Th", 232, 1.40e10 * Year),
        new("U", 234, 2.455e5 * Year),
        new("U", 235, 7.04e8 * Year),
        new("U", 238, 4.463e9 * Year),
    ];

    /// <summary>As written in recipes: <c>Ra-226</c>.</summary>
    public string Name => string.Create(CultureInfo.InvariantCulture, $"{Symbol}-{MassNumber}");

    /// <summary>Becquerel per mole, 1/(s mol): ln 2 · N_A / half-life.</summary>
    public double BecquerelPerMole => Math.Log(2) * PhysicalConstants.Avogadro / HalfLifeSeconds;

    /// <summary>mol of the nuclide that has an activity of <paramref name="becquerel"/>.</summary>
    public double Moles(double becquerel) => becquerel / BecquerelPerMole;

    /// <summary>Reads <c>Ra-226</c>; false for anything else, a nuclide without a listed half-life included.</summary>
    public static bool TryRead(string text, out Nuclide? nuclide)
    {
        nuclide = All.FirstOrDefault(n => string.Equals(n.Name, text, StringComparison.Ordinal));
        return nuclide is not null;
    }

    /// <summary>True for the shape of a nuclide token, known or not: an element's symbol, a hyphen, one to three digits.</summary>
    public static bool LooksLikeOne(string text)
    {
        var hyphen = text.IndexOf('-', StringComparison.Ordinal);
        return hyphen is 1 or 2
            && text.Length - hyphen is >= 2 and <= 4
            && text.AsSpan(hyphen + 1).IndexOfAnyExceptInRange('0', '9') < 0
            && PeriodicTable.BySymbol.ContainsKey(text[..hyphen]);
    }
}
