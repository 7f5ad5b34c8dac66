using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>A gas analysis as written: shares, one gas as the balance, a moisture reading; and the gases it can mean.</summary>
public sealed class GasAnalysis
{
    private const double ExactWithin = 1e-6;
    private const double RoundingWithin = 0.03;
    private const double TwiceWithin = 0.02;

    private static readonly string[] Words = [.. Enum.GetNames<GasSpecies>(), "frost", "dew", "moisture", "H2O/H2", "H2/H2O", "CO/CO2", "CO2/CO"];

    private GasAnalysis(ImmutableArray<GasMeaning> meanings, ImmutableArray<string> notes, ImmutableArray<string> ask)
    {
        Meanings = meanings;
        Notes = notes;
        Ask = ask;
    }

    /// <summary>At least one gas; several where the scale or place of the moisture reading is open.</summary>
    public ImmutableArray<GasMeaning> Meanings { get; }

    /// <summary>What was assumed in reading it.</summary>
    public ImmutableArray<string> Notes { get; }

    /// <summary>Questions that are open.</summary>
    public ImmutableArray<string> Ask { get; }

    /// <summary>Reads <c>H2 30%, Ar 70%, frost -45C</c>.</summary>
    /// <param name="text">Entries parted by commas: a species with a share; one species alone or with <c>balance</c>; frost, dew, moisture or H2O with a reading; a ratio H2O/H2 or CO/CO2.</param>
    /// <param name="furnace">Total pressure in the furnace, at which moisture readings count unless they say where they were taken.</param>
    /// <param name="line">Pressure of a sampling line, where one is known.</param>
    /// <returns>The analysis.</returns>
    /// <exception cref="RequestException">Unknown species, negative or over 100 %, summing to more than 103 %, or water given twice and inconsistent.</exception>
    public static GasAnalysis Parse(string text, Pressure furnace, Pressure? line = null) => Merge([text], furnace, line);

    /// <summary>Reads several texts, each taking the place of what an earlier one says of the same thing.</summary>
    /// <param name="texts">A typical analysis first, then what is known better.</param>
    /// <param name="furnace">Total pressure in the furnace.</param>
    /// <param name="line">Pressure of a sampling line, where one is known.</param>
    /// <returns>The analysis.</returns>
    /// <exception cref="RequestException">As <see cref="Parse"/>.</exception>
    public static GasAnalysis Merge(IReadOnlyList<string> texts, Pressure furnace, Pressure? line = null)
    {
        Entries all = new();
        foreach (string text in texts)
        {
            Entries own = Entries.Read(text);
            all = all.OverriddenBy(own);
        }

        return all.Settle(string.Join(", ", texts), furnace, line);
    }

    /// <summary>What is written, by what it speaks of.</summary>
    private sealed class Entries
    {
        private readonly Dictionary<GasSpecies, double> _shares = [];
        private readonly List<WaterReading> _water = [];
        private GasSpecies? _balance;
        private double? _monoxideRatio;

        public static Entries Read(string text)
        {
            Entries entries = new();
            string[] parts = text.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries);
            if (parts.Length == 0)
            {
                throw new RequestException("the gas is empty; write an analysis such as 'H2 30%, Ar 70%, frost -45C'");
            }

            foreach (string part in parts)
            {
                entries.Add(part);
            }

            return entries;
        }

        public Entries OverriddenBy(Entries later)
        {
            Entries merged = new() { _balance = later._balance ?? _balance, _monoxideRatio = later._monoxideRatio ?? _monoxideRatio };
            bool laterWater = later._water.Count > 0 || later._shares.ContainsKey(GasSpecies.H2O);
            foreach ((GasSpecies species, double share) in _shares)
            {
                bool replaced = (species == GasSpecies.H2O && laterWater) || (species == GasSpecies.CO2 && later._monoxideRatio is not null);
                if (!replaced)
                {
                    merged._shares[species] = share;
                }
            }

            foreach ((GasSpecies species, double share) in later._shares)
            {
                merged._shares[species] = share;
            }

            if (later._shares.ContainsKey(GasSpecies.CO2))
            {
                merged._monoxideRatio = later._monoxideRatio;
            }

            if (merged._balance is { } balance && later._shares.ContainsKey(balance))
            {
                merged._balance = later._balance;
            }

            if (merged._balance is { } rest)
            {
                merged._shares.Remove(rest);
            }

            merged._water.AddRange(laterWater ? later._water : _water);
            return merged;
        }

        public GasAnalysis Settle(string text, Pressure furnace, Pressure? line)
        {
            List<string> notes = [];
            List<string> ask = [];
            AddDioxide();
            double[] dry = DryShares(text, notes, ask);
            if (_water.Count == 0)
            {
                return new GasAnalysis([new GasMeaning("", GasMixture.OfAmounts(dry))], [.. notes], [.. ask]);
            }

            double stated = dry[(int)GasSpecies.H2O];
            dry[(int)GasSpecies.H2O] = 0;
            double sum = dry.Sum();
            if (!(sum > 0))
            {
                dry[(int)GasSpecies.H2O] = 1;
                sum = 1;
            }

            double? hydrogen = dry[(int)GasSpecies.H2] > 0 ? dry[(int)GasSpecies.H2] / sum : null;
            ImmutableArray<WaterMeaning> meanings = _water[0].Meanings(furnace, line, hydrogen);
            RefuseContradiction(meanings, stated, furnace, line, hydrogen);
            if (meanings.Length > 1)
            {
                ask.Add(Question(meanings, line));
            }
            else if (_water[0].Scale == WaterScale.DewPoint && _water[0].Value < Oxidation.WaterVapour.TriplePointKelvin)
            {
                notes.Add(FrostWarning(meanings[0].Content));
            }

            notes.Add("the shares are of the dry gas; the water of the reading is added to them");
            return new GasAnalysis([.. meanings.Select(meaning => new GasMeaning(meanings.Length > 1 ? meaning.Meaning : "", Moisten(dry, meaning.Content.Share)))], [.. notes], [.. ask]);
        }

        private static string FrostWarning(WaterContent content) => FormattableString.Invariant(
            $"a dew point below 0 C is taken over supercooled water ({content.Ppm:G3} ppm); many instruments show the frost point under that name, then write frost");

        private static string Question(ImmutableArray<WaterMeaning> meanings, Pressure? line)
        {
            double spread = meanings.Max(meaning => meaning.Content.Ppm) / meanings.Min(meaning => meaning.Content.Ppm);
            bool scale = meanings.Any(meaning => meaning.Meaning.StartsWith("dew", StringComparison.Ordinal)) && meanings.Any(meaning => meaning.Meaning.StartsWith("frost", StringComparison.Ordinal));
            bool place = line is not null && meanings.Select(meaning => meaning.Meaning[meaning.Meaning.IndexOf("point", StringComparison.Ordinal)..]).Distinct().Count() > 1;
            string what = (scale, place) switch
            {
                (true, true) => "is the reading a frost or a dew point, and was it taken in the line or at furnace pressure?",
                (true, false) => "is the reading a frost point or a dew point over supercooled water?",
                _ => "was the reading taken in the line or at furnace pressure?",
            };
            return FormattableString.Invariant($"{what} The meanings differ by a factor {spread:G3} in water");
        }

        private static GasMixture Moisten(double[] dry, double share)
        {
            double sum = dry.Sum();
            double[] moist = [.. dry.Select(amount => amount / sum * (1 - share))];
            moist[(int)GasSpecies.H2O] += share;
            return GasMixture.OfAmounts(moist);
        }

        private void Add(string part)
        {
            string[] words = part.Split([' ', '=', '\t'], 2, StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries);
            if (words.Length == 2 && (char.IsAsciiDigit(words[0][0]) || words[0][0] is '-' or '+' or '.'))
            {
                words = ShareFirst(part);
            }

            string name = words[0];
            if (name is "balance" or "rest" or "bal" && words.Length == 2)
            {
                SetBalance(Species(words[1]));
            }
            else if (words.Length == 1 || words[1] is "balance" or "rest" or "bal")
            {
                SetBalance(Species(name));
            }
            else if (name is "frost" or "dew" or "moisture" or "H2O/H2")
            {
                AddWater(WaterReading.Parse(name, words[1]));
            }
            else if (name == "H2/H2O")
            {
                double ratio = Ratio(name, words[1]);
                AddWater(WaterReading.Parse("H2O/H2", Printed.Exact(1 / ratio)));
            }
            else if (name is "CO/CO2" or "CO2/CO")
            {
                double ratio = Ratio(name, words[1]);
                _monoxideRatio = name == "CO/CO2" ? ratio : 1 / ratio;
            }
            else if (Species(name) is GasSpecies.H2O && !IsShare(words[1]))
            {
                AddWater(WaterReading.Parse(name, words[1]));
            }
            else
            {
                AddShare(Species(name), words[1]);
            }
        }

        private static bool IsShare(string text) => NumberWithUnit.Split(text, "H2O", "a share or a moisture reading").Unit is "%" or "ppm" or "ppmv" or "";

        /// <summary>'30% H2' is read like 'H2 30%'.</summary>
        private static string[] ShareFirst(string part)
        {
            int at = part.LastIndexOf(' ');
            return at > 0 ? [part[(at + 1)..].Trim(), part[..at].Trim()] : throw RequestException.NotAQuantity("gas", part, "a species and a share, such as H2 30%");
        }

        private static double Ratio(string name, string text)
        {
            double ratio = NumberWithUnit.ParsePlain(text, name);
            return ratio > 0 ? ratio : throw RequestException.OutOfRange(name, text, "a ratio must be above 0");
        }

        private static GasSpecies Species(string name)
            => Enum.TryParse(name, false, out GasSpecies species) && Enum.IsDefined(species) && !char.IsAsciiDigit(name[0])
                ? species
                : throw RequestException.UnknownWord("gas", name, Words);

        private void SetBalance(GasSpecies species)
            => _balance = _balance is null || _balance == species
                ? species
                : throw new RequestException($"both {_balance} and {species} are given without a share; only one gas can be the balance");

        private void AddShare(GasSpecies species, string text)
        {
            (_, string unit) = NumberWithUnit.Parse(text, species + " share", "a share with a unit, such as 30% or 200ppm");
            if (unit is not ("%" or "ppm" or "ppmv"))
            {
                throw RequestException.UnknownUnit(species + " share", text, unit, "%, ppm");
            }

            if (!_shares.TryAdd(species, Share.Parse(text, species + " share")))
            {
                throw new RequestException($"{species} is given twice; keep one");
            }
        }

        private void AddWater(WaterReading reading) => _water.Add(reading);

        private void AddDioxide()
        {
            if (_monoxideRatio is not { } ratio)
            {
                return;
            }

            bool hasMonoxide = _shares.TryGetValue(GasSpecies.CO, out double monoxide) && monoxide > 0;
            bool hasDioxide = _shares.TryGetValue(GasSpecies.CO2, out double dioxide) && dioxide > 0;
            if (hasMonoxide && hasDioxide && Math.Abs((monoxide / dioxide / ratio) - 1) > TwiceWithin)
            {
                throw new RequestException(FormattableString.Invariant($"CO/CO2 {ratio:G4} contradicts CO {monoxide * 100:G4}% over CO2 {dioxide * 100:G4}% ({monoxide / dioxide:G4}); keep two of the three"));
            }

            if (!hasMonoxide && !hasDioxide)
            {
                throw new RequestException("CO/CO2 needs the share of one of the two; add CO or CO2");
            }

            _shares[GasSpecies.CO] = hasMonoxide ? monoxide : dioxide * ratio;
            _shares[GasSpecies.CO2] = hasDioxide ? dioxide : monoxide / ratio;
        }

        private double[] DryShares(string text, List<string> notes, List<string> ask)
        {
            double[] shares = new double[GasMixture.SpeciesCount];
            foreach ((GasSpecies species, double share) in _shares)
            {
                shares[(int)species] = share;
            }

            double sum = shares.Sum();
            if (sum > 1 + RoundingWithin)
            {
                throw new RequestException(FormattableString.Invariant($"the gas '{text}' sums to {sum * 100:G4} %; at most 100 % is allowed (103 % with rounding), check the shares"));
            }

            if (_balance is { } balance)
            {
                if (sum > 1 + ExactWithin)
                {
                    throw new RequestException(FormattableString.Invariant($"the gas '{text}' sums to {sum * 100:G5} % without the balance {balance}; nothing is left for it"));
                }

                shares[(int)balance] += Math.Max(0, 1 - sum);
            }
            else if (sum == 0 && _water.Count > 0)
            {
                return shares;
            }
            else if (sum < 1 - RoundingWithin)
            {
                shares[(int)GasSpecies.N2] += 1 - sum;
                notes.Add(FormattableString.Invariant($"the shares sum to {sum * 100:G4} %: the other {(1 - sum) * 100:G4} % is taken as N2"));
                ask.Add(FormattableString.Invariant($"what is the other {(1 - sum) * 100:G4} % of the gas? Taken as N2; write 'Ar balance' or the like if not"));
            }
            else if (Math.Abs(sum - 1) > ExactWithin)
            {
                notes.Add(FormattableString.Invariant($"the shares sum to {sum * 100:G5} %: divided by that, so that they make 100 %"));
            }

            return shares;
        }

        private void RefuseContradiction(ImmutableArray<WaterMeaning> first, double stated, Pressure furnace, Pressure? line, double? hydrogen)
        {
            foreach (WaterReading other in _water.Skip(1))
            {
                ImmutableArray<WaterMeaning> second = other.Meanings(furnace, line, hydrogen);
                if (!first.Any(one => second.Any(two => Same(one.Content.Share, two.Content.Share))))
                {
                    throw Twice(_water[0].Text, first[0].Content.Share, other.Text, second[0].Content.Share);
                }
            }

            if (stated > 0 && !first.Any(one => Same(one.Content.Share, stated)))
            {
                throw Twice(_water[0].Text, first[0].Content.Share, "H2O " + GasMixture.ShareText(stated), stated);
            }
        }

        private static bool Same(double one, double two) => Math.Abs((one / two) - 1) <= TwiceWithin;

        private static RequestException Twice(string first, double firstShare, string second, double secondShare)
            => new($"water is given twice and differs: '{first}' is {GasMixture.ShareText(firstShare)} H2O, '{second}' is {GasMixture.ShareText(secondShare)}; keep one, or compare them with 'reading'");
    }
}
