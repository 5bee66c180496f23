using System.Reflection;
using Xunit;

namespace Bittern.Architecture.Tests;

/// <summary>Which project may use which. An arrow that is missing here is a decision to take, not a line to add.</summary>
public sealed class ArrowTests
{
    private static readonly Dictionary<string, string[]> Arrows = new(StringComparer.Ordinal)
    {
        ["Bittern.Chemistry"] = [],
        ["Bittern.Diagnostics"] = [],
        ["Bittern.Engine"] = ["Bittern.Chemistry"],
        ["Bittern.HookApi"] = ["Bittern.Chemistry"],
        ["Bittern.Model"] = ["Bittern.Chemistry", "Bittern.Diagnostics"],
        ["Bittern.Language"] = ["Bittern.Model"],
        ["Bittern.Catalogue"] = ["Bittern.Language"],
        ["Bittern.Calculation"] = ["Bittern.Model", "Bittern.Engine", "Bittern.HookApi"],
        ["Bittern.Reports"] = ["Bittern.Calculation"],
        ["Bittern.Hooks"] = ["Bittern.Calculation"],
        ["Bittern.HookWorker"] = ["Bittern.HookApi"],
        ["Bittern.Editor"] = ["Bittern.Language", "Bittern.Catalogue"],
        ["Bittern.Cli"] =
        [
            "Bittern.Reports",
            "Bittern.Catalogue",
            "Bittern.Hooks",
            "Bittern.Editor",
            "Bittern.Calculation",
            "Bittern.Language",
            "Bittern.Model",
            "Bittern.Engine",
            "Bittern.HookApi",
            "Bittern.Chemistry",
            "Bittern.Diagnostics",
        ],
    };

    public static TheoryData<string> Projects() => [.. House.Projects.Select(p => p.Name)];

    [Fact]
    public void Every_project_has_its_place_in_the_map() =>
        Findings.None(
            House.Projects.Select(p => p.Name).Except(Arrows.Keys, StringComparer.Ordinal)
        );

    [Theory]
    [MemberData(nameof(Projects))]
    public void A_project_file_references_only_along_the_arrows(string name) =>
        Findings.None(Find(name).Uses.Except(Arrows[name], StringComparer.Ordinal));

    [Theory]
    [MemberData(nameof(Projects))]
    public void An_assembly_uses_only_what_the_arrows_reach(string name)
    {
        var own = House.Projects.ToDictionary(
            p => p.AssemblyName,
            p => p.Name,
            StringComparer.Ordinal
        );
        var used = Find(name)
            .Assembly.GetReferencedAssemblies()
            .Select(a => own.GetValueOrDefault(a.Name!))
            .OfType<string>();
        Findings.None(used.Except(Reached(name), StringComparer.Ordinal));
    }

    [Fact]
    public void The_arrows_have_no_cycle() =>
        Assert.All(
            Arrows.Keys,
            name => Assert.DoesNotContain(name, Reached(name), StringComparer.Ordinal)
        );

    // What everything else stands on brings nothing along: no other culture, allocation or licence than ours.
    [Theory]
    [InlineData("Bittern.Chemistry")]
    [InlineData("Bittern.Diagnostics")]
    [InlineData("Bittern.Engine")]
    [InlineData("Bittern.HookApi")]
    [InlineData("Bittern.Model")]
    public void The_inner_projects_use_no_package(string name)
    {
        var foreign = Find(name)
            .Assembly.GetReferencedAssemblies()
            .Select(a => a.Name!)
            .Where(a =>
                !a.StartsWith("System.", StringComparison.Ordinal)
                && !a.StartsWith("Bittern.", StringComparison.Ordinal)
            );
        Findings.None(foreign);
    }

    private static Project Find(string name) =>
        House.Projects.Single(p => string.Equals(p.Name, name, StringComparison.Ordinal));

    // Everything that a project may use, through the projects that it uses; a name that reaches itself shows a cycle.
    private static HashSet<string> Reached(string name)
    {
        var reached = new HashSet<string>(StringComparer.Ordinal);
        var next = new Stack<string>(Arrows[name]);
        while (next.TryPop(out var one))
        {
            if (reached.Add(one))
            {
                foreach (var further in Arrows[one])
                {
                    next.Push(further);
                }
            }
        }

        return reached;
    }
}
