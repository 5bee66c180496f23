using Bittern.Engine;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>Values of quantities on a solved stream, in SI (see <see cref="Quantity"/>).</summary>
internal static class Quantities
{
    /// <summary>The value of a quantity.</summary>
    /// <param name="quantity">What is asked.</param>
    /// <param name="stream">A stream that was just equilibrated.</param>
    /// <param name="formed">mol of each solid formed so far per m3 of feed, settled or in suspension.</param>
    public static double Evaluate(Quantity quantity, Stream stream, ReadOnlySpan<double> formed)
    {
        var system = stream.System;
        var answer = stream.Answer;
        switch (quantity)
        {
            case Quantity.PH:
                return -answer.LnActivities[system.HydrogenIndex] / Math.Log(10);
            case Quantity.IonicStrength:
                return answer.IonicStrength;
            case Quantity.TotalDissolved:
                return (system.LiquorMass(answer) - answer.WaterKilograms) / stream.Volume;
            case Quantity.Dissolved dissolved:
                return Dissolved(dissolved, stream);
            case Quantity.SaturationIndex saturation:
                var index = system.System.SolidIndex(saturation.Solid.Name);
                return index < 0
                    ? double.NegativeInfinity
                    : Saturated(answer.LnSaturations[index] / Math.Log(10));
            case Quantity.Formed solid:
                var formedIndex = system.System.SolidIndex(solid.Solid.Name);
                return formedIndex < 0
                    ? 0
                    : formed[formedIndex] * solid.Solid.Formula.MolarMass / 1000;
            default:
                throw new InvalidOperationException($"unknown quantity {quantity.Name}");
        }
    }

    // A solid that is present is saturated to the certificate's tolerance (1e-9): its index is 0, and 'SI(x) <= 0' must not hang on the sign of a rounding error.
    private static double Saturated(double index) => Math.Abs(index) <= 1e-9 ? 0 : index;

    private static double Dissolved(Quantity.Dissolved quantity, Stream stream)
    {
        var system = stream.System;
        var moles = 0.0;
        foreach (var term in quantity.Basis)
        {
            var index = system.IndexOf(term.Species);
            if (index < 0)
            {
                continue;
            }

            moles += term.Coefficient * system.Dissolved(stream.Answer, index);
            if (quantity.WithSolids)
            {
                for (var s = 0; s < stream.Suspended.Length; s++)
                {
                    moles +=
                        term.Coefficient
                        * system.System.Solids[s].Coefficients[index]
                        * stream.Suspended[s];
                }
            }
        }

        return moles / stream.Volume * (quantity.InMoles ? 1 : quantity.MolarMass / 1000);
    }

    /// <summary>
    /// How far a condition is from being met: 0 or negative when it is met, in the quantity's SI unit. For <see cref="Comparison.Equal"/> the signed gap.
    /// </summary>
    public static double Gap(Condition condition, double value) =>
        condition.Comparison switch
        {
            Comparison.AtMost or Comparison.Below => value - condition.Value,
            Comparison.AtLeast or Comparison.Above => condition.Value - value,
            Comparison.Within => Math.Max(
                condition.Value - value,
                value - (condition.Upper ?? double.PositiveInfinity)
            ),
            _ => value - condition.Value,
        };

    /// <summary>True when the value meets the condition.</summary>
    public static bool IsMet(Condition condition, double value) =>
        condition.Comparison switch
        {
            Comparison.AtMost => value <= condition.Value,
            Comparison.Below => value < condition.Value,
            Comparison.AtLeast => value >= condition.Value,
            Comparison.Above => value > condition.Value,
            Comparison.Within => value >= condition.Value
                && value <= (condition.Upper ?? double.PositiveInfinity),
            _ => Math.Abs(value - condition.Value) <= 1e-6 * Math.Max(1, Math.Abs(condition.Value)),
        };
}
