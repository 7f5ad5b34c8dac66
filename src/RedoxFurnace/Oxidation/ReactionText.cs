using System.Globalization;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>Writes reactions and stoichiometric numbers as people do.</summary>
public static class ReactionText
{
    private const int LargestDenominator = 24;

    internal static string Write(IEnumerable<(Substance Substance, double Number)> terms)
    {
        var all = terms.ToList();
        return $"{Side(all.Where(term => term.Number < 0))} = {Side(all.Where(term => term.Number > 0))}";
    }

    /// <summary>A stoichiometric number: whole, a simple fraction, or four significant digits.</summary>
    /// <param name="number">Above 0.</param>
    /// <returns>Text.</returns>
    public static string Number(double number)
    {
        for (int bottom = 1; bottom <= LargestDenominator; bottom++)
        {
            double top = Math.Round(number * bottom);
            if (top > 0 && top <= 99 && Math.Abs((number * bottom) - top) < 1e-9 * Math.Max(1, top))
            {
                string whole = top.ToString("0", CultureInfo.InvariantCulture);
                return bottom == 1 ? whole : whole + "/" + bottom.ToString(CultureInfo.InvariantCulture);
            }
        }

        return number.ToString("G4", CultureInfo.InvariantCulture);
    }

    private static string Side(IEnumerable<(Substance Substance, double Number)> terms)
        => string.Join(" + ", terms.Select(term => Term(term.Substance, Math.Abs(term.Number))));

    private static string Term(Substance substance, double number)
    {
        string text = Number(number);
        return text == "1" ? substance.Id : text + " " + substance.Id;
    }
}
