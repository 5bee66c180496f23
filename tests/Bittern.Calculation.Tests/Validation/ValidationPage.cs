using System.Globalization;
using System.Text;

namespace Bittern.Calculation.Tests.Validation;

/// <summary>Writes <c>docs/validation.md</c> from the checks and what the tool finds.</summary>
internal static class ValidationPage
{
    public static string Render(
        IReadOnlyList<(PublishedCheck Check, double Found)> results,
        IReadOnlyList<CommonPractice.Fact> facts
    )
    {
        var holding = results.Count(r => r.Check.Expected.Holds(r.Found));
        var page = new StringBuilder();
        page.Append(
            CultureInfo.InvariantCulture,
            $"""
            # Validation

            Written by the tests (`BITTERN_ACCEPT=1` rewrites it; without it a test fails when this page is out of date). Every row runs a recipe text
            with the shipped catalogue and the Davies equation, and compares it with a published value that does not stem from the constants used. Rows are
            chosen by whether the catalogue has the substances, never by the outcome, and no constant is tuned to a row. Tables and recipes:
            `tests/reference`, `tests/Bittern.Calculation.Tests/Validation`.

            {holding} of {results.Count} rows hold. A row outside its tolerance is kept, asserted to be outside, and explained below its table.

            Sources marked † were recalled without sight of the publication: such a row can be wrong in itself.

            The engine itself is compared with a solve of the same equations in 40-digit arithmetic by a general-purpose root finder
            (`tests/reference/independent`): four systems with up to four solids, every molality, amount, pH and water activity to 1e-9 relative.


            """
        );
        Table(
            page,
            "Solubilities, saturated solutions, gases and weak acids",
            results,
            r => r.Table is PublishedChecks.Salts
        );
        Table(page, "Metals", results, r => r.Table is PublishedChecks.Metals);
        Table(page, "Standard buffers", results, r => r.Table is PublishedChecks.Buffers);
        page.Append(
            """
            ## Common practice

            Facts of the trade without a single source, marked so on purpose.

            | fact | expected | found | holds |
            |---|---|---|---|

            """
        );
        foreach (var fact in facts)
        {
            page.Append(
                CultureInfo.InvariantCulture,
                $"| {fact.Statement} | {fact.Expected} | {fact.Found} | {(fact.Holds ? "yes" : "**no**")} |\n"
            );
        }

        page.Append(
            """

            ## Rows left out

            Independent rows of the tables that no check runs.

            | row | why |
            |---|---|

            """
        );
        foreach (var group in RowsLeftOut.All.GroupBy(r => (r.System, r.Why)))
        {
            page.Append(
                CultureInfo.InvariantCulture,
                $"| {group.Key.System}: {string.Join("; ", group.Select(r => r.Quantity).Distinct(StringComparer.Ordinal))} | {group.Key.Why} |\n"
            );
        }

        return page.ToString().ReplaceLineEndings("\n");
    }

    private static void Table(
        StringBuilder page,
        string title,
        IReadOnlyList<(PublishedCheck Check, double Found)> results,
        Func<PublishedCheck, bool> belongs
    )
    {
        page.Append(
            CultureInfo.InvariantCulture,
            $"## {title}\n\n| system | conditions | quantity | source | expected | found | deviation | holds |\n|---|---|---|---|---|---|---|---|\n"
        );
        var outside = new List<(string Row, string Why)>();
        foreach (var (check, found) in results.Where(r => belongs(r.Check)))
        {
            var expected = check.Expected;
            var plain = IsLogarithmic(expected);
            var unit = plain ? "" : $" {expected.Unit}";
            var holds = expected.Holds(found);
            var tolerance = expected.IsFactor
                ? $"within a factor {Digits(expected.Tolerance)}"
                : $"± {Number(expected.Tolerance)}";
            page.Append(
                CultureInfo.InvariantCulture,
                $"| {check.System} | {check.Conditions} | {check.Quantity} | {expected.Source}{(expected.Status is "memory" ? " †" : "")} | {Number(expected.Value)} {tolerance}{unit} | {Number(found)}{unit} | {Deviation(expected, found)} | {(holds ? "yes" : "**no**")} |\n"
            );
            if (!holds)
            {
                outside.Add(
                    (
                        $"{check.System}, {check.Conditions}",
                        check.FailsBecause ?? "not explained yet."
                    )
                );
            }

            string Number(double value) =>
                plain ? value.ToString("0.000", CultureInfo.InvariantCulture) : Digits(value);
        }

        page.Append('\n');
        if (outside.Count > 0)
        {
            page.Append("Outside:\n\n");
            foreach (var reason in outside.GroupBy(o => o.Why, StringComparer.Ordinal))
            {
                page.Append(
                    CultureInfo.InvariantCulture,
                    $"- **{string.Join("**; **", reason.Select(r => r.Row))}**: {reason.Key}\n"
                );
            }

            page.Append('\n');
        }
    }

    // pH, log K and ratios are read to the thousandth and compared by difference.
    private static bool IsLogarithmic(PublishedValue expected) =>
        expected.Unit is "1" or "pH" or "";

    private static string Deviation(PublishedValue expected, double found) =>
        IsLogarithmic(expected) || expected.Unit is "C"
            ? (found - expected.Value).ToString("+0.000;-0.000;0.000", CultureInfo.InvariantCulture)
            : (100 * ((found / expected.Value) - 1)).ToString(
                "+0.0' %';-0.0' %';0.0' %'",
                CultureInfo.InvariantCulture
            );

    // Four significant digits, without an exponent in the ordinary range.
    private static string Digits(double value)
    {
        if (value == 0)
        {
            return "0";
        }

        var size = (int)Math.Floor(Math.Log10(Math.Abs(value)));
        return size is < -4 or > 6
            ? value.ToString("0.###e0", CultureInfo.InvariantCulture)
            : Math.Round(value, Math.Clamp(3 - size, 0, 15))
                .ToString("0.########", CultureInfo.InvariantCulture);
    }
}
