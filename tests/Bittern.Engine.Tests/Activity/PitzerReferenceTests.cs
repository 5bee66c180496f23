using Bittern.Engine.Activity;
using Bittern.Reference;
using Xunit;

namespace Bittern.Engine.Tests.Activity;

/// <summary>
/// Values of an independent evaluation of the equations of Harvie, Møller and Weare 1984 with the same parameters, its J by numerical integration; they
/// have six or seven figures. The series for J costs 5e-9 in its slope, and 1e-5 in Eθ and its slope is what any published approximation is asked for.
/// </summary>
public sealed class PitzerReferenceTests
{
    public static TheoryData<string, string, double> Rows(string kind) =>
        [
            .. ReferenceTable
                .Rows("activity/pitzer-reference-values.csv")
                .Where(r =>
                    kind is "case"
                        ? r["set"] is "HMW84"
                            && r["composition_mol_per_kg"].Contains(' ', StringComparison.Ordinal)
                            && r["case"] is not "E-theta"
                        : string.Equals(r["case"], kind, StringComparison.Ordinal)
                )
                .Select(r => new TheoryDataRow<string, string, double>(
                    r["composition_mol_per_kg"],
                    r["quantity"],
                    ParameterTables.Number(r["value"])
                )),
        ];

    [Fact]
    public void Every_row_is_used() =>
        Assert.Equal(
            ReferenceTable.Rows("activity/pitzer-reference-values.csv").Count,
            Rows("J0").Count + Rows("E-theta").Count + Rows("case").Count
        );

    [Theory]
    [MemberData(nameof(Rows), "J0")]
    public void The_series_is_the_integral(string x, string quantity, double value)
    {
        var (j, slope, _) = HarvieIntegral.At(ParameterTables.Number(x[2..]));
        Assert.Equal(value, quantity is "J" ? j : slope, 5e-9);
    }

    [Theory]
    [MemberData(nameof(Rows), "E-theta")]
    public void Unsymmetrical_mixing_agrees(string at, string quantity, double value)
    {
        var numbers = at.Replace("z=", "", StringComparison.Ordinal)
            .Replace("I=", "", StringComparison.Ordinal)
            .Split([',', ';'])
            .Select(ParameterTables.Number)
            .ToArray();
        var mixing = new UnsymmetricalMixing([(int)numbers[0], (int)numbers[1]], 0.392);
        double[] e0 = [0],
            e1 = [0],
            e2 = [0];
        mixing.Evaluate(numbers[2], e0, e1, e2);
        Assert.Equal(value, quantity is "Etheta" ? e0[0] : e1[0], 1e-5 * Math.Abs(value));
    }

    [Theory]
    [MemberData(nameof(Rows), "case")]
    public void A_composition_agrees(string composition, string quantity, double value)
    {
        var parts = composition
            .Split(';', StringSplitOptions.TrimEntries)
            .Select(p => p.Split(' '))
            .ToArray();
        var at = new Liquor(
            new Pitzer(ParameterTables.Hmw84),
            298.15,
            [.. parts.Select(p => p[0])]
        ).At([.. parts.Select(p => ParameterTables.Number(p[1]))]);
        var found = quantity switch
        {
            "osmotic coefficient" => at.Osmotic,
            "water activity" => Math.Exp(at.LnWater),
            _ => at.Gamma(quantity["gamma ".Length..]),
        };
        Assert.InRange(found / value, 1 - 1e-4, 1 + 1e-4);
    }
}
