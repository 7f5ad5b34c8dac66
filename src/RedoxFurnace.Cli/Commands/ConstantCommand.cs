using System.Collections.Immutable;
using System.CommandLine;
using System.Text.Json;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>constant "Fe2O3 + CO = Fe + CO2" --at T</c>: balances a reaction and tells K, driving force and turning temperatures.</summary>
internal static class ConstantCommand
{
    public static Command Create(Screen screen, CommonOptions common)
    {
        Argument<string> equation = new("EQUATION") { Description = "such as \"Fe2O3 + CO = Fe + CO2\", spaces around + and =" };
        Option<string> at = new("--at") { Description = "temperatures: 1000C, 700C,800C or 600C..1300C/50C", Required = true, HelpName = "T" };
        Option<string> activity = new("--activity") { Description = "activities of condensed substances, such as Fe=0.2 (1)", HelpName = "LIST" };
        Option<string> partial = new("--partial") { Description = "pressures of its gases, such as CO=0.8bar,CO2=0.1bar (1 bar each)", HelpName = "LIST" };
        Option<string> from = new("--from") { Description = "a measured K at another temperature, such as \"1000C: 0.42\"", HelpName = "\"T: K\"" };
        Command command = new("constant", "balance a reaction: K, driving force, heat, entropy and the temperatures where it turns") { equation, at, activity, partial, from };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            (Reaction reaction, bool changed) = ReactionBalance.Of(ReactionEquation.Parse(parsed.GetValue(equation)!), database);
            TemperatureSeries series = TemperatureSeries.Parse(parsed.GetValue(at)!, "--at");
            ReactionConstants constants = new(reaction, database, Activities.Parse(parsed.GetValue(activity), database), Pressures(parsed.GetValue(partial)), Measured(parsed.GetValue(from)));
            ConstantRow[] rows = [.. series.Points.Select(point => constants.At(point.Kelvin))];
            if (rows.All(row => row.WhyNot is not null))
            {
                throw new NoAnswerException(rows[0].WhyNot!);
            }

            return screen.Show(Present(constants, rows, changed, series.Unit, common.UsUnits(parsed), database, parsed.GetValue(activity), parsed.GetValue(partial), parsed.GetValue(from)), common.Form(parsed));
        });
        return command;
    }

    private static ImmutableDictionary<string, double> Pressures(string? text)
    {
        ImmutableDictionary<string, double>.Builder all = ImmutableDictionary.CreateBuilder<string, double>(StringComparer.Ordinal);
        foreach (string part in text?.Split(',', StringSplitOptions.TrimEntries) ?? [])
        {
            string[] pair = part.Split('=', StringSplitOptions.TrimEntries);
            if (pair.Length != 2 || pair[0].Length == 0 || !all.TryAdd(pair[0], Pressure.Parse(pair[1], "--partial").NaturalLogBar))
            {
                throw new RequestException($"--partial '{part}' is not understood; write each gas once, such as CO=0.8bar,CO2=0.1bar");
            }
        }

        return all.ToImmutable();
    }

    private static (double Kelvin, double K)? Measured(string? text)
    {
        if (text is null)
        {
            return null;
        }

        string[] parts = text.Split(':', StringSplitOptions.TrimEntries);
        if (parts.Length != 2)
        {
            throw new RequestException($"--from '{text}' is not understood; write a temperature and K, such as \"1000C: 0.42\"");
        }

        double k = NumberWithUnit.ParsePlain(parts[1], "--from");
        return k > 0 ? (Temperature.Parse(parts[0], "--from").Kelvin, k) : throw new RequestException($"--from '{text}': K must be above 0");
    }

    private static Answer Present(ReactionConstants constants, ConstantRow[] rows, bool changed, TemperatureUnit unit, bool us, SubstanceDatabase database, string? activity, string? partial, string? from)
    {
        Reaction reaction = constants.Reaction;
        string headline = Headline(constants, rows);
        string[] notes = [.. Notes(constants, rows, changed, from)];
        string[] assumptions =
        [
            "K and Q for the reaction as balanced here, gases in bar, condensed substances pure or at the given activity",
            activity is null && partial is null ? "Q = 1: every gas at 1 bar, every activity 1" : $"activities {activity ?? "1"}; gases {partial ?? "1 bar each"}, those not named at 1 bar",
            "driving force RT ln(K/Q), positive to the right; uncertainties are expanded (k = 2); equilibrium, not rate",
        ];
        string[] sources = [.. Citations.Of(reaction.Terms.Select(term => term.Substance), database)];
        TemperatureColumns temperatures = new(unit, us);
        return new Answer
        {
            Headline = headline,
            CallsForSafety = false,
            Tables =
            [
                new AnswerTable(
                    null,
                    [
                        .. temperatures.Columns, new Column("log10 K", "log10_K"), new Column("±", "log10_K_uncertainty"), new Column("log10 Q", "log10_Q"), new Column("driving\nkJ", "driving_kJ"),
                        new Column("dG0\nkJ", "dG_kJ"), new Column("±", "dG_uncertainty_kJ"), new Column("dH0\nkJ", "dH_kJ"), new Column("±", "dH_uncertainty_kJ"), new Column("dS0\nJ/K", "dS_J_per_K"), new Column("±", "dS_uncertainty_J_per_K"),
                        .. from is null ? Array.Empty<Column>() : [new Column("log10 K\nfrom measured", "log10_K_from_measured")],
                    ],
                    [.. rows.Select(row => (IReadOnlyList<Cell>)[
                        .. temperatures.Cells(Temperature.FromKelvin(row.Kelvin)), Cell.Of(row.Log10K, 3), Cell.Of(row.Log10KUncertainty, 3), Cell.Of(row.Log10Q, 3), Cell.Of(row.Driving / 1000, 1),
                        Cell.Of(row.Gibbs / 1000, 1), Cell.Of(row.GibbsUncertainty / 1000, 1), Cell.Of(row.Enthalpy / 1000, 1), Cell.Of(row.EnthalpyUncertainty / 1000, 1), Cell.Of(row.Entropy, 1), Cell.Of(row.EntropyUncertainty, 1),
                        .. from is null ? Array.Empty<Cell>() : [Cell.Of(row.Log10KFromMeasured, 3)],
                    ])]),
            ],
            Notes = notes,
            Assumptions = assumptions,
            Sources = sources,
            Json = writer => Write(writer, constants, rows, changed, headline, notes, assumptions, sources),
        };
    }

    private static string Headline(ReactionConstants constants, ConstantRow[] rows)
    {
        string turning = constants.Turning.IsEmpty
            ? $"it never turns between {Temperature.FromKelvin(constants.DataRange.Low)} and {Temperature.FromKelvin(constants.DataRange.High)}"
            : string.Join(", ", constants.Turning.Select(turn => $"{(turn.IsFloor ? "goes above" : "goes below")} {Printed.Fixed(turn.Kelvin - PhysicalConstants.ZeroCelsiusInKelvin, 0)} C"));
        ConstantRow[] known = [.. rows.Where(row => row.Driving is not null)];
        int right = known.Count(row => row.Driving > 0);
        string direction = right == known.Length ? "to the right" : right == 0 ? "to the left" : $"to the right at {Printed.Fixed(right, 0)} of {Printed.Fixed(known.Length, 0)} temperatures";
        return $"{constants.Reaction.Text}: driven {direction}{(known.Length == 1 ? $" at {Temperature.FromKelvin(known[0].Kelvin)}" : string.Empty)}; {turning}.";
    }

    private static IEnumerable<string> Notes(ReactionConstants constants, ConstantRow[] rows, bool changed, string? from)
    {
        if (changed)
        {
            yield return "balanced here; K belongs to these numbers";
        }

        foreach (string reason in rows.Select(row => row.WhyNot).OfType<string>())
        {
            yield return reason;
        }

        foreach (TurningTemperature turn in constants.Turning)
        {
            yield return FormattableString.Invariant($"turns at {turn.Kelvin:0.0} K ({turn.Kelvin - PhysicalConstants.ZeroCelsiusInKelvin:0} C{(turn.Uncertainty is { } error ? FormattableString.Invariant($", ± {error:0} K") : string.Empty)}): {(turn.IsFloor ? "floor" : "ceiling")}");
        }

        if (constants.Offset is { } offset)
        {
            yield return FormattableString.Invariant($"the measured K ({from}) is {Math.Exp(offset):0.000} times that of the database; van 't Hoff carries it to the other temperatures with the database's enthalpy");
        }

        foreach (Substance own in constants.Reaction.Terms.Select(term => term.Substance).Where(substance => substance.IsFromOverlay))
        {
            yield return $"{own.Id} is from your own folder";
        }
    }

    private static void Write(Utf8JsonWriter writer, ReactionConstants constants, ConstantRow[] rows, bool changed, string headline, string[] notes, string[] assumptions, string[] sources)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/constant/1");
        writer.WriteString("headline", headline);
        writer.WriteString("equation", constants.Reaction.Text);
        writer.WriteBoolean("balanced_by_program", changed);
        writer.WriteStartArray("rows");
        foreach (ConstantRow row in rows)
        {
            writer.WriteStartObject();
            writer.WriteNumber("temperature_K", row.Kelvin);
            writer.Number("log10_K", row.Log10K);
            writer.Number("log10_K_uncertainty", row.Log10KUncertainty);
            writer.Number("log10_Q", row.Log10Q);
            writer.Number("driving_kJ", row.Driving / 1000);
            writer.Number("dG_kJ", row.Gibbs / 1000);
            writer.Number("dG_uncertainty_kJ", row.GibbsUncertainty / 1000);
            writer.Number("dH_kJ", row.Enthalpy / 1000);
            writer.Number("dH_uncertainty_kJ", row.EnthalpyUncertainty / 1000);
            writer.Number("dS_J_per_K", row.Entropy);
            writer.Number("dS_uncertainty_J_per_K", row.EntropyUncertainty);
            writer.Number("log10_K_from_measured", row.Log10KFromMeasured);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("turning_temperatures_K");
        foreach (TurningTemperature turn in constants.Turning)
        {
            writer.WriteNumberValue(turn.Kelvin);
        }

        writer.WriteEndArray();
        writer.WriteStartArray("turning");
        foreach (TurningTemperature turn in constants.Turning)
        {
            writer.WriteStartObject();
            writer.WriteNumber("temperature_K", turn.Kelvin);
            writer.Number("uncertainty_K", turn.Uncertainty);
            writer.WriteString("kind", turn.IsFloor ? "floor" : "ceiling");
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Common(assumptions, sources, constants.DataRange, notes, [], []);
        writer.WriteEndObject();
    }
}
