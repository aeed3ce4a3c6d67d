using System.Collections.Immutable;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Estimate;
using FtEstimate.Reports.Pictures;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Reports.Memory;

/// <summary>What was counted, experiment by experiment.</summary>
internal static class ExperimentsSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(MemoryResults results)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.Add(TableOf(results.Experiments));
        blocks.Add(new Paragraph(
            "Intervals hold the true value in 95 of 100 cases (Clopper and Pearson, exact). Per round means ½[1 − (1 − 2P)^(1/rounds)] of the probability P per shot, " +
            "for one logical observable: a memory of Z fails by X errors, and the other way round."));
        if (results.Experiments.Any(experiment => experiment.Count.Shots > 0))
        {
            blocks.Add(new Picture(
                "memory", "Error per round against distance: counts with 95 % intervals, and the scaling law.", () => MemoryPicture.Svg(results)));
        }

        return new ReportSection("Experiments", blocks.ToImmutable());
    }

    private static Table TableOf(ImmutableArray<ExperimentResult> experiments)
    {
        TableBuilder table = new(
            new Column("Distance", Align.Right),
            new Column("Rounds", Align.Right),
            new Column("Basis"),
            new Column("Shots", Align.Right),
            new Column("Failures", Align.Right),
            new Column("Failure per shot", Align.Right),
            new Column("95 % interval", Align.Right),
            new Column("Error per round", Align.Right),
            new Column("95 % interval", Align.Right),
            new Column("Time", Align.Right));
        foreach (ExperimentResult experiment in experiments)
        {
            table.Add(
                Words.Whole(experiment.Setting.Distance),
                Words.Whole(experiment.Setting.Rounds),
                MemoryText.Basis(experiment.Setting.Basis),
                Words.Whole(experiment.Count.Shots),
                Words.Whole(experiment.Count.Failures),
                MemoryText.Value(experiment.PerShot),
                MemoryText.Interval(experiment.PerShot),
                MemoryText.Value(experiment.PerRound),
                MemoryText.Interval(experiment.PerRound),
                Show.Duration(experiment.Seconds));
        }

        return table.Build();
    }
}
