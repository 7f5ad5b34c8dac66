using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Campaigns;

/// <summary>Reads a campaign sheet, strictly: an unknown key, a wrong unit or an unknown substance is refused with its line and column.</summary>
internal sealed class CampaignSheetReader(SubstanceDatabase database)
{
    /// <summary>Larger sheets are refused unread.</summary>
    public const int MostCharacters = 200_000;

    private static readonly string[] StageKinds = ["purge", "heat", "soak", "cool", "unload"];
    private static readonly string[] ReadingKinds = ["frost", "dew", "moisture", "water", "probe", "co2"];
    private static readonly string[] Places = ["inlet", "furnace", "exit", "line"];

    /// <summary>Reads a sheet.</summary>
    /// <exception cref="DocumentException">Wrong, with file, line and column.</exception>
    public CampaignSheet Read(string yaml, string file)
    {
        if (yaml.Length > MostCharacters)
        {
            throw new DocumentException(new SourceMark(file, 1, 1), $"the sheet has {yaml.Length} characters, at most {MostCharacters} are read; that is no campaign sheet");
        }

        DocumentNode root = DocumentNode.Parse(yaml, file);
        root.AllowOnly("title", "document", "charge", "parts", "product", "reductants", "gas", "furnace", "programme", "limits", "prices");
        CampaignSheet sheet = new()
        {
            Title = root.Required("title").Text,
            Document = root.Optional("document") is { } document ? Document(document) : new CampaignDocument(),
            Charge = root.Optional("charge") is { } charge ? [.. charge.Items.Select(Item)] : [],
            Parts = root.Optional("parts") is { } parts ? Parts(parts) : null,
            Product = root.Optional("product") is { } product ? Product(product) : null,
            Reductants = root.Optional("reductants") is { } reductants ? [.. reductants.Items.Select(Offer)] : [],
            Gas = root.Optional("gas") is { } gas ? Gas(gas) : null,
            Furnace = root.Optional("furnace") is { } furnace ? Furnace(furnace) : new FurnaceSheet(),
            Programme = root.Optional("programme") is { } programme ? [.. programme.Items.Select(Stage)] : [],
            Limits = root.Optional("limits") is { } limits ? Limits(limits) : new SiteLimits(),
            Prices = root.Optional("prices") is { } prices ? Prices(prices) : new PriceSheet(),
        };
        Check(sheet, root);
        return sheet;
    }

    private static void Check(CampaignSheet sheet, DocumentNode root)
    {
        if (sheet.Charge.IsEmpty && sheet.Parts is null)
        {
            throw new DocumentException(root.At, "a campaign needs a charge or parts; add one of the two");
        }

        if (sheet.Programme.IsEmpty)
        {
            throw new DocumentException(root.At, "a campaign needs a programme; add at least one stage, such as '- { stage: soak, at: 1150C }'");
        }

        if (sheet.Limits.Highest is { } highest && sheet.Programme.FirstOrDefault(stage => stage.At > highest) is { } hot)
        {
            throw new DocumentException(hot.Mark, $"impossible programme: stage {hot.Kind} at {hot.At} is above the site limit of {highest}");
        }

        bool masses = sheet.Charge.Any(item => item.MassKilograms is not null);
        if (masses && sheet.Charge.FirstOrDefault(item => item.KilogramsPerHour is not null) is { } mixed)
        {
            throw new DocumentException(mixed.At, "masses and rates are mixed in one charge; give every substance a mass, or every one a rate");
        }

        if (sheet.Limits.MostFlow is { } most && sheet.Gas?.FlowNormalCubicMetres > most)
        {
            throw new DocumentException(sheet.Gas.At, FormattableString.Invariant($"the gas flow of {sheet.Gas.FlowNormalCubicMetres} Nm3/h is above the site limit of {most} Nm3/h"));
        }
    }

    private static CampaignDocument Document(DocumentNode node)
    {
        node.AllowOnly("number", "revision", "date", "prepared", "checked", "approved", "purpose");
        string Text(string key) => node.Optional(key)?.Text ?? "";
        return new CampaignDocument(Text("number"), Text("revision"), Text("date"), Text("prepared"), Text("checked"), Text("approved"), Text("purpose"));
    }

    private ChargeItem Item(DocumentNode node)
    {
        node.AllowOnly("substance", "mass", "rate", "purity", "moisture", "activity");
        DocumentNode name = node.Required("substance");
        Substance substance = Parsed(name, text => database.Get(text));
        double? mass = Optional(node, "mass", CampaignQuantities.Mass);
        double? rate = Optional(node, "rate", CampaignQuantities.MassRate);
        if (mass is not null && rate is not null)
        {
            throw new DocumentException(node.At, "give a mass or a rate, not both");
        }

        double purity = Optional(node, "purity", Share.Parse) ?? 1;
        double? moisture = Optional(node, "moisture", Share.Parse);
        return purity > 0
            ? new ChargeItem(substance, mass, rate, purity, moisture, node.Optional("activity") is { } activity ? Positive(activity) : null, node.At)
            : throw new DocumentException(node.KeyMark("purity"), "purity must be above 0");
    }

    private PartsSheet Parts(DocumentNode node)
    {
        node.AllowOnly("alloy", "coefficients", "keep-bright", "keep-oxidised", "steel", "carbon", "copper-holds-oxygen");
        string? alloy = node.Optional("alloy")?.Text;
        string? coefficients = node.Optional("coefficients")?.Text;
        if (alloy is not null)
        {
            Parsed(node.Required("alloy"), text => Alloy.Parse(text, coefficients, database));
        }

        if (node.Optional("steel") is { } steel)
        {
            Parsed(steel, SteelComposition.Parse);
        }

        if (alloy is null && node.Optional("steel") is null)
        {
            throw new DocumentException(node.At, "parts need an alloy or a steel; write alloy: \"Cr=18%,Ni=9%,Fe\" or steel: \"C=0.40%\"");
        }

        (double, double)? band = null;
        if (node.Optional("carbon") is { } carbon)
        {
            band = Parsed(carbon, text =>
            {
                int dots = text.IndexOf("..", StringComparison.Ordinal);
                return dots < 0
                    ? throw new RequestException($"carbon '{text}' is not a band; write 0.38%..0.43%")
                    : (CampaignQuantities.Percent(text[..dots], "carbon"), CampaignQuantities.Percent(text[(dots + 2)..], "carbon"));
            });
        }

        return new PartsSheet(
            alloy,
            coefficients,
            Names(node.Optional("keep-bright")),
            Names(node.Optional("keep-oxidised")),
            node.Optional("steel")?.Text,
            band,
            node.Optional("copper-holds-oxygen")?.Truth(),
            node.At);
    }

    private static ImmutableArray<string> Names(DocumentNode? node) => node is null ? []
        : node.IsList ? [.. node.Items.Select(item => item.Text)]
        : [.. node.Text.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries)];

    private static ProductSheet Product(DocumentNode node)
    {
        node.AllowOnly("metal", "carbon-at-most", "oxygen-at-most", "nitrogen-at-most", "residual-oxide-at-most");
        DocumentNode metal = node.Required("metal");
        if (!AtomicWeights.Has(metal.Text))
        {
            throw new DocumentException(metal.At, RequestException.UnknownWord("metal", metal.Text, AtomicWeights.Symbols).Message);
        }

        return new ProductSheet(
            metal.Text,
            Optional(node, "carbon-at-most", CampaignQuantities.Percent),
            Optional(node, "oxygen-at-most", CampaignQuantities.Percent),
            Optional(node, "nitrogen-at-most", CampaignQuantities.Percent),
            Optional(node, "residual-oxide-at-most", CampaignQuantities.Percent));
    }

    private ReductantOffer Offer(DocumentNode node)
    {
        node.AllowOnly("name", "price", "mass");
        string name = Parsed(node.Required("name"), text => ReductantCatalogue.Of(database).Get(text)).Id;
        return new ReductantOffer(name, Optional(node, "price", (text, what) => CampaignQuantities.Price(text, what, "kg")), Optional(node, "mass", CampaignQuantities.Mass), node.At);
    }

    private GasSheet Gas(DocumentNode node)
    {
        node.AllowOnly("preset", "analysis", "flow", "price", "readings");
        string? preset = node.Optional("preset") is { } name ? Parsed(name, text => GeneratorGas.Get(text, database)).Id : null;
        if (node.Optional("analysis") is { } analysis)
        {
            Parsed(analysis, text => GasAnalysis.Parse(text, Pressure.FromBar(PhysicalConstants.AtmosphereInBar)));
        }
        else if (preset is null)
        {
            throw new DocumentException(node.At, "gas needs an analysis or a preset; write analysis: \"H2 75%, N2 25%, frost -50C\" or preset: endothermic");
        }

        return new GasSheet(
            preset,
            node.Optional("analysis")?.Text,
            Optional(node, "flow", CampaignQuantities.Flow),
            Optional(node, "price", (text, what) => CampaignQuantities.Price(text, what, "Nm3")),
            node.Optional("readings") is { } readings ? [.. readings.Items.Select(Reading)] : [],
            node.At);
    }

    private static ReadingSheet Reading(DocumentNode node)
    {
        node.AllowOnly([.. ReadingKinds, "place", "pressure", "probe-temperature"]);
        KeyValuePair<string, DocumentNode>[] given = [.. node.Entries.Where(entry => ReadingKinds.Contains(entry.Key))];
        if (given.Length != 1)
        {
            throw new DocumentException(node.At, $"a reading is one of {string.Join(", ", ReadingKinds)}; found {given.Length}");
        }

        (string kind, DocumentNode value) = given[0];
        string place = node.Optional("place")?.Text ?? "";
        if (place.Length > 0 && !Places.Contains(place))
        {
            throw new DocumentException(node.KeyMark("place"), RequestException.UnknownWord("place", place, Places).Message);
        }

        Temperature? probe = node.Optional("probe-temperature") is { } at ? Parsed(at, text => Temperature.Parse(text, "probe-temperature")) : null;
        if (kind == "probe" && probe is null)
        {
            throw new DocumentException(node.At, "a probe reading needs probe-temperature: millivolts mean nothing without the temperature of the cell");
        }

        Parsed(value, text => kind switch
        {
            "probe" => NumberWithUnit.Parse(text, kind, "a voltage such as 1120mV").Value,
            "co2" => Share.Parse(text, kind),
            "water" => WaterReading.Parse("H2O", text).Value,
            _ => WaterReading.Parse(kind, text).Value,
        });
        return new ReadingSheet(
            kind,
            value.Text,
            place,
            node.Optional("pressure") is { } pressure ? Parsed(pressure, text => WaterReading.LinePressure(text, "pressure")) : null,
            probe,
            node.At);
    }

    private FurnaceSheet Furnace(DocumentNode node)
    {
        node.AllowOnly("pressure", "leak", "leak-up", "work-area", "lining", "crucible", "fixtures");
        ImmutableArray<string> Known(string key)
        {
            DocumentNode? list = node.Optional(key);
            return list is null ? [] : list.IsList ? [.. list.Items.Select(Material)] : [Material(list)];
        }

        return new FurnaceSheet
        {
            Pressure = Optional<Pressure>(node, "pressure", Pressure.Parse),
            LeakNormalCubicMetres = Optional(node, "leak", CampaignQuantities.Flow),
            LeakUpPascalCubicMetresPerSecond = Optional(node, "leak-up", CampaignQuantities.LeakUp),
            WorkArea = Optional(node, "work-area", CampaignQuantities.Area),
            Lining = Known("lining"),
            Crucible = node.Optional("crucible") is { } crucible ? Material(crucible) : null,
            Fixtures = Known("fixtures"),
        };
    }

    /// <summary>Linings may be mixtures without data (mullite, fireclay): their names stay, and the check says no data.</summary>
    private static string Material(DocumentNode node) => node.Text.Trim();

    private StageSheet Stage(DocumentNode node)
    {
        node.AllowOnly("stage", "at", "hold", "rate", "gas", "pressure");
        DocumentNode kind = node.Required("stage");
        if (!StageKinds.Contains(kind.Text))
        {
            throw new DocumentException(kind.At, RequestException.UnknownWord("stage", kind.Text, StageKinds).Message);
        }

        if (node.Optional("gas") is { } gas)
        {
            Parsed(gas, text => StageGas.Parse(text, database, Pressure.FromBar(PhysicalConstants.AtmosphereInBar)));
        }

        return new StageSheet(
            kind.Text,
            Parsed(node.Required("at"), text => Temperature.Parse(text, "at")),
            Optional(node, "hold", CampaignQuantities.Hours),
            Optional(node, "rate", CampaignQuantities.Rate),
            node.Optional("gas")?.Text,
            Optional<Pressure>(node, "pressure", Pressure.Parse),
            node.At);
    }

    private static SiteLimits Limits(DocumentNode node)
    {
        node.AllowOnly("highest-temperature", "least-pressure", "most-flow");
        return new SiteLimits(
            Optional<Temperature>(node, "highest-temperature", Temperature.Parse),
            Optional<Pressure>(node, "least-pressure", Pressure.Parse),
            Optional(node, "most-flow", CampaignQuantities.Flow));
    }

    private static PriceSheet Prices(DocumentNode node)
    {
        node.AllowOnly("currency", "energy");
        return new PriceSheet(node.Optional("currency")?.Text ?? "EUR", Optional(node, "energy", (text, what) => CampaignQuantities.Price(text, what, "kWh")));
    }

    private static double Positive(DocumentNode node) => node.Number() is > 0 and var value ? value : throw new DocumentException(node.At, $"'{node.Text}' must be above 0");

    private static T? Optional<T>(DocumentNode node, string key, Func<string, string, T> parse)
        where T : struct => node.Optional(key) is { } value ? Parsed(value, text => parse(text, key)) : null;

    private static T Parsed<T>(DocumentNode node, Func<string, T> parse)
    {
        try
        {
            return parse(node.Text);
        }
        catch (RequestException fault)
        {
            throw new DocumentException(node.At, fault.Message);
        }
    }
}
