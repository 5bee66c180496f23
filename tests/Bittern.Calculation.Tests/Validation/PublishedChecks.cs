namespace Bittern.Calculation.Tests.Validation;

/// <summary>
/// Every published row that a dilute-solution model can be asked for, with its recipe. Rows are chosen by whether the catalogue has the
/// substances, never by the outcome.
/// </summary>
internal static class PublishedChecks
{
    /// <summary>The table of pH standards.</summary>
    public const string Buffers = "ph-standards.csv";

    /// <summary>The table of solubilities, saturated solutions, gases and weak acids.</summary>
    public const string Salts = "solubility-checks.csv";

    /// <summary>The table of metals.</summary>
    public const string Metals = "metal-checks.csv";

    public static IReadOnlyList<PublishedCheck> All { get; } =
    [.. SaltChecks.All, .. MetalChecks.All, .. BufferChecks.All];
}
