namespace Bittern.Chemistry;

/// <summary>
/// Which known word a misspelt one was meant to be: insertions, deletions, substitutions and swaps of neighbours count one each
/// (Damerau–Levenshtein, optimal string alignment).
/// </summary>
public static class EditDistance
{
    // Longer texts are no misspelt word, and the cost grows with the square of the length.
    private const int LongestWord = 100;

    /// <summary>
    /// The candidate nearest to <paramref name="text"/>, the earliest on a tie; null when none is near (more than a third of the
    /// characters differ, at most three). A difference in case alone counts as half an edit.
    /// </summary>
    public static string? Closest(string text, IEnumerable<string> candidates)
    {
        if (text.Length is 0 or > LongestWord)
        {
            return null;
        }

        // Counted in halves, so that a change of case is nearer than any edit.
        string? best = null;
        var bestDistance = (2 * Math.Clamp(text.Length / 3, 1, 3)) + 1;
        foreach (var candidate in candidates)
        {
            if (2 * Math.Abs(candidate.Length - text.Length) >= bestDistance)
            {
                continue;
            }

            var distance = Math.Min(
                2 * Between(text, candidate),
                (2 * Between(text.ToUpperInvariant(), candidate.ToUpperInvariant())) + 1
            );
            if (distance < bestDistance && distance < 2 * Math.Max(text.Length, candidate.Length))
            {
                best = candidate;
                bestDistance = distance;
            }
        }

        return best;
    }

    /// <summary>Edits that turn one text into the other; case matters.</summary>
    public static int Between(string one, string other)
    {
        var previous = new int[other.Length + 1];
        var current = new int[other.Length + 1];
        var beforePrevious = new int[other.Length + 1];
        for (var j = 0; j <= other.Length; j++)
        {
            current[j] = j;
        }

        for (var i = 1; i <= one.Length; i++)
        {
            (beforePrevious, previous, current) = (previous, current, beforePrevious);
            current[0] = i;
            for (var j = 1; j <= other.Length; j++)
            {
                var substitution = one[i - 1] == other[j - 1] ? 0 : 1;
                current[j] = Math.Min(
                    Math.Min(previous[j] + 1, current[j - 1] + 1),
                    previous[j - 1] + substitution
                );
                if (i > 1 && j > 1 && one[i - 1] == other[j - 2] && one[i - 2] == other[j - 1])
                {
                    current[j] = Math.Min(current[j], beforePrevious[j - 2] + 1);
                }
            }
        }

        return current[other.Length];
    }
}
