using Bittern.Calculation;
using Bittern.Chemistry;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>Sentences that an operator can act on, chosen by the case; a case that does not arise says nothing.</summary>
internal static class Advice
{
    /// <summary>A solid above this saturation index is likely to find a way to form.</summary>
    private const double LikelyToForm = 0.3;

    /// <summary>Dosing error whose effect is told: what a diaphragm pump or a drifting slurry strength does in practice.</summary>
    private const double DosingError = 0.05;

    /// <summary>Shift of pH that an operator would notice.</summary>
    private const double NoticeableShift = 0.3;

    /// <summary>Shift of pH up to which a local slope may be quoted.</summary>
    private const double LocalShift = 0.5;

    public static IEnumerable<string> Of(Outcome outcome)
    {
        foreach (var train in outcome.Trains)
        {
            foreach (var stage in train.Stages)
            {
                foreach (var dose in stage.Doses)
                {
                    foreach (var sentence in Targets(stage, dose))
                    {
                        yield return sentence;
                    }
                }
            }
        }

        foreach (
            var (set, result) in outcome.LimitSets.SelectMany(s =>
                s.Results.Select(r => (s.Set, r))
            )
        )
        {
            if (LimitSentence(outcome, set, result) is { } sentence)
            {
                yield return sentence;
            }
        }

        foreach (var sentence in HeldBack(outcome).Concat(Unlisted(outcome)))
        {
            yield return sentence;
        }
    }

    private static IEnumerable<string> Targets(StageResult stage, DoseResult dose)
    {
        if (dose.Target is not { } target)
        {
            yield break;
        }

        var where = "Stage '" + MarkdownText.Escape(stage.Stage.Name) + "': ";
        var written = "'" + MarkdownText.Escape(target.Target.Written) + "'";
        var reagent = "'" + DoseText.Name(dose.Reagent) + "'";
        var given = dose.Reagent.IsDry ? double.NaN : dose.VolumePerStageVolume;
        if (!target.Reached)
        {
            yield return where
                + "no dose of "
                + reagent
                + " up to "
                + DoseText.PerStageVolume(dose.Reagent, target.LargestDose)
                + " meets "
                + written
                + ". The best reachable value is "
                + Judgement.Found(target.Target, target.BestValue ?? target.Value)
                + (
                    target.BestDose is { } best
                        ? ", at " + DoseText.PerStageVolume(dose.Reagent, best)
                        : ""
                )
                + "; the rest of this report goes on from there. Another reagent or a further stage is needed.";
            yield break;
        }

        if (target.HeldAlready)
        {
            yield return where + written + " holds without any " + reagent + "; none is dosed.";
        }

        if (target.StopsHoldingAt is { } stops)
        {
            yield return where
                + written
                + " holds from "
                + (
                    target.HeldAlready ? "no dose"
                    : double.IsNaN(given) ? "the dose given"
                    : DoseText.PerStageVolume(dose.Reagent, given)
                )
                + " to "
                + DoseText.PerStageVolume(dose.Reagent, stops)
                + " of "
                + reagent
                + (given > 0 ? " (" + Digits.Percent((stops / given) - 1) + " more)" : "")
                + " and stops holding beyond that. Over-dosing undoes it: set a high limit on the dosing pump below that dose.";
        }

        // A slope in pH tells how tight dosing must be; concentrations at a target say it through the window above.
        if (
            !target.HeldAlready
            && target.Target.Quantity is Quantity.PH
            && given > 0
            && double.IsFinite(target.Slope)
        )
        {
            var perShare = Math.Abs(target.Slope * given);
            if (perShare * DosingError >= NoticeableShift)
            {
                // The slope is local: quote the error that moves the pH by a step small enough for it to hold.
                yield return where
                    + "a dosing error of "
                    + Digits.Percent(Math.Min(DosingError, LocalShift / perShare))
                    + " moves the pH by about "
                    + Digits.Significant(Math.Min(perShare * DosingError, LocalShift), 1)
                    + "; control the pump on pH, not on flow alone.";
            }
        }
    }

    private static string? LimitSentence(Outcome outcome, LimitSet set, LimitResult result)
    {
        var condition = result.Limit.Condition;
        var name = MarkdownText.Escape(condition.Quantity.Name);
        var train = outcome.Trains.FirstOrDefault(t =>
            ReferenceEquals(t.Train, set.Train) || t.Train.Equals(set.Train)
        );
        switch (result.Verdict)
        {
            case Verdict.Failed:
                return name
                    + " fails: "
                    + Judgement.Found(condition, result.Value)
                    + " where "
                    + Judgement.Required(condition)
                    + " is required"
                    + Times(condition, result.Value)
                    + "."
                    + Remedy(condition, result.Value)
                    + Holder(condition, train);
            case Verdict.Undecided:
                return name
                    + " is undecided: the verdict turns on how values below detection are counted ("
                    + MarkdownText.Escape(result.BelowDetectionNote ?? "several analyses")
                    + "). Have that analysis repeated with a lower detection limit.";
            case Verdict.Met when Judgement.IsThin(condition, result.Value):
                return train is not null && IsOwnTarget(condition, train)
                    ? name
                        + " is met with no margin because the dose was set to just meet it ("
                        + Judgement.Found(condition, result.Value)
                        + " where "
                        + Judgement.Required(condition)
                        + " is required). Choose a stricter target in the stage to work with a margin."
                    : name
                        + " is met with a thin margin: "
                        + Judgement.Found(condition, result.Value)
                        + " where "
                        + Judgement.Required(condition)
                        + " is required. Ordinary errors of constants, analyses and dosing are of that size.";
            default:
                return null;
        }
    }

    private static string Remedy(Condition condition, double value) =>
        condition.Quantity is not Quantity.PH ? ""
        : value > Judgement.NearestBound(condition, value)
            ? " Separate the solids first, then bring it back with carbon dioxide or acid, so that they do not redissolve."
        : " It needs more base; look at what that does to the solids before it is dosed.";

    private static string Times(Condition condition, double value) =>
        !Judgement.IsLogarithmic(condition.Quantity)
        && condition.Comparison is Comparison.AtMost or Comparison.Below
        && condition.Value > 0
            ? ", " + Digits.Significant(value / condition.Value, 2) + " times the limit"
            : "";

    // Which species keeps it in solution points to what would help: a complex, the free ion, another pH.
    private static string Holder(Condition condition, TrainResult? train) =>
        condition.Quantity is Quantity.Dissolved { Basis: [var first, ..] }
        && train?.Outflow is { } state
        && Speciation.Mostly(state, first.Species) is { Length: > 0 } holder
            ? " What is dissolved is "
                + MarkdownText.Escape(holder)
                + ", at pH "
                + Digits.PH(state.PH)
                + "."
            : "";

    private static bool IsOwnTarget(Condition condition, TrainResult train) =>
        train
            .Stages.SelectMany(s => s.Doses)
            .Select(d => d.Target?.Target)
            .OfType<Condition>()
            .Any(t =>
                string.Equals(t.Quantity.Name, condition.Quantity.Name, StringComparison.Ordinal)
                && Math.Abs(t.Value - condition.Value) <= 1e-6 * Math.Abs(condition.Value)
            );

    private static IEnumerable<string> HeldBack(Outcome outcome)
    {
        foreach (var stage in outcome.Trains.SelectMany(t => t.Stages))
        {
            foreach (
                var s in stage.Saturations.Where(s =>
                    s.Role == SaturationRole.HeldBack && s.Index > LikelyToForm
                )
            )
            {
                yield return "Stage '"
                    + MarkdownText.Escape(stage.Stage.Name)
                    + "' leaves "
                    + MarkdownText.Escape(s.Solid.Name)
                    + " supersaturated (SI "
                    + Digits.Index(s.Index)
                    + "); it is held back"
                    + (
                        s.HeldBackBecause is { } because
                            ? " because \"" + MarkdownText.Escape(because) + "\""
                            : ""
                    )
                    + ". Watch for it as scale and in aged sludge.";
            }
        }
    }

    private static IEnumerable<string> Unlisted(Outcome outcome)
    {
        foreach (var stage in outcome.Trains.SelectMany(t => t.Stages))
        {
            var solids = stage
                .Saturations.Where(s => Mattering.IsUnexplained(s) && s.Index > LikelyToForm)
                .OrderByDescending(s => s.Index)
                .Select(s =>
                    MarkdownText.Escape(s.Solid.Name) + " (SI " + Digits.Index(s.Index) + ")"
                )
                .ToArray();
            if (solids.Length > 0)
            {
                yield return "Stage '"
                    + MarkdownText.Escape(stage.Stage.Name)
                    + "' ends supersaturated with "
                    + string.Join(", ", solids)
                    + ", which the recipe neither lists under `form` nor holds back: decide which, for the doses and the sludge depend on it.";
            }
        }
    }
}
