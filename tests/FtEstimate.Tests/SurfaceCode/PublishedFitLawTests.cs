using CsCheck;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Tests.SurfaceCode;

/// <summary>Against the published counts of O'Rourke 2025 (arXiv:2409.14765), all rows of Published/memory-uniform-noise.csv.</summary>
public sealed class PublishedFitLawTests
{
    private static readonly IScalingLaw Law = ScalingLaws.PublishedFit;

    [Fact]
    public void The_table_holds_every_published_row()
    {
        Assert.Equal(31, PublishedMemoryRow.EveryPlace.Count());
        Assert.Equal(10, PublishedMemoryRow.SlowReadout.Count());
    }

    // 20 % is what the fit reaches; the worst row inside is +16.5 % at d = 9, p = 5e-4
    [Fact]
    public void From_distance_9_the_fit_is_within_20_percent_of_every_row_inside_its_range()
    {
        List<PublishedMemoryRow> inside = [.. PublishedMemoryRow.EveryPlace.Where(row => row.Distance >= 9 && row.Error <= 3e-3)];

        Assert.Equal(15, inside.Count);
        Assert.All(inside, row =>
        {
            Assert.True(Law.Reach(row.Error / Law.Threshold, row.Distance).Inside);
            Assert.InRange(Ratio(row), 0.8, 1.2);
        });
    }

    [Fact]
    public void Near_threshold_the_fit_says_it_is_outside_and_is_at_most_50_percent_too_high()
    {
        List<PublishedMemoryRow> outside = [.. PublishedMemoryRow.EveryPlace.Where(row => row.Distance >= 9 && row.Error > 3e-3)];

        Assert.Equal([9, 11, 15, 21], outside.Select(row => row.Distance));
        Assert.All(outside, row =>
        {
            LawReach reach = Law.Reach(row.Error / Law.Threshold, row.Distance);
            Assert.False(reach.Inside);
            Assert.StartsWith("Extrapolated", reach.Sentence, StringComparison.Ordinal);
            Assert.InRange(Ratio(row), 1.19, 1.5);
        });
    }

    [Fact]
    public void At_distances_3_5_and_7_the_law_passes_through_the_rows()
    {
        List<PublishedMemoryRow> small = [.. PublishedMemoryRow.EveryPlace.Where(row => row.Distance <= 7)];

        Assert.Equal(12, small.Count);
        Assert.All(small, row =>
        {
            Assert.True(Law.Reach(row.Error / Law.Threshold, row.Distance).Inside);
            Assert.Equal(1, Ratio(row), 1e-9);
        });
    }

    // quieter waiting at the same p: measured against the every-place rows themselves these lie at 0.71 to 0.81
    [Fact]
    public void Slow_readout_rows_lie_below_the_law_of_every_place_noise_by_less_than_half()
    {
        Assert.All(PublishedMemoryRow.SlowReadout, row => Assert.InRange(Ratio(row), 1.2, 1.75));
    }

    [Fact]
    public void Below_the_data_small_patches_follow_a_power_close_to_half_of_d_plus_1()
    {
        foreach (int distance in (int[])[3, 5, 7])
        {
            double slope = Math.Log2(Law.LogicalErrorPerRound(0.02, distance) / Law.LogicalErrorPerRound(0.01, distance));

            // counts at the two lowest rates carry 2 to 3 % of noise, so 0.05 in the slope
            Assert.Equal((distance + 1) / 2.0, slope, 0.08);
        }
    }

    [Fact]
    public void Below_threshold_a_larger_distance_never_gives_a_larger_error()
    {
        for (double logX = -6; logX <= 0; logX += 0.001)
        {
            double x = Math.Pow(10, logX);
            for (int distance = 3; distance < 60; distance++)
            {
                Assert.True(
                    Law.LogicalErrorPerRound(x, distance + 1) < Law.LogicalErrorPerRound(x, distance),
                    $"x = {x}, distance {distance}");
            }
        }
    }

    [Fact]
    public void Grows_with_noise_until_it_reaches_one_half() =>
        Gen.Select(Gen.Double[1e-4, 2], Gen.Double[1.0001, 2], Gen.Int[3, 99]).Sample((x, factor, distance) =>
        {
            double error = Law.LogicalErrorPerRound(x, distance);
            return error == 0.5 || Law.LogicalErrorPerRound(x * factor, distance) > error;
        });

    [Fact]
    public void No_noise_gives_no_error_and_strong_noise_one_half()
    {
        foreach (int distance in (int[])[3, 4, 5, 6, 7, 8, 9, 25])
        {
            Assert.Equal(0, Law.LogicalErrorPerRound(0, distance));
            Assert.Equal(0.5, Law.LogicalErrorPerRound(10, distance));
        }
    }

    [Fact]
    public void Beyond_distance_21_the_law_says_it_is_extrapolated() =>
        Assert.False(Law.Reach(0.2, 23).Inside);

    [Fact]
    public void Distances_below_3_are_refused() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => Law.LogicalErrorPerRound(0.1, 2));

    // published count at d = 21, p = 1e-3: 1.85e-11 per round, 18.5 times the rule of thumb; the fit is 6 % above the count
    [Fact]
    public void Lies_18_times_above_the_textbook_law_at_distance_21_and_p_1e_3()
    {
        PublishedMemoryRow row = PublishedMemoryRow.EveryPlace.Single(row => row is { Distance: 21, Error: 1e-3 });
        double textbook = ScalingLaws.Textbook.LogicalErrorPerRound(0.1, 21);

        Assert.Equal(18.5, row.PerRound / textbook, 0.05);
        Assert.InRange(Law.LogicalErrorPerRound(1e-3 / Law.Threshold, 21) / textbook, 18, 20);
    }

    private static double Ratio(PublishedMemoryRow row) =>
        Law.LogicalErrorPerRound(row.Error / Law.Threshold, row.Distance) / row.PerRound;
}
