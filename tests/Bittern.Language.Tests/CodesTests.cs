using System.Text;
using System.Text.RegularExpressions;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Rendering;
using Xunit;

namespace Bittern.Language.Tests;

/// <summary>
/// Every code has an example that triggers it and one that does not, a page made of the same texts, and its smallest recipe with the whole output
/// in the repository.
/// </summary>
public sealed class CodesTests
{
    /// <summary>Codes that reading a recipe finds.</summary>
    public static TheoryData<string> Read =>
        [.. DiagnosticCatalogue.All.Where(c => !c.NeedsRun).Select(c => c.Id)];

    public static TheoryData<string> All => [.. DiagnosticCatalogue.All.Select(c => c.Id)];

    [Theory]
    [MemberData(nameof(Read))]
    public void The_wrong_example_triggers_its_code_and_no_other_error(string id)
    {
        var found = Check.Read(DiagnosticCatalogue.Find(id)!.Wrong).Diagnostics;

        Assert.Contains(found, d => d.Code == id);
        Assert.DoesNotContain(found, d => d.Severity == Severity.Error && d.Code != id);
    }

    [Theory]
    [MemberData(nameof(All))]
    public void The_right_example_has_no_error_and_not_this_code(string id)
    {
        var found = Check.Read(DiagnosticCatalogue.Find(id)!.Right);

        Assert.DoesNotContain(found.Diagnostics, d => d.Severity == Severity.Error || d.Code == id);
    }

    [Theory]
    [MemberData(nameof(Read))]
    public void The_smallest_recipe_gives_the_committed_text(string id)
    {
        var recipe = DiagnosticCatalogue.Find(id)!.Wrong.ReplaceLineEndings("\n") + "\n";
        Repository.Holds($"tests/mistakes/{id}/recipe.bittern", recipe);

        Repository.Holds(
            $"tests/mistakes/{id}/expected.txt",
            TextRenderer.Render(Check.Read(recipe).Diagnostics)
        );
    }

    [Theory]
    [MemberData(nameof(All))]
    public void The_page_is_made_of_the_code(string id) =>
        Repository.Holds(
            $"docs/diagnostics/{id}.md",
            CodePage.Render(DiagnosticCatalogue.Find(id)!)
        );

    [Fact]
    public void The_index_lists_every_code() =>
        Repository.Holds("docs/diagnostics/README.md", CodePage.Index());

    [Fact]
    public void The_catalogue_holds_every_code_once_and_in_order()
    {
        var declared = typeof(DiagnosticCatalogue)
            .Assembly.GetTypes()
            .Where(t => t.Namespace is "Bittern.Diagnostics.Codes" && t.IsPublic)
            .Select(t => (DiagnosticDescriptor)t.GetProperty("Descriptor")!.GetValue(null)!)
            .ToList();
        Assert.Equal(declared.OrderBy(d => d.Id, StringComparer.Ordinal), DiagnosticCatalogue.All);
        Assert.Distinct(declared.Select(d => d.Id), StringComparer.Ordinal);
        Assert.All(
            declared,
            d =>
                Assert.Matches(
                    new Regex("^BT[0-9]{4}$", RegexOptions.None, TimeSpan.FromSeconds(1)),
                    d.Id
                )
        );
    }

    [Fact]
    public void Titles_and_reasons_are_written_in_one_style()
    {
        Assert.All(
            DiagnosticCatalogue.All,
            d =>
            {
                Assert.False(d.Title.EndsWith('.') || d.Why.EndsWith('.'), d.Id);
                Assert.True(
                    d.Explanation.TrimEnd().EndsWith('.') || d.Explanation.TrimEnd().EndsWith('`'),
                    d.Id
                );
                Assert.False(d.Explanation.Contains("\n\n", StringComparison.Ordinal), d.Id);
            }
        );
    }

    [Fact]
    public void No_folder_is_left_of_a_code_that_is_gone()
    {
        var folders = Directory
            .EnumerateDirectories(Path.Combine(Repository.Root, "tests", "mistakes"))
            .Select(Path.GetFileName);
        Assert.All(folders, f => Assert.NotNull(DiagnosticCatalogue.Find(f!)));
    }
}
