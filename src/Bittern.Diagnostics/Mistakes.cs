using System.Collections.Immutable;
using System.Globalization;

namespace Bittern.Diagnostics;

/// <summary>
/// Makes the diagnostics of the language: call sites pass values, the wording is here.
/// </summary>
public static class Mistakes
{
    public static Diagnostic TextNotClosed(SourceSpan span, string quote) =>
        Make(
            DiagnosticCodes.TextNotClosed,
            span,
            $"this text has no closing {quote}",
            $"close it with {quote} on the same line"
        );

    public static Diagnostic DecimalComma(SourceSpan span) =>
        Make(
            DiagnosticCodes.DecimalComma,
            span,
            $"'{span.Text}' has a comma between digits",
            $"write {span.Text.Replace(',', '.')} for a decimal, or a comma and a space between two entries"
        );

    public static Diagnostic NumberTooLarge(SourceSpan span) =>
        Make(
            DiagnosticCodes.NumberTooLarge,
            span,
            $"'{span.Text}' is no number that can be calculated with",
            "use a power of ten of ordinary size"
        );

    public static Diagnostic StrangeCharacter(SourceSpan span, string character) =>
        Make(
            DiagnosticCodes.StrangeCharacter,
            span,
            $"the character U+{char.ConvertToUtf32(Safe(character), 0):X4} has no meaning here",
            "delete it, or put it inside a text"
        );

    public static Diagnostic NestedTooDeep(SourceSpan span) =>
        Make(
            DiagnosticCodes.NestedTooDeep,
            span,
            "this is nested deeper than the language allows",
            "take the inner parts apart"
        );

    public static Diagnostic StrayBrace(SourceSpan span) =>
        Make(
            DiagnosticCodes.StrayBrace,
            span,
            "this } closes nothing",
            "delete it, or look for a brace too many above"
        );

    public static Diagnostic BlockNotClosed(SourceSpan span, SourceSpan end) =>
        Make(
            DiagnosticCodes.BlockNotClosed,
            span,
            "this { has no closing }",
            "close the block with } on a line of its own",
            new RelatedSpan(end, "expected before this")
        );

    public static Diagnostic Unexpected(SourceSpan span, string? found, string shape) =>
        Make(
            DiagnosticCodes.Unexpected,
            span,
            found is null ? "this line ends too early" : $"'{found}' was not expected here",
            $"this is how it goes:  {shape}"
        );

    public static Diagnostic UnknownDeclaration(SourceSpan span, string word, string? near) =>
        Make(
            DiagnosticCodes.UnknownDeclaration,
            span,
            word.Length == 0
                ? "a declaration is missing before this"
                : $"no declaration starts with '{word}'",
            near is null
                ? "a recipe consists of recipe, use, cite, liquor, reagent, atmosphere, train, limits, report, mix and declarations of species"
                : $"did you mean '{near}'?"
        );

    public static Diagnostic NumberWithGap(SourceSpan span, string joined) =>
        Make(
            DiagnosticCodes.NumberWithGap,
            span,
            $"'{span.Text}' looks like one number with a gap",
            $"write {joined}, or a comma and a space between two entries"
        );

    public static Diagnostic ChargeOrder(SourceSpan span, string better) =>
        Make(
            DiagnosticCodes.ChargeOrder,
            span,
            $"'{span.Text}' has the sign before the number",
            $"write the charge as {better}"
        );

    public static Diagnostic ColonHydrate(SourceSpan span, string formula) =>
        Make(
            DiagnosticCodes.ColonHydrate,
            span,
            $"'{formula}:' is not how a hydrate is written here",
            "write the water behind a dot or a star: CaSO4·2H2O or CaSO4*2H2O"
        );

    public static Diagnostic NeedsBlock(SourceSpan span, string word) =>
        Make(
            DiagnosticCodes.NeedsBlock,
            span,
            $"'{word}' needs a block",
            "put what belongs to it between { and }"
        );

    public static Diagnostic NotAFormula(
        SourceSpan span,
        string text,
        string fault,
        string? near
    ) =>
        Make(
            DiagnosticCodes.NotAFormula,
            span,
            $"'{text}' is no formula: {fault}",
            near is null
                ? "element symbols start with a capital; brackets and charges as in Fe(OH)3 and SO4^2-"
                : $"did you mean '{near}'?"
        );

    public static Diagnostic IonOrSolute(SourceSpan span, string formula, int charge) =>
        Make(
            DiagnosticCodes.IonOrSolute,
            span,
            $"{formula} has the charge {charge}",
            charge == 0 ? $"write: solute {formula}" : $"write: ion {formula}"
        );

    public static Diagnostic Unbalanced(
        SourceSpan span,
        string reaction,
        IReadOnlyDictionary<string, double> surplus
    ) =>
        Make(
            DiagnosticCodes.Unbalanced,
            span,
            $"{reaction} does not balance: the right side has {Surplus(surplus)}",
            "correct the coefficients or the formula"
        );

    public static Diagnostic UnknownSpecies(SourceSpan span, string species, string? near) =>
        Make(
            DiagnosticCodes.UnknownSpecies,
            span,
            $"{species} is not declared",
            near is null
                ? "declare it with ion, solute or complex, or use a catalogue that has it"
                : $"did you mean {near}? Else declare it with ion, solute or complex"
        );

    public static Diagnostic Cycle(SourceSpan span, string name) =>
        Make(
            DiagnosticCodes.Cycle,
            span,
            $"the reaction of {name} leads back to itself",
            "write one of the reactions over basis species"
        );

    public static Diagnostic DeclaredTwice(SourceSpan span, string name, SourceSpan? first) =>
        Make(
            DiagnosticCodes.DeclaredTwice,
            span,
            $"'{name}' is declared twice",
            "delete one, or give it a name of its own",
            first is { } f ? new RelatedSpan(f, "first declared here") : null
        );

    public static Diagnostic NeedsOverride(SourceSpan span, string name, SourceSpan first) =>
        Make(
            DiagnosticCodes.NeedsOverride,
            span,
            $"'{name}' is in the catalogue already",
            "put override before it and because \"reason\" behind it, or give it another name",
            new RelatedSpan(first, "the catalogue's entry")
        );

    public static Diagnostic NothingToOverride(SourceSpan span, string name, string? near) =>
        Make(
            DiagnosticCodes.NothingToOverride,
            span,
            $"there is no '{name}' to override",
            near is null
                ? "declare it without override, or use the catalogue that has it"
                : $"did you mean '{near}'?"
        );

    public static Diagnostic OverrideChangesReaction(
        SourceSpan span,
        string name,
        string original,
        SourceSpan first
    ) =>
        Make(
            DiagnosticCodes.OverrideChangesReaction,
            span,
            $"the override of '{name}' has another reaction than what it replaces",
            $"repeat the reaction as it stands: {original}",
            new RelatedSpan(first, "what it replaces")
        );

    public static Diagnostic OverrideWithoutReason(SourceSpan span, string name) =>
        Make(
            DiagnosticCodes.OverrideWithoutReason,
            span,
            $"the override of '{name}' gives no reason",
            "add because \"…\" at its end"
        );

    public static Diagnostic KspNotDissolution(SourceSpan span, string reaction) =>
        Make(
            DiagnosticCodes.KspNotDissolution,
            span,
            $"{reaction} is not the dissolution of a solid by itself",
            "write log K for it, or turn the reaction into one over ions and OH-"
        );

    public static Diagnostic ConstantNotPositive(SourceSpan span) =>
        Make(
            DiagnosticCodes.ConstantNotPositive,
            span,
            "an equilibrium constant must be positive",
            "write log K or pKsp if the number is a logarithm"
        );

    public static Diagnostic PowerAsLog(SourceSpan span, string text) =>
        Make(
            DiagnosticCodes.PowerAsLog,
            span,
            $"{text} is written where a logarithm is expected",
            $"write K {text}, or the exponent alone behind log K"
        );

    public static Diagnostic UncertaintyOfPower(SourceSpan span) =>
        Make(
            DiagnosticCodes.UncertaintyOfPower,
            span,
            "an uncertainty on a power of ten is ambiguous",
            "write log Ksp -4.58 ± 0.02"
        );

    public static Diagnostic ExpressionWithEnthalpy(SourceSpan span) =>
        Make(
            DiagnosticCodes.ExpressionWithEnthalpy,
            span,
            "this constant is an expression in T and has a ΔH as well",
            "delete one of the two"
        );

    public static Diagnostic UnknownInExpression(SourceSpan span, string name, string? near) =>
        Make(
            DiagnosticCodes.UnknownInExpression,
            span,
            $"'{name}' means nothing in an expression",
            near is null
                ? "use T (kelvin), numbers, + - * / ^, log10, ln, exp and sqrt"
                : $"did you mean '{near}'?"
        );

    public static Diagnostic HalfReactionWithoutElectrons(SourceSpan span) =>
        Make(
            DiagnosticCodes.HalfReactionWithoutElectrons,
            span,
            "this half-reaction has no electrons on its left side",
            "write it as a reduction: Fe^3+ + e- to Fe^2+"
        );

    public static Diagnostic NoCitation(SourceSpan span) =>
        Make(
            DiagnosticCodes.NoCitation,
            span,
            "this constant names no source",
            "declare one with cite key \"…\" and put [key] behind the constant"
        );

    public static Diagnostic UnknownCitation(SourceSpan span, string key, string? near) =>
        Make(
            DiagnosticCodes.UnknownCitation,
            span,
            $"there is no source '{key}'",
            near is null
                ? $"declare it: cite {key} \"the reference in full\""
                : $"did you mean '{near}'?"
        );

    public static Diagnostic UnknownCatalogue(
        SourceSpan span,
        string name,
        string? near,
        IEnumerable<string> names
    ) =>
        Make(
            DiagnosticCodes.UnknownCatalogue,
            span,
            $"there is no catalogue '{name}'",
            near is null
                ? $"the catalogues are {string.Join(", ", names)}"
                : $"did you mean '{near}'?"
        );

    public static Diagnostic FileNotRead(SourceSpan span, string path, string reason) =>
        Make(
            DiagnosticCodes.FileNotRead,
            span,
            $"\"{path}\" was not read: {reason}",
            "give a path inside the recipe's own folder, with forward slashes"
        );

    public static Diagnostic OutOfRange(SourceSpan span, double celsius, int count, string names) =>
        Make(
            DiagnosticCodes.OutOfRange,
            span,
            string.Create(
                CultureInfo.InvariantCulture,
                $"{count} of the constants in reach are not given for {celsius:0.#} °C: {names}"
            ),
            "the report lists those that mattered; compare them with a source for that temperature"
        );

    public static Diagnostic SetsDoNotMix(
        SourceSpan span,
        string one,
        string other,
        string example
    ) =>
        Make(
            DiagnosticCodes.SetsDoNotMix,
            span,
            $"the catalogues {one} and {other} both describe {example}, and differently",
            $"use one of the two: brine goes with an ion-interaction model, the others with ion pairs"
        );

    public static Diagnostic ModelAndSet(SourceSpan span, string model, string set) =>
        Make(
            DiagnosticCodes.ModelAndSet,
            span,
            $"the activity model '{model}' is used with {set}",
            "choose the model that the catalogue is made for, or the catalogue that goes with the model"
        );

    public static Diagnostic WrongUnit(
        SourceSpan span,
        string unit,
        string dimension,
        string what,
        string example
    ) =>
        Make(
            DiagnosticCodes.WrongUnit,
            span,
            unit.Length == 0
                ? $"{what} needs a unit, and none is written"
                : $"{what} cannot have the unit {unit} ({dimension})",
            $"use {example}"
        );

    public static Diagnostic OutOfBounds(SourceSpan span, string what, string bounds) =>
        Make(DiagnosticCodes.OutOfBounds, span, $"{what} must be {bounds}", "correct the value");

    public static Diagnostic AnalyteWithoutSpecies(SourceSpan span, string analyte) =>
        Make(
            DiagnosticCodes.AnalyteWithoutSpecies,
            span,
            $"no species of this recipe holds '{analyte}'",
            "use the catalogue that has it (bittern catalogue lists them), or declare its ion"
        );

    public static Diagnostic CannotCountAs(SourceSpan span, string analyte, string basis) =>
        Make(
            DiagnosticCodes.CannotCountAs,
            span,
            $"'{analyte}' cannot be counted as {basis}",
            "use a formula that shares the element, as in NO3 12 mg/L as N"
        );

    public static Diagnostic AnalyteTwice(SourceSpan span, string analyte, SourceSpan first) =>
        Make(
            DiagnosticCodes.AnalyteTwice,
            span,
            $"'{analyte}' stands twice in this liquor",
            "keep one of the two lines",
            new RelatedSpan(first, "first here")
        );

    public static Diagnostic OfWhichDoesNotFit(SourceSpan span, string analyte) =>
        Make(
            DiagnosticCodes.OfWhichDoesNotFit,
            span,
            $"the parts of '{analyte}' do not fit its total",
            "check the numbers; parts are oxidation states, as in Fe 1420 mg/L, of which Fe(II) 640 mg/L"
        );

    public static Diagnostic CannotCloseCharge(SourceSpan span, string analyte, string? near) =>
        Make(
            DiagnosticCodes.CannotCloseCharge,
            span,
            $"the charge cannot be closed by '{analyte}'",
            near is null ? "name a charged entry of this liquor" : $"did you mean '{near}'?"
        );

    public static Diagnostic UnitSuspected(
        SourceSpan span,
        string liquor,
        double cations,
        double anions
    ) =>
        Make(
            DiagnosticCodes.UnitSuspected,
            span,
            string.Create(
                CultureInfo.InvariantCulture,
                $"the analysis of '{liquor}' has {cations:0.###} eq/m3 of cations and {anions:0.###} eq/m3 of anions"
            ),
            "look for an entry in g/L typed as mg/L, or a missing main ion"
        );

    public static Diagnostic UnknownGas(SourceSpan span, string gas, IEnumerable<string> gases) =>
        Make(
            DiagnosticCodes.UnknownGas,
            span,
            $"{gas} is not declared",
            $"declared gases: {string.Join(", ", gases)}"
        );

    public static Diagnostic UnknownName(
        SourceSpan span,
        string name,
        string kind,
        string? near,
        IEnumerable<string>? all = null
    ) =>
        Make(
            DiagnosticCodes.UnknownName,
            span,
            $"there is no {kind} '{name}'",
            near is not null ? $"did you mean '{near}'?"
                : all is not null ? $"known: {string.Join(", ", all)}"
                : $"declare it: {kind} {name} {{ … }}"
        );

    public static Diagnostic UnknownSolid(SourceSpan span, string name, string? near) =>
        Make(
            DiagnosticCodes.UnknownSolid,
            span,
            $"there is no solid '{name}'",
            near is null
                ? "declare it with solid, or use the catalogue that has it"
                : $"did you mean '{near}'?"
        );

    public static Diagnostic UnknownAction(SourceSpan span, string word, string? near) =>
        Make(
            DiagnosticCodes.UnknownAction,
            span,
            $"a stage does not know '{word}'",
            near is null
                ? "a stage knows add, blend, contact, oxidise, reduce, form, hold back, settle, heat to and cool to"
                : $"did you mean '{near}'?"
        );

    public static Diagnostic UnknownQuantity(SourceSpan span, string name, string? near) =>
        Make(
            DiagnosticCodes.UnknownQuantity,
            span,
            $"there is no quantity '{name}' like this",
            near is null
                ? "known: pH, dissolved(X), total(X), SI(solid), formed(solid), ionic-strength, TDS"
                : $"did you mean '{near}'? (pH, dissolved(X), total(X), SI(solid), formed(solid), ionic-strength, TDS)"
        );

    public static Diagnostic TrainWithoutFeed(SourceSpan span, string train) =>
        Make(
            DiagnosticCodes.TrainWithoutFeed,
            span,
            $"the train '{train}' has no feed",
            "begin it with: feed liquor at 40 m3/h"
        );

    public static Diagnostic DoseAsOther(SourceSpan span, string reagent, string entries) =>
        Make(
            DiagnosticCodes.DoseAsOther,
            span,
            $"the reagent '{reagent}' holds nothing of this",
            $"count the dose as one of its substances: {entries}"
        );

    public static Diagnostic FormedAndHeldBack(SourceSpan span, string solid) =>
        Make(
            DiagnosticCodes.FormedAndHeldBack,
            span,
            $"'{solid}' is to form and to be held back in the same stage",
            "delete one of the two"
        );

    public static Diagnostic LimitByEquality(SourceSpan span) =>
        Make(
            DiagnosticCodes.LimitByEquality,
            span,
            "a limit cannot be an equality",
            "write <=, >= or within a .. b"
        );

    public static Diagnostic NoCouple(SourceSpan span, string name) =>
        Make(
            DiagnosticCodes.NoCouple,
            span,
            $"there is no half-reaction that takes '{name}' here",
            "declare it with half-reaction, or use catalogue redox"
        );

    public static Diagnostic Unused(SourceSpan span, string kind, string name) =>
        Make(
            DiagnosticCodes.Unused,
            span,
            $"the {kind} '{name}' is not used",
            "use it or delete it"
        );

    private static Diagnostic Make(
        DiagnosticCode code,
        SourceSpan span,
        string what,
        string? suggestion,
        RelatedSpan? related = null
    ) =>
        new(
            code.Id,
            code.Severity,
            what,
            code.Why,
            suggestion,
            span,
            related is null ? [] : [related]
        );

    private static string Surplus(IReadOnlyDictionary<string, double> surplus) =>
        string.Join(
            ", ",
            surplus.Select(s =>
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"{(s.Value > 0 ? "+" : "")}{s.Value:0.######} {s.Key}"
                )
            )
        );

    // A lone surrogate has no code point of its own.
    private static string Safe(string character) =>
        char.IsSurrogate(character[0]) && character.Length < 2 ? "\uFFFD" : character;
}
