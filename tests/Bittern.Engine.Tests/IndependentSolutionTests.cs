using System.Globalization;
using System.Text.Json;
using Bittern.Engine.Activity;
using Xunit;

namespace Bittern.Engine.Tests;

/// <summary>
/// The engine against a solve of the same equations in 40-digit arithmetic with a general-purpose root finder
/// (<c>tests/reference/independent</c>).
/// </summary>
public sealed class IndependentSolutionTests
{
    // The engine certifies 1e-10 of the gross amount; 1e-9 of each single number leaves room for its conditioning, no more.
    private const double Tolerance = 1e-9;

    public static TheoryData<string> Names =>
        [.. Systems().Select(s => s.GetProperty("name").GetString()!)];

    [Theory]
    [MemberData(nameof(Names))]
    public void The_engine_agrees_to_nine_digits(string name)
    {
        var problem = ProblemOf(Systems().Single(s => Is(s, name)));
        var expected = Read("answers.json")
            .GetProperty("answers")
            .EnumerateArray()
            .Single(a => Is(a, name));

        var answer = Solved.Certified(problem);

        var system = problem.System;
        var gaps = new List<(string What, double Relative)>
        {
            (
                "ionic strength",
                Relative(answer.IonicStrength, expected.GetProperty("ionic_strength"))
            ),
            ("water", Relative(answer.WaterKilograms, expected.GetProperty("water_kg"))),
            ("ln a_w", Relative(answer.LnWaterActivity, expected.GetProperty("ln_water_activity"))),
            ("pH", Relative(-answer.LnActivities[0] / Math.Log(10), expected.GetProperty("pH"))),
        };
        for (var j = 0; j < system.Species.Length; j++)
        {
            gaps.Add(
                (
                    system.Species[j].Name,
                    Relative(
                        answer.Molalities[j],
                        expected.GetProperty("molalities").GetProperty(system.Species[j].Name)
                    )
                )
            );
        }

        for (var s = 0; s < system.Solids.Length; s++)
        {
            var solid = system.Solids[s].Name;
            gaps.Add(
                (
                    solid,
                    Relative(
                        answer.SolidAmounts[s],
                        expected.GetProperty("solid_amounts").GetProperty(solid)
                    )
                )
            );

            // log10 Ω is zero where a solid is present: compared as it stands.
            gaps.Add(
                (
                    $"Ω({solid})",
                    Math.Abs(
                        (answer.LnSaturations[s] / Math.Log(10))
                            - Number(expected.GetProperty("log10_saturations").GetProperty(solid))
                    )
                )
            );
        }

        for (var g = 0; g < system.Gases.Length; g++)
        {
            gaps.Add(
                (
                    system.Gases[g].Name,
                    Relative(
                        answer.GasAmounts[g],
                        expected.GetProperty("gas_amounts").GetProperty(system.Gases[g].Name)
                    )
                )
            );
        }

        var worst = gaps.MaxBy(g => g.Relative);
        TestContext.Current.TestOutputHelper!.WriteLine(
            string.Create(
                CultureInfo.InvariantCulture,
                $"{name}: worst {worst.Relative:0.0e0} at {worst.What}"
            )
        );
        Assert.True(
            worst.Relative <= Tolerance,
            string.Create(
                CultureInfo.InvariantCulture,
                $"{worst.What} is off by {worst.Relative:0.0e0}"
            )
        );
    }

    private static Problem ProblemOf(JsonElement data)
    {
        var builder = new SystemBuilder();
        foreach (var component in data.GetProperty("components").EnumerateObject())
        {
            builder.Component(component.Name, component.Value.GetInt32());
        }

        foreach (var complex in data.GetProperty("complexes").EnumerateArray())
        {
            builder.Complex(
                NameOf(complex),
                complex.GetProperty("charge").GetInt32(),
                Number(complex.GetProperty("log10K")),
                From(complex)
            );
        }

        foreach (var solid in data.GetProperty("solids").EnumerateArray())
        {
            builder.Solid(NameOf(solid), Number(solid.GetProperty("log10K")), From(solid));
        }

        foreach (var gas in data.GetProperty("gases").EnumerateArray())
        {
            builder.Gas(NameOf(gas), Number(gas.GetProperty("log10K")), From(gas));
        }

        var problem = new Problem(
            builder.Build(
                new Davies(Number(Read("systems.json").GetProperty("davies").GetProperty("A")))
            )
        );
        foreach (var total in data.GetProperty("totals").EnumerateObject())
        {
            problem.Totals[problem.System.ComponentIndex(total.Name)] = Number(total.Value);
        }

        foreach (var pressure in data.GetProperty("fixed_pressures_atm").EnumerateObject())
        {
            problem.FixedGasPressures[problem.System.GasIndex(pressure.Name)] = Pressure(
                pressure.Value.GetString()!
            );
        }

        problem.TotalWater += Number(data.GetProperty("further_water_mol"));
        Array.Fill(problem.AllowedSolids, true);
        return problem;
    }

    private static double Pressure(string text) =>
        text.StartsWith("log10 ", StringComparison.Ordinal)
            ? Math.Pow(10, double.Parse(text.AsSpan("log10 ".Length), CultureInfo.InvariantCulture))
            : double.Parse(text, CultureInfo.InvariantCulture);

    private static (string Of, double Coefficient)[] From(JsonElement entry) =>
        [.. entry.GetProperty("from").EnumerateObject().Select(p => (p.Name, p.Value.GetDouble()))];

    private static double Relative(double found, JsonElement expected)
    {
        var value = Number(expected);
        return value == 0 ? Math.Abs(found) : Math.Abs((found / value) - 1);
    }

    private static double Number(JsonElement text) =>
        double.Parse(text.GetString()!, CultureInfo.InvariantCulture);

    private static string NameOf(JsonElement entry) => entry.GetProperty("name").GetString()!;

    private static bool Is(JsonElement entry, string name) =>
        string.Equals(NameOf(entry), name, StringComparison.Ordinal);

    private static IEnumerable<JsonElement> Systems() =>
        Read("systems.json").GetProperty("systems").EnumerateArray();

    private static JsonElement Read(string file)
    {
        using var document = JsonDocument.Parse(
            File.ReadAllText(
                Path.Combine(AppContext.BaseDirectory, "reference", "independent", file)
            )
        );
        return document.RootElement.Clone();
    }
}
