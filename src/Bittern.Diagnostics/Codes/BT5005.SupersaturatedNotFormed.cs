using System.Globalization;

namespace Bittern.Diagnostics.Codes;

/// <summary>BT5005: a solid is supersaturated at the end of a stage that does not let it form.</summary>
public static class SupersaturatedNotFormed
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT5005",
            Severity.Note,
            "Supersaturated solid left out",
            "if it forms after all, less stays dissolved and more sludge or scale is made than reported"
        )
        {
            Explanation = """
                Only solids listed under `form` may precipitate; everything else is watched. A solid with Ω > 1 that may not form is either slow (then say so with
                `hold back … because`) or was forgotten (then list it).
                """,
            Wrong = """
                recipe "Gypsum forgotten" { activity davies }
                use catalogue major, salts
                liquor a { Ca 2 g/L; SO4 5 g/L; charge closed by SO4 }
                train t {
                    feed a
                    stage one { form calcite }
                }
                """,
            Right = """
                recipe "Gypsum listed" { activity davies }
                use catalogue major, salts
                liquor a { Ca 2 g/L; SO4 5 g/L; charge closed by SO4 }
                train t {
                    feed a
                    stage one { form gypsum }
                }
                """,
            NeedsRun = true,
        };

    /// <summary>The diagnostic at a place.</summary>
    /// <param name="span">The stage.</param>
    /// <param name="solid">Name of the solid.</param>
    /// <param name="stage">Name of the stage.</param>
    /// <param name="index">Saturation index, log10 Ω.</param>
    public static Diagnostic At(SourceSpan? span, string solid, string stage, double index) =>
        Descriptor.At(
            span,
            string.Create(
                CultureInfo.InvariantCulture,
                $"'{solid}' is supersaturated at the end of stage '{stage}' (SI {index:0.00}) and is not allowed to form there"
            ),
            $"list '{solid}' under 'form', or say why not with 'hold back {solid} because \"…\"'"
        );
}
