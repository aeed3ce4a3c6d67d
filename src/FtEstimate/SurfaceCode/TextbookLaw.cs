namespace FtEstimate.SurfaceCode;

/// <summary>The rule of thumb most resource papers use: 0.1·x^((d+1)/2) with x = 100·p.</summary>
/// <remarks>
/// Any logical error of one patch in one round. Fowler 2018 (arXiv:1808.06709), Litinski 2019 (arXiv:1808.02892 and
/// 1905.06903), Gidney 2021 (arXiv:1905.09749, there as 10^−⌈d/2+1⌉ at p = 1e-3). Offered to reproduce such papers:
/// published simulation with every waiting atom noisy lies 18 times higher at d = 21, p = 1e-3 (O'Rourke 2025, arXiv:2409.14765).
/// Any distance from 1 on, even ones included.
/// </remarks>
public sealed class TextbookLaw : IScalingLaw
{
    private const double SmallestStrengthInPrint = 0.01;
    private const double LargestStrengthInPrint = 0.1;

    /// <inheritdoc/>
    public string Name => "textbook";

    /// <inheritdoc/>
    public string Source =>
        "Rule of thumb 0.1 (100 p)^((d+1)/2) per patch and round, as in Fowler 2018 (arXiv:1808.06709), Litinski 2019 (arXiv:1905.06903) and Gidney 2021 (arXiv:1905.09749).";

    /// <inheritdoc/>
    public double Threshold => 0.01;

    /// <inheritdoc/>
    public double LogicalErrorPerRound(double x, int distance)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(distance, 1);
        return Math.Min(0.5, 0.1 * Math.Pow(x, 0.5 * (distance + 1)));
    }

    /// <inheritdoc/>
    public LawReach Reach(double x, int distance) =>
        x >= SmallestStrengthInPrint * (1 - Tolerance.Relative) && x <= LargestStrengthInPrint * (1 + Tolerance.Relative)
            ? new LawReach(true, "A convention that papers use for uniform errors of 1e-4 to 1e-3; it is not a fit, and simulation with noisy waiting lies above it.")
            : new LawReach(false, "Extrapolated: papers use this convention for uniform errors of 1e-4 to 1e-3 only.");
}
