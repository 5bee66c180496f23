using Bittern.Chemistry;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>
/// What one unit of a reagent brings: one m3 of product as delivered, or one kg of a dry one.
/// </summary>
internal sealed class ReagentMakeUp
{
    /// <summary>Density of the insoluble or undissolved part of a slurry that states no density, kg/m3 (calcium hydroxide and most hydroxides lie near it).</summary>
    private const double DrySolidDensity = 2400;

    private readonly EngineSystem _system;

    public ReagentMakeUp(Reagent reagent, EngineSystem system)
    {
        _system = system;
        Reagent = reagent;
        Totals = new double[system.Basis.Length];
        if (reagent.IsDry)
        {
            ProductKilograms = 1;
            foreach (var entry in reagent.Entries)
            {
                var fraction =
                    entry.Amount.Kind == ConcentrationKind.MassFraction ? entry.Amount.UsedSi : 1;
                Count(entry, fraction);
            }

            return;
        }

        var dry = reagent.Entries.Sum(e => DryKilograms(e, reagent.Density));
        ProductKilograms = reagent.Density ?? (1000 + (dry * (1 - (1000 / DrySolidDensity))));
        foreach (var entry in reagent.Entries)
        {
            Count(entry, DryKilograms(entry, ProductKilograms));
        }

        Water += (ProductKilograms - DryKilogramsTotal) / PhysicalConstants.WaterMolarMass;
    }

    public Reagent Reagent { get; }

    /// <summary>mol of each basis species per unit.</summary>
    public double[] Totals { get; }

    /// <summary>mol of water per unit, what substances bind included.</summary>
    public double Water { get; private set; }

    /// <summary>kg of product per unit.</summary>
    public double ProductKilograms { get; }

    /// <summary>kg of dry substance per unit, impurities included.</summary>
    public double DryKilogramsTotal { get; private set; }

    /// <summary>kg of substance per unit after purity.</summary>
    public double ActiveKilograms { get; private set; }

    /// <summary>Units per m3 entering the stage that a dose as written stands for; null when its <c>as</c> substance is not in the reagent.</summary>
    public double? Units(Dose dose)
    {
        if (dose.As is null)
        {
            return dose.Kind switch
            {
                DoseKind.VolumePerVolume => Reagent.IsDry ? null : dose.Si,
                DoseKind.MassPerVolume => dose.Si / ProductKilograms,
                _ => Reagent.Entries.Length == 1 ? dose.Si / MolesOf(Reagent.Entries[0]) : null,
            };
        }

        // The substance counts through the first basis species that it shares with an entry: CaO against Ca(OH)2 by calcium.
        var moles =
            dose.Kind == DoseKind.MassPerVolume ? dose.Si * 1000 / dose.As.MolarMass : dose.Si;
        foreach (var entry in Reagent.Entries)
        {
            foreach (
                var term in entry.PerMole.Where(t => !t.Species.IsWater && !t.Species.IsHydrogenIon)
            )
            {
                var element = term.Species.Atoms.Keys.FirstOrDefault(k => k is not ("H" or "O"));
                if (element is not null && dose.As.AtomsOf(element) > 0)
                {
                    var perUnit =
                        Totals[_system.IndexOf(term.Species)] * term.Species.AtomsOf(element);
                    return moles * dose.As.AtomsOf(element) / perUnit;
                }
            }
        }

        return null;
    }

    /// <summary>Adds a dose to a stream.</summary>
    /// <param name="stream">The stream.</param>
    /// <param name="units">Units per m3 of feed.</param>
    public void AddTo(Stream stream, double units)
    {
        for (var i = 0; i < Totals.Length; i++)
        {
            stream.Totals[i] += units * Totals[i];
        }

        stream.Water += units * Water;
        stream.Inert += units * (DryKilogramsTotal - ActiveKilograms);
    }

    private double MolesOf(AnalysisEntry entry) =>
        Reagent.IsDry
            ? ActiveKilograms * 1000 / entry.MolarMass
            : DryKilograms(entry, ProductKilograms) * Reagent.Purity * 1000 / entry.MolarMass;

    private static double DryKilograms(AnalysisEntry entry, double? density) =>
        entry.Amount.Kind switch
        {
            ConcentrationKind.MassPerVolume => entry.Amount.UsedSi,
            ConcentrationKind.MolesPerVolume => entry.Amount.UsedSi * entry.MolarMass / 1000,
            ConcentrationKind.EquivalentsPerVolume => entry.Amount.UsedSi
                / Math.Abs(entry.ChargePerMole ?? 1)
                * entry.MolarMass
                / 1000,

            // Mass fractions of a product without density: solutions are denser by about the volume that the solute does not take.
            ConcentrationKind.MassFraction => entry.Amount.UsedSi
                * (density ?? 1000 / (1 - (entry.Amount.UsedSi * (1 - (1000 / DrySolidDensity))))),
            ConcentrationKind.Molality => MolalDry(entry, density),
            _ => throw new InvalidOperationException(
                $"unknown concentration kind {entry.Amount.Kind}"
            ),
        };

    private static double MolalDry(AnalysisEntry entry, double? density)
    {
        var perWater = entry.Amount.UsedSi * entry.MolarMass / 1000;
        return (density ?? 1000) * perWater / (1 + perWater);
    }

    private void Count(AnalysisEntry entry, double dryKilograms)
    {
        var active = dryKilograms * Reagent.Purity;
        DryKilogramsTotal += dryKilograms;
        ActiveKilograms += active;
        var water = 0.0;
        _system.AddTerms(entry.PerMole, active * 1000 / entry.MolarMass, Totals, ref water);
        Water += water;
    }
}
