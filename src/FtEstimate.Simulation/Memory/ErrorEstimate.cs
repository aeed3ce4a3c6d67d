using FtEstimate.SurfaceCode;
using MathNet.Numerics;

namespace FtEstimate.Simulation.Memory;

/// <summary>A failure probability with its interval, per shot or per round.</summary>
/// <param name="Value">The most likely value.</param>
/// <param name="Low">Lower end of the 95 % interval.</param>
/// <param name="High">Upper end of the 95 % interval.</param>
public readonly record struct ErrorEstimate(double Value, double Low, double High)
{
    private const double OutsideEachEnd = 0.025;

    /// <summary>Failures over shots with the interval of Clopper and Pearson (exact).</summary>
    /// <param name="count">At least one shot.</param>
    public static ErrorEstimate PerShot(ShotCount count) => new(
        (double)count.Failures / count.Shots,
        count.Failures == 0 ? 0 : Quantile(count.Failures, count.Shots - count.Failures + 1, OutsideEachEnd),
        count.Failures == count.Shots ? 1 : Quantile(count.Failures + 1, count.Shots - count.Failures, 1 - OutsideEachEnd));

    /// <summary>Per round, where this is per shot: ½[1 − (1 − 2P)^{1/r}]; anything above one half counts as one half.</summary>
    public ErrorEstimate PerRound(int rounds) => new(
        MemoryError.PerRound(Math.Min(Value, 0.5), rounds),
        MemoryError.PerRound(Math.Min(Low, 0.5), rounds),
        MemoryError.PerRound(Math.Min(High, 0.5), rounds));

    // halving the logarithm keeps the digits of small probabilities, which a search on the number itself to a fixed accuracy loses
    private static double Quantile(double a, double b, double probability)
    {
        const double SmallestLogarithm = -700;
        const int Halvings = 64;
        double low = SmallestLogarithm;
        double high = 0;
        for (int i = 0; i < Halvings; i++)
        {
            double middle = (low + high) / 2;
            bool isBelow = SpecialFunctions.BetaRegularized(a, b, Math.Exp(middle)) < probability;
            low = isBelow ? middle : low;
            high = isBelow ? high : middle;
        }

        return Math.Exp((low + high) / 2);
    }
}
