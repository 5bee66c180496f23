using System.Text.RegularExpressions;
using NetArchTest.Rules;
using Xunit;

namespace Bittern.Architecture.Tests;

/// <summary>Files, clock, culture, randomness, network and processes come in through the command line alone; the rest is handed what it needs.</summary>
public sealed class OutsideWorldTests
{
    // Bittern.Hooks starts the confined process that scripts run in.
    private static readonly string[] MayTouchIt =
    [
        "Bittern.Cli",
        "Bittern.Hooks",
        "Bittern.HookWorker",
    ];

    private static readonly string[] Outside =
    [
        "System.Console",
        "System.Diagnostics.Process",
        "System.Diagnostics.Stopwatch",
        "System.IO.Directory",
        "System.IO.DirectoryInfo",
        "System.IO.File",
        "System.IO.FileInfo",
        "System.IO.FileStream",
        "System.Net.Dns",
        "System.Net.Http",
        "System.Net.HttpListener",
        "System.Net.Sockets",
        "System.Net.WebRequest",
        "System.Random",
        "System.Security.Cryptography.RandomNumberGenerator",
        "System.TimeProvider",
    ];

    public static TheoryData<string> PureProjects() =>
        [.. House.Projects.Select(p => p.Name).Except(MayTouchIt, StringComparer.Ordinal)];

    [Theory]
    [MemberData(nameof(PureProjects))]
    public void Nothing_but_the_command_line_opens_files_or_reads_the_clock(string name)
    {
        var project = House.Projects.Single(p =>
            string.Equals(p.Name, name, StringComparison.Ordinal)
        );
        var result = Types
            .InAssembly(project.Assembly)
            .ShouldNot()
            .HaveDependencyOnAny(Outside)
            .GetResult();
        Findings.None(result.FailingTypeNames ?? []);
    }

    // A check that finds nothing anywhere would pass for ever: it must see the files that the command line opens.
    [Fact]
    public void The_check_sees_the_files_of_the_command_line() =>
        Assert.False(
            Types
                .InAssembly(House.Projects.Single(p => p.Name is "Bittern.Cli").Assembly)
                .ShouldNot()
                .HaveDependencyOnAny("System.IO.File")
                .GetResult()
                .IsSuccessful
        );

    [Theory]
    [MemberData(nameof(PureProjects))]
    public void Nothing_but_the_command_line_asks_for_now_or_here(string name)
    {
        var asks = new Regex(
            @"\b(DateTime|DateTimeOffset)\.(Now|UtcNow|Today)\b|\bCultureInfo\.Current(UI)?Culture\b|\bEnvironment\.\w+|\bGuid\.NewGuid\b",
            RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture,
            TimeSpan.FromSeconds(5)
        );
        var found = House
            .Files()
            .Where(f =>
                f.Name.StartsWith($"src/{name}/", StringComparison.Ordinal)
                && f.Name.EndsWith(".cs", StringComparison.Ordinal)
            )
            .SelectMany(f =>
                asks.Matches(File.ReadAllText(f.Full)).Select(m => $"{f.Name}: {m.Value}")
            );
        Findings.None(found);
    }
}
