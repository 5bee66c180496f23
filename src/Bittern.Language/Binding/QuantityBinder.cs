using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;
using Bittern.Language.Lexing;
using Bittern.Language.Syntax;
using Bittern.Model;

namespace Bittern.Language.Binding;

/// <summary>Binds quantities and conditions, with their units.</summary>
internal sealed class QuantityBinder(
    Analytes analytes,
    ImmutableArray<Species> species,
    List<Diagnostic> diagnostics
)
{
    private static readonly string[] Known =
    [
        "pH",
        "ionic-strength",
        "TDS",
        "dissolved",
        "total",
        "SI",
        "formed",
    ];

    public Condition? Condition(ConditionSyntax syntax)
    {
        var massLike = Values.UnitOf(syntax.Value.Unit).Dimension == Dimension.AmountPerVolume;
        if (
            Bind(syntax.Quantity, massLike) is not { } quantity
            || Limit(quantity, syntax.Value) is not { } value
        )
        {
            return null;
        }

        double? upper = null;
        if (syntax.Upper is { } high)
        {
            // The unit may stand behind the second bound only.
            var low =
                syntax.Value.Unit is null && high.Unit is not null
                    ? syntax.Value with
                    {
                        Unit = high.Unit,
                    }
                    : syntax.Value;
            (value, upper) = (Limit(quantity, low) ?? double.NaN, Limit(quantity, high));
            if (upper is null || value > upper)
            {
                diagnostics.Add(
                    OutOfBounds.At(syntax.Span, "the range", "from the lower to the upper bound")
                );
                return null;
            }
        }

        var comparison = syntax.Comparison.Kind switch
        {
            TokenKind.AtMost => Comparison.AtMost,
            TokenKind.AtLeast => Comparison.AtLeast,
            '<' => Comparison.Below,
            '>' => Comparison.Above,
            '=' => Comparison.Equal,
            _ => Comparison.Within,
        };
        var unit = Values.UnitOf(
            (syntax.Upper?.Unit is not null ? syntax.Upper : syntax.Value).Unit
        );
        return new Condition(
            quantity,
            comparison,
            value,
            upper,
            syntax.Span.Text,
            unit.Symbol,
            unit.SiFactor,
            syntax.Span
        );
    }

    private double? Limit(Quantity quantity, ValueSyntax value) =>
        quantity switch
        {
            Quantity.Dissolved { InMoles: true } => Values.Si(
                value,
                quantity.Name,
                "mmol/L",
                diagnostics,
                Dimension.AmountPerVolume
            ),
            Quantity.Dissolved or Quantity.Formed or Quantity.TotalDissolved => Values.Si(
                value,
                quantity.Name,
                "mg/L or g/m3",
                diagnostics,
                Dimension.MassPerVolume
            ),
            Quantity.IonicStrength => Values.Si(
                value,
                quantity.Name,
                "mol/kg",
                diagnostics,
                Dimension.AmountPerMass
            ),
            _ => Values.Si(value, quantity.Name, "a pure number", diagnostics, Dimension.None),
        };

    private Quantity? Bind(QuantitySyntax syntax, bool inMoles)
    {
        switch (syntax.Name.Text)
        {
            case "pH" when syntax.Argument is null:
                return new Quantity.PH();
            case "ionic-strength" when syntax.Argument is null:
                return new Quantity.IonicStrength();
            case "TDS" when syntax.Argument is null:
                return new Quantity.TotalDissolved();
            case "dissolved" or "total" when syntax.Argument is { } argument:
                return Dissolved(syntax, argument, inMoles);
            case "SI" or "formed" when syntax.Argument is { } argument:
                return Solid(argument) is not { } solid ? null
                    : syntax.Name.Text is "SI" ? new Quantity.SaturationIndex(solid)
                    : new Quantity.Formed(solid);
            default:
                diagnostics.Add(
                    UnknownQuantity.At(
                        syntax.Span,
                        syntax.Name.Text,
                        EditDistance.Closest(syntax.Name.Text, Known)
                    )
                );
                return null;
        }
    }

    public Species? Solid(Token name)
    {
        var found = species.FirstOrDefault(s =>
            s.Kind == SpeciesKind.Solid
            && string.Equals(s.Name, name.Text, StringComparison.Ordinal)
        );
        if (found is null)
        {
            var solids = species.Where(s => s.Kind == SpeciesKind.Solid).ToList();
            var byFormula = solids
                .Find(s => string.Equals(s.Formula.Text, name.Text, StringComparison.Ordinal))
                ?.Name;
            diagnostics.Add(
                UnknownSolid.At(
                    name.Span,
                    name.Text,
                    byFormula ?? EditDistance.Closest(name.Text, solids.Select(s => s.Name))
                )
            );
        }

        return found;
    }

    private Quantity.Dissolved? Dissolved(QuantitySyntax syntax, Token argument, bool inMoles)
    {
        var withSolids = syntax.Name.Text is "total";
        if (
            OxidationState.TryRead(argument.Text, out _, out _)
            || !IsPlainElement(argument.Text, out var symbol)
        )
        {
            return Analyte(syntax, argument, inMoles, withSolids);
        }

        // A bare element counts all its oxidation states.
        ImmutableArray<Term> basis =
        [
            .. species
                .Where(s => s.Kind == SpeciesKind.Basis && s.Formula.AtomsOf(symbol) > 0)
                .Select(s => new Term(s.Formula.AtomsOf(symbol), s.Formula)),
        ];
        if (basis.IsEmpty)
        {
            diagnostics.Add(AnalyteWithoutSpecies.At(argument.Span, argument.Text));
            return null;
        }

        var mass = PeriodicTable.BySymbol[symbol].MolarMass;
        if (syntax.As is { } counted)
        {
            if (
                !FormulaReader.Standard.TryRead(counted.Text, out var formula, out _)
                || formula!.AtomsOf(symbol) == 0
            )
            {
                diagnostics.Add(CannotCountAs.At(counted.Span, argument.Text, counted.Text));
                return null;
            }

            mass = formula.MolarMass / formula.AtomsOf(symbol);
        }

        return new Quantity.Dissolved(Text(syntax, argument), basis, mass, inMoles, withSolids);
    }

    private static string Text(QuantitySyntax syntax, Token argument) =>
        syntax.As is null ? argument.Text : $"{argument.Text} as {syntax.As.Text}";

    private static bool IsPlainElement(string text, out string symbol)
    {
        symbol = text;
        return PeriodicTable.BySymbol.ContainsKey(text) && text is not ("H" or "O");
    }

    private Quantity.Dissolved? Analyte(
        QuantitySyntax syntax,
        Token argument,
        bool inMoles,
        bool withSolids
    )
    {
        if (analytes.Resolve(argument.Text) is not { } analyte)
        {
            diagnostics.Add(
                FormulaReader.Standard.TryRead(argument.Text, out _, out var fault)
                || OxidationState.TryRead(argument.Text, out _, out _)
                    ? AnalyteWithoutSpecies.At(argument.Span, argument.Text)
                    : NotAFormula.At(
                        argument.Span,
                        argument.Text,
                        fault!.Message,
                        EditDistance.Closest(argument.Text, analytes.Names)
                    )
            );
            return null;
        }

        var mass = analyte.Formula.MolarMass;
        if (syntax.As is { } counted)
        {
            if (
                !FormulaReader.Standard.TryRead(counted.Text, out var formula, out _)
                || Analytes.MassAs(analyte, formula!) is not { } asMass
            )
            {
                diagnostics.Add(CannotCountAs.At(counted.Span, argument.Text, counted.Text));
                return null;
            }

            mass = asMass;
        }

        // Counted through the one basis species that carries it; 1 mol of the analyte holds its coefficient of that.
        var carrier = analyte.PerMole.FirstOrDefault(t =>
            !t.Species.IsWater && !t.Species.IsHydrogenIon
        );
        if (carrier is null)
        {
            diagnostics.Add(AnalyteWithoutSpecies.At(argument.Span, argument.Text));
            return null;
        }

        return new Quantity.Dissolved(
            Text(syntax, argument),
            [new Term(1 / carrier.Coefficient, carrier.Species)],
            mass,
            inMoles,
            withSolids
        );
    }
}
