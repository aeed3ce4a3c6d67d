using System.Collections.Immutable;

namespace FtEstimate.Workloads;

/// <summary>How many T gates one z rotation costs: slope·L + offset, with L = log₂(1/ε).</summary>
/// <param name="Name">The name used in scenario files.</param>
/// <param name="Slope">T gates per bit of precision.</param>
/// <param name="Offset">T gates on top.</param>
/// <param name="IsExpectation">True where the count is a mean over measurement outcomes: parallel rotations wait for the slowest.</param>
/// <param name="Source">First author, year, arXiv number, and how it was seen.</param>
public sealed record RotationSynthesis(string Name, double Slope, double Offset, bool IsExpectation, string Source)
{
    /// <summary>Deterministic synthesis without ancillas; the O(log L) term is left out.</summary>
    public static RotationSynthesis Ross { get; } = new(
        "ross", 3, 0, false, "Ross 2016 (arXiv:1403.2975), leading term; error in operator norm");

    /// <summary>Repeat until success, mean count.</summary>
    public static RotationSynthesis RepeatUntilSuccess { get; } = new(
        "repeat-until-success", 1.15, 9.2, true, "Bocharov 2015 (arXiv:1404.5320), mean count");

    /// <summary>Mixed fallback synthesis, mean count.</summary>
    public static RotationSynthesis MixedFallback { get; } = new(
        "mixed-fallback", 0.53, 4.86, true, "Kliuchnikov 2023 (arXiv:2203.10064), mean count; error in diamond norm; read second-hand, not checked against the paper");

    /// <summary>All methods, the dearest at high precision first.</summary>
    public static ImmutableArray<RotationSynthesis> All { get; } = [Ross, RepeatUntilSuccess, MixedFallback];

    /// <summary>The method of that name, or null.</summary>
    public static RotationSynthesis? Named(string name) => All.FirstOrDefault(method => method.Name == name);

    /// <summary>T gates of one rotation; a mean where the method repeats or falls back, so not a whole number.</summary>
    /// <param name="error">Error allowed for this rotation, above 0 and below 1.</param>
    /// <exception cref="ArgumentOutOfRangeException">The error is not between 0 and 1.</exception>
    public double TPerRotation(double error)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(error);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(error, 1);
        return Slope * Math.Log2(1 / error) + Offset;
    }
}
