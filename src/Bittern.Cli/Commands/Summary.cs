using System.Globalization;
using Bittern.Calculation;
using Bittern.Model;

namespace Bittern.Cli.Commands;

/// <summary>The few lines that a run leaves on the screen: what was dosed, which limits hold, where the report is.</summary>
internal static class Summary
{
    /// <summary>kg per m3 of feed below which a solid is not worth a word on the screen; the report lists it.</summary>
    private const double WorthAWord = 1e-9;

    public static void Write(Outcome outcome, string folder, TextWriter output)
    {
        foreach (var train in outcome.Trains)
        {
            if (train.Failure is { } failure)
            {
                Line(
                    output,
                    $"{train.Train.Name}: no certified answer in {failure.Stage}: {failure.Reason}"
                );
            }
            else if (train.Train.IsMixture)
            {
                Mixture(train, output);
            }
            else
            {
                foreach (var stage in train.Stages)
                {
                    Stage(train, stage, output);
                }
            }
        }

        foreach (var set in outcome.LimitSets)
        {
            foreach (var result in set.Results)
            {
                Limit(set.Set, result, output);
            }
        }

        Line(output, $"Report: {folder}/report.md and report.html");
    }

    private static void Mixture(TrainResult train, TextWriter output)
    {
        foreach (var stage in train.Stages)
        {
            var grams = 1000 * (train.Train.Feed.CubicMetres ?? 1);
            var solids = Solids(stage, f => Number($"{f.MassPerFeed * grams:g3} g"));
            Line(output, Number($"{train.Train.Name}: pH {stage.End.PH:0.00}; {solids}"));
        }
    }

    private static void Stage(TrainResult train, StageResult stage, TextWriter output)
    {
        var doses = string.Join(
            ", ",
            stage.Doses.Select(d =>
                d.Target is { Reached: false } target
                    ? $"NO DOSE of {d.Reagent.Name} reaches {OneLine(target.Target.Written)}"
                    : Number($"{d.Reagent.Name} {d.DryPerFeed:g3} kg/m3 dry")
            )
        );
        var solids = Solids(stage, f => Number($"{f.MassPerFeed:g3} kg/m3"));
        Line(
            output,
            Number(
                $"{train.Train.Name}/{stage.Stage.Name}: pH {stage.End.PH:0.00}; {(doses.Length == 0 ? "no dose" : doses)}; {solids}"
            )
        );
    }

    private static string Solids(StageResult stage, Func<SolidAmount, string> amount)
    {
        var formed = stage
            .Formed.Where(f => f.MassPerFeed > WorthAWord)
            .Select(f => $"{f.Solid.Name} {amount(f)}")
            .ToList();
        return formed.Count == 0 ? "nothing forms" : "forms " + string.Join(", ", formed);
    }

    private static void Limit(LimitSet set, LimitResult result, TextWriter output)
    {
        var verdict = result.Verdict switch
        {
            Verdict.Met => "met",
            Verdict.Failed => "FAILED",
            Verdict.Undecided => "UNDECIDED",
            _ => "NOT JUDGED",
        };
        var condition = result.Limit.Condition;
        var value = result.Value / condition.DisplayFactor;

        // Two decimals for pH and saturation indices: a zero there is a rounding error in more digits.
        var found =
            !double.IsFinite(value) ? ""
            : condition.DisplayUnit.Length == 0 ? Number($" ({value:0.00})")
            : Number($" ({value:g3} {condition.DisplayUnit})");
        Line(output, $"{set.Name}: {OneLine(condition.Written)}: {verdict}{found}");
    }

    private static string OneLine(string text) =>
        string.Join(' ', text.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries));

    private static string Number(FormattableString text) =>
        text.ToString(CultureInfo.InvariantCulture);

    // Texts of a recipe may hold any characters; none of them may steer a terminal.
    private static void Line(TextWriter output, string text) =>
        output.WriteLine(string.Concat(text.Select(c => char.IsControl(c) ? '\uFFFD' : c)));
}
