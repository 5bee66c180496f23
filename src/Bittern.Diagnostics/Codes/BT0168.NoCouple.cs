namespace Bittern.Diagnostics.Codes;

/// <summary>BT0168: no couple for this conversion.</summary>
public static class NoCouple
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0168",
            Severity.Error,
            "No couple for this conversion",
            "an oxidation or reduction needs a half-reaction for each partner"
        )
        {
            Explanation = """
                `oxidise Fe(II) with O2` puts two half-reactions together so that electrons cancel: the one of iron and the one of oxygen. Both must be
                declared, here or in a catalogue.
                """,
            Wrong = """
                use catalogue major, metals
                liquor pond { Fe(II) 5 mg/L }
                train t { feed pond; stage s { oxidise Fe(II) with Cl } }
                """,
            Right = """
                use catalogue major, metals, redox
                liquor pond { Fe(II) 5 mg/L }
                train t { feed pond; stage s { oxidise Fe(II) with O2 } }
                """,
        };

    public static Diagnostic At(SourceSpan span, string name) =>
        Descriptor.At(
            span,
            $"there is no half-reaction that takes '{name}' here",
            "declare it with half-reaction, or use catalogue redox"
        );
}
