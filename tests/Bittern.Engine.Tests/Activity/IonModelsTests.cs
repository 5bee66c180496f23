using System.Collections.Immutable;
using Bittern.Engine.Activity;
using Bittern.Reference;
using Xunit;

namespace Bittern.Engine.Tests.Activity;

/// <summary>The models with parameters by ion against their own published tables.</summary>
public sealed class IonModelsTests
{
    public static TheoryData<double, double, double, double> KiellandRows =>
        [
            .. ReferenceTable
                .Rows("activity/kielland-activity-coefficients.csv")
                .Select(r => new TheoryDataRow<double, double, double, double>(
                    ParameterTables.Number(r["abs_charge"]),
                    ParameterTables.Number(r["a_angstrom"]),
                    ParameterTables.Number(r["ionic_strength"]),
                    ParameterTables.Number(r["gamma"])
                )),
        ];

    /// <summary>Kielland's table has three decimals (two at high charge) and slide-rule roundings: one unit of its last decimal, 0.005 below 0.1.</summary>
    [Theory]
    [MemberData(nameof(KiellandRows))]
    public void The_table_of_Kielland_is_met(
        double charge,
        double size,
        double strength,
        double gamma
    )
    {
        var name = charge == 1 ? "M+" : $"M^{charge}+";
        var sizes = new IonSizes(
            ImmutableDictionary.Create<string, double>(StringComparer.Ordinal).Add(name, size),
            0.5085,
            0.3281
        );
        var found = new Liquor(new ExtendedDebyeHuckel(sizes), 298.15, name, "X-")
            .At(strength * 2 / (charge * (charge + 1)), strength * 2 / (charge + 1))
            .Gamma(name);
        Assert.InRange(found - gamma, -0.006, 0.006);
    }

    [Fact]
    public void Species_without_parameters_are_named()
    {
        string[] species = ["Na+", "Sc^3+", "Xx^2+", "Cl-", "B(OH)3(aq)"];
        EquilibriumSystem Of(IActivityModel model) => new Liquor(model, 298.15, species).System;
        foreach (var (name, model) in Models.All)
        {
            string[] expected = name switch
            {
                "ideal" or "davies" => [],
                "debye-hückel" => ["Xx^2+"],
                _ => ["Sc^3+", "Xx^2+"],
            };
            Assert.Equal(expected, model.MissingFor(Of(model)), StringComparer.Ordinal);
        }

        var pitzer = (Pitzer)Models.All["pitzer"];
        Assert.Equal(
            [new IonPair("Sc^3+", "Cl-"), new IonPair("Xx^2+", "Cl-")],
            pitzer.MissingPairs(Of(pitzer))
        );
    }

    [Fact]
    public void A_parameter_given_twice_is_refused()
    {
        Assert.Throws<ArgumentException>(() =>
            new SpecificIonInteraction(new([new("Na+", "Cl-", 0.03), new("Cl-", "Na+", 0.03)]))
        );
        Assert.Throws<ArgumentException>(() =>
            new Pitzer(
                new PitzerParameters([]) { Thetas = [new("Na+", "K+", 0), new("K+", "Na+", 0)] }
            )
        );
    }

    [Fact]
    public void An_uncharged_species_is_salted_out_in_Truesdell_and_Jones()
    {
        var at = new Liquor(Models.All["truesdell-jones"], 298.15, "Na+", "Cl-", "CO2(aq)").At(
            1,
            1,
            0.01
        );
        Assert.Equal(0.1, Math.Log10(at.Gamma("CO2(aq)")), 1e-12);
    }

    /// <summary>γ± of 1 mol/kg NaCl at 0 °C: 0.638 (Robinson and Stokes 1959, recalled). Derivatives at 25 °C alone describe 25 K to about 1.5 %.</summary>
    [Fact]
    public void Temperature_derivatives_carry_Pitzer_to_0_celsius()
    {
        var at = new Liquor(new Pitzer(ParameterTables.Everything), 273.15, "Na+", "Cl-").At(1, 1);
        Assert.InRange(at.Gamma("Na+") / 0.638, 0.98, 1.02);
    }

    /// <summary>Worked by hand from log10 γ = -0.509 √I/(1 + 1.5 √I) + ε m: at 1 mol/kg NaCl -0.2036 + 0.03 (Grenthe et al. 1992 give the Debye-Hückel term 0.204 at I = 1).</summary>
    [Fact]
    public void The_interaction_term_adds_to_the_long_range_term()
    {
        var at = new Liquor(Models.All["sit"], 298.15, "Na+", "Cl-").At(1, 1);
        Assert.Equal(-0.2036 + 0.03, Math.Log10(at.Gamma("Na+")), 1e-4);
    }
}
