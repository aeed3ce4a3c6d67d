using System.Globalization;
using CsCheck;
using FtEstimate.Quantities;

namespace FtEstimate.Tests.Quantities;

public sealed class ShowTests
{
    [Theory]
    [InlineData(312_345, 3, "312,000")]
    [InlineData(312_345, 2, "310,000")]
    [InlineData(9_996, 3, "10,000")]
    [InlineData(1_234, 2, "1200")]
    [InlineData(3.14159, 2, "3.1")]
    [InlineData(0.0120, 3, "0.0120")]
    [InlineData(0.00099999, 3, "0.00100")]
    [InlineData(0.000999, 3, "9.99e-4")]
    [InlineData(19_254_000, 3, "19,300,000")]
    [InlineData(2.624e9, 3, "2.62e9")]
    [InlineData(1e23, 2, "1.0e23")]
    [InlineData(9.97e-16, 2, "1.0e-15")]
    [InlineData(-0.25, 2, "-0.25")]
    [InlineData(0, 3, "0")]
    public void Significant_digits(double value, int digits, string expected) =>
        Assert.Equal(expected, Show.Significant(value, digits));

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void What_is_not_a_number_is_not_shown_as_one(double value)
    {
        Assert.Equal("n/a", Show.Significant(value, 3));
        Assert.Equal("n/a", Show.Atoms(value));
        Assert.Equal("n/a", Show.Probability(value));
        Assert.Equal("n/a", Show.Duration(value));
        Assert.Equal("n/a", Show.Percent(value));
    }

    [Theory]
    [InlineData(0, "0")]
    [InlineData(0.023, "0.023")]
    [InlineData(4.71e-11, "4.7e-11")]
    [InlineData(0.5, "0.50")]
    [InlineData(0.9987, "0.9987")]
    [InlineData(0.99999864, "0.9999986")]
    [InlineData(1, "1")]
    public void Probabilities(double value, string expected) => Assert.Equal(expected, Show.Probability(value));

    [Theory]
    [InlineData(0.2669, "27 %")]
    [InlineData(0.00012, "0.012 %")]
    [InlineData(1.2e-7, "1.2e-5 %")]
    [InlineData(0.9987, "99.87 %")]
    [InlineData(0.9, "90 %")]
    [InlineData(1, "100 %")]
    [InlineData(2.5, "250 %")]
    [InlineData(0, "0 %")]
    public void Percentages(double value, string expected) => Assert.Equal(expected, Show.Percent(value));

    [Theory]
    [InlineData(47e-6, "47 µs")]
    [InlineData(0.6e-6, "600 ns")]
    [InlineData(1.3e-3, "1.3 ms")]
    [InlineData(0.25, "250 ms")]
    [InlineData(0.9999, "1 s")]
    [InlineData(59.9, "1 minute")]
    [InlineData(90, "1.5 minutes")]
    [InlineData(13 * 3600, "13 hours")]
    [InlineData(23.97 * 3600, "1 day")]
    [InlineData(4.21 * 86_400, "4.2 days")]
    [InlineData(21 * 86_400, "21 days")]
    [InlineData(264 * 86_400, "264 days")]
    [InlineData(18.2 * 365.25 * 86_400, "18 years")]
    [InlineData(43_000 * 365.25 * 86_400, "43,000 years")]
    [InlineData(3.2e20, "1.0e13 years")]
    [InlineData(1e-12, "0.001 ns")]
    [InlineData(0, "0 s")]
    public void Durations_as_people_say_them(double seconds, string expected) => Assert.Equal(expected, Show.Duration(seconds));

    [Theory]
    [InlineData(0, "0")]
    [InlineData(17, "17")]
    [InlineData(4618, "4620")]
    [InlineData(55_432, "55,400")]
    [InlineData(22_325_184, "22,300,000")]
    public void Atom_counts(double atoms, string expected) => Assert.Equal(expected, Show.Atoms(atoms));

    // the text must be the number to half a unit of its last digit, whatever the size
    [Fact]
    public void The_text_reads_back_as_the_rounded_number() =>
        Gen.Select(Gen.Double[-300, 300], Gen.Double[1, 10], Gen.Int[1, 12]).Sample((exponent, mantissa, digits) =>
        {
            double value = mantissa * Math.Pow(10, exponent);
            double back = double.Parse(Show.Significant(value, digits), CultureInfo.InvariantCulture);
            return Math.Abs(back / value - 1) <= 0.5000001 * Math.Pow(10, 1 - digits);
        });
}
