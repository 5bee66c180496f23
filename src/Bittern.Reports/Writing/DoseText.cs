using Bittern.Model;

namespace Bittern.Reports.Writing;

/// <summary>Doses in the units that a pump or a feeder is set to.</summary>
internal static class DoseText
{
    /// <summary>A dose per m3 entering the stage: litres of a product as delivered, kg of a dry one.</summary>
    public static string PerStageVolume(Reagent reagent, double units) =>
        reagent.IsDry
            ? Digits.Significant(units) + " kg/m3"
            : Digits.Significant(units * 1000) + " L/m3";

    /// <summary>What one m3 entering the stage gets, with no unit: the column header says it.</summary>
    public static double Number(Reagent reagent, double units) =>
        reagent.IsDry ? units : units * 1000;

    public static string Name(Reagent reagent) => MarkdownText.Escape(reagent.Name);

    /// <summary>The action as the recipe says it: <c>until pH = 7.2, at most 5 g/L</c>.</summary>
    public static string Asked(StageAction action) => MarkdownText.Escape(AskedPlain(action));

    /// <summary><see cref="Asked"/> without escapes.</summary>
    public static string AskedPlain(StageAction action) =>
        action switch
        {
            StageAction.AddAmount add => add.Dose.Written,
            StageAction.AddUntil until => "until "
                + until.Target.Written
                + (until.AtMost is { } most ? ", at most " + most.Written : ""),
            _ => "",
        };
}
