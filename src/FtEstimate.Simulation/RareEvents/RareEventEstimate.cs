using System.Collections.Immutable;
using FtEstimate.Simulation.Memory;
using MathNet.Numerics.Distributions;

namespace FtEstimate.Simulation.RareEvents;

/// <summary>One noise level of a ladder.</summary>
/// <param name="Noise">The number that names the level.</param>
/// <param name="Probability">Failures per shot with the decoder of the target.</param>
/// <param name="RelativeStandardError">Standard error as a fraction of it, from the spread between ladders.</param>
/// <param name="Acceptance">Share of the proposed changes that were made, 0 to 1.</param>
public readonly record struct LevelEstimate(double Noise, double Probability, double RelativeStandardError, double Acceptance);

/// <summary>A failure probability too small for plain Monte Carlo.</summary>
/// <param name="Levels">Levels, the target last. The decoder has the weights of the target at all of them.</param>
/// <param name="LadderProbabilities">What each independent ladder found at the target.</param>
/// <param name="ForwardProbability">
/// The target from ratios that look down only: free of bias however slowly chains move, with a somewhat larger error. If it differs from
/// <see cref="Probability"/> by more than both errors, chains are trapped.
/// </param>
/// <param name="ForwardRelativeStandardError">Standard error of that, as a fraction of it.</param>
/// <param name="StartShots">Shots of plain Monte Carlo at the first level.</param>
/// <param name="Decodings">Upper bound of the decodings in all.</param>
/// <param name="SurvivingStarts">Starting shots per ladder from which samples of the last level descend, on average; few means that ladders are thin.</param>
public sealed record RareEventEstimate(
    ImmutableArray<LevelEstimate> Levels,
    ImmutableArray<double> LadderProbabilities,
    double ForwardProbability,
    double ForwardRelativeStandardError,
    long StartShots,
    long Decodings,
    double SurvivingStarts)
{
    private const double BelowUpperEnd = 0.975;

    /// <summary>Below any that differs from rounding; ladders that agree to the last digit would else be worth infinitely many.</summary>
    private const double SmallestVariance = 1e-30;

    /// <summary>Failures per shot at the target.</summary>
    public double Probability => Levels[^1].Probability;

    /// <summary>Standard error as a fraction of the probability; the error of plain Monte Carlo at the first level is in it.</summary>
    public double RelativeStandardError => Levels[^1].RelativeStandardError;

    /// <summary>Effective samples: failures that plain Monte Carlo would have to see for the same standard error.</summary>
    public double EquivalentFailures => 1 / Math.Max(RelativeStandardError * RelativeStandardError, SmallestVariance);

    /// <summary>The probability with its 95 % interval: Student's, on the logarithm, which keeps the lower end positive.</summary>
    public ErrorEstimate PerShot()
    {
        double factor = Math.Exp(StudentT.InvCDF(0, 1, LadderProbabilities.Length - 1, BelowUpperEnd) * RelativeStandardError);
        return new ErrorEstimate(Probability, Probability / factor, Math.Min(Probability * factor, 1));
    }
}
