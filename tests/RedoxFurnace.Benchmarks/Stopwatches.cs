using System.Diagnostics;

namespace RedoxFurnace.Benchmarks;

/// <summary>Median times of short and of long calls.</summary>
internal static class Stopwatches
{
    private const int Rounds = 15;
    private const double SecondsARound = 0.04;

    /// <summary>Median time of one call over rounds long enough to time, after a warm-up.</summary>
    public static double Median(Action call)
    {
        call();
        long many = 1;
        while (Time(call, many) < SecondsARound)
        {
            many *= 2;
        }

        double[] seconds = [.. Enumerable.Range(0, Rounds).Select(_ => Time(call, many) / many).Order()];
        return seconds[Rounds / 2];
    }

    /// <summary>Median wall time of starting a program and waiting for its end.</summary>
    public static double MedianOfProgram(string file, params string[] arguments)
    {
        const int starts = 11;
        double[] seconds = [.. Enumerable.Range(0, starts).Select(_ => TimeProgram(file, arguments)).Order()];
        return seconds[starts / 2];
    }

    private static double Time(Action call, long many)
    {
        long start = Stopwatch.GetTimestamp();
        for (long i = 0; i < many; i++)
        {
            call();
        }

        return Stopwatch.GetElapsedTime(start).TotalSeconds;
    }

    private static double TimeProgram(string file, string[] arguments)
    {
        long start = Stopwatch.GetTimestamp();
        using Process process = Process.Start(new ProcessStartInfo(file, arguments) { RedirectStandardOutput = true, RedirectStandardError = true })!;
        process.StandardOutput.ReadToEnd();
        process.WaitForExit();
        return process.ExitCode == 0
            ? Stopwatch.GetElapsedTime(start).TotalSeconds
            : throw new InvalidOperationException($"{file} ended with {process.ExitCode}");
    }
}
