using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Substances;

/// <summary>Turns the entries of a database file into checked substances.</summary>
internal sealed class SubstanceReader(IReadOnlyDictionary<SubstanceClass, ClassDefault> defaults, Func<string, bool> knowsSource, Func<string, Substance> find, bool isOverlay)
{
    /// <summary>All substances of a file.</summary>
    public IReadOnlyList<Substance> Read(DocumentNode root)
    {
        root.AllowOnly("element", "name", "substances");
        if (root.Optional("element") is { } element && !AtomicWeights.Has(element.Text))
        {
            throw DocumentException.BadValue(element.At, "element", element.Text, "write an element symbol");
        }

        return [.. root.Required("substances").Items.Select(ReadSubstance)];
    }

    private Substance ReadSubstance(DocumentNode node)
    {
        node.AllowOnly("formula", "name", "also", "class", "group", "uncertainty", "assessed", "phases");
        DocumentNode formulaNode = node.Required("formula");
        Formula formula = Formula.TryParse(formulaNode.Text, out Formula? parsed)
            ? parsed
            : throw DocumentException.BadValue(formulaNode.At, "formula", formulaNode.Text, "write element symbols with numbers, such as Cr2O3 or Mg(g)");
        SubstanceClass kind = ReadClass(node.Required("class"));
        Assessment? assessment = node.Optional("assessed") is { } assessed ? ReadAssessment(assessed) : null;
        double enthalpyShift = (assessment?.EnthalpyKilojoules?.Shift ?? 0) * 1000;
        double entropyShift = assessment?.EntropyJoules?.Shift ?? 0;
        IReadOnlyList<DocumentNode> phaseNodes = node.Required("phases").Items;
        if (phaseNodes.Count == 0)
        {
            throw DocumentException.BadValue(node.KeyMark("phases"), "phases", "(none)", "give at least one phase");
        }

        ImmutableArray<Phase> phases = [.. phaseNodes.Select(phase => ReadPhase(phase, formula, enthalpyShift, entropyShift))];
        return new Substance(
            formula,
            node.Optional("name")?.Text,
            node.Optional("also") is { } also ? [.. also.Items.Select(item => item.Text)] : [],
            kind,
            node.Optional("group")?.Text,
            ReadUncertainty(node.Optional("uncertainty"), kind, formula),
            assessment,
            phases,
            isOverlay,
            node.At);
    }

    private static SubstanceClass ReadClass(DocumentNode node) => node.Text switch
    {
        "element" => SubstanceClass.Element,
        "oxide" => SubstanceClass.Oxide,
        "compound-oxide" => SubstanceClass.CompoundOxide,
        "carbide" => SubstanceClass.Carbide,
        "nitride" => SubstanceClass.Nitride,
        "gas" => SubstanceClass.Gas,
        "other" => SubstanceClass.Other,
        _ => throw DocumentException.BadValue(node.At, "class", node.Text, "allowed: element, oxide, compound-oxide, carbide, nitride, gas, other"),
    };

    internal static SubstanceClass ClassOf(DocumentNode node) => ReadClass(node);

    private ExpandedUncertainty ReadUncertainty(DocumentNode? node, SubstanceClass kind, Formula formula)
    {
        ClassDefault fallback = defaults[kind];
        if (node is null)
        {
            double enthalpy = fallback.Enthalpy(formula);
            return new ExpandedUncertainty(enthalpy, fallback.Entropy(formula), enthalpy, true, true, null, fallback.Reason);
        }

        node.AllowOnly("enthalpy_kj_per_mol", "entropy_j_per_mol_k", "heat_kj_per_mol", "source", "note");
        double given = Positive(node.Required("enthalpy_kj_per_mol"), "enthalpy_kj_per_mol") * 1000;
        double? entropy = node.Optional("entropy_j_per_mol_k") is { } entropyNode ? Positive(entropyNode, "entropy_j_per_mol_k") : null;
        double? heat = node.Optional("heat_kj_per_mol") is { } heatNode ? Positive(heatNode, "heat_kj_per_mol") * 1000 : null;
        return new ExpandedUncertainty(
            given,
            entropy ?? fallback.Entropy(formula),
            heat ?? given,
            false,
            entropy is null,
            Source(node.Required("source")),
            node.Optional("note")?.Text);
    }

    private static double Positive(DocumentNode node, string key)
    {
        double value = node.Number();
        return value >= 0 ? value : throw DocumentException.BadValue(node.At, key, node.Text, "an uncertainty is 0 or more");
    }

    private string Source(DocumentNode node)
        => knowsSource(node.Text) ? node.Text : throw DocumentException.BadValue(node.At, "source", node.Text, "add it to sources.yaml with its citation");

    private static Assessment ReadAssessment(DocumentNode node)
    {
        node.AllowOnly("enthalpy_298_kj_per_mol", "entropy_298_j_per_mol_k", "provenance", "measurements", "reason");
        return new Assessment(
            ReadAssessed(node.Optional("enthalpy_298_kj_per_mol")),
            ReadAssessed(node.Optional("entropy_298_j_per_mol_k")),
            node.Optional("provenance")?.Text,
            node.Optional("measurements") is { } list ? [.. list.Items.Select(item => item.Text)] : [],
            node.Required("reason").Text);
    }

    private static AssessedValue? ReadAssessed(DocumentNode? node)
    {
        if (node is null)
        {
            return null;
        }

        node.AllowOnly("raw", "value");
        return new AssessedValue(node.Required("raw").Number(), node.Required("value").Number());
    }

    private Phase ReadPhase(DocumentNode node, Formula formula, double enthalpyShift, double entropyShift)
    {
        string model = node.Required("model").Text;
        string[] own = model switch
        {
            "nasa9" or "line" => ["pieces"],
            "heat-capacity" => ["range_k", "enthalpy_298_kj_per_mol", "entropy_298_j_per_mol_k", "cp_j_per_mol_k"],
            "anchor" => ["range_k"],
            _ => throw DocumentException.BadValue(node.Required("model").At, "model", model, "allowed: nasa9, heat-capacity, line, anchor"),
        };
        node.AllowOnly(["label", "state", "model", "source", "provenance", "note", "gap_after", .. own]);
        ImmutableArray<PhaseModel> models = model switch
        {
            "nasa9" => [.. node.Required("pieces").Items.Select(piece => ReadNasa(piece, enthalpyShift, entropyShift))],
            "line" => [.. node.Required("pieces").Items.Select(piece => ReadLine(piece, formula))],
            "heat-capacity" => [ReadHeatCapacity(node, enthalpyShift, entropyShift)],
            _ => [new AnchorModel(ReadRange(node.Required("range_k")))],
        };
        if (models.Length == 0)
        {
            throw DocumentException.BadValue(node.KeyMark("pieces"), "pieces", "(none)", "give at least one piece");
        }

        CheckPieces(node, models);
        return new Phase(
            node.Required("label").Text,
            ReadState(node.Required("state")),
            models,
            Source(node.Required("source")),
            node.Optional("note")?.Text,
            node.Optional("provenance")?.Text,
            node.Optional("gap_after")?.Truth() ?? false,
            node.At);
    }

    private static void CheckPieces(DocumentNode node, ImmutableArray<PhaseModel> models)
    {
        for (int i = 1; i < models.Length; i++)
        {
            if (models[i].Range.LowKelvin != models[i - 1].Range.HighKelvin)
            {
                throw new DocumentException(
                    node.Required("pieces").Items[i].At,
                    FormattableString.Invariant($"this piece starts at {models[i].Range.LowKelvin} K, the one before ends at {models[i - 1].Range.HighKelvin} K; make them meet"));
            }
        }
    }

    private static MatterState ReadState(DocumentNode node) => node.Text switch
    {
        "solid" => MatterState.Solid,
        "liquid" => MatterState.Liquid,
        "gas" => MatterState.Gas,
        _ => throw DocumentException.BadValue(node.At, "state", node.Text, "allowed: solid, liquid, gas"),
    };

    private static TemperatureRange ReadRange(DocumentNode node)
    {
        double[] ends = node.Numbers(2);
        return ends[0] > 0 && ends[1] > ends[0]
            ? new TemperatureRange(ends[0], ends[1])
            : throw DocumentException.BadValue(node.At, "range_k", FormattableString.Invariant($"[{ends[0]}, {ends[1]}]"), "write [low, high] in kelvin with 0 < low < high");
    }

    private static NasaPolynomial ReadNasa(DocumentNode node, double enthalpyShift, double entropyShift)
    {
        node.AllowOnly("range_k", "a", "b");
        return new NasaPolynomial(ReadRange(node.Required("range_k")), node.Required("a").Numbers(7), node.Required("b").Numbers(2), enthalpyShift, entropyShift);
    }

    private static HeatCapacityPolynomial ReadHeatCapacity(DocumentNode node, double enthalpyShift, double entropyShift)
    {
        DocumentNode cp = node.Required("cp_j_per_mol_k");
        cp.AllowOnly("a", "b", "c", "d", "e");
        return new HeatCapacityPolynomial(
            ReadRange(node.Required("range_k")),
            (node.Required("enthalpy_298_kj_per_mol").Number() * 1000) + enthalpyShift,
            node.Required("entropy_298_j_per_mol_k").Number() + entropyShift,
            cp.Required("a").Number(),
            cp.Optional("b")?.Number() ?? 0,
            cp.Optional("c")?.Number() ?? 0,
            cp.Optional("d")?.Number() ?? 0,
            cp.Optional("e")?.Number() ?? 0);
    }

    private ReactionLine ReadLine(DocumentNode node, Formula target)
    {
        node.AllowOnly("range_k", "reaction", "gibbs_j", "uncertainty_kj");
        DocumentNode reaction = node.Required("reaction");
        ReactionEquation equation = ReadEquation(reaction);
        double coefficient = equation.Terms.Where(term => term.Name == target.Text).Sum(term => term.Number);
        if (coefficient == 0)
        {
            throw DocumentException.BadValue(reaction.At, "reaction", reaction.Text, $"it must contain {target.Text}, which it defines");
        }

        double imbalance = equation.LargestImbalance(name => Formula.TryParse(name, out Formula? formula)
            ? formula
            : throw DocumentException.BadValue(reaction.At, "formula", name, "write element symbols with numbers"));
        if (imbalance > 1e-6)
        {
            throw DocumentException.BadValue(reaction.At, "reaction", reaction.Text, FormattableString.Invariant($"it is not balanced (off by {imbalance:0.####} atoms)"));
        }

        double[] line = node.Required("gibbs_j").Numbers(2);
        double expanded = Positive(node.Required("uncertainty_kj"), "uncertainty_kj") * 1000;
        return new ReactionLine(ReadRange(node.Required("range_k")), equation.Text, line[0], line[1], coefficient, expanded, () => Partners(equation, target, coefficient));
    }

    private static ReactionEquation ReadEquation(DocumentNode node)
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

    private IReadOnlyList<LinePartner> Partners(ReactionEquation equation, Formula target, double coefficient)
        => [.. equation.Terms.Where(term => term.Name != target.Text).Select(term => new LinePartner(find(term.Name), -term.Number / coefficient))];
}
