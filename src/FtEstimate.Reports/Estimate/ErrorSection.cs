using System.Collections.Immutable;
using FtEstimate.Noise;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Figures;
using FtEstimate.Reports.Pictures;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Estimate;

/// <summary>Every cause of error, and where the failure of a shot comes from.</summary>
internal static class ErrorSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(Subject subject)
    {
        ErrorLedger ledger = subject.Cycle.Ledger;
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.AddRange(subject.Preface);
        if (ledger.Channels.Length > 0)
        {
            AddLedger(blocks, subject, ledger);
        }

        if (subject.Machine is { } machine)
        {
            AddFailure(blocks, machine);
        }

        return new ReportSection("Error ledger", blocks.ToImmutable());
    }

    private static void AddLedger(ImmutableArray<Block>.Builder blocks, Subject subject, ErrorLedger ledger)
    {
        NoiseStrength total = ledger.Total;
        string gates = subject.Machine is { Layout.NoiseFactor: > 1 } machine
            ? $" Transversal gates raise this by a factor of {Show.Significant(machine.Layout.NoiseFactor, 3)}, to {Show.Significant(machine.Strength.Mean, 3)}."
            : "";
        blocks.Add(new Paragraph(
            "Each physical error adds to the noise strength, measured in units of the threshold: at 1 no patch size helps, well below 1 patches protect fast. " +
            $"The sum is {Show.Significant(total.X, 3)} for errors that flip logical X and {Show.Significant(total.Z, 3)} for those that flip logical Z.{gates}"));
        blocks.Add(LedgerTable(ledger));
        if (!subject.Cycle.IsPhysical)
        {
            return;
        }

        blocks.Add(new Paragraph(
            "The weights that turn probabilities into shares are first order: each cause counts in proportion to its probability, as it would alone at small noise."));
        blocks.Add(new Picture(
            "errors", "Share of each cause of error in the noise strength.", () => SharePicture.Svg(ledger)));
    }

    private static Table LedgerTable(ErrorLedger ledger)
    {
        TableBuilder table = new(
            new Column("Cause of error"),
            new Column("Probability each time", Align.Right),
            new Column("Times per round", Align.Right),
            new Column("Probability per round", Align.Right),
            new Column("Share of noise", Align.Right));
        double[] shares = new double[ledger.Channels.Length];
        for (int i = 0; i < shares.Length; i++)
        {
            shares[i] = ledger.Share(ledger.Channels[i]);
        }

        string[] shown = Apportion.ToPercent(shares);
        for (int i = 0; i < shares.Length; i++)
        {
            ErrorChannel channel = ledger.Channels[i];
            table.Add(
                channel.Name,
                Show.Probability(channel.PerLocation),
                Show.Significant(channel.TimesPerRound, 2),
                Show.Probability(channel.PerRound),
                shown[i]);
        }

        table.AddStanding("All causes", "", "", "", "100.0 %");
        return table.Build();
    }

    private static void AddFailure(ImmutableArray<Block>.Builder blocks, SizedMachine machine)
    {
        FailureBudget failure = machine.Failure;
        double sum = failure.Patches + failure.MagicStates + failure.Synthesis;
        blocks.Add(new Paragraph(
            $"A patch of distance {machine.Distance} suffers a logical error with probability {Show.Probability(machine.LogicalErrorPerRound)} per round. " +
            "Over one shot the failure comes from:"));
        double[] parts = [failure.Patches, failure.MagicStates, failure.Synthesis];
        double[] shares = sum > 0 ? [parts[0] / sum, parts[1] / sum, parts[2] / sum] : [0, 0, 0];
        string[] shown = Apportion.ToPercent(shares);
        TableBuilder table = new(new Column("Where from"), new Column("Expected faults in one shot", Align.Right), new Column("Share", Align.Right));
        string[] faults = Apportion.ToSmallNumbers(parts);
        table.Add("Logical errors of patches", faults[0], shown[0]);
        table.Add("Faulty magic states", faults[1], shown[1]);
        table.Add("Inexact rotations", faults[2], shown[2]);
        table.AddStanding("All", faults[^1], sum > 0 ? "100.0 %" : "0.0 %");
        blocks.Add(table.Build());
        blocks.Add(new Paragraph($"At least one fault, and so a wrong result, has probability {Show.Probability(failure.Total)}."));
    }
}
