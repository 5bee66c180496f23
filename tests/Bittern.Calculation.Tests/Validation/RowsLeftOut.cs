using Bittern.Reference;

namespace Bittern.Calculation.Tests.Validation;

/// <summary>Independent rows of the tables that no check runs, and why.</summary>
internal static class RowsLeftOut
{
    private const string NotComputed =
        "no quantity of the tool: a rule of arithmetic on the analysis";
    private const string Regulation =
        "a limit set by a regulator or a guideline, nothing to compute";
    private const string Electrons =
        "needs oxidation states that share electrons, which no recipe line does yet";

    private static readonly (string SystemStart, string Why)[] Reasons =
    [
        (
            "Ag2CrO4",
            "the row leaves out protonation and dimers of chromate, which the catalogue has"
        ),
        ("Na2SO4", "needs a Pitzer model for the water activity of a saturated solution"),
        ("ferrihydrite", "the catalogue carries this very value as ferrihydrite-field"),
        ("Fe(III)/Fe(II) total", Electrons),
        ("MnO2/Mn2+", Electrons),
        ("As(V)/As(III)", Electrons),
        ("O2/H2O", Electrons),
        ("calculated acidity", NotComputed),
        ("net acidity", NotComputed),
        ("hot peroxide acidity", NotComputed),
        ("lime demand", NotComputed),
        ("reagent equivalents", NotComputed),
        ("US effluent limit", Regulation),
        ("US drinking-water limit", Regulation),
        ("IFC mining", Regulation),
    ];

    /// <summary>Every row left out with its reason; null where none is given, which a test refuses.</summary>
    public static IReadOnlyList<(string System, string Quantity, string? Why)> All { get; } =
    [
        .. new[] { PublishedChecks.Salts, PublishedChecks.Metals }
            .SelectMany(table => ReferenceTable.Rows(table).Select(row => (Table: table, Row: row)))
            .Where(r => r.Row["independent"] is "yes" && !IsRun(r.Table, r.Row))
            .Select(r =>
                (
                    r.Row["system"],
                    r.Row["quantity"],
                    Reasons
                        .Where(w =>
                            r.Row["system"].StartsWith(w.SystemStart, StringComparison.Ordinal)
                        )
                        .Select(w => w.Why)
                        .SingleOrDefault()
                )
            ),
    ];

    private static bool IsRun(string table, IReadOnlyDictionary<string, string> row) =>
        PublishedChecks.All.Any(c =>
            Is(c.Table, table)
            && Is(c.System, row["system"])
            && Is(c.Conditions, row["conditions"])
            && Is(c.Quantity, row["quantity"])
        );

    private static bool Is(string one, string other) =>
        string.Equals(one, other, StringComparison.Ordinal);
}
