using System.Collections.Immutable;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Figures;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Estimate;

/// <summary>What the time goes into: from one round to the wall clock.</summary>
internal static class ClockSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(Subject subject)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.AddRange(subject.Preface);
        if (subject.Machine is { } machine)
        {
            blocks.Add(new Paragraph(Steps(subject.Space.Scenario, machine)));
            blocks.Add(FigureTable.Of(ClockFigures.Steps(machine)));
            blocks.Add(new Paragraph("Three things must each be fast enough; the slowest sets the run time. " + BottomLineSection.PaceSentence(machine)));
            blocks.Add(FigureTable.Of(ClockFigures.Limits(machine.Clock)));
            AddDecoder(blocks, subject.Space.Scenario, machine);
            blocks.Add(new Paragraph("From run time to wall clock. A stop loses the shot, which starts again; a shot that fails is repeated."));
            blocks.Add(FigureTable.Of(ClockFigures.WallClock(subject.Space, machine)));
        }

        return new ReportSection("Clock ledger", blocks.ToImmutable());
    }

    private static string Steps(Scenario scenario, SizedMachine machine)
    {
        if (machine.Demand.TStates == 0)
        {
            return "The algorithm uses no magic states; its logical gates are done layer by layer.";
        }

        string rotations = scenario.Workload.Rotations > 0
            ? $" Each of its {Show.Significant(scenario.Workload.Rotations, 3)} rotations takes {Show.Significant(machine.Demand.TPerRotation, 3)} magic states " +
                $"at an error of {Show.Probability(machine.Demand.RotationError)}."
            : "";
        string toffolis = scenario.Workload.Toffolis > 0 ? " Each Toffoli gate takes four." : "";
        string pace = machine.Layout.Style == LogicStyle.LatticeSurgery
            ? $" On this floor plan one magic state takes {Words.Count(machine.Layout.StepsPerT, "logical step", "logical steps")}."
            : machine.Layout.Lanes > 1
            ? $" Up to {Words.Whole(machine.Layout.Lanes)} magic states are used side by side, each in two logical steps and one reaction."
            : " Magic states are used one at a time, each in two logical steps and one reaction.";
        return $"The algorithm uses magic states, one per T gate.{rotations}{toffolis}{pace} " +
            "A reaction is the time from a logical measurement to the operation that depends on it.";
    }

    private static void AddDecoder(ImmutableArray<Block>.Builder blocks, Scenario scenario, SizedMachine machine)
    {
        double decode = scenario.Machine.Control.DecodeSecondsPerRound;
        if (decode > machine.Clock.RoundSeconds)
        {
            blocks.Add(new Paragraph(
                $"The decoder takes {Show.Duration(decode)} per round, longer than the round itself. One decoder per patch falls behind more and more; " +
                "the estimate assumes enough of them side by side.",
                Tone.Caution));
        }
    }
}
