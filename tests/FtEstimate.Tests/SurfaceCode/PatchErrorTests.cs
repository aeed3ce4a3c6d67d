using FtEstimate.SurfaceCode;

namespace FtEstimate.Tests.SurfaceCode;

public sealed class PatchErrorTests
{
    [Fact]
    public void Equal_strengths_give_the_law_itself()
    {
        Assert.All(ScalingLaws.All, law =>
            Assert.Equal(law.LogicalErrorPerRound(0.3, 11), PatchError.PerRound(law, new NoiseStrength(0.3, 0.3), 11), 1e-18));
    }

    [Fact]
    public void Each_basis_counts_for_half()
    {
        double error = PatchError.PerRound(ScalingLaws.Textbook, new NoiseStrength(0.1, 0), 11);

        Assert.Equal(0.5e-7, error, 1e-18);
    }

    [Fact]
    public void A_factor_scales_both_strengths() =>
        Assert.Equal(new NoiseStrength(0.2, 0.4), new NoiseStrength(0.1, 0.2).Times(2));

    [Fact]
    public void Suppression_stays_a_number_without_noise() =>
        Assert.Equal(1, PatchError.SuppressionFactor(ScalingLaws.PublishedFit, new NoiseStrength(0, 0), 9));

    [Fact]
    public void Laws_are_found_by_name_and_nothing_else_is()
    {
        Assert.Same(ScalingLaws.Textbook, ScalingLaws.Named("textbook"));
        Assert.Same(ScalingLaws.PublishedFit, ScalingLaws.Named("published-fit"));
        Assert.Null(ScalingLaws.Named("wishful"));
    }
}
