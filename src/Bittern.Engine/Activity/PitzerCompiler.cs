namespace Bittern.Engine.Activity;

/// <summary>
/// From parameters by name to the arrays of <see cref="PitzerModel"/>. Everything constant in I becomes a coefficient of a form in the molalities q of the
/// groups: β(0), θ and λ of a quadratic, C of Z times a quadratic, ψ and ζ of a cubic one; β(1) and β(2) keep their function of I.
/// </summary>
internal static class PitzerCompiler
{
    /// <summary>Compiles a set for one list of species at one temperature.</summary>
    /// <param name="parameters">The set.</param>
    /// <param name="system">The species.</param>
    /// <param name="warmer">T - 298.15 K.</param>
    /// <param name="aPhi">A_φ at T.</param>
    public static PitzerModel Compile(
        PitzerParameters parameters,
        EquilibriumSystem system,
        double warmer,
        double aPhi
    )
    {
        var index = system
            .Species.Select((s, j) => (s.Name, j))
            .ToDictionary(s => s.Name, s => s.j, StringComparer.Ordinal);
        bool Here(params ReadOnlySpan<string> names)
        {
            foreach (var name in names)
            {
                if (!index.ContainsKey(name))
                {
                    return false;
                }
            }

            return true;
        }

        var pairs = parameters.Pairs.Where(p => Here(p.Cation, p.Anion)).ToList();
        var thetas = parameters.Thetas.Where(t => Here(t.First, t.Second)).ToList();
        var psis = parameters.Psis.Where(t => Here(t.First, t.Second, t.Opposite)).ToList();
        var lambdas = parameters.Lambdas.Where(t => Here(t.Uncharged, t.Other)).ToList();
        var zetas = parameters.Zetas.Where(t => Here(t.Uncharged, t.Cation, t.Anion)).ToList();
        var names = new HashSet<string>(StringComparer.Ordinal);
        names.UnionWith(pairs.SelectMany(p => new[] { p.Cation, p.Anion }));
        names.UnionWith(thetas.SelectMany(t => new[] { t.First, t.Second }));
        names.UnionWith(psis.SelectMany(t => new[] { t.First, t.Second, t.Opposite }));
        names.UnionWith(lambdas.SelectMany(t => new[] { t.Uncharged, t.Other }));
        names.UnionWith(zetas.SelectMany(t => new[] { t.Uncharged, t.Cation, t.Anion }));
        var groups = new MomentGroups(system, names);
        int Group(string name) => groups.GroupOf[index[name]];

        var count = groups.Count;
        var quadratic = new double[count * count];
        var third = new double[count * count];
        var terms = new List<PitzerTerm>();
        var alphas = new List<double>();
        foreach (var pair in pairs)
        {
            AddPair(pair);
        }

        foreach (
            var (first, second, value) in thetas
                .Select(t => (t.First, t.Second, t.Value + (warmer * t.PerKelvin)))
                .Concat(
                    lambdas.Select(t => (t.Uncharged, t.Other, t.Value + (warmer * t.PerKelvin)))
                )
        )
        {
            Symmetric(quadratic, Group(first), Group(second), 2 * value);
        }

        var cubic = psis.Select(t => (t.First, t.Second, t.Opposite, t.Value, t.PerKelvin))
            .Concat(zetas.Select(t => (t.Uncharged, t.Cation, t.Anion, t.Value, t.PerKelvin)))
            .Select(t =>
            {
                int[] order = [.. new[] { Group(t.Item1), Group(t.Item2), Group(t.Item3) }.Order()];
                return new PitzerCubic(
                    order[0],
                    order[1],
                    order[2],
                    t.Value + (warmer * t.PerKelvin)
                );
            })
            .Where(c => c.Value != 0);
        return new PitzerModel(groups, aPhi, quadratic, third, [.. alphas], [.. terms], [.. cubic]);

        void AddPair(PitzerPair pair)
        {
            var (c, a) = (Group(pair.Cation), Group(pair.Anion));
            var (zc, za) = (groups.Charges[c], groups.Charges[a]);
            if (zc <= 0 || za >= 0)
            {
                throw new ArgumentException(
                    $"Pitzer parameters call {pair.Cation} a cation and {pair.Anion} an anion; their charges are {zc} and {za}",
                    nameof(parameters)
                );
            }

            var slopes = pair.PerKelvin ?? new PitzerPairSlopes(0, 0, 0, 0);
            Symmetric(quadratic, c, a, 2 * (pair.Beta0 + (warmer * slopes.Beta0)));
            Symmetric(
                third,
                c,
                a,
                (pair.CPhi + (warmer * slopes.CPhi)) / (2 * Math.Sqrt(-zc * za))
            );
            var isTwoTwo = zc == 2 && za == -2;
            AddTerm(
                c,
                a,
                pair.Alpha1 ?? (isTwoTwo ? 1.4 : 2),
                pair.Beta1 + (warmer * slopes.Beta1)
            );
            AddTerm(
                c,
                a,
                pair.Alpha2 ?? (isTwoTwo || zc == 1 || za == -1 ? 12 : 50),
                pair.Beta2 + (warmer * slopes.Beta2)
            );
        }

        void AddTerm(int c, int a, double alpha, double value)
        {
            if (value == 0)
            {
                return;
            }

            var k = alphas.IndexOf(alpha);
            if (k < 0)
            {
                k = alphas.Count;
                alphas.Add(alpha);
            }

            terms.Add(new PitzerTerm(Math.Min(c, a), Math.Max(c, a), k, 2 * value));
        }

        void Symmetric(double[] matrix, int p, int r, double value)
        {
            matrix[(p * count) + r] = value;
            matrix[(r * count) + p] = value;
        }
    }
}
