namespace Bittern.Reports.Figures;

/// <summary>Sets the names of curves beside their right ends and moves them apart where they would overlap.</summary>
internal static class EndLabels
{
    private const double Pitch = 14;

    /// <summary>Draws them, each in its curve's colour, with a thin line to a curve that it had to leave.</summary>
    /// <param name="canvas">Where.</param>
    /// <param name="labels">Place of each curve's end, its name and colour.</param>
    /// <param name="x">Right edge of the plot.</param>
    /// <param name="top">Highest base line.</param>
    /// <param name="bottom">Lowest base line.</param>
    public static void Draw(
        SvgCanvas canvas,
        IEnumerable<(double Y, string Text, string Colour)> labels,
        double x,
        double top,
        double bottom
    )
    {
        var sorted = labels.OrderBy(l => l.Y).ThenBy(l => l.Text, StringComparer.Ordinal).ToArray();
        var places = sorted.Select(l => l.Y + 4).ToArray();
        for (var i = 1; i < places.Length; i++)
        {
            places[i] = Math.Max(places[i], places[i - 1] + Pitch);
        }

        if (places.Length > 0)
        {
            places[^1] = Math.Min(places[^1], bottom);
        }

        for (var i = places.Length - 2; i >= 0; i--)
        {
            places[i] = Math.Min(places[i], places[i + 1] - Pitch);
        }

        for (var i = 0; i < places.Length; i++)
        {
            places[i] = Math.Max(places[i], top + (i * Pitch));
            var (y, text, colour) = sorted[i];
            if (Math.Abs(places[i] - 4 - y) > 3)
            {
                canvas.Line(x + 1, y, x + 9, places[i] - 4, new Stroke(colour, 0.7));
            }

            canvas.Text(x + 11, places[i], text, new TextStyle(SvgCanvas.NameSize, Fill: colour));
        }
    }
}
