using FtEstimate.Sizing;

namespace FtEstimate.Tests.Sizing;

public sealed class ElapsedTimeTests
{
    [Fact]
    public void Without_stops_shots_start_run_and_repeat()
    {
        Interruptions calm = new(null, 1e4, 30, 0.2);

        ElapsedTime elapsed = ElapsedTime.Of(shotSeconds: 800, shots: 5, shotFailureProbability: 0.5, calm);

        Assert.Equal(1000, elapsed.WorkingSeconds, 1e-9);
        Assert.Equal(5 * 1030 / 0.5, elapsed.Seconds!.Value, 1e-9);
        Assert.True(elapsed.FinishesInPractice);
    }

    // Gidney 2021 (arXiv:1905.09749): 5.1 hours and a retry risk of 31 % make 7.4 hours
    [Fact]
    public void A_retry_risk_of_31_percent_turns_5_1_hours_into_7_4()
    {
        ElapsedTime elapsed = ElapsedTime.Of(5.1 * 3600, 1, 0.31, Interruptions.None);

        Assert.Equal(7.4, elapsed.Seconds!.Value / 3600, 0.05);
    }

    // Gidney 2025 (arXiv:2505.15917): 12.07 hours, 9.2 shots, 6.7 % lost: 4.96 days
    [Fact]
    public void Nine_shots_of_twelve_hours_take_five_days()
    {
        ElapsedTime elapsed = ElapsedTime.Of(12.07 * 3600, 9.2, 1 - 0.933, Interruptions.None);

        Assert.Equal(4.96, elapsed.Seconds!.Value / 86_400, 0.005);
    }

    [Theory]
    [InlineData(1e12)]
    [InlineData(1e18)]
    [InlineData(1e300)]
    public void Very_rare_stops_change_nothing(double meanSecondsBetweenStops)
    {
        ElapsedTime calm = ElapsedTime.Of(3600, 3, 0.1, new Interruptions(null, 600, 60, 0.1));
        ElapsedTime rare = ElapsedTime.Of(3600, 3, 0.1, new Interruptions(meanSecondsBetweenStops, 600, 60, 0.1));

        // first order: T/2 + R over the time between stops
        Assert.Equal(1, rare.Seconds!.Value / calm.Seconds!.Value, 3e-9);
    }

    // first-order expansion of the formula: T + T²λ/2 + TλR
    [Fact]
    public void Rare_stops_cost_half_a_shot_and_a_repair_each()
    {
        ElapsedTime elapsed = ElapsedTime.Of(1000, 1, 0, new Interruptions(1e7, 300, 0, 0));

        Assert.Equal(1000 + 1e-4 * (500 + 300), elapsed.Seconds!.Value, 1e-5);
    }

    [Theory]
    [InlineData(0.1, 0.5)]
    [InlineData(1, 0)]
    [InlineData(2.5, 0.2)]
    public void The_expectation_agrees_with_a_simulation_of_events(double stopsPerShot, double failure)
    {
        const int Runs = 40_000;
        Interruptions interruptions = new(1000 / stopsPerShot, 150, 20, 0);
        Random random = new(20260703);
        double sum = 0;
        double squares = 0;
        for (int run = 0; run < Runs; run++)
        {
            double seconds = Simulated(1000, failure, interruptions, random);
            sum += seconds;
            squares += seconds * seconds;
        }

        double mean = sum / Runs;
        double standardError = Math.Sqrt((squares / Runs - mean * mean) / Runs);

        // four standard errors: a right formula fails for one seed in 16,000
        Assert.Equal(mean, ElapsedTime.Of(1000, 1, failure, interruptions).Seconds!.Value, 4 * standardError);
        Assert.True(standardError < 0.02 * mean);
    }

    [Fact]
    public void More_than_three_stops_in_a_shot_is_no_plan_and_the_needed_quiet_is_told()
    {
        ElapsedTime elapsed = ElapsedTime.Of(90_000, 1, 0, new Interruptions(20_000, 3600, 0, 0.1));

        Assert.Equal(5, elapsed.StopsPerShot, 1e-12);
        Assert.NotNull(elapsed.Seconds);
        Assert.False(elapsed.FinishesInPractice);
        Assert.Equal(100_000, elapsed.NeededSecondsBetweenStops, 1e-6);
    }

    [Theory]
    [InlineData(1e9, 1, 0)]
    [InlineData(1e9, 1e-310, 0)]
    [InlineData(10, 1e6, 1)]
    public void A_run_that_never_ends_has_no_elapsed_time(double shotSeconds, double meanSecondsBetweenStops, double failure)
    {
        ElapsedTime elapsed = ElapsedTime.Of(shotSeconds, 1, failure, new Interruptions(meanSecondsBetweenStops, 0, 0, 0));

        Assert.Null(elapsed.Seconds);
        Assert.False(elapsed.FinishesInPractice);
        Assert.True(double.IsFinite(elapsed.StopsPerShot));
    }

    private static double Simulated(double shotSeconds, double failure, Interruptions interruptions, Random random)
    {
        double clock = 0;
        do
        {
            clock += interruptions.StartSeconds;
            double untilStop = Exponential(interruptions, random);
            while (untilStop < shotSeconds)
            {
                clock += untilStop + interruptions.SecondsToRestart;
                untilStop = Exponential(interruptions, random);
            }

            clock += shotSeconds;
        }
        while (random.NextDouble() < failure);
        return clock;
    }

    private static double Exponential(Interruptions interruptions, Random random) =>
        -interruptions.MeanSecondsBetweenStops!.Value * Math.Log(1 - random.NextDouble());
}
