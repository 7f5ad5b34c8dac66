using CsCheck;

namespace RedoxFurnace.Tests;

/// <summary>
/// Random input that is the same in every run: a test that fails, fails again. REDOXFURNACE_FUZZ=N in the environment multiplies the
/// samples and starts them elsewhere, for long runs by hand.
/// </summary>
internal static class Seeded
{
    private static readonly int Fuzz = int.TryParse(Environment.GetEnvironmentVariable("REDOXFURNACE_FUZZ"), out int times) ? Math.Max(1, times) : 1;

    /// <summary>Holds a statement against samples; the first that breaks it is printed.</summary>
    public static void Sample<T>(this Gen<T> gen, ulong seed, int count, Func<T, bool> holds, Func<T, string>? print = null)
    {
        PCG random = new(1, Fuzz > 1 ? seed + (ulong)Random.Shared.NextInt64() : seed);
        for (int i = 0; i < count * Fuzz; i++)
        {
            T sample = gen.Generate(random, null, out _);
            bool held;
            try
            {
                held = holds(sample);
            }
            catch (Exception fault) when (fault is not OutOfMemoryException)
            {
                throw new InvalidOperationException($"sample {i}: {(print is null ? sample?.ToString() : print(sample))}: {fault.Message}", fault);
            }

            Assert.True(held, $"sample {i} breaks it: {(print is null ? sample?.ToString() : print(sample))}");
        }
    }
}
