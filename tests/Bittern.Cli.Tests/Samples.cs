namespace Bittern.Cli.Tests;

/// <summary>Small recipes, invented, each for one way to end.</summary>
internal static class Samples
{
    public const string Mixture = """
        use catalogue major
        mix 250 mL of CaCl2 0.10 mol/L with 150 mL of Na2SO4 0.08 mol/L
        """;

    public const string LimitFails = """
        use catalogue major
        liquor pond { pH 7.0; Ca 800 mg/L; SO4 1900 mg/L; charge closed by SO4 }
        train hold {
            feed pond at 1 m3/h
            stage one { form gypsum }
        }
        limits "Softened" on hold { dissolved(Ca) <= 1 mg/L }
        """;

    public const string TargetOutOfReach = """
        use catalogue major
        liquor pond { pH 7.0; Ca 800 mg/L; SO4 1900 mg/L; charge closed by SO4 }
        reagent lime { Ca(OH)2 100 g/L }
        train hold {
            feed pond at 1 m3/h
            stage one {
                add lime until dissolved(Ca) <= 1 mg/L, at most 5 g/L
                form gypsum
            }
        }
        """;

    public const string NoWaterLeft = """
        use catalogue major, salts
        liquor crust { pH 7.0; density 1200 kg/m3; Na 700 g/L; Cl 1080 g/L }
        train try {
            feed crust
            stage one { form halite }
        }
        """;

    public const string TwoMistakes = """
        use catalogue major
        liquor pond { pH 7,0; Ca 800 mg/L; SO4 1900 mg/L }
        train hold {
            feed pund at 1 m3/h
            stage one { form gypsum }
        }
        """;
}
