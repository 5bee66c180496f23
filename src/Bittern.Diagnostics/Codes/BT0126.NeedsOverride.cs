namespace Bittern.Diagnostics.Codes;

/// <summary>BT0126: the catalogue has this already.</summary>
public static class NeedsOverride
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0126",
            Severity.Error,
            "The catalogue has this already",
            "a constant of the catalogue is replaced openly, with a reason, or not at all"
        )
        {
            Explanation = """
                What a catalogue declares is changed only by an `override` that repeats the whole reaction and gives a reason. The report lists the old
                value, the new one and the reason.
                """,
            Wrong = """
                use catalogue salts
                cite x "own"
                solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x]
                """,
            Right = """
                use catalogue salts
                cite x "own"
                override solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x] because "own titration"
                """,
        };

    public static Diagnostic At(SourceSpan span, string name, SourceSpan first) =>
        Descriptor.At(
            span,
            $"'{name}' is in the catalogue already",
            "put override before it and because \"reason\" behind it, or give it another name",
            new RelatedSpan(first, "the catalogue's entry")
        );
}
