namespace Bittern.Engine.Activity;

/// <summary>A term v q_c q_a G_k(I) of the excess Gibbs energy, from β(1) or β(2): v = 2 β, G_k for α number k; the groups in rising order.</summary>
internal readonly record struct PitzerTerm(int First, int Second, int Alpha, double Value);

/// <summary>A term v q_p q_r q_s of the excess Gibbs energy, from ψ or ζ; the groups differ and stand in rising order.</summary>
internal readonly record struct PitzerCubic(int P, int R, int S, double Value);

/// <summary>
/// The compiled model. With q the molalities of the groups, I = ½ Σ z² q, Z = Σ |z| q, the excess Gibbs energy per kilogram of water over R T is
/// g = f(I) + ½ q·K q + Z ½ q·C q + U(q, I) + Σ v q_p q_r q_s, f = -(4 A_φ I/b) ln(1 + b √I), b = 1.2,
/// U = Σ v q_c q_a G_k(I) + 2 Σ_(z &lt; z') N_z N_z' Eθ_zz'(I), N_z the molality of all ions of charge z.
/// </summary>
internal sealed class PitzerModel : GroupedModel
{
    private const double B = 1.2;
    private readonly double _aPhi;
    private readonly double[] _quadratic;
    private readonly double[] _third;
    private readonly double[] _alphas;
    private readonly PitzerTerm[] _terms;
    private readonly PitzerCubic[] _cubic;
    private readonly UnsymmetricalMixing _mixing;

    // ½ z² and |z| of each group, the groups on either side of each Eθ, and where each group's row of the Hessian starts.
    private readonly double[] _halfSquares;
    private readonly double[] _magnitudes;
    private readonly (int[] One, int[] Other)[] _sides;
    private readonly int[] _rows;

    public PitzerModel(
        MomentGroups groups,
        double aPhi,
        double[] quadratic,
        double[] third,
        double[] alphas,
        PitzerTerm[] terms,
        PitzerCubic[] cubic
    )
        : base(groups)
    {
        _aPhi = aPhi;
        _quadratic = quadratic;
        _third = third;
        _alphas = alphas;
        _terms = terms;
        _cubic = cubic;
        _mixing = new UnsymmetricalMixing(groups.Charges, aPhi);
        var charges = groups.Charges.ToArray();
        _halfSquares = [.. charges.Select(z => 0.5 * z * z)];
        _magnitudes = [.. charges.Select(z => (double)Math.Abs(z))];
        _rows = [.. groups.FirstOf.ToArray().Select(first => first * charges.Length)];
        _sides =
        [
            .. Enumerable
                .Range(0, _mixing.Count)
                .Select(k => (With(_mixing.Charges(k).First), With(_mixing.Charges(k).Second))),
        ];

        int[] With(int charge) =>
            [.. Enumerable.Range(0, charges.Length).Where(p => charges[p] == charge)];
    }

    protected override double Derive(
        ReadOnlySpan<double> q,
        Span<double> gradient,
        Span<double> hessian
    )
    {
        var count = _rows.Length;
        var (ionicStrength, z) = (0.0, 0.0);
        for (var p = 0; p < count; p++)
        {
            ionicStrength += _halfSquares[p] * q[p];
            z += _magnitudes[p] * q[p];
        }

        ionicStrength = Math.Max(ionicStrength, LongRange.LeastIonicStrength);

        // Parts of ∂g/∂q and q·∇g - g that do not come from U.
        Span<double> cq = stackalloc double[count];
        var (kqq, cqq) = (0.0, 0.0);
        for (var p = 0; p < count; p++)
        {
            var k = _quadratic.AsSpan(p * count, count);
            var c = _third.AsSpan(p * count, count);
            var (kq, sum) = (0.0, 0.0);
            for (var r = 0; r < k.Length; r++)
            {
                kq += k[r] * q[r];
                sum += c[r] * q[r];
            }

            gradient[p] = kq;
            cq[p] = sum;
            kqq += q[p] * kq;
            cqq += q[p] * sum;
            hessian.Slice(_rows[p], count).Clear();
        }

        // V_p = ∂²U/∂I∂q_p. Until the end the Hessian holds ∂²U/∂q_p∂q_r and the cubic terms, in its upper triangle alone.
        Span<double> v = stackalloc double[count];
        v.Clear();
        var (u, u1, u2) = (0.0, 0.0, 0.0);
        AddTerms(q, ionicStrength, gradient, hessian, v, ref u, ref u1, ref u2);
        if (_mixing.Count > 0)
        {
            AddMixing(q, ionicStrength, gradient, hessian, v, ref u, ref u1, ref u2);
        }

        var triple = AddCubic(q, gradient, hessian);
        var root = Math.Sqrt(ionicStrength);
        var f1 = -2 * _aPhi * (LongRange.Value(root, B) + (2 / B * Math.Log(1 + (B * root))));
        var f2 = -2 * _aPhi * (LongRange.Slope(root, B) + (1 / (root * (1 + (B * root)))));
        for (var p = 0; p < count; p++)
        {
            var square = _halfSquares[p];
            var magnitude = _magnitudes[p];
            gradient[p] += (square * (f1 + u1)) + (z * cq[p]) + (magnitude * cqq / 2);
            var row = hessian.Slice(_rows[p], count);
            var k = _quadratic.AsSpan(p * count, count);
            var c = _third.AsSpan(p * count, count);
            var vp = v[p] + (square * (f2 + u2));
            for (var r = p; r < row.Length; r++)
            {
                var value =
                    row[r]
                    + k[r]
                    + (z * c[r])
                    + (magnitude * cq[r])
                    + (_magnitudes[r] * cq[p])
                    + (square * v[r])
                    + (_halfSquares[r] * vp);
                row[r] = value;
                hessian[_rows[r] + p] = value;
            }
        }

        return (-2 * _aPhi * ionicStrength * LongRange.Value(root, B))
            + (kqq / 2)
            + (z * cqq)
            + u
            + (ionicStrength * u1)
            + (2 * triple);
    }

    private void AddTerms(
        ReadOnlySpan<double> q,
        double ionicStrength,
        Span<double> gradient,
        Span<double> hessian,
        Span<double> v,
        ref double u,
        ref double u1,
        ref double u2
    )
    {
        Span<double> g0 = stackalloc double[_alphas.Length];
        Span<double> g1 = stackalloc double[_alphas.Length];
        Span<double> g2 = stackalloc double[_alphas.Length];
        for (var k = 0; k < _alphas.Length; k++)
        {
            (g0[k], g1[k], g2[k]) = Decay(_alphas[k], ionicStrength);
        }

        foreach (ref readonly var term in _terms.AsSpan())
        {
            var (c, a, k) = (term.First, term.Second, term.Alpha);
            var (ofC, ofA) = (term.Value * q[a], term.Value * q[c]);
            var product = ofC * q[c];
            u += product * g0[k];
            u1 += product * g1[k];
            u2 += product * g2[k];
            gradient[c] += ofC * g0[k];
            gradient[a] += ofA * g0[k];
            v[c] += ofC * g1[k];
            v[a] += ofA * g1[k];
            hessian[_rows[c] + a] += term.Value * g0[k];
        }
    }

    private void AddMixing(
        ReadOnlySpan<double> q,
        double ionicStrength,
        Span<double> gradient,
        Span<double> hessian,
        Span<double> v,
        ref double u,
        ref double u1,
        ref double u2
    )
    {
        Span<double> e0 = stackalloc double[_sides.Length];
        Span<double> e1 = stackalloc double[_sides.Length];
        Span<double> e2 = stackalloc double[_sides.Length];
        _mixing.Evaluate(ionicStrength, e0, e1, e2);
        for (var k = 0; k < _sides.Length; k++)
        {
            var (one, other) = _sides[k];
            var (n, m) = (0.0, 0.0);
            foreach (var p in one)
            {
                n += q[p];
            }

            foreach (var r in other)
            {
                m += q[r];
                gradient[r] += 2 * n * e0[k];
                v[r] += 2 * n * e1[k];
            }

            foreach (var p in one)
            {
                gradient[p] += 2 * m * e0[k];
                v[p] += 2 * m * e1[k];
                foreach (var r in other)
                {
                    hessian[_rows[Math.Min(p, r)] + Math.Max(p, r)] += 2 * e0[k];
                }
            }

            u += 2 * n * m * e0[k];
            u1 += 2 * n * m * e1[k];
            u2 += 2 * n * m * e2[k];
        }
    }

    private double AddCubic(ReadOnlySpan<double> q, Span<double> gradient, Span<double> hessian)
    {
        var sum = 0.0;
        foreach (ref readonly var term in _cubic.AsSpan())
        {
            var (p, r, s) = (term.P, term.R, term.S);
            var (vp, vr, vs) = (term.Value * q[p], term.Value * q[r], term.Value * q[s]);
            sum += vp * q[r] * q[s];
            gradient[p] += vr * q[s];
            gradient[r] += vp * q[s];
            gradient[s] += vp * q[r];
            hessian[_rows[p] + r] += vs;
            hessian[_rows[p] + s] += vr;
            hessian[_rows[r] + s] += vp;
        }

        return sum;
    }

    /// <summary>G(I) = 2 [1 - (1 + x) e^-x]/x², x = α √I, and its first two derivatives in I.</summary>
    private static (double Value, double First, double Second) Decay(
        double alpha,
        double ionicStrength
    )
    {
        var x = alpha * Math.Sqrt(ionicStrength);
        double value;
        double xSlope;
        var e = Math.Exp(-x);
        if (x < 0.1)
        {
            // G = 2 Σ (-x)^k (k + 1)/(k + 2)!; x G'(x) from the same coefficients. Past k = 8 nothing is left for a double.
            (value, xSlope) = (0, 0);
            var coefficient = 1.0;
            for (var k = 0; k <= 8; k++)
            {
                value += coefficient;
                xSlope += k * coefficient;
                coefficient *= -x * (k + 2) / ((k + 1) * (k + 3.0));
            }
        }
        else
        {
            value = 2 * (1 - ((1 + x) * e)) / (x * x);
            xSlope = 2 * (e - value);
        }

        // I dG/dI = e^-x - G = ½ x dG/dx, and once more for the second derivative.
        var first = xSlope / (2 * ionicStrength);
        return (value, first, -((0.5 * x * e / ionicStrength) + (2 * first)) / ionicStrength);
    }
}
