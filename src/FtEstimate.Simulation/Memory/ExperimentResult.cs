using FtEstimate.SurfaceCode;

namespace FtEstimate.Simulation.Memory;

/// <summary>One experiment with what its counts say and what the law says.</summary>
/// <param name="Setting">Size and basis.</param>
/// <param name="Count">Shots and failures; no shots where it was not reached.</param>
/// <param name="Seconds">Time spent on it, all runs together.</param>
/// <param name="LawPerRound">Error per round of this observable by the law: half of the law at the strength of its basis.</param>
public sealed record ExperimentResult(MemorySetting Setting, ShotCount Count, double Seconds, double LawPerRound)
{
    /// <summary>Failures a ratio needs: with fewer its standard error says little.</summary>
    public const int FewestFailures = 10;

    /// <summary>Failure probability of a shot; null without shots.</summary>
    public ErrorEstimate? PerShot => Count.Shots > 0 ? ErrorEstimate.PerShot(Count) : null;

    /// <summary>The same per round.</summary>
    public ErrorEstimate? PerRound => PerShot?.PerRound(Setting.Rounds);

    /// <summary>Whether half of the shots may fail: then what one round adds no longer shows.</summary>
    public bool Saturates => Count.Failures >= FewestFailures && Count.Failures >= NeverSaturates * Count.Shots && PerShot is { High: >= 0.5 };

    // with ten failures or more in as many times ten shots the interval ends below 0.18, and need not be worked out
    private const double NeverSaturates = 0.1;

    /// <summary>Error per round with its standard error; null with few failures, or where half of the shots may fail.</summary>
    public MeasuredRate? Rate
    {
        get
        {
            if (Count.Failures < FewestFailures || Saturates)
            {
                return null;
            }

            double perShot = (double)Count.Failures / Count.Shots;
            double slope = Math.Pow(1 - (2 * perShot), (1.0 / Setting.Rounds) - 1) / Setting.Rounds;
            return new MeasuredRate(
                MemoryError.PerRound(perShot, Setting.Rounds), slope * Math.Sqrt(perShot * (1 - perShot) / Count.Shots));
        }
    }
}

/// <summary>A value with its standard error.</summary>
/// <param name="Value">The value.</param>
/// <param name="Error">Its standard error.</param>
public readonly record struct MeasuredRate(double Value, double Error)
{
    /// <summary>The mean of independent values.</summary>
    public static MeasuredRate Mean(ReadOnlySpan<MeasuredRate> rates)
    {
        double sum = 0;
        double variance = 0;
        foreach (MeasuredRate rate in rates)
        {
            sum += rate.Value;
            variance += rate.Error * rate.Error;
        }

        return new MeasuredRate(sum / rates.Length, Math.Sqrt(variance) / rates.Length);
    }

    /// <summary>The quotient of two independent values above 0: relative variances add, first order.</summary>
    public static MeasuredRate operator /(MeasuredRate above, MeasuredRate below)
    {
        double value = above.Value / below.Value;
        return new MeasuredRate(value, value * double.Hypot(above.Error / above.Value, below.Error / below.Value));
    }

    /// <summary>The quotient of two independent values above 0.</summary>
    public static MeasuredRate Divide(MeasuredRate left, MeasuredRate right) => left / right;
}
