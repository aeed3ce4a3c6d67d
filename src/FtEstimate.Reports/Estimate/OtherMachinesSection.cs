using System.Collections.Immutable;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Pictures;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Estimate;

/// <summary>Atoms against time: the machines that no other beats in both.</summary>
internal static class OtherMachinesSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(Subject subject)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        if (subject.Result.Best is not { } chosen)
        {
            blocks.Add(new Paragraph("No machine meets the goal, so there are no others to list."));
        }
        else if (subject.Result.Unbeaten.Length <= 1)
        {
            blocks.Add(new Paragraph("No other machine does better in atoms or in run time: the chosen one has both the fewest atoms and the shortest run."));
        }
        else
        {
            AddTradeOff(blocks, subject, chosen);
        }

        AddStyles(blocks, subject);
        return new ReportSection("Other machines that would do", blocks.ToImmutable());
    }

    /// <summary>Place of a machine in a list; −1 when it is not there.</summary>
    public static int IndexOf(ImmutableArray<SizedMachine> machines, SizedMachine machine)
    {
        for (int i = 0; i < machines.Length; i++)
        {
            if (Same(machines[i], machine))
            {
                return i;
            }
        }

        return -1;
    }

    /// <summary>Whether two are the same machine, worked out twice.</summary>
    public static bool Same(SizedMachine a, SizedMachine b) =>
        a.Atoms == b.Atoms && a.RunSeconds == b.RunSeconds && a.Distance == b.Distance && a.Layout == b.Layout;

    private static void AddTradeOff(ImmutableArray<Block>.Builder blocks, Subject subject, SizedMachine chosen)
    {
        blocks.Add(new Paragraph(
            "Each machine meets the goal, and none has both fewer atoms and a shorter run than another; where there are many, a spread of them is shown. " +
            $"The one marked is the preferred one ({Words.Preference(subject.Space.Scenario.Goal.Prefer)})."));
        TableBuilder table = new(
            new Column("Atoms", Align.Right),
            new Column("Run time", Align.Right),
            new Column("Elapsed", Align.Right),
            new Column("Style of logic"),
            new Column("Distance", Align.Right),
            new Column("Factories", Align.Right),
            new Column("Design", Verbatim: true));
        foreach (SizedMachine machine in subject.Result.Unbeaten)
        {
            ImmutableArray<string> cells =
            [
                Show.Atoms(machine.Atoms.Total),
                Show.Duration(machine.RunSeconds),
                Elapsed(machine.Elapsed),
                Words.Style(machine.Layout),
                Words.Whole(machine.Distance),
                Words.Whole(machine.FactoryCount),
                machine.Factory?.Name ?? "",
            ];
            if (Same(machine, chosen))
            {
                table.AddStanding(cells);
            }
            else
            {
                table.Add(cells);
            }
        }

        blocks.Add(table.Build());
        ImmutableArray<SizedMachine> unbeaten = subject.Result.Unbeaten;
        SizedMachine? other = subject.Result.OtherStyle;
        if (unbeaten[^1].RunSeconds <= 0 || other is { RunSeconds: <= 0 })
        {
            // a workload without timed work has no place on a logarithmic scale
            return;
        }

        blocks.Add(new Picture(
            "trade-off",
            "Run time of one shot against atoms, both on logarithmic scales. The ring marks the preferred machine; the line joins those of the table.",
            () => TradeOffPicture.Svg(unbeaten, chosen, other)));
    }

    private static string Elapsed(ElapsedTime elapsed) =>
        elapsed is { FinishesInPractice: true, Seconds: { } seconds } ? Show.Duration(seconds) : "does not finish";

    private static void AddStyles(ImmutableArray<Block>.Builder blocks, Subject subject)
    {
        bool transversal = false;
        foreach (LogicLayout layout in subject.Space.Layouts)
        {
            transversal |= layout.Style == LogicStyle.Transversal;
        }

        if (subject.Result.Best is { } chosen && subject.Result.OtherStyle is { } other)
        {
            blocks.Add(new Paragraph(
                $"The other style of logic, {Words.Style(other.Layout)}, would take {Show.Atoms(other.Atoms.Total)} atoms and {Show.Duration(other.RunSeconds)}{Compared(other, chosen)}."));
        }

        if (transversal)
        {
            blocks.Add(new Paragraph(
                "Transversal gates, where patches are moved onto each other, are promising but unproven: no closed loop of transversal gates, correlated decoding " +
                "and feed-forward has been shown at scale. Their magic-state factories are still counted as lattice-surgery ones.",
                Tone.Caution));
        }
    }

    // without timed work there is nothing to compare
    private static string Compared(SizedMachine other, SizedMachine chosen) => chosen.RunSeconds > 0
        ? $": {Times(other.Atoms.Total / chosen.Atoms.Total)} the atoms and {Times(other.RunSeconds / chosen.RunSeconds)} the run time of the preferred machine"
        : "";

    private static string Times(double ratio) => Show.Significant(ratio, 2) + " times";
}
