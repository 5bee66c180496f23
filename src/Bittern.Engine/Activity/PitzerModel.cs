namespace Bittern.Engine.Activity;

/// <summary>A term v q_c q_a G_k(I) of the excess Gibbs energy, from β(1) or β(2): v = 2 β, G_k for α number k.</summary>
internal readonly record struct PitzerTerm(int Cation, int Anion, int Alpha, double Value);

/// <summary>A term v q_p q_r q_s of the excess Gibbs energy, from ψ or ζ; the three groups differ.</summary>
internal readonly record struct PitzerCubic(int P, int R, int S, double Value);

/// <summary>
/// The compiled model. With q the molalities of the groups, I = ½ Σ z² q, Z = Σ |z| q, the excess Gibbs energy per kilogram of water over R T is
/// g = f(I) + ½ q·K q + Z ½ q·C q + U(q, I) + Σ v q_p q_r q_s, f = -(4 A_φ I/b) ln(1 + b √I), b = 1.2,
/// U = Σ v q_c q_a G_k(I) + 2 Σ_(z &lt; z') N_z N_z' Eθ_zz'(I), N_z the molality of all ions of charge z.
/// </summary>
internal sealed class PitzerModel(
    MomentGroups groups,
    double aPhi,
    double[] quadratic,
    double[] third,
    double[] alphas,
    PitzerTerm[] terms,
    PitzerCubic[] cubic
) : GroupedModel(groups)
{
    private const double B = 1.2;
    private readonly UnsymmetricalMixing _mixing = new(groups.Charges, aPhi);

    protected override double Derive(
        ReadOnlySpan<double> q,
        Span<double> gradient,
        Span<double> hessian
    )
    {
        var charges = Groups.Charges;
        var firsts = Groups.FirstOf;
        var count = charges.Length;
        var (ionicStrength, z) = (0.0, 0.0);
        for (var p = 0; p < count; p++)
        {
            ionicStrength += 0.5 * charges[p] * charges[p] * q[p];
            z += Math.Abs(charges[p]) * q[p];
        }

        ionicStrength = Math.Max(ionicStrength, LongRange.LeastIonicStrength);

        // Parts of ∂g/∂q and q·∇g - g that do not come from U.
        Span<double> cq = stackalloc double[count];
        var (kqq, cqq) = (0.0, 0.0);
        for (var p = 0; p < count; p++)
        {
            var k = quadratic.AsSpan(p * count, count);
            var c = third.AsSpan(p * count, count);
            var (kq, sum) = (0.0, 0.0);
            for (var r = 0; r < count; r++)
            {
                kq += k[r] * q[r];
                sum += c[r] * q[r];
            }

            gradient[p] = kq;
            cq[p] = sum;
            kqq += q[p] * kq;
            cqq += q[p] * sum;
        }

        // V_p = ∂²U/∂I∂q_p at fixed I on the right; row p of the Hessian holds ∂²U/∂q_p∂q_r until the end.
        Span<double> v = stackalloc double[count];
        v.Clear();
        for (var p = 0; p < count; p++)
        {
            hessian.Slice(firsts[p] * count, count).Clear();
        }

        var (u, u1, u2) = (0.0, 0.0, 0.0);
        AddTerms(q, ionicStrength, gradient, hessian, v, ref u, ref u1, ref u2);
        if (_mixing.Count > 0)
        {
            AddMixing(q, ionicStrength, gradient, hessian, v, ref u, ref u1, ref u2);
        }

        var triple = AddCubic(q, gradient, hessian);
        var root = Math.Sqrt(ionicStrength);
        var halfF1 = -aPhi * (LongRange.Value(root, B) + (2 / B * Math.Log(1 + (B * root))));
        var f2 = -2 * aPhi * (LongRange.Slope(root, B) + (1 / (root * (1 + (B * root)))));
        for (var p = 0; p < count; p++)
        {
            var square = 0.5 * charges[p] * charges[p];
            var magnitude = Math.Abs(charges[p]);
            gradient[p] += (square * ((2 * halfF1) + u1)) + (z * cq[p]) + (magnitude * cqq / 2);
            var row = hessian.Slice(firsts[p] * count, count);
            var k = quadratic.AsSpan(p * count, count);
            var c = third.AsSpan(p * count, count);
            for (var r = 0; r < count; r++)
            {
                var other = 0.5 * charges[r] * charges[r];
                row[r] +=
                    k[r]
                    + (z * c[r])
                    + (magnitude * cq[r])
                    + (Math.Abs(charges[r]) * cq[p])
                    + (square * v[r])
                    + (other * v[p])
                    + (square * other * (f2 + u2));
            }
        }

        return (-2 * aPhi * ionicStrength * LongRange.Value(root, B))
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
        Span<double> g0 = stackalloc double[alphas.Length];
        Span<double> g1 = stackalloc double[alphas.Length];
        Span<double> g2 = stackalloc double[alphas.Length];
        for (var k = 0; k < alphas.Length; k++)
        {
            (g0[k], g1[k], g2[k]) = Decay(alphas[k], ionicStrength);
        }

        var firsts = Groups.FirstOf;
        var count = firsts.Length;
        foreach (var (c, a, k, value) in terms)
        {
            var product = value * q[c] * q[a];
            u += product * g0[k];
            u1 += product * g1[k];
            u2 += product * g2[k];
            gradient[c] += value * q[a] * g0[k];
            gradient[a] += value * q[c] * g0[k];
            v[c] += value * q[a] * g1[k];
            v[a] += value * q[c] * g1[k];
            hessian[(firsts[c] * count) + a] += value * g0[k];
            hessian[(firsts[a] * count) + c] += value * g0[k];
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
        Span<double> e0 = stackalloc double[_mixing.Count];
        Span<double> e1 = stackalloc double[_mixing.Count];
        Span<double> e2 = stackalloc double[_mixing.Count];
        _mixing.Evaluate(ionicStrength, e0, e1, e2);
        var charges = Groups.Charges;
        var firsts = Groups.FirstOf;
        var count = charges.Length;
        for (var k = 0; k < _mixing.Count; k++)
        {
            var (one, other) = _mixing.Charges(k);
            var (n, m) = (0.0, 0.0);
            for (var p = 0; p < count; p++)
            {
                n += charges[p] == one ? q[p] : 0;
                m += charges[p] == other ? q[p] : 0;
            }

            u += 2 * n * m * e0[k];
            u1 += 2 * n * m * e1[k];
            u2 += 2 * n * m * e2[k];
            for (var p = 0; p < count; p++)
            {
                if (charges[p] != one && charges[p] != other)
                {
                    continue;
                }

                var opposite = charges[p] == one ? m : n;
                gradient[p] += 2 * opposite * e0[k];
                v[p] += 2 * opposite * e1[k];
                var wanted = charges[p] == one ? other : one;
                for (var r = 0; r < count; r++)
                {
                    if (charges[r] == wanted)
                    {
                        hessian[(firsts[p] * count) + r] += 2 * e0[k];
                    }
                }
            }
        }
    }

    private double AddCubic(ReadOnlySpan<double> q, Span<double> gradient, Span<double> hessian)
    {
        var firsts = Groups.FirstOf;
        var count = firsts.Length;
        var sum = 0.0;
        foreach (var (p, r, s, value) in cubic)
        {
            var (vp, vr, vs) = (value * q[p], value * q[r], value * q[s]);
            sum += vp * q[r] * q[s];
            gradient[p] += vr * q[s];
            gradient[r] += vp * q[s];
            gradient[s] += vp * q[r];
            hessian[(firsts[p] * count) + r] += vs;
            hessian[(firsts[r] * count) + p] += vs;
            hessian[(firsts[p] * count) + s] += vr;
            hessian[(firsts[s] * count) + p] += vr;
            hessian[(firsts[r] * count) + s] += vp;
            hessian[(firsts[s] * count) + r] += vp;
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
