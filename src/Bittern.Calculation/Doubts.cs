using System.Collections.Immutable;
using System.Globalization;
using Bittern.Diagnostics;
using Bittern.Engine.Activity;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>What a run found that a reader must know beside the numbers.</summary>
internal static class Doubts
{
    public static ImmutableArray<Diagnostic> Of(
        Recipe recipe,
        IActivityModel model,
        ImmutableArray<LiquorResult> liquors,
        ImmutableArray<TrainResult> trains
    ) =>
        [
            .. liquors
                .Where(l => l.Failure is not null)
                .Select(l => NoAnswer($"liquor '{l.Liquor.Name}'", l.Failure!, l.Liquor.Span)),
            .. trains
                .Where(t => t.Failure is not null)
                .Select(t =>
                    NoAnswer(
                        $"stage '{t.Failure!.Stage}' of train '{t.Train.Name}'",
                        t.Failure.Reason,
                        t.Failure.Span
                    )
                ),
            .. OutOfRange(recipe, model, liquors, trains),
            .. trains.SelectMany(t => t.Stages).SelectMany(Targets),
            .. trains.SelectMany(t => t.Stages).SelectMany(Supersaturated),
        ];

    private static Diagnostic NoAnswer(string where, string reason, SourceSpan span) =>
        new(
            "BT5001",
            Severity.Error,
            $"there is no certified answer for {where}: {reason}",
            "a number without a certificate must not be used",
            null,
            span,
            []
        );

    private static IEnumerable<Diagnostic> OutOfRange(
        Recipe recipe,
        IActivityModel model,
        ImmutableArray<LiquorResult> liquors,
        ImmutableArray<TrainResult> trains
    )
    {
        var states = liquors
            .Where(l => l.State is not null)
            .Select(l => (Name: $"liquor '{l.Liquor.Name}'", State: l.State!, l.Liquor.Span))
            .Concat(
                trains
                    .SelectMany(t => t.Stages)
                    .Select(s => (Name: $"stage '{s.Stage.Name}'", State: s.End, s.Stage.Span))
            );
        foreach (var (name, state, span) in states)
        {
            if (state.IonicStrength > model.TrustedIonicStrength)
            {
                yield return new Diagnostic(
                    "BT5003",
                    Severity.Warning,
                    string.Create(
                        CultureInfo.InvariantCulture,
                        $"the ionic strength in {name} is {state.IonicStrength:0.00} mol/kg; the activity model '{recipe.Header.ActivityModel}' is trusted up to {model.TrustedIonicStrength:0.###}"
                    ),
                    "activity coefficients, and with them every solubility there, may be off by tens of per cent",
                    "treat the numbers as indicative, or use a model made for brines",
                    span,
                    []
                );
            }
        }
    }

    private static IEnumerable<Diagnostic> Targets(StageResult stage)
    {
        foreach (var dose in stage.Doses)
        {
            if (dose.Target is { Reached: false } target)
            {
                var unit = target.Target.DisplayUnit;
                yield return new Diagnostic(
                    "BT5002",
                    Severity.Warning,
                    string.Create(
                        CultureInfo.InvariantCulture,
                        $"no dose of '{dose.Reagent.Name}' up to {target.LargestDose:0.####} {(dose.Reagent.IsDry ? "kg/m3" : "m3/m3")} meets '{target.Target.Written}'; the closest is {target.Value / target.Target.DisplayFactor:0.####}{(unit.Length == 0 ? "" : " ")}{unit}"
                    ),
                    "the stage goes on with the closest dose, so that everything after it is a best case",
                    "raise the bound, choose another reagent, or look at which solid or complex holds the substance in solution",
                    dose.Action.Span,
                    []
                );
            }
        }
    }

    private static IEnumerable<Diagnostic> Supersaturated(StageResult stage)
    {
        foreach (var saturation in stage.Saturations)
        {
            if (
                saturation.Role is SaturationRole.HeldBack or SaturationRole.NotListed
                && saturation.Index > 0
                && saturation.Solid.HeldBackByDefault is null
            )
            {
                yield return new Diagnostic(
                    "BT5005",
                    Severity.Note,
                    string.Create(
                        CultureInfo.InvariantCulture,
                        $"'{saturation.Solid.Name}' is supersaturated at the end of stage '{stage.Stage.Name}' (SI {saturation.Index:0.00}) and is not allowed to form there"
                    ),
                    "if it forms after all, less stays dissolved and more sludge or scale is made than reported",
                    "list it under 'form', or say why not with 'hold back … because'",
                    stage.Stage.Span,
                    []
                );
            }
        }
    }
}
