using System.Collections.Immutable;

namespace RedoxFurnace.Substances;

/// <summary>Examines a database and gathers every finding instead of stopping at the first.</summary>
public static class DatabaseExaminer
{
    private const double LargestGibbsStep = 20;
    private const double LargestLineStepPerMole = 1000;
    private const double LargestEntropyFall = 0.01;
    private const int HeatCapacityPoints = 60;

    /// <summary>Examines a database that could be read, file by file.</summary>
    /// <param name="database">Built-in, or with an overlay.</param>
    /// <returns>Findings, gravest first.</returns>
    public static ImmutableArray<DatabaseFinding> Examine(SubstanceDatabase database)
    {
        List<DatabaseFinding> findings = [.. database.ReadEachFile().Select(Unreadable)];
        if (findings.Count == 0)
        {
            IReadOnlyList<Substance> all = database.All;
            findings.AddRange(all.SelectMany(OfSubstance));
            findings.AddRange(UnusedSources(all, database));
            findings.AddRange(ClassDefaults(all));
        }

        return [.. findings.OrderBy(finding => finding.Severity).ThenBy(finding => finding.At.File, StringComparer.Ordinal).ThenBy(finding => finding.At.Line)];
    }

    /// <summary>Examines a user's own files laid over the built-in database.</summary>
    /// <param name="files">The files.</param>
    /// <returns>Findings, gravest first; a file that cannot be read is a finding.</returns>
    public static ImmutableArray<DatabaseFinding> ExamineOverlay(IEnumerable<DatabaseFile> files)
    {
        try
        {
            return Examine(SubstanceDatabase.WithOverlay(files));
        }
        catch (DocumentException fault)
        {
            return [Unreadable(fault)];
        }
    }

    private static DatabaseFinding Unreadable(DocumentException fault)
        => new("unreadable", FindingSeverity.Error, fault.At, fault.Message[(fault.At.ToString().Length + 2)..]);

    private static IEnumerable<DatabaseFinding> OfSubstance(Substance substance)
        => Junctions(substance).Concat(HeatCapacities(substance)).Concat(Labels(substance)).Concat(Lines(substance));

    private static IEnumerable<DatabaseFinding> Junctions(Substance substance)
    {
        for (int i = 1; i < substance.Phases.Length; i++)
        {
            Phase low = substance.Phases[i - 1];
            Phase high = substance.Phases[i];
            double end = low.Range.HighKelvin;
            double start = high.Range.LowKelvin;
            if (end < start)
            {
                yield return low.HasDeclaredGapAfter
                    ? new DatabaseFinding("declared-gap", FindingSeverity.Warning, high.At, Invariant($"{substance.Id}: no data from {end} to {start} K, as declared"))
                    : new DatabaseFinding("range-gap", FindingSeverity.Error, high.At, Invariant($"{substance.Id}: '{low.Label}' ends at {end} K, '{high.Label}' starts at {start} K; make them meet or declare gap_after"));
                continue;
            }

            if (end > start)
            {
                yield return new DatabaseFinding("range-overlap", FindingSeverity.Warning, high.At, Invariant($"{substance.Id}: '{low.Label}' runs to {end} K, '{high.Label}' starts at {start} K; the phase of lower Gibbs energy is taken"));
            }

            foreach (DatabaseFinding finding in Step(substance, low, high, (end + start) / 2))
            {
                yield return finding;
            }
        }

        foreach (DatabaseFinding finding in PieceSteps(substance))
        {
            yield return finding;
        }
    }

    private static IEnumerable<DatabaseFinding> Step(Substance substance, Phase low, Phase high, double kelvin)
    {
        ThermalState below = low.Models[^1].At(kelvin);
        ThermalState above = high.Models[0].At(kelvin);
        double step = Math.Abs(above.Gibbs - below.Gibbs);
        if (low.Models[^1] is ReactionLine || high.Models[0] is ReactionLine)
        {
            yield break;
        }

        if (step > LargestGibbsStep)
        {
            yield return new DatabaseFinding("gibbs-step", FindingSeverity.Error, high.At, Invariant($"{substance.Id}: G steps by {step:0.#} J/mol from '{low.Label}' to '{high.Label}' at {kelvin} K; at most {LargestGibbsStep} is allowed"));
        }

        if (above.Entropy - below.Entropy < -LargestEntropyFall)
        {
            yield return new DatabaseFinding("entropy-falls", FindingSeverity.Error, high.At, Invariant($"{substance.Id}: S falls by {below.Entropy - above.Entropy:0.###} J/(mol K) from '{low.Label}' to '{high.Label}' at {kelvin} K; it must not fall on heating"));
        }
    }

    /// <summary>Pieces of one phase must join; reaction lines within 1 kJ per mole of C or N2.</summary>
    private static IEnumerable<DatabaseFinding> PieceSteps(Substance substance)
    {
        foreach (Phase phase in substance.Phases)
        {
            for (int i = 1; i < phase.Models.Length; i++)
            {
                double kelvin = phase.Models[i].Range.LowKelvin;
                double step = Math.Abs(phase.Models[i].Gibbs(kelvin) - phase.Models[i - 1].Gibbs(kelvin));
                double allowed = phase.Models[i] is ReactionLine ? LargestLineStepPerMole * Moles(substance) : LargestGibbsStep;
                if (step > allowed)
                {
                    yield return new DatabaseFinding("gibbs-step", FindingSeverity.Error, phase.At, Invariant($"{substance.Id}: G steps by {step:0.#} J/mol between pieces of '{phase.Label}' at {kelvin} K; at most {allowed:0.#} is allowed"));
                }
            }
        }
    }

    private static double Moles(Substance substance)
        => Math.Max(1, Math.Max(substance.Formula.Of("C"), substance.Formula.Of("N") / 2));

    private static IEnumerable<DatabaseFinding> HeatCapacities(Substance substance)
    {
        foreach (Phase phase in substance.Phases)
        {
            foreach (PhaseModel model in phase.Models.Where(model => model is not (AnchorModel or ReactionLine)))
            {
                double step = (model.Range.HighKelvin - model.Range.LowKelvin) / HeatCapacityPoints;
                double lowest = Enumerable.Range(0, HeatCapacityPoints + 1).Select(i => model.At(model.Range.LowKelvin + (i * step)).HeatCapacity).Min();
                if (lowest <= 0)
                {
                    yield return new DatabaseFinding("heat-capacity", FindingSeverity.Error, phase.At, Invariant($"{substance.Id}: Cp of '{phase.Label}' falls to {lowest:0.##} J/(mol K) between {model.Range.LowKelvin} and {model.Range.HighKelvin} K; it must be above 0"));
                }
            }
        }
    }

    private static IEnumerable<DatabaseFinding> Labels(Substance substance)
        => substance.Phases.GroupBy(phase => phase.Label, StringComparer.Ordinal).Where(group => group.Count() > 1)
            .Select(group => new DatabaseFinding("duplicate-label", FindingSeverity.Error, group.Last().At, $"{substance.Id}: two phases are called '{group.Key}'; give each its own label"));

    /// <summary>Every partner of a reaction line must have data over the line's own range.</summary>
    private static IEnumerable<DatabaseFinding> Lines(Substance substance)
    {
        foreach (Phase phase in substance.Phases)
        {
            foreach (ReactionLine line in phase.Models.OfType<ReactionLine>())
            {
                foreach (LinePartner partner in line.Partners)
                {
                    if (!partner.Substance.TryGibbs(line.Range.LowKelvin, out _) || !partner.Substance.TryGibbs(line.Range.HighKelvin, out _))
                    {
                        yield return new DatabaseFinding("line-partner", FindingSeverity.Error, phase.At, $"{substance.Id}: {partner.Substance.Id} has no data over the whole line {line.Range}; shorten the line");
                    }
                }
            }
        }
    }

    private static IEnumerable<DatabaseFinding> UnusedSources(IReadOnlyList<Substance> all, SubstanceDatabase database)
    {
        HashSet<string> used = [.. all.SelectMany(substance => substance.Phases.Select(phase => phase.SourceKey).Append(substance.Uncertainty.SourceKey).OfType<string>())];
        return database.Sources.Keys.Where(key => !used.Contains(key)).Order(StringComparer.Ordinal)
            .Select(key => new DatabaseFinding("unused-source", FindingSeverity.Warning, new SourceMark("sources.yaml", 1, 1), $"the source '{key}' is cited by no entry; drop it or cite it"));
    }

    private static IEnumerable<DatabaseFinding> ClassDefaults(IReadOnlyList<Substance> all)
        => all.Where(substance => substance.Uncertainty.EnthalpyIsClassDefault && substance.Uncertainty.EnthalpyJoules > 0)
            .GroupBy(substance => substance.Class)
            .OrderBy(group => group.Key)
            .Select(group => new DatabaseFinding("class-default", FindingSeverity.Notice, group.First().EntryMark, $"{group.Count()} of class {group.Key} carry the class default of uncertainty: {string.Join(", ", group.Select(substance => substance.Id))}"));

    private static string Invariant(FormattableString text) => FormattableString.Invariant(text);
}
