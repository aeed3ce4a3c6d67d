using CsCheck;
using FtEstimate.MagicStates;

namespace FtEstimate.Tests.MagicStates;

public sealed class NoiseGridTests
{
    private static readonly Gen<double> Values = Gen.Double[-20, 3].Select(exponent => Math.Pow(10, exponent));

    [Fact]
    public void Values_are_rounded_up_by_less_than_a_step() =>
        Values.Sample(value => NoiseGrid.RoundUp(value) >= value && NoiseGrid.RoundUp(value) < value * NoiseGrid.Ratio * (1 + 1e-12));

    [Fact]
    public void Values_on_the_grid_stay_where_they_are() =>
        Gen.Int[-2000, 200].Sample(bin => NoiseGrid.BinAbove(NoiseGrid.ValueOf(bin)) == bin);

    [Fact]
    public void Zero_stays_zero() => Assert.Equal(0, NoiseGrid.RoundUp(0));

    [Theory]
    [InlineData(-1.0)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void What_is_no_strength_is_refused(double value) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => NoiseGrid.BinAbove(value));
}
