namespace Bittern.Chemistry;

/// <summary>Physical constants (CODATA 2018; exact in the SI since 2019 where so defined).</summary>
public static class PhysicalConstants
{
    /// <summary>Molar gas constant, J/(mol K).</summary>
    public const double GasConstant = 8.314462618;

    /// <summary>Faraday constant, C/mol.</summary>
    public const double Faraday = 96485.33212;

    /// <summary>Avogadro constant, 1/mol.</summary>
    public const double Avogadro = 6.02214076e23;

    /// <summary>0 °C in kelvin.</summary>
    public const double ZeroCelsius = 273.15;

    /// <summary>25 °C in kelvin, the reference temperature of the constants.</summary>
    public const double ReferenceKelvin = 298.15;

    /// <summary>Molar mass of water, kg/mol, from the standard atomic weights (IUPAC 2021).</summary>
    public const double WaterMolarMass = 0.018015;

    /// <summary>Standard atmosphere, Pa.</summary>
    public const double Atmosphere = 101325;
}
