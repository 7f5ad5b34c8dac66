using RedoxFurnace.Charts.Kinds;
using RedoxFurnace.Charts.Layout;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Charts.Writing;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Benchmarks;

/// <summary>A stability chart of 20 lines: from the database to SVG, and to PNG at 300 dpi, against encoding an empty page of the same size.</summary>
internal static class ChartBenchmarks
{
    private const int Dpi = 300;

    public static IEnumerable<BenchmarkRow> Run()
    {
        SubstanceDatabase database = SubstanceDatabase.Bundled;
        StabilityRequest request = new(["Al", "Cr", "Fe", "Mg", "Mn", "Si", "Ti"], ["C", "H2"], Temperature.FromCelsius(25), Temperature.FromCelsius(1800));
        Scene Draw() => ChartLayout.Lay(StabilityChart.Plan(StabilityLines.Of(request, database), new StabilityChartOptions(), database));
        Scene scene = Draw();
        Scene empty = scene with { Groups = [], Values = [] };
        int lines = scene.Values.Length;

        double emptySvg = Stopwatches.Median(() => SvgWriter.Write(empty));
        double whole = Stopwatches.Median(() => SvgWriter.Write(Draw()));
        yield return new BenchmarkRow($"SVG of {lines} lines, calculated, laid out and written", whole, "an empty SVG page", emptySvg, "under 60 ms");
        double written = Stopwatches.Median(() => SvgWriter.Write(scene));
        yield return new BenchmarkRow($"SVG of {lines} lines, written only", written, "an empty SVG page", emptySvg, "");
        double emptyPng = Stopwatches.Median(() => PngWriter.Write(empty, Dpi));
        double png = Stopwatches.Median(() => PngWriter.Write(scene, Dpi));
        yield return new BenchmarkRow($"PNG of {lines} lines at {Dpi} dpi, A4", png, "an empty picture of the same size", emptyPng, "under 250 ms warm");
    }
}
