using System.Collections.Immutable;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Simulation.Memory;

/// <summary>The error per round at one distance, mean of the bases run, beside what the law says.</summary>
/// <param name="Distance">Code distance.</param>
/// <param name="Measured">Error per round of one observable; null where failures are too few.</param>
/// <param name="Law">The same by the law: half of its error per round, which counts both observables.</param>
/// <param name="LawReach">Whether the law rests on data here.</param>
public sealed record DistanceResult(int Distance, MeasuredRate? Measured, double Law, LawReach LawReach);

/// <summary>How much smaller the error is at the next distance, beside what the law says.</summary>
/// <param name="From">The smaller distance.</param>
/// <param name="Measured">Error per round, mean of the bases run, over that at the larger distance; null where failures are too few.</param>
/// <param name="Law">Λ of the law for the bases run.</param>
public sealed record SuppressionResult(int From, MeasuredRate? Measured, double Law)
{
    /// <summary>The larger distance.</summary>
    public int To => From + 2;
}

/// <summary>What the counts of a question say.</summary>
/// <param name="Question">The question.</param>
/// <param name="Origin">Where the noise comes from.</param>
/// <param name="Shards">The shards counted.</param>
/// <param name="Experiments">The experiments, in the order of the question.</param>
/// <param name="Distances">One entry per distance, smallest first.</param>
/// <param name="Suppression">For each distance whose next odd one was run too.</param>
public sealed record MemoryResults(
    MemoryQuestion Question,
    MemoryOrigin Origin,
    ImmutableArray<Shard> Shards,
    ImmutableArray<ExperimentResult> Experiments,
    ImmutableArray<DistanceResult> Distances,
    ImmutableArray<SuppressionResult> Suppression)
{
    /// <summary>Whether every shot asked for was run.</summary>
    public bool IsWhole => Experiments.All(experiment => experiment.Count.Shots == Question.Shots);

    /// <summary>Whether half of the shots may fail in an experiment at this distance.</summary>
    public bool Saturates(int distance) => Experiments.Any(experiment => experiment.Setting.Distance == distance && experiment.Saturates);

    /// <summary>Adds up shards of one question and holds the sum against the law.</summary>
    /// <param name="shards">At least one, of one question, without blocks in common.</param>
    public static MemoryResults Of(ImmutableArray<MemoryCounts> shards)
    {
        MemoryCounts first = shards[0];
        IScalingLaw law = ScalingLaws.Named(first.Origin.LawName) ?? ScalingLaws.Simulated;
        ImmutableArray<ExperimentResult> experiments =
        [
            .. first.Question.Settings.Select((setting, index) => new ExperimentResult(
                setting,
                shards.Aggregate(default(ShotCount), (sum, shard) => sum + shard.Experiments[index].Tally.Count),
                shards.Sum(shard => shard.Experiments[index].Seconds),
                LawPerRound(law, first.Origin, setting))),
        ];
        NoiseStrength strength = StrengthOf(first.Origin, experiments);
        ImmutableArray<DistanceResult> distances =
        [
            .. experiments.Select(experiment => experiment.Setting.Distance).Distinct().Order().Select(distance => new DistanceResult(
                distance, MeanAt(experiments, distance), 0.5 * PatchError.PerRound(law, strength, distance), law.Reach(strength.Mean, distance))),
        ];
        return new MemoryResults(
            first.Question, first.Origin, [.. shards.Select(shard => shard.Shard)], experiments, distances, SuppressionOf(law, strength, distances));
    }

    // a law at equal strengths counts both observables
    private static double LawPerRound(IScalingLaw law, MemoryOrigin origin, MemorySetting setting) =>
        0.5 * law.LogicalErrorPerRound(setting.Basis == PauliBasis.Z ? origin.Strength.Z : origin.Strength.X, setting.Distance);

    // with one basis run, the law is asked for that basis alone
    private static NoiseStrength StrengthOf(MemoryOrigin origin, ImmutableArray<ExperimentResult> experiments) =>
        experiments.All(experiment => experiment.Setting.Basis == PauliBasis.Z) ? NoiseStrength.Even(origin.Strength.Z)
        : experiments.All(experiment => experiment.Setting.Basis == PauliBasis.X) ? NoiseStrength.Even(origin.Strength.X)
        : origin.Strength;

    private static MeasuredRate? MeanAt(ImmutableArray<ExperimentResult> experiments, int distance)
    {
        MeasuredRate?[] rates = [.. experiments.Where(experiment => experiment.Setting.Distance == distance).Select(experiment => experiment.Rate)];
        return Array.TrueForAll(rates, rate => rate is not null) ? MeasuredRate.Mean([.. rates.Select(rate => rate!.Value)]) : null;
    }

    private static ImmutableArray<SuppressionResult> SuppressionOf(IScalingLaw law, NoiseStrength strength, ImmutableArray<DistanceResult> distances) =>
    [
        .. from smaller in distances
           from larger in distances
           where larger.Distance == smaller.Distance + 2
           select new SuppressionResult(
               smaller.Distance, smaller.Measured / larger.Measured, PatchError.SuppressionFrom(law, strength, smaller.Distance).Factor),
    ];
}
