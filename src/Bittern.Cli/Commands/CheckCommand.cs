using System.CommandLine;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Rendering;

namespace Bittern.Cli.Commands;

/// <summary><c>bittern check</c>: mistakes of recipes, without calculating.</summary>
internal static class CheckCommand
{
    public static Command Create(Terminal terminal)
    {
        var recipes = new Argument<string[]>("recipes")
        {
            Description = "Recipe files (.bittern).",
            Arity = ArgumentArity.OneOrMore,
        };
        var format = new Option<string>("--format")
        {
            Description =
                "text for people, json for scripts, sarif for forges that annotate changes.",
            DefaultValueFactory = _ => "text",
        };
        format.AcceptOnlyFromAmong("text", "json", "sarif");
        var command = new Command(
            "check",
            """
            Look for mistakes without calculating. Nothing is written.

            Examples:
              bittern check pond.bittern
              bittern check clients/*/*.bittern --format sarif > mistakes.sarif
            """
        )
        {
            recipes,
            format,
        };
        command.SetAction(parsed =>
            Run(parsed.GetValue(recipes)!, parsed.GetValue(format)!, terminal)
        );
        return command;
    }

    private static int Run(string[] paths, string format, Terminal terminal)
    {
        var worst = ExitCode.Done;
        var found = new List<Diagnostic>();
        foreach (var path in paths)
        {
            // Places read as the path was given, so that editors and forges find the file.
            if (Recipes.Read(path, path, terminal) is not { } read)
            {
                worst = ExitCode.Usage;
                continue;
            }

            found.AddRange(read.Diagnostics);
            if (read.HasErrors)
            {
                worst = Math.Max(worst, ExitCode.RecipeWrong);
            }

            if (format is "text")
            {
                terminal.Out.Write(TextRenderer.Render(read.Diagnostics));
                if (!read.HasErrors)
                {
                    terminal.Out.WriteLine($"{path}: no errors");
                }
            }
        }

        switch (format)
        {
            case "json":
                terminal.Out.Write(JsonRenderer.Render([.. found]));
                break;
            case "sarif":
                terminal.Out.Write(SarifRenderer.Render([.. found], Terminal.Version));
                break;
        }

        return worst;
    }
}
