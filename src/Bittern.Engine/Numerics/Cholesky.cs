namespace Bittern.Engine.Numerics;

/// <summary>
/// Cholesky factorisation of a small dense symmetric positive semidefinite matrix, scaled to a unit diagonal first
/// (van der Sluis 1969: within a factor n of the best diagonal scaling). Works in place, allocates nothing.
/// </summary>
internal static class Cholesky
{
    /// <summary>A pivot below this share of the (unit) diagonal is treated as a null direction and gets no step.</summary>
    private const double NullPivot = 1e-15;

    /// <summary>
    /// Factorises the lower triangle of <paramref name="matrix"/> (row-major, <paramref name="stride"/> numbers a row) and keeps the scales.
    /// </summary>
    public static void Factor(Span<double> matrix, int n, int stride, Span<double> scale)
    {
        for (var i = 0; i < n; i++)
        {
            var diagonal = matrix[(i * stride) + i];
            scale[i] = diagonal > 0 ? 1 / Math.Sqrt(diagonal) : 0;
        }

        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j <= i; j++)
            {
                matrix[(i * stride) + j] *= scale[i] * scale[j];
            }
        }

        for (var j = 0; j < n; j++)
        {
            var row = matrix.Slice(j * stride, j + 1);
            var pivot = row[j];
            for (var k = 0; k < j; k++)
            {
                pivot -= row[k] * row[k];
            }

            if (pivot <= NullPivot)
            {
                row[j] = 0;
                for (var i = j + 1; i < n; i++)
                {
                    matrix[(i * stride) + j] = 0;
                }

                continue;
            }

            var root = Math.Sqrt(pivot);
            row[j] = root;
            for (var i = j + 1; i < n; i++)
            {
                var other = matrix.Slice(i * stride, j + 1);
                var sum = other[j];
                for (var k = 0; k < j; k++)
                {
                    sum -= other[k] * row[k];
                }

                other[j] = sum / root;
            }
        }
    }

    /// <summary>Solves with the factor of <see cref="Factor"/>; the right-hand side is overwritten by the solution.</summary>
    public static void Solve(
        ReadOnlySpan<double> factor,
        int n,
        int stride,
        ReadOnlySpan<double> scale,
        Span<double> rhs
    )
    {
        for (var i = 0; i < n; i++)
        {
            var sum = rhs[i] * scale[i];
            for (var k = 0; k < i; k++)
            {
                sum -= factor[(i * stride) + k] * rhs[k];
            }

            var pivot = factor[(i * stride) + i];
            rhs[i] = pivot == 0 ? 0 : sum / pivot;
        }

        for (var i = n - 1; i >= 0; i--)
        {
            var sum = rhs[i];
            for (var k = i + 1; k < n; k++)
            {
                sum -= factor[(k * stride) + i] * rhs[k];
            }

            var pivot = factor[(i * stride) + i];
            rhs[i] = pivot == 0 ? 0 : sum / pivot;
        }

        for (var i = 0; i < n; i++)
        {
            rhs[i] *= scale[i];
        }
    }
}
