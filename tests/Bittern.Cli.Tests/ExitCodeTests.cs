using System.Globalization;
using Xunit;

namespace Bittern.Cli.Tests;

/// <summary>The exit codes that scripts and forges rely on, and what is said with each.</summary>
public sealed class ExitCodeTests : IDisposable
{
    private readonly CommandLine _shell = new();

    public void Dispose() => _shell.Dispose();

    [Fact]
    public void A_run_without_a_fault_ends_with_0_and_says_where_the_report_is()
    {
        var run = CommandLine.Run("run", _shell.File("mix.bittern", Samples.Mixture));

        Assert.Equal(0, run.Code);
        Assert.Contains("forms gypsum 1.21 g", run.Out, StringComparison.Ordinal);
        Assert.Contains("mix.report/report.md", run.Out, StringComparison.Ordinal);
        Assert.Empty(run.Error);
        var written = _shell.Everything().ToHashSet(StringComparer.Ordinal);
        Assert.Contains("mix.report/report.md", written);
        Assert.Contains("mix.report/report.html", written);
        Assert.All(written, name => Assert.StartsWith("mix.", name, StringComparison.Ordinal));
    }

    [Fact]
    public void Json_on_standard_output_is_the_file_that_is_written()
    {
        var run = CommandLine.Run("run", _shell.File("mix.bittern", Samples.Mixture), "--json");

        Assert.Equal(0, run.Code);
        Assert.Equal(
            File.ReadAllText(Path.Combine(_shell.Folder, "mix.report", "results.json")),
            run.Out
        );
    }

    [Fact]
    public void A_failed_limit_ends_with_1_and_still_writes_the_report()
    {
        var run = CommandLine.Run("run", _shell.File("a.bittern", Samples.LimitFails));

        Assert.Equal(1, run.Code);
        Assert.Contains("dissolved(Ca) <= 1 mg/L: FAILED", run.Out, StringComparison.Ordinal);
        Assert.True(File.Exists(Path.Combine(_shell.Folder, "a.report", "report.md")));
    }

    [Fact]
    public void A_solid_that_is_present_meets_a_saturation_limit_of_zero()
    {
        var recipe = Samples.LimitFails.Replace(
            "dissolved(Ca) <= 1 mg/L",
            "SI(gypsum) within 0 .. 0",
            StringComparison.Ordinal
        );
        var run = CommandLine.Run("run", _shell.File("a.bittern", recipe));

        Assert.Equal(0, run.Code);
        Assert.Contains("met (0.00)", run.Out, StringComparison.Ordinal);
    }

    [Fact]
    public void A_target_that_no_dose_reaches_ends_with_1()
    {
        var run = CommandLine.Run("run", _shell.File("a.bittern", Samples.TargetOutOfReach));

        Assert.Equal(1, run.Code);
        Assert.Contains("NO DOSE of lime reaches", run.Out, StringComparison.Ordinal);
        Assert.Contains("BT5002", run.Error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("run")]
    [InlineData("check")]
    public void A_wrong_recipe_ends_with_2_and_writes_nothing(string command)
    {
        var run = CommandLine.Run(command, _shell.File("a.bittern", Samples.TwoMistakes));

        Assert.Equal(2, run.Code);
        Assert.Equal(["a.bittern"], _shell.Everything());
    }

    [Fact]
    public void Without_a_certified_answer_a_run_ends_with_3_and_says_why()
    {
        var run = CommandLine.Run("run", _shell.File("a.bittern", Samples.NoWaterLeft));

        Assert.Equal(3, run.Code);
        Assert.Contains("BT5001", run.Error, StringComparison.Ordinal);
        Assert.Contains("no liquid water is left", run.Error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData]
    [InlineData("run")]
    [InlineData("run", "missing.bittern")]
    [InlineData("run", ".")]
    [InlineData("run", "a.bittern", "b.bittern")]
    [InlineData("run", "--no-such-option", "a.bittern")]
    [InlineData("check")]
    [InlineData("check", "missing.bittern")]
    [InlineData("explain", "BT9999")]
    [InlineData("no-such-command")]
    public void A_wrong_command_line_ends_with_64_and_one_or_two_lines(params string[] arguments)
    {
        var run = CommandLine.Run(arguments);

        Assert.Equal(64, run.Code);
        Assert.InRange(Lines(run.Error), 1, 3);
        Assert.Empty(run.Out);
    }

    [Theory]
    [InlineData("--help")]
    [InlineData("run", "--help")]
    [InlineData("--version")]
    [InlineData("explain", "bt0102")]
    public void Questions_about_the_tool_end_with_0(params string[] arguments)
    {
        var run = CommandLine.Run(arguments);

        Assert.Equal(0, run.Code);
        Assert.NotEmpty(run.Out);
        Assert.Empty(run.Error);
    }

    [Fact]
    public void A_bug_ends_with_70_one_message_and_no_stack()
    {
        using var error = new StringWriter(CultureInfo.InvariantCulture);
        var code = Program.Run(
            ["check", _shell.File("a.bittern", Samples.Mixture)],
            new Terminal(new BrokenWriter(), error)
        );

        Assert.Equal(70, code);
        Assert.Contains("an error of its own", error.ToString(), StringComparison.Ordinal);
        Assert.Contains("report it", error.ToString(), StringComparison.Ordinal);
        Assert.DoesNotContain("   at ", error.ToString(), StringComparison.Ordinal);
    }

    private static int Lines(string text) =>
        text.Split('\n', StringSplitOptions.RemoveEmptyEntries).Length;

    // Stands for any slip of ours in the middle of a command.
    private sealed class BrokenWriter : StringWriter
    {
        public BrokenWriter()
            : base(CultureInfo.InvariantCulture) { }

        public override void WriteLine(string? value) =>
            throw new InvalidOperationException("broken on purpose");
    }
}
