using Bittern.Calculation;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>What the reader came for: limits, doses, sludge, and what to do about it.</summary>
internal static class AnswerSection
{
    public static void Write(MarkdownWriter writer, Outcome outcome)
    {
        writer.Heading(2, "Answer");
        Verdict(writer, outcome);
        Limits(writer, outcome);
        foreach (var train in outcome.Trains)
        {
            if (train.Train.IsMixture)
            {
                MixtureAnswer.Write(writer, train);
            }
            else
            {
                WriteTrain(writer, train, outcome.Trains.Length > 1);
            }
        }

        writer.Bullets(Advice.Of(outcome));
    }

    private static void Verdict(MarkdownWriter writer, Outcome outcome)
    {
        foreach (var liquor in outcome.Liquors.Where(l => l.Failure is not null))
        {
            writer.Paragraph(
                "**No certified answer for liquor '"
                    + MarkdownText.Escape(liquor.Liquor.Name)
                    + "'.** "
                    + MarkdownText.Sentence(MarkdownText.Escape(liquor.Failure!))
                    + " No number of it must be used."
            );
        }

        foreach (var train in outcome.Trains.Where(t => t.Failure is not null))
        {
            writer.Paragraph(
                "**No certified answer for '"
                    + MarkdownText.Escape(train.Train.Name)
                    + "' from stage '"
                    + MarkdownText.Escape(train.Failure!.Stage)
                    + "' on.** "
                    + MarkdownText.Sentence(MarkdownText.Escape(train.Failure.Reason))
                    + " Limits of that train are not judged."
            );
        }

        var results = outcome.LimitSets.SelectMany(s => s.Results).ToArray();
        if (results.Length == 0)
        {
            return;
        }

        var failed = results.Count(r => r.Verdict == Calculation.Verdict.Failed);
        var undecided = results.Count(r => r.Verdict == Calculation.Verdict.Undecided);
        var unjudged = results.Count(r => r.Verdict == Calculation.Verdict.NotJudged);
        if (failed + undecided + unjudged == 0)
        {
            writer.Paragraph(
                results.Length == 1
                    ? "**The limit is met.**"
                    : $"**All {results.Length} limits are met.**"
            );
            return;
        }

        var parts = new List<string>();
        Add(failed, "failed");
        Add(undecided, "undecided");
        Add(unjudged, "not judged");
        writer.Paragraph(
            $"**Of {results.Length} {(results.Length == 1 ? "limit" : "limits")}: {string.Join(", ", parts)}.**"
        );

        void Add(int count, string what)
        {
            if (count > 0)
            {
                parts.Add($"{count} {what}");
            }
        }
    }

    private static void Limits(MarkdownWriter writer, Outcome outcome)
    {
        foreach (var set in outcome.LimitSets)
        {
            writer.Paragraph(
                "Limits \""
                    + MarkdownText.Escape(set.Set.Name)
                    + "\", judged on what leaves '"
                    + MarkdownText.Escape(set.Set.Train.Name)
                    + "':"
            );
            var notes = set.Results.Any(r => r.Limit.Note is not null);
            var columns = new List<MarkdownTable.Column>
            {
                "Limit",
                MarkdownTable.Number("Found"),
                MarkdownTable.Number("Required"),
                MarkdownTable.Number("Margin"),
                "Verdict",
            };
            if (notes)
            {
                columns.Add("Note");
            }

            var table = new MarkdownTable([.. columns]);
            foreach (var result in set.Results)
            {
                var condition = result.Limit.Condition;
                var cells = new List<string>
                {
                    MarkdownText.Escape(condition.Quantity.Name),
                    Judgement.Found(condition, result.Value),
                    Judgement.Required(condition),
                    Margin(condition, result.Value),
                    Word(result.Verdict),
                };
                if (notes)
                {
                    cells.Add(MarkdownText.Escape(result.Limit.Note ?? ""));
                }

                table.Row([.. cells]);
            }

            writer.Table(table);
        }
    }

    /// <summary>Distance to the nearest bound: a difference on logarithmic scales, with the share of the bound elsewhere.</summary>
    private static string Margin(Condition condition, double value)
    {
        if (!double.IsFinite(value))
        {
            return "n/a";
        }

        var margin = Judgement.Margin(condition, value);
        var bound = Math.Abs(Judgement.NearestBound(condition, value));
        if (
            Math.Abs(margin)
            <= Digits.RelativeNoise
                * Math.Max(bound, Judgement.IsLogarithmic(condition.Quantity) ? 1 : 0)
        )
        {
            return "none: on the limit";
        }

        if (Judgement.IsLogarithmic(condition.Quantity))
        {
            return Digits.Decimals(margin / condition.DisplayFactor, 2);
        }

        var unit = condition.DisplayUnit.Length == 0 ? "" : " " + condition.DisplayUnit;
        return Digits.Significant(margin / condition.DisplayFactor)
            + unit
            + (bound > 0 ? " (" + Digits.Percent(margin / bound) + ")" : "");
    }

    /// <summary>The verdict in the word that a reader scans for.</summary>
    private static string Word(Verdict verdict) =>
        verdict switch
        {
            Calculation.Verdict.Met => "PASS",
            Calculation.Verdict.Failed => "FAIL",
            Calculation.Verdict.Undecided => "UNDECIDED",
            _ => "NOT JUDGED",
        };

    private static void WriteTrain(MarkdownWriter writer, TrainResult train, bool several)
    {
        if (several)
        {
            writer.Heading(3, "Train " + MarkdownText.Escape(train.Train.Name));
        }

        Doses(writer, train);
        Sludges(writer, train);
    }

    private static void Doses(MarkdownWriter writer, TrainResult train)
    {
        if (train.Doses.IsEmpty)
        {
            return;
        }

        var throughput = new Throughput(train.Train.Feed);
        var liquid = train.Doses.Any(d => d.ProductVolumePerFeed > 0);
        var priced = train.Doses.Any(d => d.CostPerFeed is not null);
        var perHour =
            throughput.IsFlow && train.Doses.Max(d => throughput.PerHour(d.DryPerFeed)) >= 0.1;
        var (massUnit, massSize) = Throughput.MassUnit(
            train.Doses.Select(d => throughput.PerPeriod(d.DryPerFeed))
        );
        var (volumeUnit, volumeSize) = Throughput.VolumeUnit(
            train.Doses.Select(d => throughput.PerPeriod(d.ProductVolumePerFeed))
        );

        var columns = new List<MarkdownTable.Column>
        {
            "Reagent",
            MarkdownTable.Number("Dry product (kg/m3 of feed)"),
        };
        if (perHour)
        {
            columns.Add(MarkdownTable.Number("Dry (kg/h)"));
        }

        if (throughput.IsKnown)
        {
            columns.Add(MarkdownTable.Number($"Dry ({massUnit}/{throughput.Period})"));
        }

        if (liquid)
        {
            columns.Add(MarkdownTable.Number("As delivered (L/m3 of feed)"));
            if (throughput.IsKnown)
            {
                columns.Add(
                    MarkdownTable.Number($"As delivered ({volumeUnit}/{throughput.Period})")
                );
            }
        }

        if (priced)
        {
            columns.Add(MarkdownTable.Number("Cost per m3 of feed"));
            if (throughput.IsKnown)
            {
                columns.Add(
                    MarkdownTable.Number("Cost per " + (throughput.IsFlow ? "day" : "batch"))
                );
            }
        }

        var table = new MarkdownTable([.. columns]);
        foreach (var dose in train.Doses)
        {
            var cells = new List<string>
            {
                DoseText.Name(dose.Reagent),
                Digits.Significant(dose.DryPerFeed),
            };
            if (perHour)
            {
                cells.Add(Digits.Significant(throughput.PerHour(dose.DryPerFeed)));
            }

            if (throughput.IsKnown)
            {
                cells.Add(Digits.Significant(throughput.PerPeriod(dose.DryPerFeed) / massSize));
            }

            if (liquid)
            {
                cells.Add(
                    dose.Reagent.IsDry
                        ? "dry"
                        : Digits.Significant(dose.ProductVolumePerFeed * 1000)
                );
                if (throughput.IsKnown)
                {
                    cells.Add(
                        dose.Reagent.IsDry
                            ? "dry"
                            : Digits.Significant(
                                throughput.PerPeriod(dose.ProductVolumePerFeed) / volumeSize
                            )
                    );
                }
            }

            if (priced)
            {
                var currency = MarkdownText.Escape(dose.Reagent.Price?.Currency ?? "");
                cells.Add(
                    dose.CostPerFeed is { } cost
                        ? Digits.Significant(cost) + " " + currency
                        : "no price"
                );
                if (throughput.IsKnown)
                {
                    cells.Add(
                        dose.CostPerFeed is { } each
                            ? Digits.Significant(throughput.PerPeriod(each)) + " " + currency
                            : "no price"
                    );
                }
            }

            table.Row([.. cells]);
        }

        writer.Paragraph("Doses for " + throughput.InWords() + ":");
        writer.Table(table);
    }

    private static void Sludges(MarkdownWriter writer, TrainResult train)
    {
        if (train.Sludges.IsEmpty)
        {
            return;
        }

        var throughput = new Throughput(train.Train.Feed);
        var wet = train.Sludges.Any(s => s.LiquorPerFeed > 0);
        var (unit, size) = Throughput.MassUnit(
            train.Sludges.Select(s => throughput.PerPeriod(s.DryMassPerFeed + s.LiquorPerFeed))
        );
        var columns = new List<MarkdownTable.Column>
        {
            "Sludge or product",
            "From stage",
            MarkdownTable.Number("Dry solids (kg/m3 of feed)"),
        };
        if (throughput.IsKnown)
        {
            columns.Add(MarkdownTable.Number($"Dry ({unit}/{throughput.Period})"));
            if (wet)
            {
                columns.Add(MarkdownTable.Number($"With its liquor ({unit}/{throughput.Period})"));
            }
        }

        columns.Add("Mostly");
        var table = new MarkdownTable([.. columns]);
        foreach (var sludge in train.Sludges)
        {
            var cells = new List<string>
            {
                MarkdownText.Escape(sludge.Name),
                MarkdownText.Escape(sludge.Stage),
                Digits.Amount(sludge.DryMassPerFeed),
            };
            if (throughput.IsKnown)
            {
                cells.Add(Digits.Amount(throughput.PerPeriod(sludge.DryMassPerFeed) / size));
                if (wet)
                {
                    cells.Add(
                        sludge.LiquorPerFeed > 0
                            ? Digits.Amount(
                                throughput.PerPeriod(sludge.DryMassPerFeed + sludge.LiquorPerFeed)
                                    / size
                            )
                            : "counted dry"
                    );
                }
            }

            cells.Add(Mostly(sludge));
            table.Row([.. cells]);
        }

        writer.Paragraph("Sludge or product:");
        writer.Table(table);
    }

    private static string Mostly(SludgeResult sludge)
    {
        var parts = sludge
            .Solids.Select(s => (Name: MarkdownText.Escape(s.Solid.Name), s.MassPerFeed))
            .Append((Name: "reagent impurities", MassPerFeed: sludge.InertPerFeed))
            .Where(p => sludge.DryMassPerFeed > 0 && p.MassPerFeed / sludge.DryMassPerFeed >= 0.01)
            .OrderByDescending(p => p.MassPerFeed)
            .ThenBy(p => p.Name, StringComparer.Ordinal)
            .Take(4)
            .Select(p => p.Name + " " + Digits.Percent(p.MassPerFeed / sludge.DryMassPerFeed))
            .ToArray();
        return parts.Length == 0 ? "nothing" : string.Join(", ", parts);
    }
}
