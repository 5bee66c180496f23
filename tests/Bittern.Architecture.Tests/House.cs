using System.Reflection;
using System.Xml.Linq;

namespace Bittern.Architecture.Tests;

/// <summary>One project under <c>src</c>, as its project file says.</summary>
/// <param name="Name">Name of the folder and the project file.</param>
/// <param name="AssemblyName">Name of what it compiles to.</param>
/// <param name="Uses">Names of the projects that it references.</param>
/// <param name="Xml">The project file.</param>
internal sealed record Project(
    string Name,
    string AssemblyName,
    IReadOnlyList<string> Uses,
    XDocument Xml
)
{
    /// <summary>What it compiles to, from the folder of the tests.</summary>
    public Assembly Assembly =>
        Assembly.LoadFrom(Path.Combine(AppContext.BaseDirectory, AssemblyName + ".dll"));
}

/// <summary>The repository as files: its root, its projects, its texts.</summary>
internal static class House
{
    private static readonly HashSet<string> SkippedFolders = new(StringComparer.Ordinal)
    {
        ".git",
        ".vs",
        ".idea",
        "bin",
        "obj",
        "node_modules",
        "TestResults",
        "BenchmarkDotNet.Artifacts",
    };

    /// <summary>The folder that holds the solution.</summary>
    public static string Root { get; } = FindRoot();

    /// <summary>The projects under <c>src</c>, by name.</summary>
    public static IReadOnlyList<Project> Projects { get; } =
    [
        .. Directory
            .EnumerateFiles(Path.Combine(Root, "src"), "*.csproj", SearchOption.AllDirectories)
            .Select(Read)
            .OrderBy(p => p.Name, StringComparer.Ordinal),
    ];

    /// <summary>All files of the repository that people wrote, with their path from the root.</summary>
    public static IEnumerable<(string Name, string Full)> Files() =>
        Below(Root).Select(f => (Path.GetRelativePath(Root, f).Replace('\\', '/'), f));

    private static IEnumerable<string> Below(string folder) =>
        Directory
            .EnumerateFiles(folder)
            .Concat(
                Directory
                    .EnumerateDirectories(folder)
                    .Where(d => !SkippedFolders.Contains(Path.GetFileName(d)))
                    .SelectMany(Below)
            );

    private static Project Read(string file)
    {
        var xml = XDocument.Load(file);
        var name = Path.GetFileNameWithoutExtension(file);
        return new Project(
            name,
            xml.Descendants("AssemblyName").FirstOrDefault()?.Value ?? name,
            [
                .. xml.Descendants("ProjectReference")
                    .Select(r =>
                        Path.GetFileNameWithoutExtension(
                            r.Attribute("Include")!.Value.Replace('\\', '/')
                        )
                    ),
            ],
            xml
        );
    }

    private static string FindRoot()
    {
        var folder = AppContext.BaseDirectory;
        while (!File.Exists(Path.Combine(folder, "Bittern.slnx")))
        {
            folder =
                Path.GetDirectoryName(folder)
                ?? throw new InvalidOperationException("no Bittern.slnx above the tests");
        }

        return folder;
    }
}
