using Bittern.Diagnostics;
using Bittern.Language.Binding;

namespace Bittern.Language;

/// <summary>Reads recipes.</summary>
public static class RecipeReader
{
    /// <summary>
    /// Reads a recipe and everything it uses. Never throws on what a text holds: every mistake is a diagnostic, all in one pass, in the order of the text.
    /// </summary>
    public static ReadResult Read(SourceText recipe, IRecipeFiles files) =>
        RecipeBinder.Bind(recipe, files);
}
