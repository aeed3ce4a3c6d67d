using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Memory;
using FtEstimate.Simulation.RareEvents;
using FtEstimate.SurfaceCode;
using FtEstimate.Tests.Simulation.Decoding.Matching;

namespace FtEstimate.Tests.Simulation.RareEvents;

/// <summary>What an estimate promises besides its number, and circuits too large for exact sums.</summary>
public sealed class SplittingTests
{
    private static readonly LadderPlan Short = new(0.1, 0.05, 1, Ladders: 4, StartFailures: 16, Walkers: 8, SamplesPerLevel: 2, MovesPerSample: 4);

    // both have errors: they are added in squares; 4 of them once in ten thousand cases
    [Fact]
    public void A_circuit_of_distance_5_fails_as_often_as_in_plain_Monte_Carlo()
    {
        const double Noise = 3e-3;
        var experiment = MemoryExperiment.Of(TextbookCircuit.Of(5, 5, PauliBasis.Z, UniformNoise.EveryPlace(Noise)), DecoderKind.Matching);
        ShotCount plain = MemoryRun.Run(experiment, new MemoryPlan(50_000, 1, Shard.Whole), default, 2, null, CancellationToken.None).Count;
        RareEventEstimate split = RareEventCases.Run(
            p => RareEventCases.Textbook(5, 5, PauliBasis.Z, p), new LadderPlan(0.01, Noise, 1, StartFailures: 64, Walkers: 32, SamplesPerLevel: 4));
        double expected = ErrorEstimate.PerShot(plain).Value;
        double error = Math.Sqrt((1.0 / plain.Failures) + Math.Pow(split.RelativeStandardError, 2));

        Assert.InRange(error, 0, 0.1);
        Assert.Equal(1, split.Probability / expected, 4 * error);
    }

    // O'Rourke 2025 (arXiv:2409.14765), data set: 39 rounds, 520 failures in 395463653 shots
    [Fact]
    [Trait("Category", "Long")]
    public void Distance_13_at_a_thousandth_has_the_published_error_per_round()
    {
        const double Published = 3.372e-8;
        const int Rounds = 39;
        RareEventEstimate estimate = RareEventCases.Run(
            p => RareEventCases.Textbook(13, Rounds, PauliBasis.X, p), new LadderPlan(3.5e-3, 1e-3, 1, StartFailures: 128, Walkers: 128));
        double error = Math.Sqrt((1 / 520.0) + Math.Pow(estimate.RelativeStandardError, 2));

        Assert.Equal(1, MemoryError.PerRound(estimate.Probability, Rounds) / Published, 3 * error);
    }

    [Fact]
    public void The_number_of_threads_changes_nothing()
    {
        RareEventEstimate one = RareEventCases.Run(BitFlips, Short, threads: 1);
        RareEventEstimate three = RareEventCases.Run(BitFlips, Short, threads: 3);

        Assert.Equal(one.LadderProbabilities.ToArray(), three.LadderProbabilities.ToArray());
        Assert.Equal(one.Levels.ToArray(), three.Levels.ToArray());
    }

    [Fact]
    public void Another_seed_gives_another_estimate() =>
        Assert.NotEqual(RareEventCases.Run(BitFlips, Short).Probability, RareEventCases.Run(BitFlips, Short with { Seed = 2 }).Probability);

    [Fact]
    public void Levels_lead_from_the_start_to_the_target_and_failures_grow_rarer()
    {
        RareEventEstimate estimate = RareEventCases.Run(BitFlips, Short with { Ladders = 8, StartFailures = 64, Walkers = 32 });

        Assert.Equal(Short.Start, estimate.Levels[0].Noise);
        Assert.Equal(Short.Target, estimate.Levels[^1].Noise);
        Assert.Equal(estimate.Levels.OrderByDescending(level => level.Noise), estimate.Levels);
        Assert.Equal(estimate.Levels.OrderByDescending(level => level.Probability), estimate.Levels);
    }

    [Fact]
    public void Progress_ends_with_every_level_of_every_ladder()
    {
        Latest progress = new();
        RareEventEstimate estimate = Splitting.Estimate(BitFlips, Short, 1, progress, CancellationToken.None);

        int total = Short.Ladders * estimate.Levels.Length;
        Assert.Equal(new LadderProgress(total, total), progress.Value);
    }

    [Fact]
    public void An_interrupted_estimate_gives_no_number() => Assert.ThrowsAny<OperationCanceledException>(() =>
        Splitting.Estimate(BitFlips, Short, 2, null, new CancellationToken(canceled: true)));

    [Fact]
    public void Levels_of_different_codes_are_refused() => Assert.Throws<ArgumentException>(() =>
        RareEventCases.Run(p => RareEventCases.ModelOf(RotatedCode.WithPerfectChecks(p > 0.07 ? 5 : 3, p)), Short));

    [Fact]
    public void A_mechanism_that_cannot_happen_at_one_level_is_refused() => Assert.Throws<ArgumentException>(() =>
    {
        RareEventCases.Run(
            p =>
            {
                DetectorGraph graph = RotatedCode.WithPerfectChecks(3, p);
                return RareEventCases.ModelOf(new DetectorGraph(
                    graph.VertexCount, graph.Edges.SetItem(4, graph.Edges[4] with { Probability = p > 0.07 ? 0 : p })));
            },
            Short);
    });

    [Fact]
    public void Atoms_that_may_be_lost_are_refused() => Assert.Throws<ArgumentException>(() =>
        RareEventCases.Run(p => BitFlips(p) with { Windows = [new LossWindow(0, true, [new LossStep(p, 0)], [new LossConsequence(0, 0.5)])] }, Short));

    [Theory]
    [InlineData(0.05, 0.05, 4, 16, 8, 1, 1)]
    [InlineData(0.1, 0, 4, 16, 8, 1, 1)]
    [InlineData(0.1, 0.05, 1, 16, 8, 1, 1)]
    [InlineData(0.1, 0.05, 4, 7, 8, 1, 1)]
    [InlineData(0.1, 0.05, 4, 1, 1, 1, 1)]
    [InlineData(0.1, 0.05, 4, 16, 0, 1, 1)]
    [InlineData(0.1, 0.05, 4, 16, 8, 0, 1)]
    [InlineData(0.1, 0.05, 4, 16, 8, 1, 0)]
    public void A_plan_outside_its_ranges_is_refused(
        double start, double target, int ladders, int startFailures, int walkers, int samples, int moves) =>
        Assert.Throws<ArgumentOutOfRangeException>(() =>
            RareEventCases.Run(BitFlips, new LadderPlan(start, target, 1, ladders, startFailures, walkers, samples, moves)));

    private static MemoryModel BitFlips(double p) => RareEventCases.ModelOf(RotatedCode.WithPerfectChecks(5, p));

    private sealed class Latest : IProgress<LadderProgress>
    {
        public LadderProgress Value { get; private set; }

        public void Report(LadderProgress value) => Value = value;
    }
}
