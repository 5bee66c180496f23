using System.Collections.Immutable;
using Bittern.Calculation;
using Bittern.Model;
using Bittern.Reports.Tests.Samples;
using Xunit;

namespace Bittern.Reports.Tests;

/// <summary>What the first half page says, case by case.</summary>
public sealed class AnswerTests
{
    private static readonly Outcome Adit = SampleRecipes.Run(SampleRecipes.Adit());

    [Fact]
    public void Answer_comes_first_and_sections_keep_their_order()
    {
        var headings = Render(Adit)
            .Split('\n')
            .Where(l => l.StartsWith("## ", StringComparison.Ordinal))
            .ToArray();
        Assert.Equal(
            [
                "## Answer",
                "## Notes of the author",
                "## Basis",
                "## Treatment",
                "## Onset ladder",
                "## Constants",
                "## Validity and cautions",
                "## Certificate",
            ],
            headings
        );
    }

    [Fact]
    public void Sections_without_content_are_left_out()
    {
        var markdown = Render(SampleRecipes.Run(SampleRecipes.Mixture(0.1, 0.08)));
        Assert.DoesNotContain("## Onset ladder", markdown, StringComparison.Ordinal);
        Assert.DoesNotContain("## Notes", markdown, StringComparison.Ordinal);
        Assert.DoesNotContain("### Reagents", markdown, StringComparison.Ordinal);
    }

    [Fact]
    public void Date_appears_only_when_the_recipe_states_one()
    {
        Assert.DoesNotContain("| Date", Render(Adit), StringComparison.Ordinal);
        var dated = Adit with
        {
            Recipe = Adit.Recipe with { Header = Adit.Recipe.Header with { Date = "2031-02-03" } },
        };
        Assert.Contains("2031-02-03", Render(dated), StringComparison.Ordinal);
    }

    [Fact]
    public void A_failed_limit_is_never_rounded_onto_its_bound() =>
        Assert.Contains(
            "0.5004 mg/L",
            WithZinc(Verdict.Failed, 0.5004e-3),
            StringComparison.Ordinal
        );

    [Fact]
    public void A_limit_met_by_its_own_target_says_that_there_is_no_margin()
    {
        var markdown = WithZinc(Verdict.Met, 0.49999999999e-3);
        Assert.Contains("none: on the limit", markdown, StringComparison.Ordinal);
        Assert.Contains(
            "dissolved(Zn) is met with no margin because the dose was set to just meet it",
            markdown,
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void A_thin_margin_is_told()
    {
        var results = Adit.LimitSets[0]
            .Results.Select(r =>
                r.Limit.Condition.Quantity is Quantity.PH
                    ? r with
                    {
                        Verdict = Verdict.Met,
                        Value = 8.9,
                    }
                    : r
            );
        Assert.Contains(
            "pH is met with a thin margin: 8.90 where 6 to 9 is required",
            Render(WithResults(results)),
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void An_undecided_limit_names_the_analysis_to_repeat() =>
        Assert.Contains(
            "dissolved(Cd) is undecided: the verdict turns on how values below detection are counted (Cd (< 0.01 mg/L))",
            Render(Adit),
            StringComparison.Ordinal
        );

    [Fact]
    public void An_unreachable_target_gives_the_best_value_and_its_dose()
    {
        var markdown = Render(Adit);
        Assert.Contains(
            "no dose of 'milk-of-lime' up to 53.8 L/m3 meets 'dissolved(Zn) <= 0.5 mg/L'",
            markdown,
            StringComparison.Ordinal
        );
        Assert.Contains(
            "The best reachable value is 2.40 mg/L, at 0.592 L/m3",
            markdown,
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void Over_dosing_is_warned_about_where_the_target_stops_holding()
    {
        var markdown = Render(
            WithTarget(t =>
                t with
                {
                    Reached = true,
                    Value = 0.4e-3,
                    BestDose = null,
                    BestValue = null,
                    StopsHoldingAt = 0.001,
                }
            )
        );
        Assert.Contains(
            "holds from 0.592 L/m3 to 1.00 L/m3 of 'milk-of-lime' (69 % more) and stops holding beyond that",
            markdown,
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void A_target_that_holds_already_needs_no_reagent() =>
        Assert.Contains(
            "holds without any 'milk-of-lime'; none is dosed",
            Render(
                WithTarget(t =>
                    t with
                    {
                        Reached = true,
                        HeldAlready = true,
                        Value = 0.4e-3,
                        BestDose = null,
                        BestValue = null,
                    }
                )
            ),
            StringComparison.Ordinal
        );

    [Fact]
    public void Without_a_certificate_no_limit_is_judged()
    {
        var train = Adit.Trains[0];
        var failed = Adit with
        {
            Trains =
            [
                train with
                {
                    Stages = [],
                    Doses = [],
                    Sludges = [],
                    WorstPlantImbalance = double.NaN,
                    Failure = new TrainFailure(
                        "primary",
                        "no liquid water is left",
                        train.Train.Span
                    ),
                },
            ],
            LimitSets =
            [
                .. Adit.LimitSets.Select(s =>
                    s with
                    {
                        Results =
                        [
                            .. s.Results.Select(r => new LimitResult(
                                r.Limit,
                                Verdict.NotJudged,
                                double.NaN,
                                null
                            )),
                        ],
                    }
                ),
            ],
        };
        var markdown = Render(failed);
        Assert.Contains(
            "**No certified answer for 'treatment' from stage 'primary' on.** No liquid water is left.",
            markdown,
            StringComparison.Ordinal
        );
        Assert.Contains("| NOT JUDGED |", markdown, StringComparison.Ordinal);
        Assert.DoesNotContain("PASS", markdown, StringComparison.Ordinal);
    }

    [Fact]
    public void A_held_back_supersaturated_solid_is_told_up_front()
    {
        var stage = Adit.Trains[0].Stages[0];
        var calcite = stage.Saturations.Single(s => s.Role == SaturationRole.HeldBack);
        var changed = WithStage(
            0,
            stage with
            {
                Saturations = [calcite with { Log10Q = calcite.Log10K + 1 }],
            }
        );
        Assert.Contains(
            "leaves calcite supersaturated (SI 1.00); it is held back because \"no nuclei in the first minutes\"",
            Render(changed),
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void A_mixture_that_precipitates_says_what_and_how_much()
    {
        var outcome = SampleRecipes.Run(SampleRecipes.Mixture(0.10, 0.08));
        var grams = outcome.Trains[0].Stages[0].Formed.Single().MassPerFeed * 250e-6 * 1000;
        Assert.InRange(grams, 1.0, 1.5);
        Assert.Contains(
            "**Yes: gypsum precipitates, 1.24 g from 400 mL.** That is 7.22 mmol of CaSO4·2H2O.",
            Render(outcome),
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void A_mixture_that_does_not_names_the_nearest_solid() =>
        Assert.Contains(
            "**No: nothing precipitates; nearest is gypsum at Q/K = 0.142 (SI -0.85).**",
            Render(SampleRecipes.Run(SampleRecipes.Mixture(0.010, 0.008))),
            StringComparison.Ordinal
        );

    [Theory]
    [InlineData(0.049, false)]
    [InlineData(0.051, true)]
    [InlineData(-0.2, true)]
    public void A_charge_imbalance_above_five_per_cent_cites_the_published_criterion(
        double imbalance,
        bool warned
    )
    {
        var outcome = Adit with
        {
            Liquors = [Adit.Liquors[0] with { PlainChargeImbalance = imbalance }],
        };
        Assert.Equal(warned, Render(outcome).Contains("section 1030 E", StringComparison.Ordinal));
    }

    [Fact]
    public void Overrides_stand_first_among_the_constants_with_old_new_and_reason()
    {
        var markdown = Render(Adit);
        var constants = markdown[markdown.IndexOf("## Constants", StringComparison.Ordinal)..];
        Assert.StartsWith("## Constants\n\n### Overrides", constants, StringComparison.Ordinal);
        Assert.Contains("log K 4.3 ± 0.05 at 25 °C", constants, StringComparison.Ordinal);
        Assert.Contains(
            "fresh floc, own titrations \\| notebook 22",
            constants,
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void Ion_sizes_are_listed_with_their_sources_and_ions_without_one_are_named()
    {
        var recipe = SampleRecipes.Adit();
        var size = new ActivityParameter(
            ActivityParameterKind.IonSize,
            [SampleRecipes.Formula("Ca^2+")],
            ImmutableSortedDictionary<string, double>.Empty.Add("", 6),
            null,
            SampleChemistry.Handbook,
            Recalled: true,
            null,
            recipe.Trains[0].Span
        );
        var outcome = SampleRecipes.Run(
            recipe with
            {
                Header = recipe.Header with { ActivityModel = ActivityModelNames.DebyeHuckel },
                Chemistry = recipe.Chemistry with { ActivityParameters = [size] },
                LimitSets = [],
            }
        );
        var markdown = Render(outcome);
        Assert.Contains(
            "| a (Å)     | Ca^2+ | 6     | \\[handbook\\] recalled |",
            markdown,
            StringComparison.Ordinal
        );
        Assert.Contains(
            "Without a parameter of their own: H+, Mg^2+",
            markdown,
            StringComparison.Ordinal
        );
        Assert.Contains("They take B a = 1 (Güntelberg 1926)", markdown, StringComparison.Ordinal);
        Assert.DoesNotContain(
            "Without a parameter of their own",
            Render(Adit),
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void Recalled_constants_are_marked_and_the_mark_is_explained()
    {
        var markdown = Render(Adit);
        Assert.Contains("\\[review1999\\] recalled", markdown, StringComparison.Ordinal);
        Assert.Contains(
            "**recalled** marks a constant that was written down without sight of the source",
            markdown,
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void The_report_defers_to_local_codes_and_licensed_practice() =>
        Assert.Contains(
            "Local codes, the discharge consent and the judgement of licensed practitioners come first.",
            Render(Adit),
            StringComparison.Ordinal
        );

    private static string Render(Outcome outcome) =>
        MarkdownReport.Render(outcome, SampleRecipes.Stamp);

    private static string WithZinc(Verdict verdict, double value) =>
        Render(
            WithResults(
                Adit.LimitSets[0]
                    .Results.Select(r =>
                        string.Equals(
                            r.Limit.Condition.Quantity.Name,
                            "dissolved(Zn)",
                            StringComparison.Ordinal
                        )
                            ? r with
                            {
                                Verdict = verdict,
                                Value = value,
                            }
                            : r
                    )
            )
        );

    private static Outcome WithResults(IEnumerable<LimitResult> results) =>
        Adit with
        {
            LimitSets = [Adit.LimitSets[0] with { Results = [.. results] }],
        };

    private static Outcome WithTarget(Func<TargetResult, TargetResult> change)
    {
        var stage = Adit.Trains[0].Stages[1];
        var dose = stage.Doses[0];
        return WithStage(1, stage with { Doses = [dose with { Target = change(dose.Target!) }] });
    }

    private static Outcome WithStage(int index, StageResult stage)
    {
        ImmutableArray<StageResult> stages = Adit.Trains[0].Stages.SetItem(index, stage);
        return Adit with { Trains = [Adit.Trains[0] with { Stages = stages }] };
    }
}
