using FtEstimate.Simulation.Memory;

namespace FtEstimate.Tests.Simulation.Memory;

public sealed class QuestionRunTests
{
    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    public void Counts_do_not_depend_on_the_number_of_threads(int threads)
    {
        MemoryQuestion question = SmallQuestion.Of();

        Assert.Equal(SmallQuestion.Counted(question, Shard.Whole).Experiments.ToArray(), SmallQuestion.Counted(question, Shard.Whole, threads).Experiments.ToArray());
    }

    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(11)]
    public void Shards_add_up_to_the_whole_run(int shards)
    {
        MemoryQuestion question = SmallQuestion.Of();
        MemoryResults sum = MemoryResults.Of([.. Enumerable.Range(0, shards).Select(index => SmallQuestion.Counted(question, new Shard(index, shards)))]);

        Assert.True(sum.IsWhole);
        Assert.Equal(SmallQuestion.CountsOf(MemoryResults.Of([SmallQuestion.Counted(question, Shard.Whole)])), SmallQuestion.CountsOf(sum));
    }

    // 300 blocks: looks at 64, 128 and 256; 100 and 200 lie between them, where the rate is accurate enough already but nobody looks
    [Theory]
    [InlineData(0, 1, 3)]
    [InlineData(0.016, 1, 100)]
    [InlineData(0.016, 2, 100)]
    [InlineData(0.0115, 2, 200)]
    public void An_interrupted_run_ends_with_the_counts_of_an_uninterrupted_one(double relativeError, int threads, int after)
    {
        MemoryQuestion question = SmallQuestion.Of(shots: 300 * MemoryPlan.ShotsPerBlock);
        MemoryExperiment experiment = question.ExperimentOf(question.Settings[0]);
        MemoryPlan plan = question.PlanOf(question.Settings[0], Shard.Whole, relativeError);
        using CancellationTokenSource interruption = new();
        MemoryTally whole = MemoryRun.Run(experiment, plan, default, threads, null, CancellationToken.None);

        MemoryTally part = MemoryRun.Run(experiment, plan, default, threads, new AfterBlocks(after, interruption), interruption.Token);
        MemoryTally continued = MemoryRun.Run(experiment, plan, part, 1, null, CancellationToken.None);

        Assert.InRange(part.BlocksDone, after, after + threads);
        Assert.True(part.BlocksDone < whole.BlocksDone);
        Assert.Equal(relativeError > 0, MemoryRun.IsAccurate(part.Count, relativeError));
        Assert.Equal(whole, continued);
    }

    [Fact]
    public void A_run_ends_early_once_it_is_accurate_enough()
    {
        MemoryQuestion question = SmallQuestion.Of(shots: 1_000_000);
        MemoryTally tally = MemoryRun.Run(
            question.ExperimentOf(question.Settings[0]), question.PlanOf(question.Settings[0], Shard.Whole, 0.05), default, 1, null, CancellationToken.None);

        // the binomial standard error, written out
        double rate = (double)tally.Count.Failures / tally.Count.Shots;
        Assert.InRange(Math.Sqrt(rate * (1 - rate) / tally.Count.Shots) / rate, 0, 0.05);
        Assert.True(tally.Count.Shots < 1_000_000);
    }

    [Fact]
    public void Experiments_of_one_question_have_seeds_of_their_own()
    {
        MemoryQuestion one = SmallQuestion.Of(seed: 1);
        MemoryQuestion two = SmallQuestion.Of(seed: 2);
        ulong[] seeds = [.. one.Settings.Concat(two.Settings).Select((setting, i) => (i < one.Settings.Length ? one : two).SeedOf(setting))];

        Assert.Equal(seeds.Length, seeds.Distinct().Count());
    }

    private sealed class AfterBlocks(int blocks, CancellationTokenSource interruption) : IProgress<MemoryTally>
    {
        public void Report(MemoryTally value)
        {
            if (value.BlocksDone == blocks)
            {
                interruption.Cancel();
            }
        }
    }
}
