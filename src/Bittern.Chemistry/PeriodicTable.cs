using System.Collections.Immutable;

namespace Bittern.Chemistry;

/// <summary>The elements with their standard atomic weights.</summary>
public static class PeriodicTable
{
    /// <summary>All elements by symbol.</summary>
    public static ImmutableDictionary<string, Element> BySymbol { get; } = ImmutableDictionary<string, Element>.Empty
        .Add("H", new Element("H", "hydrogen", 1.008));
}
