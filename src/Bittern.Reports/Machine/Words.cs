using Bittern.Calculation;
using Bittern.Diagnostics;
using Bittern.Model;

namespace Bittern.Reports.Machine;

/// <summary>The words that machine outputs use for a closed set of values; they are part of the format.</summary>
internal static class Words
{
    public static string Of(Comparison comparison) =>
        comparison switch
        {
            Comparison.AtMost => "at_most",
            Comparison.Below => "below",
            Comparison.AtLeast => "at_least",
            Comparison.Above => "above",
            Comparison.Within => "within",
            _ => "equal",
        };

    public static string Of(Verdict verdict) =>
        verdict switch
        {
            Verdict.Met => "met",
            Verdict.Failed => "failed",
            Verdict.Undecided => "undecided",
            _ => "not_judged",
        };

    /// <summary>Null for a value above detection.</summary>
    public static string? Of(BelowDetection detection) =>
        detection switch
        {
            BelowDetection.Half => "half",
            BelowDetection.Zero => "zero",
            BelowDetection.Limit => "limit",
            _ => null,
        };

    public static string Of(SaturationRole role) =>
        role switch
        {
            SaturationRole.Present => "formed",
            SaturationRole.Allowed => "may_form",
            SaturationRole.HeldBack => "held_back",
            _ => "not_listed",
        };

    public static string Of(Severity severity) =>
        severity switch
        {
            Severity.Error => "error",
            Severity.Warning => "warning",
            _ => "note",
        };
}
