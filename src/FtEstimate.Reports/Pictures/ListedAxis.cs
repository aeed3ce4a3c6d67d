using OxyPlot.Axes;

namespace FtEstimate.Reports.Pictures;

/// <summary>A linear axis whose ticks are listed, each with its label.</summary>
/// <param name="ticks">The ticks, rising.</param>
internal sealed class ListedAxis(IReadOnlyList<Tick> ticks) : LinearAxis
{
    /// <inheritdoc/>
    public override void GetTickValues(out IList<double> majorLabelValues, out IList<double> majorTickValues, out IList<double> minorTickValues)
    {
        double[] places = [.. ticks.Select(tick => tick.Place)];
        majorLabelValues = places;
        majorTickValues = places;
        minorTickValues = [];
    }

    /// <inheritdoc/>
    protected override string FormatValueOverride(double x) =>
        ticks.FirstOrDefault(tick => Math.Abs(tick.Place - x) < 1e-9).Label ?? "";
}

/// <summary>A tick.</summary>
/// <param name="Place">Where on the axis.</param>
/// <param name="Label">What it says.</param>
internal readonly record struct Tick(double Place, string Label);

/// <summary>Ticks of logarithmic axes at numbers people use.</summary>
internal static class LogTicks
{
    private static readonly double[] Steps = [1, 1.5, 2, 3, 4, 5, 6, 8];

    private static readonly (double Seconds, double[] Amounts)[] Durations =
    [
        (1e-6, [1, 10, 100]),
        (1e-3, [1, 10, 100]),
        (1, [1, 2, 5, 10, 20, 30]),
        (60, [1, 2, 3, 5, 10, 15, 20, 30, 40]),
        (3600, [1, 1.5, 2, 3, 4, 5, 6, 8, 10, 12, 15, 18]),
        (86_400, [1, 1.5, 2, 3, 4, 5, 6, 8, 10, 15, 20, 30, 40, 50, 60, 80, 100, 150, 200, 300]),
        (365.25 * 86_400, [1, 1.5, 2, 3, 4, 5, 6, 8, 10, 15, 20, 30, 50, 100, 200, 500, 1e3, 1e4, 1e5, 1e6, 1e8, 1e10]),
    ];

    /// <summary>Round numbers between two values, at most so many, at their logarithms to base 10.</summary>
    public static List<Tick> Numbers(double low, double high, int most)
    {
        var ticks = new List<Tick>();
        for (int exponent = (int)Math.Floor(Math.Log10(low)); exponent <= Math.Log10(high); exponent++)
        {
            foreach (double step in Steps)
            {
                AddInside(ticks, step * Math.Pow(10, exponent), low, high, Quantities.Show.Atoms);
            }
        }

        return Thin(ticks, most);
    }

    /// <summary>Durations people use between two values in seconds.</summary>
    public static List<Tick> Seconds(double low, double high, int most)
    {
        var ticks = new List<Tick>();
        foreach ((double unit, double[] amounts) in Durations)
        {
            foreach (double amount in amounts)
            {
                AddInside(ticks, amount * unit, low, high, Quantities.Show.Duration);
            }
        }

        return Thin(ticks, most);
    }

    private static void AddInside(List<Tick> ticks, double value, double low, double high, Func<double, string> label)
    {
        if (value >= low && value <= high)
        {
            ticks.Add(new Tick(Math.Log10(value), label(value)));
        }
    }

    /// <summary>Drops ticks that stand too close, keeping the roundest of their neighbourhood first.</summary>
    private static List<Tick> Thin(List<Tick> ticks, int most)
    {
        if (ticks.Count <= most)
        {
            return ticks;
        }

        double gap = (ticks[^1].Place - ticks[0].Place) / most;
        var kept = new List<Tick>();
        foreach (Tick tick in ticks.OrderBy(tick => Roughness(tick.Label)).ThenBy(tick => tick.Place))
        {
            if (kept.TrueForAll(other => Math.Abs(other.Place - tick.Place) >= gap))
            {
                kept.Add(tick);
            }
        }

        return [.. kept.OrderBy(tick => tick.Place)];
    }

    // 1 is rounder than 5, 5 than 2, and 1.5 is the roughest
    private static int Roughness(string label)
    {
        string digits = label.Split(' ')[0].Replace(",", "", StringComparison.Ordinal).TrimEnd('0');
        return digits switch { "1" => 0, "5" => 1, "2" => 2, "3" => 3, _ => 4 + digits.Length };
    }
}
