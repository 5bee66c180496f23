using System.Collections.Immutable;
using Bittern.Diagnostics.Codes;

namespace Bittern.Diagnostics;

/// <summary>Every code, in order. A test compares this list with the classes in <c>Codes</c>.</summary>
public static class DiagnosticCatalogue
{
    public static ImmutableArray<DiagnosticDescriptor> All { get; } =
    [
        NoCertifiedAnswer.Descriptor,
        TargetUnreachable.Descriptor,
        ModelOutOfRange.Descriptor,
        AgentWithoutSource.Descriptor,
        SupersaturatedNotFormed.Descriptor,
    ];

    /// <summary>The descriptor of a code; null when there is no such code.</summary>
    public static DiagnosticDescriptor? Find(string id) =>
        All.FirstOrDefault(d => string.Equals(d.Id, id, StringComparison.OrdinalIgnoreCase));
}
