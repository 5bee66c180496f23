namespace Bittern.Reports.Figures;

/// <summary>
/// Colours and dashes of curves: told apart by the colour-blind (after Okabe and Ito, darkened until text in them reads well on white) and, by their dashes, in grey print.
/// </summary>
internal static class CurveStyle
{
    private static readonly string[] Colours =
    [
        "#0072b2",
        "#b84a00",
        "#00785a",
        "#a3437a",
        "#000000",
        "#7a5c00",
        "#5b4fb5",
        "#4d5963",
    ];
    private static readonly string[] Dashes =
    [
        "",
        "7 3",
        "2 3",
        "10 3 2 3",
        "4 2",
        "14 4",
        "6 2 2 2 2 2",
        "1 4",
    ];
    private static readonly string[] Tints =
    [
        "#cfe3f0",
        "#f3ddcc",
        "#d3e8e1",
        "#ecd9e4",
        "#dcdcdc",
        "#e9e2cc",
        "#dedcf0",
        "#e2e6e9",
    ];

    /// <summary>As many curves as can be told apart.</summary>
    public const int Most = 8;

    public static Stroke Line(int index) => new(Colours[index % Most], 1.8, Dashes[index % Most]);

    public static string Colour(int index) => Colours[index % Most];

    /// <summary>A light fill in the curve's hue; neighbours differ in lightness as well.</summary>
    public static string Tint(int index) => Tints[index % Most];
}
