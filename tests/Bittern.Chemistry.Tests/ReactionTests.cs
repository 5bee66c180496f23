using System.Collections.Immutable;
using Xunit;

namespace Bittern.Chemistry.Tests;

public sealed class ReactionTests
{
    [Fact]
    public void A_balanced_reaction_has_no_imbalance()
    {
        var reaction = new Reaction(
            Terms((1, "Ca6Al2(SO4)3(OH)12·26H2O"), (12, "H+")),
            Terms((6, "Ca^2+"), (2, "Al^3+"), (3, "SO4^2-"), (38, "H2O"))
        );
        Assert.Empty(reaction.Imbalance());
    }

    [Fact]
    public void Half_water_balances() =>
        Assert.Empty(
            new Reaction(
                Terms((1, "CaSO4·0.5H2O")),
                Terms((1, "Ca^2+"), (1, "SO4^2-"), (0.5, "H2O"))
            ).Imbalance()
        );

    [Fact]
    public void Electrons_count_by_their_charge() =>
        Assert.Empty(new Reaction(Terms((1, "Fe^3+"), (1, "e-")), Terms((1, "Fe^2+"))).Imbalance());

    [Fact]
    public void A_surplus_is_given_with_its_size()
    {
        var imbalance = new Reaction(
            Terms((1, "Mg(OH)2")),
            Terms((1, "Mg^2+"), (1, "OH-"))
        ).Imbalance();
        Assert.Equal("H O charge", string.Join(' ', imbalance.Keys));
        Assert.Equal([-1, -1, 1], imbalance.Values);
    }

    [Fact]
    public void Text_is_the_reaction() =>
        Assert.Equal(
            "Mg(OH)2 + 2 H+ = Mg^2+ + 2 H2O",
            new Reaction(
                Terms((1, "Mg(OH)2"), (2, "H+")),
                Terms((1, "Mg^2+"), (2, "H2O"))
            ).ToString()
        );

    private static ImmutableArray<Term> Terms(
        params (double Coefficient, string Formula)[] terms
    ) => [.. terms.Select(t => new Term(t.Coefficient, FormulaReader.Standard.Read(t.Formula)))];
}
