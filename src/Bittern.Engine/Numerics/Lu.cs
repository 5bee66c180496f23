namespace Bittern.Engine.Numerics;

/// <summary>
/// LU factorisation with row equilibration and partial pivoting of a small dense matrix, in place, without allocation.
/// </summary>
internal static class Lu
{
    /// <summary>Factorises; false when the matrix is singular to working precision.</summary>
    public static bool Factor(
        Span<double> a,
        int n,
        int stride,
        Span<int> pivots,
        Span<double> rowScale
    )
    {
        for (var i = 0; i < n; i++)
        {
            var row = a.Slice(i * stride, n);
            var largest = 0.0;
            foreach (var value in row)
            {
                largest = Math.Max(largest, Math.Abs(value));
            }

            if (!(largest > 0) || double.IsInfinity(largest))
            {
                return false;
            }

            rowScale[i] = 1 / largest;
            for (var j = 0; j < n; j++)
            {
                row[j] *= rowScale[i];
            }
        }

        for (var k = 0; k < n; k++)
        {
            var pivot = k;
            var largest = Math.Abs(a[(k * stride) + k]);
            for (var i = k + 1; i < n; i++)
            {
                var candidate = Math.Abs(a[(i * stride) + k]);
                if (candidate > largest)
                {
                    largest = candidate;
                    pivot = i;
                }
            }

            pivots[k] = pivot;
            if (largest < 1e-280)
            {
                return false;
            }

            if (pivot != k)
            {
                for (var j = 0; j < n; j++)
                {
                    (a[(k * stride) + j], a[(pivot * stride) + j]) = (
                        a[(pivot * stride) + j],
                        a[(k * stride) + j]
                    );
                }
            }

            var top = a.Slice(k * stride, n);
            var inverse = 1 / top[k];
            for (var i = k + 1; i < n; i++)
            {
                var row = a.Slice(i * stride, n);
                var factor = row[k];
                if (factor == 0)
                {
                    continue;
                }

                factor *= inverse;
                row[k] = factor;
                for (var j = k + 1; j < n; j++)
                {
                    row[j] -= factor * top[j];
                }
            }
        }

        return true;
    }

    /// <summary>Solves with the factors; the right-hand side is overwritten by the solution.</summary>
    public static void Solve(
        ReadOnlySpan<double> lu,
        int n,
        int stride,
        ReadOnlySpan<int> pivots,
        ReadOnlySpan<double> rowScale,
        Span<double> rhs
    )
    {
        for (var i = 0; i < n; i++)
        {
            rhs[i] *= rowScale[i];
        }

        for (var k = 0; k < n; k++)
        {
            if (pivots[k] != k)
            {
                (rhs[k], rhs[pivots[k]]) = (rhs[pivots[k]], rhs[k]);
            }
        }

        for (var i = 0; i < n; i++)
        {
            var sum = rhs[i];
            for (var k = 0; k < i; k++)
            {
                sum -= lu[(i * stride) + k] * rhs[k];
            }

            rhs[i] = sum;
        }

        for (var i = n - 1; i >= 0; i--)
        {
            var sum = rhs[i];
            for (var k = i + 1; k < n; k++)
            {
                sum -= lu[(i * stride) + k] * rhs[k];
            }

            rhs[i] = sum / lu[(i * stride) + i];
        }
    }
}
