using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>Probabilities of a ranking's verdicts and percentiles of its crossovers, from errors of the data drawn with their full covariance.</summary>
public static class RankSampling
{
    /// <summary>Draws taken where none are asked for.</summary>
    public const int UsualDraws = 10_000;

    /// <summary>Fewest draws that say anything.</summary>
    public const int FewestDraws = 100;

    /// <summary>Most draws.</summary>
    public const int MostDraws = 200_000;

    private const double StepKelvin = 40;
    private const int Seed = 20_260_801;

    /// <summary>Reads <c>sample=10000</c>.</summary>
    /// <param name="text">As written.</param>
    /// <param name="what">Name of the argument, for messages.</param>
    /// <returns>Number of draws.</returns>
    /// <exception cref="RequestException">Not understood or out of range.</exception>
    public static int Parse(string text, string what = "--uncertainty")
    {
        if (text == "sample")
        {
            return UsualDraws;
        }

        if (!text.StartsWith("sample=", StringComparison.Ordinal))
        {
            throw new RequestException($"{what} '{text}' is not understood; write sample=10000");
        }

        double draws = NumberWithUnit.ParsePlain(text[7..], what);
        return draws is >= FewestDraws and <= MostDraws && draws == Math.Floor(draws)
            ? (int)draws
            : throw RequestException.OutOfRange(what, text, FormattableString.Invariant($"a whole number from {FewestDraws} to {MostDraws} is allowed"));
    }

    /// <summary>The ranking with probabilities.</summary>
    /// <param name="result">A ranking.</param>
    /// <param name="draws">Number of draws.</param>
    /// <param name="database">The data it was made with.</param>
    /// <param name="progress">Told each reductant as it is sampled, or null.</param>
    /// <returns>The same ranking, rows filled in.</returns>
    public static RankResult Of(RankResult result, int draws, SubstanceDatabase database, Action<string>? progress = null)
    {
        ErrorSample sample = new(draws, Seed, database.Covariance);
        OxidePath charge = new(database.Get(result.Oxide), result.Metal, database, result.Conditions.Activities);
        GasReactions gases = new(database);
        return result with
        {
            Rows = [.. result.Rows.Select(row =>
            {
                progress?.Invoke($"sampling {row.Reductant.Id}");
                return row.Margin is null ? row : Sampled(row, new ReductionPair(charge, ReductantModel.Of(row.Reductant, database, gases, result.Conditions, result.Conditions.Activities), result.Conditions), result.At.Kelvin, sample);
            })],
        };
    }

    private static RankedReductant Sampled(RankedReductant row, ReductionPair pair, double kelvin, ErrorSample sample)
    {
        double[] here = Margins(pair, kelvin, sample)!;
        double probability = here.Count(margin => margin > 0) / (double)sample.Draws;
        double low = Math.Min(pair.LowestKelvin, kelvin);
        double high = Math.Max(pair.HighestKelvin, kelvin);
        double[] first = new double[sample.Draws];
        double[]? before = null;
        double last = low;
        int found = 0;
        int steps = (int)Math.Ceiling((high - low) / StepKelvin);
        for (int i = 0; i <= steps && found < sample.Draws; i++)
        {
            double at = low + ((high - low) * i / steps);
            if (Margins(pair, at, sample) is not { } margins)
            {
                before = null;
                continue;
            }

            if (before is not null)
            {
                for (int k = 0; k < margins.Length; k++)
                {
                    if (first[k] == 0 && (before[k] > 0) != (margins[k] > 0))
                    {
                        first[k] = last + ((at - last) * before[k] / (before[k] - margins[k]));
                        found++;
                    }
                }
            }

            before = margins;
            last = at;
        }

        double[] crossings = [.. first.Where(value => value > 0).Order()];
        ImmutableArray<double> percentiles = crossings.Length >= 0.95 * sample.Draws
            ? [Percentile(crossings, 0.05), Percentile(crossings, 0.5), Percentile(crossings, 0.95)]
            : [];
        return row with { ProbabilityReduces = probability, CrossoverPercentiles = percentiles };
    }

    /// <summary>Margins of all draws at one temperature, or null without data.</summary>
    private static double[]? Margins(ReductionPair pair, double kelvin, ErrorSample sample)
    {
        try
        {
            ReductionPoint point = pair.At(kelvin);
            double[] margins = new double[sample.Draws];
            Array.Fill(margins, point.Margin);
            // The reaction's own Gibbs energy is the margin with the sign turned.
            sample.Add(point.Reaction, kelvin, -1, margins);
            return margins;
        }
        catch (NoAnswerException)
        {
            return null;
        }
    }

    private static double Percentile(double[] sorted, double share) => sorted[(int)Math.Round(share * (sorted.Length - 1))];
}
