using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Engine;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>Runs one train, stage by stage, on streams per m3 of feed.</summary>
internal sealed class TrainRun
{
    /// <summary>Largest dose looked at when a recipe states none: one volume of product per volume entering, or 200 kg of a dry one per m3.</summary>
    private const double LargestVolumeDose = 1;

    private const double LargestDryDose = 200;

    private readonly EngineSystem _system;
    private readonly Equilibrator _equilibrator;
    private readonly Func<Liquor, Stream?> _liquor;
    private readonly Train _train;
    private readonly bool _verdictsOnly;
    private readonly CancellationToken _cancellation;
    private readonly List<StageResult> _stages = [];
    private readonly List<SludgeResult> _sludges = [];
    private readonly double[] _formed;
    private readonly double[] _entered;
    private readonly double[] _left;

    private TrainRun(
        Train train,
        EngineSystem system,
        Func<Liquor, Stream?> liquor,
        bool verdictsOnly,
        CancellationToken cancellation
    )
    {
        _train = train;
        _system = system;
        _liquor = liquor;
        _verdictsOnly = verdictsOnly;
        _cancellation = cancellation;
        _equilibrator = new Equilibrator(system);
        _formed = new double[system.Solids.Length];
        _entered = new double[system.Basis.Length];
        _left = new double[system.Basis.Length];
    }

    /// <summary>
    /// Runs a train.
    /// </summary>
    /// <param name="train">Which.</param>
    /// <param name="system">Compiled chemistry.</param>
    /// <param name="liquor">1 m3 of a speciated liquor; null when it could not be solved.</param>
    /// <param name="verdictsOnly">Leaves out what only a report needs (onsets), for runs that judge limits alone.</param>
    /// <param name="cancellation">Stops between solves.</param>
    public static (TrainResult Result, Stream? Outflow, double[] Formed) Execute(
        Train train,
        EngineSystem system,
        Func<Liquor, Stream?> liquor,
        bool verdictsOnly,
        CancellationToken cancellation
    )
    {
        var run = new TrainRun(train, system, liquor, verdictsOnly, cancellation);
        var (result, outflow) = run.Execute();
        return (result, outflow, run._formed);
    }

    private (TrainResult Result, Stream? Outflow) Execute()
    {
        if (_liquor(_train.Feed.Liquor) is not { } feed)
        {
            return (
                Failed(
                    null,
                    new TrainFailure(
                        "feed",
                        $"the liquor '{_train.Feed.Liquor.Name}' has no certified speciation",
                        _train.Feed.Span
                    )
                ),
                null
            );
        }

        var stream = feed.Copy();
        Account(stream, _entered, 1);
        if (
            _equilibrator.Run(stream, StageConditions.Closed(_system), near: false)
            is not SolveStatus.Solved
                and var status
        )
        {
            return (
                Failed(
                    null,
                    new TrainFailure(
                        "feed",
                        States.Reason(status, stream.Answer.Obstacle),
                        _train.Feed.Span
                    )
                ),
                null
            );
        }

        var feedState = States.Describe(stream, _equilibrator.Problem);
        foreach (var stage in _train.Stages)
        {
            _cancellation.ThrowIfCancellationRequested();
            var stageRun = new StageRun(this, stage, stream);
            var failure = stageRun.Execute();
            if (failure is not null)
            {
                return (Failed(feedState, failure), null);
            }

            stream = stageRun.Outflow;
        }

        Account(stream, _left, 1);
        return (Result(feedState, null), stream);
    }

    private TrainResult Failed(SolvedState? feed, TrainFailure failure) => Result(feed, failure);

    private TrainResult Result(SolvedState? feed, TrainFailure? failure) =>
        new()
        {
            Train = _train,
            Feed = feed,
            Stages = [.. _stages],
            Sludges = [.. _sludges],
            Doses = TotalDoses(),
            WorstPlantImbalance = failure is null ? Imbalance() : double.NaN,
            Failure = failure,
        };

    private ImmutableArray<DoseTotal> TotalDoses() =>
        [
            .. _stages
                .SelectMany(s => s.Doses)
                .GroupBy(d => d.Reagent)
                .Select(g => new DoseTotal(
                    g.Key,
                    g.Sum(d => d.ProductPerFeed),
                    g.Sum(d => d.DryPerFeed),
                    g.Key.IsDry
                        ? 0
                        : g.Sum(d => d.ProductPerFeed)
                            / new ReagentMakeUp(g.Key, _system).ProductKilograms,
                    g.Key.Price is null ? null : g.Sum(d => d.CostPerFeed ?? 0)
                )),
        ];

    private double Imbalance()
    {
        var worst = 0.0;
        for (var i = 0; i < _entered.Length; i++)
        {
            // H+ is the difference of acids and bases; its balance is the certificates' business.
            if (
                i != _system.HydrogenIndex
                && Math.Max(Math.Abs(_entered[i]), Math.Abs(_left[i])) is var gross and > 0
            )
            {
                worst = Math.Max(worst, Math.Abs(_entered[i] - _left[i]) / gross);
            }
        }

        return worst;
    }

    private void Account(Stream stream, double[] into, double sign)
    {
        for (var i = 0; i < into.Length; i++)
        {
            into[i] += sign * stream.Totals[i];
            for (var s = 0; s < stream.Suspended.Length; s++)
            {
                into[i] += sign * _system.System.Solids[s].Coefficients[i] * stream.Suspended[s];
            }
        }
    }

    /// <summary>One stage.</summary>
    private sealed class StageRun
    {
        private readonly TrainRun _run;
        private readonly EngineSystem _system;
        private readonly Stage _stage;
        private readonly StageConditions _conditions;
        private readonly double[] _before;
        private readonly double[] _gasTaken;
        private readonly double[] _converted;
        private readonly double[] _stageFormed;
        private readonly List<DoseResult> _doses = [];
        private readonly List<OnsetResult> _onsets = [];
        private readonly List<DoseCurve> _curves = [];
        private readonly ImmutableArray<StageAction.Convert> _conversions;
        private double _enteringVolume;
        private Stream _stream;

        public StageRun(TrainRun run, Stage stage, Stream stream)
        {
            _run = run;
            _system = run._system;
            _stage = stage;
            _stream = stream.Copy();
            _before = [.. stream.Suspended];
            _gasTaken = new double[_system.Gases.Length];
            _stageFormed = new double[_system.Solids.Length];
            _conversions = [.. stage.Actions.OfType<StageAction.Convert>()];
            _converted = new double[_conversions.Length];
            _conditions = Conditions();
            Outflow = _stream;
        }

        public Stream Outflow { get; private set; }

        public TrainFailure? Execute()
        {
            _enteringVolume = _stream.Volume;
            if (_stage.TemperatureCelsius is { } celsius)
            {
                _stream.Kelvin = celsius + PhysicalConstants.ZeroCelsius;
            }

            // Forming, contact and electrons hold for the whole stage: what enters meets them before the first dose.
            if (Equilibrate(_stage.Span) is { } failure)
            {
                return failure;
            }

            foreach (var action in _stage.Actions)
            {
                _run._cancellation.ThrowIfCancellationRequested();
                var problem = action switch
                {
                    StageAction.AddAmount add => Add(add),
                    StageAction.AddUntil add => AddUntil(add),
                    StageAction.Blend blend => Blend(blend),
                    _ => null,
                };
                if (problem is not null)
                {
                    return problem;
                }
            }

            return Finish();
        }

        private StageConditions Conditions()
        {
            var conditions = StageConditions.Closed(_system);
            foreach (var solid in _stage.Forming)
            {
                if (_system.System.SolidIndex(solid.Name) is var index and >= 0)
                {
                    conditions.MayForm[index] = true;
                }
            }

            foreach (var held in _stage.HeldBack)
            {
                if (_system.System.SolidIndex(held.Solid.Name) is var index and >= 0)
                {
                    conditions.MayForm[index] = false;
                }
            }

            foreach (var pressure in _stage.Contacts.SelectMany(c => c.Pressures))
            {
                if (_system.System.GasIndex(pressure.Gas.Text) is var index and >= 0)
                {
                    conditions.GasPressures[index] = pressure.Atmospheres;
                }
            }

            return conditions;
        }

        private TrainFailure? Equilibrate(SourceSpan span)
        {
            Convert(_stream, count: true);
            var status = _run._equilibrator.Run(_stream, _conditions, near: false);
            if (status != SolveStatus.Solved)
            {
                return new TrainFailure(
                    _stage.Name,
                    States.Reason(status, _stream.Answer.Obstacle),
                    span
                );
            }

            for (var g = 0; g < _gasTaken.Length; g++)
            {
                _gasTaken[g] += _run._equilibrator.GasTaken[g];
                for (var i = 0; i < _run._entered.Length; i++)
                {
                    _run._entered[i] +=
                        _system.System.Gases[g].Coefficients[i] * _run._equilibrator.GasTaken[g];
                }
            }

            return null;
        }

        private void Convert(Stream stream) => Convert(stream, count: false);

        private void Convert(Stream stream, bool count)
        {
            for (var c = 0; c < _conversions.Length; c++)
            {
                var conversion = _conversions[c];
                var from = _system.IndexOf(conversion.From);
                var amount = from < 0 ? 0 : stream.Totals[from];
                if (amount <= 0)
                {
                    continue;
                }

                stream.Totals[from] = 0;
                var water = 0.0;
                _system.AddTerms(conversion.Brings, amount, stream.Totals, ref water);
                stream.Water += water;
                if (!count)
                {
                    continue;
                }

                _converted[c] += amount;
                _run._entered[from] -= amount;
                var unused = 0.0;
                _system.AddTerms(conversion.Brings, amount, _run._entered, ref unused);
            }
        }

        private TrainFailure? Add(StageAction.AddAmount add)
        {
            var makeUp = new ReagentMakeUp(add.Reagent, _system);
            if (makeUp.Units(add.Dose) is not { } units)
            {
                return new TrainFailure(
                    _stage.Name,
                    $"the dose '{add.Dose.Written}' does not say how much '{add.Reagent.Name}' that is",
                    add.Span
                );
            }

            if (!_run._verdictsOnly)
            {
                var search = new DoseSearch(
                    _stream.Copy(),
                    _conditions,
                    makeUp,
                    _enteringVolume,
                    _run._equilibrator,
                    Convert
                );
                Onsets(search, units, add.Reagent, null);
                Trace(search, units, add.Reagent, null);
            }

            return Give(add, makeUp, units, null);
        }

        private TrainFailure? AddUntil(StageAction.AddUntil add)
        {
            var makeUp = new ReagentMakeUp(add.Reagent, _system);
            var largest = add.AtMost is null
                ? add.Reagent.IsDry
                    ? LargestDryDose
                    : LargestVolumeDose
                : makeUp.Units(add.AtMost);
            if (largest is not { } cap)
            {
                return new TrainFailure(
                    _stage.Name,
                    $"the bound '{add.AtMost?.Written}' does not say how much '{add.Reagent.Name}' that is",
                    add.Span
                );
            }

            var search = new DoseSearch(
                _stream.Copy(),
                _conditions,
                makeUp,
                _enteringVolume,
                _run._equilibrator,
                Convert
            );
            var scan = search.Scan(cap);
            var found = search.Find(
                add.Target,
                scan,
                s => Quantities.Evaluate(add.Target.Quantity, s, FormedWith(s))
            );
            var dose = found.Reached ? found.Dose : found.BestDose;
            if (!_run._verdictsOnly)
            {
                Onsets(search, dose, add.Reagent, scan);
                Trace(search, dose, add.Reagent, found.StopsHoldingAt);
            }

            // Before the dose is given: the certificate belongs to the last problem that the equilibrator solved.
            var nudged = search.At(dose * (1 + 1e-5), search.At(dose, null));
            var failure = Give(add, makeUp, dose, null);
            if (failure is not null)
            {
                return failure;
            }

            var value = Quantities.Evaluate(add.Target.Quantity, _stream, FormedWith(_stream));
            _doses[^1] = _doses[^1] with
            {
                Target = new TargetResult
                {
                    Target = add.Target,
                    Reached = found.Reached,
                    HeldAlready = found.HeldAlready,
                    Value = value,
                    BestValue = found.Reached ? null : value,
                    BestDose = found.Reached ? null : dose,
                    StopsHoldingAt = found.StopsHoldingAt,
                    LargestDose = cap,
                    Slope =
                        nudged is null || dose == 0
                            ? double.NaN
                            : (
                                Quantities.Evaluate(add.Target.Quantity, nudged, FormedWith(nudged))
                                - value
                            ) / (dose * 1e-5),
                },
            };
            return null;
        }

        private TrainFailure? Give(
            StageAction action,
            ReagentMakeUp makeUp,
            double units,
            TargetResult? target
        )
        {
            var perFeed = units * _enteringVolume;
            makeUp.AddTo(_stream, perFeed);
            for (var i = 0; i < _run._entered.Length; i++)
            {
                _run._entered[i] += perFeed * makeUp.Totals[i];
            }

            var price = makeUp.Reagent.Price;
            _doses.Add(
                new DoseResult
                {
                    Reagent = makeUp.Reagent,
                    Action = action,
                    VolumePerStageVolume = makeUp.Reagent.IsDry ? 0 : units,
                    ProductPerFeed = perFeed * makeUp.ProductKilograms,
                    DryPerFeed = perFeed * makeUp.DryKilogramsTotal,
                    ActivePerFeed = perFeed * makeUp.ActiveKilograms,
                    CostPerFeed =
                        price is null ? null
                        : price.PerVolume ? price.PerUnit * perFeed
                        : price.PerUnit * perFeed * makeUp.DryKilogramsTotal,
                    Target = target,
                }
            );
            return Equilibrate(action.Span);
        }

        private TrainFailure? Blend(StageAction.Blend blend)
        {
            if (_run._liquor(blend.Liquor) is not { } other)
            {
                return new TrainFailure(
                    _stage.Name,
                    $"the liquor '{blend.Liquor.Name}' has no certified speciation",
                    blend.Span
                );
            }

            var times = blend.VolumesPerVolume * _enteringVolume;
            var kelvin = _stage.TemperatureCelsius is null
                ? ((_stream.Kelvin * _stream.Water) + (other.Kelvin * other.Water * times))
                    / (_stream.Water + (other.Water * times))
                : _stream.Kelvin;
            _stream.Add(other, times);
            _stream.Kelvin = kelvin;
            _run.Account(other, _run._entered, times);
            return Equilibrate(blend.Span);
        }

        private double[] FormedWith(Stream stream)
        {
            var formed = new double[_system.Solids.Length];
            for (var s = 0; s < formed.Length; s++)
            {
                formed[s] = _run._formed[s] + stream.Suspended[s] - _before[s];
            }

            return formed;
        }

        private void Trace(DoseSearch search, double dose, Reagent reagent, double? stopsHoldingAt)
        {
            if (
                DoseCurves.Trace(
                    search,
                    reagent,
                    dose,
                    stopsHoldingAt,
                    _before,
                    _run._cancellation
                ) is
                { } curve
            )
            {
                _curves.Add(curve);
            }
        }

        private void Onsets(
            DoseSearch search,
            double dose,
            Reagent reagent,
            List<DoseSearch.Point>? scan
        )
        {
            if (dose <= 0)
            {
                return;
            }

            var points = (scan ?? search.Scan(dose)).FindAll(p => p.Dose <= dose);
            points.Add(new DoseSearch.Point(dose, search.At(dose, points[^1].Stream)));
            for (var s = 0; s < _system.Solids.Length; s++)
            {
                if (_conditions.MayForm[s] && search.Onset(s, points) is { } onset)
                {
                    _onsets.Add(new OnsetResult(_system.Solids[s], onset.Dose, onset.PH, reagent));
                }
            }
        }

        private TrainFailure? Finish()
        {
            for (var s = 0; s < _stageFormed.Length; s++)
            {
                _stageFormed[s] = States.Change(_before[s], _stream.Suspended[s]);
                _run._formed[s] += _stageFormed[s];
            }

            var end = States.Describe(_stream, _run._equilibrator.Problem);
            if (!end.Certificate.Accepted)
            {
                return new TrainFailure(
                    _stage.Name,
                    States.Reason(SolveStatus.Solved, null),
                    _stage.Span
                );
            }

            var saturations = Saturations.Describe(_stream, _stage, _conditions);
            var result = new StageResult
            {
                Stage = _stage,
                Doses = [.. _doses],
                Conversions =
                [
                    .. _conversions.Select(
                        (c, i) =>
                            new ConversionResult(c, _converted[i], _converted[i] * c.AgentPerMole)
                    ),
                ],
                End = end,
                Outflow = end,
                Formed = States.Amounts(_system, _stageFormed),
                Saturations = saturations,
                GasExchanges =
                [
                    .. _system
                        .Gases.Select(
                            (g, i) => new GasExchange(g, _gasTaken[i], _conditions.GasPressures[i])
                        )
                        .Where(e => !double.IsNaN(e.Atmospheres)),
                ],
                DoseCurves = [.. _curves],
                Onsets =
                [
                    .. _onsets
                        .OrderBy(o => o.DosePerStageVolume)
                        .ThenBy(o => o.Solid.Name, StringComparer.Ordinal),
                ],
            };
            Outflow = _stream;
            if (_stage.Settling is { } settling)
            {
                Settle(settling);
                var status = _run._equilibrator.Run(
                    _stream,
                    StageConditions.Closed(_system) with
                    {
                        GasPressures = _conditions.GasPressures,
                        MayForm = SuspendedOnly(),
                    },
                    near: true
                );
                if (status != SolveStatus.Solved)
                {
                    return new TrainFailure(
                        _stage.Name,
                        States.Reason(status, _stream.Answer.Obstacle),
                        settling.Span
                    );
                }

                result = result with
                {
                    Outflow = States.Describe(_stream, _run._equilibrator.Problem),
                };
            }

            _run._stages.Add(result);
            return null;
        }

        private bool[] SuspendedOnly() => [.. _stream.Suspended.Select(s => s > 0)];

        private void Settle(Settling settling)
        {
            var solids = new double[_stream.Suspended.Length];
            for (var s = 0; s < solids.Length; s++)
            {
                solids[s] = settling.Fraction * _stream.Suspended[s];
            }

            var amounts = States.Amounts(_system, solids);
            var inert = settling.Fraction * _stream.Inert;
            var dry = amounts.Sum(a => a.MassPerFeed) + inert;
            var liquor = settling.SolidsContent is { } content and > 0
                ? dry * ((1 / content) - 1)
                : 0;
            var share = Math.Min(liquor / _system.LiquorMass(_stream.Answer), 1);
            var sludge = _stream.Copy();
            sludge.Remove(1 - share, 1 - settling.Fraction);
            _run.Account(sludge, _run._left, 1);
            _stream.Remove(share, settling.Fraction);
            _run._sludges.Add(
                new SludgeResult(settling.To, _stage.Name, amounts, dry, inert, liquor)
            );
        }
    }
}
