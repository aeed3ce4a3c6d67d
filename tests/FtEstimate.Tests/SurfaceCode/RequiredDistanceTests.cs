using FtEstimate.SurfaceCode;

namespace FtEstimate.Tests.SurfaceCode;

public sealed class RequiredDistanceTests
{
    private static readonly double[] Targets = [1e-9, 1e-12, 1e-15, 1e-18];

    // by exact rational arithmetic from 0.1 (100 p)^((d+1)/2); all of p = 1e-3 and two of p = 1e-4 are exact ties
    [Theory]
    [InlineData(1e-4, 7, 11, 13, 17)]
    [InlineData(5e-4, 13, 17, 21, 27)]
    [InlineData(1e-3, 15, 21, 27, 33)]
    [InlineData(2e-3, 23, 31, 41, 49)]
    [InlineData(3e-3, 31, 43, 53, 65)]
    public void Textbook_distances_meet_ties_exactly(double error, int for1e9, int for1e12, int for1e15, int for1e18)
    {
        NoiseStrength strength = NoiseStrength.Uniform(ScalingLaws.Textbook, error);

        Assert.Equal(
            [for1e9, for1e12, for1e15, for1e18],
            Targets.Select(target => RequiredDistance.For(ScalingLaws.Textbook, strength, target)!.Value));
    }

    // an independent weighted fit of the published counts, A·Λ^−(d+1)/2 with A = 0.115, Λ = 7.71, gives 19, 25, 31, 39;
    // the published law bends with d, so it may differ by one step of 2
    [Theory]
    [InlineData(1e-9, 19)]
    [InlineData(1e-12, 25)]
    [InlineData(1e-15, 31)]
    [InlineData(1e-18, 39)]
    public void Published_fit_distances_agree_with_an_exponential_fit_of_the_counts(double target, int expected)
    {
        NoiseStrength strength = NoiseStrength.Uniform(ScalingLaws.PublishedFit, 1e-3);

        int distance = RequiredDistance.For(ScalingLaws.PublishedFit, strength, target)!.Value;

        Assert.InRange(distance, expected - 2, expected + 2);
    }

    // O'Rourke 2025 (arXiv:2409.14765): 1e-12 per d rounds in one basis at p = 1e-3 takes 1397.5 ± 19.4 qubits, d = 26.4
    [Fact]
    public void The_fit_reaches_1e_12_per_d_rounds_and_basis_where_the_paper_does()
    {
        double x = 1e-3 / ScalingLaws.PublishedFit.Threshold;
        double PerDRoundsAndBasis(int distance) => ScalingLaws.PublishedFit.LogicalErrorPerRound(x, distance) * distance / 2;

        Assert.True(PerDRoundsAndBasis(26) > 1e-12);
        Assert.True(PerDRoundsAndBasis(27) < 1e-12);
    }

    [Fact]
    public void Above_threshold_no_distance_helps() =>
        Assert.Null(RequiredDistance.For(ScalingLaws.Textbook, new NoiseStrength(1.01, 1.01), 1e-6));

    [Fact]
    public void One_bad_basis_alone_can_rule_out_every_distance() =>
        Assert.Null(RequiredDistance.For(ScalingLaws.Textbook, new NoiseStrength(0.01, 1.01), 1e-6));

    [Fact]
    public void The_smallest_patch_is_enough_for_a_weak_target() =>
        Assert.Equal(3, RequiredDistance.For(ScalingLaws.PublishedFit, new NoiseStrength(0.1, 0.1), 0.1));
}
