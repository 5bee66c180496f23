using System.Globalization;
using Bittern.Reference;

namespace Bittern.Calculation.Tests.Validation;

/// <summary>One row of a published table beside the recipe that must reproduce it.</summary>
/// <param name="Table">CSV file in <c>tests/reference</c>.</param>
/// <param name="System">The row's first column.</param>
/// <param name="Conditions">The row's conditions.</param>
/// <param name="Quantity">The row's quantity.</param>
/// <param name="Recipe">The recipe, with the catalogue as shipped.</param>
/// <param name="Read">The quantity from the outcome, in the row's unit.</param>
internal sealed record PublishedCheck(
    string Table,
    string System,
    string Conditions,
    string Quantity,
    string Recipe,
    Func<Outcome, double> Read
)
{
    /// <summary>Why the check fails today; null when it holds. A failing check is asserted to fail, so that a repair is noticed.</summary>
    public string? FailsBecause => KnownFailures.Of(this);

    public string Name => $"{System}: {Quantity} ({Conditions})";

    public PublishedValue Expected => PublishedValue.Of(this);
}

/// <summary>What the table says.</summary>
/// <param name="Value">In <paramref name="Unit"/>.</param>
/// <param name="Tolerance">Absolute, same unit, or a factor when <paramref name="IsFactor"/>.</param>
/// <param name="IsFactor">The tolerance is a factor up or down.</param>
/// <param name="Unit">As in the table, 1 for a pure number.</param>
/// <param name="Source">The publication.</param>
/// <param name="Status">verified or memory.</param>
internal sealed record PublishedValue(
    double Value,
    double Tolerance,
    bool IsFactor,
    string Unit,
    string Source,
    string Status
)
{
    /// <summary>
    /// Tolerance of a buffer's pH: the Davies equation leaves 0.01 to 0.02 in log γ of a singly charged ion at I = 0.1, which the ratio of a doubly to a
    /// singly charged ion takes three times.
    /// </summary>
    private const double BufferTolerance = 0.05;

    public static PublishedValue Of(PublishedCheck check) =>
        check.Table is PublishedChecks.Buffers ? Buffer(check) : Row(check);

    public bool Holds(double found) =>
        IsFactor
            ? found >= Value / Tolerance && found <= Value * Tolerance
            : Math.Abs(found - Value) <= Tolerance;

    private static PublishedValue Buffer(PublishedCheck check)
    {
        var row = ReferenceTable
            .Rows(check.Table)
            .Single(r =>
                Is(r["standard"], check.System)
                && Is($"{r["T_C"]} C", check.Conditions)
                && Is($"pH(S), {r["set"]}", check.Quantity)
            );
        return new PublishedValue(
            Number(row["pH"]),
            BufferTolerance,
            false,
            "1",
            row["source"],
            row["status"]
        );
    }

    private static PublishedValue Row(PublishedCheck check)
    {
        var row = ReferenceTable
            .Rows(check.Table)
            .Single(r =>
                Is(r["system"], check.System)
                && Is(r["conditions"], check.Conditions)
                && Is(r["quantity"], check.Quantity)
            );
        if (row["independent"] is not "yes")
        {
            throw new InvalidOperationException(
                $"'{check.Name}' is not independent of the constants"
            );
        }

        var value = Number(row["value"]);
        var tolerance = row["tolerance"];
        return tolerance switch
        {
            _ when tolerance.EndsWith(" %", StringComparison.Ordinal) => Build(
                value * Number(tolerance[..^2]) / 100,
                false
            ),
            _ when tolerance.StartsWith("factor ", StringComparison.Ordinal) => Build(
                Number(tolerance[7..]),
                true
            ),
            _ => Build(Number(tolerance), false),
        };

        PublishedValue Build(double size, bool isFactor) =>
            new(value, size, isFactor, row["unit"], row["source"], row["status"]);
    }

    private static bool Is(string one, string other) =>
        string.Equals(one, other, StringComparison.Ordinal);

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
