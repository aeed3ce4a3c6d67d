using FtEstimate.Simulation.RareEvents;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Tests.Simulation.RareEvents;

/// <summary>Ratios of sums of weights where the ratio is known.</summary>
public sealed class BennettRatioTests
{
    private const int Samples = 20_000;
    private const double LogRatio = -2.5;

    private readonly double[] upper = new double[Samples];
    private readonly double[] lower = new double[Samples];

    // two normal distributions one apart: ln(π′/π) at x is x − ½ + ln(Z′/Z)
    public BennettRatioTests()
    {
        RandomBits random = new(1, 0);
        for (int sample = 0; sample < Samples; sample++)
        {
            upper[sample] = Normal(ref random) - 0.5 + LogRatio;
            lower[sample] = Normal(ref random) + 0.5 + LogRatio;
        }
    }

    // the variance is (1/A − 2)/n with A = ⟨ππ′/(π+π′)⟩ = 0.41: 0.0047
    [Fact]
    public void Samples_of_both_sides_give_the_ratio() => Assert.Equal(LogRatio, BennettRatio.LogOf(upper, lower), 0.016);

    // the variance is (e − 1)/n: 0.0093
    [Fact]
    public void Samples_of_one_side_give_the_ratio() => Assert.Equal(LogRatio, BennettRatio.LogForward(upper), 0.033);

    [Fact]
    public void Seen_from_the_other_side_the_ratio_is_inverted() =>
        Assert.Equal(-BennettRatio.LogOf(upper, lower), BennettRatio.LogOf([.. lower.Select(x => -x)], [.. upper.Select(x => -x)]), 1e-8);

    [Fact]
    public void Equal_weights_give_themselves() => Assert.Equal(-700.0, BennettRatio.LogOf([-700, -700], [-700]), 1e-9);

    // Box and Muller 1958
    private static double Normal(ref RandomBits random) =>
        Math.Sqrt(-2 * Math.Log(random.NextUnit())) * Math.Cos(2 * Math.PI * random.NextUnit());
}
