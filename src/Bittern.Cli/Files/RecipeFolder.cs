using System.Text;
using Bittern.Catalogue;
using Bittern.Diagnostics;
using Bittern.Language;

namespace Bittern.Cli.Files;

/// <summary>
/// The files that a recipe may read: its own folder and what lies below it, after links are followed. A recipe from a stranger reads nothing else.
/// </summary>
public sealed class RecipeFolder : IRecipeFiles
{
    /// <summary>Largest file that is read as a recipe or as part of one; the shipped catalogue is a twentieth of it.</summary>
    private const long LargestFile = 8 * 1024 * 1024;

    private readonly string _folder;
    private readonly string _shownFolder;

    /// <summary>The files beside a recipe.</summary>
    /// <param name="recipePath">Where the recipe lies.</param>
    /// <param name="shownFolder">How messages name the folder, put before the names of files in it; empty where a folder must not show.</param>
    public RecipeFolder(string recipePath, string shownFolder = "")
    {
        _folder = Real(Path.GetDirectoryName(Path.GetFullPath(recipePath))!);
        _shownFolder = shownFolder;
    }

    public IEnumerable<string> CatalogueNames => ShippedCatalogue.Names;

    public SourceText? Catalogue(string name) => ShippedCatalogue.Open(name);

    public SourceText? Include(string path, out string? fault)
    {
        fault = null;
        if (
            path.Length == 0
            || Path.IsPathRooted(path)
            || path.Contains('\\', StringComparison.Ordinal)
            || path.Contains(':', StringComparison.Ordinal)
            || path.Contains('\0', StringComparison.Ordinal)
        )
        {
            fault = "a path is relative to the recipe, with forward slashes";
            return null;
        }

        var full = Path.GetFullPath(Path.Combine(_folder, path));
        if (!File.Exists(full))
        {
            fault = Inside(full) ? "there is no such file" : "it lies outside the recipe's folder";
            return null;
        }

        if (!Inside(full) || !Inside(Real(full)))
        {
            fault = "it lies outside the recipe's folder";
            return null;
        }

        // One name for one file, however a recipe spells the way to it.
        return Read(
            full,
            Path.Combine(_shownFolder, Path.GetRelativePath(_folder, full)),
            out fault
        );
    }

    /// <summary>Reads a file under the name that messages show; null with the reason when it cannot be read.</summary>
    public static SourceText? Read(string file, string name, out string? fault)
    {
        fault = null;
        try
        {
            if (new FileInfo(file).Length > LargestFile)
            {
                fault = $"it is larger than {LargestFile / 1024 / 1024} MB";
                return null;
            }

            return new SourceText(name.Replace('\\', '/'), File.ReadAllText(file, Encoding.UTF8));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            fault = e.Message;
            return null;
        }
    }

    private bool Inside(string full) =>
        full.StartsWith(_folder + Path.DirectorySeparatorChar, StringComparison.Ordinal);

    // The path with every link in it followed.
    private static string Real(string path)
    {
        var root = Path.GetPathRoot(path)!;
        var real = root;
        foreach (
            var part in path[root.Length..]
                .Split(Path.DirectorySeparatorChar, StringSplitOptions.RemoveEmptyEntries)
        )
        {
            var next = Path.Combine(real, part);
            FileSystemInfo info = Directory.Exists(next)
                ? new DirectoryInfo(next)
                : new FileInfo(next);
            real = info.ResolveLinkTarget(returnFinalTarget: true)?.FullName ?? next;
        }

        return real;
    }
}
