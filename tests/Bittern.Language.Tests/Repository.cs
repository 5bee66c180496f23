using System.Runtime.CompilerServices;
using System.Text;
using Xunit;

namespace Bittern.Language.Tests;

/// <summary>Committed texts. BITTERN_ACCEPT=1 rewrites them, and the diff is then read by a person.</summary>
internal static class Repository
{
    public static string Root { get; } = Find();

    public static bool Accepting { get; } =
        string.Equals(
            Environment.GetEnvironmentVariable("BITTERN_ACCEPT"),
            "1",
            StringComparison.Ordinal
        );

    /// <summary>Compares a text with the committed file of that path below the root.</summary>
    public static void Holds(string path, string text)
    {
        var full = Path.Combine(Root, path);
        if (Accepting)
        {
            Directory.CreateDirectory(Path.GetDirectoryName(full)!);
            File.WriteAllText(full, text, new UTF8Encoding(false));
            return;
        }

        Assert.True(
            File.Exists(full),
            $"{path} is missing; BITTERN_ACCEPT=1 dotnet test writes it"
        );
        Assert.Equal(File.ReadAllText(full, Encoding.UTF8), text);
    }

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
