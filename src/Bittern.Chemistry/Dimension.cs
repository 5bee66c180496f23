using System.Globalization;

namespace Bittern.Chemistry;

/// <summary>
/// What a unit measures, as exponents of base dimensions. Value equality; the default value is a pure number.
/// Equivalents (moles of charge) are kept apart from moles, and money is a dimension, so that neither converts by accident.
/// </summary>
/// <param name="Mass">Exponent of mass (kg).</param>
/// <param name="Length">Exponent of length (m).</param>
/// <param name="Time">Exponent of time (s).</param>
/// <param name="Amount">Exponent of amount of substance (mol).</param>
/// <param name="Temperature">Exponent of temperature (K).</param>
/// <param name="Equivalents">Exponent of moles of charge (eq).</param>
/// <param name="Current">Exponent of electric current (A).</param>
/// <param name="Currency">Exponent of money.</param>
public readonly record struct Dimension(
    int Mass = 0,
    int Length = 0,
    int Time = 0,
    int Amount = 0,
    int Temperature = 0,
    int Equivalents = 0,
    int Current = 0,
    int Currency = 0
)
{
    public static Dimension None => default;

    public static Dimension OfMass => new(Mass: 1);

    public static Dimension Volume => new(Length: 3);

    public static Dimension OfTime => new(Time: 1);

    public static Dimension OfAmount => new(Amount: 1);

    public static Dimension OfTemperature => new(Temperature: 1);

    public static Dimension Energy => new(Mass: 1, Length: 2, Time: -2);

    public static Dimension Pressure => new(Mass: 1, Length: -1, Time: -2);

    public static Dimension Voltage => new(Mass: 1, Length: 2, Time: -3, Current: -1);

    public static Dimension Conductivity => new(Mass: -1, Length: -3, Time: 3, Current: 2);

    public static Dimension MassPerVolume => OfMass / Volume;

    public static Dimension AmountPerVolume => OfAmount / Volume;

    public static Dimension EquivalentsPerVolume => new Dimension(Equivalents: 1) / Volume;

    /// <summary>Moles per kilogram: a molality when the kilogram is of water.</summary>
    public static Dimension AmountPerMass => OfAmount / OfMass;

    public static Dimension VolumePerTime => Volume / OfTime;

    /// <summary>Radioactivity (Bq) per volume.</summary>
    public static Dimension RadioactivityPerVolume => None / OfTime / Volume;

    public static Dimension operator *(Dimension left, Dimension right) => Combine(left, right, 1);

    public static Dimension operator /(Dimension left, Dimension right) => Combine(left, right, -1);

    /// <summary>The dimension multiplied with itself <paramref name="exponent"/> times.</summary>
    public Dimension Power(int exponent) => Combine(None, this, exponent);

    /// <summary>In words, e.g. <c>mass per volume</c>; <c>a pure number</c> without dimension.</summary>
    public override string ToString()
    {
        if (this == None)
        {
            return "a pure number";
        }

        foreach (var (named, word) in Named)
        {
            var rest = this / named;
            if (rest == None)
            {
                return word;
            }

            // "energy per amount" reads better than its base dimensions.
            if (rest is { Mass: 0, Length: 0, Time: 0, Current: 0 })
            {
                return $"{word} {rest.Words()}";
            }
        }

        return Words();
    }

    private static readonly (Dimension Dimension, string Word)[] Named =
    [
        (Energy, "energy"),
        (Pressure, "pressure"),
        (Energy / OfTime, "power"),
        (Voltage, "electric potential"),
        (Conductivity, "electric conductivity"),
        (new Dimension(Mass: -1, Length: -2, Time: 3, Current: 2), "electric conductance"),
    ];

    private static Dimension Combine(Dimension left, Dimension right, int sign) =>
        new(
            left.Mass + (sign * right.Mass),
            left.Length + (sign * right.Length),
            left.Time + (sign * right.Time),
            left.Amount + (sign * right.Amount),
            left.Temperature + (sign * right.Temperature),
            left.Equivalents + (sign * right.Equivalents),
            left.Current + (sign * right.Current),
            left.Currency + (sign * right.Currency)
        );

    private string Words()
    {
        var length = Math.Abs(Length) switch
        {
            3 => ("volume", Math.Sign(Length)),
            2 => ("area", Math.Sign(Length)),
            _ => ("length", Length),
        };
        (string Word, int Exponent)[] all =
        [
            ("money", Currency),
            ("mass", Mass),
            ("amount", Amount),
            ("equivalents", Equivalents),
            length,
            ("temperature", Temperature),
            ("current", Current),
            ("time", Time),
        ];
        var above = string.Join(
            " times ",
            all.Where(d => d.Exponent > 0).Select(d => Raised(d.Word, d.Exponent))
        );
        var below = string.Join(
            " and ",
            all.Where(d => d.Exponent < 0).Select(d => Raised(d.Word, -d.Exponent))
        );
        return below.Length == 0 ? above
            : above.Length == 0 ? $"per {below}"
            : $"{above} per {below}";
    }

    private static string Raised(string word, int exponent) =>
        exponent switch
        {
            1 => word,
            2 => $"{word} squared",
            _ => string.Create(CultureInfo.InvariantCulture, $"{word} to the power {exponent}"),
        };
}
