using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Reductants;

/// <summary>What a ranking assumes of gases and activities.</summary>
public sealed record RankConditions
{
    /// <summary>The ratio pH2/pH2O or pCO/pCO2 taken when none is given.</summary>
    public const double UsualGasRatio = 100;

    /// <summary>Total pressure shared by the gases of the reaction; null puts each gas at 1 bar.</summary>
    public Pressure? Total { get; init; }

    /// <summary>Fixed pressure of CO over graphite, or null.</summary>
    public Pressure? Monoxide { get; init; }

    /// <summary>pH2/pH2O or pCO/pCO2, above 0.</summary>
    public double GasRatio { get; init; } = UsualGasRatio;

    /// <summary>The ratio pH2/pH2O that a frost point stands for, or null.</summary>
    public double? HydrogenRatioOfFrost { get; init; }

    /// <summary>Nitrogen pressure, or null without nitrogen.</summary>
    public Pressure? Nitrogen { get; init; }

    /// <summary>A flux charged in excess, formula, or null.</summary>
    public string? Flux { get; init; }

    /// <summary>Activities of condensed phases.</summary>
    public Activities Activities { get; init; } = Activities.AllOne;

    /// <summary>The ratio a gas is judged at.</summary>
    /// <param name="gas">H2 or CO.</param>
    /// <returns>Above 0.</returns>
    public double RatioOf(string gas) => gas == "H2" ? HydrogenRatioOfFrost ?? GasRatio : GasRatio;
}
