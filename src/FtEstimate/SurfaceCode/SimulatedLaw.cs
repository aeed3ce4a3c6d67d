using FtEstimate.Noise;
using FtEstimate.Quantities;

namespace FtEstimate.SurfaceCode;

/// <summary>The law fitted to this project's own Monte Carlo of the memory with exact matching: A·x^(γd − δ).</summary>
/// <remarks>
/// Any logical error of one patch in one round. A, γ, δ, the threshold of the uniform textbook circuit and the weights of all causes of error were fitted
/// together (docs/method.md). Any distance from 3 on. For x &lt; 1 a larger distance never gives a larger error.
/// </remarks>
public sealed class SimulatedLaw : IScalingLaw
{
    private static readonly double LogPrefactor = Math.Log(FittedNumbers.Value("Prefactor"));
    private static readonly double DistanceSlope = FittedNumbers.Value("DistanceSlope");
    private static readonly double ExponentOffset = FittedNumbers.Value("ExponentOffset");
    private static readonly int LargestDistance = (int)FittedNumbers.Value("LargestDistance");
    private static readonly double SmallestStrength = FittedNumbers.Value("SmallestStrength");
    private static readonly double SmallestStrengthAtLargest = FittedNumbers.Value("SmallestStrengthAtLargestDistance");
    private const int DistanceOfSmallest = 9;
    private const int FarDistance = 21;
    private const double FarUniformError = 1e-3;
    private static readonly double LargestStrength = FittedNumbers.Value("LargestStrength");

    /// <inheritdoc/>
    public string Name => "simulated";

    /// <inheritdoc/>
    public string Source =>
        $"Fitted to own Monte Carlo of the rotated memory with exact matching: {Show.Significant(FittedNumbers.Value("Experiments"), 3)} experiments at distances 3 to {LargestDistance}.";

    /// <inheritdoc/>
    public double Threshold => FittedNumbers.UniformThreshold;

    /// <inheritdoc/>
    public double LogicalErrorPerRound(double x, int distance)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(distance, 3);
        return Math.Min(0.5, Math.Exp(LogPrefactor + (((DistanceSlope * distance) - ExponentOffset) * Math.Log(x))));
    }

    /// <inheritdoc/>
    public LawReach Reach(double x, int distance)
    {
        string quality = $"The fit lies within {Show.Percent(FittedNumbers.Value("TypicalResidual"))} of its experiments typically, {Show.Percent(FittedNumbers.Value("LargestResidual"))} at worst";
        string range = $"They span distances 3 to {LargestDistance} and strengths {Show.Significant(SmallestStrength, 2)} to {Show.Significant(LargestStrength, 2)}, from {Show.Significant(SmallestStrengthAtLargest, 2)} at distance {LargestDistance}";
        bool tooFar = distance > LargestDistance;
        bool tooQuiet = x < SmallestAt(distance) * (1 - Tolerance.Relative);
        bool tooNoisy = x > LargestStrength * (1 + Tolerance.Relative);
        return tooFar || tooQuiet || tooNoisy
            ? new LawReach(false, $"{range}; beyond that the law is extrapolated: at distance {FarDistance} and a uniform error of 1e-3 it gives {Show.Significant(FarRatio, 2)} times the published fit. {quality} inside.")
            : new LawReach(true, $"{quality}. {range}.");
    }

    /// <summary>The law over the published fit where published counts end: how far the extrapolation can be trusted.</summary>
    private double FarRatio => LogicalErrorPerRound(FarUniformError / Threshold, FarDistance)
        / ScalingLaws.PublishedFit.LogicalErrorPerRound(FarUniformError / ScalingLaws.PublishedFit.Threshold, FarDistance);

    /// <summary>Large patches with little noise hardly fail, so the experiments at large distances begin at larger strengths.</summary>
    private static double SmallestAt(int distance) => distance <= DistanceOfSmallest
        ? SmallestStrength
        : SmallestStrength * Math.Pow(SmallestStrengthAtLargest / SmallestStrength, (double)(distance - DistanceOfSmallest) / (LargestDistance - DistanceOfSmallest));
}
