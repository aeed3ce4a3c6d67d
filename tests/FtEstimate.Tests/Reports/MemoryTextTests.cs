using FtEstimate.Reports.Memory;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Tests.Reports;

public sealed class MemoryTextTests
{
    [Theory]
    [InlineData(3.8217, 0.0543, "3.82 ± 0.05")]
    [InlineData(3.8217, 0.0193, "3.822 ± 0.019")]
    [InlineData(5.7, 1.2, "5.7 ± 1.2")]
    [InlineData(57.3, 12, "57 ± 12")]
    [InlineData(1.0283, 0.0098, "1.028 ± 0.010")]
    [InlineData(3.21e-5, 6.1e-6, "(3.2 ± 0.6)e-5")]
    [InlineData(0.00708, 6.6e-5, "0.00708 ± 0.00007")]
    [InlineData(0.4, 0.9, "0.4 ± 0.9")]
    [InlineData(2, 0, "2.00")]
    public void A_value_and_its_error_end_at_the_same_decimal(double value, double error, string text) =>
        Assert.Equal(text, MemoryText.WithError(new MeasuredRate(value, error)));

    [Fact]
    public void Without_failures_the_upper_end_stands_for_the_value() =>
        Assert.Equal("< 0.0037", MemoryText.Value(ErrorEstimate.PerShot(new ShotCount(1000, 0))));

    [Fact]
    public void Without_shots_there_is_no_value() => Assert.Equal(("not run", ""), (MemoryText.Value(null), MemoryText.Interval(null)));
}
