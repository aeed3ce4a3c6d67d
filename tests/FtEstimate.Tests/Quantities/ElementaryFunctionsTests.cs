using CsCheck;
using FtEstimate.Quantities;

namespace FtEstimate.Tests.Quantities;

public sealed class ElementaryFunctionsTests
{
    // power series by brute force; 2e-15 is nine units in the last place, shared by the function and the sum
    [Fact]
    public void Both_agree_with_their_power_series_from_1e_18_to_one_half() =>
        Gen.Select(Gen.Double[-18, Math.Log10(0.5)], Gen.Bool).Sample((exponent, negative) =>
        {
            double x = (negative ? -1 : 1) * Math.Pow(10, exponent);
            return Math.Abs(ElementaryFunctions.LogOnePlus(x) / LogSeries(x) - 1) < 2e-15
                && Math.Abs(ElementaryFunctions.ExpMinusOne(x) / ExponentialSeries(x) - 1) < 2e-15;
        });

    [Fact]
    public void The_ends_are_right()
    {
        Assert.Equal(double.NegativeInfinity, ElementaryFunctions.LogOnePlus(-1));
        Assert.Equal(-1, ElementaryFunctions.ExpMinusOne(double.NegativeInfinity));
        Assert.Equal(double.PositiveInfinity, ElementaryFunctions.ExpMinusOne(1000));
        Assert.Equal(0, ElementaryFunctions.LogOnePlus(0));
        Assert.Equal(0, ElementaryFunctions.ExpMinusOne(0));
    }

    // x + x²/2! + x³/3! ..., by Horner's rule from the small end
    private static double ExponentialSeries(double x)
    {
        double sum = 1;
        for (int term = 30; term >= 2; term--)
        {
            sum = 1 + sum * x / term;
        }

        return sum * x;
    }

    // ln(1 + x) = 2 (u + u³/3 + u⁵/5 ...) with u = x/(2 + x)
    private static double LogSeries(double x)
    {
        double u = x / (2 + x);
        double sum = 0;
        for (int power = 61; power >= 1; power -= 2)
        {
            sum = sum * u * u + 1.0 / power;
        }

        return 2 * u * sum;
    }
}
