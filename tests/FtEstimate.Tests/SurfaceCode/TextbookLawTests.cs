using FtEstimate.SurfaceCode;

namespace FtEstimate.Tests.SurfaceCode;

public sealed class TextbookLawTests
{
    private static readonly IScalingLaw Law = ScalingLaws.Textbook;

    // Gidney 2021 (arXiv:1905.09749), section on topological error: 226 x 63 patches, three quarters in use,
    // 25e9 rounds at d = 27 and p = 1e-3 fail with 27 %
    [Fact]
    public void The_topological_error_of_factoring_2048_bits_is_27_percent()
    {
        double perRound = Law.LogicalErrorPerRound(0.1, 27);

        Assert.Equal(1e-15, perRound, 1e-24);
        Assert.Equal(0.27, perRound * 226 * 63 * 0.75 * 25e9, 0.005);
    }

    // Litinski 2019 (arXiv:1808.02892): 164 tiles at d = 13, p = 1e-4, 1.1e9 steps of 13 rounds: below 1 %; at d = 11 too much
    [Theory]
    [InlineData(13, 2.3e-3, 5e-5)]
    [InlineData(11, 0.2, 0.005)]
    public void A_hundred_qubits_and_1e8_t_gates_fail_as_published(int distance, double expected, double rounding)
    {
        double failure = 164 * 1.1e9 * distance * Law.LogicalErrorPerRound(0.01, distance);

        Assert.Equal(expected, failure, rounding);
    }

    // "each increase of the code distance by 2 suppresses ... by a factor of 10" at p = 1e-3, Gidney 2021
    [Theory]
    [InlineData(3)]
    [InlineData(11)]
    [InlineData(27)]
    public void Suppression_is_10_at_one_tenth_of_threshold(int distance)
    {
        Suppression suppression = NoiseStrength.Uniform(Law, 1e-3).Suppression(Law, distance);

        Assert.Equal(10, suppression.Factor, 1e-9);
        Assert.Equal((distance, distance + 2), (suppression.FromDistance, suppression.ToDistance));
    }

    [Fact]
    public void The_error_never_exceeds_one_half() => Assert.Equal(0.5, Law.LogicalErrorPerRound(1.5, 21));

    [Fact]
    public void The_range_of_printed_use_includes_its_ends()
    {
        Assert.True(Law.Reach(1e-4 / Law.Threshold, 27).Inside);
        Assert.True(Law.Reach(1e-3 / Law.Threshold, 27).Inside);
        Assert.False(Law.Reach(2e-3 / Law.Threshold, 27).Inside);
    }
}
