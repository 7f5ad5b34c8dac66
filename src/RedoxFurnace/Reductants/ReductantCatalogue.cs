using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>The reductants of <c>reductants.yaml</c>, in its order.</summary>
public sealed class ReductantCatalogue
{
    private readonly SubstanceDatabase _database;

    private ReductantCatalogue(SubstanceDatabase database, ImmutableArray<Reductant> listed)
    {
        _database = database;
        Listed = listed;
    }

    /// <summary>All that are compared when a request names none.</summary>
    public ImmutableArray<Reductant> Listed { get; }

    /// <summary>Reads the catalogue of a database.</summary>
    /// <param name="database">Data.</param>
    /// <returns>The catalogue.</returns>
    /// <exception cref="DocumentException">The file is wrong.</exception>
    public static ReductantCatalogue Of(SubstanceDatabase database)
    {
        DocumentNode root = database.Document("reductants.yaml");
        root.AllowOnly("reductants");
        return new ReductantCatalogue(database, [.. root.Required("reductants").Items.Select(Read)]);
    }

    /// <summary>A reductant of the list, or a metal of the database that has a condensed oxide.</summary>
    /// <param name="name">Id of the list or element symbol.</param>
    /// <returns>The reductant.</returns>
    /// <exception cref="RequestException">Unknown; the nearest is offered.</exception>
    public Reductant Get(string name)
    {
        Reductant? listed = Listed.FirstOrDefault(reductant => reductant.Id == name || string.Equals(reductant.Name, name, StringComparison.OrdinalIgnoreCase));
        if (listed is not null)
        {
            return listed;
        }

        return AtomicWeights.Has(name) && _database.Metal(name) is not null && _database.OxidesOf(name).Count > 0
            ? OfMetal(name)
            : throw RequestException.UnknownWord("reductant", name, [.. Listed.Select(reductant => reductant.Id)]);
    }

    private static Reductant OfMetal(string symbol)
        => new(symbol, symbol, ReductantKind.Metal, null, symbol, 1, [1], [], null);

    private static Reductant Read(DocumentNode node)
    {
        node.AllowOnly("id", "name", "kind", "oxidised", "metal", "mass_fraction", "activities", "reactions", "note", "source");
        DocumentNode kindNode = node.Required("kind");
        ReductantKind kind = kindNode.Text switch
        {
            "graphite" => ReductantKind.Graphite,
            "gas" => ReductantKind.Gas,
            "metal" => ReductantKind.Metal,
            "reaction" => ReductantKind.Reaction,
            _ => throw DocumentException.BadValue(kindNode.At, "kind", kindNode.Text, "allowed: graphite, gas, metal, reaction"),
        };
        string id = node.Required("id").Text;
        return new Reductant(
            id,
            node.Required("name").Text,
            kind,
            node.Optional("oxidised")?.Text,
            kind == ReductantKind.Metal ? node.Optional("metal")?.Text ?? id : null,
            ReadFraction(node.Optional("mass_fraction")),
            node.Optional("activities") is { } activities ? [.. activities.Items.Select(item => item.Number())] : [1],
            node.Optional("reactions") is { } reactions ? [.. reactions.Items.Select(ReadReaction)] : [],
            node.Optional("note")?.Text);
    }

    private static double ReadFraction(DocumentNode? node)
    {
        double fraction = node?.Number() ?? 1;
        return fraction is > 0 and <= 1 ? fraction : throw DocumentException.BadValue(node!.At, "mass_fraction", node.Text, "above 0, at most 1");
    }

    private static ReactionEquation ReadReaction(DocumentNode node)
    {
        try
        {
            return ReactionEquation.Parse(node.Text);
        }
        catch (RequestException fault)
        {
            throw new DocumentException(node.At, fault.Message);
        }
    }
}
