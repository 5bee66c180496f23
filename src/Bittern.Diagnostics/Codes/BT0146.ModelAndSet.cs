namespace Bittern.Diagnostics.Codes;

/// <summary>BT0146: the activity model does not go with the constants.</summary>
public static class ModelAndSet
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0146",
            Severity.Warning,
            "The activity model does not go with the constants",
            "constants with ion pairs and a model that has pairing in its parameters count the same interaction twice, or not at all"
        )
        {
            Explanation = """
                Constants fitted with ion pairs go with `davies`, `debye-huckel` or `truesdell-jones`; constants without them with `pitzer` or `sit` and
                their parameters.
                """,
            Wrong = """
                recipe "x" { activity davies }
                set ion-interaction
                """,
            Right = """
                recipe "x" { activity pitzer }
                set ion-interaction
                """,
        };

    public static Diagnostic At(SourceSpan span, string model, string set) =>
        Descriptor.At(
            span,
            $"the activity model '{model}' is used with {set}",
            "choose the model that the catalogue is made for, or the catalogue that goes with the model"
        );
}
