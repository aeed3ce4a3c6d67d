using FtEstimate.Workloads;

namespace FtEstimate.Tests.Workloads;

public sealed class RotationSynthesisTests
{
    private static readonly double[] Errors = [1e-3, 1e-6, 1e-10, 1e-12];

    // the formulas of Ross 2016, Bocharov 2015 and Kliuchnikov 2023 worked out by hand calculator to one decimal
    [Theory]
    [InlineData("ross", 29.9, 59.8, 99.7, 119.6)]
    [InlineData("repeat-until-success", 20.7, 32.1, 47.4, 55.0)]
    [InlineData("mixed-fallback", 10.1, 15.4, 22.5, 26.0)]
    public void T_per_rotation_at_four_precisions(string name, double at1e3, double at1e6, double at1e10, double at1e12)
    {
        RotationSynthesis method = RotationSynthesis.Named(name)!;

        Assert.Equal(
            [at1e3, at1e6, at1e10, at1e12],
            Errors.Select(error => Math.Round(method.TPerRotation(error), 1)));
    }

    // the published example of Ross 2016 (arXiv:1403.2975), a z rotation by π/128 within 1e-10, has 100 T gates
    [Fact]
    public void Ross_comes_within_one_gate_of_the_published_example() =>
        Assert.Equal(100, RotationSynthesis.Ross.TPerRotation(1e-10), 1.0);

    [Fact]
    public void Repeating_methods_say_that_their_count_is_a_mean()
    {
        Assert.False(RotationSynthesis.Ross.IsExpectation);
        Assert.True(RotationSynthesis.RepeatUntilSuccess.IsExpectation);
        Assert.Contains("second-hand", RotationSynthesis.MixedFallback.Source, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(-1e-3)]
    public void An_error_outside_0_to_1_is_refused(double error) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => RotationSynthesis.Ross.TPerRotation(error));
}
