using System.Globalization;
using System.Net;
using System.Text;

namespace Bittern.Reports.Figures;

/// <summary>
/// Collects SVG elements with text as text. Deterministic: coordinates to a tenth of a unit, invariant, in the order drawn. Mutable.
/// </summary>
internal sealed class SvgCanvas(double width, double height)
{
    private readonly StringBuilder _body = new();

    /// <summary>Fonts that look alike on all systems; the text stays text.</summary>
    private const string Font = "Liberation Sans, Arial, Helvetica, sans-serif";

    /// <summary>
    /// Room for a name of a curve. Advance widths of Helvetica average half the size in lower case; a little more keeps wide names inside.
    /// </summary>
    public static double WidthOf(string text) => text.Length * NameSize * 0.55;

    /// <summary>Size of the names of curves.</summary>
    public const double NameSize = 12;

    public void Line(double x1, double y1, double x2, double y2, Stroke stroke) =>
        _body.Append($"<path d=\"M{N(x1)} {N(y1)}L{N(x2)} {N(y2)}\" {stroke.Attributes()}/>\n");

    /// <summary>An open line through points; fewer than two draw nothing.</summary>
    public void Polyline(IReadOnlyList<(double X, double Y)> points, Stroke stroke)
    {
        if (points.Count > 1)
        {
            _body.Append(
                $"<path d=\"{Path(points)}\" {stroke.Attributes()} stroke-linejoin=\"round\"/>\n"
            );
        }
    }

    public void Area(IReadOnlyList<(double X, double Y)> points, string fill)
    {
        if (points.Count > 2)
        {
            _body.Append($"<path d=\"{Path(points)}Z\" fill=\"{fill}\"/>\n");
        }
    }

    public void Dot(double x, double y, string fill) =>
        _body.Append($"<circle cx=\"{N(x)}\" cy=\"{N(y)}\" r=\"3\" fill=\"{fill}\"/>\n");

    /// <summary>A line of text.</summary>
    /// <param name="x">Anchor.</param>
    /// <param name="y">Base line.</param>
    /// <param name="text">Plain text.</param>
    /// <param name="style">Size, anchor, weight, colour.</param>
    public void Text(double x, double y, string text, TextStyle style)
    {
        var turn = style.Upright ? $" transform=\"rotate(-90 {N(x)} {N(y)})\"" : "";
        _body.Append(
            $"<text x=\"{N(x)}\" y=\"{N(y)}\" font-size=\"{N(style.Size)}\" text-anchor=\"{style.Anchor}\" fill=\"{style.Fill}\"{(style.Bold ? " font-weight=\"bold\"" : "")}{turn}>{WebUtility.HtmlEncode(text)}</text>\n"
        );
    }

    /// <summary>The document; its title and description are read out by screen readers.</summary>
    public string Document(string title, string description) =>
        $"<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 {N(width)} {N(height)}\" width=\"{N(width)}\" height=\"{N(height)}\" role=\"img\" aria-label=\"{WebUtility.HtmlEncode(title + ". " + description)}\" font-family=\"{Font}\">\n"
        + $"<title>{WebUtility.HtmlEncode(title)}</title>\n<desc>{WebUtility.HtmlEncode(description)}</desc>\n"
        + $"<rect width=\"{N(width)}\" height=\"{N(height)}\" fill=\"#ffffff\"/>\n"
        + _body
        + "</svg>\n";

    private static string Path(IReadOnlyList<(double X, double Y)> points)
    {
        var path = new StringBuilder();
        for (var i = 0; i < points.Count; i++)
        {
            path.Append(i == 0 ? 'M' : 'L')
                .Append(N(points[i].X))
                .Append(' ')
                .Append(N(points[i].Y));
        }

        return path.ToString();
    }

    private static string N(double value) =>
        (Math.Round(value, 1) + 0.0).ToString("0.#", CultureInfo.InvariantCulture);
}

/// <summary>How a line is drawn.</summary>
/// <param name="Colour">Hexadecimal.</param>
/// <param name="Width">Units.</param>
/// <param name="Dash">Dash pattern; empty for a whole line.</param>
internal sealed record Stroke(string Colour, double Width = 1, string Dash = "")
{
    public string Attributes() =>
        string.Create(
            CultureInfo.InvariantCulture,
            $"fill=\"none\" stroke=\"{Colour}\" stroke-width=\"{Width:0.#}\"{(Dash.Length == 0 ? "" : $" stroke-dasharray=\"{Dash}\"")}"
        );
}

/// <summary>How a text is set.</summary>
internal sealed record TextStyle(
    double Size = 12,
    string Anchor = "start",
    string Fill = "#1b2126",
    bool Bold = false,
    bool Upright = false
);
