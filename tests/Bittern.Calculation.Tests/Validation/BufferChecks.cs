using System.Globalization;
using static Bittern.Calculation.Tests.Validation.Readings;

namespace Bittern.Calculation.Tests.Validation;

/// <summary>Standard buffers between 10 and 40 °C.</summary>
internal static class BufferChecks
{
    public static IEnumerable<PublishedCheck> All => [.. Standards()];

    private static IEnumerable<PublishedCheck> Standards()
    {
        const string Iupac = "NBS=IUPAC2002";
        const string ToFifty = "NBS=IUPAC2002 to 50 C";
        (string Standard, string Set, string Entries)[] buffers =
        [
            ("tetroxalate", "NBS", "KH3(C2O4)2·2H2O 0.05 mol/kg"),
            ("phthalate", "IUPAC2002", "KHC8H4O4 0.05 mol/kg"),
            ("citrate", "NBS", "KH2C6H5O7 0.05 mol/kg"),
            ("phosphate", ToFifty, "KH2PO4 0.025 mol/kg; Na2HPO4 0.025 mol/kg"),
            ("phosphate 1:3.5", Iupac, "KH2PO4 0.008695 mol/kg; Na2HPO4 0.03043 mol/kg"),
            ("borax", ToFifty, "Na2B4O7·10H2O 0.01 mol/kg"),
            ("carbonate", Iupac, "NaHCO3 0.025 mol/kg; Na2CO3 0.025 mol/kg"),
            ("calcium hydroxide", "NBS", "Ca(OH)2 0.0203 mol/kg"),
        ];
        foreach (var (standard, set, entries) in buffers)
        {
            foreach (var celsius in new[] { 10, 25, 40 })
            {
                yield return new PublishedCheck(
                    PublishedChecks.Buffers,
                    standard,
                    string.Create(CultureInfo.InvariantCulture, $"{celsius} C"),
                    $"pH(S), {set}",
                    Recipes.Equilibrium("", entries, celsius),
                    PH
                );
            }
        }
    }
}
