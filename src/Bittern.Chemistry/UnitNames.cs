using System.Collections.Immutable;

namespace Bittern.Chemistry;

/// <summary>The named units that <see cref="UnitReader"/> builds on.</summary>
internal static class UnitNames
{
    /// <summary>Every spelling with its prefix.</summary>
    internal static ImmutableDictionary<string, UnitAtom> Atoms { get; } = BuildAtoms();

    // Spellings that turn up in laboratory reports, too far from ours for the edit distance.
    internal static readonly ImmutableDictionary<string, string> Familiar = new Dictionary<
        string,
        string
    >(StringComparer.Ordinal)
    {
        ["gr"] = "g",
        ["gm"] = "g",
        ["mgr"] = "mg",
        ["mcg"] = "µg",
        ["kilo"] = "kg",
        ["ton"] = "t",
        ["tonne"] = "t",
        ["tonnes"] = "t",
        ["lt"] = "L",
        ["ltr"] = "L",
        ["liter"] = "L",
        ["litre"] = "L",
        ["cc"] = "cm3",
        ["sec"] = "s",
        ["mins"] = "min",
        ["minute"] = "min",
        ["hr"] = "h",
        ["hrs"] = "h",
        ["hour"] = "h",
        ["day"] = "d",
        ["days"] = "d",
        ["year"] = "a",
        ["yr"] = "a",
        ["mEq"] = "meq",
        ["mval"] = "meq",
        ["C"] = "°C",
        ["Celsius"] = "°C",
    }.ToImmutableDictionary(StringComparer.Ordinal);

    /// <summary>Units to suggest from.</summary>
    internal static ImmutableArray<string> Common { get; } =
    [
        "mg/L",
        "µg/L",
        "ng/L",
        "g/L",
        "g/m3",
        "kg/m3",
        "t/m3",
        "mmol/L",
        "mol/L",
        "mol/m3",
        "µmol/L",
        "meq/L",
        "eq/L",
        "mol/kg",
        "mmol/kg",
        "mg/kg",
        "g/kg",
        "%",
        "ppm",
        "ppb",
        "mL/L",
        "L/m3",
        "m3/h",
        "L/s",
        "L/h",
        "ML/d",
        "m3/d",
        "kg/h",
        "t/d",
        "kg",
        "g",
        "mg",
        "t",
        "L",
        "mL",
        "m3",
        "s",
        "min",
        "h",
        "d",
        "°C",
        "K",
        "atm",
        "bar",
        "mbar",
        "kPa",
        "Pa",
        "mV",
        "V",
        "EUR/kg",
        "EUR/t",
        "EUR/m3",
        "USD/t",
        "kJ/mol",
        "kcal/mol",
        "cm3/mol",
        "Bq/L",
        "mS/cm",
        "µS/cm",
        "kWh/m3",
    ];

    private static ImmutableDictionary<string, UnitAtom> BuildAtoms()
    {
        var atoms = ImmutableDictionary.CreateBuilder<string, UnitAtom>(StringComparer.Ordinal);
        var charge = new Dimension(Equivalents: 1);
        var current = new Dimension(Current: 1);
        var conductance = Dimension.Conductivity * new Dimension(Length: 1);
        Add("g", Dimension.OfMass, 1, -3, "kmµnp");
        Add("t", Dimension.OfMass, 1, 3, "k");
        Add("L", Dimension.Volume, 1, -3, "Mkmµ", alias: "l");
        Add("m", new Dimension(Length: 1), 1, 0, "kcdmµ");
        Add("s", Dimension.OfTime, 1, 0, "m");
        Add("min", Dimension.OfTime, 60, 0, "");
        Add("h", Dimension.OfTime, 3600, 0, "");
        Add("d", Dimension.OfTime, 86400, 0, "");
        Add("a", Dimension.OfTime, 31_557_600, 0, "");
        Add("mol", Dimension.OfAmount, 1, 0, "kmµnp");
        Add("eq", charge, 1, 0, "kmµ");
        Add("K", Dimension.OfTemperature, 1, 0, "");
        Add("Pa", Dimension.Pressure, 1, 0, "hkM");
        Add("bar", Dimension.Pressure, 1, 5, "m");
        Add("atm", Dimension.Pressure, PhysicalConstants.Atmosphere, 0, "mµ");
        Add("V", Dimension.Voltage, 1, 0, "mµ");
        Add("A", current, 1, 0, "mk");
        Add("S", conductance, 1, 0, "mµ");
        Add("J", Dimension.Energy, 1, 0, "kM");
        Add("cal", Dimension.Energy, 4.184, 0, "k");
        Add("W", Dimension.Energy / Dimension.OfTime, 1, 0, "kM");
        Add("Wh", Dimension.Energy, 3600, 0, "kM");
        Add("Bq", Dimension.None / Dimension.OfTime, 1, 0, "mkMG");
        Add("Ci", Dimension.None / Dimension.OfTime, 3.7, 10, "pnµm");
        AddRatio("%", -2, null);
        AddRatio("ppm", -6, Dimension.OfMass);
        AddRatio("ppb", -9, Dimension.OfMass);
        return atoms.ToImmutable();

        void Add(
            string name,
            Dimension dimension,
            double mantissa,
            int power,
            string prefixes,
            string? alias = null
        )
        {
            foreach (var prefix in prefixes.Prepend(' '))
            {
                var mark = prefix == ' ' ? "" : prefix.ToString();
                var atom = new UnitAtom(mark + name, dimension, mantissa, power + PowerOf(prefix));
                atoms[mark + name] = atom;
                if (alias is not null)
                {
                    atoms[mark + alias] = atom;
                }

                if (prefix == 'µ')
                {
                    atoms["u" + name] = atom;
                    if (alias is not null)
                    {
                        atoms["u" + alias] = atom;
                    }
                }
            }
        }

        void AddRatio(string name, int power, Dimension? of) =>
            atoms[name] = new UnitAtom(name, Dimension.None, 1, power)
            {
                Alone = true,
                RatioOf = of,
            };
    }

    private static int PowerOf(char prefix) =>
        prefix switch
        {
            'G' => 9,
            'M' => 6,
            'k' => 3,
            'h' => 2,
            'd' => -1,
            'c' => -2,
            'm' => -3,
            'µ' => -6,
            'n' => -9,
            'p' => -12,
            _ => 0,
        };
}
