using System.Collections.Immutable;
using System.Globalization;
using FtEstimate.Cycles;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Pictures;

namespace FtEstimate.Reports.Estimate;

/// <summary>The phases of a round.</summary>
internal static class CycleSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(Subject subject)
    {
        CycleView cycle = subject.Cycle;
        var blocks = ImmutableArray.CreateBuilder<Block>();
        if (subject.Machine is null)
        {
            blocks.Add(new Paragraph("No machine meets the goal. The round shown is that of a single patch of distance 3, at the quietest exposure."));
        }
        else
        {
            blocks.AddRange(subject.Preface);
        }

        if (!cycle.IsPhysical)
        {
            blocks.Add(new Paragraph($"No physical cycle stands behind this machine. One round takes {Show.Duration(cycle.RoundSeconds)}, as stated."));
            return new ReportSection("Syndrome cycle", blocks.ToImmutable());
        }

        blocks.Add(new Paragraph(Sentence(cycle)));
        TimeColumn time = TimeColumn.For(cycle.RoundSeconds);
        blocks.Add(PhaseTable(cycle, time));
        blocks.Add(new Paragraph(
            "Phases that serve a limited number of atoms at a time go in groups, so the round grows with the machine. " +
            "Work that is not done in every round is shown as its average over rounds."));
        blocks.Add(new Picture(
            "cycle",
            $"One syndrome round of {Show.Duration(cycle.RoundSeconds)}, phase by phase. Very short phases are drawn as a thin line.",
            () => CyclePicture.Svg(cycle)));
        return new ReportSection("Syndrome cycle", blocks.ToImmutable());
    }

    private static string Sentence(CycleView cycle)
    {
        double round = cycle.RoundSeconds;
        double inRound = cycle.SecondsOf(CyclePart.Readout, beside: false);
        double beside = cycle.SecondsOf(CyclePart.Readout, beside: true);
        double gates = cycle.SecondsOf(CyclePart.Gates, beside: false);
        string readout = beside > 0
            ? $"The readout takes {Show.Duration(beside)} and runs beside the gates, on a second bank of checks"
            : $"Readout is {Show.Percent(inRound / round)} of it";
        string idle = cycle.IdleSeconds > 0 ? $"; the gates wait {Show.Duration(cycle.IdleSeconds)} for it" : "";
        return $"In one syndrome round every check is measured once. It takes {Show.Duration(round)}. {readout}{idle}. " +
            $"Gates and the moves between them are {Show.Percent(gates / round)}.";
    }

    private static Table PhaseTable(CycleView cycle, TimeColumn time)
    {
        TableBuilder table = new(
            new Column("Phase"),
            new Column($"Start ({time.Unit})", Align.Right),
            new Column($"Duration ({time.Unit})", Align.Right),
            new Column("Groups", Align.Right),
            new Column("Part"));
        foreach (CyclePhase phase in cycle.Phases)
        {
            string part = Words.Part(phase.Part) + (phase.Data == DataState.Beside ? ", beside the gates" : "");
            table.Add(
                phase.Name,
                time.Show(phase.StartSeconds),
                time.Between(phase.StartSeconds, phase.StartSeconds + phase.Seconds),
                phase.Goes < 1 ? Show.Significant(phase.Goes, 1) : Words.Whole(phase.Goes),
                part);
        }

        if (cycle.IdleSeconds > 0)
        {
            double start = cycle.RoundSeconds - cycle.IdleSeconds;
            table.Add("Wait for the readout", time.Show(start), time.Between(start, cycle.RoundSeconds), "", "readout");
        }

        table.AddStanding("Round", "", time.Show(cycle.RoundSeconds), "", "");
        return table.Build();
    }

    /// <summary>One unit and one number of decimals for all durations, so that they add up as printed.</summary>
    private sealed record TimeColumn(string Unit, double Seconds, int Decimals)
    {
        public static TimeColumn For(double roundSeconds) => roundSeconds switch
        {
            < 1e-4 => new TimeColumn("µs", 1e-6, 2),
            < 1e-2 => new TimeColumn("µs", 1e-6, 1),
            < 1 => new TimeColumn("ms", 1e-3, 2),
            _ => new TimeColumn("s", 1, 3),
        };

        public string Show(double seconds) => Text(Rounded(seconds));

        // the step of the rounded clock, not the rounded step
        public string Between(double start, double end) => Text(Rounded(end) - Rounded(start));

        private double Rounded(double seconds) => Math.Round(seconds / Seconds, Decimals);

        private string Text(double amount) => amount.ToString(Decimals switch { 1 => "N1", 2 => "N2", _ => "N3" }, CultureInfo.InvariantCulture);
    }
}
