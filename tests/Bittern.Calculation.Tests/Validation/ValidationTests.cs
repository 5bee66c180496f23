using System.Collections.Concurrent;
using System.Globalization;
using Xunit;

namespace Bittern.Calculation.Tests.Validation;

/// <summary>Recipe texts with the shipped catalogue against published values.</summary>
public sealed class ValidationTests
{
    private static readonly ConcurrentDictionary<string, Lazy<double>> Results = new(
        StringComparer.Ordinal
    );

    public static TheoryData<string> Names => [.. PublishedChecks.All.Select(c => c.Name)];

    [Theory]
    [MemberData(nameof(Names))]
    public void A_published_value_is_met_or_its_failure_is_known(string name)
    {
        var check = PublishedChecks.All.Single(c =>
            string.Equals(c.Name, name, StringComparison.Ordinal)
        );
        var found = Found(check);
        var expected = check.Expected;
        var text = string.Create(
            CultureInfo.InvariantCulture,
            $"found {found:G6}, expected {expected.Value:G6} within {expected.Tolerance:G3} {expected.Unit}: {expected.Source}"
        );
        Assert.True(expected.Holds(found) == check.FailsBecause is null, text);
    }

    [Fact]
    public void At_least_twenty_independent_rows_of_the_tables_hold() =>
        Assert.InRange(
            PublishedChecks.All.Count(c =>
                c.FailsBecause is null && c.Table is not PublishedChecks.Buffers
            ),
            20,
            int.MaxValue
        );

    [Fact]
    public void Every_independent_row_is_run_or_left_out_with_a_reason() =>
        Assert.All(
            RowsLeftOut.All,
            row => Assert.True(row.Why is not null, $"{row.System}: {row.Quantity}")
        );

    [Fact]
    public void Common_practice_is_confirmed() =>
        Assert.All(
            CommonPractice.All,
            fact => Assert.True(fact.Holds, $"{fact.Statement}: {fact.Found}")
        );

    [Fact]
    public void The_validation_page_is_up_to_date()
    {
        var page = ValidationPage.Render(
            [.. PublishedChecks.All.Select(c => (c, Found(c)))],
            CommonPractice.All
        );
        var path = Path.Combine(Root(), "docs", "validation.md");
        if (Environment.GetEnvironmentVariable("BITTERN_ACCEPT") is "1")
        {
            File.WriteAllText(path, page);
        }

        Assert.Equal(File.Exists(path) ? File.ReadAllText(path) : "", page);
    }

    private static double Found(PublishedCheck check) =>
        Results
            .GetOrAdd(
                check.Name,
                _ => new Lazy<double>(() => check.Read(Recipes.Run(check.Recipe)))
            )
            .Value;

    private static string Root()
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "Bittern.slnx")))
        {
            folder = folder.Parent;
        }

        return folder?.FullName
            ?? throw new InvalidOperationException(
                "the repository's root was not found above the test assembly"
            );
    }
}
