using System.Text.RegularExpressions;
using Bittern.Catalogue;
using Bittern.Diagnostics;
using Xunit;

namespace Bittern.Language.Tests;

/// <summary>Every code has an example that triggers it and one that does not; the page that users read is made of the same texts.</summary>
public sealed class CodesTests
{
    public static TheoryData<string> Triggered =>
        [.. DiagnosticCodes.All.Where(c => c.Wrong.Length > 0).Select(c => c.Id)];

    [Theory]
    [MemberData(nameof(Triggered))]
    public void The_wrong_example_triggers_its_code(string id)
    {
        var found = Read(DiagnosticCodes.Find(id)!.Wrong);

        Assert.Contains(
            found.Diagnostics,
            d => string.Equals(d.Code, id, StringComparison.Ordinal)
        );
    }

    [Theory]
    [MemberData(nameof(Triggered))]
    public void The_right_example_has_no_error_at_all(string id)
    {
        var found = Read(DiagnosticCodes.Find(id)!.Right);

        Assert.DoesNotContain(
            found.Diagnostics,
            d => d.Severity == Severity.Error || string.Equals(d.Code, id, StringComparison.Ordinal)
        );
    }

    [Fact]
    public void Codes_are_unique_and_well_formed()
    {
        Assert.All(
            DiagnosticCodes.All,
            c =>
                Assert.Matches(
                    new Regex("^BT[0-9]{4}$", RegexOptions.None, TimeSpan.FromSeconds(1)),
                    c.Id
                )
        );
        Assert.Distinct(DiagnosticCodes.All.Select(c => c.Id), StringComparer.Ordinal);
    }

    private static ReadResult Read(string text) =>
        RecipeReader.Read(new SourceText("test.bittern", text), new CatalogueOnly());

    private sealed class CatalogueOnly : IRecipeFiles
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
