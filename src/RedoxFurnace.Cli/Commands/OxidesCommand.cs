using System.CommandLine;
using System.Text.Json;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>oxides list|show|check</c>: the database and its examiner.</summary>
internal static class OxidesCommand
{
    public static Command Create(Screen screen, CommonOptions common)
    {
        Command command = new("oxides", "what the database holds, and whether it is sound");
        command.Subcommands.Add(CreateList(screen, common));
        command.Subcommands.Add(CreateShow(screen, common));
        command.Subcommands.Add(OxidesCheckCommand.Create(screen, common));
        command.Subcommands.Add(OxidesAssessCommand.Create(screen, common));
        command.Subcommands.Add(OxidesAgainstCommand.Create(screen, common));
        command.Subcommands.Add(OxidesFitCommand.Create(screen, common));
        command.Subcommands.Add(OxidesWhyCommand.Create(screen, common));
        return command;
    }

    private static Command CreateList(Screen screen, CommonOptions common)
    {
        Option<string> of = new("--of") { Description = "only substances that hold one of these elements", HelpName = "LIST" };
        Command command = new("list", "every substance with its phases, range, uncertainty and source") { of };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            string[] elements = parsed.GetValue(of)?.Split(',', StringSplitOptions.TrimEntries) ?? [];
            foreach (string element in elements.Where(element => !AtomicWeights.Has(element)))
            {
                throw RequestException.UnknownWord("element", element, AtomicWeights.Symbols);
            }

            Substance[] chosen = [.. database.All.Where(substance => elements.Length == 0 || elements.Any(element => substance.Formula.Of(element) > 0))];
            return screen.Show(PresentList(chosen, database), common.Form(parsed));
        });
        return command;
    }

    private static Answer PresentList(Substance[] substances, SubstanceDatabase database) => new()
    {
        Headline = FormattableString.Invariant($"{substances.Length} substances; database {database.Hash[..12]}."),
        CallsForSafety = false,
        Tables =
        [
            new AnswerTable(
                null,
                [
                    new Column("formula", "formula", false), new Column("name", "name", false), new Column("kind", "class", false), new Column("phases", "phases", false) { IsProse = true },
                    new Column("from K", "t_min_K"), new Column("to K", "t_max_K"), new Column("± H kJ/mol", "uncertainty_kJ_per_mol"), new Column("source", "source", false) { IsProse = true },
                ],
                [.. substances.Select(substance => (IReadOnlyList<Cell>)[
                    Cell.Word(substance.Id),
                    Cell.Word(substance.Name),
                    Cell.Word(ClassWord(substance.Class)),
                    Cell.Word(string.Join(", ", substance.Phases.Select(phase => phase.Label))),
                    Cell.Of(substance.LowestKelvin, 0),
                    Cell.Of(substance.HighestKelvin, 0),
                    UncertaintyCell(substance),
                    Cell.Word(string.Join(", ", substance.Phases.Select(phase => phase.SourceKey).Distinct()) + (substance.IsFromOverlay ? " (own)" : string.Empty)),
                ])]),
        ],
        Notes = ["* marks an uncertainty that is a class default"],
        Json = writer => WriteList(writer, substances, database),
    };

    private static Cell UncertaintyCell(Substance substance)
    {
        Cell number = Cell.Of(substance.Uncertainty.EnthalpyJoules / 1000, 1);
        return substance.Uncertainty.EnthalpyIsClassDefault ? new Cell(number.Text + "*", number.Exact) : number;
    }

    private static string ClassWord(SubstanceClass kind) => kind == SubstanceClass.CompoundOxide ? "compound-oxide" : kind.ToString().ToLowerInvariant();

    private static void WriteList(Utf8JsonWriter writer, Substance[] substances, SubstanceDatabase database)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/substance-list/1");
        writer.WriteString("database_hash", database.Hash);
        writer.WriteStartArray("substances");
        foreach (Substance substance in substances)
        {
            writer.WriteStartObject();
            writer.WriteString("formula", substance.Id);
            writer.WriteString("name", substance.Name);
            writer.WriteString("class", ClassWord(substance.Class));
            writer.Number("t_min_K", substance.LowestKelvin);
            writer.Number("t_max_K", substance.HighestKelvin);
            writer.Number("uncertainty_kJ_per_mol", substance.Uncertainty.EnthalpyJoules / 1000);
            writer.WriteBoolean("uncertainty_is_class_default", substance.Uncertainty.EnthalpyIsClassDefault);
            writer.WriteBoolean("own_entry", substance.IsFromOverlay);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Common([], Citations.Of(substances, database), null, [], [], []);
        writer.WriteEndObject();
    }

    private static Command CreateShow(Screen screen, CommonOptions common)
    {
        Argument<string> name = new("SUBSTANCE") { Description = "formula or name, such as SiO2, wustite, Mg(g)" };
        Option<string> at = new("--at") { Description = "temperatures: 25C, 1000C or a range (25C)", HelpName = "T" };
        Command command = new("show", "phases and properties of one substance") { name, at };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            TemperatureSeries series = TemperatureSeries.Parse(parsed.GetValue(at) ?? "25C", "--at");
            SubstanceReport report = SubstanceReport.Of(parsed.GetValue(name)!, series, database);
            return screen.Show(PresentShow(report, new TemperatureColumns(series.Unit, common.UsUnits(parsed))), common.Form(parsed));
        });
        return command;
    }

    private static Answer PresentShow(SubstanceReport report, TemperatureColumns temperatures)
    {
        Substance substance = report.Substance;
        ExpandedUncertainty uncertainty = substance.Uncertainty;
        string known = uncertainty.EnthalpyIsClassDefault ? "class default" : "given by its source";
        return new Answer
        {
            Headline = FormattableString.Invariant($"{substance.Id}{(substance.Name is { } name ? $" ({name})" : string.Empty)}, {substance.Formula.MolarMass:0.###} g/mol, {substance.Phases.Length} phase{(substance.Phases.Length == 1 ? string.Empty : "s")}, data from {substance.LowestKelvin:0.##} to {substance.HighestKelvin:0.##} K."),
            CallsForSafety = false,
            Tables =
            [
                new AnswerTable(
                    null,
                    [
                        .. temperatures.Columns, new Column("phase", "phase", false), new Column("Cp J/(mol K)", "cp_J_per_mol_K"), new Column("H kJ/mol", "h_kJ_per_mol"),
                        new Column("S J/(mol K)", "s_J_per_mol_K"), new Column("G kJ/mol", "g_kJ_per_mol"), new Column("dGf kJ/mol", "dGf_kJ_per_mol"),
                    ],
                    [.. report.Rows.Select(row => (IReadOnlyList<Cell>)[
                        .. temperatures.Cells(row.At), Cell.Word(row.Phase ?? "no data"), Cell.Of(row.State?.HeatCapacity, 2), Cell.Of(row.State?.Enthalpy / 1000, 2),
                        Cell.Of(row.State?.Entropy, 2), Cell.Of(row.State?.Gibbs / 1000, 2), Cell.Of(row.FormationGibbs / 1000, 2),
                    ])]),
                new AnswerTable(
                    "Phases",
                    [new Column("phase", "label", false), new Column("state", "state", false), new Column("from K", "t_min_K"), new Column("to K", "t_max_K"), new Column("from C", "t_min_C"), new Column("to C", "t_max_C")],
                    [.. substance.Phases.Select(phase => (IReadOnlyList<Cell>)[
                        Cell.Word(phase.Label), Cell.Word(phase.State.ToString().ToLowerInvariant()), Cell.Of(phase.Range.LowKelvin, 2), Cell.Of(phase.Range.HighKelvin, 2),
                        Cell.Of(phase.Range.LowKelvin - PhysicalConstants.ZeroCelsiusInKelvin, 1), Cell.Of(phase.Range.HighKelvin - PhysicalConstants.ZeroCelsiusInKelvin, 1),
                    ])]),
            ],
            Notes = report.Notes,
            Assumptions = [.. AssumedOf(uncertainty, known)],
            Sources = report.Sources,
            Json = writer => WriteShow(writer, report, [.. AssumedOf(uncertainty, known)]),
        };
    }

    private static IEnumerable<string> AssumedOf(ExpandedUncertainty uncertainty, string known) =>
    [
        "elements in their reference state have H = 0 at 298.15 K; H and G are apparent values; dGf from the elements in their stable state, vapour at 1 bar above boiling",
        FormattableString.Invariant($"uncertainty (k = 2): H {uncertainty.EnthalpyJoules / 1000:0.##} kJ/mol ({known}), S {uncertainty.EntropyJoulesPerKelvin:0.##} J/(mol K){(uncertainty.EntropyIsClassDefault ? " (class default)" : string.Empty)}"),
    ];

    private static void WriteShow(Utf8JsonWriter writer, SubstanceReport report, IEnumerable<string> assumptions)
    {
        Substance substance = report.Substance;
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/substance/1");
        writer.WriteString("formula", substance.Id);
        writer.WriteString("name", substance.Name);
        writer.WriteNumber("molar_mass_g_per_mol", substance.Formula.MolarMass);
        writer.WriteStartArray("phases");
        foreach (Phase phase in substance.Phases)
        {
            writer.WriteStartObject();
            writer.WriteString("label", phase.Label);
            writer.WriteString("state", phase.State.ToString().ToLowerInvariant());
            writer.WriteNumber("t_min_K", phase.Range.LowKelvin);
            writer.WriteNumber("t_max_K", phase.Range.HighKelvin);
            writer.WriteString("source", phase.SourceKey);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("rows");
        foreach (SubstanceReport.Row row in report.Rows)
        {
            writer.WriteStartObject();
            writer.WriteNumber("temperature_K", row.At.Kelvin);
            writer.WriteString("phase", row.Phase);
            writer.Number("cp_J_per_mol_K", row.State?.HeatCapacity);
            writer.Number("h_kJ_per_mol", row.State?.Enthalpy / 1000);
            writer.Number("s_J_per_mol_K", row.State?.Entropy);
            writer.Number("g_kJ_per_mol", row.State?.Gibbs / 1000);
            writer.Number("dGf_kJ_per_mol", row.FormationGibbs / 1000);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Number("uncertainty_kJ_per_mol", substance.Uncertainty.EnthalpyJoules / 1000);
        writer.Number("uncertainty_S_J_per_mol_K", substance.Uncertainty.EntropyJoulesPerKelvin);
        writer.WriteBoolean("uncertainty_is_class_default", substance.Uncertainty.EnthalpyIsClassDefault);
        writer.Common(assumptions, report.Sources, (substance.LowestKelvin, substance.HighestKelvin), report.Notes, [], []);
        writer.WriteEndObject();
    }
}
