using System.Globalization;
using Bittern.Chemistry;

namespace Bittern.Catalogue;

/// <summary>How constants are put into words, in cards and pages alike.</summary>
internal static class ConstantWords
{
    public static string Kind(EntryKind kind) =>
        kind switch
        {
            EntryKind.Basis => "primary species",
            EntryKind.Complex => "dissolved species",
            EntryKind.Solid => "solid",
            EntryKind.Gas => "gas",
            EntryKind.HalfReaction => "half-reaction",
            _ => throw new ArgumentOutOfRangeException(nameof(kind), kind, message: null),
        };

    /// <summary>What the numbers are the logarithm of, whatever form the author chose.</summary>
    public static string Form(EquilibriumConstant constant) =>
        constant.Form switch
        {
            ConstantForm.LogKsp or ConstantForm.PKsp or ConstantForm.Ksp => "log Ksp",
            ConstantForm.LogKH => "log KH",
            _ => "log K",
        };

    public static string Value(EquilibriumConstant constant) =>
        constant.Value switch
        {
            TemperatureFunction.VantHoff { EnthalpyKilojoules: { } h } v => string.Create(
                CultureInfo.InvariantCulture,
                $"{v.Log10At25}, ΔH {h} kJ/mol"
            ),
            TemperatureFunction.VantHoff v => string.Create(
                CultureInfo.InvariantCulture,
                $"{v.Log10At25}"
            ),
            TemperatureFunction.Published p => p.Text,
            _ => throw new InvalidOperationException("a temperature function of a new kind"),
        };

    public static string Uncertainty(EquilibriumConstant constant) =>
        constant.UncertaintyLog10 is { } u
            ? string.Create(CultureInfo.InvariantCulture, $"± {u:0.###}")
            : "";

    public static string Range(EquilibriumConstant constant) =>
        (constant.ValidFromCelsius, constant.ValidToCelsius) switch
        {
            ({ } from, { } to) when from == to => string.Create(
                CultureInfo.InvariantCulture,
                $"{from} °C only"
            ),
            ({ } from, { } to) => string.Create(CultureInfo.InvariantCulture, $"{from} to {to} °C"),
            _ => "no range stated",
        };

    public static string Source(EquilibriumConstant constant) =>
        constant.Source is { } s
            ? $"{s.Text} [{s.Key}]{(constant.Recalled ? ", recalled without sight of it" : "")}"
            : "none";
}
