namespace LoadWatch.Service.Configuration;

/// <summary>Finds the word that was meant.</summary>
public static class Nearest
{
    /// <summary><c>; did you mean "inboxes"?</c>, or nothing where no candidate is near: at most a third of the letters differ.</summary>
    public static string Hint(string word, IEnumerable<string> candidates)
    {
        var best = candidates
            .Select(candidate => (candidate, distance: Distance(word.ToUpperInvariant(), candidate.ToUpperInvariant())))
            .OrderBy(pair => pair.distance)
            .ThenBy(pair => pair.candidate, StringComparer.Ordinal)
            .FirstOrDefault();
        return best.candidate is not null && best.distance <= Math.Max(1, Math.Max(word.Length, best.candidate.Length) / 3)
            ? $"; did you mean \"{best.candidate}\"?"
            : "";
    }

    /// <summary>Edits (insert, delete, replace, swap of neighbours) between two words; Damerau 1964, optimal string alignment.</summary>
    private static int Distance(string a, string b)
    {
        var rows = new int[a.Length + 1, b.Length + 1];
        for (var i = 0; i <= a.Length; i++)
        {
            rows[i, 0] = i;
        }

        for (var j = 0; j <= b.Length; j++)
        {
            rows[0, j] = j;
        }

        for (var i = 1; i <= a.Length; i++)
        {
            for (var j = 1; j <= b.Length; j++)
            {
                var replace = rows[i - 1, j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1);
                rows[i, j] = Math.Min(replace, Math.Min(rows[i - 1, j], rows[i, j - 1]) + 1);
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                {
                    rows[i, j] = Math.Min(rows[i, j], rows[i - 2, j - 2] + 1);
                }
            }
        }

        return rows[a.Length, b.Length];
    }
}
