namespace RedoxFurnace.Atmospheres;

/// <summary>The oxygen pressure of CO + CO2 and H2 + H2O that may only pass oxygen to one another and to O2.</summary>
/// <remarks>
/// THEORY.md, 'Gas equilibrium'. One unknown, v = ln of moles of O2; the balance rises with it throughout, so one bracketed Newton root suffices.
/// Written either as oxygen beyond CO (right where that is scarce) or as fuel less twice the O2 (right where fuel is scarce), so that no digits cancel.
/// </remarks>
internal readonly struct GasShift
{
    private const double LowestLog = -2000;
    private const int MostSteps = 200;

    private readonly double _carbon;
    private readonly double _hydrogen;
    private readonly double _beyondMonoxide;
    private readonly double _burnt;
    private readonly double _others;
    private readonly double _logPressure;
    private readonly double _logCarbonSplit;
    private readonly double _logHydrogenSplit;
    private readonly bool _fuelIsScarce;

    /// <param name="carbon">Moles of CO + CO2, each possibly 0.</param>
    /// <param name="hydrogen">Moles of H2 + H2O.</param>
    /// <param name="beyondMonoxide">Oxygen atoms beyond one per CO or CO2, above 0.</param>
    /// <param name="burnt">Twice O2 less H2 and CO: negative where fuel is left.</param>
    /// <param name="others">Moles of all gases but O2.</param>
    /// <param name="logPressure">ln of total pressure in bar.</param>
    /// <param name="logCarbonSplit">ln K of CO + O2/2 = CO2.</param>
    /// <param name="logHydrogenSplit">ln K of H2 + O2/2 = H2O.</param>
    public GasShift(double carbon, double hydrogen, double beyondMonoxide, double burnt, double others, double logPressure, double logCarbonSplit, double logHydrogenSplit)
    {
        _carbon = carbon;
        _hydrogen = hydrogen;
        _beyondMonoxide = beyondMonoxide;
        _burnt = burnt;
        _others = others;
        _logPressure = logPressure;
        _logCarbonSplit = logCarbonSplit;
        _logHydrogenSplit = logHydrogenSplit;
        _fuelIsScarce = Math.Abs(burnt) < beyondMonoxide;
    }

    /// <summary>ln(1 + e^x) without overflow.</summary>
    public static double Softplus(double x) => x > 35 ? x : x < -745 ? 0 : Log1p(Math.Exp(x));

    /// <summary>ln of moles of O2.</summary>
    public double Solve()
    {
        double high = Math.Log(0.5 * _beyondMonoxide);
        double low = LowestLog;
        double v = Start(low, high);
        for (int step = 0; step < MostSteps; step++)
        {
            (double value, double slope) = Balance(v);
            if (value > 0)
            {
                high = v;
            }
            else
            {
                low = v;
            }

            double next = v - (value / slope);
            if (!(next >= low && next <= high))
            {
                next = 0.5 * (low + high);
            }

            if (Math.Abs(next - v) <= 1e-15 * Math.Max(1, Math.Abs(v)))
            {
                return next;
            }

            v = next;
        }

        return v;
    }

    /// <summary>ln(pO2/bar)/2 where there are e^v moles of O2.</summary>
    public double HalfLogOxygen(double v) => 0.5 * (_logPressure + v - Math.Log(_others + Math.Exp(v)));

    private double Start(double low, double high)
    {
        double split = _hydrogen > 0 && (_carbon == 0 || _logHydrogenSplit > _logCarbonSplit) ? _logHydrogenSplit : _logCarbonSplit;
        double fuel = Math.Max(-_burnt, 1e-12 * (_carbon + _hydrogen));
        double u = Math.Log(_beyondMonoxide / fuel) - split;
        return Math.Clamp(_burnt > 0 ? Math.Log(0.5 * _burnt) : (2 * u) - _logPressure + Math.Log(_others), low + 1, high);
    }

    private (double Value, double Slope) Balance(double v)
    {
        double moles = Math.Exp(v);
        double u = HalfLogOxygen(v);
        double slopeOfU = 0.5 * _others / (_others + moles);
        (double dioxide, double monoxide) = Split(_logCarbonSplit + u);
        (double water, double hydrogen) = Split(_logHydrogenSplit + u);
        double oxygen = 2 * moles;
        double exchange = ((_carbon * dioxide * monoxide) + (_hydrogen * water * hydrogen)) * slopeOfU;
        if (!_fuelIsScarce)
        {
            double bound = (_carbon * dioxide) + (_hydrogen * water) + oxygen;
            return (Math.Log(bound / _beyondMonoxide), (exchange + oxygen) / bound);
        }

        double more = oxygen + Math.Max(0, -_burnt);
        double less = (_carbon * monoxide) + (_hydrogen * hydrogen) + Math.Max(0, _burnt);
        return (Math.Log(more / less), (oxygen / more) + (exchange / less));
    }

    /// <summary>Shares of the oxidised and the reduced gas where ln of their ratio is x.</summary>
    private static (double Oxidised, double Reduced) Split(double x)
    {
        double e = Math.Exp(-Math.Abs(x));
        double large = 1 / (1 + e);
        double small = e / (1 + e);
        return x >= 0 ? (large, small) : (small, large);
    }

    private static double Log1p(double x)
    {
        // For small x the rounding of 1 + x is divided out again, which keeps every digit.
        double sum = 1 + x;
        return sum == 1 ? x : Math.Log(sum) * (x / (sum - 1));
    }
}
