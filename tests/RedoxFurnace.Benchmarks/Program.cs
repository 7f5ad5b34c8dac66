using System.Globalization;
using RedoxFurnace.Benchmarks;

// A topic is one file with Run() and one line here. Words on the command line choose topics by name.
(string Name, Func<IEnumerable<BenchmarkRow>> Run)[] topics =
[
    ("data", DataBenchmarks.Run),
    ("ranking", DataBenchmarks.Ranking),
    ("charts", ChartBenchmarks.Run),
    ("charge", ChargeBenchmarks.Run),
    ("gas", GasBenchmarks.Run),
    ("assess", AssessBenchmarks.Run),
];

Console.WriteLine("| what | one call | against | baseline | ratio | goal |");
Console.WriteLine("| --- | ---: | --- | ---: | ---: | --- |");
foreach ((string name, Func<IEnumerable<BenchmarkRow>> run) in topics.Where(topic => args.Length == 0 || args.Contains(topic.Name)))
{
    foreach (BenchmarkRow row in run())
    {
        string ratio = row.BaselineSeconds is { } baseline ? (row.Seconds / baseline).ToString("0.00", CultureInfo.InvariantCulture) : "";
        Console.WriteLine($"| {row.What} | {Show(row.Seconds)} | {row.Against} | {(row.BaselineSeconds is { } seconds ? Show(seconds) : "")} | {ratio} | {row.Goal} |");
    }
}

return 0;

static string Show(double seconds) => seconds switch
{
    < 1e-6 => FormattableString.Invariant($"{seconds * 1e9:0.0} ns"),
    < 1e-3 => FormattableString.Invariant($"{seconds * 1e6:0.0} us"),
    < 1 => FormattableString.Invariant($"{seconds * 1e3:0.0} ms"),
    _ => FormattableString.Invariant($"{seconds:0.00} s"),
};
