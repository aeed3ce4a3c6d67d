using FtEstimate.Noise;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Tests.SurfaceCode;

public sealed class LawComparisonTests
{
    [Fact]
    public void The_same_uniform_noise_is_put_into_both_laws()
    {
        const double uniformError = 1e-3;
        NoiseStrength strength = PatchError.Uniform(ScalingLaws.PublishedFit, uniformError);

        LawComparison laws = LawComparison.Of(ScalingLaws.PublishedFit, strength, 21).Single(other => other.Other.Name == "textbook");

        Assert.Equal(uniformError, laws.UniformError, 12);

        // 0.1 (100 p)^11, the rule of thumb itself
        Assert.Equal(1e-12, laws.OtherPerRound, 1e-20);

        // O'Rourke 2025 (arXiv:2409.14765): simulation lies 18 times above the rule at distance 21, p = 1e-3; the fit meets it within 20 %
        Assert.InRange(laws.Ratio!.Value, 18 / 1.2, 18 * 1.2);
    }

    [Fact]
    public void Every_other_law_stands_beside_the_one_in_use() =>
        Assert.Equal(["simulated", "published-fit"], LawComparison.Of(ScalingLaws.Textbook, NoiseStrength.Even(0.1), 11).Select(law => law.Other.Name));
}
