using System.Diagnostics;
using System.Globalization;
using System.Text;
using Xunit;

namespace Bittern.Cli.Tests;

/// <summary>The command as a process: the user's culture, and Ctrl-C.</summary>
public sealed class ProcessTests : IDisposable
{
    private readonly CommandLine _shell = new();

    public void Dispose() => _shell.Dispose();

    [Theory]
    [InlineData("de_DE.UTF-8")]
    [InlineData("tr_TR.UTF-8")]
    public async Task The_users_culture_changes_no_byte(string culture)
    {
        var recipe = _shell.File("mix.bittern", Samples.Mixture);
        var plain = await Run("C.UTF-8", recipe, "plain");
        var local = await Run(culture, recipe, "local");

        Assert.Equal(0, plain.Code);
        Assert.Equal(plain.Out.Replace("plain", "local", StringComparison.Ordinal), local.Out);
        Golden.Compare(
            Path.Combine(_shell.Folder, "plain"),
            Path.Combine(_shell.Folder, "local"),
            mayAccept: false
        );
    }

    [Fact]
    public async Task An_interrupted_run_leaves_nothing_behind()
    {
        if (OperatingSystem.IsWindows())
        {
            return; // There is no interrupt to send to one process alone.
        }

        var recipe = _shell.File("long.bittern", Long());
        using var process = Start("C.UTF-8", recipe, "out");
        var cancellation = TestContext.Current.CancellationToken;
        await Task.Delay(1500, cancellation);
        Assert.False(process.HasExited, "the recipe is too short to interrupt it");
        using (var kill = Process.Start("kill", ["-INT", Id(process)]))
        {
            await kill.WaitForExitAsync(cancellation);
        }

        var stopwatch = Stopwatch.StartNew();
        await process.WaitForExitAsync(cancellation);

        Assert.Equal(130, process.ExitCode);
        Assert.InRange(stopwatch.Elapsed.TotalSeconds, 0, 5);
        Assert.Equal(["long.bittern"], _shell.Everything());
    }

    // Enough targets to keep any machine busy for longer than the test waits.
    private static string Long()
    {
        var text = new StringBuilder(
            """
            use catalogue major, salts, metals
            liquor pond { pH 3.0; Fe(III) 100 mg/L; Al 80 mg/L; Zn 40 mg/L; Mg 500 mg/L; Ca 300 mg/L; SO4 4000 mg/L; charge closed by SO4 }
            reagent lime { Ca(OH)2 100 g/L }

            """
        );
        for (var i = 1; i <= 500; i++)
        {
            text.Append(
                CultureInfo.InvariantCulture,
                $"train t{i} {{\n feed pond at 1 m3/h\n stage one {{\n add lime until dissolved(Zn) <= 1 mg/L\n form any\n }}\n}}\n"
            );
        }

        return text.ToString();
    }

    private static string Id(Process process) => process.Id.ToString(CultureInfo.InvariantCulture);

    private async Task<Finished> Run(string culture, string recipe, string into)
    {
        using var process = Start(culture, recipe, into);
        var cancellation = TestContext.Current.CancellationToken;
        var output = process.StandardOutput.ReadToEndAsync(cancellation);
        var error = process.StandardError.ReadToEndAsync(cancellation);
        await process.WaitForExitAsync(cancellation);
        return new Finished(process.ExitCode, await output, await error);
    }

    private Process Start(string culture, string recipe, string into)
    {
        var start = new ProcessStartInfo(
            Path.Combine(AppContext.BaseDirectory, "bittern"),
            ["run", recipe, "--out", Path.Combine(_shell.Folder, into)]
        )
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            UseShellExecute = false,
        };
        start.Environment["LANG"] = culture;
        start.Environment["LC_ALL"] = culture;
        return Process.Start(start)!;
    }
}
