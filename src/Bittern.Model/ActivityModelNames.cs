using System.Collections.Immutable;

namespace Bittern.Model;

/// <summary>Activity models by the names that recipes write.</summary>
public static class ActivityModelNames
{
    public const string Ideal = "ideal";
    public const string DebyeHuckel = "debye-huckel";
    public const string Davies = "davies";
    public const string TruesdellJones = "truesdell-jones";
    public const string Sit = "sit";
    public const string Pitzer = "pitzer";

    /// <summary>All of them, from the simplest on.</summary>
    public static ImmutableArray<string> All { get; } =
    [Ideal, DebyeHuckel, Davies, TruesdellJones, Sit, Pitzer];
}
