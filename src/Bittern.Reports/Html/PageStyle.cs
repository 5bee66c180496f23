using System.Reflection;

namespace Bittern.Reports.Html;

/// <summary>The page's own style sheet, carried inside the assembly.</summary>
internal static class PageStyle
{
    public static string Text { get; } = Read();

    private static string Read()
    {
        using var stream =
            Assembly.GetExecutingAssembly().GetManifestResourceStream("Bittern.Reports.report.css")
            ?? throw new InvalidOperationException("the style sheet is not inside the assembly");
        using var reader = new StreamReader(stream);
        return reader.ReadToEnd().Replace("\r\n", "\n", StringComparison.Ordinal);
    }
}
