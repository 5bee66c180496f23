using System.Collections.Immutable;
using System.Globalization;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;
using Bittern.Language.Grammar;
using Bittern.Language.Lexing;
using Bittern.Language.Syntax;
using Bittern.Model;
using Sprache;

namespace Bittern.Language.Binding;

/// <summary>Binds a whole recipe: chemistry first, then what is named, then what uses the names.</summary>
internal sealed class RecipeBinder
{
    private static readonly string[] TopWords =
    [
        "recipe",
        "use",
        "cite",
        "element",
        "ion",
        "solute",
        "complex",
        "solid",
        "gas",
        "half-reaction",
        "override",
        "liquor",
        "reagent",
        "atmosphere",
        "train",
        "limits",
        "report",
        "mix",
    ];

    private readonly List<Diagnostic> _diagnostics = [];
    private readonly SourceText _source;
    private readonly ChemistryBinder _chemistry;
    private readonly ImmutableArray<Item> _items;
    private readonly ImmutableArray<Species> _species;
    private readonly Analytes _analytes;
    private readonly SolutionBinder _solutions;
    private readonly QuantityBinder _quantities;
    private SourceSpan _headerSpan;

    private RecipeBinder(SourceText source, IRecipeFiles files)
    {
        _source = source;
        _chemistry = new ChemistryBinder(files, _diagnostics);
        var file = ChemistryReader.Read(source, isCatalogue: false);
        _chemistry.Bind(file);
        _items = file.OtherItems;
        _headerSpan = _items.IsEmpty ? new SourceSpan(source, 0, 0) : _items[0].Span;
        _species = _chemistry.Species;
        _analytes = new Analytes(_species);
        _solutions = new SolutionBinder(_analytes, _species, _diagnostics);
        _quantities = new QuantityBinder(_analytes, _species, _diagnostics);
    }

    public static ReadResult Bind(SourceText source, IRecipeFiles files)
    {
        var binder = new RecipeBinder(source, files);
        var recipe = binder.Run();
        var diagnostics = binder
            ._diagnostics.DistinctBy(d => (d.Code, d.Span?.Start, d.Span?.Source.Name, d.What))
            .OrderBy(d => d.Span is null || !ReferenceEquals(d.Span.Value.Source, source))
            .ThenBy(d => d.Span?.Source.Name, StringComparer.Ordinal)
            .ThenBy(d => d.Span?.Start)
            .ToImmutableArray();
        return new ReadResult(
            diagnostics.Any(d => d.Severity == Severity.Error) ? null : recipe,
            diagnostics
        );
    }

    private static string FirstWord(Item item) => item.Head.Length == 0 ? "" : item.Head[0].Text;

    private Recipe Run()
    {
        var header = Header();
        var liquors = All("liquor", _solutions.Liquor, l => l.Name, l => l.Span);
        var reagents = All("reagent", _solutions.Reagent, r => r.Name, r => r.Span);
        var atmospheres = All("atmosphere", _solutions.Atmosphere, a => a.Name, a => a.Span);
        var solids = _species.Where(s => s.Kind == SpeciesKind.Solid).ToImmutableArray();
        var conversions = new ConversionBinder(
            _analytes,
            _chemistry.HalfReactions,
            _species,
            _diagnostics
        );
        var trainBinder = new TrainBinder(
            new Named(
                Index(liquors, l => l.Name),
                Index(reagents, r => r.Name),
                Index(atmospheres, a => a.Name)
            ),
            _quantities,
            conversions,
            solids,
            _diagnostics
        );
        var trains = All("train", trainBinder.Train, t => t.Name, t => t.Span);
        foreach (var item in _items.Where(i => FirstWord(i) is "mix"))
        {
            if (Mix(item, liquors, solids, trains.Count(t => t.IsMixture)) is { } mixture)
            {
                liquors = liquors.AddRange(mixture.Made);
                trains = trains.Add(mixture.Train);
            }
        }

        var limits = _items
            .Where(i => FirstWord(i) is "limits")
            .Select(i => Limits(i, trains))
            .OfType<LimitSet>()
            .ToImmutableArray();
        var texts = _items
            .Where(i => FirstWord(i) is "report")
            .SelectMany(Texts)
            .ToImmutableArray();
        foreach (
            var item in _items.Where(i => !TopWords.Contains(FirstWord(i), StringComparer.Ordinal))
        )
        {
            if (!item.Head.Any(t => t.Kind == TokenKind.Fault))
            {
                _diagnostics.Add(
                    UnknownDeclaration.At(
                        item.Span,
                        FirstWord(item),
                        EditDistance.Closest(FirstWord(item), TopWords)
                    )
                );
            }
        }

        CheckUse(liquors, reagents, atmospheres, trains);
        var system = Reach.Restrict(
            _species,
            _chemistry.HalfReactions,
            _chemistry.ActivityParameters,
            liquors,
            reagents,
            atmospheres,
            trains
        );
        CheckRanges(system, header, trains);
        CheckModel(header);
        var restricted = new Dictionary<Train, Train>(ReferenceEqualityComparer.Instance);
        foreach (var train in trains)
        {
            restricted.Add(train, Reach.Restrict(train, system));
        }
        return new Recipe
        {
            Header = header,
            Chemistry = system,
            Liquors = liquors,
            Reagents = reagents,
            Atmospheres = atmospheres,
            Trains = [.. trains.Select(t => restricted[t])],
            LimitSets = [.. limits.Select(l => l with { Train = restricted[l.Train] })],
            ReportTexts = texts,
            Sources = [.. _chemistry.Sources],
        };
    }

    private ImmutableArray<T> All<T>(
        string word,
        Func<Item, T?> bind,
        Func<T, string> nameOf,
        Func<T, SourceSpan> spanOf
    )
        where T : class
    {
        var all = _items
            .Where(i => string.Equals(FirstWord(i), word, StringComparison.Ordinal))
            .Select(bind)
            .OfType<T>()
            .ToImmutableArray();
        foreach (
            var twice in all.GroupBy(nameOf, StringComparer.Ordinal).Where(g => g.Skip(1).Any())
        )
        {
            _diagnostics.Add(
                DeclaredTwice.At(spanOf(twice.Last()), twice.Key, spanOf(twice.First()))
            );
        }

        return all;
    }

    private static Dictionary<string, T> Index<T>(ImmutableArray<T> all, Func<T, string> nameOf) =>
        all.GroupBy(nameOf, StringComparer.Ordinal)
            .ToDictionary(g => g.Key, g => g.First(), StringComparer.Ordinal);

    private RecipeHeader Header()
    {
        var items = _items.Where(i => FirstWord(i) is "recipe").ToList();
        if (items.Count == 0)
        {
            return new RecipeHeader { Title = Path.GetFileNameWithoutExtension(_source.Name) };
        }

        var title = HeadReader.Read(
            from word in Pieces.Word("recipe")
            from text in Pieces.Text
            select text,
            items[0],
            "recipe \"title\" { … }",
            _diagnostics
        );
        var header = new RecipeHeader { Title = title?.Text ?? "" };
        foreach (var second in items.Skip(1))
        {
            _diagnostics.Add(DeclaredTwice.At(second.Span, "recipe", items[0].Span));
        }

        foreach (var line in items[0].HasBlock ? items[0].Block : [])
        {
            header = HeaderLine(header, line);
        }

        return header;
    }

    private RecipeHeader HeaderLine(RecipeHeader header, Item line)
    {
        var word = FirstWord(line);
        switch (word)
        {
            case "client" or "reference" or "revision":
                var text = HeadReader
                    .Read(
                        from name in Pieces.Name
                        from t in Pieces.Text
                        select t,
                        line,
                        word + " \"text\"",
                        _diagnostics
                    )
                    ?.Text;
                return word switch
                {
                    "client" => header with { Client = text },
                    "reference" => header with { Reference = text },
                    _ => header with { Revision = text },
                };
            case "date":
                return header with
                {
                    Date = HeadReader
                        .Read(
                            from name in Pieces.Name
                            from d in Pieces.Kind(TokenKind.Date)
                            select d,
                            line,
                            "date 2031-03-01",
                            _diagnostics
                        )
                        ?.Text,
                };
            case "temperature":
                _headerSpan = line.Span;
                var value = HeadReader.Read(
                    from name in Pieces.Name
                    from v in Pieces.Value
                    select v,
                    line,
                    "temperature 12 °C",
                    _diagnostics
                );
                return
                    value is not null
                    && SolutionBinder.Temperature(value, _diagnostics) is { } celsius
                    ? header with
                    {
                        TemperatureCelsius = celsius,
                        TemperatureAssumed = false,
                    }
                    : header;
            case "activity":
                var model = HeadReader.Read(
                    from name in Pieces.Name
                    from m in Pieces.Name
                    select m,
                    line,
                    "activity davies",
                    _diagnostics
                );
                if (model is null)
                {
                    return header;
                }

                if (!ActivityModelNames.All.Contains(model.Text, StringComparer.Ordinal))
                {
                    _diagnostics.Add(
                        UnknownName.At(
                            model.Span,
                            model.Text,
                            "activity model",
                            EditDistance.Closest(model.Text, ActivityModelNames.All),
                            ActivityModelNames.All
                        )
                    );
                    return header;
                }

                return header with
                {
                    ActivityModel = model.Text,
                    ActivityModelAssumed = false,
                };
            default:
                _diagnostics.Add(
                    Unexpected.At(
                        line.Span,
                        word,
                        "client, reference, revision, date, temperature or activity"
                    )
                );
                return header;
        }
    }

    private sealed record Mixture(ImmutableArray<Liquor> Made, Train Train);

    private Mixture? Mix(
        Item item,
        ImmutableArray<Liquor> liquors,
        ImmutableArray<Species> solids,
        int earlier
    )
    {
        var part =
            from volume in Pieces.Value
            from ofWord in Pieces.Word("of")
            from content in (
                from entries in (
                    from first in Pieces.PlainEntry
                    from rest in (
                        from comma in Pieces.Comma
                        from e in Pieces.PlainEntry
                        select e
                    ).Many()
                    select ImmutableArray.CreateRange(rest.Prepend(first))
                )
                select new MixPartSyntax(volume, null, entries)
            ).Or(from name in Pieces.Name select new MixPartSyntax(volume, name, []))
            select content;
        var read = HeadReader.Read(
            from word in Pieces.Word("mix")
            from first in part
            from rest in (
                from withWord in Pieces.Word("with")
                from p in part
                select p
            ).AtLeastOnce()
            select Tuple.Create(ImmutableArray.CreateRange(rest.Prepend(first))),
            item,
            "mix 250 mL of CaCl2 0.10 mol/L with 150 mL of Na2SO4 0.08 mol/L",
            _diagnostics
        );
        if (read is null)
        {
            return null;
        }

        var prefix =
            earlier == 0
                ? "mixture"
                : string.Create(CultureInfo.InvariantCulture, $"mixture-{earlier + 1}");
        List<(double Volume, Liquor Liquor)> parts = [];
        List<Liquor> made = [];
        foreach (var syntax in read.Item1)
        {
            if (
                Values.Si(syntax.Volume, "a volume", "mL or L", _diagnostics, Dimension.Volume)
                is not { } volume
            )
            {
                continue;
            }

            if (volume <= 0)
            {
                _diagnostics.Add(OutOfBounds.At(syntax.Volume.Span, "a volume", "above zero"));
                continue;
            }

            if (syntax.Liquor is { } name)
            {
                if (
                    liquors.FirstOrDefault(l =>
                        string.Equals(l.Name, name.Text, StringComparison.Ordinal)
                    ) is
                    { } known
                )
                {
                    parts.Add((volume, known));
                }
                else
                {
                    _diagnostics.Add(
                        UnknownName.At(
                            name.Span,
                            name.Text,
                            "liquor",
                            EditDistance.Closest(name.Text, liquors.Select(l => l.Name))
                        )
                    );
                }

                continue;
            }

            ImmutableArray<AnalysisEntry> entries =
            [
                .. syntax.Entries.SelectMany(_solutions.Entries),
            ];
            if (entries.Length == syntax.Entries.Length)
            {
                var liquor = new Liquor
                {
                    Name = $"{prefix}-{(char)('a' + made.Count)}",
                    Entries = entries,
                    Span = syntax.Volume.Span,
                };
                made.Add(liquor);
                parts.Add((volume, liquor));
            }
        }

        if (parts.Count != read.Item1.Length)
        {
            return null;
        }

        var (feedVolume, feedLiquor) = parts[0];
        var stage = new Stage
        {
            Name = "mixture",
            Actions =
            [
                .. parts
                    .Skip(1)
                    .Select(p => new StageAction.Blend(p.Liquor, p.Volume / feedVolume, item.Span)),
            ],
            Forming = [.. solids.Where(s => s.HeldBackByDefault is null)],
            FormsAny = true,
            Span = item.Span,
        };
        var feed = new Feed(
            feedLiquor,
            read.Item1[0].Volume.Span.Text,
            null,
            feedVolume,
            item.Span
        );
        return new Mixture(
            [.. made],
            new Train
            {
                Name = prefix,
                Feed = feed,
                Stages = [stage],
                IsMixture = true,
                Span = item.Span,
            }
        );
    }

    private LimitSet? Limits(Item item, ImmutableArray<Train> trains)
    {
        var head = HeadReader.Read(
            from word in Pieces.Word("limits")
            from name in Pieces.Text
            from onWord in Pieces.Word("on")
            from train in Pieces.Name
            select Tuple.Create(name, train),
            item,
            "limits \"name\" on train { … }",
            _diagnostics
        );
        var limits = ImmutableArray.CreateBuilder<Limit>();
        foreach (var line in item.HasBlock ? item.Block : [])
        {
            var read = HeadReader.Read(
                from comparison in Pieces.Condition
                from note in Pieces.Maybe(Pieces.Text)
                select Tuple.Create(comparison, note),
                line,
                "dissolved(Zn) <= 0.5 mg/L   or   pH within 6.0 .. 9.0",
                _diagnostics
            );
            if (read is not null && _quantities.Condition(read.Item1) is { } condition)
            {
                if (condition.Comparison == Comparison.Equal)
                {
                    _diagnostics.Add(LimitByEquality.At(line.Span));
                    continue;
                }

                limits.Add(new Limit(condition, read.Item2?.Text, line.Span));
            }
        }

        if (head is null)
        {
            return null;
        }

        if (!item.HasBlock)
        {
            _diagnostics.Add(NeedsBlock.At(item.Span, "limits"));
            return null;
        }

        var declared = _items
            .Where(i => FirstWord(i) is "train" && i.Head.Length > 1)
            .Select(i => i.Head[1].Text)
            .ToList();
        var found = trains.FirstOrDefault(t =>
            string.Equals(t.Name, head.Item2.Text, StringComparison.Ordinal)
        );
        if (found is null && !declared.Contains(head.Item2.Text, StringComparer.Ordinal))
        {
            _diagnostics.Add(
                UnknownName.At(
                    head.Item2.Span,
                    head.Item2.Text,
                    "train",
                    EditDistance.Closest(head.Item2.Text, trains.Select(t => t.Name))
                )
            );
        }

        return found is null
            ? null
            : new LimitSet(head.Item1.Text, found, limits.ToImmutable(), item.Span);
    }

    private IEnumerable<ReportText> Texts(Item item)
    {
        foreach (var line in item.HasBlock ? item.Block : [])
        {
            var text = HeadReader.Read(
                from word in Pieces.Word("text")
                from t in Pieces.Kind(TokenKind.Block).Or(Pieces.Text)
                select t,
                line,
                "text \"\"\" … \"\"\"",
                _diagnostics
            );
            if (text is not null)
            {
                yield return new ReportText(text.Text, text.Span);
            }
        }
    }

    private void CheckUse(
        ImmutableArray<Liquor> liquors,
        ImmutableArray<Reagent> reagents,
        ImmutableArray<Atmosphere> atmospheres,
        ImmutableArray<Train> trains
    )
    {
        // A misspelt use has its own message; "unused" would be its echo.
        if (_diagnostics.Exists(d => d.Severity == Severity.Error))
        {
            return;
        }

        var actions = trains.SelectMany(t => t.Stages).SelectMany(s => s.Actions).ToList();
        var usedReagents = actions
            .Select(a =>
                a switch
                {
                    StageAction.AddAmount add => add.Reagent.Name,
                    StageAction.AddUntil add => add.Reagent.Name,
                    _ => null,
                }
            )
            .OfType<string>()
            .ToHashSet(StringComparer.Ordinal);
        var usedLiquors = trains
            .Select(t => t.Feed.Liquor.Name)
            .Concat(actions.OfType<StageAction.Blend>().Select(b => b.Liquor.Name))
            .ToHashSet(StringComparer.Ordinal);
        var usedAir = trains
            .SelectMany(t => t.Stages)
            .SelectMany(s => s.Contacts)
            .Select(c => c.Name)
            .ToHashSet(StringComparer.Ordinal);
        foreach (
            var (name, span, kind) in reagents
                .Where(r => !usedReagents.Contains(r.Name))
                .Select(r => (r.Name, r.Span, "reagent"))
                .Concat(
                    atmospheres
                        .Where(a => !usedAir.Contains(a.Name))
                        .Select(a => (a.Name, a.Span, "atmosphere"))
                )
                .Concat(
                    trains.IsEmpty
                        ? []
                        : liquors
                            .Where(l => !usedLiquors.Contains(l.Name))
                            .Select(l => (l.Name, l.Span, "liquor"))
                )
        )
        {
            _diagnostics.Add(Unused.At(span, kind, name));
        }
    }

    private void CheckModel(RecipeHeader header)
    {
        var fits = (_chemistry.Set, header.ActivityModel) switch
        {
            (null, _) or (_, ActivityModelNames.Ideal) => true,
            (ConstantSetKind.IonInteraction, var model) => model is ActivityModelNames.Pitzer,
            (ConstantSetKind.SpecificInteraction, var model) => model is ActivityModelNames.Sit,
            (_, var model) => model is not (ActivityModelNames.Pitzer or ActivityModelNames.Sit),
        };
        if (!fits)
        {
            _diagnostics.Add(
                ModelAndSet.At(
                    _headerSpan,
                    header.ActivityModel,
                    _chemistry.Set switch
                    {
                        ConstantSetKind.IonInteraction =>
                            "constants without ion pairs, made for 'pitzer'",
                        ConstantSetKind.SpecificInteraction => "constants made for 'sit'",
                        _ => "constants with ion pairs, made for 'davies' and its kin",
                    }
                )
            );
        }
    }

    private void CheckRanges(
        ChemicalSystem system,
        RecipeHeader header,
        ImmutableArray<Train> trains
    )
    {
        if (_diagnostics.Exists(d => d.Severity == Severity.Error))
        {
            return;
        }

        var temperatures = trains
            .SelectMany(t => t.Stages)
            .Select(s => s.TemperatureCelsius)
            .OfType<double>()
            .Append(header.TemperatureCelsius)
            .Distinct()
            .ToList();
        foreach (var celsius in temperatures)
        {
            var outside = system
                .All.Where(s => s.Constant is not null && !s.Constant.Covers(celsius))
                .Select(s => s.Name)
                .ToList();
            if (outside.Count > 0)
            {
                _diagnostics.Add(
                    OutOfRange.At(
                        _headerSpan,
                        celsius,
                        outside.Count,
                        string.Join(", ", outside.Take(6)) + (outside.Count > 6 ? ", …" : "")
                    )
                );
            }
        }
    }
}
