using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;
using RedoxFurnace.Tests.Published;

namespace RedoxFurnace.Tests.Reductants;

/// <summary>The ranking against published onsets and worked furnace cases.</summary>
public class RankingTests
{
    private const double Zero = PhysicalConstants.ZeroCelsiusInKelvin;
    private static readonly PublishedTable Values = PublishedTable.Load("check-values.csv");

    /// <summary>Onset of the reduction by graphite with CO and metal vapour at 1 bar: value and tolerance stand in the published table.</summary>
    [Theory]
    [InlineData("G2-116", "MgO")]
    [InlineData("G2-117", "SiO2")]
    [InlineData("G2-118", "Cr2O3")]
    [InlineData("G2-119", "MnO")]
    [InlineData("G2-122", "Fe0.947O")]
    [InlineData("G2-124", "Al2O3")]
    public void Carbon_takes_over_at_the_published_temperature(string id, string oxide)
    {
        PublishedRow row = Values[id];
        double celsius = Row(oxide, 1000 + Zero, "C", new RankConditions { Monoxide = Pressure.FromBar(1) }).Crossovers!.Kelvin.Min() - Zero;
        double allowed = double.Parse(row["tolerance"].TrimStart('±'), System.Globalization.CultureInfo.InvariantCulture);
        Assert.Equal(double.Parse(row["value"], System.Globalization.CultureInfo.InvariantCulture), celsius, allowed);
    }

    /// <summary>Hu 2013, J. Magnesium Alloys: the two gases share the total pressure. Value and tolerance from the published table.</summary>
    [Theory]
    [InlineData("G2-127", "MgO", 30)]
    [InlineData("G2-131", "MgO", 101325)]
    [InlineData("G2-132", "CaO", 100)]
    public void Vacuum_brings_the_onset_down_as_published(string id, string oxide, double pascal)
    {
        PublishedRow row = Values[id];
        RankConditions conditions = new() { Total = Pressure.FromBar(pascal / 1e5) };
        double kelvin = Row(oxide, 1600, "C", conditions).Crossovers!.Kelvin.Min();
        double allowed = double.Parse(row["tolerance"].TrimStart('±'), System.Globalization.CultureInfo.InvariantCulture);
        Assert.Equal(double.Parse(row["value"], System.Globalization.CultureInfo.InvariantCulture), kelvin, allowed);
    }

    /// <summary>Low-carbon chromium at 1150 C: bands are straight-line handbook fits (common practice, no source).</summary>
    [Fact]
    public void Carbon_makes_carbide_of_chromia_in_a_kiln_and_aluminium_stands_above_it()
    {
        RankResult result = Rank("Cr2O3", 1150 + Zero);
        RankedReductant carbon = result.Rows.Single(row => row.Reductant.Id == "C");
        Assert.InRange(carbon.Crossovers!.Kelvin.Min() - Zero, 1220, 1260);
        Assert.InRange(carbon.Carbide!.CarbideFloorKelvin!.Value - Zero, 1090, 1140);
        Assert.InRange(carbon.Carbide.MetalFloorKelvin!.Value - Zero, 1640, 1760);
        Assert.Contains(carbon.Job, new[] { JobVerdict.DoesNotWork, JobVerdict.WorksIf });
        Assert.InRange(carbon.KgPerKgMetal!.Value, 0.330, 0.364);
        RankedReductant aluminium = result.Rows.Single(row => row.Reductant.Id == "Al");
        Assert.Equal(JobVerdict.Works, aluminium.Job);
        Assert.InRange(aluminium.KgPerKgMetal!.Value, 0.493, 0.545);
        Assert.True(result.Rows.IndexOf(aluminium) < result.Rows.IndexOf(carbon));
        RankedReductant silicon = result.Rows.Single(row => row.Reductant.Id == "Si");
        Assert.Equal(Verdict.Reduces, silicon.Verdict);
        Assert.InRange(silicon.KgPerKgMetal!.Value, 0.385, 0.425);
        RankedReductant hydrogen = result.Rows.Single(row => row.Reductant.Id == "H2");
        Assert.Equal(Verdict.DoesNotReduce, hydrogen.Verdict);
        Assert.InRange(hydrogen.UsableShare!.Value, 0.0005, 0.0012);
    }

    /// <summary>Chromium metal by carbon at 1 mbar of CO: about 1170 C (common practice, no source).</summary>
    [Fact]
    public void A_vacuum_clears_chromium_of_its_carbide_far_cooler()
    {
        RankedReductant carbon = Row("Cr2O3", 1200 + Zero, "C", new RankConditions { Monoxide = Pressure.FromBar(0.001) });
        Assert.InRange(carbon.Carbide!.MetalFloorKelvin!.Value - Zero, 1130, 1210);
    }

    /// <summary>Tungsten powder: the W/WO2 ceiling of water at 800 and 900 C, sources differ (common practice, no source).</summary>
    [Theory]
    [InlineData(700, 0.13, 0.21)]
    [InlineData(800, 0.21, 0.31)]
    [InlineData(900, 0.29, 0.39)]
    public void Hydrogen_over_tungsten_uses_the_share_the_trade_knows(double celsius, double low, double high)
        => Assert.InRange(Row("WO3", celsius + Zero, "H2").UsableShare!.Value, low, high);

    [Fact]
    public void Carbon_monoxide_richer_than_graphite_allows_never_stands_above_graphite()
    {
        RankResult result = Rank("Fe2O3", 600 + Zero, conditions: new RankConditions { GasRatio = 1000 });
        ImmutableArray<string> order = [.. result.Rows.Select(row => row.Reductant.Id)];
        RankedReductant monoxide = result.Rows[order.IndexOf("CO")];
        Assert.True(monoxide.CarbonActivity > 1);
        Assert.True(order.IndexOf("C") < order.IndexOf("CO"));
        Assert.Contains("soot", string.Join(' ', monoxide.Notes.Append(monoxide.Reason)), StringComparison.Ordinal);
    }

    [Fact]
    public void Ferrosilicon_is_judged_fresh_and_nearly_used_up()
    {
        RankedReductant fresh = Row("MgO", 1200 + Zero, "FeSi75", new RankConditions { Total = Pressure.FromBar(1e-4) });
        string note = Assert.Single(fresh.Notes, note => note.Contains("a(Si) = 0.1", StringComparison.Ordinal));
        double atTenth = double.Parse(System.Text.RegularExpressions.Regex.Match(note, @"a\(Si\) = 0\.1: margin (-?\d+)").Groups[1].Value, System.Globalization.CultureInfo.InvariantCulture);
        // One mole of silicon a mole of O2: a tenth of the activity takes RT ln 10 off the margin.
        Assert.Equal((fresh.Margin!.Value / 1000) - (PhysicalConstants.GasConstant * (1200 + Zero) * Math.Log(10) / 1000), atTenth, 0.6);
        Assert.Contains(fresh.Notes, text => text.Contains("silicides have no data", StringComparison.OrdinalIgnoreCase));
    }

    [Fact]
    public void An_activity_of_one_changes_nothing_and_a_dilute_metal_is_easier_to_win()
    {
        RankedReductant pure = Row("Cr2O3", 1300 + Zero, "C");
        RankedReductant one = Row("Cr2O3", 1300 + Zero, "C", new RankConditions { Activities = Activities.Parse("Cr=1,Cr2O3=1", SubstanceDatabase.Bundled) });
        RankedReductant dilute = Row("Cr2O3", 1300 + Zero, "C", new RankConditions { Activities = Activities.Parse("Cr=0.2", SubstanceDatabase.Bundled) });
        Assert.Equal(pure.Margin, one.Margin);
        double shift = -4.0 / 3 * PhysicalConstants.GasConstant * (1300 + Zero) * Math.Log(0.2);
        Assert.Equal(pure.Margin!.Value + shift, dilute.Margin!.Value, 1e-6);
    }

    [Theory]
    [InlineData("FeCr2O4", "Fe")]
    [InlineData("MgAl2O4", "Al")]
    [InlineData("Fe2SiO4", "Fe")]
    public void A_double_oxide_is_harder_to_reduce_than_the_simple_one(string oxide, string metal)
    {
        Dictionary<string, string> simple = new() { ["Fe"] = "Fe0.947O", ["Al"] = "Al2O3" };
        RankedReductant bound = ReductantRanking.Rank(new RankRequest(oxide, metal, Temperature.FromKelvin(1400), ["Mg"], new RankConditions(), default), SubstanceDatabase.Bundled).Single().Rows[0];
        RankedReductant free = Row(simple[metal], 1400, "Mg");
        Assert.True(bound.Margin < free.Margin, $"{bound.Margin} against {free.Margin}");
    }

    [Fact]
    public void The_margin_is_the_difference_of_the_two_couples_published_by_the_ladder()
    {
        // The same figure by another road: oxygen potentials of two ladders.
        double kelvin = 1500;
        double chromia = OxideSystem.OfMetal("Cr", SubstanceDatabase.Bundled, Activities.AllOne).LadderAt(kelvin, 0).Steps[0].Couple.Formation.StandardGibbs(kelvin);
        double alumina = OxideSystem.OfMetal("Al", SubstanceDatabase.Bundled, Activities.AllOne).LadderAt(kelvin, 0).Steps[0].Couple.Formation.StandardGibbs(kelvin);
        Assert.Equal(chromia - alumina, Row("Cr2O3", kelvin, "Al").Margin!.Value, 1e-6);
    }

    /// <summary>Without lime part of the magnesium stays as forsterite, with it none (scenario of silicothermic magnesium; common practice, no source).</summary>
    [Fact]
    public void What_the_charge_becomes_is_told_and_lime_frees_the_magnesium()
    {
        RankConditions vacuum = new() { Total = Pressure.FromBar(1e-4) };
        RankedReductant plain = Row("MgO", 1200 + Zero, "Si", vacuum);
        Assert.Contains(plain.Notes, note => note.Contains("whole charge", StringComparison.Ordinal) && note.Contains("Mg2SiO4", StringComparison.Ordinal));
        RankedReductant limed = Row("MgO", 1200 + Zero, "Si", vacuum with { Flux = "CaO" });
        Assert.Contains(limed.Notes, note => note.Contains("100 % of the Mg as vapour", StringComparison.Ordinal));
    }

    /// <summary>A carbide of calcium or silicon takes the oxygen and leaves its carbon: chromium carbide, not chromium, below the metal's own floor.</summary>
    [Theory]
    [InlineData("CaC2")]
    [InlineData("SiC")]
    public void A_reductant_that_brings_carbon_makes_carbide_and_the_job_does_not_work(string reductant)
    {
        RankedReductant row = Row("Cr2O3", 1400 + Zero, reductant);
        Assert.Equal(Verdict.Reduces, row.Verdict);
        Assert.Equal(JobVerdict.DoesNotWork, row.Job);
        Assert.Contains("Cr7C3", row.Reason, StringComparison.Ordinal);
    }

    /// <summary>Sampled errors against linear propagation where that holds: the share that reduces is the normal integral of margin over standard error, and half the draws cross below the crossover.</summary>
    [Theory]
    [InlineData("Cr2O3", 1240, "C")]
    [InlineData("MnO", 1400, "C")]
    [InlineData("Cr2O3", 1600, "H2")]
    [InlineData("Fe2O3", 690, "C")]
    public void Sampling_agrees_with_linear_propagation(string oxide, double celsius, string reductant)
    {
        RankResult plain = Rank(oxide, celsius + Zero, [reductant]);
        RankedReductant row = RankSampling.Of(plain, 20_000, SubstanceDatabase.Bundled).Rows.Single();
        double expected = MathNet.Numerics.Distributions.Normal.CDF(0, row.ExpandedUncertainty!.Value / 2, row.Margin!.Value);
        Assert.Equal(expected, row.ProbabilityReduces!.Value, 0.015);
        Assert.Equal(row.Crossovers!.Kelvin.Min(), row.CrossoverPercentiles[1], 2.0);
        Assert.True(row.CrossoverPercentiles[0] < row.CrossoverPercentiles[1] && row.CrossoverPercentiles[1] < row.CrossoverPercentiles[2]);
        RankedReductant again = RankSampling.Of(plain, 20_000, SubstanceDatabase.Bundled).Rows.Single();
        Assert.Equal(row.ProbabilityReduces, again.ProbabilityReduces);
        Assert.Equal(row.CrossoverPercentiles.AsEnumerable(), again.CrossoverPercentiles);
    }

    /// <summary>The table of many margins is the ranking's own, oxide by oxide, at cold and hot ends and past the data.</summary>
    [Fact]
    public void The_table_of_margins_holds_the_margins_of_the_ranking()
    {
        ImmutableArray<string> oxides = ["Cr2O3", "Fe2O3", "Fe0.947O", "MnO", "SiO2", "TiO2", "MgO", "V2O5"];
        ImmutableArray<string> reductants = ["C", "H2", "CO", "Al", "Mg", "Si", "CaC2", "SiC"];
        ImmutableArray<Temperature> at = [.. new[] { 500.0, 900, 1300, 1700, 2100, 2600 }.Select(Temperature.FromKelvin)];
        MarginTable table = MarginTable.Of(oxides, reductants, at, new RankConditions(), SubstanceDatabase.Bundled);
        int compared = 0;
        for (int t = 0; t < at.Length; t++)
        {
            for (int o = 0; o < oxides.Length; o++)
            {
                foreach ((int r, string reductant) in reductants.Index())
                {
                    double? ranked;
                    try
                    {
                        ranked = Row(oxides[o], at[t].Kelvin, reductant).Margin;
                    }
                    catch (NoAnswerException)
                    {
                        continue;
                    }

                    if (ranked is { } margin && table.Margin(o, r, t) is { } own)
                    {
                        Assert.Equal(margin, own, 1e-6);
                        compared++;
                    }
                }
            }
        }

        Assert.True(compared > 200, $"{compared} compared");
    }

    private static RankedReductant Row(string oxide, double kelvin, string reductant, RankConditions? conditions = null)
        => Rank(oxide, kelvin, [reductant], conditions).Rows.Single();

    private static RankResult Rank(string oxide, double kelvin, ImmutableArray<string>? with = null, RankConditions? conditions = null)
        => ReductantRanking.Rank(new RankRequest(oxide, null, Temperature.FromKelvin(kelvin), with ?? [], conditions ?? new RankConditions(), default), SubstanceDatabase.Bundled).Single();
}
