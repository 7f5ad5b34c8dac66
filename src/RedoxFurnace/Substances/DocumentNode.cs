using System.Globalization;
using RedoxFurnace.Quantities;
using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace RedoxFurnace.Substances;

/// <summary>A YAML document read by events into a small tree whose every node knows its line and column.</summary>
/// <remarks>Anchors, aliases, tags and a second document are refused: data files need none, and an alias can blow a small file up to a huge tree.</remarks>
public sealed class DocumentNode
{
    private const int DeepestNesting = 24;
    private const int LongestText = 4_000_000;

    private readonly string? _scalar;
    private readonly List<DocumentNode>? _items;
    private readonly List<KeyValuePair<string, DocumentNode>>? _entries;
    private readonly Dictionary<string, SourceMark>? _keyMarks;

    private DocumentNode(SourceMark at, string? scalar, List<DocumentNode>? items, List<KeyValuePair<string, DocumentNode>>? entries, Dictionary<string, SourceMark>? keyMarks)
    {
        At = at;
        _scalar = scalar;
        _items = items;
        _entries = entries;
        _keyMarks = keyMarks;
    }

    /// <summary>Where the node starts.</summary>
    public SourceMark At { get; }

    /// <summary>Whether the node is a mapping of keys to values.</summary>
    public bool IsMapping => _entries is not null;

    /// <summary>Whether the node is a list.</summary>
    public bool IsList => _items is not null;

    /// <summary>Keys and values in the order written.</summary>
    public IReadOnlyList<KeyValuePair<string, DocumentNode>> Entries
        => _entries ?? throw DocumentException.WrongKind(At, "a mapping (key: value)", Kind());

    /// <summary>List members in the order written.</summary>
    public IReadOnlyList<DocumentNode> Items
        => _items ?? throw DocumentException.WrongKind(At, "a list", Kind());

    /// <summary>The text of a scalar.</summary>
    public string Text
        => _scalar ?? throw DocumentException.WrongKind(At, "a single value", Kind());

    /// <summary>Reads one document.</summary>
    /// <param name="text">YAML text, at most 4 million characters.</param>
    /// <param name="file">Name used in messages.</param>
    /// <returns>The root node.</returns>
    /// <exception cref="DocumentException">Not well-formed, too large, nested too deeply, or using anchors, aliases or tags.</exception>
    public static DocumentNode Parse(string text, string file)
    {
        if (text.Length > LongestText)
        {
            throw new DocumentException(new SourceMark(file, 1, 1), $"the file has {text.Length} characters, at most {LongestText} are read");
        }

        try
        {
            Parser parser = new(new StringReader(text));
            parser.Consume<StreamStart>();
            if (parser.Accept<StreamEnd>(out _))
            {
                throw new DocumentException(new SourceMark(file, 1, 1), "the file is empty");
            }

            parser.Consume<DocumentStart>();
            DocumentNode root = Read(parser, file, 0);
            parser.Consume<DocumentEnd>();
            return parser.Accept<StreamEnd>(out _)
                ? root
                : throw new DocumentException(Mark(parser.Current!, file), "a second document starts here; one file holds one");
        }
        catch (YamlException fault)
        {
            string reason = fault.InnerException?.Message ?? fault.Message;
            throw new DocumentException(new SourceMark(file, fault.Start.Line, fault.Start.Column), "not well-formed YAML: " + OneLine(reason));
        }
    }

    /// <summary>The value of a key that must be there.</summary>
    /// <param name="key">The key.</param>
    /// <returns>Its value.</returns>
    /// <exception cref="DocumentException">No such key.</exception>
    public DocumentNode Required(string key) => Optional(key) ?? throw DocumentException.MissingKey(At, key);

    /// <summary>The value of a key, or null.</summary>
    /// <param name="key">The key.</param>
    /// <returns>Its value or null.</returns>
    public DocumentNode? Optional(string key)
    {
        foreach (KeyValuePair<string, DocumentNode> entry in Entries)
        {
            if (entry.Key == key)
            {
                return entry.Value;
            }
        }

        return null;
    }

    /// <summary>Where a key of this mapping is written; the mapping's own start when it has no such key.</summary>
    /// <param name="key">The key.</param>
    /// <returns>The place.</returns>
    public SourceMark KeyMark(string key) => _keyMarks is not null && _keyMarks.TryGetValue(key, out SourceMark mark) ? mark : At;

    /// <summary>Refuses every key that is not listed.</summary>
    /// <param name="known">The keys allowed in this mapping.</param>
    /// <exception cref="DocumentException">An unknown key; the nearest allowed one is offered.</exception>
    public void AllowOnly(params string[] known)
    {
        foreach (KeyValuePair<string, DocumentNode> entry in Entries)
        {
            if (!known.Contains(entry.Key, StringComparer.Ordinal))
            {
                throw DocumentException.UnknownKey(KeyMark(entry.Key), entry.Key, known);
            }
        }
    }

    /// <summary>A finite number in the invariant culture.</summary>
    /// <returns>The number.</returns>
    /// <exception cref="DocumentException">Not a finite number.</exception>
    public double Number()
        => double.TryParse(Text, NumberStyles.Float, CultureInfo.InvariantCulture, out double value) && double.IsFinite(value)
            ? value
            : throw DocumentException.BadValue(At, "number", Text, "write a finite number with a decimal point");

    /// <summary>A yes or no.</summary>
    /// <returns>The value.</returns>
    /// <exception cref="DocumentException">Neither true nor false.</exception>
    public bool Truth() => Text switch
    {
        "true" => true,
        "false" => false,
        _ => throw DocumentException.BadValue(At, "value", Text, "write true or false"),
    };

    /// <summary>A list of finite numbers of known length.</summary>
    /// <param name="length">How many.</param>
    /// <returns>The numbers.</returns>
    /// <exception cref="DocumentException">Another length, or not numbers.</exception>
    public double[] Numbers(int length)
        => Items.Count == length
            ? [.. Items.Select(item => item.Number())]
            : throw DocumentException.WrongKind(At, FormattableString.Invariant($"{length} numbers"), FormattableString.Invariant($"{Items.Count}"));

    private static DocumentNode Read(Parser parser, string file, int depth)
    {
        ParsingEvent current = parser.Current!;
        SourceMark at = Mark(current, file);
        if (depth > DeepestNesting)
        {
            throw new DocumentException(at, $"nested more than {DeepestNesting} deep");
        }

        if (current is NodeEvent { Anchor.IsEmpty: false } or AnchorAlias)
        {
            throw new DocumentException(at, "anchors and aliases (& and *) are not read here; write the value out");
        }

        if (current is NodeEvent { Tag.IsEmpty: false } tagged && !tagged.Tag.IsNonSpecific)
        {
            throw new DocumentException(at, "tags (!) are not read here; drop the tag");
        }

        return current switch
        {
            Scalar => new DocumentNode(at, parser.Consume<Scalar>().Value, null, null, null),
            SequenceStart => ReadList(parser, file, at, depth),
            _ => ReadMapping(parser, file, at, depth),
        };
    }

    private static DocumentNode ReadList(Parser parser, string file, SourceMark at, int depth)
    {
        parser.Consume<SequenceStart>();
        List<DocumentNode> items = [];
        while (!parser.Accept<SequenceEnd>(out _))
        {
            items.Add(Read(parser, file, depth + 1));
        }

        parser.Consume<SequenceEnd>();

        return new DocumentNode(at, null, items, null, null);
    }

    private static DocumentNode ReadMapping(Parser parser, string file, SourceMark at, int depth)
    {
        parser.Consume<MappingStart>();
        List<KeyValuePair<string, DocumentNode>> entries = [];
        Dictionary<string, SourceMark> marks = new(StringComparer.Ordinal);
        while (!parser.Accept<MappingEnd>(out _))
        {
            SourceMark keyAt = Mark(parser.Current!, file);
            string key = Read(parser, file, depth + 1).Text;
            if (!marks.TryAdd(key, keyAt))
            {
                throw DocumentException.DuplicateKey(keyAt, key);
            }

            entries.Add(new(key, Read(parser, file, depth + 1)));
        }

        parser.Consume<MappingEnd>();

        return new DocumentNode(at, null, null, entries, marks);
    }

    private static SourceMark Mark(ParsingEvent at, string file) => new(file, at.Start.Line, at.Start.Column);

    private static string OneLine(string text) => text.ReplaceLineEndings(" ").Trim();

    private string Kind() => IsMapping ? "a mapping" : IsList ? "a list" : $"'{_scalar}'";
}
