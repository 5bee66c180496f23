using System.Collections.Concurrent;
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

/// <summary>Reads the declarations of one file: species, constants, citations, uses. Catalogue files are read once per process.</summary>
internal sealed class ChemistryReader
{
    private static readonly ConcurrentDictionary<string, ChemistryFile> CatalogueFiles = new(
        StringComparer.Ordinal
    );

    private readonly SourceText _source;
    private readonly bool _isCatalogue;
    private readonly List<Diagnostic> _diagnostics = [];
    private readonly Dictionary<string, Citation> _citations = new(StringComparer.Ordinal);
    private readonly List<Declared> _species = [];
    private readonly List<HalfReaction> _halfReactions = [];
    private readonly List<ActivityParameter> _parameters = [];
    private ConstantSetKind? _set;
    private readonly List<OverrideDeclaration> _overrides = [];
    private readonly List<(string, SourceSpan)> _catalogues = [];
    private readonly List<(string, SourceSpan)> _files = [];
    private readonly List<(string, SourceSpan)> _openCitations = [];
    private readonly List<Item> _others = [];
    private FormulaReader _formulas = FormulaReader.Standard;

    private ChemistryReader(SourceText source, bool isCatalogue)
    {
        _source = source;
        _isCatalogue = isCatalogue;
    }

    public static ChemistryFile Read(SourceText source, bool isCatalogue)
    {
        if (!isCatalogue)
        {
            return new ChemistryReader(source, isCatalogue).Run();
        }

        if (
            CatalogueFiles.TryGetValue(source.Name, out var known)
            && string.Equals(known.Source.Text, source.Text, StringComparison.Ordinal)
        )
        {
            return known;
        }

        return CatalogueFiles[source.Name] = new ChemistryReader(source, isCatalogue).Run();
    }

    private ChemistryFile Run()
    {
        var (tokens, lexical) = Lexer.Read(_source);
        _diagnostics.AddRange(lexical);
        var items = ItemCutter.Cut(tokens, _diagnostics);

        // Citations and elements may stand below their first use.
        foreach (var item in items)
        {
            Preliminary(item);
        }

        foreach (var item in items)
        {
            Declaration(item);
        }

        return new ChemistryFile(
            _source,
            [.. _species],
            [.. _halfReactions],
            [.. _parameters],
            _set,
            [.. _overrides],
            [.. _catalogues],
            [.. _files],
            [.. _citations.Values],
            [.. _openCitations],
            [.. _others],
            [.. _diagnostics]
        );
    }

    private static string FirstWord(Item item) => item.Head.Length == 0 ? "" : item.Head[0].Text;

    private void Preliminary(Item item)
    {
        switch (FirstWord(item))
        {
            case "cite":
                var cite = HeadReader.Read(
                    from word in Pieces.Word("cite")
                    from key in Pieces.Name
                    from text in Pieces.Text
                    select Tuple.Create(key, text),
                    item,
                    "cite key \"the reference in full\"",
                    _diagnostics
                );
                if (
                    cite is not null
                    && !_citations.TryAdd(
                        cite.Item1.Text,
                        new Citation(cite.Item1.Text, cite.Item2.Text)
                    )
                )
                {
                    _diagnostics.Add(DeclaredTwice.At(cite.Item1.Span, cite.Item1.Text, null));
                }

                break;
            case "element":
                var element = HeadReader.Read(
                    from word in Pieces.Word("element")
                    from symbol in Pieces.Formula
                    from value in Pieces.Value
                    select Tuple.Create(symbol, value),
                    item,
                    "element Hu 250 g/mol",
                    _diagnostics
                );
                if (element is not null)
                {
                    var factor =
                        element.Item2.Unit is { } unit
                        && UnitReader.TryRead(unit.Text, out var read, out _)
                            ? read!.SiFactor * 1000
                            : 1;
                    _formulas = _formulas.With(
                        new Element(
                            element.Item1.Text,
                            element.Item1.Text,
                            element.Item2.Number.Number * factor
                        )
                    );
                }

                break;
        }
    }

    private void Declaration(Item item)
    {
        switch (FirstWord(item))
        {
            case "cite" or "element":
                break;
            case "ion" or "solute":
                Basis(item);
                break;
            case "complex":
                Species(item, SpeciesKind.Complex);
                break;
            case "solid":
                Species(item, SpeciesKind.Solid);
                break;
            case "gas":
                Species(item, SpeciesKind.Gas);
                break;
            case "half-reaction":
                HalfReaction(item);
                break;
            case "override":
                Override(item);
                break;
            case "use":
                Use(item);
                break;
            case "set":
                Set(item);
                break;
            case "ion-size"
            or "truesdell-jones"
            or "sit"
            or "pitzer"
            or "pitzer-slope"
            or "theta"
            or "psi"
            or "lambda"
            or "zeta":
                if (
                    ActivityParameters.Read(
                        item,
                        _formulas,
                        _citations,
                        _openCitations,
                        _diagnostics
                    ) is
                    { } parameter
                )
                {
                    _parameters.Add(parameter);
                }

                break;
            default:
                _others.Add(item);
                break;
        }
    }

    private void Set(Item item)
    {
        var name = HeadReader.Read(
            from word in Pieces.Word("set")
            from n in Pieces.Name
            from text in Pieces.Maybe(Pieces.Text)
            select n,
            item,
            "set ion-interaction \"after whom\"",
            _diagnostics
        );
        ConstantSetKind? kind = name?.Text switch
        {
            "ion-association" => ConstantSetKind.IonAssociation,
            "ion-interaction" => ConstantSetKind.IonInteraction,
            "specific-interaction" => ConstantSetKind.SpecificInteraction,
            _ => null,
        };
        if (kind is null && name is not null)
        {
            string[] known = ["ion-association", "ion-interaction", "specific-interaction"];
            _diagnostics.Add(
                UnknownName.At(
                    name.Span,
                    name.Text,
                    "kind of set",
                    EditDistance.Closest(name.Text, known),
                    known
                )
            );
        }

        _set = kind ?? _set;
    }

    private void Use(Item item)
    {
        var names = HeadReader.Read(
            (
                from use in Pieces.Word("use")
                from catalogue in Pieces.Word("catalogue")
                from list in Pieces.Names
                select Tuple.Create(list, default(Token))
            ).Or(
                from use in Pieces.Word("use")
                from file in Pieces.Text
                select Tuple.Create(ImmutableArray<Token>.Empty, (Token?)file)
            ),
            item,
            "use catalogue major, metals   or   use \"constants/site.bittern\"",
            _diagnostics
        );
        if (names is null)
        {
            return;
        }

        _catalogues.AddRange(names.Item1.Select(n => (n.Text, n.Span)));
        if (names.Item2 is { } path)
        {
            _files.Add((path.Text, path.Span));
        }
    }

    private void Basis(Item item)
    {
        var word = FirstWord(item);
        var tokens = HeadReader.Read(
            from kind in Pieces.Word(word)
            from first in Pieces.Formula
            from rest in (
                from comma in Pieces.Comma
                from formula in Pieces.Formula
                select formula
            ).Many()
            select Tuple.Create(ImmutableArray.CreateRange(rest.Prepend(first))),
            item,
            word is "ion" ? "ion Ca^2+" : "solute H4SiO4(aq)",
            _diagnostics
        );
        foreach (var token in tokens?.Item1 ?? [])
        {
            if (ReadFormula(token) is not { } formula)
            {
                continue;
            }

            if ((word is "ion") != (formula.Charge != 0))
            {
                _diagnostics.Add(IonOrSolute.At(token.Span, formula.Text, formula.Charge));
                continue;
            }

            _species.Add(
                new Declared
                {
                    Name = formula.Text,
                    Formula = formula,
                    Kind = SpeciesKind.Basis,
                    Span = token.Span,
                    FromCatalogue = _isCatalogue,
                }
            );
        }
    }

    private static readonly Parser<SpeciesSyntax> ComplexHead =
        from kind in Pieces.Word("complex")
        from formula in Pieces.Formula
        from fromWord in Pieces.Word("from")
        from side in Pieces.Side
        from constant in Constants.Constant
        select new SpeciesSyntax(
            kind,
            null,
            formula,
            new ReactionSyntax(side, [new TermSyntax(1, formula)]),
            constant
        );

    private static readonly Parser<SpeciesSyntax> SolidHead =
        from kind in Pieces.Word("solid")
        from name in Pieces.Name
        from reaction in Pieces.Dissolution
        from constant in Constants.Constant
        select new SpeciesSyntax(kind, name, null, reaction, constant);

    private static readonly Parser<SpeciesSyntax> GasHead =
        from kind in Pieces.Word("gas")
        from reaction in Pieces.Dissolution
        from constant in Constants.Constant
        select new SpeciesSyntax(kind, null, null, reaction, constant);

    private static (Parser<SpeciesSyntax> Parser, string Shape) HeadOf(SpeciesKind kind) =>
        kind switch
        {
            SpeciesKind.Complex => (
                ComplexHead,
                "complex CaSO4(aq) from Ca^2+ + SO4^2-   log K 2.30 ± 0.05, ΔH 6.9 kJ/mol [source]"
            ),
            SpeciesKind.Solid => (
                SolidHead,
                "solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58 ± 0.02 [source]"
            ),
            _ => (GasHead, "gas CO2(g) to CO2(aq)   log KH -1.47 [source]"),
        };

    private void Species(Item item, SpeciesKind kind)
    {
        var (parser, shape) = HeadOf(kind);
        if (
            HeadReader.Read(parser, item, shape, _diagnostics) is { } syntax
            && Declare(syntax, kind, item.Span, out _) is { } declared
        )
        {
            _species.Add(declared);
        }
    }

    private void Override(Item item)
    {
        var rest = new Item([.. item.Head.Skip(1)], item.Block, item.Span, item.Whole);
        var kind = FirstWord(rest) switch
        {
            "complex" => SpeciesKind.Complex,
            "solid" => SpeciesKind.Solid,
            "gas" => SpeciesKind.Gas,
            _ => SpeciesKind.Basis,
        };
        if (kind == SpeciesKind.Basis)
        {
            _diagnostics.Add(
                Unexpected.At(
                    rest.Head.Length > 0 ? rest.Head[0].Span : item.Span,
                    FirstWord(rest),
                    "override solid name reaction constant [source] because \"reason\""
                )
            );
            return;
        }

        var (parser, shape) = HeadOf(kind);
        if (
            HeadReader.Read(parser, rest, "override " + shape + " because \"reason\"", _diagnostics)
                is { } syntax
            && Declare(syntax, kind, item.Span, out var because) is { } declared
        )
        {
            if (because is null)
            {
                _diagnostics.Add(OverrideWithoutReason.At(item.Span, declared.Name));
            }

            _overrides.Add(new OverrideDeclaration(declared, because, item.Span));
        }
    }

    private void HalfReaction(Item item)
    {
        var syntax = HeadReader.Read(
            from word in Pieces.Word("half-reaction")
            from reaction in Pieces.Dissolution
            from k in Constants.Constant
            select new SpeciesSyntax(word, null, null, reaction, k),
            item,
            "half-reaction Fe^3+ + e- to Fe^2+   log K 13.02 [source]",
            _diagnostics
        );
        if (
            syntax is null
            || ReadReaction(syntax.Reaction) is not { } written
            || !Balanced(written, item.Span)
        )
        {
            return;
        }

        var electrons = written.Left.Where(t => t.Species.IsElectron).Sum(t => t.Coefficient);
        if (electrons <= 0)
        {
            _diagnostics.Add(HalfReactionWithoutElectrons.At(item.Span));
            return;
        }

        if (
            ReadConstant(syntax.Constant, written, item.Span, null, out _, out _, out _) is
            { } constant
        )
        {
            _halfReactions.Add(new HalfReaction(written, electrons, constant, item.Span));
        }
    }

    private Declared? Declare(
        SpeciesSyntax syntax,
        SpeciesKind kind,
        SourceSpan span,
        out string? because
    )
    {
        because = null;
        if (ReadReaction(syntax.Reaction) is not { } written)
        {
            return null;
        }

        var formula =
            kind == SpeciesKind.Complex ? written.Right[0].Species : written.Left[0].Species;
        if (!Balanced(written, span))
        {
            return null;
        }

        var constant = ReadConstant(
            syntax.Constant,
            written,
            span,
            kind,
            out var doubt,
            out var held,
            out because
        );
        return constant is null
            ? null
            : new Declared
            {
                Name = syntax.Name?.Text ?? formula.Text,
                Formula = formula,
                Kind = kind,
                Written = written,
                Constant = constant,
                Syntax = syntax.Reaction,
                Doubt = doubt,
                HeldBack = held,
                Span = span,
                FromCatalogue = _isCatalogue,
            };
    }

    private bool Balanced(Reaction written, SourceSpan span)
    {
        var imbalance = written.Imbalance();
        if (imbalance.IsEmpty)
        {
            return true;
        }

        _diagnostics.Add(Unbalanced.At(span, written.ToString(), imbalance));
        return false;
    }

    private Reaction? ReadReaction(ReactionSyntax syntax)
    {
        // A species behind a minus belongs to the other side.
        var left = Terms(syntax.Left, syntax.Right);
        var right = Terms(syntax.Right, syntax.Left);
        return left is null || right is null ? null : new Reaction([.. left], [.. right]);

        List<Term>? Terms(ImmutableArray<TermSyntax> own, ImmutableArray<TermSyntax> other)
        {
            List<Term> terms = [];
            var fine = true;
            foreach (
                var term in own.Where(t => t.Coefficient > 0)
                    .Concat(other.Where(t => t.Coefficient < 0))
            )
            {
                if (ReadFormula(term.Species) is { } formula)
                {
                    terms.Add(new Term(Math.Abs(term.Coefficient), formula));
                }
                else
                {
                    fine = false;
                }
            }

            return fine ? terms : null;
        }
    }

    private Formula? ReadFormula(Token token)
    {
        if (_formulas.TryRead(token.Text, out var formula, out var fault))
        {
            return formula;
        }

        var span = new SourceSpan(
            token.Span.Source,
            token.Span.Start + Math.Min(fault!.Offset, token.Span.Length - 1),
            Math.Max(1, Math.Min(fault.Length, token.Span.Length - fault.Offset))
        );
        _diagnostics.Add(
            NotAFormula.At(
                span,
                token.Text,
                fault.Message,
                fault.UnknownSymbol is null
                    ? null
                    : EditDistance.Closest(fault.UnknownSymbol, _formulas.Symbols)
            )
        );
        return null;
    }

    private EquilibriumConstant? ReadConstant(
        ConstantSyntax syntax,
        Reaction written,
        SourceSpan span,
        SpeciesKind? kind,
        out string? doubt,
        out string? held,
        out string? because
    )
    {
        doubt = null;
        held = null;
        because = null;
        Citation? source = null;
        var recalled = false;
        double? enthalpy = null,
            from = null,
            to = null;
        foreach (var option in syntax.Options)
        {
            switch (option)
            {
                case ConstantOption.Enthalpy e:
                    enthalpy = Enthalpy(e.Value);
                    break;
                case ConstantOption.Valid v:
                    (from, to) = (Celsius(v.From.Number, v.Unit), Celsius(v.To.Number, v.Unit));
                    break;
                case ConstantOption.Cited c:
                    // A key that this file does not hold may be one of a file it uses: the binder looks there.
                    source =
                        _citations.GetValueOrDefault(c.Key.Text) ?? new Citation(c.Key.Text, "");
                    if (source.Text.Length == 0)
                    {
                        _openCitations.Add((c.Key.Text, c.Key.Span));
                    }

                    break;
                case ConstantOption.Recalled:
                    recalled = true;
                    break;
                case ConstantOption.Doubt d:
                    doubt = d.Text.Text;
                    break;
                case ConstantOption.HeldBack h:
                    held = h.Text.Text;
                    break;
                case ConstantOption.Reason b:
                    because = b.Text.Text;
                    break;
            }
        }

        if (source is null && !syntax.Options.OfType<ConstantOption.Cited>().Any())
        {
            _diagnostics.Add(NoCitation.At(span));
        }

        if (FormOf(syntax, written, kind) is not { } form)
        {
            return null;
        }

        if (Value(syntax, form, enthalpy) is not { } value)
        {
            return null;
        }

        return new EquilibriumConstant(
            value,
            form,
            Uncertainty(syntax, form),
            from,
            to,
            source,
            recalled
        );
    }

    private ConstantForm? FormOf(ConstantSyntax syntax, Reaction written, SpeciesKind? kind)
    {
        var form = (syntax.IsLog is not null, syntax.Name.Text) switch
        {
            (true, "K") => ConstantForm.LogK,
            (true, "Ksp") => ConstantForm.LogKsp,
            (true, "KH") => ConstantForm.LogKH,
            (false, "K") => ConstantForm.K,
            (false, "Ksp") => ConstantForm.Ksp,
            (false, "pKsp") => ConstantForm.PKsp,
            _ => (ConstantForm?)null,
        };
        if (form is null)
        {
            _diagnostics.Add(
                Unexpected.At(
                    syntax.Name.Span,
                    syntax.Name.Text,
                    "log K, log Ksp, pKsp, K, Ksp or log KH"
                )
            );
            return null;
        }

        if (
            form is ConstantForm.Ksp or ConstantForm.LogKsp or ConstantForm.PKsp
            && (kind != SpeciesKind.Solid || written.Left.Length > 1)
        )
        {
            _diagnostics.Add(KspNotDissolution.At(syntax.Name.Span, written.ToString()));
            return null;
        }

        return form;
    }

    private TemperatureFunction? Value(ConstantSyntax syntax, ConstantForm form, double? enthalpy)
    {
        if (!Expressions.Check(syntax.Value, _diagnostics))
        {
            return null;
        }

        if (Expressions.IsConstant(syntax.Value))
        {
            var number = Expressions.Evaluate(syntax.Value, PhysicalConstants.ReferenceKelvin);
            var log = form switch
            {
                ConstantForm.K or ConstantForm.Ksp => Math.Log10(number),
                ConstantForm.PKsp => -number,
                _ => number,
            };
            if (!double.IsFinite(log))
            {
                _diagnostics.Add(ConstantNotPositive.At(syntax.ValueSpan));
                return null;
            }

            if (
                form is ConstantForm.LogK or ConstantForm.LogKsp or ConstantForm.LogKH
                && syntax.Value is ExpressionSyntax.Literal { Number.IsPower: true } literal
            )
            {
                _diagnostics.Add(PowerAsLog.At(literal.Number.Span, literal.Number.Text));
                return null;
            }

            return new TemperatureFunction.VantHoff(log, enthalpy);
        }

        if (enthalpy is not null)
        {
            _diagnostics.Add(ExpressionWithEnthalpy.At(syntax.ValueSpan));
        }

        var expression = syntax.Value;
        Func<double, double> evaluate = form switch
        {
            ConstantForm.K or ConstantForm.Ksp => kelvin =>
                Math.Log10(Expressions.Evaluate(expression, kelvin)),
            ConstantForm.PKsp => kelvin => -Expressions.Evaluate(expression, kelvin),
            _ => kelvin => Expressions.Evaluate(expression, kelvin),
        };
        return new TemperatureFunction.Published(
            string.Join(
                ' ',
                syntax.ValueSpan.Text.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries)
            ),
            evaluate
        );
    }

    private double? Uncertainty(ConstantSyntax syntax, ConstantForm form)
    {
        if (syntax.Uncertainty is not { } uncertainty)
        {
            return null;
        }

        var isPower = syntax.Value is ExpressionSyntax.Literal { Number.IsPower: true };
        if (form is ConstantForm.K or ConstantForm.Ksp)
        {
            if (isPower)
            {
                _diagnostics.Add(UncertaintyOfPower.At(uncertainty.Number.Span));
                return null;
            }

            // u(log10 K) = u(K)/(K ln 10), first order.
            var value = Expressions.Evaluate(syntax.Value, PhysicalConstants.ReferenceKelvin);
            var relative = uncertainty.Unit?.Text is "%"
                ? uncertainty.Number.Number / 100
                : uncertainty.Number.Number / value;
            return relative / Math.Log(10);
        }

        if (uncertainty.Unit is { } unit)
        {
            _diagnostics.Add(
                UnitMistakes.Wrong(unit.Span, unit.Text, "the logarithm of a constant", "no unit")
            );
            return null;
        }

        return uncertainty.Number.Number;
    }

    private double? Enthalpy(ValueSyntax value)
    {
        if (
            value.Unit is not { } unit
            || !UnitReader.TryRead(unit.Text, out var read, out _)
            || read!.Dimension != UnitReader.Read("kJ/mol").Dimension
        )
        {
            _diagnostics.Add(
                UnitMistakes.Wrong(
                    (value.Unit ?? value.Number).Span,
                    value.Unit?.Text ?? "",
                    "an enthalpy",
                    "kJ/mol or kcal/mol"
                )
            );
            return null;
        }

        return value.Number.Number * read.SiFactor / 1000;
    }

    private double? Celsius(double value, Token? unit)
    {
        if (
            unit is null
            || !UnitReader.TryRead(unit.Text, out var read, out _)
            || read!.Dimension != Dimension.OfTemperature
        )
        {
            return value;
        }

        return read.ToSi(value) - PhysicalConstants.ZeroCelsius;
    }
}
