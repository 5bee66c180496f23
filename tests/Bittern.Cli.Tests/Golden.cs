using System.Runtime.CompilerServices;
using System.Text;
using Xunit;

namespace Bittern.Cli.Tests;

/// <summary>
/// Committed outputs. BITTERN_ACCEPT=1 rewrites them, and the diff is then read by a person; without it a missing or different file fails.
/// </summary>
internal static class Golden
{
    /// <summary>Top folder of the repository.</summary>
    public static string Repository { get; } = Find();

    public static bool Accepting { get; } =
        string.Equals(
            Environment.GetEnvironmentVariable("BITTERN_ACCEPT"),
            "1",
            StringComparison.Ordinal
        );

    /// <summary>Compares every file of a folder just written with the committed one, byte for byte.</summary>
    public static void Compare(string committed, string written, bool mayAccept = true)
    {
        if (Accepting && mayAccept)
        {
            if (Directory.Exists(committed))
            {
                Directory.Delete(committed, recursive: true);
            }

            foreach (var file in Files(written))
            {
                Directory.CreateDirectory(Path.GetDirectoryName(Path.Combine(committed, file))!);
                File.Copy(Path.Combine(written, file), Path.Combine(committed, file));
            }

            return;
        }

        Assert.Equal(Files(committed), Files(written));
        foreach (var file in Files(written))
        {
            var expected = File.ReadAllBytes(Path.Combine(committed, file));
            var found = File.ReadAllBytes(Path.Combine(written, file));
            if (!expected.AsSpan().SequenceEqual(found))
            {
                Assert.Fail(
                    $"{file} differs; BITTERN_ACCEPT=1 dotnet test rewrites it.\n{FirstDifference(Encoding.UTF8.GetString(expected), Encoding.UTF8.GetString(found))}"
                );
            }
        }
    }

    private static string FirstDifference(string expected, string found)
    {
        var (a, b) = (expected.Split('\n'), found.Split('\n'));
        for (var i = 0; i < Math.Max(a.Length, b.Length); i++)
        {
            var (left, right) = (i < a.Length ? a[i] : "(end)", i < b.Length ? b[i] : "(end)");
            if (!string.Equals(left, right, StringComparison.Ordinal))
            {
                return $"line {i + 1}\n- {left}\n+ {right}";
            }
        }

        return "line ends differ";
    }

    private static List<string> Files(string folder) =>
        Directory.Exists(folder)
            ?
            [
                .. Directory
                    .EnumerateFiles(folder, "*", SearchOption.AllDirectories)
                    .Select(f => Path.GetRelativePath(folder, f).Replace('\\', '/'))
                    .Order(StringComparer.Ordinal),
            ]
            : [];

    private static string Find([CallerFilePath] string here = "")
    {
        var folder = Path.GetDirectoryName(here)!;
        while (!File.Exists(Path.Combine(folder, "Bittern.slnx")))
        {
            folder =
                Path.GetDirectoryName(folder)
                ?? throw new InvalidOperationException("the repository was not found");
        }

        return folder;
    }
}
