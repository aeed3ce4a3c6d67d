using System.Globalization;
using CsCheck;
using FtEstimate.Reports.Figures;

namespace FtEstimate.Tests.Reports;

public sealed class ApportionTests
{
    private static readonly Gen<double[]> Parts = Gen.Double[0, 1].Array[1, 12].Where(parts => parts.Sum() > 0);

    [Fact]
    public void Whole_parts_add_up_and_stay_within_one_of_the_truth() => Parts.Sample(parts =>
    {
        double[] atoms = [.. parts.Select(part => part * 1e5)];
        double[] whole = Apportion.ToWhole(atoms);
        Assert.Equal(Math.Round(atoms.Sum()), whole.Sum());
        Assert.All(whole.Zip(atoms), pair => Assert.InRange(pair.First - pair.Second, -1.001, 1.001));
    });

    [Fact]
    public void Percentages_add_up_to_a_hundred() => Parts.Sample(parts =>
    {
        double sum = parts.Sum();
        string[] shown = Apportion.ToPercent([.. parts.Select(part => part / sum)]);
        decimal total = shown.Sum(text => text.StartsWith('<') ? 0 : decimal.Parse(text[..^2], CultureInfo.InvariantCulture));
        Assert.Equal(100.0m, total);
    });

    [Fact]
    public void Small_numbers_add_up_at_any_scale() => Gen.Select(Parts, Gen.Double[-12, 0]).Sample((parts, exponent) =>
    {
        string[] shown = Apportion.ToSmallNumbers([.. parts.Select(part => part * Math.Pow(10, exponent))]);
        decimal[] numbers = [.. shown.Select(text => decimal.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture))];
        Assert.Equal(numbers[^1], numbers[..^1].Sum());
    });
}
