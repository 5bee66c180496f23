using Xunit;

namespace Bittern.Cli.Tests;

/// <summary>What the README promises: two commands, and an excerpt that stands in the committed report.</summary>
public sealed class ReadmeTests
{
    private const string Begins = "<!-- excerpt begins";
    private const string Ends = "<!-- excerpt ends -->";

    private static string Readme => Path.Combine(Golden.Repository, "README.md");

    [Fact]
    public void The_first_code_block_holds_exactly_two_commands_that_exist()
    {
        var block = File.ReadAllText(Readme).Split("```")[1];
        var commands = block.Split('\n').Skip(1).Where(l => l.Trim().Length > 0).ToList();

        Assert.Equal(2, commands.Count);
        var words = commands[0].Split(' ');
        Assert.Equal(["dotnet", "run", "--project"], words[..3]);
        Assert.True(Directory.Exists(Path.Combine(Golden.Repository, words[3])), words[3]);
        Assert.True(File.Exists(Path.Combine(Golden.Repository, words[^1])), words[^1]);
        Assert.Equal("dotnet test", commands[1]);
    }

    [Fact]
    public void The_ci_script_calls_the_second_command() =>
        Assert.Contains(
            "\ndotnet test ",
            File.ReadAllText(Path.Combine(Golden.Repository, ".ci", "run")),
            StringComparison.Ordinal
        );

    [Fact]
    public void The_excerpt_is_cut_from_the_report_of_the_first_command()
    {
        // Run afresh, so that accepting does not depend on which test rewrites the report first.
        using var shell = new CommandLine();
        var folder = Path.Combine(shell.Folder, "out");
        var run = CommandLine.Run(
            "run",
            Path.Combine(
                Golden.Repository,
                "recipes/adit-lime-treatment/adit-lime-treatment.bittern"
            ),
            "--out",
            folder
        );
        Assert.Equal(0, run.Code);
        var report = File.ReadAllText(Path.Combine(folder, "report.md"));
        var readme = File.ReadAllText(Readme);
        var start = readme.IndexOf('\n', readme.IndexOf(Begins, StringComparison.Ordinal)) + 1;
        var end = readme.IndexOf(Ends, StringComparison.Ordinal);
        var excerpt =
            "\n"
            + Quoted(Between(report, "## Answer\n", "Sludge or product:\n"))
            + ">\n> […]\n>\n"
            + Quoted(Between(report, "**gypsum** (formed)\n", "\n**"))
            + "\n";
        if (Golden.Accepting)
        {
            File.WriteAllText(Readme, readme[..start] + excerpt + readme[end..]);
            return;
        }

        Assert.Equal(excerpt, readme[start..end]);
    }

    [Fact]
    public void Links_in_the_readme_and_the_map_lead_somewhere()
    {
        foreach (var page in new[] { "README.md", "DEVELOPERS.md", "CHANGELOG.md" })
        {
            var text = File.ReadAllText(Path.Combine(Golden.Repository, page));
            foreach (var part in text.Split("](").Skip(1))
            {
                var target = part[..part.IndexOf(')', StringComparison.Ordinal)];
                var full = Path.Combine(Golden.Repository, target);
                Assert.True(File.Exists(full) || Directory.Exists(full), $"{page}: {target}");
            }
        }
    }

    private static string Between(string text, string from, string to)
    {
        var start = text.IndexOf(from, StringComparison.Ordinal);
        var end = text.IndexOf(to, start + from.Length, StringComparison.Ordinal);
        return text[start..end];
    }

    private static string Quoted(string text) =>
        string.Concat(text.Trim('\n').Split('\n').Select(l => l.Length == 0 ? ">\n" : $"> {l}\n"));
}
