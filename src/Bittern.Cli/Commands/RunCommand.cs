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
    public static Command Create(Terminal terminal)
    {
        var recipe = new Argument<string>("recipe") { Description = "The recipe file (.bittern)." };
        var output = new Option<string?>("--out")
        {
            Description =
                "Folder for the report. Default: beside the recipe, named after it with .report at its end. An earlier report there is replaced as a whole.",
        };
        var command = new Command("run", "Calculate a recipe and write report.md and report.html.")
        {
            recipe,
            output,
        };
        command.SetAction(
            (parsed, cancellation) =>
                Task.FromResult(
                    Run(parsed.GetValue(recipe)!, parsed.GetValue(output), terminal, cancellation)
                )
        );
        return command;
    }

    private static int Run(
        string path,
        string? output,
        Terminal terminal,
        CancellationToken cancellation
    )
    {
        if (Recipes.Read(path, terminal) is not { } read)
        {
            return ExitCode.Usage;
        }

        var said = read.Diagnostics.Where(Recipes.IsWorthSaying).ToList();
        if (said.Count > 0)
        {
            terminal.Error.Write(TextRenderer.Render([.. said]));
        }

        if (read.Recipe is not { } recipe)
        {
            return ExitCode.RecipeWrong;
        }

        var outcome = RecipeRun.Execute(recipe, cancellation);
        outcome = outcome with { Diagnostics = [.. read.Diagnostics, .. outcome.Diagnostics] };
        var folder =
            output
            ?? Path.Combine(
                Path.GetDirectoryName(Path.GetFullPath(path))!,
                Path.GetFileNameWithoutExtension(path) + ".report"
            );
        try
        {
            OutputFolder.Write(folder, Files(outcome), cancellation);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            terminal.Error.WriteLine($"The report was not written: {e.Message}");
            return ExitCode.Usage;
        }

        Summary.Write(outcome, Relative(folder), terminal.Out);
        return !outcome.AllCertified ? ExitCode.NoAnswer
            : outcome.AllLimitsMet ? ExitCode.Done
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
            ("results.json", JsonReport.Render(outcome, stamp)),
            .. figures.Select(f => ($"{ReportFigures.Folder}/{f.Name}", f.Svg)),
            .. CsvTables.Render(outcome).Select(t => ($"tables/{t.Name}", t.Text)),
        ];
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
