using FtEstimate.Noise;
using FtEstimate.Tests.Cycles;

namespace FtEstimate.Tests.Noise;

public sealed class WeightTests
{
    // the weights were fitted at d = 5 and 7 to 9 %; the sum over a uniform circuit at d = 11 must give back p over the threshold
    [Theory]
    [InlineData(0.00529)]
    [InlineData(0.01)]
    public void Uniform_noise_at_distance_11_gives_error_over_threshold(double threshold)
    {
        NoiseStrength strength = ChannelWeights.For(threshold).Uniform(1e-3, 11);

        Assert.Equal(1, strength.X / (1e-3 / threshold), 0.06);
        Assert.Equal(strength.X, strength.Z);
    }

    // 1.5 (pz + py) of an even channel is the channel's total, and so is 0.75 (px + pz + 2 py)
    [Fact]
    public void An_even_channel_counts_with_its_total_in_both_bases()
    {
        ChannelWeights weights = new(1);

        Assert.Equal(23 * 3e-3, weights.DataEvent(PauliChannel.Depolarising(3e-3)).X, 1e-15);
        Assert.Equal(23 * 3e-3, weights.DataEvent(PauliChannel.Depolarising(3e-3)).Z, 1e-15);
        Assert.Equal(143 * 3e-3, weights.WaitingPerLayer(PauliChannel.Depolarising(3e-3)).X, 1e-14);
    }

    [Fact]
    public void Phase_errors_of_data_flip_logical_x_only()
    {
        NoiseStrength strength = new ChannelWeights(1).DataEvent(new PauliChannel(0, 0, 1e-3));

        Assert.Equal(1.5 * 23e-3, strength.X, 1e-15);
        Assert.Equal(0, strength.Z);
    }

    // Baranes 2026 (arXiv:2502.20558), rounded to a hundredth of a percent
    [Fact]
    public void Loss_thresholds_fall_with_the_cube_root_of_the_life()
    {
        foreach (double[] row in PublishedTable.Rows("loss-thresholds.csv"))
        {
            Assert.Equal(row[1], 100 * LossWeights.Threshold(row[0]), 0.005);
        }
    }

    // thresholds are per gate, losses per atom, and half of the atoms are of each kind: both lost at their threshold together make strength 1
    [Fact]
    public void Loss_at_its_threshold_on_both_kinds_is_strength_1()
    {
        NoiseStrength data = LossWeights.Told(LossWeights.Threshold(16) / 2, 4);
        NoiseStrength checks = LossWeights.Told(LossWeights.Threshold(4) / 2, 1);

        Assert.Equal(1, (data + checks).Mean, 1e-12);
    }
}
