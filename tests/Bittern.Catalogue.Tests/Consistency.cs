using System.Globalization;
using System.Text.RegularExpressions;
using Bittern.Catalogue;
using Bittern.Chemistry;
using Bittern.Model;
using Xunit;

namespace Bittern.Catalogue.Tests;

public sealed partial class Consistency
{
    [Fact]
    public void Every_file_binds_without_diagnostics() =>
        Assert.Empty(Shipped.Index.Diagnostics.Select(d => $"{d.Span}: {d.Code} {d.What}"));

    [Fact]
    public void Nothing_is_lost_on_the_way() =>
        // One entry for each declaration that the files hold.
        Assert.Equal(
            ShippedCatalogue.Names.Sum(n =>
                ShippedCatalogue.Open(n)!.Text.Split('\n').Count(l => Declaration().IsMatch(l))
            ),
            Shipped.Index.Entries.Length
        );

    [Fact]
    public void No_parameter_is_lost_and_each_names_its_source()
    {
        Assert.Equal(
            ShippedCatalogue.Names.Sum(n =>
                ShippedCatalogue.Open(n)!.Text.Split('\n').Count(l => Parameter().IsMatch(l))
            ),
            Shipped.Index.Parameters.Length
        );
        Assert.All(Shipped.Index.Parameters, p => Assert.NotNull(p.Parameter.Source));
    }

    [Fact]
    public void Parameters_stand_between_the_charges_that_their_equation_asks_for()
    {
        foreach (var p in Shipped.Index.Parameters.Select(p => p.Parameter))
        {
            var charges = p.Species.Select(s => Math.Sign(s.Charge)).ToArray();
            var fits = p.Kind switch
            {
                ActivityParameterKind.IonSize or ActivityParameterKind.TruesdellJones => charges[0]
                    != 0,
                ActivityParameterKind.Sit
                or ActivityParameterKind.Pitzer
                or ActivityParameterKind.PitzerSlope => charges is [1, -1],
                ActivityParameterKind.Theta => charges[0] == charges[1] && charges[0] != 0,
                ActivityParameterKind.Psi => charges[0] == charges[1] && charges[2] == -charges[0],
                ActivityParameterKind.Lambda => charges[0] == 0,
                ActivityParameterKind.Zeta => charges is [0, 1, -1],
                _ => false,
            };
            Assert.True(fits, $"{p.Kind} {string.Join(' ', p.Species)}");
        }
    }

    [Fact]
    public void Every_slope_has_a_value_at_25_degrees_in_its_set()
    {
        var pairs = Shipped
            .Index.Parameters.Where(p => p.Parameter.Kind is ActivityParameterKind.Pitzer)
            .Select(Key)
            .ToHashSet(StringComparer.Ordinal);
        Assert.All(
            Shipped.Index.Parameters.Where(p =>
                p.Parameter.Kind is ActivityParameterKind.PitzerSlope
            ),
            p => Assert.Contains(Key(p), pairs)
        );

        static string Key(CatalogueParameter p) =>
            $"{p.Domain} {string.Join(' ', p.Parameter.Species)}";
    }

    [Fact]
    public void Every_reaction_balances_in_elements_and_charge() =>
        Assert.Empty(
            Shipped
                .WithConstant.Where(e => !e.Reaction!.Imbalance().IsEmpty)
                .Select(e => $"{e.Domain}: {e.Reaction}")
        );

    [Fact]
    public void Every_constant_names_its_source() =>
        Assert.Empty(
            Shipped.WithConstant.Where(e => e.Constant!.Source is null).Select(e => e.Name)
        );

    [Fact]
    public void A_source_has_one_text_in_all_files() =>
        Assert.Empty(
            Shipped
                .WithConstant.Select(e => e.Constant!.Source)
                .OfType<Citation>()
                .Distinct()
                .GroupBy(s => s.Key, StringComparer.Ordinal)
                .Where(g => g.Count() > 1)
                .Select(g => g.Key)
        );

    [Fact]
    public void Every_expression_gives_the_constant_that_its_source_states_at_25_degrees()
    {
        var expressions = Shipped
            .WithConstant.Where(e => e.Constant!.Value is TemperatureFunction.Published)
            .ToArray();
        Assert.NotEmpty(expressions);
        // Published constants are rounded to two or three decimals.
        Assert.Empty(
            expressions
                .Where(e => Math.Abs(e.Constant!.Log10AtCelsius(25) - Stated(e)) > 0.006)
                .Select(e => $"{e.Domain}: {e.Name}")
        );
    }

    [Fact]
    public void A_range_that_is_stated_holds_25_degrees_or_starts_there() =>
        Assert.Empty(
            Shipped
                .WithConstant.Where(e => !e.Constant!.Covers(25))
                .Select(e => $"{e.Domain}: {e.Name}")
        );

    [Fact]
    public void The_catalogue_s_own_check_finds_no_twins_and_no_runaway_constants() =>
        Assert.Empty(
            CatalogueCheck
                .Within(Shipped.Index)
                .Where(f => !f.What.StartsWith("never forms", StringComparison.Ordinal))
                .Select(f => $"{f.Entry.Domain}: {f.Entry.Name} {f.What}")
        );

    [Fact]
    public void No_species_stands_in_two_domains_that_may_be_used_together()
    {
        var twice = Shipped
            .Index.Entries.Where(e =>
                !IsStandAlone(e.Domain) && e.Kind is not EntryKind.HalfReaction
            )
            .GroupBy(e => e.Name, StringComparer.Ordinal)
            .Where(g => g.Count() > 1)
            .Select(g => g.Key);
        Assert.Empty(twice);
    }

    [Fact]
    public void No_solid_stands_twice_under_different_names()
    {
        // Same composition and same constant: one of the two was copied by accident.
        var solids = Shipped
            .Index.Entries.Where(e => e.Kind is EntryKind.Solid && !IsStandAlone(e.Domain))
            .ToArray();
        var twins =
            from a in solids
            from b in solids
            where
                string.CompareOrdinal(a.Name, b.Name) < 0
                && a.Formula!.SameCompositionAs(b.Formula!)
            where
                Math.Abs(a.Species!.Log10FormationAt(25) - b.Species!.Log10FormationAt(25)) < 0.005
            select $"{a.Name} = {b.Name}";
        Assert.Empty(twins);
    }

    [Fact]
    public void Where_several_forms_share_a_composition_one_forms_by_default()
    {
        // Compositions whose every form is slow; the fresh precipitate has another formula, or a recipe names the form it means.
        string[] slowOnly = ["CaMg(CO3)2", "FeOOH", "PbO"];
        var none = Shipped
            .Index.Entries.Where(e => e.Kind is EntryKind.Solid && !IsStandAlone(e.Domain))
            .GroupBy(e => e.Formula!.Text, StringComparer.Ordinal)
            .Where(g => g.Count() > 1 && g.All(e => e.HeldBack is not null))
            .Select(g => g.Key)
            .Except(slowOnly, StringComparer.Ordinal);
        Assert.Empty(none);
    }

    [Theory]
    [InlineData("dolomite")]
    [InlineData("magnesite")]
    [InlineData("quartz")]
    [InlineData("hematite")]
    [InlineData("goethite")]
    [InlineData("gibbsite")]
    [InlineData("boehmite")]
    [InlineData("tenorite")]
    [InlineData("hydroxyapatite")]
    [InlineData("scorodite")]
    public void A_solid_that_takes_longer_than_hours_is_held_back_with_a_reason(string solid)
    {
        var entry = Assert.Single(
            Shipped.Index.Entries,
            e => string.Equals(e.Name, solid, StringComparison.Ordinal) && !IsStandAlone(e.Domain)
        );
        Assert.NotNull(entry.HeldBack);
    }

    [Theory]
    [InlineData("ferrihydrite")]
    [InlineData("aluminium-hydroxide")]
    [InlineData("zinc-hydroxide")]
    [InlineData("manganese-hydroxide")]
    [InlineData("nickel-hydroxide")]
    [InlineData("copper-hydroxide")]
    [InlineData("gypsum")]
    [InlineData("calcite")]
    [InlineData("brucite")]
    public void What_lime_precipitates_forms_by_default(string solid)
    {
        var entry = Assert.Single(
            Shipped.Index.Entries,
            e => string.Equals(e.Name, solid, StringComparison.Ordinal) && !IsStandAlone(e.Domain)
        );
        Assert.Null(entry.HeldBack);
    }

    [Fact]
    public void A_reason_for_holding_back_says_where_it_comes_from() =>
        // "(common practice)" or a reference with a year, unless it points to another entry.
        Assert.Empty(
            Shipped
                .Index.Entries.Where(e => e.HeldBack is { } why && !Reason().IsMatch(why))
                .Select(e => $"{e.Name}: {e.HeldBack}")
        );

    private static bool IsStandAlone(string domain) =>
        !ShippedCatalogue.IonAssociation.Contains(domain, StringComparer.Ordinal);

    private static double Stated(CatalogueEntry entry)
    {
        var stated = StatedAt25().Match(entry.Remark);
        Assert.True(stated.Success, $"{entry.Name} does not say what its source gives at 25 °C");
        return double.Parse(stated.Groups["value"].ValueSpan, CultureInfo.InvariantCulture);
    }

    [GeneratedRegex(@"^At 25 °C: (?<value>-?\d+(\.\d+)?)\.", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex StatedAt25();

    [GeneratedRegex(
        "^(ion-size|truesdell-jones|sit|pitzer|pitzer-slope|theta|psi|lambda|zeta) ",
        RegexOptions.ExplicitCapture,
        1000
    )]
    private static partial Regex Parameter();

    [GeneratedRegex(
        "^(ion|solute|complex|solid|gas|half-reaction) ",
        RegexOptions.ExplicitCapture,
        1000
    )]
    private static partial Regex Declaration();

    [GeneratedRegex(
        @"\(common practice\)|practice of|\(.*\d{4}\)|second study|another",
        RegexOptions.ExplicitCapture,
        1000
    )]
    private static partial Regex Reason();
}
