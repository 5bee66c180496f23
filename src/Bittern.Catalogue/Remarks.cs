using Bittern.Diagnostics;

namespace Bittern.Catalogue;

/// <summary>Comments of catalogue files that speak about the declaration below them.</summary>
internal static class Remarks
{
    private const string Mark = "//";

    /// <summary>The unbroken run of comment lines right above a declaration, joined; empty when there is none.</summary>
    public static string Above(SourceSpan declaration)
    {
        var source = declaration.Source;
        var lines = new List<string>();
        for (var line = source.Position(declaration.Start).Line - 1; line >= 0; line--)
        {
            var text = source.Line(line).Trim();
            if (!text.StartsWith(Mark, StringComparison.Ordinal))
            {
                break;
            }

            lines.Add(text[Mark.Length..].Trim());
        }

        lines.Reverse();
        return string.Join(' ', lines);
    }
}
