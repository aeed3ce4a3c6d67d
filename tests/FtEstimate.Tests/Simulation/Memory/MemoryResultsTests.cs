using System.Collections.Immutable;
using CsCheck;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Tests.Simulation.Memory;

public sealed class MemoryResultsTests
{
    private static readonly IScalingLaw Law = ScalingLaws.PublishedFit;

    // spread of Λ over repetitions of the whole experiment, 4000 repetitions leave 1.1 % on a standard deviation
    [Fact]
    public void The_standard_error_of_a_factor_is_its_spread_over_repetitions()
    {
        const long Shots = 100_000;
        Random random = new(3);
        double[] factors = [.. Enumerable.Range(0, 4000).Select(_ => Factor(() => Draw(4000), () => Draw(900)).Value)];
        double mean = factors.Average();
        double spread = Math.Sqrt(factors.Average(factor => (factor - mean) * (factor - mean)));

        Assert.InRange(Factor(() => 4000, () => 900).Error / spread, 0.95, 1.05);

        MeasuredRate Factor(Func<long> smaller, Func<long> larger) =>
            Results(Shots, [smaller(), smaller(), larger(), larger()]).Suppression[0].Measured!.Value;

        // binomial, by its normal limit: 900 failures are many
        long Draw(double expected) => (long)MathNet.Numerics.Distributions.Normal.Sample(random, expected, Math.Sqrt(expected * (1 - (expected / Shots))));
    }

    [Theory]
    [InlineData(0)]
    [InlineData(9)]
    public void Few_failures_give_no_factor(long failures) =>
        Assert.Null(Assert.Single(Results(100_000, [500, 500, failures, 500]).Suppression).Measured);

    [Fact]
    public void Shots_that_fail_half_the_time_give_no_rate()
    {
        MemoryResults results = Results(1000, [500, 485, 300, 300]);

        Assert.Null(results.Distances[0].Measured);
        Assert.NotNull(results.Distances[1].Measured);
        Assert.Null(results.Suppression[0].Measured);
    }

    [Fact]
    public void The_law_is_asked_for_the_basis_that_was_run()
    {
        NoiseStrength strength = new(0.2, 0.5);
        MemoryResults both = Results(1000, [20, 20, 20, 20], strength);
        MemoryResults onlyZ = Results(1000, [20, 20], strength, [new(3, 9, PauliBasis.Z), new(5, 15, PauliBasis.Z)]);

        // a memory of Z is flipped by the errors that flip logical Z; together the bases make the error of the patch
        Assert.Equal(Law.LogicalErrorPerRound(0.5, 3) / 2, onlyZ.Distances[0].Law, 1e-15);
        Assert.Equal(Law.LogicalErrorPerRound(0.5, 3) / 2, both.Experiments[0].LawPerRound, 1e-15);
        Assert.Equal(PatchError.PerRound(Law, strength, 3), both.Experiments[0].LawPerRound + both.Experiments[1].LawPerRound, 1e-15);
        Assert.Equal(PatchError.SuppressionFrom(Law, strength, 3).Factor, both.Suppression[0].Law);
    }

    [Fact]
    public void No_counts_lead_to_a_number_that_is_none() => Gen.Select(Gen.Long[1, 100_000], Gen.Double[0, 1].Array[4], Gen.Double[1e-9, 90]).Sample((shots, fractions, x) =>
    {
        MemoryResults results = Results(shots, [.. fractions.Select(fraction => (long)Math.Round(fraction * shots))], NoiseStrength.Even(x));
        double?[] numbers =
        [
            .. results.Experiments.SelectMany(experiment => new double?[] { experiment.PerShot?.Low, experiment.PerShot?.High, experiment.PerRound?.Value, experiment.LawPerRound }),
            .. results.Distances.SelectMany(distance => new double?[] { distance.Measured?.Value, distance.Measured?.Error, distance.Law }),
            .. results.Suppression.SelectMany(step => new double?[] { step.Measured?.Value, step.Measured?.Error, step.Law }),
        ];
        return numbers.All(number => number is null || double.IsFinite(number.Value));
    }, iter: 60);

    [Theory]
    [InlineData(0, 2, 1, 2, false)]
    [InlineData(0, 2, 0, 2, true)]
    [InlineData(0, 1, 2, 3, true)]
    [InlineData(0, 2, 3, 4, false)]
    [InlineData(0, 2, 2, 4, true)]
    [InlineData(1, 2, 2, 3, true)]
    public void Shards_overlap_when_a_block_belongs_to_both(int index, int count, int otherIndex, int otherCount, bool overlap)
    {
        // blocks written out
        Assert.Equal(overlap, Enumerable.Range(0, 100).Any(block => block % count == index && block % otherCount == otherIndex));
        Assert.Equal(overlap, Shards.Overlap(new Shard(index, count), new Shard(otherIndex, otherCount)));
    }

    private static MemoryResults Results(long shots, long[] failures, NoiseStrength? strength = null, ImmutableArray<MemorySetting>? settings = null)
    {
        MemoryQuestion question = new(
            SmallQuestion.Subject.Noise,
            settings ?? [new(3, 9, PauliBasis.Z), new(3, 9, PauliBasis.X), new(5, 15, PauliBasis.Z), new(5, 15, PauliBasis.X)],
            DecoderKind.Matching,
            shots,
            1);
        MemoryOrigin origin = new("Title", "Sentence.", Law.Name, strength ?? NoiseStrength.Even(0.3));
        return MemoryResults.Of(
            [new MemoryCounts(question, origin, Shard.Whole, [.. failures.Select(some => new ExperimentCount(new MemoryTally(1, new ShotCount(shots, some)), 1))])]);
    }
}
