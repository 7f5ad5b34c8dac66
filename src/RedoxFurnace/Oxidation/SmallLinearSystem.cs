namespace RedoxFurnace.Oxidation;

/// <summary>Solves systems of two or three equations by elimination with pivoting; small enough that a library's matrices would cost more than the work.</summary>
internal static class SmallLinearSystem
{
    /// <summary>Solves the augmented matrix, or says that it is singular.</summary>
    /// <param name="augmented">n rows, n + 1 columns; overwritten.</param>
    /// <returns>The solution or null.</returns>
    public static double[]? TrySolve(double[,] augmented)
    {
        int n = augmented.GetLength(0);
        for (int column = 0; column < n; column++)
        {
            int pivot = column;
            for (int row = column + 1; row < n; row++)
            {
                if (Math.Abs(augmented[row, column]) > Math.Abs(augmented[pivot, column]))
                {
                    pivot = row;
                }
            }

            if (Math.Abs(augmented[pivot, column]) < 1e-12)
            {
                return null;
            }

            for (int k = 0; k <= n; k++)
            {
                (augmented[column, k], augmented[pivot, k]) = (augmented[pivot, k], augmented[column, k]);
            }

            for (int row = 0; row < n; row++)
            {
                double factor = row == column ? 0 : augmented[row, column] / augmented[column, column];
                for (int k = column; factor != 0 && k <= n; k++)
                {
                    augmented[row, k] -= factor * augmented[column, k];
                }
            }
        }

        return [.. Enumerable.Range(0, n).Select(i => augmented[i, n] / augmented[i, i])];
    }
}
