using System.Collections.Immutable;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Rendering;
using Bittern.Model;
using Xunit;

namespace Bittern.Language.Tests;

/// <summary>Reads snippets for tests, with the shipped catalogues at hand.</summary>
internal static class Check
{
    public static ReadResult Read(string text, IRecipeFiles? files = null) =>
        RecipeReader.Read(new SourceText("recipe.bittern", text), files ?? ShippedFiles.Only);

    /// <summary>The recipe, which must have no error.</summary>
    public static Recipe Bound(string text, IRecipeFiles? files = null)
    {
        var result = Read(text, files);
        Assert.True(result.Recipe is not null, TextRenderer.Render(result.Diagnostics));
        return result.Recipe!;
    }

    /// <summary>The recipe, which must have neither error nor warning.</summary>
    public static Recipe Clean(string text, IRecipeFiles? files = null)
    {
        var result = Read(text, files);
        Assert.True(
            result.Diagnostics.All(d => d.Severity == Severity.Note),
            TextRenderer.Render(result.Diagnostics)
        );
        return result.Recipe!;
    }

    /// <summary>Codes and places of errors and warnings, <c>BT0150 at 5 mg</c>, in order.</summary>
    public static ImmutableArray<string> Mistakes(string text, IRecipeFiles? files = null) =>
        [
            .. Read(text, files)
                .Diagnostics.Where(d => d.Severity != Severity.Note)
                .Select(d => $"{d.Code} at {d.Span?.Text}"),
        ];
}
