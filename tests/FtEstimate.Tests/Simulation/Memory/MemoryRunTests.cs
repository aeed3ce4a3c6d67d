using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;
using FtEstimate.Tests.Simulation.Circuits;
using Xunit.Abstractions;

namespace FtEstimate.Tests.Simulation.Memory;

public sealed class MemoryRunTests(ITestOutputHelper output)
{
    private static readonly MemoryExperiment Experiment = MemoryExperiment.Of(
        AtomCircuit.Of(3, 3, PauliBasis.Z, TestCircuits.EverywhereOnAtoms(0.003) with { DataLossPerSlot = 0.002, DataLossTold = true }), DecoderKind.Matching);

    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(7)]
    public void The_same_seed_gives_the_same_counts_on_any_number_of_threads(int threads)
    {
        MemoryTally one = Run(new MemoryPlan(20_011, 5, Shard.Whole), 1);

        Assert.True(one.Count.Failures > 100);
        Assert.Equal(20_011, one.Count.Shots);
        Assert.Equal(one, Run(new MemoryPlan(20_011, 5, Shard.Whole), threads));
        Assert.NotEqual(one, Run(new MemoryPlan(20_011, 6, Shard.Whole), threads));
    }

    [Theory]
    [InlineData(1)]
    [InlineData(3)]
    public void Stopping_at_an_accuracy_does_not_depend_on_the_threads(int threads)
    {
        MemoryPlan plan = new(10_000_000, 5, Shard.Whole, RelativeError: 0.03);
        MemoryTally tally = Run(plan, threads);

        Assert.Equal(Run(plan, 2), tally);
        Assert.InRange(tally.Count.Shots, 1, 1_000_000);
        Assert.InRange(tally.Count.StandardError(), 0, 0.03 * tally.Count.Rate());
    }

    [Fact]
    public void Shards_add_up_to_the_whole()
    {
        ShotCount sum = default;
        for (int index = 0; index < 3; index++)
        {
            sum += Run(new MemoryPlan(20_011, 5, new Shard(index, 3)), 2).Count;
        }

        Assert.Equal(Run(new MemoryPlan(20_011, 5, Shard.Whole), 2).Count, sum);
    }

    [Fact]
    public void An_interrupted_run_goes_on_where_it_stood()
    {
        MemoryPlan plan = new(20_011, 5, Shard.Whole);
        using CancellationTokenSource source = new();
        MemoryTally half = MemoryRun.Run(Experiment, plan, default, 2, new CancelAfter(source, 20), source.Token);

        Assert.InRange(half.BlocksDone, 20, plan.Blocks - 1);
        Assert.Equal(Run(plan, 1), MemoryRun.Run(Experiment, plan, half, 2, null, CancellationToken.None));
    }

    [Fact]
    [Trait("Category", "Long")]
    public void Two_threads_are_reported_against_one()
    {
        MemoryExperiment experiment = MemoryExperiment.Of(
            TextbookCircuit.Of(7, 7, PauliBasis.Z, UniformNoise.EveryPlace(1e-3)), DecoderKind.Matching);
        MemoryPlan plan = new(400_000, 5, Shard.Whole);
        double[] seconds = [double.PositiveInfinity, double.PositiveInfinity];
        for (int trial = 0; trial < 3; trial++)
        {
            for (int threads = 1; threads <= 2; threads++)
            {
                long start = TimeProvider.System.GetTimestamp();
                MemoryRun.Run(experiment, plan, default, threads, null, CancellationToken.None);
                seconds[threads - 1] = Math.Min(seconds[threads - 1], TimeProvider.System.GetElapsedTime(start).TotalSeconds);
            }
        }

        // a noisy machine: the figure is for the reader; only a slowdown is a fault
        output.WriteLine(FormattableString.Invariant($"{plan.Shots / seconds[0]:F0} shots a second on one thread, {plan.Shots / seconds[1]:F0} on two"));
        Assert.InRange(seconds[1], 0, 1.5 * seconds[0]);
    }

    private static MemoryTally Run(MemoryPlan plan, int threads) => MemoryRun.Run(Experiment, plan, default, threads, null, CancellationToken.None);

    private sealed class CancelAfter(CancellationTokenSource source, long blocks) : IProgress<MemoryTally>
    {
        public void Report(MemoryTally value)
        {
            if (value.BlocksDone >= blocks)
            {
                source.Cancel();
            }
        }
    }
}
