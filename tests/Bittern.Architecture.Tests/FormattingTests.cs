using System.Diagnostics;
using Xunit;

namespace Bittern.Architecture.Tests;

/// <summary>Every C# and project file is as the formatter of the tool manifest writes it.</summary>
public sealed class FormattingTests
{
    [Fact]
    public async Task Sources_are_formatted()
    {
        var restored = await Dotnet("tool", "restore");
        Assert.True(restored.Code == 0, restored.Text);
        var check = await Dotnet("csharpier", "check", "src", "tests");
        Assert.True(
            check.Code == 0,
            "dotnet csharpier format src tests   mends this:\n" + check.Text
        );
    }

    private static async Task<(int Code, string Text)> Dotnet(params string[] arguments)
    {
        var start = new ProcessStartInfo("dotnet", arguments)
        {
            WorkingDirectory = House.Root,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            UseShellExecute = false,
        };
        using var process = Process.Start(start)!;
        var cancellation = TestContext.Current.CancellationToken;
        var output = process.StandardOutput.ReadToEndAsync(cancellation);
        var error = process.StandardError.ReadToEndAsync(cancellation);
        await process.WaitForExitAsync(cancellation);
        return (process.ExitCode, await output + await error);
    }
}
