using Bittern.Catalogue;
using Bittern.Diagnostics;
using Bittern.Language;
using Xunit;

namespace Bittern.Calculation.Tests;

/// <summary>Codes that only a calculation finds: their examples do what their pages say.</summary>
public sealed class CodesTests
{
    public static TheoryData<string> FoundByRunning =>
        [.. DiagnosticCatalogue.All.Where(c => c.NeedsRun).Select(c => c.Id)];

    [Theory]
    [MemberData(nameof(FoundByRunning))]
    public void The_wrong_example_gives_the_code(string id) =>
        Assert.Contains(Run(DiagnosticCatalogue.Find(id)!.Wrong), d => d.Code == id);

    [Theory]
    [MemberData(nameof(FoundByRunning))]
    public void The_right_example_does_not(string id) =>
        Assert.DoesNotContain(Run(DiagnosticCatalogue.Find(id)!.Right), d => d.Code == id);

    private static IEnumerable<Diagnostic> Run(string text)
    {
        var read = RecipeReader.Read(new SourceText("example.bittern", text), new Files());
        Assert.True(
            read.Recipe is not null,
            string.Join('\n', read.Diagnostics.Select(d => $"{d.Code} {d.What} ({d.Span})"))
        );
        return RecipeRun.Execute(read.Recipe!, TestContext.Current.CancellationToken).Diagnostics;
    }

    private sealed class Files : IRecipeFiles
    {
        public IEnumerable<string> CatalogueNames => ShippedCatalogue.Names;

        public SourceText? Catalogue(string name) => ShippedCatalogue.Open(name);

        public SourceText? Include(string path, out string? fault)
        {
            fault = "there is no such file";
            return null;
        }
    }
}
