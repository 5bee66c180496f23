using System.Xml.Linq;
using Xunit;

namespace Bittern.Architecture.Tests;

/// <summary>One place for versions, a lock file a project, and every project in the solution.</summary>
public sealed class BuildFileTests
{
    private static IEnumerable<(string Name, string Full)> ProjectFiles() =>
        House.Files().Where(f => f.Name.EndsWith(".csproj", StringComparison.Ordinal));

    [Fact]
    public void Versions_stand_in_one_file_only()
    {
        var versions = ProjectFiles()
            .Where(f =>
                XDocument
                    .Load(f.Full)
                    .Descendants("PackageReference")
                    .Any(r =>
                        r.Attribute("Version") is not null
                        || r.Attribute("VersionOverride") is not null
                    )
            );
        Findings.None(versions.Select(f => f.Name));
    }

    [Fact]
    public void Every_project_has_a_lock_file()
    {
        var open = ProjectFiles()
            .Where(f =>
                !File.Exists(Path.Combine(Path.GetDirectoryName(f.Full)!, "packages.lock.json"))
            );
        Findings.None(open.Select(f => f.Name));
    }

    [Fact]
    public void Every_project_is_in_the_solution()
    {
        var listed = XDocument
            .Load(Path.Combine(House.Root, "Bittern.slnx"))
            .Descendants("Project")
            .Select(p => p.Attribute("Path")!.Value);
        Findings.None(ProjectFiles().Select(f => f.Name).Except(listed, StringComparer.Ordinal));
    }
}
