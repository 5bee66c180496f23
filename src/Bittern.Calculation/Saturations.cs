using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>Q against Ksp of the solids that matter in a stage.</summary>
internal static class Saturations
{
    /// <summary>A solid that may not form is worth showing from a tenth of saturation.</summary>
    private const double WorthShowing = -1;

    public static ImmutableArray<SaturationResult> Describe(
        Stream stream,
        Stage stage,
        StageConditions conditions
    )
    {
        var system = stream.System;
        var results = new List<SaturationResult>();
        for (var s = 0; s < system.Solids.Length; s++)
        {
            var solid = system.Solids[s];
            var held = stage.HeldBack.FirstOrDefault(h =>
                string.Equals(h.Solid.Name, solid.Name, StringComparison.Ordinal)
            );
            var index = stream.Answer.LnSaturations[s] / Math.Log(10);
            var listed = conditions.MayForm[s] || held is not null || stream.Suspended[s] > 0;
            if (double.IsNegativeInfinity(index) || (!listed && index < WorthShowing))
            {
                continue;
            }

            var role =
                held is not null ? SaturationRole.HeldBack
                : stream.Suspended[s] > 0 ? SaturationRole.Present
                : conditions.MayForm[s] ? SaturationRole.Allowed
                : SaturationRole.NotListed;
            if (
                Write(
                    stream,
                    solid,
                    role,
                    held?.Because
                        ?? (role == SaturationRole.NotListed ? solid.HeldBackByDefault : null)
                ) is
                { } result
            )
            {
                results.Add(result);
            }
        }

        return [.. results];
    }

    private static SaturationResult? Write(
        Stream stream,
        Species solid,
        SaturationRole role,
        string? because
    )
    {
        if (solid.Written is not { } reaction || solid.Constant is not { } constant)
        {
            return null;
        }

        var terms = ImmutableArray.CreateBuilder<ActivityTerm>();
        var log10Q = 0.0;
        foreach (
            var (term, sign) in reaction
                .Left.Select(t => (t, -1.0))
                .Concat(reaction.Right.Select(t => (t, 1.0)))
        )
        {
            if (term.Species.Equals(solid.Formula))
            {
                continue;
            }

            if (Factor(stream, term, sign) is not { } factor)
            {
                return null;
            }

            terms.Add(factor);
            log10Q += factor.Coefficient * Math.Log10(factor.Activity);
        }

        return new SaturationResult
        {
            Solid = solid,
            Role = role,
            HeldBackBecause = because,
            Terms = terms.ToImmutable(),
            Log10Q = log10Q,
            Log10K = constant.Value.Log10At(stream.Kelvin),
        };
    }

    private static ActivityTerm? Factor(Stream stream, Term term, double sign)
    {
        var answer = stream.Answer;
        if (term.Species.IsWater)
        {
            return new ActivityTerm(
                "H2O",
                sign * term.Coefficient,
                double.NaN,
                double.NaN,
                Math.Exp(answer.LnWaterActivity)
            );
        }

        var index = stream.System.System.SpeciesIndex(term.Species.Text);
        if (index < 0 || answer.Molalities[index] <= 0)
        {
            return null;
        }

        var gamma = Math.Exp(answer.LnGammas[index]);
        return new ActivityTerm(
            term.Species.Text,
            sign * term.Coefficient,
            answer.Molalities[index],
            gamma,
            answer.Molalities[index] * gamma
        );
    }
}
