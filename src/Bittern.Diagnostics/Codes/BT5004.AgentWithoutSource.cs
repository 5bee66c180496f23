namespace Bittern.Diagnostics.Codes;

/// <summary>BT5004: an oxidation or reduction by a gas in a stage that touches no atmosphere with that gas.</summary>
public static class AgentWithoutSource
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT5004",
            Severity.Warning,
            "Gas conversion without an atmosphere",
            "the agent is taken to be at hand in whatever amount is needed, and nothing in the recipe supplies it"
        )
        {
            Explanation = """
                `oxidise Fe(II) with O2` uses oxygen by stoichiometric need. When the stage is in contact with an atmosphere that holds the gas, the gas comes from
                there. Without such a contact, and without the gas dissolved in the liquor, the recipe leaves open where it comes from; the report states how much
                is needed.
                """,
            Wrong = """
                recipe "Where does the oxygen come from?" { activity davies }
                use catalogue major, metals, redox
                liquor seep { pH 6.5; Fe(II) 20 mg/L; Cl 26 mg/L; charge closed by Cl }
                train t {
                    feed seep
                    stage one {
                        oxidise Fe(II) with O2
                        form ferrihydrite
                    }
                }
                """,
            Right = """
                recipe "Oxygen from the air" { activity davies }
                use catalogue major, metals, redox
                liquor seep { pH 6.5; Fe(II) 20 mg/L; Cl 26 mg/L; charge closed by Cl }
                atmosphere air { O2 0.209 atm }
                train t {
                    feed seep
                    stage one {
                        contact air
                        oxidise Fe(II) with O2
                        form ferrihydrite
                    }
                }
                """,
        };

    /// <summary>The diagnostic at a place.</summary>
    /// <param name="span">The action.</param>
    /// <param name="stage">Name of the stage.</param>
    /// <param name="agent">The gas as written.</param>
    public static Diagnostic At(SourceSpan? span, string stage, string agent) =>
        Descriptor.At(
            span,
            $"stage '{stage}' converts with {agent} but is in contact with no atmosphere that holds {agent}",
            $"add 'contact' with an atmosphere that holds {agent} to the stage, or name the agent that is really dosed"
        );
}
