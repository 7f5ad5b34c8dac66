namespace RedoxFurnace.Quantities;

/// <summary>Finds the known word a misspelt one most likely meant.</summary>
public static class NearestSpelling
{
    /// <summary>The known word with the fewest edits (insert, drop, change, swap of neighbours) from the one given.</summary>
    /// <param name="word">The word as written; case is ignored at half weight.</param>
    /// <param name="known">Candidates.</param>
    /// <returns>The nearest word, or null when none is near enough to be worth offering.</returns>
    public static string? Find(string word, IEnumerable<string> known)
    {
        string? best = null;
        double bestDistance = double.PositiveInfinity;
        foreach (string candidate in known)
        {
            double distance = Distance(word, candidate);
            if (distance < bestDistance)
            {
                (best, bestDistance) = (candidate, distance);
            }
        }

        double allowed = Math.Max(1.0, Math.Ceiling(word.Length / 3.0));
        return bestDistance <= allowed ? best : null;
    }

    private static double Distance(string a, string b)
    {
        double[,] cost = new double[a.Length + 1, b.Length + 1];
        for (int i = 0; i <= a.Length; i++)
        {
            cost[i, 0] = i;
        }

        for (int j = 0; j <= b.Length; j++)
        {
            cost[0, j] = j;
        }

        for (int i = 1; i <= a.Length; i++)
        {
            for (int j = 1; j <= b.Length; j++)
            {
                double change = cost[i - 1, j - 1] + Change(a[i - 1], b[j - 1]);
                double best = Math.Min(change, Math.Min(cost[i - 1, j], cost[i, j - 1]) + 1);
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                {
                    best = Math.Min(best, cost[i - 2, j - 2] + 1);
                }

                cost[i, j] = best;
            }
        }

        return cost[a.Length, b.Length];
    }

    private static double Change(char a, char b)
        => a == b ? 0 : char.ToLowerInvariant(a) == char.ToLowerInvariant(b) ? 0.5 : 1;
}
