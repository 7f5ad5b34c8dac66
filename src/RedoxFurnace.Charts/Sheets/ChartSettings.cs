using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charts.Sheets;

/// <summary>
/// What is asked of a chart, as written: the keys of a chart sheet, which are also the options of the command line. A value that
/// is not understood is refused with its place in the sheet, or with its option.
/// </summary>
public sealed class ChartSettings
{
    private readonly Dictionary<string, (string Text, SourceMark? At)> _values;

    private ChartSettings(Dictionary<string, (string Text, SourceMark? At)> values) => _values = values;

    /// <summary>Every key a sheet may hold, with what it says.</summary>
    public static IReadOnlyList<(string Key, string Meaning)> Keys { get; } =
    [
        ("kind", "stability (default), oxygen-pressure, van-t-hoff, margins, gas-ratio"),
        ("title", "above the plot"),
        ("of", "metals and oxides, such as Cr,Fe,SiO2"),
        ("with", "reductants, such as C,H2,Al"),
        ("range", "temperatures from and to, such as 200C..1800C"),
        ("at", "one temperature, for margins"),
        ("pressure", "total pressure"),
        ("pco", "pressures of CO (gas-ratio chart: of CO and CO2) over graphite, one line each, such as 1bar,1mbar"),
        ("gas-ratio", "pH2/pH2O and pCO/pCO2, one line each, such as 10,100"),
        ("activity", "activities, such as Cr=0.2"),
        ("direct", "metal to one oxide instead of the couples of the ladder"),
        ("bands", "bands of expanded uncertainty"),
        ("highlight", "the line to be lifted out"),
        ("crossovers", "yes (default) or no: mark and list them"),
        ("window", "operating window, such as 1000C..1150C"),
        ("scales", "side scales: pO2,CO/CO2,H2/H2O"),
        ("frost", "frost-point scale or lines for a share of hydrogen, such as 75%"),
        ("unit", "C, K or F"),
        ("energy", "kJ or kcal"),
        ("inverse", "1/T along the horizontal axis"),
        ("ratios", "lines of equal gas ratio: CO/CO2, H2/H2O or both"),
        ("axis", "gas-ratio chart: share (default) or log of the ratio"),
        ("equations", "reactions, parted by semicolons"),
        ("points", "measured points of a reaction: 900C 0.5; 1000C 0.8 (T and log10 K)"),
        ("charge", "what is charged, such as Cr2O3 1000kg, C 237kg"),
        ("size", "A4, A5, A3, Letter, slide or 180mmx120mm"),
        ("frame", "none, caption (default) or document"),
        ("number", "document number"),
        ("revision", "revision"),
        ("date", "date, as it is to stand there"),
        ("page", "page, such as 1 of 1"),
        ("prepared", "who prepared it"),
        ("checked", "who checked it"),
        ("approved", "who approved it"),
        ("purpose", "what it is for"),
    ];

    /// <summary>Settings from options of a command line.</summary>
    /// <param name="options">Keys without dashes, with their texts; null texts are left out.</param>
    /// <returns>The settings.</returns>
    public static ChartSettings Of(IEnumerable<(string Key, string? Text)> options)
        => new(options.Where(option => option.Text is not null).ToDictionary(option => option.Key, option => (option.Text!, (SourceMark?)null)));

    /// <summary>Reads a chart sheet.</summary>
    /// <param name="yaml">The whole text.</param>
    /// <param name="file">Its name, for messages.</param>
    /// <returns>The settings.</returns>
    /// <exception cref="DocumentException">Unknown or doubled key, or no mapping.</exception>
    public static ChartSettings Parse(string yaml, string file)
    {
        DocumentNode root = DocumentNode.Parse(yaml, file);
        root.AllowOnly([.. Keys.Select(key => key.Key)]);
        return new ChartSettings(root.Entries.ToDictionary(entry => entry.Key, entry => (Written(entry.Value), (SourceMark?)entry.Value.At)));
    }

    /// <summary>These settings with those of another laid over them.</summary>
    /// <param name="over">Counts where both have a key.</param>
    /// <returns>The new settings.</returns>
    public ChartSettings With(ChartSettings over)
    {
        Dictionary<string, (string, SourceMark?)> all = new(_values);
        foreach ((string key, (string Text, SourceMark? At) value) in over._values)
        {
            all[key] = value;
        }

        return new ChartSettings(all);
    }

    /// <summary>The text of a key, or null.</summary>
    /// <param name="key">One of <see cref="Keys"/>.</param>
    /// <returns>As written.</returns>
    public string? Text(string key) => _values.TryGetValue(key, out (string Text, SourceMark? At) value) ? value.Text : null;

    /// <summary>A list parted by commas; empty where the key is absent.</summary>
    /// <param name="key">One of <see cref="Keys"/>.</param>
    /// <returns>Trimmed members.</returns>
    public string[] List(string key) => Text(key)?.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries) ?? [];

    /// <summary>A value, read by a function that may refuse it.</summary>
    /// <typeparam name="T">Its type.</typeparam>
    /// <param name="key">One of <see cref="Keys"/>.</param>
    /// <param name="parse">Text and the name of the value for messages, to value.</param>
    /// <param name="absent">Where the key is absent.</param>
    /// <returns>The value.</returns>
    /// <exception cref="RequestException">Refused, on the command line.</exception>
    /// <exception cref="DocumentException">Refused, in a sheet.</exception>
    public T Read<T>(string key, Func<string, string, T> parse, T absent)
    {
        if (!_values.TryGetValue(key, out (string Text, SourceMark? At) value))
        {
            return absent;
        }

        if (value.At is not { } at)
        {
            return parse(value.Text, "--" + key);
        }

        try
        {
            return parse(value.Text, key);
        }
        catch (RequestException fault)
        {
            throw new DocumentException(at, fault.Message);
        }
    }

    /// <summary>A truth: yes or no, true or false.</summary>
    /// <param name="key">One of <see cref="Keys"/>.</param>
    /// <param name="absent">Where the key is absent.</param>
    /// <returns>The truth.</returns>
    public bool Truth(string key, bool absent = false) => Read(key, (text, what) => text switch
    {
        "yes" or "true" => true,
        "no" or "false" => false,
        _ => throw new RequestException($"{what} '{text}' is not understood; write yes or no"),
    }, absent);

    /// <summary>One word of several.</summary>
    /// <param name="key">One of <see cref="Keys"/>.</param>
    /// <param name="words">Those allowed; the first counts where the key is absent.</param>
    /// <returns>The word.</returns>
    public string Word(string key, params string[] words)
        => Read(key, (text, what) => words.Contains(text) ? text : throw RequestException.UnknownWord(what, text, words), words[0]);

    private static string Written(DocumentNode node) => node.IsList ? string.Join(",", node.Items.Select(item => item.Text)) : node.Text;
}
