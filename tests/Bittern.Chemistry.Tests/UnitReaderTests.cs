using System.Globalization;
using CsCheck;
using Xunit;

namespace Bittern.Chemistry.Tests;

public sealed class UnitReaderTests
{
    // Factors written out by hand from the definitions of the units.
    [Theory]
    [InlineData("mg/L", 0.001, "mass per volume", "mg/L")]
    [InlineData("mg/l", 0.001, "mass per volume", "mg/L")]
    [InlineData("µg/L", 0.000001, "mass per volume", "µg/L")]
    [InlineData("\u03BCg/L", 0.000001, "mass per volume", "µg/L")]
    [InlineData("ug/L", 0.000001, "mass per volume", "µg/L")]
    [InlineData("ug/l", 0.000001, "mass per volume", "µg/L")]
    [InlineData("ng/L", 0.000000001, "mass per volume", "ng/L")]
    [InlineData("g/L", 1, "mass per volume", "g/L")]
    [InlineData("g/m3", 0.001, "mass per volume", "g/m³")]
    [InlineData("g/m³", 0.001, "mass per volume", "g/m³")]
    [InlineData("g/m^3", 0.001, "mass per volume", "g/m³")]
    [InlineData("kg/m3", 1, "mass per volume", "kg/m³")]
    [InlineData("t/m3", 1000, "mass per volume", "t/m³")]
    [InlineData("mmol/L", 1, "amount per volume", "mmol/L")]
    [InlineData("mol/L", 1000, "amount per volume", "mol/L")]
    [InlineData("mol/m3", 1, "amount per volume", "mol/m³")]
    [InlineData("µmol/L", 0.001, "amount per volume", "µmol/L")]
    [InlineData("meq/L", 1, "equivalents per volume", "meq/L")]
    [InlineData("eq/L", 1000, "equivalents per volume", "eq/L")]
    [InlineData("mol/kg", 1, "amount per mass", "mol/kg")]
    [InlineData("mmol/kg", 0.001, "amount per mass", "mmol/kg")]
    [InlineData("mg/kg", 0.000001, "a pure number", "mg/kg")]
    [InlineData("g/kg", 0.001, "a pure number", "g/kg")]
    [InlineData("%", 0.01, "a pure number", "%")]
    [InlineData("ppm", 0.000001, "a pure number", "ppm")]
    [InlineData("ppb", 0.000000001, "a pure number", "ppb")]
    [InlineData("mL/L", 0.001, "a pure number", "mL/L")]
    [InlineData("L/m3", 0.001, "a pure number", "L/m³")]
    [InlineData("m3/h", 1.0 / 3600, "volume per time", "m³/h")]
    [InlineData("m³/h", 1.0 / 3600, "volume per time", "m³/h")]
    [InlineData("L/s", 0.001, "volume per time", "L/s")]
    [InlineData("ML/d", 1000.0 / 86400, "volume per time", "ML/d")]
    [InlineData("m3/d", 1.0 / 86400, "volume per time", "m³/d")]
    [InlineData("kg/h", 1.0 / 3600, "mass per time", "kg/h")]
    [InlineData("t/d", 1000.0 / 86400, "mass per time", "t/d")]
    [InlineData("kg", 1, "mass", "kg")]
    [InlineData("g", 0.001, "mass", "g")]
    [InlineData("t", 1000, "mass", "t")]
    [InlineData("L", 0.001, "volume", "L")]
    [InlineData("mL", 0.000001, "volume", "mL")]
    [InlineData("m3", 1, "volume", "m³")]
    [InlineData("s", 1, "time", "s")]
    [InlineData("min", 60, "time", "min")]
    [InlineData("h", 3600, "time", "h")]
    [InlineData("d", 86400, "time", "d")]
    [InlineData("K", 1, "temperature", "K")]
    [InlineData("atm", 101325, "pressure", "atm")]
    [InlineData("bar", 100000, "pressure", "bar")]
    [InlineData("mbar", 100, "pressure", "mbar")]
    [InlineData("kPa", 1000, "pressure", "kPa")]
    [InlineData("Pa", 1, "pressure", "Pa")]
    [InlineData("mV", 0.001, "electric potential", "mV")]
    [InlineData("V", 1, "electric potential", "V")]
    [InlineData("EUR/kg", 1, "money per mass", "EUR/kg")]
    [InlineData("EUR/t", 0.001, "money per mass", "EUR/t")]
    [InlineData("USD/m3", 1, "money per volume", "USD/m³")]
    [InlineData("kJ/mol", 1000, "energy per amount", "kJ/mol")]
    [InlineData("kcal/mol", 4184, "energy per amount", "kcal/mol")]
    [InlineData("cm3/mol", 0.000001, "volume per amount", "cm³/mol")]
    [InlineData("Bq/L", 1000, "per volume and time", "Bq/L")]
    [InlineData("pCi/L", 37, "per volume and time", "pCi/L")]
    [InlineData("mS/cm", 0.1, "electric conductivity", "mS/cm")]
    [InlineData("µS/cm", 0.0001, "electric conductivity", "µS/cm")]
    [InlineData("uS/cm", 0.0001, "electric conductivity", "µS/cm")]
    [InlineData("L/m2/h", 0.001 / 3600, "length per time", "L/m²/h")]
    [InlineData("kWh/m3", 3600000, "pressure", "kWh/m³")]
    [InlineData("1/s", 1, "per time", "1/s")]
    public void A_unit_has_its_si_factor_dimension_and_one_spelling(
        string text,
        double factor,
        string dimension,
        string symbol
    )
    {
        Assert.True(UnitReader.TryRead(text, out var unit, out var fault), fault);
        Assert.InRange(unit!.SiFactor / factor, 1 - 4e-16, 1 + 4e-16);
        Assert.Equal(0, unit.SiOffset);
        Assert.Equal(dimension, unit.Dimension.ToString());
        Assert.Equal(symbol, unit.Symbol);
    }

    [Theory]
    [InlineData("°C")]
    [InlineData("degC")]
    [InlineData("\u2103")]
    public void Celsius_has_its_zero_at_the_ice_point(string text)
    {
        var unit = UnitReader.Read(text);
        Assert.Equal(298.15, unit.ToSi(25));
        Assert.Equal(25, unit.FromSi(298.15), 1e-12);
        Assert.Equal("°C", unit.Symbol);
        Assert.Equal(Dimension.OfTemperature, unit.Dimension);
    }

    [Fact]
    public void Decimal_prefixes_lose_no_bit()
    {
        Assert.Equal(0.001, UnitReader.Read("mg/L").SiFactor);
        Assert.Equal(1e-9, UnitReader.Read("ng/L").SiFactor);
        Assert.Equal(1e-6, UnitReader.Read("cm3/mol").SiFactor);
        Assert.Equal(0.1, UnitReader.Read("mS/cm").SiFactor);
    }

    [Fact]
    public void Molality_and_mass_fraction_do_not_mix()
    {
        Assert.NotEqual(UnitReader.Read("mol/kg").Dimension, UnitReader.Read("mg/kg").Dimension);
        Assert.NotEqual(UnitReader.Read("mol/L").Dimension, UnitReader.Read("eq/L").Dimension);
        Assert.Equal(Dimension.OfMass, UnitReader.Read("mg/kg").RatioOf);
        Assert.Equal(Dimension.OfMass, UnitReader.Read("ppm").RatioOf);
        Assert.Equal(Dimension.Volume, UnitReader.Read("mL/L").RatioOf);
        Assert.Null(UnitReader.Read("%").RatioOf);
        Assert.Null(UnitReader.Read("mg/L").RatioOf);
    }

    [Fact]
    public void A_currency_is_kept()
    {
        Assert.Equal("EUR", UnitReader.Read("EUR/kg").Currency);
        Assert.Equal("AUD", UnitReader.Read("AUD").Currency);
        Assert.Null(UnitReader.Read("mg/L").Currency);
    }

    [Theory]
    [InlineData("", "a unit is missing")]
    [InlineData("mgL", "'mgL' is no unit: did you mean 'mg/L'?")]
    [InlineData("mg/lt", "'lt' in 'mg/lt' is no unit: did you mean 'mg/L'?")]
    [InlineData("mgg/L", "'mgg' in 'mgg/L' is no unit: did you mean 'mg/L'?")]
    [InlineData("mol/KG", "'KG' in 'mol/KG' is no unit: did you mean 'mol/kg'?")]
    [InlineData("M", "'M' is not used for a concentration: write mol/L")]
    [InlineData("mM", "'mM' is not used for a concentration: write mmol/L")]
    [InlineData(
        "ppt",
        "'ppt' is not used: it means parts per thousand to some and per trillion to others; write g/kg or ng/kg"
    )]
    [InlineData(
        "kJ/°C",
        "'kJ/°C' is no unit: °C stands alone; a difference in temperature is in K"
    )]
    [InlineData("ppm/h", "'ppm/h' is no unit: 'ppm' stands alone")]
    [InlineData("EUR/USD", "'EUR/USD' is no unit: it mixes the currencies EUR and USD")]
    [InlineData("mg/", "'mg/' is no unit: something is missing beside '/'")]
    [InlineData("/L", "'/L' is no unit: something is missing beside '/'")]
    [InlineData("mg//L", "'mg//L' is no unit: something is missing beside '/'")]
    [InlineData("m0", "'m0' is no unit: 'm0' has no usable exponent")]
    [InlineData("m^x", "'m^x' is no unit: 'm^x' has no usable exponent")]
    [InlineData("furlong", "'furlong' is no unit")]
    public void A_text_that_is_no_unit_is_explained(string text, string expected)
    {
        Assert.False(UnitReader.TryRead(text, out var unit, out var fault));
        Assert.Null(unit);
        Assert.Equal(expected, fault);
    }

    [Fact]
    public void Every_suggested_unit_is_one() =>
        Assert.All(
            UnitReader.Common,
            text => Assert.True(UnitReader.TryRead(text, out _, out _), text)
        );

    [Fact]
    public void A_canonical_symbol_reads_as_the_same_unit() =>
        Assert.All(
            UnitReader.Common,
            text =>
                Assert.Equal(UnitReader.Read(text), UnitReader.Read(UnitReader.Read(text).Symbol))
        );

    [Fact]
    public void Any_string_is_read_or_explained() =>
        Gen.OneOf(Gen.String, Gen.String[Gen.Char["mgLlkµuolbardhsEURSD/·^-0123456789%K°C"], 0, 45])
            .Sample(
                text =>
                {
                    var read = UnitReader.TryRead(text, out var unit, out var fault);
                    Assert.Equal(read, unit is not null);
                    Assert.Equal(read, fault is null);
                    Assert.True(!read || double.IsNormal(unit!.SiFactor));
                },
                iter: 50_000
            );

    [Fact]
    public void A_decimal_comma_culture_changes_nothing()
    {
        var before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = new CultureInfo("de-DE");
            Assert.Equal(0.001, UnitReader.Read("mg/L").SiFactor);
            Assert.Equal(145.15, FormulaReader.Standard.Read("CaSO4·0.5H2O").MolarMass, 0.01);
            Assert.Equal(
                "2.5 H2O = 2.5 H2O",
                new Reaction(
                    [new(2.5, FormulaReader.Standard.Read("H2O"))],
                    [new(2.5, FormulaReader.Standard.Read("H2O"))]
                ).ToString()
            );
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }
}
