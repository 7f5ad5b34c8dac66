using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Published;

/// <summary>Gibbs energies of formation against the NIST-JANAF tables (Chase 1998), each substance with its own argued tolerance.</summary>
public class JanafFormationTests
{
    private static readonly PublishedTable Table = PublishedTable.Load("janaf-formation.csv");
    private static readonly PublishedTable Tolerances = PublishedTable.Load("janaf-tolerances.csv");

    /// <summary>Formula and temperature of every row.</summary>
    public static TheoryData<string, double> Rows
    {
        get
        {
            TheoryData<string, double> rows = [];
            foreach (PublishedRow row in Table.Rows)
            {
                rows.Add(row["formula"], row.Number("T_K"));
            }

            return rows;
        }
    }

    [Theory, MemberData(nameof(Rows))]
    public void Gibbs_energy_of_formation_agrees_with_the_table(string formula, double kelvin)
    {
        double published = Table.Rows.Single(row => row["formula"] == formula && row.Number("T_K") == kelvin).Number("dGf_kJ_per_mol");
        PublishedRow? allowed = Tolerances.Rows.SingleOrDefault(
            row => row["formula"] == formula && row.Number("t_min_K") <= kelvin && row.Number("t_max_K") >= kelvin);
        if (allowed is null)
        {
            Assert.Throws<OutsideDataException>(() => FormationKilojoules(formula, kelvin));
        }
        else
        {
            Assert.Equal(published, FormationKilojoules(formula, kelvin), allowed.Number("tolerance_kJ_per_mol"));
        }
    }

    [Fact]
    public void Every_row_of_the_table_is_tested_and_every_tolerance_argued()
    {
        Assert.Equal(171, Rows.Count);
        Assert.All(Tolerances.Rows, row => Assert.True(row["reason"].Length > 10, row["formula"]));
    }

    // The tables take an element as its gas at 1 bar where that is the stable state.
    private static double FormationKilojoules(string formula, double kelvin)
    {
        SubstanceDatabase database = SubstanceDatabase.Bundled;
        Substance substance = database.Get(formula);
        double elements = substance.Formula.Atoms.Sum(atom => atom.Value * ElementGibbs(atom.Key, kelvin));
        return (substance.Gibbs(kelvin) - elements) / 1000;
    }

    private static double ElementGibbs(string element, double kelvin) => element == "O"
        ? SubstanceDatabase.Bundled.Get("O2").Gibbs(kelvin) / 2
        : new[] { SubstanceDatabase.Bundled.Metal(element), SubstanceDatabase.Bundled.Vapour(element) }
            .Min(state => state is not null && state.TryGibbs(kelvin, out double gibbs) ? gibbs : double.PositiveInfinity);
}
