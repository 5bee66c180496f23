using System.Collections.Immutable;
using Bittern.Diagnostics;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>Calculates a recipe.</summary>
public static class RecipeRun
{
    /// <summary>
    /// Runs every liquor, train and limit of a recipe. Deterministic: the same recipe gives the same bits.
    /// </summary>
    /// <exception cref="OperationCanceledException">Cancelled between two solves.</exception>
    /// <exception cref="ArgumentException">The recipe names an activity model that does not exist (the binder refuses it).</exception>
    public static Outcome Execute(Recipe recipe, CancellationToken cancellation)
    {
        var model =
            ActivityModels.Of(recipe)
            ?? throw new ArgumentException(
                $"there is no activity model '{recipe.Header.ActivityModel}'",
                nameof(recipe)
            );
        var system = EngineSystem.Build(recipe.Chemistry, model);
        var run = new Pass(recipe, system, DetectionChoice.AsStated, null, cancellation);
        var liquors = recipe.Liquors.Select(run.Liquor).ToImmutableArray();
        var trains = recipe
            .Trains.Select(t => run.Train(t, verdictsOnly: false))
            .ToImmutableArray();
        var limits = Limits.Judge(
            recipe,
            run,
            (choice, only) => new Pass(recipe, system, choice, only, cancellation)
        );
        return new Outcome
        {
            Recipe = recipe,
            Liquors = [.. liquors.Select(l => l.Result)],
            Trains = [.. trains.Select(t => t.Result)],
            LimitSets = limits,
            Diagnostics = Doubts.Of(
                recipe,
                model,
                [.. liquors.Select(l => l.Result)],
                [.. trains.Select(t => t.Result)]
            ),
        };
    }

    /// <summary>One calculation of all liquors and trains under one choice for values below detection; results are kept.</summary>
    internal sealed class Pass(
        Recipe recipe,
        EngineSystem system,
        DetectionChoice choice,
        AnalysisEntry? only,
        CancellationToken cancellation
    )
    {
        private readonly Dictionary<Liquor, (LiquorResult Result, Stream? Stream)> _liquors = new(
            ReferenceEqualityComparer.Instance
        );
        private readonly Dictionary<
            Train,
            (TrainResult Result, Stream? Outflow, double[] Formed)
        > _trains = new(ReferenceEqualityComparer.Instance);

        public (LiquorResult Result, Stream? Stream) Liquor(Liquor liquor)
        {
            if (!_liquors.TryGetValue(liquor, out var found))
            {
                cancellation.ThrowIfCancellationRequested();
                found = LiquorSpeciation.Solve(
                    liquor,
                    system,
                    recipe.Header.TemperatureCelsius,
                    choice,
                    only
                );
                _liquors.Add(liquor, found);
            }

            return found;
        }

        public (TrainResult Result, Stream? Outflow, double[] Formed) Train(
            Train train,
            bool verdictsOnly
        )
        {
            if (!_trains.TryGetValue(train, out var found))
            {
                found = TrainRun.Execute(
                    train,
                    system,
                    l => Liquor(l).Stream,
                    verdictsOnly,
                    cancellation
                );
                _trains.Add(train, found);
            }

            return found;
        }
    }
}
