using System.Text;

namespace Bittern.Diagnostics.Rendering;

/// <summary>The page of a code as Markdown, the same for the documentation, <c>bittern explain</c> and editors.</summary>
public static class CodePage
{
    /// <summary>The page.</summary>
    public static string Render(DiagnosticDescriptor code)
    {
        var page = new StringBuilder()
            .Append($"# {code.Id}: {code.Title}\n\n")
            .Append($"**{Word(code.Severity)}.** {Sentence(code.Why)}\n\n")
            .Append(code.Explanation.ReplaceLineEndings("\n"))
            .Append('\n');
        if (code.NeedsRun)
        {
            page.Append(
                "\nOnly a calculation finds it: `bittern run` reports it, `bittern check` does not.\n"
            );
        }

        Example(page, "Wrong", code.Wrong);
        Example(page, "Right", code.Right);
        return page.ToString();
    }

    /// <summary>The list of all codes.</summary>
    public static string Index()
    {
        var page = new StringBuilder(
            "# What the messages mean\n\nEvery message has a code that never changes its meaning. `bittern explain CODE` shows the same page on the command line.\n\n"
                + "| code | | what it is about |\n|---|---|---|\n"
        );
        foreach (var code in DiagnosticCatalogue.All)
        {
            page.Append(
                $"| [{code.Id}]({code.Id}.md) | {Word(code.Severity).ToLowerInvariant()} | {code.Title} |\n"
            );
        }

        return page.ToString();
    }

    private static void Example(StringBuilder page, string label, string recipe)
    {
        if (recipe.Length > 0)
        {
            page.Append($"\n{label}:\n\n```bittern\n")
                .Append(recipe.ReplaceLineEndings("\n").TrimEnd('\n'))
                .Append("\n```\n");
        }
    }

    private static string Sentence(string clause) =>
        $"{char.ToUpperInvariant(clause[0])}{clause[1..]}.";

    private static string Word(Severity severity) =>
        severity switch
        {
            Severity.Error => "Error",
            Severity.Warning => "Warning",
            _ => "Note",
        };
}
