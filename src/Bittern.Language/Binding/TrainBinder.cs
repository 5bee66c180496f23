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

/// <summary>What a train may name.</summary>
internal sealed record Named(
    IReadOnlyDictionary<string, Liquor> Liquors,
    IReadOnlyDictionary<string, Reagent> Reagents,
    IReadOnlyDictionary<string, Atmosphere> Atmospheres
);

/// <summary>Binds trains and their stages.</summary>
internal sealed class TrainBinder(
    Named named,
    QuantityBinder quantities,
    ConversionBinder conversions,
    ImmutableArray<Species> solids,
    List<Diagnostic> diagnostics
)
{
    public Train? Train(Item item)
    {
        var name = HeadReader.Read(
            from word in Pieces.Word("train")
            from n in Pieces.Name
            select n,
            item,
            "train name { … }",
            diagnostics
        );
        if (name is null)
        {
            return null;
        }

        if (!item.HasBlock)
        {
            diagnostics.Add(NeedsBlock.At(item.Span, "train"));
            return null;
        }

        Feed? feed = null;
        var fed = false;
        var stages = ImmutableArray.CreateBuilder<Stage>();
        foreach (var line in item.Block)
        {
            switch (line.Head.Length == 0 ? "" : line.Head[0].Text)
            {
                case "feed":
                    fed = true;
                    feed = Feed(line);
                    break;
                case "stage":
                    if (Stage(line) is { } stage)
                    {
                        if (
                            stages.Any(s =>
                                string.Equals(s.Name, stage.Name, StringComparison.Ordinal)
                            )
                        )
                        {
                            diagnostics.Add(
                                DeclaredTwice.At(
                                    stage.Span,
                                    stage.Name,
                                    stages
                                        .First(s =>
                                            string.Equals(
                                                s.Name,
                                                stage.Name,
                                                StringComparison.Ordinal
                                            )
                                        )
                                        .Span
                                )
                            );
                        }

                        stages.Add(stage);
                    }

                    break;
                default:
                    diagnostics.Add(
                        Unexpected.At(
                            line.Span,
                            line.Head.Length == 0 ? null : line.Head[0].Text,
                            "feed liquor at 40 m3/h   or   stage name { … }"
                        )
                    );
                    break;
            }
        }

        if (!fed)
        {
            diagnostics.Add(TrainWithoutFeed.At(name.Span, name.Text));
        }

        return feed is null
            ? null
            : new Train
            {
                Name = name.Text,
                Feed = feed,
                Stages = stages.ToImmutable(),
                Span = name.Span,
            };
    }

    private Feed? Feed(Item line)
    {
        var read = HeadReader.Read(
            from word in Pieces.Word("feed")
            from liquor in Pieces.Name
            from flow in Pieces.Maybe(
                from at in Pieces.Word("at").Or(Pieces.Word("of"))
                from value in Pieces.Value
                select value
            )
            select Tuple.Create(liquor, flow),
            line,
            "feed liquor at 40 m3/h",
            diagnostics
        );
        if (read is null || Find(named.Liquors, read.Item1, "liquor") is not { } found)
        {
            return null;
        }

        if (read.Item2 is not { } rate)
        {
            return new Feed(found, null, null, null, line.Span);
        }

        var isVolume = Values.UnitOf(rate.Unit).Dimension == Dimension.Volume;
        if (
            Values.Si(
                rate,
                "a feed",
                "m3/h or m3",
                diagnostics,
                Dimension.VolumePerTime,
                Dimension.Volume
            )
            is not { } si
        )
        {
            return null;
        }

        if (si <= 0)
        {
            diagnostics.Add(OutOfBounds.At(rate.Span, "a feed", "above zero"));
            return null;
        }

        return new Feed(
            found,
            rate.Span.Text,
            isVolume ? null : si,
            isVolume ? si : null,
            line.Span
        );
    }

    private T? Find<T>(IReadOnlyDictionary<string, T> all, Token name, string kind)
        where T : class
    {
        if (all.TryGetValue(name.Text, out var found))
        {
            return found;
        }

        diagnostics.Add(
            UnknownName.At(name.Span, name.Text, kind, EditDistance.Closest(name.Text, all.Keys))
        );
        return null;
    }

    private Stage? Stage(Item item)
    {
        var name = HeadReader.Read(
            from word in Pieces.Word("stage")
            from n in Pieces.Name
            select n,
            item,
            "stage name { … }",
            diagnostics
        );
        if (name is null)
        {
            return null;
        }

        if (!item.HasBlock)
        {
            diagnostics.Add(NeedsBlock.At(item.Span, "stage"));
            return null;
        }

        var stage = new Stage { Name = name.Text, Span = name.Span };
        foreach (var line in item.Block)
        {
            stage = Line(stage, line);
        }

        stage = stage with
        {
            Actions =
            [
                .. stage.Actions.Select(a =>
                    a is StageAction.Convert convert
                        ? conversions.Supplied(convert, stage, named)
                        : a
                ),
            ],
        };
        foreach (var held in stage.HeldBack)
        {
            if (
                !stage.FormsAny
                && stage.Forming.Any(f =>
                    string.Equals(f.Name, held.Solid.Name, StringComparison.Ordinal)
                )
            )
            {
                diagnostics.Add(FormedAndHeldBack.At(held.Span, held.Solid.Name));
            }
        }

        return stage;
    }

    private Stage Line(Stage stage, Item line)
    {
        switch (line.Head.Length == 0 ? "" : line.Head[0].Text)
        {
            case "add":
                return Add(line) is { } add
                    ? stage with
                    {
                        Actions = stage.Actions.Add(add),
                    }
                    : stage;
            case "blend":
                return Blend(line) is { } blend
                    ? stage with
                    {
                        Actions = stage.Actions.Add(blend),
                    }
                    : stage;
            case "contact":
                var atmosphere = HeadReader.Read(
                    from word in Pieces.Word("contact")
                    from n in Pieces.Name
                    select n,
                    line,
                    "contact air",
                    diagnostics
                );
                return
                    atmosphere is not null
                    && Find(named.Atmospheres, atmosphere, "atmosphere") is { } found
                    ? stage with
                    {
                        Contacts = stage.Contacts.Add(found),
                    }
                    : stage;
            case "oxidise" or "reduce":
                return Convert(line) is { } convert
                    ? stage with
                    {
                        Actions = stage.Actions.Add(convert),
                    }
                    : stage;
            case "form":
                return Form(stage, line);
            case "hold":
                return HoldBack(stage, line);
            case "settle":
                return Settle(line) is { } settling ? stage with { Settling = settling } : stage;
            case "heat" or "cool":
                var word2 = line.Head[0].Text;
                var value = HeadReader.Read(
                    from word in Pieces.Word(word2)
                    from toWord in Pieces.Word("to")
                    from v in Pieces.Value
                    select v,
                    line,
                    word2 + " to 40 °C",
                    diagnostics
                );
                return
                    value is not null
                    && SolutionBinder.Temperature(value, diagnostics) is { } celsius
                    ? stage with
                    {
                        TemperatureCelsius = celsius,
                    }
                    : stage;
            default:
                diagnostics.Add(
                    UnknownAction.At(
                        line.Span,
                        line.Head.Length == 0 ? "" : line.Head[0].Text,
                        line.Head.Length == 0
                            ? null
                            : EditDistance.Closest(
                                line.Head[0].Text,
                                [
                                    "add",
                                    "blend",
                                    "contact",
                                    "oxidise",
                                    "reduce",
                                    "form",
                                    "hold",
                                    "settle",
                                    "heat",
                                    "cool",
                                ]
                            )
                    )
                );
                return stage;
        }
    }

    private StageAction? Add(Item line)
    {
        var head = from word in Pieces.Word("add") from n in Pieces.Name select n;
        var amount =
            from n in head
            from d in Pieces.Dose
            select Tuple.Create(n, (DoseSyntax?)d, (ConditionSyntax?)null);
        var until =
            from n in head
            from word in Pieces.Word("until")
            from c in Pieces.Condition
            from most in Pieces.Maybe(
                from comma in Pieces.Comma
                from at in Pieces.Word("at")
                from mostWord in Pieces.Word("most")
                from d in Pieces.Dose
                select d
            )
            select Tuple.Create(n, most, (ConditionSyntax?)c);
        var read = HeadReader.Read(
            until.Or(amount),
            line,
            "add milk-of-lime 2 mL/L   or   add milk-of-lime until pH = 9.2, at most 5 g/L as Ca(OH)2",
            diagnostics
        );
        if (read is null)
        {
            return null;
        }

        var (name, doseSyntax, conditionSyntax) = read;
        var reagent = Find(named.Reagents, name, "reagent");
        var condition = conditionSyntax is null ? null : quantities.Condition(conditionSyntax);
        var dose = doseSyntax is null || reagent is null ? null : Dose(doseSyntax, reagent);
        if (
            reagent is null
            || (conditionSyntax is not null && condition is null)
            || (doseSyntax is not null && dose is null)
        )
        {
            return null;
        }

        return condition is null
            ? new StageAction.AddAmount(reagent, dose!, line.Span)
            : new StageAction.AddUntil(reagent, condition, dose, line.Span);
    }

    private Dose? Dose(DoseSyntax syntax, Reagent reagent)
    {
        var unit = Values.UnitOf(syntax.Value.Unit);
        DoseKind? kind =
            unit.Dimension == Dimension.MassPerVolume ? DoseKind.MassPerVolume
            : unit.Dimension == Dimension.AmountPerVolume ? DoseKind.MolesPerVolume
            : unit.Dimension == Dimension.None
            && (unit.RatioOf == Dimension.Volume || unit.Symbol is "%")
            && !reagent.IsDry
                ? DoseKind.VolumePerVolume
            : null;
        if (kind is null)
        {
            diagnostics.Add(
                UnitMistakes.Wrong(
                    (syntax.Value.Unit ?? syntax.Value.Number).Span,
                    syntax.Value.Unit?.Text ?? "",
                    $"a dose of '{reagent.Name}'",
                    reagent.IsDry ? "g/L or mol/L" : "mL/L, g/L or mol/L"
                )
            );
            return null;
        }

        if (syntax.Value.Number.Number < 0)
        {
            diagnostics.Add(OutOfBounds.At(syntax.Value.Span, "a dose", "zero or more"));
            return null;
        }

        Formula? counted = null;
        if (
            syntax.As is { } token
            && !FormulaReader.Standard.TryRead(token.Text, out counted, out var fault)
        )
        {
            diagnostics.Add(NotAFormula.At(token.Span, token.Text, fault!.Message, null));
            return null;
        }

        var shares = reagent.Entries.Any(e =>
            e.PerMole.Any(t =>
                t.Species.Atoms.Keys.Any(k =>
                    k is not ("H" or "O") && (counted?.AtomsOf(k) ?? 0) > 0
                )
            )
        );
        if (
            (counted is not null && !shares)
            || (kind == DoseKind.MolesPerVolume && counted is null && reagent.Entries.Length != 1)
        )
        {
            diagnostics.Add(
                DoseAsOther.At(
                    (syntax.As ?? syntax.Value.Number).Span,
                    reagent.Name,
                    string.Join(", ", reagent.Entries.Select(e => e.Analyte))
                )
            );
            return null;
        }

        return new Dose(
            syntax.Value.Span.Text + (counted is null ? "" : " as " + counted.Text),
            kind.Value,
            unit.ToSi(syntax.Value.Number.Number),
            counted
        );
    }

    private StageAction.Blend? Blend(Item line)
    {
        var read = HeadReader.Read(
            from word in Pieces.Word("blend")
            from n in Pieces.Name
            from at in Pieces.Word("at")
            from value in Pieces.Value
            select Tuple.Create(n, value),
            line,
            "blend seawater at 250 L/m3",
            diagnostics
        );
        if (
            read is null
            || Find(named.Liquors, read.Item1, "liquor") is not { } liquor
            || Values.Si(read.Item2, "a blending ratio", "L/m3 or %", diagnostics, Dimension.None)
                is not { } ratio
        )
        {
            return null;
        }

        return new StageAction.Blend(liquor, ratio, line.Span);
    }

    private StageAction.Convert? Convert(Item line)
    {
        var oxidise = line.Head[0].Text is "oxidise";
        var read = HeadReader.Read(
            from word in Pieces.Name
            from analyte in Pieces.Formula
            from withWord in Pieces.Word("with")
            from agent in Pieces.Formula
            select Tuple.Create(analyte, agent),
            line,
            oxidise ? "oxidise Fe(II) with O2" : "reduce Cr(VI) with SO3",
            diagnostics
        );
        return read is null ? null : conversions.Bind(read.Item1, read.Item2, oxidise, line.Span);
    }

    private Stage Form(Stage stage, Item line)
    {
        var any = HeadReader.Read(
            (
                from form in Pieces.Word("form")
                from anyWord in Pieces.Word("any")
                from except in Pieces.Maybe(
                    from e in Pieces.Word("except")
                    from list in Pieces.Names
                    select Tuple.Create(list)
                )
                select Tuple.Create(true, except?.Item1 ?? [])
            ).Or(
                from form in Pieces.Word("form")
                from list in Pieces.Names
                select Tuple.Create(false, list)
            ),
            line,
            "form gypsum, calcite   or   form any except dolomite",
            diagnostics
        );
        if (any is null)
        {
            return stage;
        }

        var listed = any
            .Item2.Select(n => (Token: n, Solid: quantities.Solid(n)))
            .Where(p => p.Solid is not null)
            .ToList();
        if (!any.Item1)
        {
            return stage with { Forming = stage.Forming.AddRange(listed.Select(p => p.Solid!)) };
        }

        var excepted = listed.Select(p => p.Solid!.Name).ToHashSet(StringComparer.Ordinal);
        return stage with
        {
            FormsAny = true,
            Forming =
            [
                .. solids.Where(s => s.HeldBackByDefault is null && !excepted.Contains(s.Name)),
            ],
            HeldBack = stage.HeldBack.AddRange(
                listed.Select(p => new HeldBack(p.Solid!, "excepted by the recipe", p.Token.Span))
            ),
        };
    }

    private Stage HoldBack(Stage stage, Item line)
    {
        var read = HeadReader.Read(
            from hold in Pieces.Word("hold")
            from back in Pieces.Word("back")
            from list in Pieces.Names
            from because in Pieces.Maybe(
                from b in Pieces.Word("because")
                from text in Pieces.Text
                select text
            )
            select Tuple.Create(list, because),
            line,
            "hold back calcite because \"slow below 10 °C\"",
            diagnostics
        );
        if (read is null)
        {
            return stage;
        }

        var held = read
            .Item1.Select(n => (Token: n, Solid: quantities.Solid(n)))
            .Where(p => p.Solid is not null)
            .Select(p => new HeldBack(p.Solid!, read.Item2?.Text, p.Token.Span));
        return stage with { HeldBack = stage.HeldBack.AddRange(held) };
    }

    private Settling? Settle(Item line)
    {
        var read = HeadReader.Read(
            from word in Pieces.Word("settle")
            from share in Pieces.Value
            from target in Pieces.Maybe(
                from t in Pieces.Word("to")
                from name in Pieces.Name
                select name
            )
            from dryness in Pieces.Maybe(
                from a in Pieces.Word("at")
                from v in Pieces.Value
                from s in Pieces.Word("solids")
                select v
            )
            select Tuple.Create(share, target, dryness),
            line,
            "settle 99 % to primary-sludge at 20 % solids",
            diagnostics
        );
        if (
            read is null
            || Values.Fraction(read.Item1, "the share that settles", diagnostics)
                is not { } fraction
        )
        {
            return null;
        }

        double? solidsContent = null;
        if (read.Item3 is { } content)
        {
            solidsContent = Values.Fraction(content, "the solids content", diagnostics);
            if (solidsContent is null or 0)
            {
                return null;
            }
        }

        return new Settling(fraction, read.Item2?.Text ?? "sludge", solidsContent, line.Span);
    }
}
