namespace Bittern.Diagnostics.Codes;

/// <summary>BT0170: declared and not used.</summary>
public static class Unused
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0170",
            Severity.Warning,
            "Declared and not used",
            "most often a line was forgotten or a name misspelt"
        )
        {
            Explanation = """
                A liquor that no train is fed with, a reagent that is never dosed, or an atmosphere that nothing touches.
                """,
            Wrong = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                reagent soda { Na2CO3 100 g/L }
                train t { feed pond }
                """,
            Right = """
                use catalogue major
                liquor pond { Ca 5 mg/L }
                train t { feed pond }
                """,
        };

    public static Diagnostic At(SourceSpan span, string kind, string name) =>
        Descriptor.At(span, $"the {kind} '{name}' is not used", "use it or delete it");
}
