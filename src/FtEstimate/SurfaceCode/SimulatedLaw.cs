using FtEstimate.Noise;

namespace FtEstimate.SurfaceCode;

/// <summary>The law fitted to this project's own Monte Carlo of the memory with exact matching: A·x^(γd − δ + η/d).</summary>
/// <remarks>
/// Any logical error of one patch in one round. A, γ, δ, η, the threshold of the uniform textbook circuit and the weights of all causes of error were fitted
/// together (docs/method.md). Any distance from 3 on.
/// </remarks>
public sealed class SimulatedLaw : IScalingLaw
{
    private static readonly double LogPrefactor = Math.Log(FittedNumbers.Value("Prefactor"));
    private static readonly double DistanceSlope = FittedNumbers.Value("DistanceSlope");
    private static readonly double ExponentOffset = FittedNumbers.Value("ExponentOffset");
    private static readonly double InverseDistance = FittedNumbers.Value("InverseDistance");

    /// <inheritdoc/>
    public string Name => "simulated";

    /// <inheritdoc/>
    public string Source => "Own Monte Carlo.";

    /// <inheritdoc/>
    public double Threshold => FittedNumbers.UniformThreshold;

    /// <inheritdoc/>
    public double LogicalErrorPerRound(double x, int distance)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(distance, 3);
        double exponent = (DistanceSlope * distance) - ExponentOffset + (InverseDistance / distance);
        return Math.Min(0.5, Math.Exp(LogPrefactor + (exponent * Math.Log(x))));
    }

    /// <inheritdoc/>
    public LawReach Reach(double x, int distance) => new(true, "");
}
