using System.Text.RegularExpressions;
using Bittern.Reports.Tests.Samples;
using Xunit;

namespace Bittern.Reports.Tests.Html;

public sealed partial class HtmlReportTests
{
    private static string Html { get; } =
        HtmlReport.Render(
            MarkdownReport.Render(SampleRecipes.Run(SampleRecipes.Adit()), SampleRecipes.Stamp),
            "Adit & more"
        );

    [Fact]
    public void Page_names_its_language_title_and_landmarks()
    {
        Assert.StartsWith("<!DOCTYPE html>\n<html lang=\"en\">", Html, StringComparison.Ordinal);
        Assert.Contains("<title>Adit &amp; more</title>", Html, StringComparison.Ordinal);
        Assert.Contains("<main id=\"_report\">", Html, StringComparison.Ordinal);
        Assert.Contains(
            "<nav class=\"contents\" aria-label=\"Contents\">",
            Html,
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void Page_needs_nothing_from_elsewhere()
    {
        Assert.DoesNotContain("<script", Html, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain("<link", Html, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain(" src=", Html, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain("url(", Html, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain("@import", Html, StringComparison.OrdinalIgnoreCase);
    }

    [Fact]
    public void Every_header_cell_has_a_scope()
    {
        Assert.All(
            HeaderCell().Matches(Html),
            m => Assert.Contains("scope=", m.Value, StringComparison.Ordinal)
        );
        Assert.NotEmpty(HeaderCell().Matches(Html));
    }

    [Fact]
    public void Every_entry_of_the_contents_leads_somewhere_and_ids_are_unique()
    {
        var ids = Id().Matches(Html).Select(m => m.Groups[1].Value).ToArray();
        Assert.Equal(ids.Length, ids.Distinct(StringComparer.Ordinal).Count());
        var targets = Target().Matches(Html).Select(m => m.Groups[1].Value).ToArray();
        Assert.True(targets.Length > 10);
        Assert.All(targets, t => Assert.Contains(t, ids, StringComparer.Ordinal));
    }

    [Fact]
    public void Verdicts_carry_a_class_beside_their_word()
    {
        Assert.Contains("<td class=\"verdict fail\">FAIL</td>", Html, StringComparison.Ordinal);
        Assert.Contains("<td class=\"verdict pass\">PASS</td>", Html, StringComparison.Ordinal);
        Assert.Contains(
            "<td class=\"verdict open\">UNDECIDED</td>",
            Html,
            StringComparison.Ordinal
        );
    }

    [Theory]
    [InlineData("<script>alert(1)</script>")]
    [InlineData("text <img src=x onerror=alert(1)> text")]
    [InlineData("<iframe src=\"https://example.org\"></iframe>")]
    [InlineData("[x](javascript:alert(1))")]
    [InlineData("[x](  JaVaScRiPt:alert(1) )")]
    [InlineData("[x](java&#115;cript:alert(1))")]
    [InlineData("[x](data:text/html;base64,PHNjcmlwdD4=)")]
    [InlineData("[x](vbscript:msgbox)")]
    [InlineData("[x][r]\n\n[r]: javascript:alert(1)")]
    [InlineData("<javascript:alert(1)>")]
    [InlineData("![x](https://example.org/pixel.png)")]
    [InlineData("![x](file:///etc/passwd)")]
    [InlineData("![x][r]\n\n[r]: https://example.org/pixel.png")]
    public void Text_of_a_recipe_can_neither_run_nor_fetch_anything(string text)
    {
        var html = HtmlReport.Render("# t\n\n" + text + "\n", "t");
        var body = html[html.IndexOf("<main", StringComparison.Ordinal)..];
        Assert.DoesNotContain("<script", body, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain("<img", body, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain("<iframe", body, StringComparison.OrdinalIgnoreCase);
        foreach (Match href in Href().Matches(body))
        {
            Assert.Matches("^(https?:|mailto:|#)", href.Groups[1].Value);
        }
    }

    [GeneratedRegex("<th[ >][^>]*")]
    private static partial Regex HeaderCell();

    [GeneratedRegex(" id=\"([^\"]*)\"")]
    private static partial Regex Id();

    [GeneratedRegex("href=\"#([^\"]*)\"")]
    private static partial Regex Target();

    [GeneratedRegex("href=\"([^\"]*)\"")]
    private static partial Regex Href();
}
