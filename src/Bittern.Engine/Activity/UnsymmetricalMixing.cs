namespace Bittern.Engine.Activity;

/// <summary>
/// Eθ of ions of like sign and different charge (Pitzer 1975, J. Solution Chem. 4, 249): Eθ_ij = z_i z_j/(4 I) [J(x_ij) - J(x_ii)/2 - J(x_jj)/2],
/// x_ij = 6 z_i z_j A_φ √I. It depends on charges alone, so a solution has as many as pairs of charges, however many ions.
/// </summary>
internal sealed class UnsymmetricalMixing
{
    private readonly int[] _charges;
    private readonly int[] _products;
    private readonly double _aPhi;
    private readonly (int First, int Second, int Mixed, int OwnFirst, int OwnSecond)[] _pairs;

    /// <summary>The pairs of charges of a solution.</summary>
    /// <param name="charges">Charge numbers of a solution, in any order, with repetitions.</param>
    /// <param name="aPhi">A_φ, kg^½ mol^-½.</param>
    public UnsymmetricalMixing(ReadOnlySpan<int> charges, double aPhi)
    {
        _aPhi = aPhi;
        _charges = [.. charges.ToArray().Where(z => z != 0).Distinct().Order()];
        var pairs =
            from i in Enumerable.Range(0, _charges.Length)
            from j in Enumerable.Range(i + 1, _charges.Length - i - 1)
            where _charges[i] * _charges[j] > 0
            select (I: i, J: j);
        _products =
        [
            .. pairs
                .SelectMany(p =>
                    new[]
                    {
                        _charges[p.I] * _charges[p.J],
                        _charges[p.I] * _charges[p.I],
                        _charges[p.J] * _charges[p.J],
                    }
                )
                .Distinct()
                .Order(),
        ];
        _pairs =
        [
            .. pairs.Select(p =>
                (
                    p.I,
                    p.J,
                    Array.IndexOf(_products, _charges[p.I] * _charges[p.J]),
                    Array.IndexOf(_products, _charges[p.I] * _charges[p.I]),
                    Array.IndexOf(_products, _charges[p.J] * _charges[p.J])
                )
            ),
        ];
    }

    /// <summary>Number of pairs of charges.</summary>
    public int Count => _pairs.Length;

    /// <summary>The charge numbers of pair <paramref name="pair"/>.</summary>
    public (int First, int Second) Charges(int pair) =>
        (_charges[_pairs[pair].First], _charges[_pairs[pair].Second]);

    /// <summary>Eθ and its first two derivatives in I, by pair.</summary>
    public void Evaluate(
        double ionicStrength,
        Span<double> value,
        Span<double> first,
        Span<double> second
    )
    {
        Span<double> j0 = stackalloc double[_products.Length];
        Span<double> j1 = stackalloc double[_products.Length];
        Span<double> j2 = stackalloc double[_products.Length];
        var root = Math.Sqrt(ionicStrength);
        for (var k = 0; k < _products.Length; k++)
        {
            var x = 6 * _products[k] * _aPhi * root;
            var (j, slope, curvature) = HarvieIntegral.At(x);
            j0[k] = j;
            j1[k] = slope * x / (2 * ionicStrength);
            j2[k] = ((curvature * x) - slope) * x / (4 * ionicStrength * ionicStrength);
        }

        for (var k = 0; k < _pairs.Length; k++)
        {
            var (_, _, mixed, own, other) = _pairs[k];
            var scale = _products[mixed] / (4 * ionicStrength);
            var t0 = j0[mixed] - ((j0[own] + j0[other]) / 2);
            var t1 = j1[mixed] - ((j1[own] + j1[other]) / 2);
            var t2 = j2[mixed] - ((j2[own] + j2[other]) / 2);
            value[k] = scale * t0;
            first[k] = scale * (t1 - (t0 / ionicStrength));
            second[k] = scale * (t2 - (2 * (t1 - (t0 / ionicStrength)) / ionicStrength));
        }
    }
}
