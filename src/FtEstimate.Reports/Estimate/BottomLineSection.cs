using System.Collections.Immutable;
using FtEstimate.Machines;
using FtEstimate.Noise;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Figures;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Estimate;

/// <summary>The half page a reader may stop after.</summary>
internal static class BottomLineSection
{
    /// <summary>Heading of the section, with and without an answer.</summary>
    public const string Title = "Bottom line";

    /// <summary>The section.</summary>
    public static ReportSection Of(Subject subject, SizedMachine machine)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.Add(new Paragraph(Sentence(subject.Space.Scenario, machine), Tone.Strong));
        AddCautions(blocks, subject);
        blocks.Add(FigureTable.Of(AnswerFigures.Of(subject.Space, machine), withMeaning: true));
        blocks.Add(new Paragraph("What limits it:"));
        blocks.Add(new BulletList(Limits(subject, machine)));
        string reach = subject.Space.Law.Reach(machine.Strength.Worse, machine.Distance).Inside
            ? ""
            : $" The law from physical to logical errors is carried beyond its data at distance {machine.Distance}; see Method and limits.";
        blocks.Add(new Paragraph(
            $"This is a planning estimate, not a forecast.{reach} How far the ranges of the inputs move it is not worked out yet; see How sure."));
        return new ReportSection(Title, blocks.ToImmutable());
    }

    /// <summary>The cautions that a reader of the first half page must not miss.</summary>
    public static void AddCautions(ImmutableArray<Block>.Builder blocks, Subject subject)
    {
        if (!subject.Cycle.IsPhysical)
        {
            blocks.Add(new Paragraph(
                "This machine is abstract: its error and round time are stated, and no physical cycle stands behind them.", Tone.Caution));
        }

        if (subject.Machine is { Elapsed.FinishesInPractice: false } machine && subject.Space.Scenario.Machine.Running.MeanSecondsBetweenStops is { } between)
        {
            blocks.Add(new Paragraph(
                $"This run does not finish in practice. A stop loses the shot, and {Show.Significant(machine.Elapsed.StopsPerShot, 2)} stops are " +
                $"expected within one. The mean time between stops is {Show.Duration(between)}; it must reach about " +
                $"{Show.Duration(machine.Elapsed.NeededSecondsBetweenStops)}, so that one stop falls into a shot.",
                Tone.Caution));
        }

        if (subject.Machine?.Optics.Fields is > 1 and double fields)
        {
            blocks.Add(new Paragraph(
                $"The atoms fill {Words.Whole(fields)} optical fields of the stated diameter. No link between fields is modelled.", Tone.Caution));
        }

        if (LeavesLossUnseen(subject.Space.Scenario.Machine))
        {
            blocks.Add(new Paragraph("No check for lost data atoms is stated. The estimate does not hold for long runs.", Tone.Caution));
        }
    }

    private static bool LeavesLossUnseen(Machine machine) =>
        machine.Apparatus is AtomArray { Coherence.LossCheck.Method: LossCheckMethod.None };

    private static string Sentence(Scenario scenario, SizedMachine machine)
    {
        string shots = scenario.Workload.Shots > 1 ? "each shot of " : "";
        if (machine.Elapsed is not { FinishesInPractice: true, Seconds: { } seconds })
        {
            return $"{Show.Atoms(machine.Atoms.Total)} atoms would complete {shots}“{scenario.Workload.Name}” on “{scenario.Machine.Name}” in " +
                $"{Show.Duration(machine.RunSeconds)} of run time without a stop, but between stops the run does not finish in practice.";
        }

        string elapsed = $"; expect {Show.Duration(seconds)} on the wall clock";
        return $"{Show.Atoms(machine.Atoms.Total)} atoms and {Show.Duration(machine.RunSeconds)} of run time complete {shots}" +
            $"“{scenario.Workload.Name}” on “{scenario.Machine.Name}”{elapsed}.";
    }

    private static ImmutableArray<Bullet> Limits(Subject subject, SizedMachine machine)
    {
        var limits = ImmutableArray.CreateBuilder<Bullet>();
        limits.Add(new Bullet("Pace", PaceSentence(machine)));
        if (machine.Ledger.Channels.Length > 0)
        {
            ErrorChannel largest = machine.Ledger.Channels[0];
            limits.Add(new Bullet("Errors", $"{largest.Name}: {Show.Percent(machine.Ledger.Share(largest))} of the noise. The error ledger lists every cause."));
        }

        AtomCount atoms = machine.Atoms;
        string factories = machine.Factory is null ? "no factories are needed"
            : $"{Words.Count(machine.FactoryCount, "factory holds", "factories hold")} {Show.Percent(atoms.FactoryAtoms / atoms.Total)}";
        limits.Add(new Bullet("Atoms", $"Patches of the algorithm hold {Show.Percent(atoms.TileAtoms / atoms.Total)}, {factories}, more checks and spares the rest."));
        if (subject.Space.Scenario.Machine.Supply.AtomsPerSecond is { } delivered && machine.LossPerSecond > 0)
        {
            limits.Add(new Bullet(
                "Fresh atoms",
                $"{Show.Percent(machine.LossPerSecond / delivered)} of the stated delivery is needed to replace lost atoms."));
        }

        return limits.ToImmutable();
    }

    /// <summary>What sets the pace, in a sentence.</summary>
    public static string PaceSentence(SizedMachine machine) => machine.Clock.Pace switch
    {
        _ when machine.RunSeconds == 0 => "The workload states neither T gates nor layers of logical gates, so nothing takes time.",
        Pace.Supply =>
            $"Magic states, which the costly T gates use up, arrive too slowly: {Words.Count(machine.FactoryCount, "factory makes", "factories make")} " +
            $"one every {Show.Duration(machine.Clock.SupplySeconds / machine.Demand.TStates)}. More factories cost atoms.",
        Pace.Consumption when machine.Demand.TStates > 0 =>
            "Magic states, which the costly T gates use up, are taken in one after another: one every " +
            $"{Show.Duration(machine.Clock.ConsumptionSeconds / machine.Demand.TStates)}. A faster round {(machine.Layout.Name == "fast" ? "" : "or a larger floor plan ")}would help.",
        Pace.Consumption => $"The logical gates themselves, layer by layer, at {Show.Duration(machine.Clock.StepSeconds)} each.",
        _ =>
            $"{Show.Significant(machine.Demand.ReactionDepth, 3)} decisions wait for one another, {Show.Duration(machine.ReactionSeconds)} each: " +
            "readout, camera, decoding and feed-forward.",
    };
}
