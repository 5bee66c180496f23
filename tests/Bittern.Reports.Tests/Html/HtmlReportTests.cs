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
    [InlineData("SO4^2- and Ca^2+", "SO<sub>4</sub><sup>2−</sup> and Ca<sup>2+</sup>")]
    [InlineData("2 Na+ + SO4^2-", "2 Na<sup>+</sup> + SO<sub>4</sub><sup>2−</sup>")]
    [InlineData("CaSO4·2H2O, CO2(aq)", "CaSO<sub>4</sub>·2H<sub>2</sub>O, CO<sub>2</sub>(aq)")]
    [InlineData("Fe(OH)2+ 58 %", "Fe(OH)<sub>2</sub><sup>+</sup> 58 %")]
    [InlineData("Al2(OH)2^4+", "Al<sub>2</sub>(OH)<sub>2</sub><sup>4+</sup>")]
    [InlineData(
        "Fe8O8(OH)4.8(SO4)1.6",
        "Fe<sub>8</sub>O<sub>8</sub>(OH)<sub>4.8</sub>(SO<sub>4</sub>)<sub>1.6</sub>"
    )]
    [InlineData("dissolved(SO4) <= 5", "dissolved(SO<sub>4</sub>) &lt;= 5")]
    [InlineData(
        "In- and outflow, revision B2, EX-0417, Fe(II), pH, No-",
        "In- and outflow, revision B2, EX-0417, Fe(II), pH, No-"
    )]
    [InlineData("`SO4^2-`", "<code>SO4^2-</code>")]
    public void Formulas_are_typeset_and_words_are_not(string markdown, string html) =>
        Assert.Contains(
            "<p>" + html + "</p>",
            HtmlReport.Render(markdown, "t"),
            StringComparison.Ordinal
        );

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
