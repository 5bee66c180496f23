using System.Collections.Immutable;

namespace Bittern.Chemistry;

/// <summary>
/// The elements with their abridged standard atomic weights, g/mol (Prohaska et al. 2022, Pure Appl. Chem. 94, 573: IUPAC 2021;
/// conventional values where the standard is an interval). Elements without a standard weight carry the mass number of a
/// long-lived isotope. All values are recalled, not copied from the paper.
/// </summary>
public static class PeriodicTable
{
    private static readonly ImmutableArray<Element> InOrder =
    [
        Weight("H", "hydrogen", 1.008),
        Weight("He", "helium", 4.0026),
        Weight("Li", "lithium", 6.94),
        Weight("Be", "beryllium", 9.0122),
        Weight("B", "boron", 10.81),
        Weight("C", "carbon", 12.011),
        Weight("N", "nitrogen", 14.007),
        Weight("O", "oxygen", 15.999),
        Weight("F", "fluorine", 18.998),
        Weight("Ne", "neon", 20.180),
        Weight("Na", "sodium", 22.990),
        Weight("Mg", "magnesium", 24.305),
        Weight("Al", "aluminium", 26.982),
        Weight("Si", "silicon", 28.085),
        Weight("P", "phosphorus", 30.974),
        Weight("S", "sulfur", 32.06),
        Weight("Cl", "chlorine", 35.45),
        Weight("Ar", "argon", 39.95),
        Weight("K", "potassium", 39.098),
        Weight("Ca", "calcium", 40.078),
        Weight("Sc", "scandium", 44.956),
        Weight("Ti", "titanium", 47.867),
        Weight("V", "vanadium", 50.942),
        Weight("Cr", "chromium", 51.996),
        Weight("Mn", "manganese", 54.938),
        Weight("Fe", "iron", 55.845),
        Weight("Co", "cobalt", 58.933),
        Weight("Ni", "nickel", 58.693),
        Weight("Cu", "copper", 63.546),
        Weight("Zn", "zinc", 65.38),
        Weight("Ga", "gallium", 69.723),
        Weight("Ge", "germanium", 72.630),
        Weight("As", "arsenic", 74.922),
        Weight("Se", "selenium", 78.971),
        Weight("Br", "bromine", 79.904),
        Weight("Kr", "krypton", 83.798),
        Weight("Rb", "rubidium", 85.468),
        Weight("Sr", "strontium", 87.62),
        Weight("Y", "yttrium", 88.906),
        Weight("Zr", "zirconium", 91.224),
        Weight("Nb", "niobium", 92.906),
        Weight("Mo", "molybdenum", 95.95),
        MassNumber("Tc", "technetium", 97),
        Weight("Ru", "ruthenium", 101.07),
        Weight("Rh", "rhodium", 102.91),
        Weight("Pd", "palladium", 106.42),
        Weight("Ag", "silver", 107.87),
        Weight("Cd", "cadmium", 112.41),
        Weight("In", "indium", 114.82),
        Weight("Sn", "tin", 118.71),
        Weight("Sb", "antimony", 121.76),
        Weight("Te", "tellurium", 127.60),
        Weight("I", "iodine", 126.90),
        Weight("Xe", "xenon", 131.29),
        Weight("Cs", "caesium", 132.91),
        Weight("Ba", "barium", 137.33),
        Weight("La", "lanthanum", 138.91),
        Weight("Ce", "cerium", 140.12),
        Weight("Pr", "praseodymium", 140.91),
        Weight("Nd", "neodymium", 144.24),
        MassNumber("Pm", "promethium", 145),
        Weight("Sm", "samarium", 150.36),
        Weight("Eu", "europium", 151.96),
        Weight("Gd", "gadolinium", 157.25),
        Weight("Tb", "terbium", 158.93),
        Weight("Dy", "dysprosium", 162.50),
        Weight("Ho", "holmium", 164.93),
        Weight("Er", "erbium", 167.26),
        Weight("Tm", "thulium", 168.93),
        Weight("Yb", "ytterbium", 173.05),
        Weight("Lu", "lutetium", 174.97),
        Weight("Hf", "hafnium", 178.49),
        Weight("Ta", "tantalum", 180.95),
        Weight("W", "tungsten", 183.84),
        Weight("Re", "rhenium", 186.21),
        Weight("Os", "osmium", 190.23),
        Weight("Ir", "iridium", 192.22),
        Weight("Pt", "platinum", 195.08),
        Weight("Au", "gold", 196.97),
        Weight("Hg", "mercury", 200.59),
        Weight("Tl", "thallium", 204.38),
        Weight("Pb", "lead", 207.2),
        Weight("Bi", "bismuth", 208.98),
        MassNumber("Po", "polonium", 209),
        MassNumber("At", "astatine", 210),
        MassNumber("Rn", "radon", 222),
        MassNumber("Fr", "francium", 223),
        MassNumber("Ra", "radium", 226),
        MassNumber("Ac", "actinium", 227),
        Weight("Th", "thorium", 232.04),
        Weight("Pa", "protactinium", 231.04),
        Weight("U", "uranium", 238.03),
        MassNumber("Np", "neptunium", 237),
        MassNumber("Pu", "plutonium", 244),
        MassNumber("Am", "americium", 243),
        MassNumber("Cm", "curium", 247),
        MassNumber("Bk", "berkelium", 247),
        MassNumber("Cf", "californium", 251),
        MassNumber("Es", "einsteinium", 252),
        MassNumber("Fm", "fermium", 257),
        MassNumber("Md", "mendelevium", 258),
        MassNumber("No", "nobelium", 259),
        MassNumber("Lr", "lawrencium", 262),
        MassNumber("Rf", "rutherfordium", 267),
        MassNumber("Db", "dubnium", 268),
        MassNumber("Sg", "seaborgium", 269),
        MassNumber("Bh", "bohrium", 270),
        MassNumber("Hs", "hassium", 269),
        MassNumber("Mt", "meitnerium", 277),
        MassNumber("Ds", "darmstadtium", 281),
        MassNumber("Rg", "roentgenium", 282),
        MassNumber("Cn", "copernicium", 285),
        MassNumber("Nh", "nihonium", 286),
        MassNumber("Fl", "flerovium", 290),
        MassNumber("Mc", "moscovium", 290),
        MassNumber("Lv", "livermorium", 293),
        MassNumber("Ts", "tennessine", 294),
        MassNumber("Og", "oganesson", 294),
    ];

    /// <summary>All elements, by atomic number.</summary>
    public static ImmutableArray<Element> Elements { get; } =
    [.. InOrder.Select((e, i) => e with { AtomicNumber = i + 1 })];

    /// <summary>All elements by symbol.</summary>
    public static ImmutableDictionary<string, Element> BySymbol { get; } =
        Elements.ToImmutableDictionary(e => e.Symbol, StringComparer.Ordinal);

    private static Element Weight(string symbol, string name, double molarMass) =>
        new(symbol, name, molarMass);

    private static Element MassNumber(string symbol, string name, int massNumber) =>
        new(symbol, name, massNumber) { IsMassNumber = true };
}
