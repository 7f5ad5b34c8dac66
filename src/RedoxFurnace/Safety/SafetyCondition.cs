namespace RedoxFurnace.Safety;

/// <summary>One set of circumstances in which a rule speaks: everything stated in it must hold.</summary>
public sealed record SafetyCondition
{
    /// <summary>Any of these formulas is present; null where not asked.</summary>
    public IReadOnlyList<string>? Species { get; init; }

    /// <summary>Any of these elements is present in any formula; null where not asked.</summary>
    public IReadOnlyList<string>? Elements { get; init; }

    /// <summary>Of each of these groups of formulas at least one is present; null where not asked.</summary>
    public IReadOnlyList<IReadOnlyList<string>>? AllOf { get; init; }

    /// <summary>Any of these tags is set; null where not asked.</summary>
    public IReadOnlyList<string>? Tags { get; init; }

    /// <summary>The work goes above this temperature in degrees Celsius; null where not asked.</summary>
    public double? AboveCelsius { get; init; }

    /// <summary>The work goes below this temperature in degrees Celsius; null where not asked.</summary>
    public double? BelowCelsius { get; init; }

    /// <summary>Whether the condition holds. An unknown temperature holds, because silence would be the wrong guess.</summary>
    public bool Holds(HazardContext context)
    {
        ArgumentNullException.ThrowIfNull(context);
        return (Species is null || Species.Any(context.Formulas.Contains))
            && (Elements is null || Elements.Any(context.Elements.Contains))
            && (AllOf is null || AllOf.All(group => group.Any(context.Formulas.Contains)))
            && (Tags is null || Tags.Any(context.Tags.Contains))
            && (AboveCelsius is not { } above || context.HighestKelvin is not { } highest || highest - 273.15 > above)
            && (BelowCelsius is not { } below || context.LowestKelvin is not { } lowest || lowest - 273.15 < below);
    }
}
