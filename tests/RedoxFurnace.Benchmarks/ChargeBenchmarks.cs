using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.Optimization;
using RedoxFurnace.Charges;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Benchmarks;

/// <summary>The charge equilibrium at several sizes, and against a general-purpose optimiser on a small problem.</summary>
internal static class ChargeBenchmarks
{
    public static IEnumerable<BenchmarkRow> Run()
    {
        foreach ((string name, string[] elements) in new (string, string[])[]
        {
            ("3 elements", ["Cr", "O", "C"]),
            ("5 elements", ["Fe", "Cr", "O", "C", "Si"]),
            ("8 elements", ["Fe", "Cr", "O", "C", "Si", "Mn", "Al", "N"]),
        })
        {
            ChargeEquilibrium equilibrium = new(SubstanceDatabase.Bundled, elements);
            Dictionary<string, double> moles = elements.Select((element, i) => (element, 0.3 + (0.2 * i))).ToDictionary();
            int candidates = SubstanceDatabase.Bundled.MadeOf(elements.ToHashSet()).Count;
            int turn = 0;
            double seconds = Stopwatches.Median(() => equilibrium.Solve(moles, Temperature.FromCelsius(1100 + (turn++ % 60 * 10)), Pressure.Standard));
            yield return new BenchmarkRow($"charge equilibrium, {name}, {candidates} candidates", seconds, "", null, name == "5 elements" ? "under 200 us" : "");
        }

        ChargeEquilibrium small = new(SubstanceDatabase.Bundled, ["C", "O", "H"]);
        Dictionary<string, double> gas = new() { ["C"] = 1, ["O"] = 1.2, ["H"] = 2 };
        Temperature at = Temperature.FromKelvin(1300);
        double ours = Stopwatches.Median(() => small.Solve(gas, at, Pressure.Standard));
        double general = Stopwatches.Median(() => General(at));
        yield return new BenchmarkRow("charge equilibrium, C-H-O", ours, "BFGS on the dual of six gases alone (MathNet.Numerics)", general, "");
    }

    /// <summary>Minimises ln sum exp over the element potentials: the same gas by a general optimiser.</summary>
    private static double General(Temperature at)
    {
        string[] names = ["CO", "CO2", "H2", "H2O", "CH4", "O2"];
        double[][] atoms = [[1, 1, 0], [1, 2, 0], [0, 0, 2], [0, 1, 2], [1, 0, 4], [0, 2, 0]];
        double rt = PhysicalConstants.GasConstant * at.Kelvin;
        double[] costs = [.. names.Select(name => SubstanceDatabase.Bundled.Get(name).Gibbs(at.Kelvin) / rt)];
        double[] amounts = [1, 1.2, 2];
        double Value(Vector<double> x) => atoms.Select((a, j) => Math.Exp(Math.Min(200, (a[0] * x[0]) + (a[1] * x[1]) + (a[2] * x[2]) - costs[j]))).Sum() - (amounts[0] * x[0]) - (amounts[1] * x[1]) - (amounts[2] * x[2]);
        Vector<double> Slope(Vector<double> x)
        {
            double[] slope = [-amounts[0], -amounts[1], -amounts[2]];
            for (int j = 0; j < atoms.Length; j++)
            {
                double y = Math.Exp(Math.Min(200, (atoms[j][0] * x[0]) + (atoms[j][1] * x[1]) + (atoms[j][2] * x[2]) - costs[j]));
                for (int i = 0; i < 3; i++)
                {
                    slope[i] += y * atoms[j][i];
                }
            }

            return Vector<double>.Build.Dense(slope);
        }

        BfgsMinimizer minimiser = new(1e-6, 1e-8, 1e-8, 2000);
        Vector<double> start = Vector<double>.Build.Dense([costs[0] * 0.2, costs[0] * 0.8, costs[2] / 2]);
        try
        {
            return minimiser.FindMinimum(ObjectiveFunction.Gradient(Value, Slope), start).FunctionInfoAtMinimum.Value;
        }
        catch (MathNet.Numerics.Optimization.OptimizationException)
        {
            return double.NaN;
        }
    }
}
