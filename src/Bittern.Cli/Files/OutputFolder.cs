using System.Text;

namespace Bittern.Cli.Files;

/// <summary>
/// Writes a folder whole or not at all: everything goes to a new folder beside it, which then takes its place.
/// </summary>
public static class OutputFolder
{
    // What a report folder may hold. Anything else in it is somebody's work and keeps the folder from being replaced.
    private static readonly string[] Ours =
    [
        "report.md",
        "report.html",
        "results.json",
        "figures",
        "tables",
    ];

    /// <summary>
    /// Replaces <paramref name="folder"/> by one with these files (relative path with forward slashes, text). A folder that holds
    /// anything that is no part of a report is not touched.
    /// </summary>
    /// <exception cref="IOException">The folder cannot be written, or holds something that is not ours.</exception>
    public static void Write(
        string folder,
        IReadOnlyList<(string Path, string Text)> files,
        CancellationToken cancellation
    )
    {
        var full = Path.GetFullPath(folder);
        if (File.Exists(full))
        {
            throw new IOException($"'{folder}' is a file");
        }

        if (Stranger(full) is { } stranger)
        {
            throw new IOException(
                $"'{folder}' holds '{stranger}', which is no part of a report; choose another --out"
            );
        }

        var parent =
            Path.GetDirectoryName(full)
            ?? throw new IOException($"'{folder}' is no folder that can be replaced");
        Directory.CreateDirectory(parent);
        var id = Environment.ProcessId.ToString(System.Globalization.CultureInfo.InvariantCulture);
        var fresh = full + ".new-" + id;
        var old = full + ".old-" + id;
        try
        {
            foreach (var (path, text) in files)
            {
                cancellation.ThrowIfCancellationRequested();
                var file = Path.Combine(fresh, path);
                Directory.CreateDirectory(Path.GetDirectoryName(file)!);
                File.WriteAllText(
                    file,
                    text,
                    new UTF8Encoding(encoderShouldEmitUTF8Identifier: false)
                );
            }

            cancellation.ThrowIfCancellationRequested();
            if (Directory.Exists(full))
            {
                Directory.Move(full, old);
            }

            Directory.Move(fresh, full);
        }
        catch
        {
            if (!Directory.Exists(full) && Directory.Exists(old))
            {
                Directory.Move(old, full);
            }

            throw;
        }
        finally
        {
            Delete(fresh);
            Delete(old);
        }
    }

    private static string? Stranger(string folder) =>
        Directory.Exists(folder)
            ? Directory
                .EnumerateFileSystemEntries(folder)
                .Select(e => Path.GetFileName(e)!)
                .Order(StringComparer.Ordinal)
                .FirstOrDefault(n => !Ours.Contains(n, StringComparer.Ordinal))
            : null;

    private static void Delete(string folder)
    {
        if (Directory.Exists(folder))
        {
            Directory.Delete(folder, recursive: true);
        }
    }
}
