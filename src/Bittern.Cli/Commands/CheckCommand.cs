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
        var command = new Command(
            "check",
            "Look for mistakes without calculating. Nothing is written."
        )
        {
            recipes,
        };
        command.SetAction(parsed => Run(parsed.GetValue(recipes)!, terminal));
        return command;
    }

    private static int Run(string[] paths, Terminal terminal)
    {
        var worst = ExitCode.Done;
        foreach (var path in paths)
        {
            if (Recipes.Read(path, path, terminal) is not { } read)
            {
                worst = ExitCode.Usage;
                continue;
            }

            if (!read.Diagnostics.IsEmpty)
            {
                terminal.Out.Write(TextRenderer.Render(read.Diagnostics));
            }

            if (read.HasErrors)
            {
                worst = Math.Max(worst, ExitCode.RecipeWrong);
            }
            else
            {
                terminal.Out.WriteLine($"{path}: no errors");
            }
        }

        return worst;
    }
}
