using Bittern.Calculation;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>The numbers that prove each answer is an equilibrium, and the hashes of what it was made from.</summary>
internal static class CertificateSection
{
    public static void Write(MarkdownWriter writer, Outcome outcome, ReportStamp stamp)
    {
        writer.Heading(2, "Certificate");
        writer.Paragraph(
            "Each state was checked against its own equations by code apart from the solver: the worst balance of a component and the charge relative to gross amounts "
                + "(accepted to 1e-10), the largest Q/K - 1 of a solid that may form and the largest |ln Q/K| of a solid that is present (to 1e-9), and the largest change of "
                + "a logarithmic activity on fresh evaluation (to 1e-9). Residuals are given as the power of ten that they stay below."
        );
        var table = new MarkdownTable(
            "State",
            MarkdownTable.Number("Balance"),
            "Worst component",
            MarkdownTable.Number("Charge"),
            MarkdownTable.Number("Worst Q/K - 1"),
            "Of solid",
            MarkdownTable.Number("Present solids"),
            MarkdownTable.Number("Activity"),
            MarkdownTable.Number("Iterations"),
            "Accepted"
        );
        foreach (var (name, state) in States(outcome))
        {
            var c = state.Certificate;
            table.Row(
                name,
                Digits.Residual(c.WorstBalance),
                Of(c.WorstBalance, c.WorstBalanceOf),
                Digits.Residual(c.ChargeResidual),
                c.WorstSaturationOf is null ? "none"
                    : c.WorstSaturation < -Digits.RelativeNoise
                        ? Digits.Significant(c.WorstSaturation, 2)
                    : Digits.Residual(c.WorstSaturation),
                c.WorstSaturationOf is null
                    ? "none may form"
                    : Of(c.WorstSaturation, c.WorstSaturationOf),
                Digits.Residual(c.WorstComplementarity),
                Digits.Residual(c.ActivityResidual),
                Digits.AsTyped(c.Iterations),
                c.Accepted ? "yes" : "**NO**"
            );
        }

        writer.Table(table);
        writer.Bullets(
            outcome
                .Trains.Where(t => t.Failure is null && !double.IsNaN(t.WorstPlantImbalance))
                .Select(t =>
                    "Everything that entered '"
                    + MarkdownText.Escape(t.Train.Name)
                    + "' against everything that left it: worst relative imbalance "
                    + Digits.Residual(t.WorstPlantImbalance)
                    + "."
                )
        );
        Hashes(writer, stamp);
    }

    // Which of many residuals of rounding noise is the largest is chance, and differs between machines.
    private static string Of(double residual, string name) =>
        Math.Abs(residual) <= Digits.ResidualFloor ? "none stands out" : MarkdownText.Escape(name);

    private static IEnumerable<(string Name, SolvedState State)> States(Outcome outcome)
    {
        foreach (var liquor in outcome.Liquors)
        {
            if (liquor.State is { } state)
            {
                yield return ("liquor " + MarkdownText.Escape(liquor.Liquor.Name), state);
            }
        }

        foreach (var train in outcome.Trains)
        {
            var prefix = MarkdownText.Escape(train.Train.Name);
            if (train.Feed is { } feed)
            {
                yield return (prefix + ", feed", feed);
            }

            foreach (var stage in train.Stages)
            {
                var name = prefix + ", " + MarkdownText.Escape(stage.Stage.Name);
                yield return (name + ", end", stage.End);
                if (!ReferenceEquals(stage.Outflow, stage.End))
                {
                    yield return (name + ", outflow", stage.Outflow);
                }
            }
        }
    }

    private static void Hashes(MarkdownWriter writer, ReportStamp stamp)
    {
        if (stamp.Inputs.IsDefaultOrEmpty)
        {
            return;
        }

        writer.Paragraph("Inputs, with the SHA-256 by which they can be recognised:");
        var table = new MarkdownTable("File", "SHA-256");
        foreach (var input in stamp.Inputs)
        {
            table.Row(MarkdownText.Escape(input.Name), "`" + input.Sha256 + "`");
        }

        writer.Table(table);
    }
}
