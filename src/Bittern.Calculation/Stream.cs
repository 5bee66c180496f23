using Bittern.Engine;

namespace Bittern.Calculation;

/// <summary>
/// Liquor with its suspended solids on its way through a train, per m3 of the train's feed. Mutable; the run owns it.
/// </summary>
internal sealed class Stream
{
    public Stream(EngineSystem system)
    {
        System = system;
        Totals = new double[system.Basis.Length];
        Suspended = new double[system.Solids.Length];
        Answer = new Answer(system.System);
    }

    public EngineSystem System { get; }

    /// <summary>mol of each basis species in the liquor, suspended solids left out.</summary>
    public double[] Totals { get; }

    /// <summary>mol of water in the liquor, what dissolved species bind included.</summary>
    public double Water { get; set; }

    /// <summary>mol of each solid in suspension.</summary>
    public double[] Suspended { get; }

    /// <summary>kg of insoluble reagent impurities in suspension.</summary>
    public double Inert { get; set; }

    /// <summary>eq of inert charge.</summary>
    public double InertCharge { get; set; }

    public double Kelvin { get; set; }

    /// <summary>The last equilibrium of this stream.</summary>
    public Answer Answer { get; }

    public double Volume => System.Volume(Answer, Kelvin);

    public Stream Copy()
    {
        var copy = new Stream(System)
        {
            Water = Water,
            Inert = Inert,
            InertCharge = InertCharge,
            Kelvin = Kelvin,
        };
        Totals.CopyTo(copy.Totals, 0);
        Suspended.CopyTo(copy.Suspended, 0);
        copy.Answer.CopyFrom(Answer);
        return copy;
    }

    public void Add(Stream other, double times)
    {
        for (var i = 0; i < Totals.Length; i++)
        {
            Totals[i] += times * other.Totals[i];
        }

        for (var s = 0; s < Suspended.Length; s++)
        {
            Suspended[s] += times * other.Suspended[s];
        }

        Water += times * other.Water;
        Inert += times * other.Inert;
        InertCharge += times * other.InertCharge;
    }

    /// <summary>Takes a share of liquor and of suspended matter away.</summary>
    public void Remove(double liquorShare, double solidShare)
    {
        for (var i = 0; i < Totals.Length; i++)
        {
            Totals[i] *= 1 - liquorShare;
        }

        for (var s = 0; s < Suspended.Length; s++)
        {
            Suspended[s] *= 1 - solidShare;
        }

        Water *= 1 - liquorShare;
        InertCharge *= 1 - liquorShare;
        Inert *= 1 - solidShare;
    }
}
