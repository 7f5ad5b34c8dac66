using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charges;

/// <summary>Reads what is charged: <c>Cr2O3 1000kg, C 237kg</c>, and a gas by amount: <c>H2 20Nm3, frost -50C</c>.</summary>
public static class ChargeText
{
    private const double PoundInKilograms = 0.45359237;

    /// <summary>Condensed substances with their moles.</summary>
    /// <param name="text">Names with kg, g, t, lb, mol or kmol, parted by commas.</param>
    /// <param name="database">Data.</param>
    /// <returns>In the order written.</returns>
    /// <exception cref="RequestException">Unknown substance, missing or unknown unit, or nothing.</exception>
    public static ImmutableArray<(Substance Substance, double Moles)> Parse(string text, SubstanceDatabase database)
    {
        ImmutableArray<(Substance, double)>.Builder charge = ImmutableArray.CreateBuilder<(Substance, double)>();
        foreach (string part in text.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries))
        {
            string[] words = part.Split(' ', 2, StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries);
            if (words.Length != 2)
            {
                throw new RequestException($"the charge '{part}' is not understood; write a substance and an amount, such as 'Cr2O3 1000kg'");
            }

            Substance substance = database.Get(words[0]);
            charge.Add((substance, Moles(words[1], substance)));
        }

        return charge.Count > 0 ? charge.ToImmutable() : throw new RequestException("the charge is empty; write substances and amounts, such as 'Cr2O3 1000kg, C 237kg'");
    }

    /// <summary>A gas by its amount, at 0 C and 101325 Pa, with an optional moisture reading.</summary>
    /// <param name="text">Species with Nm3, mol or kmol; frost or dew.</param>
    /// <param name="total">Pressure the moisture was read at.</param>
    /// <param name="database">Data.</param>
    /// <returns>Species with moles.</returns>
    /// <exception cref="RequestException">Not understood.</exception>
    public static ImmutableArray<(Substance Substance, double Moles)> ParseGas(string text, Pressure total, SubstanceDatabase database)
    {
        List<(Substance Substance, double Moles)> gas = [];
        WaterReading? moisture = null;
        foreach (string part in text.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries))
        {
            string[] words = part.Split(' ', 2, StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries);
            if (words.Length != 2)
            {
                throw new RequestException($"--gas '{part}' is not understood; write a species and an amount, such as 'H2 20Nm3'");
            }

            if (words[0] is "frost" or "dew")
            {
                moisture = WaterReading.Parse(words[0], words[1]);
                continue;
            }

            Substance species = database.Get(words[0]);
            if (!species.IsGas)
            {
                throw new RequestException($"--gas '{species.Id}' is no gas; charge it with the rest");
            }

            (double value, string unit) = NumberWithUnit.Parse(words[1], species.Id, "an amount with Nm3, mol or kmol, such as 20Nm3");
            gas.Add((species, Above(part, value) * unit switch
            {
                "Nm3" => 1 / PhysicalConstants.NormalCubicMetrePerMole,
                "mol" => 1,
                "kmol" => 1e3,
                _ => throw new RequestException($"--gas '{part}' has the unit '{unit}', which is not one of Nm3, mol, kmol"),
            }));
        }

        if (gas.Count == 0)
        {
            throw new RequestException("--gas is empty; write species and amounts, such as 'H2 20Nm3, frost -50C'");
        }

        if (moisture is not null)
        {
            double share = moisture.Meanings(total)[0].Content.Share;
            gas.Add((database.Get("H2O"), gas.Sum(item => item.Moles) * share / (1 - share)));
        }

        return [.. gas];
    }

    private static double Moles(string text, Substance substance)
    {
        (double value, string unit) = NumberWithUnit.Parse(text, substance.Id, "an amount with kg, g, t, lb, mol or kmol, such as 100kg");
        double kilogram = 1000 / substance.Formula.MolarMass;
        return Above(substance.Id + " " + text, value) * unit switch
        {
            "kg" => kilogram,
            "g" => kilogram / 1000,
            "t" => kilogram * 1000,
            "lb" => kilogram * PoundInKilograms,
            "mol" => 1,
            "kmol" => 1e3,
            _ => throw new RequestException($"the charge '{substance.Id} {text}' has the unit '{unit}', which is not one of kg, g, t, lb, mol, kmol"),
        };
    }

    private static double Above(string text, double value) => value > 0 ? value : throw new RequestException($"the charge '{text}' must be above 0");
}
