using System.Globalization;
using System.Text.RegularExpressions;
using System.Xml.Linq;
using Bittern.Calculation;
using Bittern.Reports.Figures;
using Bittern.Reports.Tests.Samples;
using Xunit;

namespace Bittern.Reports.Tests.Figures;

public sealed partial class FigureTests
{
    private static readonly Outcome Adit = SampleRecipes.Run(SampleRecipes.Adit());

    [Fact]
    public void Every_stage_that_doses_has_a_figure_that_the_report_shows()
    {
        var figures = ReportFigures.Render(Adit);
        Assert.Equal(
            ["treatment-primary.svg", "treatment-secondary.svg"],
            figures.Select(f => f.Name),
            StringComparer.Ordinal
        );
        var markdown = MarkdownReport.Render(Adit, SampleRecipes.Stamp);
        var html = HtmlReport.Render(markdown, "t", figures);
        Assert.All(
            figures,
            f => Assert.Contains("](figures/" + f.Name + ")", markdown, StringComparison.Ordinal)
        );
        Assert.Equal(2, html.Split("<svg ").Length - 1);
        Assert.DoesNotContain("<img", html, StringComparison.Ordinal);
    }

    [Fact]
    public void A_figure_is_well_formed_has_text_as_text_and_nothing_that_could_collide_or_run()
    {
        foreach (var figure in ReportFigures.Render(Adit))
        {
            var root = XDocument.Parse(figure.Svg).Root!;
            Assert.Equal("svg", root.Name.LocalName);
            Assert.Equal("img", root.Attribute("role")!.Value);
            Assert.NotEmpty(root.Elements().Single(e => e.Name.LocalName is "title").Value);
            Assert.NotEmpty(root.Elements().Single(e => e.Name.LocalName is "desc").Value);
            Assert.Contains(
                root.Descendants(),
                e => e.Name.LocalName is "text" && e.Value is "Dissolved (mg/L)"
            );
            Assert.Contains(root.Descendants(), e => e.Name.LocalName is "text" && e.Value is "Zn");
            Assert.All(
                root.Descendants(),
                e => Assert.Contains(e.Name.LocalName, Allowed, StringComparer.Ordinal)
            );
            Assert.All(
                root.DescendantsAndSelf().Attributes(),
                a =>
                    Assert.False(
                        a.Name.LocalName is "id" or "class" or "style" or "href"
                            || a.Name.LocalName.StartsWith("on", StringComparison.Ordinal),
                        a.ToString()
                    )
            );
            Assert.DoesNotContain("NaN", figure.Svg, StringComparison.Ordinal);
            Assert.DoesNotContain("-0 ", figure.Svg, StringComparison.Ordinal);
        }
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("fa-IR")]
    public void A_figure_does_not_know_the_culture(string culture)
    {
        var before = CultureInfo.CurrentCulture;
        var expected = string.Concat(ReportFigures.Render(Adit).Select(f => f.Svg));
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
            Assert.Equal(expected, string.Concat(ReportFigures.Render(Adit).Select(f => f.Svg)));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void Names_beside_curves_never_overlap()
    {
        var random = new Random(11);
        for (var round = 0; round < 200; round++)
        {
            var canvas = new SvgCanvas(200, 240);
            var labels = Enumerable
                .Range(0, random.Next(1, 9))
                .Select(i => (random.NextDouble() * 220, "c" + i, "#000000"));
            EndLabels.Draw(canvas, labels, 100, 12, 220);
            var places = TextPlace()
                .Matches(canvas.Document("t", "d"))
                .Select(m => double.Parse(m.Groups[1].Value, CultureInfo.InvariantCulture))
                .Order()
                .ToArray();
            Assert.All(places, p => Assert.InRange(p, 11.9, 220.1));
            Assert.All(
                places.Zip(places.Skip(1)),
                p => Assert.True(p.Second - p.First >= 13.8, $"{p.First} and {p.Second}")
            );
        }
    }

    [Theory]
    [InlineData(0, 14.25)]
    [InlineData(0, 1.2)]
    [InlineData(0, 9e-5)]
    [InlineData(2, 13)]
    [InlineData(0, 7e6)]
    public void Linear_axes_have_three_to_ten_ticks_at_round_values(double low, double high)
    {
        foreach (var endOnTick in new[] { true, false })
        {
            var scale = Scale.Linear(low, high, 0, 100, endOnTick);
            Assert.InRange(scale.Ticks.Length, 3, 10);
            Assert.All(scale.Ticks, t => Assert.InRange(scale.At(t), -1e-9, 100 + 1e-9));
            Assert.All(scale.Ticks, t => Assert.True(Scale.Label(t).Length <= 7, Scale.Label(t)));
            Assert.True(scale.At(high) <= 100 + 1e-9);
        }
    }

    private static readonly string[] Allowed = ["title", "desc", "rect", "path", "circle", "text"];

    [GeneratedRegex("<text x=\"[0-9.]+\" y=\"([0-9.]+)\"")]
    private static partial Regex TextPlace();
}
