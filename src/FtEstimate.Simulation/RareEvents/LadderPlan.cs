namespace FtEstimate.Simulation.RareEvents;

/// <summary>How much work a rare event is worth, and where its ladder of noise levels begins and ends.</summary>
/// <param name="Start">Noise of the first level, where failures are common: a failure in some ten to a hundred shots is good; without failures the first level never ends.</param>
/// <param name="Target">Noise of the last level, above 0 and below <paramref name="Start"/>.</param>
/// <param name="Seed">Seed; the same seed gives the same estimate whatever the number of threads.</param>
/// <param name="Ladders">Independent repetitions of everything, at least 2: their spread is the error bar.</param>
/// <param name="StartFailures">Failing shots drawn at the first level by each ladder, at least <paramref name="Walkers"/> and at least 2.</param>
/// <param name="Walkers">Chains of a ladder, at least 1; each begins with a failing shot of its own.</param>
/// <param name="SamplesPerLevel">Samples that each walker gives at each level, at least 1.</param>
/// <param name="MovesPerSample">Proposed changes between two samples, at least 1.</param>
/// <remarks>
/// With the defaults a textbook circuit of distance 13 to 15 at a thousandth comes out within a tenth (one standard error); four times the walkers halve that.
/// </remarks>
public sealed record LadderPlan(
    double Start, double Target, ulong Seed, int Ladders = 16, int StartFailures = 64, int Walkers = 64, int SamplesPerLevel = 8, int MovesPerSample = 10)
{
    /// <summary>Complains of a plan that cannot be carried out.</summary>
    /// <exception cref="ArgumentOutOfRangeException">A number lies outside its range.</exception>
    internal void Check()
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(Target);
        ArgumentOutOfRangeException.ThrowIfLessThanOrEqual(Start, Target);
        ArgumentOutOfRangeException.ThrowIfLessThan(Ladders, 2);
        ArgumentOutOfRangeException.ThrowIfLessThan(Walkers, 1);
        ArgumentOutOfRangeException.ThrowIfLessThan(StartFailures, Math.Max(Walkers, 2));
        ArgumentOutOfRangeException.ThrowIfLessThan(SamplesPerLevel, 1);
        ArgumentOutOfRangeException.ThrowIfLessThan(MovesPerSample, 1);
    }
}
