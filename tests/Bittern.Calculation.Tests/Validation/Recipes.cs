using System.Globalization;
using System.Text;
using Bittern.Catalogue;
using Bittern.Diagnostics;
using Bittern.Language;

namespace Bittern.Calculation.Tests.Validation;

/// <summary>Recipe texts of the checks, and how they are run.</summary>
internal static class Recipes
{
    /// <summary>Water in contact with a solid, and with an atmosphere if one is given.</summary>
    /// <param name="solids">What may form, as in a <c>form</c> line; empty: nothing.</param>
    /// <param name="entries">What is in the water, enough for the solid to be left over; separated by semicolons.</param>
    /// <param name="celsius">Temperature.</param>
    /// <param name="air">Partial pressures as in an <c>atmosphere</c>; empty: closed.</param>
    public static string Equilibrium(
        string solids,
        string entries,
        double celsius = 25,
        string air = ""
    )
    {
        var text = Head(celsius);
        if (air.Length > 0)
        {
            text.Append("atmosphere above { ").Append(air).Append(" }\n\n");
        }

        text.Append("liquor water {\n    ")
            .Append(entries.Replace("; ", "\n    ", StringComparison.Ordinal))
            .Append("\n}\n\n");
        text.Append("train check {\n    feed water\n    stage equilibrium {\n");
        text.Append(air.Length > 0 ? "        contact above\n" : "");
        text.Append(solids.Length > 0 ? $"        form {solids}\n" : "");
        return text.Append("    }\n}\n").ToString();
    }

    /// <summary>The same closed water at several temperatures, a train for each.</summary>
    public static string Temperatures(
        string solids,
        string entries,
        params IEnumerable<double> celsius
    )
    {
        var text = Head(25);
        var number = 0;
        foreach (var temperature in celsius)
        {
            number++;
            text.Append(
                CultureInfo.InvariantCulture,
                $"liquor water-{number} {{\n    temperature {temperature} °C\n    "
            );
            text.Append(entries.Replace("; ", "\n    ", StringComparison.Ordinal));
            text.Append(
                CultureInfo.InvariantCulture,
                $"\n}}\n\ntrain at-{number} {{\n    feed water-{number}\n    stage equilibrium {{\n        form {solids}\n    }}\n}}\n\n"
            );
        }

        return text.ToString();
    }

    /// <summary>An acid liquor, its ferrous iron oxidised by air without carbon dioxide, titrated with sodium hydroxide.</summary>
    public static string Neutralisation(string solids, string entries, string target)
    {
        var text = Head(25).Append("liquor acid {\n    ");
        text.Append(entries.Replace("; ", "\n    ", StringComparison.Ordinal)).Append("\n}\n\n");
        text.Append("reagent caustic { NaOH 1 mol/L }\n\natmosphere air { O2 0.209 atm }\n\n");
        text.Append("train treatment {\n    feed acid\n    stage neutralisation {\n");
        text.Append(
            "        contact air\n        oxidise Fe(II) with O2\n        add caustic until "
        );
        return text.Append(target)
            .Append("\n        form ")
            .Append(solids)
            .Append("\n    }\n}\n")
            .ToString();
    }

    /// <summary>A liquor titrated with sodium hydroxide; one train for every target.</summary>
    public static string Titration(
        string solids,
        string entries,
        params IEnumerable<string> targets
    ) => Titration(25, solids, entries, targets);

    /// <summary>The same at another temperature.</summary>
    public static string Titration(
        double celsius,
        string solids,
        string entries,
        params IEnumerable<string> targets
    )
    {
        var text = Head(celsius);
        text.Append("liquor metal {\n    ")
            .Append(entries.Replace("; ", "\n    ", StringComparison.Ordinal))
            .Append("\n}\n\n");
        text.Append("reagent caustic { NaOH 1 mol/L }\n");
        var number = 0;
        foreach (var target in targets)
        {
            number++;
            text.Append(
                CultureInfo.InvariantCulture,
                $"\ntrain titration-{number} {{\n    feed metal\n    stage dosing {{\n        add caustic until {target}\n"
            );
            text.Append(solids.Length > 0 ? $"        form {solids}\n" : "").Append("    }\n}\n");
        }

        return text.ToString();
    }

    /// <summary>Binds and runs a recipe; a text with errors fails the test.</summary>
    public static Outcome Run(string text)
    {
        var read = RecipeReader.Read(new SourceText("check.bittern", text), Files);
        var errors = read
            .Diagnostics.Where(d => d.Severity == Severity.Error)
            .Select(d => $"{d.Code} {d.Span}: {d.What}")
            .ToList();
        if (read.Recipe is not { } recipe || errors.Count > 0)
        {
            throw new InvalidOperationException($"{string.Join('\n', errors)}\n\n{text}");
        }

        var outcome = RecipeRun.Execute(recipe, CancellationToken.None);
        return outcome.AllCertified
            ? outcome
            : throw new InvalidOperationException(
                $"{string.Join('\n', outcome.Diagnostics.Select(d => d.What))}\n\n{text}"
            );
    }

    private static StringBuilder Head(double celsius) =>
        new StringBuilder().Append(
            CultureInfo.InvariantCulture,
            $"recipe \"check\" {{\n    temperature {celsius} °C\n    activity davies\n}}\n\nuse catalogue {Catalogues}\n\n"
        );

    // All that may be used together: the brine set replaces the others' ion pairs by its own parameters.
    private static string Catalogues { get; } = string.Join(", ", ShippedCatalogue.IonAssociation);

    private static ShippedFiles Files { get; } = new();

    private sealed class ShippedFiles : IRecipeFiles
    {
        public IEnumerable<string> CatalogueNames => ShippedCatalogue.Names;

        public SourceText? Catalogue(string name) => ShippedCatalogue.Open(name);

        public SourceText? Include(string path, out string? fault)
        {
            fault = "a check includes no file";
            return null;
        }
    }
}
