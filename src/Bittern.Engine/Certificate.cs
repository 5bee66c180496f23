using Bittern.Chemistry;

namespace Bittern.Engine;

/// <summary>
/// The numbers that prove an answer is an equilibrium. Recomputed from the problem and the answer alone, in the system's own components, by code that
/// shares nothing with the solver: mass action, balances, charge, saturation and activity model, each in a plain loop.
/// </summary>
/// <param name="WorstBalance">Largest |balance residual| relative to the gross amount of that component, water included.</param>
/// <param name="WorstBalanceOf">Which component.</param>
/// <param name="ChargeResidual">Charge of all dissolved species less that of all totals and fixed amounts, relative to the gross charge.</param>
/// <param name="WorstMassAction">Largest |ln (m γ) - ln (K Π a^ν)| of a dissolved species.</param>
/// <param name="WorstSaturation">Largest Ω - 1 of a solid that may form (negative when all are undersaturated).</param>
/// <param name="WorstSaturationOf">Which solid; null when none may form.</param>
/// <param name="WorstComplementarity">Largest |ln Ω| of a solid that is present.</param>
/// <param name="SmallestAmount">Smallest amount of a solid, mol.</param>
/// <param name="ActivityResidual">Largest |Δ ln γ| or |Δ ln a_w| when the activity model is evaluated afresh at the answer.</param>
/// <param name="WorstFixed">Largest |ln| gap between a fixed activity or gas pressure and what the answer has.</param>
public sealed record Certificate(
    double WorstBalance,
    string WorstBalanceOf,
    double ChargeResidual,
    double WorstMassAction,
    double WorstSaturation,
    string? WorstSaturationOf,
    double WorstComplementarity,
    double SmallestAmount,
    double ActivityResidual,
    double WorstFixed
)
{
    /// <summary>Balances and charge: 1e-10 of the gross amount, far below any analysis and above rounding.</summary>
    public const double BalanceTolerance = 1e-10;

    /// <summary>Ω of a solid that may form exceeds 1 by no more than this.</summary>
    public const double SaturationTolerance = 1e-9;

    /// <summary>Logarithmic residuals of mass action, activity model and fixed activities.</summary>
    public const double LogTolerance = 1e-9;

    /// <summary>True when every number lies within its tolerance. NaN fails.</summary>
    public bool Accepted =>
        WorstBalance <= BalanceTolerance
        && ChargeResidual <= BalanceTolerance
        && WorstMassAction <= LogTolerance
        && WorstSaturation <= SaturationTolerance
        && WorstComplementarity <= SaturationTolerance
        && SmallestAmount >= 0
        && ActivityResidual <= LogTolerance
        && WorstFixed <= LogTolerance;

    /// <summary>Checks a solved answer.</summary>
    /// <exception cref="ArgumentException">The answer is not solved: there is nothing to check.</exception>
    public static Certificate Check(Problem problem, Answer answer)
    {
        if (answer.Status != SolveStatus.Solved)
        {
            throw new ArgumentException(
                $"an answer with status {answer.Status} has no certificate",
                nameof(answer)
            );
        }

        var (balance, balanceOf) = Balances(problem, answer);
        var (saturation, saturationOf, complementarity, smallest) = Solids(problem, answer);
        var (massAction, activity) = MassAction(problem, answer);
        return new Certificate(
            balance,
            balanceOf,
            Charge(problem, answer),
            massAction,
            saturation,
            saturationOf,
            complementarity,
            smallest,
            activity,
            Fixed(problem, answer)
        );
    }

    private static (double Worst, string Of) Balances(Problem problem, Answer answer)
    {
        var system = problem.System;
        var worst = 0.0;
        var of = "";
        for (var i = 0; i < system.Components.Length; i++)
        {
            var inside = 0.0;
            var gross = Math.Abs(problem.Totals[i]) + Math.Abs(answer.FixedAmounts[i]);
            for (var j = 0; j < system.Species.Length; j++)
            {
                Count(
                    system.Species[j].Coefficients[i] * answer.Molalities[j] * answer.WaterKilograms
                );
            }

            for (var s = 0; s < system.Solids.Length; s++)
            {
                Count(system.Solids[s].Coefficients[i] * answer.SolidAmounts[s]);
            }

            var given = problem.Totals[i] + answer.FixedAmounts[i];
            for (var g = 0; g < system.Gases.Length; g++)
            {
                given += system.Gases[g].Coefficients[i] * answer.GasAmounts[g];
                gross += Math.Abs(system.Gases[g].Coefficients[i] * answer.GasAmounts[g]);
            }

            Worse(Math.Abs(inside - given), gross, system.Components[i].Name);
            continue;

            void Count(double amount)
            {
                inside += amount;
                gross += Math.Abs(amount);
            }
        }

        var water = answer.WaterKilograms / PhysicalConstants.WaterMolarMass;
        for (var j = 0; j < system.Species.Length; j++)
        {
            water += system.Species[j].Water * answer.Molalities[j] * answer.WaterKilograms;
        }

        for (var s = 0; s < system.Solids.Length; s++)
        {
            water += system.Solids[s].Water * answer.SolidAmounts[s];
        }

        for (var g = 0; g < system.Gases.Length; g++)
        {
            water -= system.Gases[g].Water * answer.GasAmounts[g];
        }

        Worse(Math.Abs(water - problem.TotalWater), problem.TotalWater, "H2O");
        return (worst, of);

        void Worse(double residual, double gross, string name)
        {
            var relative = gross == 0 ? residual : residual / gross;
            if (relative > worst || double.IsNaN(relative))
            {
                worst = relative;
                of = name;
            }
        }
    }

    private static double Charge(Problem problem, Answer answer)
    {
        var system = problem.System;
        var net = 0.0;
        var gross = 0.0;
        for (var j = 0; j < system.Species.Length; j++)
        {
            var charge = system.SpeciesCharges[j] * answer.Molalities[j] * answer.WaterKilograms;
            net += charge;
            gross += Math.Abs(charge);
        }

        for (var i = 0; i < system.Components.Length; i++)
        {
            var charge = system.Components[i].Charge * (problem.Totals[i] + answer.FixedAmounts[i]);
            net -= charge;
            gross += Math.Abs(charge);
        }

        return gross == 0 ? Math.Abs(net) : Math.Abs(net) / gross;
    }

    private static (double Worst, string? Of, double Complementarity, double Smallest) Solids(
        Problem problem,
        Answer answer
    )
    {
        var system = problem.System;
        var worst = double.NegativeInfinity;
        string? of = null;
        var complementarity = 0.0;
        var smallest = 0.0;
        for (var s = 0; s < system.Solids.Length; s++)
        {
            var amount = answer.SolidAmounts[s];
            smallest = Math.Min(smallest, amount);
            if (!problem.AllowedSolids[s])
            {
                // A solid that may not form and yet is there is as wrong as a negative amount.
                smallest = amount == 0 ? smallest : double.NaN;
                continue;
            }

            var ln = LnActivity(system.Solids[s], problem.Kelvin, answer);
            if (Math.Exp(ln) - 1 > worst)
            {
                worst = Math.Exp(ln) - 1;
                of = system.Solids[s].Name;
            }

            if (amount > 0)
            {
                complementarity = Math.Max(complementarity, Math.Abs(ln));
            }
        }

        return (of is null ? -1 : worst, of, complementarity, smallest);
    }

    private static (double MassAction, double Activity) MassAction(Problem problem, Answer answer)
    {
        var system = problem.System;
        var count = system.Species.Length;
        var model = system.ActivityModel.Compile(system, problem.Kelvin);
        var moments = new double[model.MomentCount];
        for (var p = 0; p < moments.Length; p++)
        {
            for (var j = 0; j < count; j++)
            {
                moments[p] += model.Weights[(p * count) + j] * answer.Molalities[j];
            }
        }

        var lnGamma = new double[count];
        model.Evaluate(
            moments,
            lnGamma,
            out var lnWaterActivity,
            new double[count * moments.Length],
            new double[moments.Length]
        );
        var activity = Math.Abs(lnWaterActivity - answer.LnWaterActivity);
        var massAction = 0.0;
        for (var j = 0; j < count; j++)
        {
            if (answer.Molalities[j] == 0)
            {
                continue;
            }

            activity = Math.Max(activity, Math.Abs(lnGamma[j] - answer.LnGammas[j]));
            var gap =
                Math.Log(answer.Molalities[j])
                + answer.LnGammas[j]
                - LnActivity(system.Species[j], problem.Kelvin, answer);

            // Below the smallest normal double a logarithm says nothing.
            massAction =
                answer.Molalities[j] < 1e-300 ? massAction : Math.Max(massAction, Math.Abs(gap));
        }

        return (massAction, activity);
    }

    private static double Fixed(Problem problem, Answer answer)
    {
        var system = problem.System;
        var worst = 0.0;
        for (var i = 0; i < system.Components.Length; i++)
        {
            if (!double.IsNaN(problem.FixedLog10Activities[i]))
            {
                worst = Math.Max(
                    worst,
                    Math.Abs(
                        answer.LnActivities[i] - (Math.Log(10) * problem.FixedLog10Activities[i])
                    )
                );
            }
        }

        for (var g = 0; g < system.Gases.Length; g++)
        {
            if (!double.IsNaN(problem.FixedGasPressures[g]))
            {
                worst = Math.Max(
                    worst,
                    Math.Abs(
                        LnActivity(system.Gases[g], problem.Kelvin, answer)
                            - Math.Log(problem.FixedGasPressures[g])
                    )
                );
            }
        }

        return worst;
    }

    private static double LnActivity(Formation formation, double kelvin, Answer answer)
    {
        var sum =
            (Math.Log(10) * formation.Log10K(kelvin)) + (formation.Water * answer.LnWaterActivity);
        for (var i = 0; i < formation.Coefficients.Length; i++)
        {
            if (formation.Coefficients[i] != 0)
            {
                sum += formation.Coefficients[i] * answer.LnActivities[i];
            }
        }

        return sum;
    }
}
