using System.Collections.Immutable;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Estimate;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Reports.Memory;

/// <summary>The result in a sentence or two, and whether all of it was run.</summary>
internal static class MemorySummary
{
    /// <summary>The section.</summary>
    public static ReportSection Of(MemoryResults results)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.Add(new Paragraph(Result(results), Tone.Strong));
        if (!results.IsWhole)
        {
            long run = results.Experiments.Sum(experiment => experiment.Count.Shots);
            double asked = (double)results.Question.Shots * results.Experiments.Length;
            blocks.Add(new Paragraph(
                $"{Words.Whole(run)} of {Words.Whole(asked)} shots were run{WhyNotAll(results)}. The intervals below belong to the shots that were run.", Tone.Caution));
        }

        return new ReportSection("In short", blocks.ToImmutable());
    }

    private static string Result(MemoryResults results)
    {
        if (results.Suppression.LastOrDefault(step => step.Measured is not null) is { Measured: { } measured } best)
        {
            return $"From distance {Words.Whole(best.From)} to {Words.Whole(best.To)} the error per round falls by a factor of {MemoryText.WithError(measured)}; " +
                $"the law {results.Origin.LawName} says {Show.Significant(best.Law, 3)}.";
        }

        return results.Distances.LastOrDefault(distance => distance.Measured is not null) is { Measured: { } rate } largest
            ? $"At distance {Words.Whole(largest.Distance)} the error per round is {MemoryText.WithError(rate)}; the law {results.Origin.LawName} says {Show.Significant(largest.Law, 2)}."
            : "No experiment gives an error per round: failures are too few, or half the shots fail. The intervals below bound it.";
    }

    private static string WhyNotAll(MemoryResults results) => results.Shards is [{ Count: > 1 } only]
        ? $", of which share {Words.Whole(only.Index + 1)} of {Words.Whole(only.Count)} was this run's"
        : results.Shards.Length > 1 ? $", from {Words.Whole(results.Shards.Length)} counts files" : "; the rest was interrupted, or not needed for the accuracy asked for";
}
