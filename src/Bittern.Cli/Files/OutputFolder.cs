using System.Text;

namespace Bittern.Cli.Files;

/// <summary>
/// Writes a folder whole or not at all: everything goes to a new folder beside it, which then takes its place.
/// </summary>
public static class OutputFolder
{
    private const string Marker = "report.md";

    /// <summary>
    /// Replaces <paramref name="folder"/> by one with these files (relative path with forward slashes, text). A folder that holds something else than an
    /// earlier report is not touched.
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

        if (
            Directory.Exists(full)
            && Directory.EnumerateFileSystemEntries(full).Any()
            && !File.Exists(Path.Combine(full, Marker))
        )
        {
            throw new IOException($"'{folder}' exists and holds no report; choose another --out");
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

    private static void Delete(string folder)
    {
        if (Directory.Exists(folder))
        {
            Directory.Delete(folder, recursive: true);
        }
    }
}
