using System.Collections.Immutable;
using System.Globalization;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>
/// Judges limits. Each is looked at with values below detection at zero and at the limit as well; a verdict that flips is undecided, and the analyses that
/// flip it are named.
/// </summary>
internal static class Limits
{
    public static ImmutableArray<LimitSetResult> Judge(
        Recipe recipe,
        RecipeRun.Pass stated,
        Func<DetectionChoice, AnalysisEntry?, RecipeRun.Pass> passes
    )
    {
        var censored = recipe
            .Liquors.SelectMany(l => l.Entries)
            .Where(e => e.Amount.BelowDetection != BelowDetection.No)
            .ToImmutableArray();
        RecipeRun.Pass[] ends =
            censored.IsEmpty || recipe.LimitSets.IsEmpty
                ? []
                : [passes(DetectionChoice.AllZero, null), passes(DetectionChoice.AllAtLimit, null)];
        return
        [
            .. recipe.LimitSets.Select(set => new LimitSetResult(
                set,
                [
                    .. set.Limits.Select(limit =>
                        JudgeOne(set, limit, stated, ends, censored, passes)
                    ),
                ]
            )),
        ];
    }

    private static LimitResult JudgeOne(
        LimitSet set,
        Limit limit,
        RecipeRun.Pass stated,
        RecipeRun.Pass[] ends,
        ImmutableArray<AnalysisEntry> censored,
        Func<DetectionChoice, AnalysisEntry?, RecipeRun.Pass> passes
    )
    {
        if (Value(set, limit, stated) is not { } value)
        {
            return new LimitResult(limit, Verdict.NotJudged, double.NaN, null);
        }

        var met = Quantities.IsMet(limit.Condition, value);
        var verdict = met ? Verdict.Met : Verdict.Failed;
        if (
            ends.All(e =>
                Value(set, limit, e) is { } other && Quantities.IsMet(limit.Condition, other) == met
            )
        )
        {
            return new LimitResult(limit, verdict, value, null);
        }

        var culprits = censored.Where(entry =>
            new[] { DetectionChoice.AllZero, DetectionChoice.AllAtLimit }.Any(choice =>
                Value(set, limit, passes(choice, entry)) is not { } other
                || Quantities.IsMet(limit.Condition, other) != met
            )
        );
        var names = string.Join(
            ", ",
            culprits.Select(e =>
                string.Create(CultureInfo.InvariantCulture, $"{e.Analyte} ({e.Amount.Written})")
            )
        );
        return new LimitResult(
            limit,
            Verdict.Undecided,
            value,
            names.Length == 0 ? "several values below detection together" : names
        );
    }

    private static double? Value(LimitSet set, Limit limit, RecipeRun.Pass pass)
    {
        var (result, outflow, formed) = pass.Train(set.Train, verdictsOnly: true);
        return result.Failure is not null || outflow is null
            ? null
            : Quantities.Evaluate(limit.Condition.Quantity, outflow, formed);
    }
}
