using System.Collections.Immutable;
using Bittern.Chemistry;
using Bittern.Engine;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>Turns streams and answers into reportable records.</summary>
internal static class States
{
    /// <summary>A stream that was just equilibrated with <paramref name="problem"/>, certified.</summary>
    public static SolvedState Describe(Stream stream, Problem problem)
    {
        var system = stream.System;
        var answer = stream.Answer;
        var certificate = Certificate.Check(problem, answer);
        return new SolvedState
        {
            TemperatureCelsius = stream.Kelvin - PhysicalConstants.ZeroCelsius,
            PH = -answer.LnActivities[system.HydrogenIndex] / Math.Log(10),
            IonicStrength = answer.IonicStrength,
            WaterActivity = Math.Exp(answer.LnWaterActivity),
            WaterKilograms = answer.WaterKilograms,
            Volume = stream.Volume,
            Density = system.LiquorMass(answer) / stream.Volume,
            Species =
            [
                .. system.Aqueous.Select(
                    (s, j) =>
                        new SpeciesAmount(s, answer.Molalities[j], Math.Exp(answer.LnGammas[j]))
                ),
            ],
            DissolvedTotals =
            [
                .. system
                    .Basis.Select((b, i) => (b, i))
                    .Where(p => p.i != system.HydrogenIndex)
                    .Select(p => new Term(system.Dissolved(answer, p.i), p.b.Formula)),
            ],
            Suspended = Amounts(system, stream.Suspended),
            InertCharge = stream.InertCharge,
            Certificate = Result(certificate, answer),
        };
    }

    /// <summary>Non-zero amounts of solids with their masses.</summary>
    public static ImmutableArray<SolidAmount> Amounts(EngineSystem system, double[] moles) =>
        [
            .. system
                .Solids.Select(
                    (s, i) => new SolidAmount(s, moles[i], moles[i] * s.Formula.MolarMass / 1000)
                )
                .Where(a => a.MolesPerFeed != 0),
        ];

    /// <summary>What an amount has changed by; nothing where the difference is what solving twice leaves in the last digits.</summary>
    public static double Change(double before, double after)
    {
        const double LastDigits = 1e-11;
        var change = after - before;
        return Math.Abs(change) <= LastDigits * Math.Max(Math.Abs(before), Math.Abs(after))
            ? 0
            : change;
    }

    /// <summary>Why there is no answer, in a sentence.</summary>
    public static string Reason(SolveStatus status, string? obstacle) =>
        status switch
        {
            SolveStatus.NegativeTotal =>
                $"the amount of {obstacle} is negative, and no species of the recipe can carry that",
            SolveStatus.ConflictingFixedActivities =>
                $"the fixed activity of {obstacle} contradicts another one or fixes something that is not there",
            SolveStatus.Dry => "no liquid water is left",
            SolveStatus.NotConverged when obstacle is not null =>
                $"no equilibrium was found before {obstacle} ran out",
            SolveStatus.NotConverged => "the iteration did not converge; nothing can be concluded",
            _ => "the answer did not pass its certificate",
        };

    private static CertificateResult Result(Certificate certificate, Answer answer) =>
        new(
            certificate.WorstBalance,
            certificate.WorstBalanceOf,
            certificate.ChargeResidual,
            certificate.WorstSaturation,
            certificate.WorstSaturationOf,
            certificate.WorstComplementarity,
            certificate.SmallestAmount,
            Math.Max(certificate.ActivityResidual, certificate.WorstMassAction),
            answer.Iterations,
            certificate.Accepted
        );
}
