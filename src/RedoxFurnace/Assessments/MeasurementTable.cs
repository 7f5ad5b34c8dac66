using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Assessments;

/// <summary>Measurements and priors of an adjustment, read from <c>measurements.yaml</c> or from a user's file of the same shape.</summary>
/// <param name="Measurements">In the order of the file.</param>
/// <param name="Priors">In the order of the file.</param>
/// <param name="Slopes">J/(mol O2 K) by product, to turn an error in kelvin into one in energy.</param>
public sealed record MeasurementTable(ImmutableArray<Measurement> Measurements, ImmutableArray<MeasurementPrior> Priors, ImmutableDictionary<string, double> Slopes)
{
    /// <summary>The table built in.</summary>
    /// <param name="database">Whose file; a file of that name in a user's folder comes first.</param>
    /// <returns>The table.</returns>
    /// <exception cref="DocumentException">It is wrong.</exception>
    public static MeasurementTable Of(SubstanceDatabase database) => Read(database.Document("measurements.yaml"), database);

    /// <summary>Reads a document.</summary>
    /// <param name="root">With <c>measurements</c> and, if it likes, <c>priors</c>.</param>
    /// <param name="database">Which must know the substances.</param>
    /// <returns>The table.</returns>
    /// <exception cref="DocumentException">It is wrong: unknown key or substance, an error of zero, a temperature outside the range.</exception>
    public static MeasurementTable Read(DocumentNode root, SubstanceDatabase database)
    {
        root.AllowOnly("measurements", "priors");
        ImmutableArray<Measurement> measurements = [.. root.Required("measurements").Items.Select(node => ReadMeasurement(node, database))];
        HashSet<string> ids = new(StringComparer.Ordinal);
        foreach (Measurement measurement in measurements.Where(measurement => !ids.Add(measurement.Id)))
        {
            throw new DocumentException(measurement.At, $"the measurement '{measurement.Id}' stands twice; give each its own id");
        }

        ImmutableArray<MeasurementPrior>.Builder priors = ImmutableArray.CreateBuilder<MeasurementPrior>();
        ImmutableDictionary<string, double>.Builder slopes = ImmutableDictionary.CreateBuilder<string, double>(StringComparer.Ordinal);
        foreach (DocumentNode node in root.Optional("priors")?.Items ?? [])
        {
            ReadPrior(node, database, priors, slopes);
        }

        return new MeasurementTable(measurements, priors.ToImmutable(), slopes.ToImmutable());
    }

    /// <summary>This table and a user's own measurements after it.</summary>
    /// <param name="own">The user's.</param>
    /// <returns>Both.</returns>
    /// <exception cref="DocumentException">An id stands in both.</exception>
    public MeasurementTable With(MeasurementTable own)
    {
        foreach (Measurement measurement in own.Measurements.Where(measurement => Measurements.Any(known => known.Id == measurement.Id)))
        {
            throw new DocumentException(measurement.At, $"the measurement '{measurement.Id}' is in the database already; choose another id");
        }

        return new MeasurementTable(
            [.. Measurements, .. own.Measurements],
            [.. Priors.Where(prior => !own.Priors.Any(other => other.Substance == prior.Substance && other.IsEntropy == prior.IsEntropy)), .. own.Priors],
            Slopes.SetItems(own.Slopes));
    }

    private static Measurement ReadMeasurement(DocumentNode node, SubstanceDatabase database)
    {
        node.AllowOnly("id", "couple", "reactant", "product", "potential_j_per_mol_o2", "point", "range_k", "error", "provenance", "source", "use", "t_fit_k", "t_evidence_k", "note");
        string reactant = Known(node.Required("reactant"), database);
        string product = Known(node.Required("product"), database);
        (MeasurementKind kind, double[] potential, DocumentNode? point) = ReadStatement(node);
        (double error, string errorUnit) = ReadError(node.Required("error"), kind);
        bool isFit = node.Required("use").Text switch
        {
            "fit" => true,
            "evidence" => false,
            { } other => throw DocumentException.BadValue(node.Required("use").At, "use", other, "allowed: fit, evidence"),
        };
        ImmutableArray<double> fit = Temperatures(node, "t_fit_k");
        ImmutableArray<double> evidence = Temperatures(node, "t_evidence_k");
        CheckTemperatures(node, isFit, fit, evidence);
        return new Measurement(
            node.Required("id").Text,
            node.Required("couple").Text,
            reactant,
            product,
            kind,
            [.. potential],
            point?.Required("value").Number() ?? 0,
            point?.Optional("po2_bar")?.Number() ?? 1,
            point?.Optional("phases") is { } phases ? [.. phases.Items.Select(phase => Known(phase, database))] : [],
            error,
            errorUnit,
            node.Required("provenance").Text,
            node.Required("source").Text,
            isFit,
            fit,
            evidence,
            node.Optional("note")?.Text,
            node.At);
    }

    private static (MeasurementKind Kind, double[] Potential, DocumentNode? Point) ReadStatement(DocumentNode node)
    {
        if (node.Optional("potential_j_per_mol_o2") is { } line)
        {
            line.AllowOnly("constant", "t", "t_ln_t", "t_squared");
            return (MeasurementKind.Potential, [line.Required("constant").Number(), line.Required("t").Number(), line.Optional("t_ln_t")?.Number() ?? 0, line.Optional("t_squared")?.Number() ?? 0], null);
        }

        DocumentNode point = node.Required("point");
        point.AllowOnly("kind", "value", "t_k", "po2_bar", "phases");
        MeasurementKind kind = point.Required("kind").Text switch
        {
            "gas-ratio-h2" => MeasurementKind.GasRatioHydrogen,
            "gas-ratio-co" => MeasurementKind.GasRatioMonoxide,
            "temperature-at-po2" => MeasurementKind.TemperatureAtPressure,
            "invariant-temperature" => MeasurementKind.InvariantTemperature,
            "gibbs-of-formation" => MeasurementKind.GibbsOfFormation,
            "reaction-enthalpy" => MeasurementKind.ReactionEnthalpy,
            { } other => throw DocumentException.BadValue(point.Required("kind").At, "kind", other, "allowed: gas-ratio-h2, gas-ratio-co, temperature-at-po2, invariant-temperature, gibbs-of-formation, reaction-enthalpy"),
        };
        if (kind is MeasurementKind.GasRatioHydrogen or MeasurementKind.GasRatioMonoxide or MeasurementKind.TemperatureAtPressure && point.Required("value").Number() <= 0)
        {
            throw DocumentException.BadValue(point.Required("value").At, "value", point.Required("value").Text, "a ratio or a temperature is above 0");
        }

        if (point.Optional("po2_bar") is { } pressure && pressure.Number() <= 0)
        {
            throw DocumentException.BadValue(pressure.At, "po2_bar", pressure.Text, "a pressure is above 0");
        }

        if (kind == MeasurementKind.InvariantTemperature && point.Required("phases").Items.Count != 3)
        {
            throw DocumentException.BadValue(point.Required("phases").At, "phases", "(list)", "name three phases by rising oxygen");
        }

        return (kind, [], point);
    }

    private static (double Error, string Unit) ReadError(DocumentNode node, MeasurementKind kind)
    {
        node.AllowOnly("value", "unit");
        DocumentNode value = node.Required("value");
        if (value.Number() <= 0)
        {
            throw DocumentException.BadValue(value.At, "error", value.Text, "an error is above 0 (k = 2): a measurement without error would outweigh all others");
        }

        string unit = node.Required("unit").Text;
        string wanted = kind switch
        {
            MeasurementKind.GasRatioHydrogen or MeasurementKind.GasRatioMonoxide => "%",
            MeasurementKind.TemperatureAtPressure or MeasurementKind.InvariantTemperature => "K",
            _ => "kJ/mol O2",
        };
        return unit == wanted ? (value.Number(), unit) : throw DocumentException.BadValue(node.Required("unit").At, "unit", unit, $"here '{wanted}'");
    }

    private static void CheckTemperatures(DocumentNode node, bool isFit, ImmutableArray<double> fit, ImmutableArray<double> evidence)
    {
        if (isFit != fit.Length > 0 || (!isFit && evidence.IsEmpty))
        {
            throw new DocumentException(node.At, isFit ? "a measurement with use: fit needs t_fit_k" : "a measurement with use: evidence has t_evidence_k and no t_fit_k");
        }

        if (node.Optional("range_k") is { } range)
        {
            double[] ends = range.Numbers(2);
            foreach (double kelvin in fit.Concat(evidence).Where(kelvin => kelvin < ends[0] - 0.1 || kelvin > ends[1] + 0.1))
            {
                throw new DocumentException(range.At, FormattableString.Invariant($"{kelvin} K lies outside the measured range {ends[0]} to {ends[1]} K; drop it"));
            }
        }
    }

    private static ImmutableArray<double> Temperatures(DocumentNode node, string key)
        => node.Optional(key) is { } list ? [.. list.Items.Select(item => item.Number() > 0 ? item.Number() : throw DocumentException.BadValue(item.At, key, item.Text, "kelvin, above 0"))] : [];

    private static string Known(DocumentNode node, SubstanceDatabase database)
        => database.TryGet(node.Text)?.Id ?? throw DocumentException.BadValue(node.At, "substance", node.Text, "it is not in the database; add an entry of it first");

    private static void ReadPrior(DocumentNode node, SubstanceDatabase database, ImmutableArray<MeasurementPrior>.Builder priors, ImmutableDictionary<string, double>.Builder slopes)
    {
        node.AllowOnly("substance", "quantity", "value", "unit", "error_k2", "source", "treatment");
        string substance = Known(node.Required("substance"), database);
        double? value = node.Optional("value")?.Number();
        string quantity = node.Required("quantity").Text;
        if (quantity == "slope-of-point")
        {
            slopes[substance] = node.Required("value").Number();
            return;
        }

        if (quantity is not ("enthalpy-298" or "entropy-298"))
        {
            throw DocumentException.BadValue(node.Required("quantity").At, "quantity", quantity, "allowed: enthalpy-298, entropy-298, slope-of-point");
        }

        double? error = node.Optional("error_k2")?.Number();
        if (error <= 0)
        {
            throw DocumentException.BadValue(node.Required("error_k2").At, "error_k2", node.Required("error_k2").Text, "an error is above 0");
        }

        string treatment = node.Required("treatment").Text;
        priors.Add(new MeasurementPrior(substance, quantity == "entropy-298", value, error, node.Optional("source")?.Text, treatment.StartsWith("free", StringComparison.Ordinal), treatment));
    }
}
