namespace Bittern.Reports;

/// <summary>A figure of a report.</summary>
/// <param name="Name">File name without folder, e.g. <c>treatment-primary.svg</c>; unique within a report.</param>
/// <param name="Svg">A whole SVG document without XML header, fit to stand in a file or inside HTML: no script, no style sheet, no identifiers that could collide.</param>
/// <param name="Caption">What it shows, a sentence.</param>
public sealed record Figure(string Name, string Svg, string Caption);
