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
            Vertex([
                .. outcome.Trains.Select(t =>
                    (t.Stages[0].End.PH, Math.Log10(basis.Sum(b => PerLitre(t.Stages[0].End, b))))
                ),
            ]);

    /// <summary>Temperature, °C, of the train with the most dissolved, the grid's nearest three points joined by a parabola.</summary>
    public static Func<Outcome, double> TemperatureOfMaximum(string basis) =>
        outcome =>
            Vertex([
                .. outcome.Trains.Select(t =>
                    (
                        t.Stages[0].End.TemperatureCelsius,
                        -Moles(t.Stages[0].End, basis) / t.Stages[0].End.WaterKilograms
                    )
                ),
            ]);

    /// <summary>Temperature, °C, at which a solid that may not form saturates, between two trains joined by a line.</summary>
    public static Func<Outcome, double> TemperatureOfSaturation(string solid) =>
        outcome =>
        {
            var points = outcome
                .Trains.Select(t =>
                    (
                        X: t.Stages[0].End.TemperatureCelsius,
                        Y: t.Stages[0].Saturations.Single(s => Is(s.Solid.Name, solid)).Index
                    )
                )
                .ToList();
            var after = points.FindIndex(p => p.Y >= 0);
            if (after <= 0)
            {
                throw new InvalidOperationException($"'{solid}' does not saturate in the range");
            }

            var (x0, y0) = points[after - 1];
            var (x1, y1) = points[after];
            return x0 - (y0 * (x1 - x0) / (y1 - y0));
        };

    /// <summary>Molality of a basis species in the last train over that in the first.</summary>
    public static Func<Outcome, double> LastOverFirst(string basis) =>
        outcome =>
            Moles(outcome.Trains[^1].Stages[0].End, basis)
            / outcome.Trains[^1].Stages[0].End.WaterKilograms
            / (
                Moles(outcome.Trains[0].Stages[0].End, basis)
                / outcome.Trains[0].Stages[0].End.WaterKilograms
            );

    /// <summary>log10 of a dissolved gas's fugacity, bar.</summary>
    public static Func<Outcome, double> Log10Bar(string gas) =>
        outcome =>
        {
            var species = outcome.Recipe.Chemistry.Gases.Single(g => Is(g.Formula.Text, gas));
            var state = End(outcome);
            var sum = species.Log10FormationAt(state.TemperatureCelsius);
            foreach (var term in species.FromBasis)
            {
                sum +=
                    term.Coefficient
                    * (
                        term.Species.IsWater
                            ? Math.Log10(state.WaterActivity)
                            : Math.Log10(
                                state
                                    .Species.Single(s => s.Species.Formula.Equals(term.Species))
                                    .Activity
                            )
                    );
            }

            return sum + Math.Log10(PhysicalConstants.Atmosphere / 1e5);
        };

    /// <summary>Base that a titration took, mg/L as CaCO3 of feed, over an acidity in the same unit.</summary>
    public static Func<Outcome, double> BaseOver(double acidity) =>
        outcome =>
            outcome.Trains[0].Doses.Single().DryPerFeed
            * 1000
            / FormulaReader.Standard.Read("NaOH").MolarMass
            * FormulaReader.Standard.Read("CaCO3").MolarMass
            / 2
            / acidity;

    /// <summary>log10 K of a solid's written reaction at 25 °C.</summary>
    public static Func<Outcome, double> Constant(string solid) =>
        outcome =>
            outcome
                .Recipe.Chemistry.Solids.Single(s => Is(s.Name, solid))
                .Constant!.Log10AtCelsius(25);

    /// <summary>log10 of a complex's formation from the basis at 25 °C.</summary>
    public static Func<Outcome, double> Formation(string complex) =>
        outcome =>
            outcome
                .Recipe.Chemistry.Complexes.Single(s => Is(s.Formula.Text, complex))
                .Log10FormationAt(25);

    /// <summary>pe of a couple at unit activities and 25 °C: log10 K per electron of the half-reaction that makes <paramref name="reduced"/> from <paramref name="oxidised"/>.</summary>
    public static Func<Outcome, double> StandardPe(string oxidised, string reduced) =>
        outcome =>
        {
            var couple = outcome.Recipe.Chemistry.HalfReactions.Single(h =>
                h.Written.Left.Any(t => Is(t.Species.Text, oxidised))
                && h.Written.Right.Any(t => Is(t.Species.Text, reduced))
                && h.Written.Left.All(t =>
                    t.Species.Text is "e-" or "H+" || Is(t.Species.Text, oxidised)
                )
            );
            return couple.Constant.Log10AtCelsius(25) / couple.Electrons;
        };

    /// <summary>The same as a potential, V.</summary>
    public static Func<Outcome, double> StandardPotential(string oxidised, string reduced) =>
        outcome =>
            StandardPe(oxidised, reduced)(outcome)
            * Math.Log(10)
            * PhysicalConstants.GasConstant
            * PhysicalConstants.ReferenceKelvin
            / PhysicalConstants.Faraday;

    /// <summary>Molality of a species at the end of the first stage, mol/kg.</summary>
    public static double SpeciesMolality(Outcome outcome, string species) =>
        End(outcome)
            .Species.Single(s =>
                string.Equals(s.Species.Formula.Text, species, StringComparison.Ordinal)
            )
            .Molality;

    private static bool Is(string one, string other) =>
        string.Equals(one, other, StringComparison.Ordinal);

    private static SolvedState End(Outcome outcome) => outcome.Trains[0].Stages[0].End;

    // The lowest point and its two neighbours, joined by a parabola.
    private static double Vertex(IReadOnlyList<(double X, double Y)> points)
    {
        var least = Enumerable.Range(0, points.Count).MinBy(i => points[i].Y);
        if (least == 0 || least == points.Count - 1)
        {
            throw new InvalidOperationException(
                $"no extremum between {points[0].X} and {points[^1].X}"
            );
        }

        var (x0, y0) = points[least - 1];
        var (x1, y1) = points[least];
        var (x2, y2) = points[least + 1];
        var left = (x1 - x0) * (y1 - y2);
        var right = (x1 - x2) * (y1 - y0);
        return x1 - ((((x1 - x0) * left) - ((x1 - x2) * right)) / (2 * (left - right)));
    }

    private static double Moles(SolvedState state, string basis) =>
        state
            .DissolvedTotals.Single(t =>
                string.Equals(t.Species.Text, basis, StringComparison.Ordinal)
            )
            .Coefficient;

    private static double PerLitre(SolvedState state, string basis) =>
        Moles(state, basis) / state.Volume / 1000;
}
