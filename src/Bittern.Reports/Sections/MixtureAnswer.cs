using Bittern.Calculation;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>The plain question: these solutions mixed, does it precipitate, and how much?</summary>
internal static class MixtureAnswer
{
    public static void Write(MarkdownWriter writer, TrainResult train)
    {
        if (train.Failure is not null || train.Stages.IsEmpty)
        {
            return;
        }

        var stage = train.Stages[^1];
        var formed = stage
            .Formed.Where(f => f.MassPerFeed > 0)
            .OrderByDescending(f => f.MassPerFeed)
            .ThenBy(f => f.Solid.Name, StringComparer.Ordinal)
            .ToArray();
        var first = train.Train.Feed.CubicMetres ?? 1;
        var volume =
            first
            * (1 + stage.Stage.Actions.OfType<StageAction.Blend>().Sum(b => b.VolumesPerVolume));
        writer.Paragraph(formed.Length > 0 ? Yes(formed, first, volume) : No(stage));
        writer.Paragraph(
            "The mixture has pH "
                + Digits.PH(stage.End.PH)
                + " and an ionic strength of "
                + Digits.Significant(stage.End.IonicStrength)
                + " mol/kg at "
                + Digits.AsTyped(Math.Round(stage.End.TemperatureCelsius, 2))
                + " °C."
        );
        var held = stage
            .Saturations.Where(s =>
                s.Role is SaturationRole.HeldBack or SaturationRole.NotListed && s.Index > 1e-6
            )
            .ToArray();
        if (held.Length > 0)
        {
            writer.Paragraph(
                "Not counted, although supersaturated: "
                    + string.Join(
                        ", ",
                        held.Select(s =>
                            MarkdownText.Escape(s.Solid.Name)
                            + " (Q/K = "
                            + SaturationArithmetic.Ratio(s.Index)
                            + (
                                s.HeldBackBecause is { } because
                                    ? ", " + MarkdownText.Escape(because)
                                    : ""
                            )
                            + ")"
                        )
                    )
                    + "."
            );
        }
    }

    private static string Yes(SolidAmount[] formed, double first, double volume) =>
        "**Yes: "
        + string.Join(" and ", formed.Select(f => MarkdownText.Escape(f.Solid.Name)))
        + (formed.Length == 1 ? " precipitates, " : " precipitate, ")
        + string.Join(" and ", formed.Select(f => Mass(f.MassPerFeed * first)))
        + " from "
        + Volume(volume)
        + ".** That is "
        + string.Join(
            " and ",
            formed.Select(f =>
                Digits.Amount(f.MolesPerFeed * first * 1000)
                + " mmol of "
                + MarkdownText.Escape(f.Solid.Formula.Text)
            )
        )
        + ".";

    private static string No(StageResult stage)
    {
        var nearest = stage
            .Saturations.Where(s => s.Role is SaturationRole.Allowed or SaturationRole.Present)
            .MaxBy(s => s.Index);
        return "**No: nothing precipitates"
            + (
                nearest is null
                    ? ".** No solid in the constants in use can be made from what is mixed."
                    : "; nearest is "
                        + MarkdownText.Escape(nearest.Solid.Name)
                        + " at Q/K = "
                        + SaturationArithmetic.Ratio(nearest.Index)
                        + " (SI "
                        + Digits.Index(nearest.Index)
                        + ").**"
            );
    }

    private static string Mass(double kilograms)
    {
        var (unit, size) = Throughput.MassUnit([kilograms]);
        return kilograms < 1e-4
            ? Digits.Significant(kilograms * 1e6) + " mg"
            : Digits.Significant(kilograms / size) + " " + unit;
    }

    private static string Volume(double cubicMetres)
    {
        var (unit, size) = cubicMetres < 1e-3 ? ("mL", 1e-6) : Throughput.VolumeUnit([cubicMetres]);
        return Digits.AsTyped(Math.Round(cubicMetres / size, 6)) + " " + unit;
    }
}
