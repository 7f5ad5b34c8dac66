using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Atmospheres;

/// <summary>A furnace gas known by its trade name, with a typical analysis to start from.</summary>
public sealed record GeneratorGas
{
    private const string FileName = "generator-gases.yaml";

    private GeneratorGas(string id, string name, ImmutableArray<string> otherNames, string analysis, bool followsWaterGas, Pressure? pressure, string typical, string source, string provenance)
    {
        Id = id;
        Name = name;
        OtherNames = otherNames;
        Analysis = analysis;
        FollowsWaterGas = followsWaterGas;
        TotalPressure = pressure;
        Typical = typical;
        Source = source;
        Provenance = provenance;
    }

    /// <summary>Short name used in requests.</summary>
    public string Id { get; }

    /// <summary>Name in full.</summary>
    public string Name { get; }

    /// <summary>Further names accepted.</summary>
    public ImmutableArray<string> OtherNames { get; }

    /// <summary>Typical analysis as it would be written in a request.</summary>
    public string Analysis { get; }

    /// <summary>Whether CO2 and H2O belong together through the water-gas shift.</summary>
    public bool FollowsWaterGas { get; }

    /// <summary>Total pressure where a request gives none, or null.</summary>
    public Pressure? TotalPressure { get; }

    /// <summary>What is usual, in words.</summary>
    public string Typical { get; }

    /// <summary>Where the analysis comes from.</summary>
    public string Source { get; }

    /// <summary><c>memory</c> or <c>retrieved</c>.</summary>
    public string Provenance { get; }

    /// <summary>All gases of <c>oxides/generator-gases.yaml</c>.</summary>
    /// <param name="database">Its files.</param>
    /// <returns>In the order of the file.</returns>
    /// <exception cref="DocumentException">The file is wrong.</exception>
    public static ImmutableArray<GeneratorGas> All(SubstanceDatabase database)
    {
        DocumentNode root = database.Document(FileName);
        root.AllowOnly("gases");
        return [.. root.Required("gases").Items.Select(Read)];
    }

    /// <summary>A gas by its name.</summary>
    /// <param name="name">Id or other name.</param>
    /// <param name="database">Its files.</param>
    /// <returns>The gas.</returns>
    /// <exception cref="RequestException">Unknown; the nearest name is offered.</exception>
    public static GeneratorGas Get(string name, SubstanceDatabase database)
    {
        ImmutableArray<GeneratorGas> all = All(database);
        return all.FirstOrDefault(gas => gas.Id == name || gas.OtherNames.Contains(name))
            ?? throw RequestException.UnknownWord("furnace gas", name, [.. all.Select(gas => gas.Id)]);
    }

    private static GeneratorGas Read(DocumentNode node)
    {
        node.AllowOnly("id", "name", "also", "analysis", "follows", "pressure", "typical", "source", "provenance");
        string analysis = node.Required("analysis").Text;
        try
        {
            GasAnalysis.Parse(analysis, Pressure.FromBar(PhysicalConstants.AtmosphereInBar));
            return new GeneratorGas(
                node.Required("id").Text,
                node.Required("name").Text,
                [.. node.Required("also").Items.Select(item => item.Text)],
                analysis,
                Follows(node.Optional("follows")),
                node.Optional("pressure") is { } pressure ? Pressure.Parse(pressure.Text) : null,
                node.Required("typical").Text,
                node.Required("source").Text,
                node.Required("provenance").Text);
        }
        catch (RequestException fault)
        {
            throw new DocumentException(node.At, fault.Message);
        }
    }

    private static bool Follows(DocumentNode? node)
        => node is not null && (node.Text == "water-gas" ? true : throw DocumentException.BadValue(node.At, "follows", node.Text, "write water-gas"));
}
