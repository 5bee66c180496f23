using System.Reflection;
using System.Runtime.CompilerServices;
using Xunit;

namespace Bittern.Architecture.Tests;

/// <summary>What every public type keeps to: sealed unless meant to be derived from, and no data that changes behind a reader's back.</summary>
public sealed class PublicTypeTests
{
    // The engine's input buffer, reused from solve to solve so that nothing allocates; its own comment says so.
    private static readonly HashSet<string> MayChange = new(StringComparer.Ordinal)
    {
        "Bittern.Engine.Problem",
    };

    [Fact]
    public void Public_classes_are_sealed_abstract_or_static()
    {
        var open = Exported()
            .Where(t => t is { IsClass: true, IsSealed: false, IsAbstract: false });
        Findings.None(open.Select(t => t.FullName));
    }

    [Fact]
    public void Public_properties_cannot_be_set_after_the_object_is_made()
    {
        var settable = Exported()
            .Where(t => !MayChange.Contains(t.FullName!))
            .SelectMany(t =>
                t.GetProperties(
                    BindingFlags.Instance
                        | BindingFlags.Static
                        | BindingFlags.Public
                        | BindingFlags.DeclaredOnly
                )
            )
            .Where(p => p.SetMethod is { IsPublic: true } set && !IsInit(set));
        Findings.None(settable.Select(p => $"{p.DeclaringType!.FullName}.{p.Name}"));
    }

    [Fact]
    public void Public_fields_cannot_be_written()
    {
        var open = Exported()
            .Where(t => !t.IsEnum)
            .SelectMany(t =>
                t.GetFields(
                    BindingFlags.Instance
                        | BindingFlags.Static
                        | BindingFlags.Public
                        | BindingFlags.DeclaredOnly
                )
            )
            .Where(f => f is { IsInitOnly: false, IsLiteral: false });
        Findings.None(open.Select(f => $"{f.DeclaringType!.FullName}.{f.Name}"));
    }

    private static IEnumerable<Type> Exported() =>
        House.Projects.SelectMany(p => p.Assembly.GetExportedTypes());

    private static bool IsInit(MethodInfo set) =>
        set.ReturnParameter.GetRequiredCustomModifiers().Contains(typeof(IsExternalInit));
}
