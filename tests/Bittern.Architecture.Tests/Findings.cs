using Xunit;

namespace Bittern.Architecture.Tests;

/// <summary>Shows every finding, where the framework's own message stops after three.</summary>
internal static class Findings
{
    public static void None(IEnumerable<string?> findings)
    {
        var all = findings.Order(StringComparer.Ordinal).ToList();
        Assert.True(all.Count == 0, string.Join('\n', all));
    }
}
