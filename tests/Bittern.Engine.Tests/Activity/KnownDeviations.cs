namespace Bittern.Engine.Tests.Activity;

/// <summary>
/// Why a series lies outside its tolerance. A series that holds has no reason here and one that does not must have one; nothing is tuned to a table.
/// </summary>
internal static class KnownDeviations
{
    /// <summary>What the general models leave out, by the sign of their error.</summary>
    private const string TooHigh =
        "the ions of this salt attract each other more than their charges and sizes say (weak pairing); the model has no term for it";

    private const string TooLow =
        "the ions of this salt hold water firmly, which raises γ; the model has no term for it";

    private const string Scale =
        "a constant factor: the table's own scale at low molality; the osmotic coefficients agree";

    private const string TwoTables =
        "the other published table holds: the deviation is the spread of the experiments";

    private const string Unsettled =
        "table and parameters were both recalled and neither has been seen: which of the two is off is open";

    private static readonly Dictionary<string, string> OfPitzer = new(StringComparer.Ordinal)
    {
        ["(NH4)2SO4"] = Scale,
        ["K2CrO4"] = Scale,
        ["Na2CrO4"] = Scale,
        ["Na2SO4"] = Scale,
        ["Li2SO4"] = Scale,
        ["Rb2SO4"] = Scale,
        ["Pb(NO3)2"] = Scale,
        ["BaCl2"] = TwoTables,
        ["CaBr2"] = TwoTables,
        ["CaCl2"] =
            "the row of the 1984 set gives up accuracy above 4 mol/kg, where calcium chloride begins to pair",
        ["KOH"] = Unsettled,
        ["LiI"] = Unsettled,
        ["Ca(ClO4)2"] = Unsettled,
        ["UO2SO4"] = "its source gives no β(2), the term for pairing at low molality",
        ["ZnSO4"] = "2-2 sulfates pair at 0.1 mol/kg, where β(2) is at its limit",
    };

    /// <summary>The reason; null for a series that holds.</summary>
    public static string? Of(Series series) =>
        series.Holds ? null
        : series.Model is "pitzer" ? OfPitzer.GetValueOrDefault(series.Salt)
        : series.Worst.Deviation > 0 ? TooHigh
        : TooLow;

    /// <summary>Salts with a reason that no series needs.</summary>
    public static IEnumerable<string> Idle =>
        OfPitzer.Keys.Except(
            PublishedCoefficients
                .All.Where(s => s.Model is "pitzer" && !s.Holds)
                .Select(s => s.Salt),
            StringComparer.Ordinal
        );
}
