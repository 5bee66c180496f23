using System.CommandLine;
using Bittern.Calculation;
using Bittern.Cli.Files;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Rendering;
using Bittern.Model;
using Bittern.Reports;

namespace Bittern.Cli.Commands;

/// <summary><c>bittern run</c>: calculates a recipe and writes its report.</summary>
internal static class RunCommand
{
    private const string Results = "results.json";

    public static Command Create(Terminal terminal)
    {
        var recipe = new Argument<string>("recipe") { Description = "The recipe file (.bittern)." };
        var output = new Option<string?>("--out")
        {
            Description =
                "Folder for the report. Default: beside the recipe, named after it with .report at its end. An earlier report there is replaced as a whole.",
        };
        var json = new Option<bool>("--json")
        {
            Description =
                "Print results.json instead of the summary (its schema: docs/results.schema.json).",
        };
        var command = new Command(
            "run",
            """
            Calculate a recipe and write its report: report.md and report.html for people, results.json and tables/*.csv for machines.

            Examples:
              bittern run pond.bittern                      writes pond.report/ beside the recipe
              bittern run pond.bittern --out client/pond    writes there instead
              bittern run pond.bittern --json | jq .limits  results for a script
            """
        )
        {
            recipe,
            output,
            json,
        };
        command.SetAction(
            (parsed, cancellation) =>
                Task.FromResult(
                    Run(
                        parsed.GetValue(recipe)!,
                        new Wishes(parsed.GetValue(output), parsed.GetValue(json)),
                        terminal,
                        cancellation
                    )
                )
        );
        return command;
    }

    /// <summary>What the command line asks for.</summary>
    /// <param name="Output">Folder for the report; null for the one beside the recipe.</param>
    /// <param name="Json">Results on standard output instead of the summary.</param>
    private sealed record Wishes(string? Output, bool Json);

    private static int Run(
        string path,
        Wishes wishes,
        Terminal terminal,
        CancellationToken cancellation
    )
    {
        if (Recipes.Read(path, Path.GetFileName(path), terminal) is not { } read)
        {
            return ExitCode.Usage;
        }

        Say(read.Diagnostics, terminal);
        if (read.Recipe is not { } recipe)
        {
            return ExitCode.RecipeWrong;
        }

        var outcome = RecipeRun.Execute(recipe, cancellation);
        Say(outcome.Diagnostics, terminal);
        outcome = outcome with { Diagnostics = [.. read.Diagnostics, .. outcome.Diagnostics] };
        var folder =
            wishes.Output
            ?? Path.Combine(
                Path.GetDirectoryName(Path.GetFullPath(path))!,
                Path.GetFileNameWithoutExtension(path) + ".report"
            );
        var files = Files(outcome);
        try
        {
            OutputFolder.Write(folder, files, cancellation);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            terminal.Error.WriteLine($"The report was not written: {e.Message}");
            return ExitCode.Usage;
        }

        if (wishes.Json)
        {
            terminal.Out.Write(files.Single(f => f.Path is Results).Text);
        }
        else
        {
            Summary.Write(outcome, Relative(folder), terminal.Out);
        }

        return !outcome.AllCertified ? ExitCode.NoAnswer
            : outcome.AllLimitsMet && outcome.Trains.All(AllTargetsReached) ? ExitCode.Done
            : ExitCode.LimitFailed;
    }

    private static List<(string Path, string Text)> Files(Outcome outcome)
    {
        var stamp = ReportStamp.Of(outcome.Recipe, Terminal.Version);
        var markdown = MarkdownReport.Render(outcome, stamp);
        var figures = ReportFigures.Render(outcome);
        return
        [
            ("report.md", markdown),
            ("report.html", HtmlReport.Render(markdown, outcome.Recipe.Header.Title, figures)),
            (Results, JsonReport.Render(outcome, stamp)),
            .. figures.Select(f => ($"{ReportFigures.Folder}/{f.Name}", f.Svg)),
            .. CsvTables.Render(outcome).Select(t => ($"tables/{t.Name}", t.Text)),
        ];
    }

    // What follows an unreached target is a best case, so a script must not take the run for a success.
    private static bool AllTargetsReached(TrainResult train) =>
        train.Stages.All(s => s.Doses.All(d => d.Target is null or { Reached: true }));

    private static void Say(IEnumerable<Diagnostic> diagnostics, Terminal terminal)
    {
        var said = diagnostics.Where(Recipes.IsWorthSaying).ToList();
        if (said.Count > 0)
        {
            terminal.Error.WriteLine(TextRenderer.Render([.. said]));
        }
    }

    private static string Relative(string folder)
    {
        var relative = Path.GetRelativePath(Directory.GetCurrentDirectory(), folder);
        return (relative.StartsWith("..", StringComparison.Ordinal) ? folder : relative).Replace(
            '\\',
            '/'
        );
    }
}
