using System.Globalization;
using Bittern.Calculation;

namespace Bittern.Cli.Commands;

/// <summary>The few lines that a run leaves on the screen: what was dosed, which limits hold, where the report is.</summary>
internal static class Summary
{
    public static void Write(Outcome outcome, string folder, TextWriter output)
    {
        foreach (var train in outcome.Trains)
        {
            if (train.Failure is { } failure)
            {
                output.WriteLine(
                    $"{train.Train.Name}: no certified answer in {failure.Stage}: {failure.Reason}"
                );
                continue;
            }

            foreach (var stage in train.Stages)
            {
                var doses = string.Join(
                    ", ",
                    stage.Doses.Select(d =>
                        string.Create(
                            CultureInfo.InvariantCulture,
                            $"{d.Reagent.Name} {d.DryPerFeed:g4} kg/m3 dry"
                        )
                    )
                );
                var solids = string.Join(
                    ", ",
                    stage
                        .Formed.Where(f => f.MassPerFeed > 1e-9)
                        .Select(f =>
                            string.Create(
                                CultureInfo.InvariantCulture,
                                $"{f.Solid.Name} {f.MassPerFeed:g3} kg/m3"
                            )
                        )
                );
                output.WriteLine(
                    string.Create(
                        CultureInfo.InvariantCulture,
                        $"{train.Train.Name}/{stage.Stage.Name}: pH {stage.End.PH:0.00}; {(doses.Length == 0 ? "no dose" : doses)}; {(solids.Length == 0 ? "nothing forms" : "forms " + solids)}"
                    )
                );
            }
        }

        foreach (var set in outcome.LimitSets)
        {
            foreach (var result in set.Results)
            {
                var verdict = result.Verdict switch
                {
                    Verdict.Met => "met",
                    Verdict.Failed => "FAILED",
                    Verdict.Undecided => "UNDECIDED",
                    _ => "NOT JUDGED",
                };
                output.WriteLine(
                    $"{set.Set.Name}: {string.Join(' ', result.Limit.Condition.Written.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries))}: {verdict}"
                );
            }
        }

        output.WriteLine($"Report: {folder}/report.md and report.html");
    }
}
