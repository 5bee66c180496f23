using System.Globalization;
using Bittern.Chemistry;
using Bittern.Engine.Tests.Activity;
using Bittern.Engine.Water;
using Bittern.Reference;
using Xunit;

namespace Bittern.Engine.Tests.Water;

/// <summary>Densities of solutions against handbook values, and against a sea water that no coefficient was fitted to.</summary>
public sealed class LiquorVolumeTests
{
    /// <summary>Salts whose coefficient was fitted are met to 0.2 %; others, which take the value of their charges, to what the class states for them.</summary>
    private static double Tolerance(string use) => use is "fit" ? 0.002 : 0.01;

    public static TheoryData<string, string, double, double, double, string> Rows =>
        [
            .. ReferenceTable
                .Rows("liquor-densities.csv")
                .Select(r => new TheoryDataRow<string, string, double, double, double, string>(
                    r["salt"],
                    r["ions"],
                    Number(r["T_C"]),
                    Number(r["mass_percent"]),
                    Number(r["density_kg_per_L"]),
                    r["use"]
                )),
        ];

    [Theory]
    [MemberData(nameof(Rows))]
    public void A_handbook_density_is_met(
        string salt,
        string ions,
        double celsius,
        double massPercent,
        double density,
        string use
    )
    {
        var parts = ions.Split(';', StringSplitOptions.TrimEntries)
            .Select(p => p.Split(' '))
            .Select(p => (Name: p[0], Count: Number(p[1])))
            .ToArray();
        var grams = parts.Sum(p => p.Count * Mass(p.Name));
        var molality = 1000 * massPercent / (100 - massPercent) / grams;
        var found = Density([.. parts.Select(p => (p.Name, molality * p.Count))], celsius);
        Assert.True(
            Math.Abs((found / (1000 * density)) - 1) <= Tolerance(use),
            string.Create(
                CultureInfo.InvariantCulture,
                $"{salt} {massPercent} %: {found} against {1000 * density}: {100 * ((found / 1000 / density) - 1):+0.00;-0.00} %"
            )
        );
    }

    /// <summary>Sea water S = 35: 1023.343 kg/m3 at 25 °C (Millero and Poisson 1981, Deep-Sea Research 28A, 625), 1028.106 at 0 °C; composition per kilogram of water.</summary>
    [Theory]
    [InlineData(25, 1023.343, 5e-4)]
    [InlineData(0, 1028.106, 2.5e-3)]
    public void Sea_water_is_met(double celsius, double density, double tolerance)
    {
        var found = Density(
            [
                ("Na+", 0.48606),
                ("Mg^2+", 0.05474),
                ("Ca^2+", 0.01066),
                ("K+", 0.01058),
                ("Cl-", 0.56577),
                ("SO4^2-", 0.02927),
                ("HCO3-", 0.00215),
            ],
            celsius
        );
        Assert.InRange(found / density, 1 - tolerance, 1 + tolerance);
    }

    private static double Density((string Name, double Molality)[] species, double celsius)
    {
        var volume = new LiquorVolume([
            .. species.Select(s =>
                (s.Name, Liquor.Charge(s.Name), LiquorVolume.IonVolume(s.Name)!.Value)
            ),
        ]);
        var kilograms = 1 + species.Sum(s => s.Molality * Mass(s.Name) / 1000);
        return kilograms
            / volume.CubicMetres(
                [.. species.Select(s => s.Molality)],
                1,
                celsius + PhysicalConstants.ZeroCelsius
            );
    }

    private static double Mass(string name) => FormulaReader.Standard.Read(name).MolarMass;

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
