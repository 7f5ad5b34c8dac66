using System.Globalization;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>What of a steel bears on its carbon: mass percents, each 0 unless given.</summary>
public sealed record SteelComposition
{
    private static readonly string[] Known = ["C", "Si", "Mn", "Cr", "Ni", "Mo"];

    /// <summary>Carbon the steel is to keep, mass percent; null where not given.</summary>
    public double? Carbon { get; init; }

    /// <summary>Silicon, mass percent.</summary>
    public double Silicon { get; init; }

    /// <summary>Manganese, mass percent.</summary>
    public double Manganese { get; init; }

    /// <summary>Chromium, mass percent.</summary>
    public double Chromium { get; init; }

    /// <summary>Nickel, mass percent.</summary>
    public double Nickel { get; init; }

    /// <summary>Molybdenum, mass percent.</summary>
    public double Molybdenum { get; init; }

    /// <summary>Reads <c>C=0.35%,Mn=0.8%</c>.</summary>
    /// <param name="text">C, Si, Mn, Cr, Ni, Mo with mass percents.</param>
    /// <returns>The composition.</returns>
    /// <exception cref="RequestException">Unknown element, not a percentage, or outside 0 to 30 % (carbon 2 %).</exception>
    public static SteelComposition Parse(string text)
    {
        Dictionary<string, double> percent = new(StringComparer.Ordinal);
        foreach (string part in text.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries))
        {
            int equals = part.IndexOf('=');
            string name = equals > 0 ? part[..equals].Trim() : part;
            if (!Known.Contains(name))
            {
                throw RequestException.UnknownWord("steel element", name, Known);
            }

            (double value, string unit) = NumberWithUnit.Parse(equals > 0 ? part[(equals + 1)..] : "", "steel " + name, "a mass percent, such as C=0.35%");
            double most = name == "C" ? 2 : 30;
            if (unit != "%" || !(value >= 0 && value <= most))
            {
                throw RequestException.OutOfRange("steel " + name, part, string.Create(CultureInfo.InvariantCulture, $"a mass percent from 0 to {most} % is allowed"));
            }

            if (!percent.TryAdd(name, value))
            {
                throw new RequestException($"steel: {name} is given twice; keep one");
            }
        }

        return new SteelComposition
        {
            Carbon = percent.TryGetValue("C", out double carbon) && carbon > 0 ? carbon : null,
            Silicon = percent.GetValueOrDefault("Si"),
            Manganese = percent.GetValueOrDefault("Mn"),
            Chromium = percent.GetValueOrDefault("Cr"),
            Nickel = percent.GetValueOrDefault("Ni"),
            Molybdenum = percent.GetValueOrDefault("Mo"),
        };
    }

    /// <summary>Carbon potential over carbon in the steel: above 1 for elements that push carbon out, below 1 for those that bind it.</summary>
    /// <remarks>
    /// Gunnarson S. 1967, Haerterei-Technische Mitteilungen 22: log10(Cp/C) = 0.055 Si - 0.013 Mn - 0.040 Cr + 0.014 Ni - 0.013 Mo; from memory.
    /// </remarks>
    public double PotentialOverCarbon => Math.Pow(10, (0.055 * Silicon) - (0.013 * Manganese) - (0.040 * Chromium) + (0.014 * Nickel) - (0.013 * Molybdenum));
}
