using FtEstimate.Noise;

namespace FtEstimate.Tests.Noise;

public sealed class WeightTests
{
    [Fact]
    public void Every_cause_counts_and_more_of_it_counts_more() => Assert.All(Enum.GetValues<ErrorLocation>(), location =>
    {
        NoiseStrength once = ChannelWeights.Fitted.Of(ErrorSource.Of(location, 1e-3, 1), 2);
        NoiseStrength twice = ChannelWeights.Fitted.Of(ErrorSource.Of(location, 2e-3, 1), 2);

        Assert.True(once.X > 0 && once.Z > 0, location.ToString());
        Assert.Equal(2, twice.X / once.X, 1e-12);
        Assert.Equal(2, twice.Z / once.Z, 1e-12);
    });

    // the same noise must be as strong a uniform error under any law
    [Fact]
    public void Weights_scale_with_the_threshold_of_the_law()
    {
        ErrorSource gate = ErrorSource.Of(ErrorLocation.CzGate, 1e-3, 4);

        double asUniform = ChannelWeights.For(0.005).Of(gate, 1).X * 0.005;

        Assert.Equal(asUniform, ChannelWeights.For(0.01).Of(gate, 1).X * 0.01, 1e-15);
        Assert.Equal(asUniform, ChannelWeights.Fitted.Of(gate, 1).X * FittedNumbers.UniformThreshold, 1e-15);
    }

    [Fact]
    public void Phase_errors_of_data_flip_logical_x_only()
    {
        NoiseStrength strength = ChannelWeights.Fitted.Of(new ErrorSource(ErrorLocation.DataAtom, new PauliChannel(0, 0, 1e-3), 1), 1);

        Assert.Equal(ChannelWeights.Fitted[NoiseWeight.DataFlip] * 1e-3, strength.X, 1e-15);
        Assert.Equal(0, strength.Z);
    }

    // in the layers data atoms sit half the time in the Hadamard frame, so neither basis is spared
    [Fact]
    public void Phase_errors_in_layers_load_both_bases_alike()
    {
        NoiseStrength strength = ChannelWeights.Fitted.Of(new ErrorSource(ErrorLocation.WaitingInLayer, new PauliChannel(0, 0, 1e-3), 4), 1);

        Assert.Equal(strength.X, strength.Z);
        Assert.True(strength.X > 0);
    }

    // a lost atom does its harm for longer, the later it is found
    [Theory]
    [InlineData(ErrorLocation.ToldLossOfData)]
    [InlineData(ErrorLocation.UntoldLossOfData)]
    public void Rarer_looks_make_a_loss_count_more(ErrorLocation loss) => Assert.True(
        ChannelWeights.Fitted.Of(ErrorSource.Of(loss, 1e-3, 4), 4).X > ChannelWeights.Fitted.Of(ErrorSource.Of(loss, 1e-3, 4), 1).X);

    // Wu 2022 (arXiv:2201.03540): located erasures are milder than unlocated errors, 4.15 % against 0.94 %
    [Fact]
    public void A_loss_that_is_told_counts_less_than_one_that_is_not()
    {
        Assert.True(ChannelWeights.Fitted[NoiseWeight.ToldLossOfData] < ChannelWeights.Fitted[NoiseWeight.UntoldLossOfData]);
        Assert.True(ChannelWeights.Fitted[NoiseWeight.ToldLossOfChecks] < ChannelWeights.Fitted[NoiseWeight.UntoldLossOfChecks]);
    }
}
