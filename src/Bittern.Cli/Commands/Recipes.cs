using Bittern.Cli.Files;
using Bittern.Diagnostics;
using Bittern.Language;

namespace Bittern.Cli.Commands;

/// <summary>Opens and reads the recipe that a command names.</summary>
internal static class Recipes
{
    /// <summary>The recipe read; null when its file cannot be read, which has been said.</summary>
    /// <param name="path">Where it lies.</param>
    /// <param name="name">
    /// What messages and reports call it. A report's name has no folder, so that the same recipe gives the same bytes wherever it lies; an editor needs the path.
    /// </param>
    /// <param name="terminal">Where faults are said.</param>
    public static ReadResult? Read(string path, string name, Terminal terminal)
    {
        if (!File.Exists(path))
        {
            terminal.Error.WriteLine(
                Directory.Exists(path)
                    ? $"'{path}' is a folder; name the .bittern file in it."
                    : $"There is no file '{path}'."
            );
            return null;
        }

        if (RecipeFolder.Read(path, name, out var fault) is not { } source)
        {
            terminal.Error.WriteLine($"'{path}' cannot be read: {fault}");
            return null;
        }

        return RecipeReader.Read(source, new RecipeFolder(path, Path.GetDirectoryName(name) ?? ""));
    }

    /// <summary>True for what belongs on the screen: notes are for reports.</summary>
    public static bool IsWorthSaying(Diagnostic diagnostic) => diagnostic.Severity != Severity.Note;
}
