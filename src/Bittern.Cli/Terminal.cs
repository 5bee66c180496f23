using System.Reflection;

namespace Bittern.Cli;

/// <summary>Where a command writes: results to <see cref="Out"/>, everything else to <see cref="Error"/>.</summary>
public sealed record Terminal(TextWriter Out, TextWriter Error)
{
    /// <summary>Version of the tool, as reports print it.</summary>
    public static string Version { get; } =
        typeof(Terminal)
            .Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()
            ?.InformationalVersion
        ?? "0";
}
