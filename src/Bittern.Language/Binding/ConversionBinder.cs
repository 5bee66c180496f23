using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;
using Bittern.Language.Lexing;
using Bittern.Model;

namespace Bittern.Language.Binding;

/// <summary>Combines two half-reactions into an oxidation or reduction by stoichiometric need.</summary>
internal sealed class ConversionBinder(
    Analytes analytes,
    ImmutableArray<HalfReaction> halves,
    ImmutableArray<Species> species,
    List<Diagnostic> diagnostics
)
{
    private readonly Dictionary<string, Species> _byFormula = species
        .Where(s => s.Kind != SpeciesKind.Solid)
        .GroupBy(s => s.Formula.Text, StringComparer.Ordinal)
        .ToDictionary(g => g.Key, g => g.First(), StringComparer.Ordinal);

    /// <summary>The conversion of all of <paramref name="from"/> with as much agent as it takes; a diagnostic and null when no couple fits.</summary>
    public StageAction.Convert? Bind(Token from, Token agent, bool oxidise, SourceSpan span)
    {
        if (analytes.Resolve(from.Text) is not { } analyte)
        {
            diagnostics.Add(AnalyteWithoutSpecies.At(from.Span, from.Text));
            return null;
        }

        var source = analyte
            .PerMole.First(t => !t.Species.IsWater && !t.Species.IsHydrogenIon)
            .Species;
        var couple = halves.FirstOrDefault(h =>
            Side(h, oxidise).Any(t => t.Species.Equals(source))
            && Other(h, oxidise)
                .Any(t => _byFormula.ContainsKey(t.Species.Text) && !t.Species.IsWater)
        );
        var agentCouple = halves.FirstOrDefault(h =>
            !ReferenceEquals(h, couple)
            && Side(h, !oxidise).Any(t => IsAgent(t.Species, agent.Text))
        );
        if (couple is null || agentCouple is null)
        {
            diagnostics.Add(
                NoCouple.At(
                    couple is null ? from.Span : agent.Span,
                    couple is null ? from.Text : agent.Text
                )
            );
            return null;
        }

        var own = Side(couple, oxidise).First(t => t.Species.Equals(source)).Coefficient;
        var agentTerm = Side(agentCouple, !oxidise).First(t => IsAgent(t.Species, agent.Text));
        var electrons = couple.Electrons / own;
        var agents = electrons / agentCouple.Electrons;
        var net = new SortedDictionary<string, Term>(StringComparer.Ordinal);
        Add(couple.Written, (oxidise ? -1 : 1) / own);
        Add(agentCouple.Written, (oxidise ? 1 : -1) * agents);
        var perMole = agents * agentTerm.Coefficient;
        var isGas = agentTerm.Species.Phase == PhaseMark.Gas;
        return Over(net, source, isGas ? agentTerm.Species : null) is not { } brings
            ? null
            : new StageAction.Convert(source, brings, agent.Text, perMole, isGas, Text(net), span);

        void Add(Reaction reaction, double times)
        {
            foreach (
                var (term, sign) in reaction
                    .Left.Select(t => (t, -1.0))
                    .Concat(reaction.Right.Select(t => (t, 1.0)))
            )
            {
                var before = net.TryGetValue(term.Species.Text, out var known)
                    ? known.Coefficient
                    : 0;
                net[term.Species.Text] = new Term(
                    before + (times * sign * term.Coefficient),
                    term.Species
                );
            }
        }
    }

    /// <summary>
    /// The conversion as it stands when the stage's atmospheres, a liquor or a reagent supply the agent. When nothing does, the agent is taken to be at
    /// hand in whatever amount is needed, outside of the liquor, and a diagnostic says so.
    /// </summary>
    public StageAction.Convert Supplied(StageAction.Convert convert, Stage stage, Named named)
    {
        var gases = stage
            .Contacts.SelectMany(c => c.Pressures)
            .Select(p => _byFormula.GetValueOrDefault(p.Gas.Text))
            .OfType<Species>()
            .SelectMany(g => g.FromBasis);
        var brought = named
            .Liquors.Values.SelectMany(l => l.Entries)
            .Concat(named.Reagents.Values.SelectMany(r => r.Entries))
            .SelectMany(e => e.PerMole)
            .Concat(gases)
            .Select(t => t.Species.Text)
            .ToHashSet(StringComparer.Ordinal);
        var missing = convert
            .Brings.Where(t =>
                t.Coefficient < 0
                && !t.Species.IsWater
                && !t.Species.IsHydrogenIon
                && !brought.Contains(t.Species.Text)
            )
            .ToList();
        var fromNowhere =
            missing.Count > 0
            || (convert.AgentFromAir && !stage.Contacts.Any(c => Holds(c, convert.Agent)));
        if (!fromNowhere)
        {
            return convert;
        }

        diagnostics.Add(AgentWithoutSource.At(convert.Span, stage.Name, convert.Agent));
        return convert with { Brings = convert.Brings.RemoveRange(missing), AgentFromAir = true };
    }

    private static bool Holds(Atmosphere atmosphere, string agent) =>
        atmosphere.Pressures.Any(p =>
            string.Equals(p.Gas.Text, agent, StringComparison.Ordinal)
            || string.Equals(p.Gas.Text, agent + "(g)", StringComparison.Ordinal)
        );

    private static ImmutableArray<Term> Side(HalfReaction half, bool reduced) =>
        reduced ? half.Written.Right : half.Written.Left;

    private static ImmutableArray<Term> Other(HalfReaction half, bool reduced) =>
        Side(half, !reduced);

    private static bool IsAgent(Formula formula, string agent) =>
        string.Equals(formula.Text, agent, StringComparison.Ordinal)
        || (
            OxidationState.TryRead(agent, out var symbol, out var state)
            && OxidationState.In(formula, symbol) == state
            && formula.Phase != PhaseMark.Solid
        )
        || (
            !agent.Contains('(', StringComparison.Ordinal)
            && (
                string.Equals(formula.Text, agent + "(g)", StringComparison.Ordinal)
                || string.Equals(formula.Text, agent + "(aq)", StringComparison.Ordinal)
            )
        );

    // The net reaction over the basis, per mole of what is converted; that mole itself and a gaseous agent are left out.
    private ImmutableArray<Term>? Over(
        SortedDictionary<string, Term> net,
        Formula source,
        Formula? outside
    )
    {
        var sum = new SortedDictionary<string, Term>(StringComparer.Ordinal);
        foreach (var term in net.Values)
        {
            if (
                Math.Abs(term.Coefficient) < 1e-12
                || term.Species.IsElectron
                || term.Species.Equals(source)
                || term.Species.Equals(outside)
            )
            {
                continue;
            }

            if (term.Species.IsWater)
            {
                Add(term.Species, term.Coefficient);
            }
            else if (_byFormula.TryGetValue(term.Species.Text, out var known))
            {
                foreach (var part in known.FromBasis)
                {
                    Add(part.Species, part.Coefficient * term.Coefficient);
                }
            }
            else
            {
                diagnostics.Add(UnknownSpecies.At(halves[0].Span, term.Species.Text, null));
                return null;
            }
        }

        return [.. sum.Values.Where(t => Math.Abs(t.Coefficient) > 1e-12)];

        void Add(Formula formula, double coefficient) =>
            sum[formula.Text] = new Term(
                coefficient
                    + (sum.TryGetValue(formula.Text, out var before) ? before.Coefficient : 0),
                formula
            );
    }

    private static string Text(SortedDictionary<string, Term> net) =>
        new Reaction(
            [
                .. net
                    .Values.Where(t => t.Coefficient < -1e-12 && !t.Species.IsElectron)
                    .Select(t => t with { Coefficient = -t.Coefficient }),
            ],
            [.. net.Values.Where(t => t.Coefficient > 1e-12 && !t.Species.IsElectron)]
        ).ToString();
}
