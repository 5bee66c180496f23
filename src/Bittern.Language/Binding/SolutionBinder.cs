using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;
using Bittern.Language.Grammar;
using Bittern.Language.Lexing;
using Bittern.Language.Syntax;
using Bittern.Model;
using Sprache;

namespace Bittern.Language.Binding;

/// <summary>Binds liquors, reagents and atmospheres.</summary>
internal sealed class SolutionBinder(
    Analytes analytes,
    ImmutableArray<Species> species,
    List<Diagnostic> diagnostics
)
{
    private const string EntryShape =
        "Zn 41 mg/L ± 4 %   or   NO3 12 mg/L as N   or   Cd < 0.01 mg/L";

    public Liquor? Liquor(Item item)
    {
        if (Named(item, "liquor") is not { } name)
        {
            return null;
        }

        var liquor = new Liquor { Name = name.Text, Span = name.Span };
        var entries = ImmutableArray.CreateBuilder<AnalysisEntry>();
        (Token Analyte, string? Because)? closing = null;
        foreach (var line in item.Block)
        {
            switch (line.Head.Length == 0 ? "" : line.Head[0].Text)
            {
                case "pH" or "temperature" or "density" or "alkalinity":
                    liquor = Property(liquor, line);
                    break;
                case "charge":
                    var clause = HeadReader.Read(
                        from word in Pieces.Word("charge")
                        from closed in Pieces.Word("closed")
                        from byWord in Pieces.Word("by")
                        from analyte in Pieces.Formula
                        from because in Pieces.Maybe(
                            from b in Pieces.Word("because")
                            from text in Pieces.Text
                            select text
                        )
                        select Tuple.Create(analyte, because),
                        line,
                        "charge closed by SO4",
                        diagnostics
                    );
                    closing = clause is null ? closing : (clause.Item1, clause.Item2?.Text);
                    break;
                default:
                    if (HeadReader.Read(Pieces.Entry, line, EntryShape, diagnostics) is { } entry)
                    {
                        entries.AddRange(Entries(entry));
                    }

                    break;
            }
        }

        foreach (
            var twice in entries
                .GroupBy(e => e.Analyte, StringComparer.Ordinal)
                .Where(g => g.Skip(1).Any())
        )
        {
            diagnostics.Add(AnalyteTwice.At(twice.Last().Span, twice.Key, twice.First().Span));
        }

        liquor = liquor with { Entries = entries.ToImmutable() };
        if (closing is { } wanted)
        {
            var entry = liquor.Entries.FirstOrDefault(e =>
                string.Equals(e.Analyte, wanted.Analyte.Text, StringComparison.Ordinal)
            );
            if (entry is null || entry.PerMole.Sum(t => t.Coefficient * t.Species.Charge) == 0)
            {
                diagnostics.Add(
                    CannotCloseCharge.At(
                        wanted.Analyte.Span,
                        wanted.Analyte.Text,
                        EditDistance.Closest(
                            wanted.Analyte.Text,
                            liquor.Entries.Select(e => e.Analyte)
                        )
                    )
                );
            }

            liquor = liquor with { ChargeClosedBy = entry, ChargeClosedBecause = wanted.Because };
        }

        CheckCharge(liquor);
        return liquor;
    }

    // A balance that is off by far more than any laboratory is a typing slip, most often a unit.
    private void CheckCharge(Liquor liquor)
    {
        double cations = 0,
            anions = 0;
        foreach (var entry in liquor.Entries)
        {
            if (
                entry.Amount.Kind
                is not (ConcentrationKind.MassPerVolume or ConcentrationKind.MolesPerVolume)
            )
            {
                return;
            }

            var moles =
                entry.Amount.Kind == ConcentrationKind.MassPerVolume
                    ? entry.Amount.UsedSi * 1000 / entry.MolarMass
                    : entry.Amount.UsedSi;
            var charge = moles * entry.PerMole.Sum(t => t.Coefficient * t.Species.Charge);
            cations += Math.Max(charge, 0);
            anions += Math.Max(-charge, 0);
        }

        var acid = liquor.PH is { } pH ? Math.Pow(10, 3 - pH) + Math.Pow(10, 3 + pH - 14) : 0;
        var ratio =
            (Math.Max(cations, anions) + acid)
            / (Math.Min(cations, anions) + acid + (liquor.Alkalinity ?? 0));
        if (cations > 0 && anions > 0 && ratio > 8)
        {
            diagnostics.Add(UnitSuspected.At(liquor.Span, liquor.Name, cations, anions));
        }
    }

    private Liquor Property(Liquor liquor, Item line)
    {
        var word = line.Head[0].Text;
        var read = HeadReader.Read(
            from name in Pieces.Name
            from v in Pieces.Value
            from asFormula in Pieces.Maybe(
                from a in Pieces.Word("as")
                from formula in Pieces.Formula
                select formula
            )
            from late in Pieces.Maybe(Pieces.Uncertainty)
            select Tuple.Create(late is null ? v : v with { Uncertainty = late }, asFormula),
            line,
            word switch
            {
                "pH" => "pH 7.2",
                "temperature" => "temperature 12 °C",
                "density" => "density 1040 kg/m3",
                _ => "alkalinity 180 mg/L as CaCO3   or   alkalinity 3.6 meq/L",
            },
            diagnostics
        );
        if (read is null)
        {
            return liquor;
        }

        var (value, counted) = read;
        switch (word)
        {
            case "pH":
                if (value.Unit is not null || value.Number.Number is < -3 or > 17)
                {
                    diagnostics.Add(
                        OutOfBounds.At(value.Span, "a pH", "a pure number between -3 and 17")
                    );
                    return liquor;
                }

                return liquor with
                {
                    PH = value.Number.Number,
                    PHUncertainty = Values.Uncertainty(value),
                };
            case "temperature":
                return Temperature(value, diagnostics) is { } celsius
                    ? liquor with
                    {
                        TemperatureCelsius = celsius,
                    }
                    : liquor;
            case "density":
                return
                    Values.Si(
                        value,
                        "a density",
                        "kg/m3 or g/mL",
                        diagnostics,
                        Dimension.MassPerVolume
                    )
                        is { } density
                    ? liquor with
                    {
                        Density = density,
                    }
                    : liquor;
            default:
                return Alkalinity(liquor, value, counted);
        }
    }

    private Liquor Alkalinity(Liquor liquor, ValueSyntax value, Token? counted)
    {
        var unit = Values.UnitOf(value.Unit);
        var written = value.Span.Text + (counted is null ? "" : " as " + counted.Text);
        if (unit.Dimension == Dimension.EquivalentsPerVolume && counted is null)
        {
            return liquor with
            {
                Alkalinity = unit.ToSi(value.Number.Number),
                AlkalinityWritten = written,
            };
        }

        if (unit.Dimension == Dimension.MassPerVolume && counted?.Text is "CaCO3" or "HCO3")
        {
            // 1 mol CaCO3 is 2 eq, 1 mol HCO3- is 1 eq.
            var grams = counted.Text is "CaCO3"
                ? FormulaReader.Standard.Read("CaCO3").MolarMass / 2
                : FormulaReader.Standard.Read("HCO3-").MolarMass;
            return liquor with
            {
                Alkalinity = unit.ToSi(value.Number.Number) * 1000 / grams,
                AlkalinityWritten = written,
            };
        }

        diagnostics.Add(
            UnitMistakes.Wrong(
                (value.Unit ?? value.Number).Span,
                value.Unit?.Text ?? "",
                "an alkalinity",
                "meq/L, or mg/L as CaCO3"
            )
        );
        return liquor;
    }

    /// <summary>°C between the freezing of strong brines and boiling under pressure.</summary>
    public static double? Temperature(ValueSyntax value, ICollection<Diagnostic> diagnostics)
    {
        if (
            Values.Si(value, "a temperature", "°C or K", diagnostics, Dimension.OfTemperature)
            is not { } kelvin
        )
        {
            return null;
        }

        var celsius = kelvin - PhysicalConstants.ZeroCelsius;
        if (celsius is >= -25 and <= 110)
        {
            return Math.Round(celsius, 9);
        }

        diagnostics.Add(OutOfBounds.At(value.Span, "a temperature", "between -25 and 110 °C"));
        return null;
    }

    private Token? Named(Item item, string word)
    {
        var name = HeadReader.Read(
            from keyword in Pieces.Word(word)
            from n in Pieces.Name
            select n,
            item,
            word + " name { … }",
            diagnostics
        );
        if (name is not null && !item.HasBlock)
        {
            diagnostics.Add(NeedsBlock.At(item.Span, word));
            return null;
        }

        return name;
    }

    /// <summary>The entries of one line, <c>of which</c> parts split off.</summary>
    public IEnumerable<AnalysisEntry> Entries(EntrySyntax syntax)
    {
        if (syntax.OfWhich.IsEmpty)
        {
            return Entry(syntax) is { } entry ? [entry] : [];
        }

        var parts = syntax.OfWhich.Select(Entry).OfType<AnalysisEntry>().ToList();
        if (Entry(syntax) is not { } whole || parts.Count != syntax.OfWhich.Length)
        {
            return [];
        }

        var rest = whole.Amount.Si - parts.Sum(p => p.Amount.Si);
        var other = OtherState(syntax, parts);
        if (rest < 0 || other is null || parts.Exists(p => p.Amount.Kind != whole.Amount.Kind))
        {
            diagnostics.Add(OfWhichDoesNotFit.At(syntax.Span, syntax.Analyte.Text));
            return [];
        }

        var written =
            $"{whole.Amount.Written} less {string.Join(" and ", parts.Select(p => $"{p.Amount.Written} {p.Analyte}"))}";
        return
        [
            .. parts,
            whole with
            {
                Analyte = other.Value.Name,
                PerMole = other.Value.Analyte.PerMole,
                Assumption = $"{other.Value.Name} by difference",
                Amount = whole.Amount with { Written = written, Si = rest },
            },
        ];
    }

    // Fe with Fe(II) given: the rest is the one other oxidation state that the recipe's chemistry has.
    private (string Name, Analyte Analyte)? OtherState(
        EntrySyntax syntax,
        List<AnalysisEntry> parts
    )
    {
        var symbol = syntax.Analyte.Text;
        var states = species
            .Where(s => s.Kind == SpeciesKind.Basis)
            .Select(s => OxidationState.In(s.Formula, symbol))
            .OfType<int>()
            .Distinct()
            .Select(s => OxidationState.Text(symbol, s))
            .Where(n => !parts.Exists(p => string.Equals(p.Analyte, n, StringComparison.Ordinal)))
            .ToList();
        return states.Count == 1 && analytes.Resolve(states[0]) is { } analyte
            ? (states[0], analyte)
            : null;
    }

    private AnalysisEntry? Entry(EntrySyntax syntax)
    {
        if (syntax.Analyte.Kind == TokenKind.Nuclide)
        {
            return NuclideEntry(syntax);
        }

        if (analytes.Resolve(syntax.Analyte.Text) is not { } analyte)
        {
            diagnostics.Add(UnknownAnalyte(syntax.Analyte));
            return null;
        }

        var choice = syntax.BelowAs?.Text switch
        {
            "zero" => BelowDetection.Zero,
            "limit" => BelowDetection.Limit,
            _ => BelowDetection.Half,
        };
        var mass = analyte.Formula.MolarMass;
        if (syntax.As is { } counted)
        {
            if (
                !FormulaReader.Standard.TryRead(counted.Text, out var formula, out _)
                || Analytes.MassAs(analyte, formula!) is not { } asMass
            )
            {
                diagnostics.Add(CannotCountAs.At(counted.Span, syntax.Analyte.Text, counted.Text));
                return null;
            }

            mass = asMass;
        }

        var written = syntax.Value.Span.Text + (syntax.As is null ? "" : " as " + syntax.As.Text);
        if (Values.Concentration(syntax.Value, written, choice, diagnostics) is not { } amount)
        {
            return null;
        }

        var charge = analyte.Charge == 0 ? (double?)null : Math.Abs(analyte.Charge);
        if (amount.Kind == ConcentrationKind.EquivalentsPerVolume && charge is null)
        {
            diagnostics.Add(
                UnitMistakes.Wrong(
                    syntax.Value.Span,
                    syntax.Value.Unit?.Text ?? "",
                    $"the uncharged '{syntax.Analyte.Text}'",
                    "mg/L or mmol/L"
                )
            );
            return null;
        }

        return new AnalysisEntry(
            syntax.Analyte.Text,
            amount,
            mass,
            analyte.PerMole,
            charge,
            analyte.Assumption,
            syntax.Span
        );
    }

    private AnalysisEntry? NuclideEntry(EntrySyntax syntax)
    {
        if (
            !Nuclide.TryRead(syntax.Analyte.Text, out var nuclide)
            || analytes.Resolve(nuclide!.Symbol) is not { } analyte
        )
        {
            diagnostics.Add(UnknownAnalyte(syntax.Analyte));
            return null;
        }

        if (
            Values.Si(
                syntax.Value,
                "an activity concentration",
                "Bq/L",
                diagnostics,
                Dimension.RadioactivityPerVolume
            )
            is not { } becquerel
        )
        {
            return null;
        }

        var uncertainty =
            Values.Uncertainty(syntax.Value) * Values.UnitOf(syntax.Value.Unit).SiFactor;
        var amount = new Concentration(
            syntax.Value.Span.Text,
            ConcentrationKind.MolesPerVolume,
            nuclide.Moles(becquerel),
            uncertainty is { } u ? nuclide.Moles(u) : null,
            syntax.Value.Below is null ? BelowDetection.No : BelowDetection.Half
        );
        return new AnalysisEntry(
            syntax.Analyte.Text,
            amount,
            nuclide.MassNumber,
            analyte.PerMole,
            null,
            $"half-life: {Nuclide.HalfLifeSource.Text}",
            syntax.Span
        );
    }

    private Diagnostic UnknownAnalyte(Token token) =>
        FormulaReader.Standard.TryRead(token.Text, out _, out var fault)
        || OxidationState.TryRead(token.Text, out _, out _)
            ? AnalyteWithoutSpecies.At(token.Span, token.Text)
            : NotAFormula.At(
                token.Span,
                token.Text,
                fault!.Message,
                EditDistance.Closest(token.Text, analytes.Names)
            );

    public Reagent? Reagent(Item item)
    {
        if (Named(item, "reagent") is not { } name)
        {
            return null;
        }

        var reagent = new Reagent { Name = name.Text, Span = name.Span };
        var entries = ImmutableArray.CreateBuilder<AnalysisEntry>();
        var dry = true;
        foreach (var line in item.Block)
        {
            switch (line.Head.Length == 0 ? "" : line.Head[0].Text)
            {
                case "purity":
                    reagent =
                        Single(line, "purity", "purity 93 %") is { } purity
                        && Values.Fraction(purity, "a purity", diagnostics) is { } share
                            ? reagent with
                            {
                                Purity = share,
                            }
                            : reagent;
                    break;
                case "density":
                    reagent =
                        Single(line, "density", "density 1210 kg/m3") is { } density
                        && Values.Si(
                            density,
                            "a density",
                            "kg/m3 or g/mL",
                            diagnostics,
                            Dimension.MassPerVolume
                        )
                            is { } si
                            ? reagent with
                            {
                                Density = si,
                            }
                            : reagent;
                    break;
                case "price":
                    reagent = Single(line, "price", "price 0.14 EUR/kg") is { } price
                        ? Price(reagent, price)
                        : reagent;
                    break;
                default:
                    if (
                        HeadReader.Read(
                            Pieces.Entry,
                            line,
                            "Ca(OH)2 100 g/L   or, for a dry product,   Ca(OH)2 100 %",
                            diagnostics
                        ) is
                        { } syntax
                    )
                    {
                        foreach (var entry in Entries(syntax))
                        {
                            entries.Add(entry);
                            dry &= entry.Amount.Kind == ConcentrationKind.MassFraction;
                        }
                    }

                    break;
            }
        }

        // Mass fractions that make up the whole are a dry product; with a density, or less than the whole, the rest is water.
        var isDry =
            dry
            && reagent.Density is null
            && entries.Count > 0
            && entries.Sum(e => e.Amount.UsedSi) >= 0.999;
        return reagent with { Entries = entries.ToImmutable(), IsDry = isDry };
    }

    private ValueSyntax? Single(Item line, string word, string shape) =>
        HeadReader.Read(
            from keyword in Pieces.Word(word)
            from value in Pieces.Value
            select value,
            line,
            shape,
            diagnostics
        );

    private Reagent Price(Reagent reagent, ValueSyntax value)
    {
        var unit = Values.UnitOf(value.Unit);
        var perMass = new Dimension(Currency: 1) / Dimension.OfMass;
        var perVolume = new Dimension(Currency: 1) / Dimension.Volume;
        if (unit.Currency is null || (unit.Dimension != perMass && unit.Dimension != perVolume))
        {
            diagnostics.Add(
                UnitMistakes.Wrong(
                    (value.Unit ?? value.Number).Span,
                    value.Unit?.Text ?? "",
                    "a price",
                    "EUR/kg, EUR/t or EUR/m3"
                )
            );
            return reagent;
        }

        return reagent with
        {
            Price = new ReagentPrice(
                value.Span.Text,
                unit.ToSi(value.Number.Number),
                unit.Currency,
                unit.Dimension == perVolume
            ),
        };
    }

    public Atmosphere? Atmosphere(Item item)
    {
        if (Named(item, "atmosphere") is not { } name)
        {
            return null;
        }

        var pressures = ImmutableArray.CreateBuilder<PartialPressure>();
        foreach (var line in item.Block)
        {
            var entry = HeadReader.Read(
                from g in Pieces.Formula
                from v in Pieces.Value
                select Tuple.Create(g, v),
                line,
                "CO2 4.2e-4 atm",
                diagnostics
            );
            if (entry is null)
            {
                continue;
            }

            var (token, value) = entry;
            var wanted = token.Text.EndsWith("(g)", StringComparison.Ordinal)
                ? token.Text
                : token.Text + "(g)";
            if (!FormulaReader.Standard.TryRead(wanted, out var gas, out var fault))
            {
                diagnostics.Add(NotAFormula.At(token.Span, token.Text, fault!.Message, null));
                continue;
            }

            if (
                Values.Si(
                    value,
                    "a partial pressure",
                    "atm, bar or kPa",
                    diagnostics,
                    Dimension.Pressure
                ) is
                { } pascal
            )
            {
                if (pascal <= 0)
                {
                    diagnostics.Add(OutOfBounds.At(value.Span, "a partial pressure", "above zero"));
                    continue;
                }

                if (!species.Any(s => s.Kind == SpeciesKind.Gas && s.Formula.Equals(gas!)))
                {
                    diagnostics.Add(
                        UnknownGas.At(
                            token.Span,
                            wanted,
                            species.Where(s => s.Kind == SpeciesKind.Gas).Select(s => s.Name)
                        )
                    );
                    continue;
                }

                pressures.Add(
                    new PartialPressure(
                        gas!,
                        pascal / PhysicalConstants.Atmosphere,
                        value.Span.Text,
                        token.Span
                    )
                );
            }
        }

        return new Atmosphere
        {
            Name = name.Text,
            Pressures = pressures.ToImmutable(),
            Span = name.Span,
        };
    }
}
