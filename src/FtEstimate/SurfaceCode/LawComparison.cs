using System.Collections.Immutable;
using FtEstimate.Noise;

namespace FtEstimate.SurfaceCode;

/// <summary>What another law says of the same patch under the same physical noise.</summary>
/// <param name="Other">The other law.</param>
/// <param name="UniformError">The uniform error of the textbook circuit that is as strong as the noise, by the law in use.</param>
/// <param name="InUsePerRound">Any logical error of one patch in one round by the law in use.</param>
/// <param name="OtherPerRound">The same by the other law.</param>
public sealed record LawComparison(IScalingLaw Other, double UniformError, double InUsePerRound, double OtherPerRound)
{
    /// <summary>Error by the law in use over that by the other; null where the other says 0.</summary>
    public double? Ratio => OtherPerRound > 0 ? InUsePerRound / OtherPerRound : null;

    /// <summary>Every other law beside the law in use.</summary>
    /// <remarks>A strength is p over the threshold of its law, so the same noise has another strength under another law.</remarks>
    public static ImmutableArray<LawComparison> Of(IScalingLaw law, NoiseStrength strength, int distance) =>
    [
        .. ScalingLaws.All.Where(other => other.Name != law.Name).Select(other => new LawComparison(
            other,
            strength.Mean * law.Threshold,
            PatchError.PerRound(law, strength, distance),
            PatchError.PerRound(other, strength * (law.Threshold / other.Threshold), distance))),
    ];
}
