using System.Globalization;
using Xunit;

namespace Bittern.Cli.Tests;

/// <summary>Every recipe of the repository gives its committed report, byte for byte, under any culture and at every run.</summary>
public sealed class RecipeGoldenTests : IDisposable
{
    private readonly string _scratch = Directory.CreateTempSubdirectory("bittern-golden-").FullName;
    private readonly CultureInfo _culture = CultureInfo.CurrentCulture;

    public void Dispose()
    {
        CultureInfo.CurrentCulture = _culture;
        Directory.Delete(_scratch, recursive: true);
    }

    /// <summary>Recipes with the exit code that they end with.</summary>
    public static TheoryData<string, int> Recipes =>
        new()
        {
            { "gypsum-mix", ExitCode.Done },
            { "adit-lime-treatment", ExitCode.Done },
            { "magnesium-hydroxide-recovery", ExitCode.Done },
        };

    [Theory]
    [MemberData(nameof(Recipes))]
    public void A_recipe_gives_its_committed_report(string name, int exitCode)
    {
        var written = Run(name, exitCode, "a");
        Golden.Compare(Path.Combine(Golden.Repository, "recipes", name, name + ".report"), written);
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("tr-TR")]
    [InlineData("ar-SA")]
    public void A_report_does_not_depend_on_the_culture(string culture)
    {
        CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
        var written = Run("adit-lime-treatment", ExitCode.Done, "b");
        CultureInfo.CurrentCulture = _culture;
        if (!Golden.Accepting)
        {
            Golden.Compare(
                Path.Combine(
                    Golden.Repository,
                    "recipes",
                    "adit-lime-treatment",
                    "adit-lime-treatment.report"
                ),
                written
            );
        }
    }

    [Fact]
    public void Every_recipe_of_the_repository_is_tested()
    {
        var folders = Directory
            .EnumerateDirectories(Path.Combine(Golden.Repository, "recipes"))
            .Where(d => Directory.EnumerateFiles(d, "*.bittern").Any())
            .Select(d => Path.GetFileName(d)!)
            .Order(StringComparer.Ordinal);

        Assert.Equal(folders, Recipes.Select(r => r.Data.Item1).Order(StringComparer.Ordinal));
    }

    private string Run(string name, int exitCode, string into)
    {
        var folder = Path.Combine(_scratch, into);
        using var output = new StringWriter(CultureInfo.InvariantCulture);
        using var error = new StringWriter(CultureInfo.InvariantCulture);
        var code = Program.Run(
            [
                "run",
                Path.Combine(Golden.Repository, "recipes", name, name + ".bittern"),
                "--out",
                folder,
            ],
            new Terminal(output, error)
        );
        Assert.True(code == exitCode, $"exit {code}\n{output}\n{error}");
        return folder;
    }
}
