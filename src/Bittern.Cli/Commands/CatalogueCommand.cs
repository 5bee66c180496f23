using System.CommandLine;
using System.Globalization;
using Bittern.Catalogue;
using Bittern.Chemistry;
using Bittern.Cli.Files;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Rendering;

namespace Bittern.Cli.Commands;

/// <summary><c>bittern catalogue</c>: looks up constants, and compares one's own with the shipped ones.</summary>
internal static class CatalogueCommand
{
    public static Command Create(Terminal terminal)
    {
        var words = new Argument<string[]>("words")
        {
            Description =
                "Elements (Ca), parts of a name, formula, domain or source (hydroxide, nordstrom); an entry must fit all of them. Without words: the domains.",
            Arity = ArgumentArity.ZeroOrMore,
        };
        var command = new Command(
            "catalogue",
            """
            Search the constants that are shipped.

            Examples:
              bittern catalogue                      the domains
              bittern catalogue Zn hydroxide         the hydroxides of zinc
              bittern catalogue show gypsum          everything about one entry, with its source
              bittern catalogue check site.bittern   own constants against each other and against the catalogue
            """
        )
        {
            words,
            ShowCommand(terminal),
            OwnCommand(terminal),
        };
        command.SetAction(parsed => Find(parsed.GetValue(words) ?? [], terminal));
        return command;
    }

    private static Command ShowCommand(Terminal terminal)
    {
        var name = new Argument<string>("name")
        {
            Description = "A solid's name or a formula: gypsum, \"CaSO4*2H2O\", \"Zn(OH)4^2-\".",
        };
        var command = new Command("show", "Everything about one entry.") { name };
        command.SetAction(parsed =>
            Show(CatalogueIndex.Shipped(), parsed.GetValue(name)!, terminal)
        );
        return command;
    }

    private static Command OwnCommand(Terminal terminal)
    {
        var file = new Argument<string>("file") { Description = "A file of constants (.bittern)." };
        var command = new Command(
            "check",
            "Compare own constants with each other and with the catalogue."
        )
        {
            file,
        };
        command.SetAction(parsed => Own(parsed.GetValue(file)!, terminal));
        return command;
    }

    private static int Find(string[] words, Terminal terminal)
    {
        var index = CatalogueIndex.Shipped();
        if (words.Length > 0)
        {
            terminal.Out.Write(
                CatalogueListing.Render(CatalogueSearch.Find(index, string.Join(' ', words)))
            );
            return ExitCode.Done;
        }

        foreach (var domain in ShippedCatalogue.Names)
        {
            var constants = index.Entries.Count(e =>
                e.Constant is not null && string.Equals(e.Domain, domain, StringComparison.Ordinal)
            );
            var parameters = index.Parameters.Count(p =>
                string.Equals(p.Domain, domain, StringComparison.Ordinal)
            );
            var counts = string.Join(
                ", ",
                new[]
                {
                    Count(constants, "constant"),
                    Count(parameters, "activity parameter"),
                }.OfType<string>()
            );
            terminal.Out.WriteLine($"{domain, -22} {counts}");
        }

        return ExitCode.Done;
    }

    private static string? Count(int count, string what) =>
        count == 0
            ? null
            : string.Create(
                CultureInfo.InvariantCulture,
                $"{count} {what}{(count == 1 ? "" : "s")}"
            );

    /// <summary>Prints every entry of a name, or says what comes near.</summary>
    public static int Show(CatalogueIndex index, string name, Terminal terminal)
    {
        var entries = CatalogueSearch.Named(index, name);
        if (entries.IsEmpty)
        {
            var near = EditDistance.Closest(name, index.Entries.Select(e => e.Name));
            terminal.Error.WriteLine(
                $"The catalogue has no '{name}'."
                    + (
                        near is null
                            ? " Search it: bittern catalogue WORDS"
                            : $" Did you mean '{near}'?"
                    )
            );
            return ExitCode.Usage;
        }

        terminal.Out.Write(string.Join('\n', entries.Select(e => CatalogueCard.Render(index, e))));
        return ExitCode.Done;
    }

    private static int Own(string path, Terminal terminal)
    {
        if (RecipeFolder.Read(path, path, out var fault) is not { } text)
        {
            terminal.Error.WriteLine($"'{path}' cannot be read: {fault}");
            return ExitCode.Usage;
        }

        var own = CatalogueIndex.Read(
            [text],
            new RecipeFolder(path, Path.GetDirectoryName(path) ?? "")
        );
        terminal.Out.Write(TextRenderer.Render(own.Diagnostics));
        if (own.Diagnostics.Any(d => d.Severity == Severity.Error))
        {
            return ExitCode.RecipeWrong;
        }

        var findings = CatalogueCheck
            .Within(own)
            .AddRange(CatalogueCheck.Against(own, CatalogueIndex.Shipped()));
        foreach (var finding in findings)
        {
            terminal.Out.WriteLine(
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"{path}:{finding.Entry.Line + 1}: {finding.Entry.Name}: {finding.What}"
                )
            );
        }

        terminal.Out.WriteLine(
            $"{path}: {Count(own.Entries.Length, "declaration") ?? "no declarations"}, {Count(findings.Length, "remark") ?? "no remarks"}"
        );
        return ExitCode.Done;
    }
}
