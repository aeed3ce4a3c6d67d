using CsCheck;
using FtEstimate.Quantities;

namespace FtEstimate.Tests.Quantities;

public sealed class FailureCompositionTests
{
    [Fact]
    public void Two_coins_show_a_head_in_three_of_four_tosses() =>
        Assert.Equal(0.75, FailureComposition.AnyOf(new RepeatedRisk(1, 0.5), new RepeatedRisk(1, 0.5)), 1e-15);

    [Fact]
    public void Tiny_risks_keep_their_digits() =>
        Assert.Equal(3e-21, FailureComposition.AnyOf(new RepeatedRisk(1, 1e-21), new RepeatedRisk(2, 1e-21)), 1e-35);

    // 1 − (1 − 1e-9)^1e9 = 1 − 1/e to nine digits
    [Fact]
    public void A_billion_chances_of_one_in_a_billion_fail_with_63_percent() =>
        Assert.Equal(1 - Math.Exp(-1), FailureComposition.Repeated(1e9, 1e-9), 1e-9);

    [Fact]
    public void Nothing_done_cannot_fail_and_a_certain_failure_does()
    {
        Assert.Equal(0, FailureComposition.AnyOf(new RepeatedRisk(0, 1)));
        Assert.Equal(1, FailureComposition.AnyOf(new RepeatedRisk(1, 1), new RepeatedRisk(5, 0.1)));
        Assert.Equal(0, FailureComposition.AnyOf());
    }

    // brute force: multiply the survivals one by one
    [Fact]
    public void Agrees_with_the_plain_product() =>
        Gen.Select(Gen.Double[0.001, 0.5], Gen.Int[0, 40], Gen.Double[0.001, 0.5]).Sample((first, count, second) =>
        {
            double survival = 1 - second;
            for (int i = 0; i < count; i++)
            {
                survival *= 1 - first;
            }

            double failure = FailureComposition.AnyOf(new RepeatedRisk(count, first), new RepeatedRisk(1, second));
            return Math.Abs(failure - (1 - survival)) < 1e-13;
        });
}
