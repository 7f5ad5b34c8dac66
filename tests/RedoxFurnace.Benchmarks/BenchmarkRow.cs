namespace RedoxFurnace.Benchmarks;

/// <summary>One line of the table: a time, the baseline measured in the same run, and the ratio aimed at.</summary>
/// <param name="What">What was timed.</param>
/// <param name="Seconds">Median of one call, s.</param>
/// <param name="Against">What it is compared with.</param>
/// <param name="BaselineSeconds">Median of that, s; null where there is nothing to compare with.</param>
/// <param name="Goal">The goal in words.</param>
internal sealed record BenchmarkRow(string What, double Seconds, string Against, double? BaselineSeconds, string Goal);
