using System.Globalization;
using System.Text.Json;
using Bittern.Calculation;
using Bittern.Model;
using Bittern.Reports.Tests.Samples;
using Xunit;

namespace Bittern.Reports.Tests.Machine;

public sealed class MachineOutputTests
{
    private static readonly Outcome Adit = SampleRecipes.Run(SampleRecipes.Adit());

    public static TheoryData<string> Cases => new("adit", "mixture", "failed");

    [Theory]
    [MemberData(nameof(Cases))]
    public void Results_follow_the_published_schema(string name)
    {
        var outcome = name switch
        {
            "adit" => Adit,
            "mixture" => SampleRecipes.Run(SampleRecipes.Mixture(0.1, 0.08)),
            _ => Failed(),
        };
        using var schema = JsonDocument.Parse(
            File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "results.schema.json"))
        );
        using var results = JsonDocument.Parse(JsonReport.Render(outcome, SampleRecipes.Stamp));
        Assert.Empty(new MiniSchema(schema.RootElement).Faults(results.RootElement));
    }

    [Fact]
    public void The_schema_check_finds_what_does_not_belong()
    {
        using var schema = JsonDocument.Parse(
            File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "results.schema.json"))
        );
        var text = JsonReport.Render(Adit, SampleRecipes.Stamp);
        foreach (
            var (from, to) in new[]
            {
                ("bittern-results/1", "bittern-results/2"),
                ("\"verdict\": \"failed\"", "\"verdict\": \"FAIL\""),
                ("\"measured_ph\": 2.9", "\"measured_ph\": \"2.9\""),
                ("\"all_certified\"", "\"certified\""),
            }
        )
        {
            Assert.Contains(from, text, StringComparison.Ordinal);
            using var broken = JsonDocument.Parse(text.Replace(from, to, StringComparison.Ordinal));
            Assert.NotEmpty(new MiniSchema(schema.RootElement).Faults(broken.RootElement));
        }
    }

    [Fact]
    public void Results_say_what_the_report_says()
    {
        using var results = JsonDocument.Parse(JsonReport.Render(Adit, SampleRecipes.Stamp));
        var root = results.RootElement;
        Assert.False(root.GetProperty("all_limits_met").GetBoolean());
        var zinc = root.GetProperty("limit_sets")[0].GetProperty("limits")[1];
        Assert.Equal("dissolved(Zn)", zinc.GetProperty("quantity").GetString());
        Assert.Equal(0.5, zinc.GetProperty("bound").GetDouble());
        Assert.Equal("mg/L", zinc.GetProperty("unit").GetString());
        Assert.Equal(
            Adit.LimitSets[0].Results[1].Value * 1000,
            zinc.GetProperty("found").GetDouble(),
            1e-5 * 2.4
        );
        var stage = root.GetProperty("trains")[0].GetProperty("stages")[0];
        Assert.Equal(7.2, stage.GetProperty("end").GetProperty("ph").GetDouble(), 1e-6);
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("fa-IR")]
    public void Machine_outputs_do_not_know_the_culture(string culture)
    {
        var before = CultureInfo.CurrentCulture;
        var expected = (
            JsonReport.Render(Adit, SampleRecipes.Stamp),
            string.Concat(CsvTables.Render(Adit).Select(t => t.Text))
        );
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
            Assert.Equal(
                expected,
                (
                    JsonReport.Render(Adit, SampleRecipes.Stamp),
                    string.Concat(CsvTables.Render(Adit).Select(t => t.Text))
                )
            );
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void Csv_tables_have_a_name_for_every_column_and_a_cell_for_every_name()
    {
        var tables = CsvTables.Render(Adit);
        Assert.Equal(
            [
                "limits.csv",
                "doses.csv",
                "sludges.csv",
                "solids.csv",
                "dissolved.csv",
                "species.csv",
                "saturations.csv",
                "onsets.csv",
                "constants.csv",
                "dose-treatment-primary.csv",
                "dose-treatment-secondary.csv",
            ],
            tables.Select(t => t.Name),
            StringComparer.Ordinal
        );
        foreach (var table in tables)
        {
            var rows = Read(table.Text);
            Assert.True(rows.Count > 1, table.Name);
            Assert.All(rows, r => Assert.Equal(rows[0].Count, r.Count));
            Assert.Equal(rows[0].Count, rows[0].Distinct(StringComparer.Ordinal).Count());
        }
    }

    [Theory]
    [InlineData("=1+1", "'=1+1")]
    [InlineData("@cmd", "'@cmd")]
    [InlineData("a,b", "a,b")]
    [InlineData("say \"x\"\nnow", "say \"x\"\nnow")]
    public void Csv_text_stays_text(string name, string expected)
    {
        var changed = Adit with
        {
            LimitSets =
            [
                Adit.LimitSets[0] with
                {
                    Set = Adit.LimitSets[0].Set with { Name = name },
                },
            ],
        };
        Assert.Equal(expected, Read(CsvTables.Render(changed)[0].Text)[1][0]);
    }

    private static Outcome Failed()
    {
        var train = Adit.Trains[0];
        return Adit with
        {
            Liquors =
            [
                Adit.Liquors[0] with
                {
                    State = null,
                    Closure = null,
                    Failure = "the iteration did not converge",
                },
            ],
            Trains =
            [
                train with
                {
                    Stages = [],
                    Feed = null,
                    WorstPlantImbalance = double.NaN,
                    Failure = new TrainFailure("feed", "no speciation", train.Train.Span),
                },
            ],
            LimitSets =
            [
                Adit.LimitSets[0] with
                {
                    Results =
                    [
                        .. Adit.LimitSets[0]
                            .Results.Select(r => new LimitResult(
                                r.Limit,
                                Verdict.NotJudged,
                                double.NaN,
                                null
                            )),
                    ],
                },
            ],
        };
    }

    // RFC 4180 as a reader would do it.
    private static List<List<string>> Read(string text)
    {
        var rows = new List<List<string>>();
        var row = new List<string>();
        var cell = new System.Text.StringBuilder();
        var quoted = false;
        for (var i = 0; i < text.Length; i++)
        {
            var c = text[i];
            if (quoted && c == '"' && i + 1 < text.Length && text[i + 1] == '"')
            {
                cell.Append('"');
                i++;
            }
            else if (c == '"')
            {
                quoted = !quoted;
            }
            else if (!quoted && c is (',' or '\n'))
            {
                row.Add(cell.ToString());
                cell.Clear();
                if (c == '\n')
                {
                    rows.Add(row);
                    row = [];
                }
            }
            else
            {
                cell.Append(c);
            }
        }

        return rows;
    }
}
