using CsCheck;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Tests.SurfaceCode;

public sealed class MemoryErrorTests
{
    // exact arithmetic, P = ½[1 − (1 − 2ε)ⁿ]
    [Theory]
    [InlineData(0.00143, 25, 0.0345495446)]
    [InlineData(0.03028, 25, 0.3951191493)]
    [InlineData(0.02914, 25, 0.3885667356)]
    [InlineData(1e-6, 1e6, 0.4323324937)]
    public void Rounds_add_up_to_the_exact_value(double perRound, double rounds, double expected) =>
        Assert.Equal(expected, MemoryError.AfterRounds(perRound, rounds), 5e-11);

    // exact arithmetic
    [Theory]
    [InlineData(0.01, 10, 1.009115679215e-3)]
    [InlineData(0.1, 25, 4.443012935140e-3)]
    [InlineData(0.007854, 9, 8.788199905491e-4)]
    public void The_error_per_round_is_the_exact_inverse(double afterRounds, double rounds, double expected) =>
        Assert.Equal(expected, MemoryError.PerRound(afterRounds, rounds), 1e-15);

    [Fact]
    public void Tiny_errors_keep_their_digits() =>
        Assert.Equal(1e-17, MemoryError.AfterRounds(1e-20, 1000), 1e-30);

    [Fact]
    public void There_and_back_is_the_same_number() =>
        Gen.Select(Gen.Double[-18, -1], Gen.Int[1, 60]).Sample((exponent, rounds) =>
        {
            double perRound = Math.Pow(10, exponent) / rounds;
            double back = MemoryError.PerRound(MemoryError.AfterRounds(perRound, rounds), rounds);
            return Math.Abs(back / perRound - 1) < 1e-12;
        });
}
