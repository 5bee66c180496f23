using Bittern.Cli.Files;
using Xunit;

namespace Bittern.Cli.Tests;

/// <summary>Outputs appear whole or not at all, and never in the place of somebody's work.</summary>
public sealed class OutputFolderTests : IDisposable
{
    private readonly CommandLine _shell = new();

    public void Dispose() => _shell.Dispose();

    private string Target => Path.Combine(_shell.Folder, "out");

    [Fact]
    public void An_earlier_report_is_replaced_as_a_whole()
    {
        Write(("report.md", "old"), ("figures/gone.svg", "old"));
        Write(("report.md", "new"), ("tables/a.csv", "new"));

        Assert.Equal(
            ["out", "out/report.md", "out/tables", "out/tables/a.csv"],
            _shell.Everything()
        );
        Assert.Equal("new", File.ReadAllText(Path.Combine(Target, "report.md")));
    }

    [Theory]
    [InlineData("notes.txt")]
    [InlineData("report.md.bak")]
    [InlineData("my.bittern")]
    public void A_folder_with_anything_else_in_it_is_left_alone(string stranger)
    {
        _shell.File("out/report.md", "old");
        _shell.File("out/" + stranger, "mine");

        var fault = Assert.Throws<IOException>(() => Write(("report.md", "new")));

        Assert.Contains(stranger, fault.Message, StringComparison.Ordinal);
        Assert.Equal("old", File.ReadAllText(Path.Combine(Target, "report.md")));
        Assert.Equal("mine", File.ReadAllText(Path.Combine(Target, stranger)));
        Assert.Equal(3, _shell.Everything().Count);
    }

    [Fact]
    public void A_file_in_the_place_of_the_folder_is_left_alone()
    {
        _shell.File("out", "mine");

        Assert.Throws<IOException>(() => Write(("report.md", "new")));
        Assert.Equal("mine", File.ReadAllText(Target));
    }

    [Fact]
    public void A_write_that_fails_half_way_leaves_the_earlier_report_and_no_crumbs()
    {
        Write(("report.md", "old"));

        // The second file needs the first as a folder.
        Assert.ThrowsAny<IOException>(() => Write(("report.md", "new"), ("report.md/x", "new")));

        Assert.Equal(["out", "out/report.md"], _shell.Everything());
        Assert.Equal("old", File.ReadAllText(Path.Combine(Target, "report.md")));
    }

    [Fact]
    public void A_cancelled_write_leaves_the_earlier_report_and_no_crumbs()
    {
        Write(("report.md", "old"));

        Assert.Throws<OperationCanceledException>(() =>
            OutputFolder.Write(Target, [("report.md", "new")], new CancellationToken(true))
        );

        Assert.Equal(["out", "out/report.md"], _shell.Everything());
        Assert.Equal("old", File.ReadAllText(Path.Combine(Target, "report.md")));
    }

    [Fact]
    public void The_command_line_says_that_nothing_was_written()
    {
        _shell.File("out/thesis.docx", "mine");

        var run = CommandLine.Run(
            "run",
            _shell.File("mix.bittern", Samples.Mixture),
            "--out",
            Target
        );

        Assert.Equal(64, run.Code);
        Assert.Contains("thesis.docx", run.Error, StringComparison.Ordinal);
        Assert.Equal(["mix.bittern", "out", "out/thesis.docx"], _shell.Everything());
    }

    private void Write(params (string Path, string Text)[] files) =>
        OutputFolder.Write(Target, files, CancellationToken.None);
}
