using System.Text.Json;
using Xunit;

namespace Bittern.Cli.Tests;

/// <summary>What people and machines look up: mistakes in three formats, codes, constants.</summary>
public sealed class LookUpTests : IDisposable
{
    private readonly CommandLine _shell = new();

    public void Dispose() => _shell.Dispose();

    [Fact]
    public void Mistakes_of_several_recipes_are_one_json_document()
    {
        var check = CommandLine.Run(
            "check",
            _shell.File("a.bittern", Samples.TwoMistakes),
            _shell.File("b.bittern", Samples.TwoMistakes),
            "--format",
            "json"
        );

        using var json = JsonDocument.Parse(check.Out);
        Assert.Equal(2, check.Code);
        Assert.Equal(4, json.RootElement.GetProperty("errors").GetInt32());
    }

    [Fact]
    public void Mistakes_as_sarif_name_the_file_as_it_was_given()
    {
        var path = _shell.File("a.bittern", Samples.TwoMistakes);
        var check = CommandLine.Run("check", path, "--format", "sarif");

        using var json = JsonDocument.Parse(check.Out);
        var results = json.RootElement.GetProperty("runs")[0].GetProperty("results");
        var uri = results[0]
            .GetProperty("locations")[0]
            .GetProperty("physicalLocation")
            .GetProperty("artifactLocation")
            .GetProperty("uri")
            .GetString();
        Assert.Equal(2, results.GetArrayLength());
        Assert.Equal(path.Replace('\\', '/'), Uri.UnescapeDataString(uri!));
    }

    [Fact]
    public void A_mistake_in_an_included_file_names_it_by_the_way_from_here()
    {
        _shell.File("sub/constants/site.bittern", "solid x Y");
        var recipe = _shell.File("sub/a.bittern", "use \"./constants/site.bittern\"");

        var check = CommandLine.Run("check", recipe);

        Assert.Contains(
            Path.Combine(_shell.Folder, "sub", "constants", "site.bittern").Replace('\\', '/')
                + ":1:",
            check.Out,
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void A_report_never_names_the_folder_of_its_recipe()
    {
        var run = CommandLine.Run("run", _shell.File("mix.bittern", Samples.Mixture));

        Assert.Equal(0, run.Code);
        foreach (
            var file in Directory.EnumerateFiles(
                Path.Combine(_shell.Folder, "mix.report"),
                "*",
                SearchOption.AllDirectories
            )
        )
        {
            Assert.DoesNotContain(
                Path.GetFileName(_shell.Folder),
                File.ReadAllText(file),
                StringComparison.Ordinal
            );
        }
    }

    [Theory]
    [InlineData("explain", "gypsum")]
    [InlineData("catalogue", "show", "gypsum")]
    [InlineData("catalogue", "show", "CaSO4*2H2O")]
    public void A_constant_is_shown_with_reaction_and_source(params string[] arguments)
    {
        var shown = CommandLine.Run(arguments);

        Assert.Equal(0, shown.Code);
        Assert.Contains("CaSO4·2H2O = Ca^2+ + SO4^2- + 2 H2O", shown.Out, StringComparison.Ordinal);
        Assert.Contains("[nordstrom1990]", shown.Out, StringComparison.Ordinal);
    }

    [Fact]
    public void A_misspelt_constant_gets_a_suggestion()
    {
        var shown = CommandLine.Run("explain", "gypsm");

        Assert.Equal(64, shown.Code);
        Assert.Contains("Did you mean 'gypsum'?", shown.Error, StringComparison.Ordinal);
    }

    [Fact]
    public void The_catalogue_lists_its_domains_and_what_is_searched()
    {
        Assert.Contains("major ", CommandLine.Run("catalogue").Out, StringComparison.Ordinal);
        var found = CommandLine.Run("catalogue", "Zn", "hydroxide").Out;
        Assert.Contains("zinc-hydroxide ", found, StringComparison.Ordinal);
        Assert.DoesNotContain("brucite", found, StringComparison.Ordinal);
    }

    [Fact]
    public void Own_constants_are_compared_with_the_catalogue()
    {
        var file = _shell.File(
            "own.bittern",
            """
            use catalogue major
            cite notebook "laboratory notebook 7"
            solid own-gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -5.1 ± 0.1 [notebook]
            """
        );

        var check = CommandLine.Run("catalogue", "check", file);

        Assert.Equal(0, check.Code);
        Assert.Contains(
            "own.bittern:3: own-gypsum: more stable by 0.5 log10 units",
            check.Out,
            StringComparison.Ordinal
        );
    }

    [Theory]
    [InlineData("check", "--format", "xml", "a.bittern")]
    [InlineData("catalogue", "check", "missing.bittern")]
    [InlineData("catalogue", "show")]
    public void A_wrong_look_up_ends_with_64(params string[] arguments) =>
        Assert.Equal(64, CommandLine.Run(arguments).Code);
}
