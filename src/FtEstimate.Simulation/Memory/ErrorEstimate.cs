using FtEstimate.SurfaceCode;
using MathNet.Numerics.Distributions;

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
        count.Failures == 0 ? 0 : Beta.InvCDF(count.Failures, count.Shots - count.Failures + 1, OutsideEachEnd),
        count.Failures == count.Shots ? 1 : Beta.InvCDF(count.Failures + 1, count.Shots - count.Failures, 1 - OutsideEachEnd));

    /// <summary>Per round, where this is per shot: ½[1 − (1 − 2P)^{1/r}]; anything above one half counts as one half.</summary>
    public ErrorEstimate PerRound(int rounds) => new(
        MemoryError.PerRound(Math.Min(Value, 0.5), rounds),
        MemoryError.PerRound(Math.Min(Low, 0.5), rounds),
        MemoryError.PerRound(Math.Min(High, 0.5), rounds));
}
