using System.Globalization;
using Bittern.Reports.Tests.Samples;
using Xunit;

namespace Bittern.Reports.Tests;

public sealed class MarkdownReportTests
{
    [Theory]
    [InlineData("de-DE")]
    [InlineData("tr-TR")]
    [InlineData("fa-IR")]
    public void Report_is_byte_identical_under_any_culture(string culture)
    {
        var recipe = SampleRecipes.Adit();
        var before = CultureInfo.CurrentCulture;
        var expected = Render();
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
            CultureInfo.CurrentUICulture = CultureInfo.GetCultureInfo(culture);
            Assert.Equal(expected, Render());
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
            CultureInfo.CurrentUICulture = before;
        }

        (string, string) Render()
        {
            var markdown = MarkdownReport.Render(SampleRecipes.Run(recipe), SampleRecipes.Stamp);
            return (markdown, HtmlReport.Render(markdown, recipe.Header.Title));
        }
    }
}
