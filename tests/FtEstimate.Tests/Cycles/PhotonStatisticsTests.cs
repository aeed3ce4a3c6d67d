using CsCheck;
using FtEstimate.Cycles;
using FtEstimate.Machines;
using MathNet.Numerics;
using MathNet.Numerics.Distributions;
using MathNet.Numerics.Integration;

namespace FtEstimate.Tests.Cycles;

public sealed class PhotonStatisticsTests
{
    // own table (plain Poisson sums): the smallest signal, on a grid of a quarter count, whose mean error at the best threshold is at most the stated one
    [Fact]
    public void The_signal_of_the_table_is_the_smallest_that_reaches_the_stated_error()
    {
        foreach (double[] row in PublishedTable.Rows("photon-counts.csv"))
        {
            (double background, double error, double signal, double threshold) = (row[0], row[1], row[2], row[3]);
            CheckReading enough = PhotonStatistics.Read(Clean(signal, background), 1, 1);
            CheckReading tooLittle = PhotonStatistics.Read(Clean(signal - 0.25, background), 1, 1);

            Assert.Equal(threshold, enough.Threshold!.Value);
            Assert.True(enough.Flip <= error, $"{signal} counts over {background}: {enough.Flip}");
            Assert.True(tooLittle.Flip > error, $"{signal - 0.25} counts over {background}: {tooLittle.Flip}");
        }
    }

    // textbook: the likelihoods cross at n* = s / ln(1 + s/b)
    [Fact]
    public void Without_jumps_the_threshold_is_where_the_likelihoods_cross() =>
        Gen.Select(Gen.Double[3, 60], Gen.Double[0.05, 20]).Sample((signal, background) =>
        {
            double crossing = signal / Math.Log(1 + (signal / background));
            return PhotonStatistics.Read(Clean(signal, background), 1, 1).Threshold == (int)Math.Ceiling(crossing);
        });

    // the two tails of the library's own Poisson distribution
    [Fact]
    public void Without_jumps_the_flips_are_the_tails_of_two_poisson_laws() =>
        Gen.Select(Gen.Double[3, 60], Gen.Double[0.05, 20]).Sample((signal, background) =>
        {
            CheckReading reading = PhotonStatistics.Read(Clean(signal, background), 1, 1);
            int below = reading.Threshold!.Value - 1;
            Assert.Equal(1 - new Poisson(background).CumulativeDistribution(below), reading.DarkFlip, 1e-12);
            Assert.Equal(new Poisson(background + signal).CumulativeDistribution(below), reading.BrightFlip, 1e-12);
        });

    // the physical model integrated numerically: bright until a jump at time u, exponential with rate G, then background alone
    [Theory]
    [InlineData(50, 2, 0.02)]
    [InlineData(12, 0.5, 0.3)]
    [InlineData(30, 5, 1.5)]
    [InlineData(8, 0, 4)]
    public void Bright_counts_agree_with_numerical_integration_over_the_moment_of_the_jump(double signal, double background, double jumps)
    {
        PhotonCounting detector = Clean(signal, background) with { DepumpPerSecond = 0.75 * jumps, LossPerSecond = 0.25 * jumps };
        double[] counts = PhotonStatistics.BrightCounts(detector, 1, 1, 40);

        for (int n = 0; n < counts.Length; n++)
        {
            double stays = Math.Exp(-jumps) * Probability(n, background + signal);
            double jumped = GaussLegendreRule.Integrate(
                u => jumps * Math.Exp(-jumps * u) * Probability(n, background + (signal * u)), 0, 1, 64);
            Assert.Equal(stays + jumped, counts[n], 1e-11);
        }
    }

    // the closed form in the documentation with the library's regularised incomplete gamma function instead of our Poisson tails
    [Fact]
    public void Bright_counts_agree_with_the_closed_form_by_a_library_gamma_function() =>
        Gen.Select(Gen.Double[2, 80], Gen.Double[0.01, 3]).Sample((signal, jumps) =>
        {
            double[] counts = PhotonStatistics.BrightCounts(Clean(signal, 0) with { DepumpPerSecond = jumps }, 1, 1, 60);
            for (int n = 0; n < counts.Length; n++)
            {
                double closed = (Math.Exp(-jumps) * Probability(n, signal))
                    + (jumps / (signal + jumps) * Math.Pow(signal / (signal + jumps), n)
                        * SpecialFunctions.GammaLowerRegularized(n + 1, signal + jumps));
                Assert.Equal(closed, counts[n], 1e-12);
            }
        });

    // The lossy Poisson law of Manetsch 2025 (arXiv:2403.12021) as printed, l0 background, l1 signal, L losses:
    // (l0+l1-L)^n e^-(l0+l1)/n! + (L/l1) e^(l0 L/(l1-L)) (1-L/l1)^(n-1)/(n-1)! [G(n, l0/(1-L/l1)) - G(n, (l0+l1)/(1-L/l1))].
    // Its s t is l1 - L. Its second term carries the index n - 1 and so counts one photon more for a lost atom, and it integrates a little beyond the exposure, so
    // that it sums to 1 + O(L^2/l1): the cumulative laws may differ by one count of the bridge, L/l1, and by that excess.
    [Theory]
    [InlineData(50, 2, 0.01)]
    [InlineData(50, 2, 0.1)]
    [InlineData(120, 10, 0.05)]
    public void Bright_counts_agree_with_the_printed_lossy_poisson_law(double l1, double l0, double loss)
    {
        PhotonCounting detector = Clean(l1 - loss, l0) with { LossPerSecond = loss };
        double[] counts = PhotonStatistics.BrightCounts(detector, 1, 1, (int)(l0 + l1));
        double allowed = (loss / l1) + (loss * loss / l1);

        double ours = counts[0];
        double printed = Printed(0);
        double largest = 0;
        for (int n = 1; n < counts.Length; n++)
        {
            ours += counts[n];
            printed += Printed(n);
            largest = Math.Max(largest, Math.Abs(ours - printed));
        }

        Assert.InRange(largest, 0, allowed);

        // and the bridge is really there: without it the law misses the lost atoms altogether
        Assert.True(ours > new Poisson(l0 + l1).CumulativeDistribution(counts.Length - 1) + (0.3 * loss));

        double Printed(int n)
        {
            double first = Math.Exp((n * Math.Log(l0 + l1 - loss)) - l0 - l1 - SpecialFunctions.FactorialLn(n));
            double keep = 1 - (loss / l1);
            return n == 0 ? first : first + (loss / l1 * Math.Exp(l0 * loss / (l1 - loss)) * Math.Pow(keep, n - 1)
                * (SpecialFunctions.GammaUpperRegularized(n, l0 / keep) - SpecialFunctions.GammaUpperRegularized(n, (l0 + l1) / keep)));
        }
    }

    // the mirror image: dark until a jump, bright for the rest
    [Theory]
    [InlineData(50, 2, 0.02)]
    [InlineData(30, 1, 0.5)]
    [InlineData(30, 1, 20)]
    [InlineData(30, 1, 29.9)]
    public void Dark_counts_agree_with_numerical_integration_when_dark_atoms_brighten(double signal, double background, double jumps)
    {
        PhotonCounting detector = Clean(signal, background) with { BrightenPerSecond = jumps };
        double[] counts = PhotonStatistics.DarkCounts(detector, 1, 1, 60);

        for (int n = 0; n < counts.Length; n++)
        {
            double stays = Math.Exp(-jumps) * Probability(n, background);
            double jumped = GaussLegendreRule.Integrate(
                u => jumps * Math.Exp(-jumps * u) * Probability(n, background + (signal * (1 - u))), 0, 1, 128);
            Assert.Equal(stays + jumped, counts[n], 1e-11);
        }
    }

    // exact: independent Poisson counts add up
    [Theory]
    [InlineData(2)]
    [InlineData(5)]
    public void Without_jumps_an_ensemble_is_one_atom_with_so_many_times_the_signal(int atoms)
    {
        double[] ensemble = PhotonStatistics.BrightCounts(Clean(7, 3), atoms, 1, 50);
        double[] strong = PhotonStatistics.BrightCounts(Clean(7 * atoms, 3), 1, 1, 50);

        Assert.All(ensemble.Zip(strong), pair => Assert.Equal(pair.Second, pair.First, 1e-14));
    }

    // simulated atom by atom: 400,000 seeded checks; five standard errors over 30 cells fail for one seed in 60,000
    [Theory]
    [InlineData(1)]
    [InlineData(3)]
    public void Atoms_of_an_ensemble_jump_one_by_one(int atoms)
    {
        const int Checks = 400_000;
        const double Signal = 5;
        const double Background = 1.5;
        const double Jumps = 0.8;
        Random random = new(20251103);
        int[] histogram = new int[30];
        for (int check = 0; check < Checks; check++)
        {
            double bright = Background;
            for (int atom = 0; atom < atoms; atom++)
            {
                bright += Signal * Math.Min(1, -Math.Log(1 - random.NextDouble()) / Jumps);
            }

            int counts = Poisson.Sample(random, bright);
            if (counts < histogram.Length)
            {
                histogram[counts]++;
            }
        }

        double[] expected = PhotonStatistics.BrightCounts(
            Clean(Signal, Background) with { DepumpPerSecond = Jumps }, atoms, 1, histogram.Length);
        for (int n = 0; n < histogram.Length; n++)
        {
            double standardError = Math.Sqrt(expected[n] * (1 - expected[n]) / Checks);
            Assert.Equal(expected[n], (double)histogram[n] / Checks, (5 * standardError) + (2.0 / Checks));
        }
    }

    [Fact]
    public void With_depumping_the_flip_rate_falls_to_one_best_exposure_and_rises_beyond()
    {
        Gen<PhotonCounting> detectors = Gen.Select(
            MachineGenerators.Factor(3),
            MachineGenerators.Factor(5),
            MachineGenerators.Factor(5),
            (signal, background, jump) => new PhotonCounting(signal * 1e5, background * 3e3, jump * 200, 0, 0, null, 0, false));
        foreach ((PhotonCounting detector, int atoms) in Drawn.Cases(Gen.Select(detectors, Gen.Int[1, 3]), 40, seed: 7))
        {
            double[] flips = [.. Enumerable.Range(0, 61).Select(i => PhotonStatistics.Read(detector, atoms, 5e-6 * Math.Pow(10, i / 20.0)).Flip)];
            int best = Array.IndexOf(flips, flips.Min());
            Assert.InRange(best, 1, flips.Length - 2);

            // around the broad optimum each step of the whole-numbered threshold has a small minimum of its own; over a factor of four the trend is plain
            for (int i = 0; i + 12 < flips.Length; i++)
            {
                Assert.True(i + 12 > best || flips[i] > flips[i + 12], $"does not fall at point {i}: {flips[i]} to {flips[i + 12]}");
                Assert.True(i < best || flips[i] < flips[i + 12], $"does not rise at point {i}: {flips[i]} to {flips[i + 12]}");
            }
        }
    }

    [Fact]
    public void Loss_in_a_look_follows_the_exponential_law() =>
        Assert.Equal(1 - Math.Exp(-0.05), PhotonStatistics.Read(Clean(1e5, 1e3) with { LossPerSecond = 50 }, 1, 1e-3).LossPerLook, 1e-15);

    // no light at all: a coin toss, not a fault
    [Fact]
    public void Without_signal_bright_and_dark_cannot_be_told_apart() =>
        Assert.Equal(0.5, PhotonStatistics.Read(Clean(1e-9, 2), 1, 1).Flip, 1e-8);

    // the histogram is bounded; beyond it the answer must still be finite
    [Theory]
    [InlineData(4e4, 1e4)]
    [InlineData(100, 1e6)]
    public void Very_strong_light_still_gives_a_probability(double signal, double background)
    {
        CheckReading reading = PhotonStatistics.Read(
            Clean(signal, background) with { DepumpPerSecond = 1, BrightenPerSecond = 0.5 * signal }, 1, 1);

        Assert.InRange(reading.Flip, 0, 0.5);
    }

    /// <summary>A detector without jumps, in counts per exposure of one second.</summary>
    private static PhotonCounting Clean(double signal, double background) => new(signal, background, 0, 0, 0, null, 0, false);

    private static double Probability(int n, double mean) =>
        mean == 0 ? (n == 0 ? 1 : 0) : Math.Exp((n * Math.Log(mean)) - mean - SpecialFunctions.FactorialLn(n));
}
