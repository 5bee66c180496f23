using System.Collections.Immutable;
using Bittern.Engine.Activity;
using Bittern.Model;

namespace Bittern.Calculation;

/// <summary>The activity model of a recipe with the parameters that it declares.</summary>
internal static class ActivityModels
{
    /// <summary>A_φ that the ion-interaction sets of 1973 to 1984 were fitted with, kg^½ mol^-½ at 25 °C (Pitzer and Mayorga 1973).</summary>
    private const double PitzerAPhi = 0.392;

    /// <summary>A of the NEA tables of SIT coefficients, kg^½ mol^-½ at 25 °C (Grenthe et al. 1992, appendix B).</summary>
    private const double SitSlope = 0.509;

    /// <summary>The model; null when there is none of that name (the binder refuses it).</summary>
    public static IActivityModel? Of(Recipe recipe)
    {
        var parameters = recipe.Chemistry.ActivityParameters;
        return recipe.Header.ActivityModel switch
        {
            ActivityModelNames.Ideal => new Ideal(),
            ActivityModelNames.Davies => new Davies(),
            ActivityModelNames.DebyeHuckel => new ExtendedDebyeHuckel(
                new IonSizes(
                    Of(parameters, ActivityParameterKind.IonSize)
                        .ToImmutableDictionary(
                            p => p.Species[0].Text,
                            p => p.Value(""),
                            StringComparer.Ordinal
                        )
                )
            ),
            ActivityModelNames.TruesdellJones => new TruesdellJones(
                new TruesdellJonesParameters(
                    Of(parameters, ActivityParameterKind.TruesdellJones)
                        .ToImmutableDictionary(
                            p => p.Species[0].Text,
                            p => new TruesdellJonesIon(p.Value("a"), p.Value("b")),
                            StringComparer.Ordinal
                        )
                )
            ),
            ActivityModelNames.Sit => new SpecificIonInteraction(
                new InteractionCoefficients(
                    [
                        .. Of(parameters, ActivityParameterKind.Sit)
                            .Select(p => new InteractionCoefficient(
                                p.Species[0].Text,
                                p.Species[1].Text,
                                p.Value("epsilon") + p.Value("")
                            )),
                    ],
                    SitSlope
                )
            ),
            ActivityModelNames.Pitzer => new Pitzer(PitzerSet(parameters)),
            _ => null,
        };
    }

    private static IEnumerable<ActivityParameter> Of(
        ImmutableArray<ActivityParameter> all,
        ActivityParameterKind kind
    ) => all.Where(p => p.Kind == kind);

    private static PitzerParameters PitzerSet(ImmutableArray<ActivityParameter> all)
    {
        var slopes = Of(all, ActivityParameterKind.PitzerSlope).ToList();
        return new PitzerParameters([
            .. Of(all, ActivityParameterKind.Pitzer)
                .Select(p => new PitzerPair(
                    p.Species[0].Text,
                    p.Species[1].Text,
                    p.Value("beta0"),
                    p.Value("beta1"),
                    p.Value("beta2"),
                    p.Value("Cphi")
                )
                {
                    Alpha1 = p.Values.TryGetValue("alpha1", out var alpha1) ? alpha1 : null,
                    Alpha2 = p.Values.TryGetValue("alpha2", out var alpha2) ? alpha2 : null,
                    PerKelvin = slopes.Find(s => s.Species.SequenceEqual(p.Species)) is { } slope
                        ? new PitzerPairSlopes(
                            slope.Value("beta0"),
                            slope.Value("beta1"),
                            slope.Value("beta2"),
                            slope.Value("Cphi")
                        )
                        : null,
                }),
        ])
        {
            Thetas =
            [
                .. Of(all, ActivityParameterKind.Theta)
                    .Select(p => new PitzerTheta(
                        p.Species[0].Text,
                        p.Species[1].Text,
                        p.Value("")
                    )),
            ],
            Psis =
            [
                .. Of(all, ActivityParameterKind.Psi)
                    .Select(p => new PitzerPsi(
                        p.Species[0].Text,
                        p.Species[1].Text,
                        p.Species[2].Text,
                        p.Value("")
                    )),
            ],
            Lambdas =
            [
                .. Of(all, ActivityParameterKind.Lambda)
                    .Select(p => new PitzerLambda(
                        p.Species[0].Text,
                        p.Species[1].Text,
                        p.Value("")
                    )),
            ],
            Zetas =
            [
                .. Of(all, ActivityParameterKind.Zeta)
                    .Select(p => new PitzerZeta(
                        p.Species[0].Text,
                        p.Species[1].Text,
                        p.Species[2].Text,
                        p.Value("")
                    )),
            ],
            APhi = PitzerAPhi,
        };
    }
}
