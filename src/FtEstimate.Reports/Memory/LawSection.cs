using System.Collections.Immutable;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Estimate;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Reports.Memory;

/// <summary>Counts beside the scaling law.</summary>
internal static class LawSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(MemoryResults results)
    {
        MemoryOrigin origin = results.Origin;
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.Add(new Paragraph(
            $"The law in use is {origin.LawName}; the noise is at {Show.Significant(origin.Strength.X, 3)} of its threshold for errors that flip logical X and at " +
            $"{Show.Significant(origin.Strength.Z, 3)} for those that flip logical Z. Measured is the mean of the bases run, with its standard error; " +
            "the law counts both observables of a patch, so half of it stands here."));
        blocks.Add(Rates(results));
        if (!results.Suppression.IsEmpty)
        {
            blocks.Add(new Paragraph("Λ is the error per round over that at the next odd distance. Standard errors follow from those above, to first order."));
            blocks.Add(Factors(results));
        }

        return new ReportSection("Beside the scaling law", blocks.ToImmutable());
    }

    private static Table Rates(MemoryResults results)
    {
        TableBuilder table = new(
            new Column("Distance", Align.Right),
            new Column("Error per round, measured", Align.Right),
            new Column("By the law", Align.Right),
            new Column("Measured / law", Align.Right),
            new Column("Does the law rest on data here?"));
        foreach (DistanceResult distance in results.Distances)
        {
            table.Add(
                Words.Whole(distance.Distance),
                MemoryText.Measured(distance.Measured, results.Saturates(distance.Distance)),
                Show.Significant(distance.Law, 3),
                Ratio(distance.Measured, distance.Law),
                distance.LawReach.Sentence);
        }

        return table.Build();
    }

    private static Table Factors(MemoryResults results)
    {
        TableBuilder table = new(
            new Column("Distances"),
            new Column("Λ measured", Align.Right),
            new Column("Λ by the law", Align.Right),
            new Column("Measured / law", Align.Right));
        foreach (SuppressionResult step in results.Suppression)
        {
            table.Add(
                $"{Words.Whole(step.From)} → {Words.Whole(step.To)}",
                MemoryText.Measured(step.Measured, results.Saturates(step.From) || results.Saturates(step.To)),
                Show.Significant(step.Law, 3),
                Ratio(step.Measured, step.Law));
        }

        return table.Build();
    }

    private static string Ratio(MeasuredRate? measured, double law) =>
        measured is { } rate && law > 0 ? MemoryText.WithError(new MeasuredRate(rate.Value / law, rate.Error / law)) : "";
}
