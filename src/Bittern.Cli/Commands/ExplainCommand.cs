using System.CommandLine;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Rendering;

namespace Bittern.Cli.Commands;

/// <summary><c>bittern explain</c>: what a code means, with a wrong and a right example.</summary>
internal static class ExplainCommand
{
    public static Command Create(Terminal terminal)
    {
        var code = new Argument<string>("code")
        {
            Description = "A code as messages show it, e.g. BT0122.",
        };
        var command = new Command("explain", "Explain a message by its code.") { code };
        command.SetAction(parsed => Run(parsed.GetValue(code)!, terminal));
        return command;
    }

    private static int Run(string id, Terminal terminal)
    {
        if (DiagnosticCatalogue.Find(id) is not { } code)
        {
            terminal.Error.WriteLine($"There is no code '{id}'. Codes look like BT0122.");
            return ExitCode.Usage;
        }

        terminal.Out.Write(CodePage.Render(code));
        return ExitCode.Done;
    }
}
