namespace Bittern.Chemistry;

/// <summary>One named unit with its prefix: mantissa · 10^power SI units.</summary>
internal sealed record UnitAtom(string Symbol, Dimension Dimension, double Mantissa, int Power)
{
    public bool Alone { get; init; }

    public Dimension? RatioOf { get; init; }
}

/// <summary>A product of named units. Mantissa and power of ten are kept apart so that mg/L is 0.001 to the last bit.</summary>
internal sealed class UnitProduct
{
    private readonly List<(UnitAtom Atom, int Exponent)> _atoms = [];

    public int Factors { get; set; }

    public string? Currency { get; set; }

    public void Multiply(UnitAtom atom, int exponent)
    {
        _atoms.Add((atom, exponent));
        Factors++;
    }

    public string? Finish(string text, string symbol, out Unit? unit)
    {
        unit = null;
        var above = 1.0;
        var below = 1.0;
        var power = 0;
        var dimension = Dimension.None;
        foreach (var (atom, exponent) in _atoms)
        {
            var mantissa = Math.Pow(atom.Mantissa, Math.Abs(exponent));
            above *= exponent > 0 ? mantissa : 1;
            below *= exponent < 0 ? mantissa : 1;
            power += atom.Power * exponent;
            dimension *= atom.Dimension.Power(exponent);
        }

        // Powers of ten up to 10^22 are exact, so that multiplying or dividing by one rounds once.
        var factor =
            power < 0 ? above / below / Math.Pow(10, -power) : above / below * Math.Pow(10, power);
        if (!double.IsNormal(factor))
        {
            return $"'{text}' is no unit: its size is out of range";
        }

        Dimension? ratio = _atoms[0].Atom.RatioOf;
        if (dimension == Dimension.None && _atoms.Count > 1)
        {
            ratio = _atoms[0].Atom.Dimension.Power(_atoms[0].Exponent);
        }

        unit = new Unit(symbol, dimension, factor, 0) { RatioOf = ratio, Currency = Currency };
        return null;
    }
}
