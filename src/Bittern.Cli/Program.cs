using System.CommandLine;
using System.Globalization;
using System.Text;
using Bittern.Cli.Commands;

namespace Bittern.Cli;

/// <summary>The command line: the one place that touches files, culture and the console.</summary>
public static class Program
{
    /// <summary>Shows the stack of an unexpected error when set to 1.</summary>
    private const string StackVariable = "BITTERN_STACK";

    public static int Main(string[] args)
    {
        CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
        CultureInfo.CurrentUICulture = CultureInfo.InvariantCulture;
        CultureInfo.DefaultThreadCurrentCulture = CultureInfo.InvariantCulture;
        Console.OutputEncoding = new UTF8Encoding(encoderShouldEmitUTF8Identifier: false);
        return Run(args, new Terminal(Console.Out, Console.Error));
    }

    /// <summary>Runs one command; tests call this with writers of their own.</summary>
    public static int Run(string[] args, Terminal terminal)
    {
        try
        {
            var parsed = BitternCommand.Create(terminal).Parse(args);
            if (parsed.Errors.Count > 0)
            {
                foreach (var error in parsed.Errors)
                {
                    terminal.Error.WriteLine(error.Message);
                }

                terminal.Error.WriteLine("See: bittern --help");
                return ExitCode.Usage;
            }

            return parsed.Invoke(
                new InvocationConfiguration
                {
                    EnableDefaultExceptionHandler = false,
                    Output = terminal.Out,
                    Error = terminal.Error,
                    ProcessTerminationTimeout = TimeSpan.FromSeconds(2),
                }
            );
        }
        catch (OperationCanceledException)
        {
            terminal.Error.WriteLine("Stopped; nothing was written.");
            return ExitCode.Cancelled;
        }
        catch (Exception bug)
        {
            terminal.Error.WriteLine(
                $"Bittern stopped on an error of its own: {bug.GetType().Name}: {bug.Message}"
            );
            terminal.Error.WriteLine(
                $"Please report it with the recipe. {StackVariable}=1 shows where it happened."
            );
            if (
                string.Equals(
                    Environment.GetEnvironmentVariable(StackVariable),
                    "1",
                    StringComparison.Ordinal
                )
            )
            {
                terminal.Error.WriteLine(bug.ToString());
            }

            return ExitCode.Bug;
        }
    }
}
