using FtEstimate.Simulation.Memory;

namespace FtEstimate.Tests.Simulation.Memory;

public sealed class ErrorEstimateTests
{
    // Clopper-Pearson: solutions of the binomial tail equations at 2.5 %, computed apart from this code to ten digits; of a million shots the library's beta function keeps nine
    [Theory]
    [InlineData(0, 10, 0, 0.3084971078)]
    [InlineData(1, 10, 0.002528578544, 0.445016117)]
    [InlineData(5, 10, 0.1870860284, 0.8129139716)]
    [InlineData(10, 10, 0.6915028922, 1)]
    [InlineData(0, 1000, 0, 0.003682083897)]
    [InlineData(7, 1000, 0.00281885876, 0.01436919498)]
    [InlineData(10, 1_000_000, 4.795398787e-6, 1.839027889e-5)]
    public void The_interval_is_that_of_Clopper_and_Pearson(long failures, long shots, double low, double high)
    {
        ErrorEstimate estimate = ErrorEstimate.PerShot(new ShotCount(shots, failures));

        Assert.Equal((double)failures / shots, estimate.Value);
        Assert.InRange(Math.Abs(estimate.Low - low), 0, 1e-8 * low);
        Assert.InRange(Math.Abs(estimate.High - high), 0, 1e-8 * high);
    }

    // ½[1 − (1 − 2P)^{1/r}] in exact arithmetic, thirteen digits
    [Theory]
    [InlineData(0.01, 10, 1.009115679215e-3)]
    [InlineData(0.1, 25, 4.443012935140e-3)]
    [InlineData(0.007854, 9, 8.788199905491e-4)]
    public void The_error_per_round_is_the_exact_root(double perShot, int rounds, double perRound)
    {
        ErrorEstimate estimate = new ErrorEstimate(perShot, perShot / 2, perShot * 2).PerRound(rounds);

        Assert.InRange(Math.Abs((estimate.Value / perRound) - 1), 0, 1e-11);
        Assert.True(estimate.Low < estimate.Value && estimate.Value < estimate.High);
    }

    // for small k of large n the ends are Poisson quantiles over n, χ²(0.975; 4)/2 = 5.571643390938: relative corrections are of order k/n.
    // The library's beta function keeps five digits here; a search on the probability itself would keep one
    [Fact]
    public void The_interval_keeps_its_digits_for_very_many_shots()
    {
        ErrorEstimate estimate = ErrorEstimate.PerShot(new ShotCount(1_000_000_000, 1));

        Assert.InRange(estimate.High / 5.571643390938e-9, 1 - 1e-4, 1 + 1e-4);
        Assert.InRange(estimate.Low / 2.531780798428e-11, 1 - 1e-4, 1 + 1e-4);
    }

    [Fact]
    public void A_failure_probability_above_one_half_counts_as_one_half()
    {
        ErrorEstimate estimate = ErrorEstimate.PerShot(new ShotCount(10, 9)).PerRound(5);

        Assert.Equal((0.5, 0.5), (estimate.Value, estimate.High));
    }
}
