using System.Collections.Immutable;
using Bittern.Calculation;
using Bittern.Chemistry;
using Bittern.Model;
using Bittern.Reports.Writing;

namespace Bittern.Reports.Sections;

/// <summary>A hazard that the chemistry of a recipe brings.</summary>
/// <param name="Trigger">What in this recipe brings it, as a sentence.</param>
/// <param name="Text">What to do about it.</param>
internal sealed record Caution(string Trigger, string Text);

/// <summary>
/// The usual cautions of handling, each with what triggers it. Common practice; safety data sheets and local rules go further.
/// </summary>
internal static class Cautions
{
    private static readonly string[] StrongBases = ["Ca(OH)2", "CaO", "NaOH", "KOH", "LiOH"];
    private static readonly string[] MildBases = ["Mg(OH)2", "MgO", "Na2CO3", "CaCO3", "NaHCO3"];
    private static readonly string[] StrongAcids =
    [
        "HCl",
        "H2SO4",
        "HNO3",
        "H3PO4",
        "HClO4",
        "HBr",
    ];
    private static readonly string[] Oxidisers =
    [
        "H2O2",
        "KMnO4",
        "NaOCl",
        "NaClO",
        "Ca(OCl)2",
        "Ca(ClO)2",
        "O3",
        "Cl2",
    ];
    private static readonly string[] Sulfides = ["Na2S", "NaHS", "K2S", "(NH4)2S", "FeS", "CaS"];

    /// <summary>Elements whose hydroxide, sulfate or arsenate sludge is usually a waste under special rules.</summary>
    private static readonly (string Symbol, string Name)[] ToxicElements =
    [
        ("As", "arsenic"),
        ("Be", "beryllium"),
        ("Cd", "cadmium"),
        ("Co", "cobalt"),
        ("Cr", "chromium"),
        ("Cu", "copper"),
        ("Hg", "mercury"),
        ("Ni", "nickel"),
        ("Pb", "lead"),
        ("Sb", "antimony"),
        ("Se", "selenium"),
        ("Tl", "thallium"),
        ("Zn", "zinc"),
    ];

    private static readonly string[] Radioactive = ["Po", "Ra", "Th", "U"];

    public static IEnumerable<Caution> Of(Outcome outcome)
    {
        var dosed = DosedSubstances(outcome);
        var present = PresentFormulas(outcome);
        return GasCautions
            .Of(outcome)
            .Concat(Reagents(dosed))
            .Concat(Liquids(outcome, dosed, present))
            .Concat(Sludges(outcome))
            .Concat(Scale(outcome));
    }

    private static ImmutableArray<(string Reagent, string Substance, bool Dry)> DosedSubstances(
        Outcome outcome
    ) =>
        [
            .. outcome
                .Trains.SelectMany(t => t.Train.Stages)
                .SelectMany(s => s.Actions)
                .Select(a =>
                    (a as StageAction.AddAmount)?.Reagent ?? (a as StageAction.AddUntil)?.Reagent
                )
                .OfType<Reagent>()
                .DistinctBy(r => r.Name, StringComparer.Ordinal)
                .SelectMany(r => r.Entries.Select(e => (r.Name, e.Analyte, r.IsDry))),
        ];

    private static ImmutableArray<Formula> PresentFormulas(Outcome outcome) =>
        [
            .. Mattering
                .States(outcome)
                .SelectMany(s => s.DissolvedTotals)
                .Where(t => t.Coefficient > 0)
                .Select(t => t.Species)
                .Distinct(),
        ];

    private static IEnumerable<Caution> Reagents(
        ImmutableArray<(string Reagent, string Substance, bool Dry)> dosed
    )
    {
        foreach (var (reagent, substance, dry) in dosed)
        {
            var name = MarkdownText.Escape(reagent);
            var formula = MarkdownText.Escape(substance);
            if (Is(StrongBases, substance))
            {
                yield return new Caution(
                    $"'{name}' holds {formula}, a strong base.",
                    "It burns skin and can blind: face shield, gloves, eye wash within reach."
                        + (
                            substance is "CaO"
                                ? " Quicklime boils when it slakes; add it to water slowly and keep people away from the steam."
                                : ""
                        )
                        + (
                            substance is "NaOH" or "KOH"
                                ? " Diluting it gives off much heat; add it to water, never water to it."
                                : ""
                        )
                        + (dry ? " Keep dust down and out of lungs." : "")
                );
            }
            else if (Is(StrongAcids, substance))
            {
                yield return new Caution(
                    $"'{name}' holds {formula}, a strong acid.",
                    "It burns skin and eyes, and its dilution gives off much heat: add acid to water, never water to acid. Keep it away from sulfide, cyanide, hypochlorite and carbonate liquors in closed spaces."
                );
            }
            else if (substance is "HF")
            {
                yield return new Caution(
                    $"'{name}' holds hydrogen fluoride.",
                    "Burns are deep, late to hurt and can kill: trained people only, calcium gluconate gel at hand."
                );
            }
            else if (Is(MildBases, substance) && dry)
            {
                yield return new Caution(
                    $"'{name}' is dosed dry.",
                    "Its dust irritates eyes and lungs; keep dust down."
                );
            }
            else if (Is(Oxidisers, substance))
            {
                yield return new Caution(
                    $"'{name}' holds {formula}, a strong oxidiser.",
                    "Keep it from organic matter and reducing agents"
                        + (
                            substance is "NaOCl" or "NaClO" or "Ca(OCl)2" or "Ca(ClO)2"
                                ? ", and from every acid: chlorine gas would be set free."
                                : "."
                        )
                );
            }
            else if (Is(Sulfides, substance))
            {
                yield return new Caution(
                    $"'{name}' holds {formula}.",
                    "Any acid sets free hydrogen sulfide, which kills in minutes and numbs the sense of smell: interlock the dosing with pH, ventilate, fixed gas detection."
                );
            }
            else if (substance is "NH3" or "NH4OH")
            {
                yield return new Caution(
                    $"'{name}' holds ammonia.",
                    "Its vapour burns eyes and lungs; closed handling and ventilation."
                );
            }
        }
    }

    private static IEnumerable<Caution> Liquids(
        Outcome outcome,
        ImmutableArray<(string Reagent, string Substance, bool Dry)> dosed,
        ImmutableArray<Formula> present
    )
    {
        var acids = dosed.Any(d => Is(StrongAcids, d.Substance));
        var lowest = Mattering.States(outcome).Select(s => s.PH).DefaultIfEmpty(7).Min();
        var highest = Mattering.States(outcome).Select(s => s.PH).DefaultIfEmpty(7).Max();
        if (present.Any(IsSulfide))
        {
            yield return new Caution(
                $"Sulfide is dissolved and the lowest pH is {Digits.PH(lowest)}.",
                "Below about pH 9 hydrogen sulfide leaves the liquor. Never acidify it in the open"
                    + (acids ? "; this recipe doses acid" : "")
                    + ": ventilate, fixed gas detection, nobody alone."
            );
        }

        if (present.Any(f => f.AtomsOf("C") == 1 && f.AtomsOf("N") == 1 && f.AtomsOf("O") == 0))
        {
            yield return new Caution(
                $"Cyanide is dissolved and the lowest pH is {Digits.PH(lowest)}.",
                "Below about pH 10.5 hydrogen cyanide leaves the liquor"
                    + (acids ? "; this recipe doses acid" : "")
                    + ". Keep the pH up, fixed gas detection, antidote and trained people on site."
            );
        }

        if (highest > 8.5 && present.Any(f => f.Text is "NH4+" or "NH3(aq)" or "NH3"))
        {
            yield return new Caution(
                $"Ammonium is dissolved and the pH reaches {Digits.PH(highest)}.",
                "Ammonia leaves the liquor above about pH 9: ventilate closed tanks and look at odour and air permits."
            );
        }

        if (present.Any(f => f.AtomsOf("Cr") > 0 && OxidationState.In(f, "Cr") == 6))
        {
            yield return new Caution(
                "Hexavalent chromium is dissolved.",
                "It causes cancer and burns skin: no mist, no skin contact. Lime does not precipitate it; it has to be reduced first."
            );
        }

        if (lowest < 6 && present.Any(f => f.Text is "F-"))
        {
            yield return new Caution(
                $"Fluoride is dissolved and the lowest pH is {Digits.PH(lowest)}.",
                "Towards pH 3 it turns into hydrogen fluoride, which passes through skin and attacks glass and enamel. Treat acid fluoride liquors as hydrofluoric acid."
            );
        }

        if (lowest < 4)
        {
            yield return new Caution(
                $"The lowest pH is {Digits.PH(lowest)}.",
                "The liquor is corrosive: protect eyes and hands when sampling, and choose pump, pipe and concrete accordingly."
            );
        }

        if (highest > 11)
        {
            yield return new Caution(
                $"The pH reaches {Digits.PH(highest)}.",
                "The liquor is caustic; it also takes up carbon dioxide from the air and scales with calcite. Correct the pH before discharge."
            );
        }

        if (acids && present.Any(f => f.Text is "CO3^2-" or "HCO3-"))
        {
            yield return new Caution(
                "Acid is dosed into a liquor with carbonate.",
                "Carbon dioxide is given off: it foams, and it collects in sumps and closed tanks, where it suffocates."
            );
        }
    }

    private static bool IsSulfide(Formula f) =>
        f.AtomsOf("S") > 0 && f.AtomsOf("O") == 0 && f.AtomsOf("C") == 0 && f.AtomsOf("N") == 0;

    private static IEnumerable<Caution> Sludges(Outcome outcome)
    {
        foreach (var sludge in outcome.Trains.SelectMany(t => t.Sludges))
        {
            var metals = ToxicElements
                .Select(e =>
                    (
                        e.Name,
                        Mass: sludge.Solids.Sum(s =>
                            s.Solid.Formula.AtomsOf(e.Symbol)
                            * Mass(e.Symbol)
                            * s.MolesPerFeed
                            / 1000
                        )
                    )
                )
                .Where(e =>
                    e.Mass > 0
                    && sludge.DryMassPerFeed > 0
                    && e.Mass / sludge.DryMassPerFeed >= 1e-4
                )
                .Select(e => $"{e.Name} {Digits.Percent(e.Mass / sludge.DryMassPerFeed)}")
                .ToArray();
            if (metals.Length > 0)
            {
                yield return new Caution(
                    $"The sludge '{MarkdownText.Escape(sludge.Name)}' holds, of its dry mass: {string.Join(", ", metals)}.",
                    "Acid water or strong base dissolves it again. Have it classified and leach-tested under local waste rules before it is moved, and keep it apart from acid drainage."
                );
            }

            var active = Radioactive
                .Where(r => sludge.Solids.Any(s => s.Solid.Formula.AtomsOf(r) > 0))
                .ToArray();
            if (active.Length > 0)
            {
                yield return new Caution(
                    $"The sludge '{MarkdownText.Escape(sludge.Name)}' collects {string.Join(", ", active)}.",
                    "It can become radioactive waste although the liquor is not: have its activity measured and a radiation protection adviser named."
                );
            }
        }
    }

    private static double Mass(string symbol) =>
        PeriodicTable.BySymbol.TryGetValue(symbol, out var element) ? element.MolarMass : 0;

    private static IEnumerable<Caution> Scale(Outcome outcome)
    {
        foreach (
            var train in outcome.Trains.Where(t => t is { Failure: null, Train.IsMixture: false })
        )
        {
            var scaling = train
                .Stages.SelectMany(s => s.Saturations)
                .Where(s => s.Role == SaturationRole.Present && IsScale(s.Solid.Formula))
                .Select(s => MarkdownText.Escape(s.Solid.Name))
                .Distinct(StringComparer.Ordinal)
                .ToArray();
            if (scaling.Length > 0)
            {
                yield return new Caution(
                    $"The treated liquor of '{MarkdownText.Escape(train.Train.Name)}' is saturated with {string.Join(", ", scaling)}.",
                    "Expect scale on probes, pumps and pipes: clean pH probes often, for a coated probe overdoses; recirculated sludge as seed moves the scale into the sludge."
                );
            }
        }
    }

    // Sparingly soluble salts of the alkaline earths are what scales; hydroxides come down as floc.
    private static bool IsScale(Formula f) =>
        (f.AtomsOf("Ca") > 0 || f.AtomsOf("Ba") > 0 || f.AtomsOf("Sr") > 0 || f.AtomsOf("Mg") > 0)
        && (
            f.AtomsOf("S") > 0
            || f.AtomsOf("C") > 0
            || f.AtomsOf("P") > 0
            || f.AtomsOf("F") > 0
            || f.AtomsOf("Si") > 0
        );

    private static bool Is(string[] list, string substance) =>
        list.Contains(substance, StringComparer.Ordinal);
}
