using System.Collections.Immutable;
using System.Reflection;
using System.Security.Cryptography;
using System.Text;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Substances;

/// <summary>The substances of the files embedded at build time, overlaid by a user's own entries. Element files are read when first needed.</summary>
/// <remarks>Safe to use from several threads.</remarks>
public sealed class SubstanceDatabase
{
    private const string Gases = "gases.yaml";
    private const string Compounds = "compounds.yaml";
    private const string SourcesFile = "sources.yaml";
    private const string DefaultsFile = "defaults.yaml";
    private const string CovarianceFile = "covariance.yaml";
    private const string ResourcePrefix = "oxides/";

    private static readonly ImmutableHashSet<string> OtherFiles =
        [SourcesFile, DefaultsFile, "reductants.yaml", "linings.yaml", "safety.yaml", "measurements.yaml", "covariance.yaml", "generator-gases.yaml"];

    private static readonly Lazy<SubstanceDatabase> BundledDatabase = new(() => new SubstanceDatabase([]));

    private readonly Lock _gate = new();
    private readonly ImmutableDictionary<string, Func<string>> _bundledFiles;
    private readonly ImmutableArray<DatabaseFile> _overlayFiles;
    private readonly Dictionary<string, Substance> _substances = new(StringComparer.Ordinal);
    private readonly Dictionary<string, Substance> _names = new(StringComparer.Ordinal);
    private readonly HashSet<string> _read = new(StringComparer.Ordinal);
    private readonly Dictionary<SubstanceClass, ClassDefault> _defaults = [];
    private readonly Dictionary<string, Citation> _sources = new(StringComparer.Ordinal);
    private readonly Lazy<string> _hash;
    private readonly Lazy<EnthalpyCovariance?> _covariance;
    private bool _allRead;

    private SubstanceDatabase(ImmutableArray<DatabaseFile> overlayFiles)
    {
        _overlayFiles = overlayFiles;
        Assembly assembly = typeof(SubstanceDatabase).Assembly;
        _bundledFiles = assembly.GetManifestResourceNames()
            .Where(name => name.StartsWith(ResourcePrefix, StringComparison.Ordinal))
            .ToImmutableDictionary(name => name[ResourcePrefix.Length..], name => (Func<string>)(() => ReadResource(assembly, name)), StringComparer.Ordinal);
        _hash = new Lazy<string>(ComputeHash);
        _covariance = new Lazy<EnthalpyCovariance?>(ReadCovariance);
        ReadDefaults(Document(DefaultsFile));
        ReadSources(Document(SourcesFile));
        foreach (DatabaseFile file in overlayFiles)
        {
            if (file.Name == SourcesFile)
            {
                ReadSources(DocumentNode.Parse(file.Text, file.Name));
            }
        }

        foreach (DatabaseFile file in overlayFiles.Where(file => !OtherFiles.Contains(file.Name)))
        {
            Add(DocumentNode.Parse(file.Text, file.Name), isOverlay: true);
        }
    }

    /// <summary>The database as built into the program.</summary>
    public static SubstanceDatabase Bundled => BundledDatabase.Value;

    /// <summary>Names of the files built in, in alphabetical order.</summary>
    public IReadOnlyList<string> FileNames => [.. _bundledFiles.Keys.Order(StringComparer.Ordinal)];

    /// <summary>SHA-256 over the names and texts of all files, overlay included, as 64 hexadecimal digits: two results with one hash rest on the same data.</summary>
    public string Hash => _hash.Value;

    /// <summary>Covariance of the entries an assessment weighed together, or null. A user's own entry is independent of the others and counts with its own uncertainty.</summary>
    public EnthalpyCovariance? Covariance => _covariance.Value;

    /// <summary>Whether a user's own entries are laid over the built-in ones.</summary>
    public bool HasOverlay => !_overlayFiles.IsEmpty;

    /// <summary>Class defaults of uncertainty.</summary>
    public IReadOnlyDictionary<SubstanceClass, ClassDefault> ClassDefaults => _defaults;

    /// <summary>All citations by key.</summary>
    public IReadOnlyDictionary<string, Citation> Sources => _sources;

    /// <summary>Every substance, in alphabetical order of its formula. Reads all files.</summary>
    public IReadOnlyList<Substance> All
    {
        get
        {
            lock (_gate)
            {
                ReadAll();
                return [.. _substances.Values.OrderBy(substance => substance.Id, StringComparer.Ordinal)];
            }
        }
    }

    /// <summary>The built-in database with a user's own entries added or put in place of built-in ones.</summary>
    /// <param name="files">YAML files of the user's folder, in the same shape as the built-in ones.</param>
    /// <returns>The overlaid database.</returns>
    /// <exception cref="DocumentException">An entry is wrong.</exception>
    public static SubstanceDatabase WithOverlay(IEnumerable<DatabaseFile> files) => new([.. files.OrderBy(file => file.Name, StringComparer.Ordinal)]);

    /// <summary>A substance by formula, mineral or trade name.</summary>
    /// <param name="name">Such as <c>Cr2O3</c>, <c>wustite</c>, <c>Mg(g)</c>.</param>
    /// <returns>The substance.</returns>
    /// <exception cref="RequestException">Unknown; the nearest name is offered.</exception>
    public Substance Get(string name) => TryGet(name) ?? throw RequestException.UnknownWord("substance", name, Names());

    /// <summary>A substance by formula or name, or null.</summary>
    /// <param name="name">As written.</param>
    /// <returns>The substance or null.</returns>
    public Substance? TryGet(string name)
    {
        lock (_gate)
        {
            if (Known(name) is { } known)
            {
                return known;
            }

            if (Formula.TryParse(name, out Formula? formula))
            {
                ReadFilesFor(formula);
                if (Known(name) is { } found)
                {
                    return found;
                }
            }

            ReadAll();
            return Known(name);
        }
    }

    /// <summary>Condensed oxides of one element, by rising oxygen per atom of it.</summary>
    /// <param name="element">Symbol.</param>
    /// <returns>Oxides, none when the database has none.</returns>
    public IReadOnlyList<Substance> OxidesOf(string element)
    {
        lock (_gate)
        {
            ReadFile(element + ".yaml");
            return [.. _substances.Values
                .Where(substance => !substance.IsGas && IsOxideOf(substance.Formula, element))
                .OrderBy(substance => substance.Formula.Of("O") / substance.Formula.Of(element))
                .ThenBy(substance => substance.Id, StringComparer.Ordinal)];
        }
    }

    /// <summary>All substances whose elements all lie in a set.</summary>
    /// <param name="elements">Symbols.</param>
    /// <returns>In alphabetical order of formula.</returns>
    public IReadOnlyList<Substance> MadeOf(IReadOnlySet<string> elements)
    {
        lock (_gate)
        {
            ReadFile(Gases);
            ReadFile(Compounds);
            foreach (string element in elements)
            {
                ReadFile(element + ".yaml");
            }

            return [.. _substances.Values.Where(substance => substance.Formula.Atoms.Keys.All(elements.Contains)).OrderBy(substance => substance.Id, StringComparer.Ordinal)];
        }
    }

    /// <summary>The condensed element, or null.</summary>
    /// <param name="element">Symbol.</param>
    /// <returns>The substance or null.</returns>
    public Substance? Metal(string element) => TryGet(element) is { IsGas: false } metal ? metal : null;

    /// <summary>The monatomic vapour of an element, or null.</summary>
    /// <param name="element">Symbol.</param>
    /// <returns>The substance or null.</returns>
    public Substance? Vapour(string element)
    {
        lock (_gate)
        {
            ReadFile(element + ".yaml");
            return Known(element + "(g)");
        }
    }

    /// <summary>The text of a built-in file that does not hold substances, such as <c>reductants.yaml</c>; a file of the same name in the overlay comes first.</summary>
    /// <param name="fileName">Its name.</param>
    /// <returns>The document.</returns>
    public DocumentNode Document(string fileName)
    {
        DatabaseFile? own = _overlayFiles.FirstOrDefault(file => file.Name == fileName && fileName is not (SourcesFile or DefaultsFile));
        return own is not null
            ? DocumentNode.Parse(own.Text, own.Name)
            : DocumentNode.Parse(_bundledFiles[fileName](), ResourcePrefix + fileName);
    }

    /// <summary>Whether a built-in or overlaid file exists.</summary>
    /// <param name="fileName">Its name.</param>
    /// <returns>True when it does.</returns>
    public bool HasDocument(string fileName) => _bundledFiles.ContainsKey(fileName) || _overlayFiles.Any(file => file.Name == fileName);

    /// <summary>Reads every built-in file of substances on its own, so that an examiner can gather every fault instead of stopping at the first.</summary>
    /// <returns>The faults found, in the order of the files.</returns>
    internal IReadOnlyList<DocumentException> ReadEachFile()
    {
        List<DocumentException> faults = [];
        lock (_gate)
        {
            foreach (string file in FileNames.Where(name => !OtherFiles.Contains(name)))
            {
                try
                {
                    ReadFile(file);
                }
                catch (DocumentException fault)
                {
                    faults.Add(fault);
                }
            }
        }

        return faults;
    }

    /// <summary>Every name a request may use.</summary>
    /// <returns>Formulas and names.</returns>
    public IReadOnlyCollection<string> Names()
    {
        lock (_gate)
        {
            ReadAll();
            return [.. _substances.Keys.Concat(_names.Keys)];
        }
    }

    private static bool IsOxideOf(Formula formula, string element)
        => formula.Atoms.Count == 2 && formula.Of("O") > 0 && formula.Of(element) > 0;

    private static string ReadResource(Assembly assembly, string name)
    {
        using StreamReader reader = new(assembly.GetManifestResourceStream(name)!, Encoding.UTF8);
        return reader.ReadToEnd();
    }

    private Substance? Known(string name) => _substances.GetValueOrDefault(name) ?? _names.GetValueOrDefault(name);

    private void ReadFilesFor(Formula formula)
    {
        ReadFile(Gases);
        if (formula.Atoms.Count > 1)
        {
            ReadFile(Compounds);
        }

        foreach (string element in formula.Atoms.Keys)
        {
            ReadFile(element + ".yaml");
        }
    }

    private void ReadAll()
    {
        if (!_allRead)
        {
            foreach (string file in FileNames.Where(name => !OtherFiles.Contains(name)))
            {
                ReadFile(file);
            }

            _allRead = true;
        }
    }

    private void ReadFile(string fileName)
    {
        if (_read.Add(fileName) && _bundledFiles.TryGetValue(fileName, out Func<string>? text))
        {
            Add(DocumentNode.Parse(text(), ResourcePrefix + fileName), isOverlay: false);
        }
    }

    private void Add(DocumentNode root, bool isOverlay)
    {
        SubstanceReader reader = new(_defaults, _sources.ContainsKey, Get, isOverlay);
        foreach (Substance substance in reader.Read(root))
        {
            if (_substances.TryGetValue(substance.Id, out Substance? earlier))
            {
                // An overlay is read first and stands in place of the built-in entry of the same formula.
                if (earlier.IsFromOverlay && !isOverlay)
                {
                    continue;
                }

                throw new DocumentException(substance.EntryMark, $"'{substance.Id}' is defined twice, first at {earlier.EntryMark}; keep one");
            }

            _substances.Add(substance.Id, substance);
            AddNames(substance);
        }
    }

    private void AddNames(Substance substance)
    {
        foreach (string name in substance.OtherNames.Append(substance.Name).OfType<string>())
        {
            if (_names.TryGetValue(name, out Substance? earlier) && !ReferenceEquals(earlier, substance))
            {
                throw new DocumentException(substance.EntryMark, $"the name '{name}' already belongs to {earlier.Id} at {earlier.EntryMark}; choose another");
            }

            _names[name] = substance;
        }
    }

    private void ReadDefaults(DocumentNode root)
    {
        root.AllowOnly("defaults");
        foreach (DocumentNode node in root.Required("defaults").Items)
        {
            node.AllowOnly("class", "enthalpy_kj_per_mol", "enthalpy_kj_per_mol_per_atom", "entropy_j_per_mol_k_per_atom", "reason");
            SubstanceClass kind = SubstanceReader.ClassOf(node.Required("class"));
            _defaults[kind] = new ClassDefault(
                kind,
                node.Required("enthalpy_kj_per_mol").Number() * 1000,
                node.Required("enthalpy_kj_per_mol_per_atom").Number() * 1000,
                node.Required("entropy_j_per_mol_k_per_atom").Number(),
                node.Required("reason").Text);
        }

        foreach (SubstanceClass kind in Enum.GetValues<SubstanceClass>().Where(kind => !_defaults.ContainsKey(kind)))
        {
            throw new DocumentException(root.At, $"no default for the class {kind}; add one");
        }
    }

    private void ReadSources(DocumentNode root)
    {
        root.AllowOnly("sources");
        foreach (DocumentNode node in root.Required("sources").Items)
        {
            node.AllowOnly("key", "citation", "licence", "taken", "provenance");
            Citation citation = new(
                node.Required("key").Text,
                node.Required("citation").Text,
                node.Required("licence").Text,
                node.Required("taken").Text,
                node.Required("provenance").Text);
            if (!_sources.TryAdd(citation.Key, citation))
            {
                throw new DocumentException(node.At, $"the source key '{citation.Key}' stands twice; keep one");
            }
        }
    }

    private EnthalpyCovariance? ReadCovariance()
    {
        if (!_bundledFiles.TryGetValue(CovarianceFile, out Func<string>? text))
        {
            return null;
        }

        EnthalpyCovariance whole = EnthalpyCovariance.Read(DocumentNode.Parse(text(), ResourcePrefix + CovarianceFile));
        HashSet<string> own = [.. whole.Substances.Where(id => Get(id).IsFromOverlay)];
        return own.Count == 0 ? whole : whole.Without(own);
    }

    private string ComputeHash()
    {
        StringBuilder all = new();
        foreach (string name in FileNames)
        {
            all.Append(name).Append('\n').Append(_bundledFiles[name]().ReplaceLineEndings("\n")).Append('\n');
        }

        foreach (DatabaseFile file in _overlayFiles)
        {
            all.Append("overlay ").Append(file.Name).Append('\n').Append(file.Text.ReplaceLineEndings("\n")).Append('\n');
        }

        return Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(all.ToString())));
    }
}
