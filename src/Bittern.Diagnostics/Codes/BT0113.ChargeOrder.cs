namespace Bittern.Diagnostics.Codes;

/// <summary>BT0113: a charge written sign first.</summary>
public static class ChargeOrder
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0113",
            Severity.Error,
            "A charge written sign first",
            "the number could belong to the charge or to the reaction"
        )
        {
            Explanation = """
                A charge of one is `+` or `-` behind the formula; a higher one has a caret, the number and then the sign: `Na+`, `Ca^2+`, `SO4^2-`.
                """,
            Wrong = """
                ion Ca+2
                """,
            Right = """
                ion Ca^2+
                """,
        };

    public static Diagnostic At(SourceSpan span, string better) =>
        Descriptor.At(
            span,
            $"'{span.Text}' has the sign before the number",
            $"write the charge as {better}"
        );
}
