namespace MocapClean.Cli.Config;

/// <summary>The word that was probably meant.</summary>
public static class NearMiss
{
    /// <summary>
    /// The candidate fewest edits away: at most two, or one for words under five letters; null where none is that near.
    /// An edit adds, drops or changes a letter or swaps two neighbours (optimal string alignment, Damerau 1964).
    /// </summary>
    public static string? Of(string word, IEnumerable<string> candidates)
    {
        var best = candidates
            .Select(c => (Word: c, Edits: Edits(word.ToLowerInvariant(), c.ToLowerInvariant())))
            .OrderBy(c => c.Edits)
            .FirstOrDefault((Word: "", Edits: int.MaxValue));
        return best.Edits <= (Math.Min(word.Length, best.Word.Length) < 5 ? 1 : 2) ? best.Word : null;
    }

    /// <summary>A question to hang on a message, or nothing.</summary>
    public static string Hint(string? likely) => likely is null ? "" : $"; did you mean '{likely}'?";

    private static int Edits(string a, string b)
    {
        if (Math.Abs(a.Length - b.Length) > 2)
        {
            return int.MaxValue;
        }

        var table = new int[a.Length + 1, b.Length + 1];
        for (var i = 0; i <= a.Length; i++)
        {
            for (var j = 0; j <= b.Length; j++)
            {
                table[i, j] = (i, j) switch
                {
                    (0, _) => j,
                    (_, 0) => i,
                    _ => Math.Min(
                        Math.Min(table[i - 1, j], table[i, j - 1]) + 1,
                        table[i - 1, j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1)),
                };
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                {
                    table[i, j] = Math.Min(table[i, j], table[i - 2, j - 2] + 1);
                }
            }
        }

        return table[a.Length, b.Length];
    }
}
