using Bittern.Calculation;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>In which order and at which dose each solid first saturates.</summary>
internal static class OnsetSection
{
    public static void Write(MarkdownWriter writer, Outcome outcome)
    {
        var trains = outcome
            .Trains.Where(t => t.Stages.Any(s => !s.Onsets.IsEmpty || !s.DoseCurves.IsEmpty))
            .ToArray();
        if (trains.Length == 0)
        {
            return;
        }

        writer.Heading(2, "Onset ladder");
        writer.Paragraph(
            "The order in which solids that may form first saturate while the stage's reagent is dosed. Doses are per m3 entering the stage, of the product as delivered."
        );
        foreach (var train in trains)
        {
            if (trains.Length > 1)
            {
                writer.Heading(3, "Onsets in " + MarkdownText.Escape(train.Train.Name));
            }

            foreach (var stage in train.Stages)
            {
                foreach (var figure in ReportFigures.OfStage(outcome, train, stage))
                {
                    writer.Paragraph(
                        "!["
                            + MarkdownText.Escape(figure.Caption)
                            + "]("
                            + ReportFigures.Folder
                            + "/"
                            + figure.Name
                            + ")"
                    );
                }
            }

            var table = new MarkdownTable(
                "Stage",
                MarkdownTable.Number("Step"),
                "Solid",
                "Reagent",
                MarkdownTable.Number("Dose"),
                MarkdownTable.Number("pH")
            );
            foreach (var stage in train.Stages)
            {
                var step = 0;
                foreach (var onset in stage.Onsets)
                {
                    step += onset.DosePerStageVolume == 0 ? 0 : 1;
                    table.Row(
                        MarkdownText.Escape(stage.Stage.Name),
                        Digits.AsTyped(step),
                        MarkdownText.Escape(onset.Solid.Name),
                        DoseText.Name(onset.Reagent),
                        onset.DosePerStageVolume == 0
                            ? "before any dose"
                            : DoseText.PerStageVolume(onset.Reagent, onset.DosePerStageVolume),
                        Digits.PH(onset.PH)
                    );
                }
            }

            writer.Table(table);
        }
    }
}
