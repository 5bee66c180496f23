using System.CommandLine;

namespace Bittern.Cli.Commands;

/// <summary>The root command.</summary>
internal static class BitternCommand
{
    public static RootCommand Create(Terminal terminal) =>
        new(
            """
            Bittern calculates which solids form when a brine, leachate or effluent is dosed, blended or aerated, and writes the report.

            Start with:
              bittern run recipes/gypsum-mix/gypsum-mix.bittern     run a recipe and write its report beside it
              bittern check my.bittern                              look for mistakes without calculating
              bittern explain BT0122                                what a message means, with an example
              bittern catalogue Zn hydroxide                        which constants are shipped

            Exit codes: 0 done and all limits met, 1 a limit failed or a target is out of reach, 2 the recipe is wrong, 3 no certified answer, 64 usage, 70 a bug of ours.
            The results support a decision; they do not make one. Local codes and licensed practice come first.
            """
        )
        {
            RunCommand.Create(terminal),
            CheckCommand.Create(terminal),
            ExplainCommand.Create(terminal),
            CatalogueCommand.Create(terminal),
        };
}
