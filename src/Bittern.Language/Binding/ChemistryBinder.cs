using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;
using Bittern.Model;

namespace Bittern.Language.Binding;

/// <summary>
/// Puts the declarations of a recipe and of everything it uses together: citations, overrides, duplicates; then rewrites every species to the basis.
/// </summary>
internal sealed class ChemistryBinder
{
    private readonly IRecipeFiles _files;
    private readonly List<Diagnostic> _diagnostics;
    private readonly List<ChemistryFile> _order = [];
    private readonly HashSet<string> _seen = new(StringComparer.Ordinal);
    private readonly Dictionary<string, Declared> _byName = new(StringComparer.Ordinal);
    private readonly Dictionary<string, Rewritten?> _rewritten = new(StringComparer.Ordinal);
    private readonly HashSet<string> _open = new(StringComparer.Ordinal);
    private readonly HashSet<(string, string)> _clashes = [];

    public ChemistryBinder(IRecipeFiles files, List<Diagnostic> diagnostics)
    {
        _files = files;
        _diagnostics = diagnostics;
    }

    /// <summary>All files in order of first use, the recipe first.</summary>
    public IEnumerable<SourceText> Sources => _order.Select(f => f.Source);

    /// <summary>All species over the basis, in order of declaration; those that could not be placed are left out, with a diagnostic.</summary>
    public ImmutableArray<Species> Species { get; private set; } = [];

    public ImmutableArray<HalfReaction> HalfReactions { get; private set; } = [];

    /// <summary>Parameters of activity models, each combination once.</summary>
    public ImmutableArray<ActivityParameter> ActivityParameters { get; private set; } = [];

    /// <summary>What the catalogues in use are made for; null when none says so.</summary>
    public ConstantSetKind? Set { get; private set; }

    public void Bind(ChemistryFile recipe)
    {
        Collect(recipe);
        var citations = _order
            .SelectMany(f => f.Citations)
            .GroupBy(c => c.Key, StringComparer.Ordinal)
            .ToDictionary(g => g.Key, g => g.First(), StringComparer.Ordinal);
        foreach (var (key, span) in _order.SelectMany(f => f.OpenCitations))
        {
            if (!citations.ContainsKey(key))
            {
                _diagnostics.Add(
                    UnknownCitation.At(span, key, EditDistance.Closest(key, citations.Keys))
                );
            }
        }

        foreach (var declared in _order.SelectMany(f => f.Species))
        {
            Declare(declared);
        }

        foreach (var replacement in _order.SelectMany(f => f.Overrides))
        {
            Override(replacement);
        }

        EnsureHydrogen();
        BindSets();
        BindParameters(citations);
        HalfReactions =
        [
            .. _order
                .SelectMany(f => f.HalfReactions)
                .Select(h => h with { Constant = Cite(h.Constant, citations) }),
        ];
        Species = [.. _byName.Values.Select(d => Place(d, citations)).OfType<Species>()];
    }

    private void Collect(ChemistryFile file)
    {
        if (!_seen.Add(file.Source.Name))
        {
            return;
        }

        _order.Add(file);
        _diagnostics.AddRange(file.Diagnostics);
        foreach (var (name, span) in file.UsedCatalogues)
        {
            if (_files.Catalogue(name) is { } source)
            {
                Collect(ChemistryReader.Read(source, isCatalogue: true));
            }
            else
            {
                _diagnostics.Add(
                    UnknownCatalogue.At(
                        span,
                        name,
                        EditDistance.Closest(name, _files.CatalogueNames),
                        _files.CatalogueNames
                    )
                );
            }
        }

        foreach (var (path, span) in file.UsedFiles)
        {
            if (_files.Include(path, out var fault) is { } source)
            {
                Collect(ChemistryReader.Read(source, isCatalogue: false));
            }
            else
            {
                _diagnostics.Add(FileNotRead.At(span, path, fault ?? "it cannot be read"));
            }
        }
    }

    private void Declare(Declared declared)
    {
        if (_byName.TryGetValue(declared.Name, out var earlier))
        {
            if (
                declared.FromCatalogue
                && earlier.FromCatalogue
                && declared.Kind != SpeciesKind.Basis
            )
            {
                Clash(earlier.Span, declared);
                return;
            }

            // The same basis ion in two files is the same ion.
            if (declared.Kind != SpeciesKind.Basis || earlier.Kind != SpeciesKind.Basis)
            {
                _diagnostics.Add(
                    (earlier.FromCatalogue, declared.FromCatalogue) switch
                    {
                        (true, false) => NeedsOverride.At(
                            declared.Span,
                            declared.Name,
                            earlier.Span
                        ),
                        (false, true) => NeedsOverride.At(
                            earlier.Span,
                            declared.Name,
                            declared.Span
                        ),
                        _ => DeclaredTwice.At(declared.Span, declared.Name, earlier.Span),
                    }
                );
            }

            return;
        }

        _byName.Add(declared.Name, declared);
    }

    private void BindSets()
    {
        ChemistryFile? first = null;
        foreach (var file in _order.Where(f => f.Set is not null))
        {
            first ??= file;
            Set ??= file.Set;
            var (one, other) = (CatalogueName(first.Source), CatalogueName(file.Source));
            if (
                file.Set != first.Set
                && !_clashes.Contains((one, other))
                && _clashes.Add((other, one))
            )
            {
                var use = _order
                    .SelectMany(f => f.UsedCatalogues)
                    .LastOrDefault(u => string.Equals(u.Name, other, StringComparison.Ordinal));
                _diagnostics.Add(
                    SetsDoNotMix.At(
                        use.Name is null ? new SourceSpan(file.Source, 0, 0) : use.Span,
                        one,
                        other,
                        "interactions between the same ions"
                    )
                );
            }
        }
    }

    private void BindParameters(Dictionary<string, Citation> citations)
    {
        var seen = new Dictionary<string, ActivityParameter>(StringComparer.Ordinal);
        foreach (var parameter in _order.SelectMany(f => f.ActivityParameters))
        {
            // The order of two ions does not matter, save where the kind tells them apart.
            var names = parameter.Species.Select(s => s.Text);
            var key = $"{parameter.Kind} {string.Join(' ', names.Order(StringComparer.Ordinal))}";
            if (seen.TryGetValue(key, out var earlier))
            {
                _diagnostics.Add(
                    DeclaredTwice.At(
                        parameter.Span,
                        $"{parameter.Kind.ToString().ToLowerInvariant()} {string.Join(' ', parameter.Species)}",
                        earlier.Span
                    )
                );
                continue;
            }

            var source = parameter.Source is { Text.Length: 0 } open
                ? citations.GetValueOrDefault(open.Key)
                : parameter.Source;
            seen.Add(key, parameter with { Source = source });
        }

        ActivityParameters =
        [
            .. seen
                .Values.OrderBy(p => p.Span.Source.Name, StringComparer.Ordinal)
                .ThenBy(p => p.Span.Start),
        ];
    }

    // Two catalogues that both declare a species are sets fitted apart: said once a pair, at the use that brought the second.
    private void Clash(SourceSpan first, Declared declared)
    {
        var (one, other) = (CatalogueName(first.Source), CatalogueName(declared.Span.Source));
        if (_clashes.Add((one, other)))
        {
            var use = _order
                .SelectMany(f => f.UsedCatalogues)
                .LastOrDefault(u => string.Equals(u.Name, other, StringComparison.Ordinal));
            _diagnostics.Add(
                SetsDoNotMix.At(
                    use.Name is null ? declared.Span : use.Span,
                    one,
                    other,
                    declared.Name
                )
            );
        }
    }

    private static string CatalogueName(SourceText source) =>
        System.IO.Path.GetFileNameWithoutExtension(source.Name);

    private void Override(OverrideDeclaration replacement)
    {
        var name = replacement.Replacement.Name;
        if (
            !_byName.TryGetValue(name, out var original)
            || original.Kind != replacement.Replacement.Kind
            || original.Constant is null
        )
        {
            _diagnostics.Add(
                NothingToOverride.At(
                    replacement.Span,
                    name,
                    EditDistance.Closest(
                        name,
                        _byName
                            .Values.Where(d => d.Kind == replacement.Replacement.Kind)
                            .Select(d => d.Name)
                    )
                )
            );
            return;
        }

        if (!SameReaction(original.Written!, replacement.Replacement.Written!))
        {
            _diagnostics.Add(
                OverrideChangesReaction.At(
                    replacement.Span,
                    name,
                    original.Written!.ToString(),
                    original.Span
                )
            );
            return;
        }

        _byName[name] = original with
        {
            Constant = replacement.Replacement.Constant,
            Override = new Override(original.Constant, replacement.Because ?? "", replacement.Span),
            Doubt = replacement.Replacement.Doubt,
        };
    }

    private static bool SameReaction(Reaction one, Reaction other)
    {
        return SameSide(one.Left, other.Left) && SameSide(one.Right, other.Right);

        static bool SameSide(ImmutableArray<Term> a, ImmutableArray<Term> b) =>
            a.Length == b.Length
            && a.All(t =>
                b.Any(o => o.Species.Equals(t.Species) && o.Coefficient == t.Coefficient)
            );
    }

    private void EnsureHydrogen()
    {
        if (!_byName.ContainsKey("H+"))
        {
            _byName.Add(
                "H+",
                new Declared
                {
                    Name = "H+",
                    Formula = FormulaReader.Standard.Read("H+"),
                    Kind = SpeciesKind.Basis,
                    Span = new SourceSpan(_order[0].Source, 0, 0),
                }
            );
        }
    }

    private Species? Place(Declared declared, Dictionary<string, Citation> citations)
    {
        if (Rewrite(declared) is not { } rewritten)
        {
            return null;
        }

        return new Species
        {
            Name = declared.Name,
            Formula = declared.Formula,
            Kind = declared.Kind,
            Written = declared.Written,
            Constant = declared.Constant is null ? null : Cite(declared.Constant, citations),
            FromBasis = rewritten.Terms,
            FormationConstants = rewritten.Constants,
            Override = declared.Override,
            HeldBackByDefault = declared.HeldBack,
            Doubt = declared.Doubt,
            Span = declared.Span,
        };
    }

    private static EquilibriumConstant Cite(
        EquilibriumConstant constant,
        Dictionary<string, Citation> citations
    ) =>
        constant.Source is { Text.Length: 0 } open
            ? constant with
            {
                Source = citations.GetValueOrDefault(open.Key),
            }
            : constant;

    /// <summary>A species over the basis.</summary>
    private sealed record Rewritten(
        ImmutableArray<Term> Terms,
        ImmutableArray<ConstantShare> Constants
    );

    // Formation of one mole: the written reaction solved for the species, with everything else in it replaced by its own formation.
    private Rewritten? Rewrite(Declared declared)
    {
        if (_rewritten.TryGetValue(declared.Name, out var known))
        {
            return known;
        }

        if (declared.Kind == SpeciesKind.Basis)
        {
            return _rewritten[declared.Name] = new Rewritten([new Term(1, declared.Formula)], []);
        }

        if (!_open.Add(declared.Name))
        {
            _diagnostics.Add(Cycle.At(declared.Span, declared.Name));
            return _rewritten[declared.Name] = null;
        }

        var reaction = declared.Written!;
        var isProduct = declared.Kind == SpeciesKind.Complex;
        var own = (isProduct ? reaction.Right : reaction.Left)
            .First(t => t.Species.Equals(declared.Formula))
            .Coefficient;
        var sign = (isProduct ? 1 : -1) / own;
        var terms = new SortedDictionary<string, Term>(StringComparer.Ordinal);
        List<ConstantShare> constants = [new(declared.Name, declared.Constant!, sign)];
        var fine = true;
        foreach (
            var (term, side) in reaction
                .Left.Select(t => (t, 1.0))
                .Concat(reaction.Right.Select(t => (t, -1.0)))
        )
        {
            if (term.Species.Equals(declared.Formula))
            {
                continue;
            }

            var share = sign * side * term.Coefficient;
            if (term.Species.IsWater || term.Species.IsElectron)
            {
                Add(term.Species, share);
                continue;
            }

            if (!_byName.TryGetValue(term.Species.Text, out var part))
            {
                _diagnostics.Add(
                    UnknownSpecies.At(
                        declared.Span,
                        term.Species.Text,
                        EditDistance.Closest(
                            term.Species.Text,
                            _byName
                                .Values.Where(d =>
                                    d.Kind is SpeciesKind.Basis or SpeciesKind.Complex
                                )
                                .Select(d => d.Name)
                        )
                    )
                );
                fine = false;
                continue;
            }

            if (Rewrite(part) is not { } formation)
            {
                fine = false;
                continue;
            }

            foreach (var inner in formation.Terms)
            {
                Add(inner.Species, share * inner.Coefficient);
            }

            constants.AddRange(formation.Constants.Select(c => c with { Share = c.Share * share }));
        }

        _open.Remove(declared.Name);
        return _rewritten[declared.Name] = fine
            ? new Rewritten(
                [.. terms.Values.Where(t => Math.Abs(t.Coefficient) > 1e-12)],
                [.. constants]
            )
            : null;

        void Add(Formula species, double coefficient) =>
            terms[species.Text] = new Term(
                coefficient
                    + (terms.TryGetValue(species.Text, out var before) ? before.Coefficient : 0),
                species
            );
    }
}
