namespace RedoxFurnace.Safety;

/// <summary>Finds the word a misspelt one most likely stands for.</summary>
internal static class Spelling
{
    internal static string Nearest(string word, IReadOnlyList<string> allowed) =>
        allowed.MinBy(candidate => Distance(word, candidate)) ?? "";

    // Edits by insertion, deletion and substitution, two rows at a time.
    private static int Distance(string from, string to)
    {
        int[] previous = [.. Enumerable.Range(0, to.Length + 1)];
        for (int i = 1; i <= from.Length; i++)
        {
            int[] current = new int[to.Length + 1];
            current[0] = i;
            for (int j = 1; j <= to.Length; j++)
            {
                int substitution = previous[j - 1] + (from[i - 1] == to[j - 1] ? 0 : 1);
                current[j] = Math.Min(substitution, Math.Min(previous[j], current[j - 1]) + 1);
            }

            previous = current;
        }

        return previous[to.Length];
    }
}
