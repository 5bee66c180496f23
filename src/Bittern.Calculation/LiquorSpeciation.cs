using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Engine;
using Bittern.Engine.Water;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>How values below detection count: as the recipe says, or all at one end to see whether a verdict depends on it.</summary>
internal enum DetectionChoice
{
    AsStated,
    AllZero,
    AllAtLimit,
}

/// <summary>Turns an analysis into a speciated stream of 1 m3 of liquor.</summary>
internal static class LiquorSpeciation
{
    private const int MaxPasses = 60;

    /// <summary>Largest change of density, relative, that ends the iteration between volume and mass units.</summary>
    private const double DensityTolerance = 1e-12;

    public static (LiquorResult Result, Stream? Stream) Solve(
        Liquor liquor,
        EngineSystem system,
        double recipeCelsius,
        DetectionChoice choice,
        AnalysisEntry? onlyEntry = null
    )
    {
        var work = new Work(
            liquor,
            system,
            (liquor.TemperatureCelsius ?? recipeCelsius) + PhysicalConstants.ZeroCelsius,
            choice,
            onlyEntry
        );
        return work.Run();
    }

    /// <summary>SI value that counts for an entry.</summary>
    public static double Used(Concentration amount, DetectionChoice choice) =>
        (choice, amount.BelowDetection) switch
        {
            (_, BelowDetection.No) => amount.Si,
            (DetectionChoice.AllZero, _) => 0,
            (DetectionChoice.AllAtLimit, _) => amount.Si,
            _ => amount.UsedSi,
        };

    /// <summary>mol per m3 of liquor that an entry stands for.</summary>
    public static double Moles(
        AnalysisEntry entry,
        double si,
        double density,
        double waterKilograms
    ) =>
        entry.Amount.Kind switch
        {
            ConcentrationKind.MassPerVolume => si * 1000 / entry.MolarMass,
            ConcentrationKind.MolesPerVolume => si,
            ConcentrationKind.EquivalentsPerVolume => si / Math.Abs(entry.ChargePerMole ?? 1),
            ConcentrationKind.Molality => si * waterKilograms,
            ConcentrationKind.MassFraction => si * density * 1000 / entry.MolarMass,
            _ => throw new InvalidOperationException(
                $"unknown concentration kind {entry.Amount.Kind}"
            ),
        };

    private sealed class Work(
        Liquor liquor,
        EngineSystem system,
        double kelvin,
        DetectionChoice choice,
        AnalysisEntry? onlyEntry
    )
    {
        private readonly Equilibrator _equilibrator = new(system);
        private readonly Stream _stream = new(system) { Kelvin = kelvin };
        private readonly double[] _moles = new double[liquor.Entries.Length];
        private readonly int _closing = liquor.ChargeClosedBy is null
            ? -1
            : liquor.Entries.IndexOf(liquor.ChargeClosedBy);
        private readonly int _carbonate = system.IndexOf(FormulaReader.Standard.Read("CO3^2-"));
        private double _density = liquor.Density ?? LiquidWater.Density(kelvin);
        private double _closure;
        private double _carbonateMoles;
        private bool _solvedOnce;

        public (LiquorResult Result, Stream? Stream) Run()
        {
            for (var pass = 0; pass < MaxPasses; pass++)
            {
                // Molalities count the water, and the water is what the mass of everything else leaves of the density.
                var water = WaterByMass();
                for (var e = 0; e < _moles.Length; e++)
                {
                    var entry = liquor.Entries[e];
                    _moles[e] = Moles(
                        entry,
                        Used(
                            entry.Amount,
                            onlyEntry is null || ReferenceEquals(onlyEntry, entry)
                                ? choice
                                : DetectionChoice.AsStated
                        ),
                        _density,
                        water
                    );
                }

                var status = Close();
                if (status != SolveStatus.Solved)
                {
                    return (Failed(status), null);
                }

                var before = _density;
                if (liquor.Density is null)
                {
                    _density =
                        system.LiquorMass(_stream.Answer) / system.Volume(_stream.Answer, kelvin);
                }

                if (Math.Abs(_density - before) <= DensityTolerance * _density && pass > 0)
                {
                    break;
                }
            }

            return Finish();
        }

        private double WaterByMass()
        {
            var perVolume = 0.0;
            var perWater = 0.0;
            foreach (var entry in liquor.Entries)
            {
                var si = Used(entry.Amount, choice);
                switch (entry.Amount.Kind)
                {
                    case ConcentrationKind.Molality:
                        perWater += si * entry.MolarMass / 1000;
                        break;
                    default:
                        perVolume += Moles(entry, si, _density, 0) * entry.MolarMass / 1000;
                        break;
                }
            }

            return Math.Max((_density - perVolume) / (1 + perWater), 1);
        }

        private (LiquorResult Result, Stream? Stream) Finish()
        {
            var (plain, speciated) = Imbalances();
            var answer = _stream.Answer;
            var result = new LiquorResult
            {
                Liquor = liquor,
                Entries =
                [
                    .. liquor.Entries.Select(
                        (e, i) => new EntryResult(e, _moles[i], _moles[i] / answer.WaterKilograms)
                    ),
                ],
                State = States.Describe(_stream, _equilibrator.Problem),
                Density = _density,
                DensityFromModel = liquor.Density is null,
                PlainChargeImbalance = plain,
                SpeciatedChargeImbalance = speciated,
                InertCharge = _closing < 0 ? _stream.InertCharge : 0,
                Closure =
                    _closing < 0
                        ? null
                        : new ChargeClosure(
                            liquor.Entries[_closing],
                            _moles[_closing],
                            _moles[_closing] + _closure
                        ),
            };
            return (result, _stream);
        }

        private LiquorResult Failed(SolveStatus status) =>
            new() { Liquor = liquor, Failure = States.Reason(status, _stream.Answer.Obstacle) };

        // Adjusts the closing entry (and inorganic carbon where alkalinity is given) by secants; the functions are monotone.
        private SolveStatus Close()
        {
            var status = CloseAlkalinity();
            if (status != SolveStatus.Solved || _closing < 0)
            {
                _stream.InertCharge = -Charge();
                return status;
            }

            var entry = liquor.Entries[_closing];
            var perMole = entry.PerMole.Sum(t => t.Coefficient * t.Species.Charge);
            var slope = (double)perMole;
            for (var i = 0; i < MaxPasses; i++)
            {
                var charge = Charge();
                if (Math.Abs(charge) <= 1e-13 * GrossCharge())
                {
                    break;
                }

                var step = -charge / slope;
                if (_moles[_closing] + _closure + step < 0)
                {
                    step = -(_moles[_closing] + _closure) / 2;
                }

                _closure += step;
                status = CloseAlkalinity();
                if (status != SolveStatus.Solved)
                {
                    return status;
                }

                var gained = Charge() - charge;
                if (Math.Abs(gained) > 0)
                {
                    slope = gained / step;
                }
            }

            _stream.InertCharge = 0;
            return status;
        }

        private SolveStatus CloseAlkalinity()
        {
            if (liquor.Alkalinity is not { } wanted || _carbonate < 0 || liquor.PH is null)
            {
                return Speciate(liquor.PH);
            }

            var step = Math.Max(wanted / 2, 1e-6);
            _carbonateMoles = Math.Max(_carbonateMoles, wanted);
            var previous = double.NaN;
            var at = _carbonateMoles;
            for (var i = 0; i < MaxPasses; i++)
            {
                _carbonateMoles = at;
                var status = Titrated(out var found);
                if (status != SolveStatus.Solved)
                {
                    return status;
                }

                var gap = found - wanted;
                if (Math.Abs(gap) <= 1e-12 * Math.Abs(wanted))
                {
                    break;
                }

                var slope = double.IsNaN(previous) ? 1 : (gap - previous) / step;
                previous = gap;
                step = -gap / (slope > 1e-6 ? slope : 1);
                step = at + step < 0 ? -at / 2 : step;
                at += step;
            }

            return Speciate(liquor.PH);
        }

        // Acid that a closed titration from the liquor's own pH to 4.5 takes, eq/m3.
        private SolveStatus Titrated(out double acid)
        {
            const double EndPoint = 4.5;
            acid = 0;
            var status = Speciate(EndPoint);
            if (status != SolveStatus.Solved)
            {
                return status;
            }

            var end = _stream.Totals[system.HydrogenIndex];
            status = Speciate(liquor.PH);
            acid = end - _stream.Totals[system.HydrogenIndex];
            return status;
        }

        private SolveStatus Speciate(double? pH)
        {
            Array.Clear(_stream.Totals);
            var bound = 0.0;
            for (var e = 0; e < _moles.Length; e++)
            {
                system.AddTerms(
                    liquor.Entries[e].PerMole,
                    _moles[e] + (e == _closing ? _closure : 0),
                    _stream.Totals,
                    ref bound
                );
            }

            if (_carbonate >= 0)
            {
                _stream.Totals[_carbonate] += _carbonateMoles;
            }

            if (pH is not null)
            {
                _stream.Totals[system.HydrogenIndex] = 0;
            }

            // What is not solute by mass is water; water that entries bind (hydroxides over H+) is part of it.
            var grams = 0.0;
            for (var i = 0; i < _stream.Totals.Length; i++)
            {
                grams += _stream.Totals[i] * system.Basis[i].Formula.MolarMass;
            }

            _stream.Water = ((_density * 1000) - grams) / (PhysicalConstants.WaterMolarMass * 1000);
            Array.Clear(_stream.Suspended);
            var status = _equilibrator.RunFixedPH(_stream, pH, _solvedOnce);
            _solvedOnce = status == SolveStatus.Solved;
            return status;
        }

        private double Charge()
        {
            var sum = 0.0;
            for (var i = 0; i < _stream.Totals.Length; i++)
            {
                sum += _stream.Totals[i] * system.Basis[i].Formula.Charge;
            }

            return sum;
        }

        private double GrossCharge()
        {
            var sum = 0.0;
            for (var j = 0; j < system.Aqueous.Length; j++)
            {
                sum += Math.Abs(system.System.SpeciesCharges[j]) * _stream.Answer.Molalities[j];
            }

            return sum * _stream.Answer.WaterKilograms;
        }

        // Plain: every basis ion bare, with free H+ and OH- from the pH. Speciated: the ions as they are. Both before closing.
        private (double Plain, double Speciated) Imbalances()
        {
            double cations = 0,
                anions = 0;
            for (var e = 0; e < _moles.Length; e++)
            {
                foreach (var term in liquor.Entries[e].PerMole)
                {
                    if (
                        term.Species.IsWater
                        || (liquor.PH is not null && term.Species.IsHydrogenIon)
                    )
                    {
                        continue;
                    }

                    Count(term.Coefficient * _moles[e] * term.Species.Charge);
                }
            }

            if (_carbonateMoles > 0 && liquor.Alkalinity is { } alkalinity)
            {
                Count(-alkalinity);
            }

            if (liquor.PH is { } pH)
            {
                Count(Math.Pow(10, 3 - pH));
                Count(-Math.Pow(10, 3 + pH - 14));
            }

            var plain = Relative(cations, anions);
            var closureCharge =
                _closing < 0
                    ? 0
                    : _closure
                        * liquor
                            .Entries[_closing]
                            .PerMole.Sum(t => t.Coefficient * t.Species.Charge);
            return (plain, (Charge() - closureCharge) / Math.Max(GrossCharge(), 1e-300));

            void Count(double charge)
            {
                cations += Math.Max(charge, 0);
                anions += Math.Max(-charge, 0);
            }
        }

        private static double Relative(double cations, double anions) =>
            cations + anions == 0 ? 0 : (cations - anions) / (cations + anions);
    }
}
