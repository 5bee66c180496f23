using Bittern.Calculation;
using Bittern.Model;
using Bittern.Reports.Sections;
using Bittern.Reports.Tests.Samples;
using Xunit;

namespace Bittern.Reports.Tests;

/// <summary>Each hazard is told when its trigger is there, and only then.</summary>
public sealed class CautionTests
{
    private static readonly Outcome Adit = SampleRecipes.Run(SampleRecipes.Adit());

    [Theory]
    [InlineData("Ca(OH)2", "It burns skin and can blind")]
    [InlineData("CaO", "Quicklime boils when it slakes")]
    [InlineData("NaOH", "Diluting it gives off much heat")]
    [InlineData("H2SO4", "add acid to water, never water to acid")]
    [InlineData("HF", "calcium gluconate")]
    [InlineData("NaOCl", "chlorine gas")]
    [InlineData("Na2S", "hydrogen sulfide, which kills")]
    public void A_dosed_substance_brings_its_caution(string substance, string words)
    {
        Assert.Contains(Of(Dosing(substance)), c => c.Contains(words, StringComparison.Ordinal));
        Assert.DoesNotContain(Of(Dosing("NaCl")), c => c.Contains(words, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("HS-", "Sulfide is dissolved", "hydrogen sulfide leaves")]
    [InlineData("CN-", "Cyanide is dissolved", "hydrogen cyanide leaves")]
    [InlineData("NH4+", "Ammonium is dissolved", "Ammonia leaves")]
    [InlineData("CrO4^2-", "Hexavalent chromium", "causes cancer")]
    [InlineData("F-", "Fluoride is dissolved", "hydrogen fluoride")]
    public void A_dissolved_substance_brings_its_caution(string ion, string trigger, string words)
    {
        Assert.Contains(
            Of(Holding(ion)),
            c =>
                c.Contains(trigger, StringComparison.Ordinal)
                && c.Contains(words, StringComparison.Ordinal)
        );
        Assert.DoesNotContain(Of(Adit), c => c.Contains(trigger, StringComparison.Ordinal));
    }

    [Fact]
    public void An_arsenic_sludge_is_called_toxic()
    {
        var arsenate = SampleChemistry.Solid(
            "ferric-arsenate",
            "FeAsO4·2H2O",
            "FeAsO4·2H2O = Fe^3+ + AsO4^3- + 2 H2O",
            -23,
            null,
            Chemistry.ConstantForm.LogKsp
        );
        var train = Adit.Trains[0];
        var sludge = train.Sludges[0] with
        {
            Solids = [new SolidAmount(arsenate, 1, 0.23)],
            DryMassPerFeed = 0.5,
        };
        Assert.Contains(
            Of(Adit with { Trains = [train with { Sludges = [sludge] }] }),
            c =>
                c.Contains("arsenic 15 %", StringComparison.Ordinal)
                && c.Contains("leach-tested", StringComparison.Ordinal)
        );
    }

    [Fact]
    public void Gas_over_an_acidified_sulfide_liquor_is_compared_with_the_exposure_limit()
    {
        // 1e-4 mol/kg of dissolved H2S stands under 1e-4/10^-1 atm, a thousand ppm.
        var hydrogenSulfide = SampleChemistry.Ion("H2S(aq)");
        var gas = SampleChemistry.Solid(
            "H2S(g)",
            "H2S(g)",
            "H2S(g) = H2S(aq)",
            -1.0,
            null,
            Chemistry.ConstantForm.LogKH
        ) with
        {
            Kind = SpeciesKind.Gas,
        };
        var state = Adit.Liquors[0].State!;
        var changed = Adit with
        {
            Recipe = Adit.Recipe with { Chemistry = Adit.Recipe.Chemistry with { Gases = [gas] } },
            Liquors =
            [
                Adit.Liquors[0] with
                {
                    State = state with
                    {
                        Species = state.Species.Add(new SpeciesAmount(hydrogenSulfide, 1e-4, 1)),
                    },
                },
            ],
        };
        Assert.Contains(
            Of(changed),
            c =>
                c.Contains("would hold 1000 ppm of hydrogen sulfide", StringComparison.Ordinal)
                && c.Contains("immediately dangerous to life", StringComparison.Ordinal)
        );
    }

    private static string[] Of(Outcome outcome) =>
        [.. Cautions.Of(outcome).Select(c => c.Trigger + " " + c.Text)];

    private static Outcome Dosing(string substance)
    {
        var train = Adit.Trains[0];
        var until = (StageAction.AddUntil)train.Train.Stages[1].Actions[0];
        var reagent = until.Reagent with
        {
            Entries = [until.Reagent.Entries[0] with { Analyte = substance }],
        };
        var stage = train.Train.Stages[1] with { Actions = [until with { Reagent = reagent }] };
        return Adit with
        {
            Trains = [train with { Train = train.Train with { Stages = [stage] } }],
        };
    }

    private static Outcome Holding(string ion)
    {
        var state = Adit.Liquors[0].State!;
        var changed = state with
        {
            DissolvedTotals = state.DissolvedTotals.Add(
                new Chemistry.Term(1, SampleRecipes.Formula(ion))
            ),
        };
        return Adit with { Liquors = [Adit.Liquors[0] with { State = changed }] };
    }
}
