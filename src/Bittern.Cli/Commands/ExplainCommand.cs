using System.CommandLine;
using Bittern.Catalogue;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Rendering;

namespace Bittern.Cli.Commands;

/// <summary><c>bittern explain</c>: what a code means, with a wrong and a right example; or what the catalogue knows of a substance.</summary>
internal static class ExplainCommand
{
    public static Command Create(Terminal terminal)
    {
        var what = new Argument<string>("what")
        {
            Description =
                "A code as messages show it (BT0122), or a solid, species or gas of the catalogue (gypsum, \"CaSO4(aq)\").",
        };
        var command = new Command(
            "explain",
            "Explain a message by its code, or a constant of the catalogue."
        )
        {
            what,
        };
        command.SetAction(parsed => Run(parsed.GetValue(what)!, terminal));
        return command;
    }

    private static int Run(string what, Terminal terminal)
    {
        if (DiagnosticCatalogue.Find(what) is { } code)
        {
            terminal.Out.Write(CodePage.Render(code));
            return ExitCode.Done;
        }

        if (IsCode(what))
        {
            terminal.Error.WriteLine($"There is no code '{what}'. Codes look like BT0122.");
            return ExitCode.Usage;
        }

        return CatalogueCommand.Show(CatalogueIndex.Shipped(), what, terminal);
    }

    private static bool IsCode(string what) =>
        what.Length > 2
        && what.StartsWith("BT", StringComparison.OrdinalIgnoreCase)
        && what.AsSpan(2).ContainsAnyInRange('0', '9');
}
