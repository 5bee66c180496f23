using System.Globalization;
using System.Text;

namespace Bittern.Engine.Tests.Activity;

/// <summary>Writes <c>docs/validation-activity.md</c>.</summary>
internal static class ActivityPage
{
    private static readonly (string Model, string Title, string About)[] Models =
    [
        (
            "pitzer",
            "Pitzer",
            "Single salts with the preferred parameters, each up to the molality it was fitted to; tolerance 2 %. H2SO4 counts 2 H+ and SO4^2- and goes through HSO4-."
        ),
        (
            "davies",
            "Davies",
            "Up to an ionic strength of 0.1 mol/kg; tolerance 1 %. The equation gives all salts of one type one value."
        ),
        (
            "debye-hückel",
            "Debye-Hückel with Kielland's sizes",
            "Salts whose ions both have a size, up to 0.1 mol/kg; tolerance 1 %."
        ),
        (
            "truesdell-jones",
            "Truesdell-Jones",
            "Salts whose ions both have parameters, up to 0.1 mol/kg; tolerance 1 %."
        ),
        ("sit", "SIT", "Salts with an interaction coefficient, up to 0.1 mol/kg; tolerance 1 %."),
    ];

    public static string Render()
    {
        var page = new StringBuilder();
        page.Append(
            """
            # Validation of the activity models

            Written by the tests (`BITTERN_ACCEPT=1` rewrites it; without it a test fails when this page is out of date). Mean activity coefficients γ± and osmotic
            coefficients φ at 25 °C, molal scale. A row is one salt in one published table: the number of points compared, and the point with the largest
            deviation. `γ±/γ±(0.1)` stands where the publication itself assigned the value at 0.1 mol/kg, so that only ratios mean something. A row outside its
            tolerance stays, and the reason is given; nothing is tuned to a table.

            Tables: RS59, RS59-4: Robinson and Stokes 1959, Electrolyte Solutions, appendix 8.10 (recalled; good to about 1 %); CRC: CRC Handbook, Mean Activity
            Coefficients, after Hamer and Wu 1972, Goldberg, Staples (partly read, partly recalled). Parameters and tables: `tests/reference/activity`.
            The equations: [Activity models](activity-models.md).


            """
        );
        foreach (var (model, title, about) in Models)
        {
            Section(
                page,
                title,
                about,
                [
                    .. PublishedCoefficients.All.Where(s =>
                        string.Equals(s.Model, model, StringComparison.Ordinal)
                    ),
                ]
            );
        }

        return page.ToString().TrimEnd('\n') + "\n";
    }

    private static void Section(
        StringBuilder page,
        string title,
        string about,
        IReadOnlyList<Series> series
    )
    {
        var points = series.Sum(s => s.Points.Count);
        page.Append(
            CultureInfo.InvariantCulture,
            $"""
            ## {title}

            {about} {series.Count(s => s.Holds)} of {series.Count} rows hold; {points} points.

            | salt | quantity | table | points | largest deviation at, mol/kg | expected | found | deviation | holds |
            |---|---|---|---|---|---|---|---|---|

            """
        );
        foreach (var s in series)
        {
            page.Append(
                CultureInfo.InvariantCulture,
                $"| {s.Salt} | {s.Quantity} | {s.Table} | {s.Points.Count} | {s.Worst.Molality} | {s.Worst.Published} | {s.Worst.Found:0.0000} | {100 * s.Worst.Deviation:+0.0;-0.0;0.0} % | {(s.Holds ? "yes" : "**no**")} |\n"
            );
        }

        page.Append('\n');
        foreach (
            var reason in series
                .Where(s => !s.Holds)
                .GroupBy(s => KnownDeviations.Of(s)!, StringComparer.Ordinal)
        )
        {
            page.Append(
                CultureInfo.InvariantCulture,
                $"- {string.Join(", ", reason.Select(s => s.Salt).Distinct(StringComparer.Ordinal))}: {reason.Key}.\n"
            );
        }

        page.Append('\n');
    }
}
