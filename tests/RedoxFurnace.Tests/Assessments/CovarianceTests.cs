using RedoxFurnace.Assessments;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Substances;
using RedoxFurnace.Tests.Published;

namespace RedoxFurnace.Tests.Assessments;

/// <summary>The covariance stored with the database, and what it makes of the uncertainty of couples.</summary>
public class CovarianceTests
{
    private static readonly SubstanceDatabase Database = SubstanceDatabase.Bundled;
    private static readonly AssessmentResult Result = OxideAssessment.Of(MeasurementTable.Of(Database), Database);

    [Fact]
    public void The_file_is_what_the_assessment_gives()
    {
        string[] written = Result.Covariance.Write().Split('\n');
        string[] committed = File.ReadAllText(Path.Combine(Repository.Root, "oxides", "covariance.yaml")).ReplaceLineEndings("\n").Split('\n');
        Assert.Equal(committed.Length, written.Length);
        EnthalpyCovariance stored = Database.Covariance!;
        Assert.Equal(stored.Substances.ToArray(), Result.Covariance.Substances.ToArray());
        // Numbers are compared, not digits: the last one may differ between processors.
        for (int i = 0; i < 2 * stored.Substances.Length; i++)
        {
            for (int j = 0; j <= i; j++)
            {
                double scale = Math.Sqrt(stored.Entry(i, i) * stored.Entry(j, j));
                Assert.InRange(Math.Abs(stored.Entry(i, j) - Result.Covariance.Entry(i, j)), 0, 1e-6 * scale);
            }
        }
    }

    [Theory]
    [InlineData("Ni", "NiO", 1300, 0.5, 3)]
    [InlineData("Cu", "Cu2O", 1200, 0.5, 3)]
    [InlineData("Co", "CoO", 1100, 0.5, 3)]
    [InlineData("Fe", "Fe0.947O", 1100, 0.5, 3)]
    [InlineData("Cr", "Cr2O3", 1300, 0.5, 3)]
    [InlineData("Nb", "NbO", 1300, 0.5, 3)]
    [InlineData("Mo", "MoO2", 1300, 0.5, 3)]
    [InlineData("Pb", "PbO", 800, 0.5, 3)]
    [InlineData("Sn", "SnO2", 1000, 0.5, 3)]
    [InlineData("Pd", "PdO", 1000, 0.5, 3)]
    [InlineData("MnO", "Mn3O4", 1200, 0.5, 3)]
    [InlineData("Fe3O4", "Fe2O3", 1300, 0.5, 3)]
    public void A_measured_couple_is_known_to_one_to_three_kilojoules(string reactant, string product, double kelvin, double least, double most)
    {
        Reaction couple = new CoupleModel(Database).Formation(Database.Get(reactant), Database.Get(product));
        Assert.InRange(ReactionUncertainty.OfGibbs(couple, kelvin, Database.Covariance) / 1000, least, most);
    }

    /// <summary>Uncertainty against the scatter of its measurements, every one of them, with the plainly contradicted sources (measured-misses.csv) left out.</summary>
    [Fact]
    public void Nineteen_measurements_of_twenty_lie_inside_the_joined_uncertainty()
    {
        PublishedTable misses = PublishedTable.Load("measured-misses.csv");
        CoupleModel model = new(Database);
        int inside = 0, all = 0;
        foreach (AssessedMeasurement item in Result.Measurements.Where(item => item.Measurement.Kind is not (MeasurementKind.ReactionEnthalpy or MeasurementKind.InvariantTemperature)))
        {
            if (misses.Rows.Any(row => row["id"] == item.Measurement.Id))
            {
                continue;
            }

            double kelvin = item.Points.Average(point => point.Kelvin);
            Reaction couple = model.Of(item.Measurement, kelvin, new Dictionary<string, CoupleModel.Shift>()).Reaction;
            double own = ReactionUncertainty.OfGibbs(couple, kelvin, Database.Covariance);
            double joined = Math.Sqrt((own * own) + Math.Pow(2 * item.StandardErrorJoules, 2) + Math.Pow(2 * Result.BetweenSourcesJoules, 2));
            all++;
            inside += Math.Abs(item.Points.Average(point => point.AfterJoules)) <= joined ? 1 : 0;
        }

        Assert.InRange(inside / (double)all, 0.9, 1);
        Assert.True(all > 50);
    }

    [Fact]
    public void Adjusted_oxides_are_correlated()
    {
        EnthalpyCovariance covariance = Database.Covariance!;
        double correlation = covariance.OfGibbs("Fe3O4", "Fe2O3", 1300) / Math.Sqrt(covariance.OfGibbs("Fe3O4", "Fe3O4", 1300) * covariance.OfGibbs("Fe2O3", "Fe2O3", 1300));
        Assert.InRange(correlation, 0.3, 1);
        Reaction couple = new CoupleModel(Database).Formation(Database.Get("Fe3O4"), Database.Get("Fe2O3"));
        Assert.True(ReactionUncertainty.OfGibbs(couple, 1300, covariance) < ReactionUncertainty.OfGibbs(couple, 1300, null));
    }

    [Fact]
    public void An_entry_of_a_users_own_stands_apart_with_its_own_uncertainty()
    {
        const string own = """
            substances:
              - formula: NiO
                class: oxide
                uncertainty: { enthalpy_kj_per_mol: 10, entropy_j_per_mol_k: 0, source: mine }
                phases:
                  - label: solid
                    state: solid
                    model: heat-capacity
                    source: mine
                    range_k: [298.15, 2000]
                    enthalpy_298_kj_per_mol: -240
                    entropy_298_j_per_mol_k: 38
                    cp_j_per_mol_k: { a: 52 }
            """;
        const string sources = "sources: [{ key: mine, citation: mine, licence: own, taken: all, provenance: retrieved }]";
        SubstanceDatabase overlaid = SubstanceDatabase.WithOverlay([new DatabaseFile("mine.yaml", own), new DatabaseFile("sources.yaml", sources)]);
        Assert.False(overlaid.Covariance!.Has("NiO"));
        Assert.True(overlaid.Covariance.Has("Fe2O3"));
        Assert.Equal(Database.Covariance!.OfGibbs("Fe3O4", "Fe2O3", 1000), overlaid.Covariance.OfGibbs("Fe3O4", "Fe2O3", 1000), 6);
        Reaction couple = new CoupleModel(overlaid).Formation(overlaid.Get("Ni"), overlaid.Get("NiO"));
        Assert.InRange(ReactionUncertainty.OfGibbs(couple, 1000, overlaid.Covariance), 19_999, 20_100);
    }
}
