using System.Reflection;
using System.Xml.Linq;
using Xunit;

namespace Bittern.Architecture.Tests;

/// <summary>Numbers that people dose lime on say what they are: the chemistry and the engine are documented, members that carry a number with their unit.</summary>
public sealed class DocumentationTests
{
    private static readonly string[] Documented = ["Bittern.Chemistry", "Bittern.Engine"];

    [Fact]
    public void Public_types_of_chemistry_and_engine_have_a_summary()
    {
        var silent = Documented.SelectMany(name =>
        {
            var comments = Comments(name);
            return Exported(name)
                .Where(t => !comments.ContainsKey("T:" + Id(t)))
                .Select(t => t.FullName);
        });
        Findings.None(silent);
    }

    [Fact]
    public void Public_members_that_carry_a_number_are_documented()
    {
        var silent = Documented.SelectMany(name =>
        {
            var comments = Comments(name);
            return Exported(name)
                .SelectMany(t =>
                    t.GetMembers(
                            BindingFlags.Instance
                                | BindingFlags.Static
                                | BindingFlags.Public
                                | BindingFlags.DeclaredOnly
                        )
                        .Where(m => CarriesNumber(m) && !IsDocumented(comments, t, m))
                        .Select(m => $"{t.FullName}.{m.Name}")
                );
        });
        Findings.None(silent);
    }

    private static IEnumerable<Type> Exported(string name) =>
        House
            .Projects.Single(p => string.Equals(p.Name, name, StringComparison.Ordinal))
            .Assembly.GetExportedTypes();

    private static bool CarriesNumber(MemberInfo member) =>
        member switch
        {
            PropertyInfo p => p.PropertyType == typeof(double),
            FieldInfo f => f.FieldType == typeof(double),
            // An override means what its base says.
            MethodInfo m => m.ReturnType == typeof(double)
                && !m.IsSpecialName
                && m.GetBaseDefinition() == m,
            _ => false,
        };

    // By itself; as a parameter of its type; by the summary of a small record that is documented as a whole; or by the interface that it implements.
    private static bool IsDocumented(
        Dictionary<string, XElement> comments,
        Type type,
        MemberInfo member
    ) =>
        HasComment(comments, type, member)
        || (comments.ContainsKey("T:" + Id(type)) && IsParameter(type, member))
        || type.GetInterfaces()
            .SelectMany(i => i.GetMember(member.Name).Select(m => (Interface: i, Member: m)))
            .Any(p => HasComment(comments, p.Interface, p.Member));

    private static bool HasComment(
        Dictionary<string, XElement> comments,
        Type type,
        MemberInfo member
    )
    {
        var kind = member switch
        {
            PropertyInfo => 'P',
            FieldInfo => 'F',
            _ => 'M',
        };
        var id = $"{kind}:{Id(type)}.{member.Name}";
        return comments.Keys.Any(k =>
            string.Equals(k, id, StringComparison.Ordinal)
            || k.StartsWith(id + "(", StringComparison.Ordinal)
        );
    }

    private static bool IsParameter(Type type, MemberInfo member) =>
        type.GetConstructors()
            .SelectMany(c => c.GetParameters())
            .Any(p => string.Equals(p.Name, member.Name, StringComparison.Ordinal));

    private static string Id(Type type) => type.FullName!.Replace('+', '.');

    private static Dictionary<string, XElement> Comments(string name) =>
        XDocument
            .Load(Path.Combine(AppContext.BaseDirectory, name + ".xml"))
            .Descendants("member")
            .ToDictionary(m => m.Attribute("name")!.Value, m => m, StringComparer.Ordinal);
}
