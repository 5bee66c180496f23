using System.Collections.Immutable;
using System.Text;
using Bittern.Calculation;
using Bittern.Reports.Figures;

namespace Bittern.Reports;

/// <summary>The figures of a report, one for every dose curve.</summary>
public static class ReportFigures
{
    /// <summary>Folder that the Markdown refers to, beside the report.</summary>
    public const string Folder = "figures";

    /// <summary>All figures in the order of trains, stages and doses. Pure; the same outcome gives the same bytes.</summary>
    public static ImmutableArray<Figure> Render(Outcome outcome) =>
        [.. outcome.Trains.SelectMany(t => t.Stages.SelectMany(s => OfStage(outcome, t, s)))];

    /// <summary>Figures of one stage.</summary>
    internal static IEnumerable<Figure> OfStage(
        Outcome outcome,
        TrainResult train,
        StageResult stage
    )
    {
        for (var i = 0; i < stage.DoseCurves.Length; i++)
        {
            var name = NameOf(train, stage, i) + ".svg";
            if (
                DoseCurveFigure.Draw(name, train, stage, stage.DoseCurves[i], outcome) is { } figure
            )
            {
                yield return figure;
            }
        }
    }

    /// <summary>Name of the figure of a stage's dose curve, without extension; its table has the same.</summary>
    internal static string NameOf(TrainResult train, StageResult stage, int index) =>
        Slug(train.Train.Name)
        + "-"
        + Slug(stage.Stage.Name)
        + (stage.DoseCurves.Length > 1 ? "-" + (char)('a' + (index % 26)) : "");

    // File names of lower-case ASCII letters, digits and hyphens are safe on every file system and in every link.
    private static string Slug(string name)
    {
        var slug = new StringBuilder();
        foreach (var c in name)
        {
            slug.Append(char.IsAsciiLetterOrDigit(c) ? char.ToLowerInvariant(c) : '-');
        }

        return slug.ToString();
    }
}
