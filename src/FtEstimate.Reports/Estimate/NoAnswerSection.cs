using System.Collections.Immutable;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Figures;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Estimate;

/// <summary>The bottom line when no machine meets the goal: why, what is to blame, and what comes closest.</summary>
internal static class NoAnswerSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(Subject subject, NoAnswer none)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.Add(new Paragraph(
            $"No machine meets the goal: “{subject.Space.Scenario.Workload.Name}” on “{subject.Space.Scenario.Machine.Name}”.", Tone.Strong));
        blocks.Add(new Paragraph(NoAnswerSentence.Of(subject.Space, none)));
        BottomLineSection.AddCautions(blocks, subject);
        if (none.Closest is { } closest)
        {
            blocks.Add(new Paragraph("With the limits on atoms, time and supply dropped, this machine would be preferred:"));
            blocks.Add(FigureTable.Of(AnswerFigures.Of(subject.Space, closest), withMeaning: true));
        }

        AddBlame(blocks, none);

        blocks.Add(new Paragraph("This is a planning estimate, not a forecast."));
        return new ReportSection(BottomLineSection.Title, blocks.ToImmutable());
    }

    private static void AddBlame(ImmutableArray<Block>.Builder blocks, NoAnswer none)
    {
        if (none.Blame.Length == 0)
        {
            return;
        }

        if (none.Reason == Obstacle.Limits && none.Blame.All(cause => cause.NeededPerLocation is null))
        {
            blocks.Add(new Paragraph("No single cause of error, improved alone, would be enough: the limits are what stands in the way."));
            return;
        }

        string goal = none.StrengthNeeded is { } needed
            ? $"The noise is at {Show.Significant(none.Strength, 3)} of the threshold (1, where no patch size helps) and must fall to {Show.Significant(needed, 3)}. "
            : $"The noise is at {Show.Significant(none.Strength, 3)} of the threshold (1, where no patch size helps). ";
        blocks.Add(new Paragraph(
            goal + "Causes of error, largest share first. The last column is the probability that would do if this cause alone improved and all else stayed."));
        TableBuilder table = new(
            new Column("Cause of error"), new Column("Share of noise", Align.Right), new Column("Probability today", Align.Right), new Column("Needed alone", Align.Right));
        double[] shares = new double[none.Blame.Length];
        for (int i = 0; i < shares.Length; i++)
        {
            shares[i] = none.Blame[i].Share;
        }

        string[] shown = Apportion.ToPercent(shares);
        for (int i = 0; i < shares.Length; i++)
        {
            BlamedChannel cause = none.Blame[i];
            string alone = cause.NeededPerLocation is { } value ? Show.Probability(value) : "not even at zero";
            table.Add(cause.Channel, shown[i], Show.Probability(cause.PerLocation), alone);
        }

        blocks.Add(table.Build());
    }
}
