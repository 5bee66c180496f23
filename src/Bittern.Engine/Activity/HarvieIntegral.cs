namespace Bittern.Engine.Activity;

/// <summary>
/// The integral J(x) = x/4 - 1 + (1/x) ∫ (1 - exp(-(x/y) e^-y)) y² dy of the theory of unsymmetrical mixing (Pitzer 1975, J. Solution Chem. 4, 249, eq. 14),
/// by the Chebyshev series of Harvie 1981 (dissertation, University of California San Diego; printed in Pitzer 1991, Activity Coefficients in Electrolyte
/// Solutions, ch. 3, table B-1). Recalled; compared with the integral itself in the tests: 3e-10 absolute at any x, the constant part of which cancels in Eθ.
/// </summary>
internal static class HarvieIntegral
{
    /// <summary>J and its first two derivatives at x > 0.</summary>
    public static (double J, double First, double Second) At(double x)
    {
        double z;
        double dz;
        double ddz;
        double[] a;
        if (x <= 1)
        {
            var fifth = Math.Pow(x, 0.2);
            z = (4 * fifth) - 2;
            dz = 0.8 * fifth / x;
            ddz = -0.8 * dz / x;
            a = Small;
        }
        else
        {
            var tenth = Math.Pow(x, -0.1);
            z = ((40 * tenth) - 22) / 9;
            dz = -4 * tenth / (9 * x);
            ddz = -1.1 * dz / x;
            a = Large;
        }

        // Clenshaw's recurrence and its first two derivatives in z.
        double b0 = 0,
            b1 = 0,
            b2 = 0;
        double d0 = 0,
            d1 = 0,
            d2 = 0;
        double e0 = 0,
            e1 = 0,
            e2 = 0;
        for (var k = a.Length - 1; k >= 0; k--)
        {
            (b2, b1) = (b1, b0);
            (d2, d1) = (d1, d0);
            (e2, e1) = (e1, e0);
            b0 = (z * b1) - b2 + a[k];
            d0 = b1 + (z * d1) - d2;
            e0 = (2 * d1) + (z * e1) - e2;
        }

        var slope = (d0 - d2) / 2;
        return (
            (x / 4) - 1 + ((b0 - b2) / 2),
            0.25 + (slope * dz),
            ((e0 - e2) / 2 * dz * dz) + (slope * ddz)
        );
    }

    // 0 < x <= 1, in z = 4 x^(1/5) - 2.
    private static readonly double[] Small =
    [
        1.925154014814667,
        -0.060076477753119,
        -0.029779077456514,
        -0.007299499690937,
        0.000388260636404,
        0.000636874599598,
        0.000036583601823,
        -0.000045036975204,
        -0.000004537895710,
        0.000002937706971,
        0.000000396566462,
        -0.000000202099617,
        -0.000000025267769,
        0.000000013522610,
        0.000000001229405,
        -0.000000000821969,
        -0.000000000050847,
        0.000000000046333,
        0.000000000001943,
        -0.000000000002563,
        -0.000000000010991,
    ];

    // x > 1, in z = 40/9 x^(-1/10) - 22/9.
    private static readonly double[] Large =
    [
        0.628023320520852,
        0.462762985338493,
        0.150044637187895,
        -0.028796057604906,
        -0.036552745910311,
        -0.001668087945272,
        0.006519840398744,
        0.001130378079086,
        -0.000887171310131,
        -0.000242107641309,
        0.000087294451594,
        0.000034682122751,
        -0.000004583768938,
        -0.000003548684306,
        -0.000000250453880,
        0.000000216991779,
        0.000000080779570,
        0.000000004558555,
        -0.000000006944757,
        -0.000000002849257,
        0.000000000237816,
    ];
}
