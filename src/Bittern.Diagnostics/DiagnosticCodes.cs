using System.Collections.Immutable;

namespace Bittern.Diagnostics;

/// <summary>Every diagnostic that the tool can give, in the order of their numbers.</summary>
public static class DiagnosticCodes
{
    public static DiagnosticCode TextNotClosed { get; } =
        new(
            "BT0101",
            Severity.Error,
            "A text is not closed",
            "everything behind it would be read as text",
            "recipe \"Pond water",
            "recipe \"Pond water\""
        );

    public static DiagnosticCode DecimalComma { get; } =
        new(
            "BT0102",
            Severity.Error,
            "A comma inside a number",
            "0,5 could be a list of two numbers or one number",
            "use catalogue major\nliquor a { Ca 0,5 mg/L }",
            "use catalogue major\nliquor a { Ca 0.5 mg/L }"
        );

    public static DiagnosticCode NumberTooLarge { get; } =
        new(
            "BT0103",
            Severity.Error,
            "A number that cannot be held",
            "beyond about 1e308 a number has no value",
            "use catalogue major\nliquor a { Ca 1e999 mg/L }",
            "use catalogue major\nliquor a { Ca 1e2 mg/L }"
        );

    public static DiagnosticCode StrangeCharacter { get; } =
        new(
            "BT0104",
            Severity.Error,
            "A character that the language does not use",
            "invisible or look-alike characters make two recipes look the same that are not",
            "use catalogue major @",
            "use catalogue major"
        );

    public static DiagnosticCode NestedTooDeep { get; } =
        new(
            "BT0105",
            Severity.Error,
            "Nested too deep",
            "nothing that a chemist writes needs it, and unlimited nesting could exhaust the machine",
            "{{{{{{{{{{{{{{{{{{{{{{{{{}}}}}}}}}}}}}}}}}}}}}}}}}",
            ""
        );

    public static DiagnosticCode StrayBrace { get; } =
        new(
            "BT0106",
            Severity.Error,
            "A closing brace too many",
            "the block that you meant to close was closed earlier",
            "use catalogue major\n}",
            "use catalogue major\n"
        );

    public static DiagnosticCode BlockNotClosed { get; } =
        new(
            "BT0107",
            Severity.Error,
            "A block is not closed",
            "everything below it would belong to it",
            "use catalogue major\nliquor a { Ca 5 mg/L",
            "use catalogue major\nliquor a { Ca 5 mg/L }"
        );

    public static DiagnosticCode Unexpected { get; } =
        new(
            "BT0110",
            Severity.Error,
            "This does not fit here",
            "a line that is not understood cannot be calculated, and guessing could change its meaning",
            "use catalogue major\nliquor a { pH about 7 }",
            "use catalogue major\nliquor a { pH 7 }"
        );

    public static DiagnosticCode UnknownDeclaration { get; } =
        new(
            "BT0111",
            Severity.Error,
            "No declaration starts like this",
            "a line that is not understood cannot be calculated",
            "use catalogue major\nliqour a { Ca 5 mg/L }",
            "use catalogue major\nliquor a { Ca 5 mg/L }"
        );

    public static DiagnosticCode NumberWithGap { get; } =
        new(
            "BT0112",
            Severity.Error,
            "A gap inside a number",
            "10 250 could be one number or two",
            "use catalogue major\nliquor a { Ca 1 250 mg/L }",
            "use catalogue major\nliquor a { Ca 1250 mg/L }"
        );

    public static DiagnosticCode ChargeOrder { get; } =
        new(
            "BT0113",
            Severity.Error,
            "A charge written sign first",
            "the number could belong to the charge or to the reaction",
            "ion Ca+2",
            "ion Ca^2+"
        );

    public static DiagnosticCode ColonHydrate { get; } =
        new(
            "BT0114",
            Severity.Error,
            "A hydrate written with a colon",
            "a colon has no meaning in a formula",
            "use catalogue major\nsolid plaster CaSO4:2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58",
            "use catalogue major\ncite x \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58 [x]"
        );

    public static DiagnosticCode NeedsBlock { get; } =
        new(
            "BT0115",
            Severity.Error,
            "The braces are missing",
            "without a block there is nothing to calculate with",
            "use catalogue major\nliquor a",
            "use catalogue major\nliquor a { Ca 5 mg/L }"
        );

    public static DiagnosticCode NotAFormula { get; } =
        new(
            "BT0120",
            Severity.Error,
            "Not a chemical formula",
            "elements and charge are computed from the formula, so every symbol must be known",
            "use catalogue major\nliquor a { Xq 5 mg/L }",
            "use catalogue major\nliquor a { Ca 5 mg/L }"
        );

    public static DiagnosticCode IonOrSolute { get; } =
        new(
            "BT0121",
            Severity.Error,
            "ion for charged, solute for uncharged",
            "the charge decides how activity and charge balance count the species",
            "ion H4SiO4(aq)",
            "solute H4SiO4(aq)"
        );

    public static DiagnosticCode Unbalanced { get; } =
        new(
            "BT0122",
            Severity.Error,
            "A reaction does not balance",
            "an unbalanced reaction makes or loses matter in every calculation",
            "use catalogue major\ncite x \"own\"\ncomplex CaF+ from Ca^2+ + 2 F-   log K 0.94 [x]",
            "use catalogue major\ncite x \"own\"\ncomplex CaF2(aq) from Ca^2+ + 2 F-   log K 0.94 [x]"
        );

    public static DiagnosticCode UnknownSpecies { get; } =
        new(
            "BT0123",
            Severity.Error,
            "A species that nothing declares",
            "a reaction over an unknown species has no constant to calculate with",
            "cite x \"own\"\nion Ca^2+\ncomplex CaF+ from Ca^2+ + F-   log K 0.94 [x]",
            "cite x \"own\"\nion Ca^2+, F-\ncomplex CaF+ from Ca^2+ + F-   log K 0.94 [x]"
        );

    public static DiagnosticCode Cycle { get; } =
        new(
            "BT0124",
            Severity.Error,
            "Reactions in a circle",
            "a species that is formed from itself has no constant over the basis",
            "cite x \"own\"\nion CO3^2-\ncomplex HCO3- from CO2(aq) + H2O - H+   log K -6.35 [x]\ncomplex CO2(aq) from HCO3- + H+ - H2O   log K 6.35 [x]",
            "cite x \"own\"\nion CO3^2-\ncomplex HCO3- from CO3^2- + H+   log K 10.33 [x]\ncomplex CO2(aq) from HCO3- + H+ - H2O   log K 6.35 [x]"
        );

    public static DiagnosticCode DeclaredTwice { get; } =
        new(
            "BT0125",
            Severity.Error,
            "Declared twice",
            "with two declarations it is open which one counts",
            "use catalogue major\nliquor a { Ca 5 mg/L }\nliquor a { Ca 6 mg/L }",
            "use catalogue major\nliquor a { Ca 5 mg/L }\nliquor b { Ca 6 mg/L }"
        );

    public static DiagnosticCode NeedsOverride { get; } =
        new(
            "BT0126",
            Severity.Error,
            "The catalogue has this already",
            "a constant of the catalogue is replaced openly, with a reason, or not at all",
            "use catalogue salts\ncite x \"own\"\nsolid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x]",
            "use catalogue salts\ncite x \"own\"\noverride solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x] because \"own titration\""
        );

    public static DiagnosticCode NothingToOverride { get; } =
        new(
            "BT0127",
            Severity.Error,
            "Nothing to override",
            "an override that hits nothing would be lost without a word",
            "use catalogue salts\ncite x \"own\"\noverride solid gypsun CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x] because \"own\"",
            "use catalogue salts\ncite x \"own\"\noverride solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x] because \"own\""
        );

    public static DiagnosticCode OverrideChangesReaction { get; } =
        new(
            "BT0128",
            Severity.Error,
            "An override with another reaction",
            "a constant belongs to its reaction; over another one the same number means something else",
            "use catalogue salts\ncite x \"own\"\noverride solid gypsum CaSO4 to Ca^2+ + SO4^2-   log Ksp -4.6 [x] because \"own\"",
            "use catalogue salts\ncite x \"own\"\noverride solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x] because \"own\""
        );

    public static DiagnosticCode OverrideWithoutReason { get; } =
        new(
            "BT0129",
            Severity.Warning,
            "An override without a reason",
            "whoever signs the report must see why a published constant was replaced",
            "use catalogue salts\ncite x \"own\"\noverride solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x]",
            "use catalogue salts\ncite x \"own\"\noverride solid gypsum CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.6 [x] because \"own titration\""
        );

    public static DiagnosticCode KspNotDissolution { get; } =
        new(
            "BT0130",
            Severity.Error,
            "Ksp of something that is no dissolution into ions",
            "a solubility product is for a solid that dissolves alone; with H+ or others beside it the number means something else",
            "use catalogue major\ncite x \"own\"\nsolid own-brucite Mg(OH)2 + 2 H+ to Mg^2+ + 2 H2O   log Ksp 17.1 [x]",
            "use catalogue major\ncite x \"own\"\nsolid own-brucite Mg(OH)2 + 2 H+ to Mg^2+ + 2 H2O   log K 17.1 [x]"
        );

    public static DiagnosticCode ConstantNotPositive { get; } =
        new(
            "BT0131",
            Severity.Error,
            "A constant that is not positive",
            "an equilibrium constant is a positive number; its logarithm may have any sign",
            "use catalogue major\ncite x \"own\"\ncomplex CaF+ from Ca^2+ + F-   K -0.94 [x]",
            "use catalogue major\ncite x \"own\"\ncomplex CaBr+ from Ca^2+ + Br-   log K -0.94 [x]\nion Br-"
        );

    public static DiagnosticCode PowerAsLog { get; } =
        new(
            "BT0132",
            Severity.Error,
            "A power of ten as a logarithm",
            "log K 10^-4 would mean a logarithm of 0.0001",
            "use catalogue major\ncite x \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp 10^-4.58 [x]",
            "use catalogue major\ncite x \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   Ksp 10^-4.58 [x]"
        );

    public static DiagnosticCode UncertaintyOfPower { get; } =
        new(
            "BT0133",
            Severity.Error,
            "An uncertainty on a power of ten",
            "± on 10^-4.58 could mean the number or its exponent",
            "use catalogue major\ncite x \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   Ksp 10^-4.58 ± 0.02 [x]",
            "use catalogue major\ncite x \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58 ± 0.02 [x]"
        );

    public static DiagnosticCode ExpressionWithEnthalpy { get; } =
        new(
            "BT0134",
            Severity.Error,
            "Temperature dependence twice",
            "an expression in T already holds the enthalpy; with ΔH beside it, it is open which one counts",
            "use catalogue major\ncite x \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp = 1 - 1660/T, ΔH 3 kJ/mol [x]",
            "use catalogue major\ncite x \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp = 1 - 1660/T [x]"
        );

    public static DiagnosticCode UnknownInExpression { get; } =
        new(
            "BT0135",
            Severity.Error,
            "An unknown name in an expression",
            "a constant may depend on the temperature T and on nothing else",
            "use catalogue major\ncite x \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp = 1 - 1660/t [x]",
            "use catalogue major\ncite x \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp = 1 - 1660/T [x]"
        );

    public static DiagnosticCode HalfReactionWithoutElectrons { get; } =
        new(
            "BT0136",
            Severity.Error,
            "A half-reaction without electrons",
            "a couple gains its electrons on the left side",
            "cite x \"own\"\nion Fe^2+\nhalf-reaction Fe^2+ to Fe^2+   log K 0 [x]",
            "cite x \"own\"\nion Fe^2+, Fe^3+\nhalf-reaction Fe^3+ + e- to Fe^2+   log K 13.02 [x]"
        );

    public static DiagnosticCode NoCitation { get; } =
        new(
            "BT0140",
            Severity.Warning,
            "A constant without a source",
            "a reader must be able to trace every number",
            "use catalogue major\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58",
            "use catalogue major\ncite x \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58 [x]"
        );

    public static DiagnosticCode UnknownCitation { get; } =
        new(
            "BT0141",
            Severity.Error,
            "A source that nothing declares",
            "a source that cannot be looked up is none",
            "use catalogue major\ncite own-lab \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58 [own-lap]",
            "use catalogue major\ncite own-lab \"own\"\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58 [own-lab]"
        );

    public static DiagnosticCode UnknownCatalogue { get; } =
        new(
            "BT0142",
            Severity.Error,
            "No such catalogue",
            "without its species the recipe cannot be understood",
            "use catalogue mayor",
            "use catalogue major"
        );

    public static DiagnosticCode FileNotRead { get; } =
        new(
            "BT0143",
            Severity.Error,
            "A file that cannot be read",
            "what it declares is missing",
            "use \"nowhere.bittern\"",
            ""
        );

    public static DiagnosticCode OutOfRange { get; } =
        new(
            "BT0144",
            Severity.Note,
            "Constants outside their range",
            "outside the range of its measurements a constant is an extrapolation",
            "recipe \"x\" { temperature 90 °C }\ncite x \"own\"\nion Ca^2+, SO4^2-\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58, valid 0 .. 40 °C [x]\nliquor a { Ca 1 mmol/L; SO4 1 mmol/L }",
            "recipe \"x\" { temperature 30 °C }\ncite x \"own\"\nion Ca^2+, SO4^2-\nsolid plaster CaSO4·2H2O to Ca^2+ + SO4^2- + 2 H2O   log Ksp -4.58, valid 0 .. 40 °C [x]\nliquor a { Ca 1 mmol/L; SO4 1 mmol/L }"
        );

    public static DiagnosticCode SetsDoNotMix { get; } =
        new(
            "BT0145",
            Severity.Error,
            "Catalogues that do not belong together",
            "sets fitted apart describe the same interaction twice, once as an ion pair and once in the activity model",
            "use catalogue major, brine",
            "use catalogue major"
        );

    public static DiagnosticCode ModelAndSet { get; } =
        new(
            "BT0146",
            Severity.Warning,
            "The activity model does not go with the constants",
            "constants with ion pairs and a model that has pairing in its parameters count the same interaction twice, or not at all",
            "recipe \"x\" { activity davies }\nset ion-interaction",
            "recipe \"x\" { activity pitzer }\nset ion-interaction"
        );

    public static DiagnosticCode WrongUnit { get; } =
        new(
            "BT0150",
            Severity.Error,
            "A unit that does not fit",
            "a number in the wrong kind of unit is a different quantity",
            "use catalogue major\nliquor a { Ca 5 kg }",
            "use catalogue major\nliquor a { Ca 5 mg/L }"
        );

    public static DiagnosticCode OutOfBounds { get; } =
        new(
            "BT0151",
            Severity.Error,
            "A value outside what is possible",
            "the calculation would mean nothing",
            "use catalogue major\nliquor a { pH 40 }",
            "use catalogue major\nliquor a { pH 4 }"
        );

    public static DiagnosticCode AnalyteWithoutSpecies { get; } =
        new(
            "BT0152",
            Severity.Error,
            "Nothing in the recipe holds this",
            "what has no species cannot be calculated with",
            "use catalogue major\nliquor a { Zn 5 mg/L }",
            "use catalogue major, metals\nliquor a { Zn 5 mg/L }"
        );

    public static DiagnosticCode CannotCountAs { get; } =
        new(
            "BT0153",
            Severity.Error,
            "Cannot be counted as that",
            "a basis must share an element with what it counts, or be CaCO3 for equivalents",
            "use catalogue major\nliquor a { Na 5 mg/L as N }",
            "use catalogue major\nliquor a { NO3 5 mg/L as N }"
        );

    public static DiagnosticCode AnalyteTwice { get; } =
        new(
            "BT0154",
            Severity.Error,
            "An analyte twice in one liquor",
            "it is open whether the values add up or one is a slip",
            "use catalogue major\nliquor a { Ca 5 mg/L; Ca 6 mg/L }",
            "use catalogue major\nliquor a { Ca 5 mg/L }"
        );

    public static DiagnosticCode OfWhichDoesNotFit { get; } =
        new(
            "BT0155",
            Severity.Error,
            "Parts that do not fit the whole",
            "the rest must be positive and belong to one other oxidation state, in the same kind of unit",
            "use catalogue major, metals\nliquor a { Fe 5 mg/L, of which Fe(II) 6 mg/L }",
            "use catalogue major, metals\nliquor a { Fe 7 mg/L, of which Fe(II) 6 mg/L }"
        );

    public static DiagnosticCode CannotCloseCharge { get; } =
        new(
            "BT0156",
            Severity.Error,
            "Cannot close the charge",
            "the balance is closed by adjusting an analysed ion",
            "use catalogue major\nliquor a { Ca 5 mg/L; charge closed by SO4 }",
            "use catalogue major\nliquor a { Ca 5 mg/L; SO4 10 mg/L; charge closed by SO4 }"
        );

    public static DiagnosticCode UnitSuspected { get; } =
        new(
            "BT0157",
            Severity.Warning,
            "A number that looks like the wrong unit",
            "a charge balance this far off is rarely an analysis and often a unit",
            "use catalogue major\nliquor a { Na 10 g/L; Cl 15 mg/L }",
            "use catalogue major\nliquor a { Na 10 g/L; Cl 15 g/L }"
        );

    public static DiagnosticCode UnknownGas { get; } =
        new(
            "BT0158",
            Severity.Error,
            "A gas that nothing declares",
            "a pressure needs a gas with a constant",
            "use catalogue major\natmosphere air { Ar 0.009 atm }",
            "use catalogue major\natmosphere air { CO2 4.2e-4 atm }"
        );

    public static DiagnosticCode UnknownName { get; } =
        new(
            "BT0160",
            Severity.Error,
            "A name that nothing declares",
            "a misspelt name would otherwise calculate something else",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\ntrain t { feed pont }",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond }"
        );

    public static DiagnosticCode UnknownSolid { get; } =
        new(
            "BT0161",
            Severity.Error,
            "A solid that nothing declares",
            "a solid that is left out silently would change every dose",
            "use catalogue major, salts\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond; stage s { form gipsum } }",
            "use catalogue major, salts\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond; stage s { form gypsum } }"
        );

    public static DiagnosticCode UnknownAction { get; } =
        new(
            "BT0162",
            Severity.Error,
            "No action of a stage",
            "a step that is not understood would be left out",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond; stage s { settel 99 % } }",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond; stage s { settle 99 % } }"
        );

    public static DiagnosticCode UnknownQuantity { get; } =
        new(
            "BT0163",
            Severity.Error,
            "A quantity that nothing declares",
            "a condition on an unknown quantity cannot be judged",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond }\nlimits \"l\" on t { disolved(Ca) <= 5 mg/L }",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond }\nlimits \"l\" on t { dissolved(Ca) <= 5 mg/L }"
        );

    public static DiagnosticCode TrainWithoutFeed { get; } =
        new(
            "BT0164",
            Severity.Error,
            "A train without a feed",
            "a train treats a liquor",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\ntrain t { stage s { settle 99 % } }",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond; stage s { settle 99 % } }"
        );

    public static DiagnosticCode DoseAsOther { get; } =
        new(
            "BT0165",
            Severity.Error,
            "A dose counted as something that is not in the reagent",
            "grams of one substance say nothing about another",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\nreagent soda { Na2CO3 100 g/L }\ntrain t { feed pond; stage s { add soda 5 g/L as Mg(OH)2 } }",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\nreagent soda { Na2CO3 100 g/L }\ntrain t { feed pond; stage s { add soda 5 g/L as Na2CO3 } }"
        );

    public static DiagnosticCode FormedAndHeldBack { get; } =
        new(
            "BT0166",
            Severity.Error,
            "Formed and held back at once",
            "the two lines contradict each other",
            "use catalogue major, salts\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond; stage s { form gypsum; hold back gypsum } }",
            "use catalogue major, salts\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond; stage s { hold back gypsum } }"
        );

    public static DiagnosticCode LimitByEquality { get; } =
        new(
            "BT0167",
            Severity.Error,
            "A limit that demands equality",
            "no plant meets a number exactly",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond }\nlimits \"l\" on t { pH = 7 }",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond }\nlimits \"l\" on t { pH within 6.5 .. 7.5 }"
        );

    public static DiagnosticCode NoCouple { get; } =
        new(
            "BT0168",
            Severity.Error,
            "No couple for this conversion",
            "an oxidation or reduction needs a half-reaction for each partner",
            "use catalogue major, metals\nliquor pond { Fe(II) 5 mg/L }\ntrain t { feed pond; stage s { oxidise Fe(II) with Cl } }",
            "use catalogue major, metals, redox\nliquor pond { Fe(II) 5 mg/L }\ntrain t { feed pond; stage s { oxidise Fe(II) with O2 } }"
        );

    public static DiagnosticCode Unused { get; } =
        new(
            "BT0170",
            Severity.Warning,
            "Declared and not used",
            "most often a line was forgotten or a name misspelt",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\nreagent soda { Na2CO3 100 g/L }\ntrain t { feed pond }",
            "use catalogue major\nliquor pond { Ca 5 mg/L }\ntrain t { feed pond }"
        );

    public static DiagnosticCode NoCertifiedAnswer { get; } =
        new(
            "BT5001",
            Severity.Error,
            "No certified answer",
            "a number without a certificate must not be used"
        );

    public static DiagnosticCode TargetUnreachable { get; } =
        new(
            "BT5002",
            Severity.Warning,
            "A target that no dose meets",
            "the stage goes on with the closest dose, so that everything after it is a best case"
        );

    public static DiagnosticCode ModelOutOfRange { get; } =
        new(
            "BT5003",
            Severity.Warning,
            "The activity model is out of its range",
            "activity coefficients, and with them every solubility there, may be off by tens of per cent"
        );

    public static DiagnosticCode Supersaturated { get; } =
        new(
            "BT5005",
            Severity.Note,
            "A supersaturated solid that may not form",
            "if it forms after all, less stays dissolved and more sludge or scale is made than reported"
        );

    /// <summary>All of them, by number.</summary>
    public static ImmutableArray<DiagnosticCode> All { get; } =
    [
        TextNotClosed,
        DecimalComma,
        NumberTooLarge,
        StrangeCharacter,
        NestedTooDeep,
        StrayBrace,
        BlockNotClosed,
        Unexpected,
        UnknownDeclaration,
        NumberWithGap,
        ChargeOrder,
        ColonHydrate,
        NeedsBlock,
        NotAFormula,
        IonOrSolute,
        Unbalanced,
        UnknownSpecies,
        Cycle,
        DeclaredTwice,
        NeedsOverride,
        NothingToOverride,
        OverrideChangesReaction,
        OverrideWithoutReason,
        KspNotDissolution,
        ConstantNotPositive,
        PowerAsLog,
        UncertaintyOfPower,
        ExpressionWithEnthalpy,
        UnknownInExpression,
        HalfReactionWithoutElectrons,
        NoCitation,
        UnknownCitation,
        UnknownCatalogue,
        FileNotRead,
        OutOfRange,
        SetsDoNotMix,
        ModelAndSet,
        WrongUnit,
        OutOfBounds,
        AnalyteWithoutSpecies,
        CannotCountAs,
        AnalyteTwice,
        OfWhichDoesNotFit,
        CannotCloseCharge,
        UnitSuspected,
        UnknownGas,
        UnknownName,
        UnknownSolid,
        UnknownAction,
        UnknownQuantity,
        TrainWithoutFeed,
        DoseAsOther,
        FormedAndHeldBack,
        LimitByEquality,
        NoCouple,
        Unused,
        NoCertifiedAnswer,
        TargetUnreachable,
        ModelOutOfRange,
        Supersaturated,
    ];

    /// <summary>A code by its id, in any case; null when there is none.</summary>
    public static DiagnosticCode? Find(string id) =>
        All.FirstOrDefault(c => string.Equals(c.Id, id, StringComparison.OrdinalIgnoreCase));
}
