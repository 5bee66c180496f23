using System.Globalization;

namespace Bittern.Cli.Tests;

/// <summary>What one command left behind.</summary>
internal sealed record Finished(int Code, string Out, string Error);

/// <summary>A folder of its own with recipes in it, and commands run on them as the shell would.</summary>
internal sealed class CommandLine : IDisposable
{
    public string Folder { get; } = Directory.CreateTempSubdirectory("bittern-cli-").FullName;

    /// <summary>Writes a file below the folder and gives its path.</summary>
    public string File(string name, string text)
    {
        var path = Path.Combine(Folder, name);
        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        System.IO.File.WriteAllText(path, text);
        return path;
    }

    /// <summary>Everything below the folder, relative, in ordinal order.</summary>
    public IReadOnlyList<string> Everything() =>
        [
            .. Directory
                .EnumerateFileSystemEntries(Folder, "*", SearchOption.AllDirectories)
                .Select(e => Path.GetRelativePath(Folder, e).Replace('\\', '/'))
                .Order(StringComparer.Ordinal),
        ];

    /// <summary>Runs a command in this process.</summary>
    public static Finished Run(params string[] arguments)
    {
        using var output = new StringWriter(CultureInfo.InvariantCulture);
        using var error = new StringWriter(CultureInfo.InvariantCulture);
        var code = Program.Run(arguments, new Terminal(output, error));
        return new Finished(code, output.ToString(), error.ToString());
    }

    public void Dispose() => Directory.Delete(Folder, recursive: true);
}
