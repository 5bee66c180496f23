using System.Globalization;
using System.Net;
using Bittern.Reports.Tests.Samples;
using Bittern.Reports.Writing;
using Xunit;

namespace Bittern.Reports.Tests.Writing;

public sealed class MarkdownTests
{
    [Theory]
    [InlineData("Smith & Sons | *Client* _x_")]
    [InlineData("a <b>bold</b> <script>alert(1)</script>")]
    [InlineData("&lt; &amp; &#60;")]
    [InlineData("[link](javascript:alert(1)) ![i](http://x/y.png)")]
    [InlineData("back\\slash \\| `code` ~~gone~~ $x^2$")]
    [InlineData("# no heading")]
    [InlineData("< 0.01 mg/L")]
    public void Text_of_a_recipe_comes_out_as_it_went_in(string text)
    {
        var table = new MarkdownTable("A", "B");
        table.Row(MarkdownText.Escape(text), "end");
        var html = HtmlReport.Render("# t\n\n## s\n\n" + table, "t");
        Assert.Contains(
            "<th scope=\"row\">"
                + WebUtility.HtmlEncode(text).Replace("&#39;", "'", StringComparison.Ordinal)
                + "</th>",
            html,
            StringComparison.Ordinal
        );
    }

    [Fact]
    public void Tables_line_up_in_the_source()
    {
        var markdown = MarkdownReport.Render(
            SampleRecipes.Run(SampleRecipes.Adit()),
            SampleRecipes.Stamp
        );
        int? width = null;
        foreach (var line in markdown.Split('\n'))
        {
            if (!line.StartsWith('|'))
            {
                width = null;
                continue;
            }

            var own = new StringInfo(line).LengthInTextElements;
            Assert.Equal(width ?? own, own);
            width = own;
        }
    }

    [Fact]
    public void Lines_end_with_a_line_feed_and_without_blanks()
    {
        var markdown = MarkdownReport.Render(
            SampleRecipes.Run(SampleRecipes.Adit()),
            SampleRecipes.Stamp
        );
        Assert.DoesNotContain('\r', markdown);
        Assert.DoesNotContain('\t', markdown);
        Assert.DoesNotContain(" \n", markdown, StringComparison.Ordinal);
        Assert.DoesNotContain("\n\n\n", markdown, StringComparison.Ordinal);
        Assert.EndsWith("|\n", markdown, StringComparison.Ordinal);
    }
}
