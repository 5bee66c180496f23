using System.Text;
using Bittern.Catalogue;
using Xunit;

namespace Bittern.Catalogue.Tests;

/// <summary>The pages under docs/catalogue. <c>BITTERN_ACCEPT=1</c> rewrites them; the review is <c>git diff</c>.</summary>
public sealed class Pages
{
    public static TheoryData<string> Domains => [.. ShippedCatalogue.Names];

    [Theory]
    [MemberData(nameof(Domains))]
    public void A_domain_s_page_is_up_to_date(string domain)
    {
        var path = Path.Combine(Root(), "docs", "catalogue", domain + ".md");
        var page = CataloguePage.Render(Shipped.Index, domain);
        if (Environment.GetEnvironmentVariable("BITTERN_ACCEPT") is "1")
        {
            Directory.CreateDirectory(Path.GetDirectoryName(path)!);
            File.WriteAllText(path, page, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false));
        }

        Assert.True(
            File.Exists(path),
            $"docs/catalogue/{domain}.md is missing: run with BITTERN_ACCEPT=1"
        );
        Assert.Equal(page, File.ReadAllText(path));
    }

    [Fact]
    public void The_overview_links_every_page()
    {
        var overview = File.ReadAllText(Path.Combine(Root(), "docs", "catalogue", "README.md"));
        Assert.All(
            ShippedCatalogue.Names,
            n => Assert.Contains($"({n}.md)", overview, StringComparison.Ordinal)
        );
    }

    private static string Root()
    {
        var at = AppContext.BaseDirectory;
        while (!File.Exists(Path.Combine(at, "Bittern.slnx")))
        {
            at =
                Path.GetDirectoryName(at)
                ?? throw new InvalidOperationException(
                    "the tests do not run inside the repository"
                );
        }

        return at;
    }
}
