using RedoxFurnace.Quantities;

namespace RedoxFurnace.Cli.Presentation;

/// <summary>Temperatures in the user's scale and in kelvin, with Fahrenheit beside for units of the United States.</summary>
internal sealed class TemperatureColumns(TemperatureUnit unit, bool us)
{
    private readonly TemperatureUnit[] _units = [.. new[] { unit, TemperatureUnit.Kelvin }.Concat(us ? [TemperatureUnit.Fahrenheit] : []).Distinct()];

    public IEnumerable<Column> Columns => _units.Select(scale => new Column("T " + Temperature.Symbol(scale), "temperature_" + Temperature.Symbol(scale)));

    public IEnumerable<Cell> Cells(Temperature at) => _units.Select(scale => Cell.Of(at.In(scale), scale == TemperatureUnit.Kelvin ? 2 : 1));
}
