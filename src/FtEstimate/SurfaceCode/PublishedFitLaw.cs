namespace FtEstimate.SurfaceCode;

/// <summary>A law taken from published Monte Carlo of the rotated memory with every location noisy.</summary>
/// <remarks>
/// Any logical error of one patch in one round; x = p/0.00529, p the Pauli error of every location, waiting included.
/// From distance 9 on the fit of O'Rourke 2025 (arXiv:2409.14765, its data repository): 0.078·x^(0.578d − 0.28) per d rounds and
/// basis, so 2/d times that per round for both. It meets the published counts within 20 % for 5e-4 ≤ p ≤ 3e-3 and 9 ≤ d ≤ 21,
/// and lies up to 50 % above them at p = 5e-3. At distances 3, 5 and 7 a log-log interpolation of the counts themselves, continued with the
/// slope of the last interval, which is close to (d+1)/2 at the low end.
/// Even distances below 9 take the geometric mean of their neighbours. Uncorrelated matching decoder.
/// For x &lt; 1 a larger distance never gives a larger error.
/// </remarks>
public sealed class PublishedFitLaw : IScalingLaw
{
    private const double FitThreshold = 0.00529;
    private const int SmallestFittedDistance = 9;
    private const int LargestFittedDistance = 21;

    private static readonly LogLogCurve Distance3 = PublishedCounts.Distance3.ToCurve(FitThreshold);
    private static readonly LogLogCurve Distance5 = PublishedCounts.Distance5.ToCurve(FitThreshold);
    private static readonly LogLogCurve Distance7 = PublishedCounts.Distance7.ToCurve(FitThreshold);

    /// <inheritdoc/>
    public string Name => "published-fit";

    /// <inheritdoc/>
    public string Source =>
        "Fit and counts of O'Rourke 2025 (arXiv:2409.14765): rotated memory, every location noisy, uncorrelated matching.";

    /// <inheritdoc/>
    public double Threshold => FitThreshold;

    /// <inheritdoc/>
    public double LogicalErrorPerRound(double x, int distance)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(distance, 3);
        double logX = Math.Log(x);
        double error = distance >= SmallestFittedDistance
            ? 2 * 0.078 / distance * Math.Exp((0.578 * distance - 0.28) * logX)
            : Math.Exp(LogErrorOfSmallPatch(logX, distance));
        return Math.Min(0.5, error);
    }

    /// <inheritdoc/>
    public LawReach Reach(double x, int distance)
    {
        double uniformError = x * FitThreshold;
        return distance switch
        {
            > LargestFittedDistance => new LawReach(false, "Extrapolated: the published counts end at distance 21."),
            >= SmallestFittedDistance => Between(uniformError, 3e-3)
                ? new LawReach(true, "Within 20 % of the published counts, which span uniform errors of 5e-4 to 3e-3 and distances 9 to 21.")
                : new LawReach(false, "Extrapolated: from distance 9 on the fit holds for uniform errors of 5e-4 to 3e-3; closer to threshold it is up to 50 % too high."),
            _ => Between(uniformError, 5e-3)
                ? new LawReach(true, "Interpolated between published counts at uniform errors of 5e-4 to 5e-3.")
                : new LawReach(false, "Extrapolated: at small distances the published counts span uniform errors of 5e-4 to 5e-3."),
        };

        static bool Between(double uniformError, double largest) =>
            uniformError >= 5e-4 * (1 - Tolerance.Relative) && uniformError <= largest * (1 + Tolerance.Relative);
    }

    private static double LogErrorOfSmallPatch(double logX, int distance) => distance switch
    {
        3 => Distance3.At(logX),
        5 => Distance5.At(logX),
        7 => Distance7.At(logX),
        4 => 0.5 * (Distance3.At(logX) + Distance5.At(logX)),
        6 => 0.5 * (Distance5.At(logX) + Distance7.At(logX)),
        _ => 0.5 * (Distance7.At(logX) + Math.Log(2 * 0.078 / 9) + (0.578 * 9 - 0.28) * logX),
    };
}
