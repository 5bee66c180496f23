using Bittern.Chemistry;

namespace Bittern.Calculation.Tests.Validation;

/// <summary>Numbers that the checks read off an outcome.</summary>
internal static class Readings
{
    public static double PH(Outcome outcome) => End(outcome).PH;

    /// <summary>Dissolved total of a basis species, mol per kg of water.</summary>
    public static Func<Outcome, double> Molality(string basis) =>
        outcome => Moles(End(outcome), basis) / End(outcome).WaterKilograms;

    /// <summary>Dissolved total of a basis species, mol/L.</summary>
    public static Func<Outcome, double> Molarity(string basis) =>
        outcome => PerLitre(End(outcome), basis);

    /// <summary>What is dissolved of a substance, mg/L, counted by a basis species of which one formula unit holds <paramref name="units"/>.</summary>
    public static Func<Outcome, double> MilligramsPerLitre(
        string substance,
        string basis,
        double units = 1
    ) =>
        outcome =>
            PerLitre(End(outcome), basis)
            / units
            * FormulaReader.Standard.Read(substance).MolarMass
            * 1000;

    /// <summary>The same in g/L.</summary>
    public static Func<Outcome, double> GramsPerLitre(
        string substance,
        string basis,
        double units = 1
    ) => outcome => MilligramsPerLitre(substance, basis, units)(outcome) / 1000;

    /// <summary>The same in g per kg of water.</summary>
    public static Func<Outcome, double> GramsPerKilogram(
        string substance,
        string basis,
        double units = 1
    ) =>
        outcome =>
            Molality(basis)(outcome) / units * FormulaReader.Standard.Read(substance).MolarMass;

    /// <summary>pH at which a solid first saturates while the reagent is dosed.</summary>
    public static Func<Outcome, double> OnsetPH(string solid) =>
        outcome =>
            outcome
                .Trains[0]
                .Stages[0]
                .Onsets.Single(o => string.Equals(o.Solid.Name, solid, StringComparison.Ordinal))
                .PH;

    /// <summary>pH of the train with the least dissolved metal, the grid's nearest three points joined by a parabola.</summary>
    public static Func<Outcome, double> PHOfMinimum(params string[] basis) =>
        outcome =>
        {
            var points = outcome
                .Trains.Select(t =>
                    (
                        t.Stages[0].End.PH,
                        Log: Math.Log10(basis.Sum(b => PerLitre(t.Stages[0].End, b)))
                    )
                )
                .ToList();
            var least = Enumerable.Range(0, points.Count).MinBy(i => points[i].Log);
            if (least == 0 || least == points.Count - 1)
            {
                throw new InvalidOperationException(
                    $"no minimum between pH {points[0].PH} and {points[^1].PH}"
                );
            }

            var (x0, y0) = points[least - 1];
            var (x1, y1) = points[least];
            var (x2, y2) = points[least + 1];
            var left = (x1 - x0) * (y1 - y2);
            var right = (x1 - x2) * (y1 - y0);
            return x1 - ((((x1 - x0) * left) - ((x1 - x2) * right)) / (2 * (left - right)));
        };

    /// <summary>Molality of a species at the end of the first stage, mol/kg.</summary>
    public static double SpeciesMolality(Outcome outcome, string species) =>
        End(outcome)
            .Species.Single(s =>
                string.Equals(s.Species.Formula.Text, species, StringComparison.Ordinal)
            )
            .Molality;

    private static SolvedState End(Outcome outcome) => outcome.Trains[0].Stages[0].End;

    private static double Moles(SolvedState state, string basis) =>
        state
            .DissolvedTotals.Single(t =>
                string.Equals(t.Species.Text, basis, StringComparison.Ordinal)
            )
            .Coefficient;

    private static double PerLitre(SolvedState state, string basis) =>
        Moles(state, basis) / state.Volume / 1000;
}
