using System.Text;
using Markdig.Syntax.Inlines;

namespace Bittern.Reports.Html;

/// <summary>The words of inline Markdown without its markup.</summary>
internal static class PlainText
{
    public static string Of(ContainerInline? inline)
    {
        var text = new StringBuilder();
        Append(text, inline);
        return text.ToString().Trim();
    }

    private static void Append(StringBuilder text, ContainerInline? container)
    {
        if (container is null)
        {
            return;
        }

        foreach (var child in container)
        {
            switch (child)
            {
                case LiteralInline literal:
                    text.Append(literal.Content.AsSpan());
                    break;
                case CodeInline code:
                    text.Append(code.Content);
                    break;
                case LineBreakInline:
                    text.Append(' ');
                    break;
                case HtmlEntityInline entity:
                    text.Append(entity.Transcoded.AsSpan());
                    break;
                case ContainerInline inner:
                    Append(text, inner);
                    break;
                default:
                    break;
            }
        }
    }
}
