using System.Collections.Immutable;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Simulation.Memory;
using FtEstimate.Simulation.RareEvents;

namespace FtEstimate.Reports.Memory;

/// <summary>What was estimated by splitting.</summary>
/// <param name="Noise">Kind of noise, by its name.</param>
/// <param name="Error">The one number the rates follow from.</param>
/// <param name="Distance">Code distance.</param>
/// <param name="Rounds">Rounds.</param>
/// <param name="Basis">Basis of the memory.</param>
/// <param name="LawName">Law it is held against.</param>
/// <param name="LawPerRound">What that law says for one observable per round.</param>
/// <param name="LawRemark">How far the law can be trusted here.</param>
public sealed record RareQuestion(string Noise, double Error, int Distance, int Rounds, string Basis, string LawName, double LawPerRound, string LawRemark);

/// <summary>The report on a failure probability that plain Monte Carlo cannot see.</summary>
public static class RareReport
{
    /// <summary>The report.</summary>
    public static ReportDocument Of(RareQuestion question, LadderPlan plan, RareEventEstimate estimate)
    {
        ErrorEstimate perRound = estimate.PerShot().PerRound(question.Rounds);
        return new ReportDocument(
            $"A rare failure: distance {question.Distance}, {question.Basis} memory, {question.Noise} at {Show.Probability(question.Error)}",
            [
                new ReportSection(
                    "In short",
                    [
                        new Paragraph(
                            $"The logical error per round is {Show.Significant(perRound.Value, 3)}, with 95 % between {Show.Significant(perRound.Low, 3)} and {Show.Significant(perRound.High, 3)}; "
                            + $"the law {question.LawName} says {Show.Significant(question.LawPerRound, 3)}.",
                            Tone.Strong),
                        new Paragraph(
                            $"One logical observable, {question.Rounds} rounds of the textbook circuit, exact matching. Per shot {Show.Significant(estimate.Probability, 3)} "
                            + $"with a standard error of {Show.Percent(estimate.RelativeStandardError)}: as good as {Show.Significant(estimate.EquivalentFailures, 2)} failures of plain Monte Carlo, "
                            + $"which would take about {Show.Significant(estimate.EquivalentFailures / estimate.Probability, 2)} shots."),
                    ]),
                new ReportSection("Noise levels", [Levels(estimate)]),
                new ReportSection("How it was done, and a check", [new BulletList(Method(question, plan, estimate))]),
            ]);
    }

    private static Table Levels(RareEventEstimate estimate)
    {
        TableBuilder table = new(
            new Column("Error of the circuit", Align.Right), new Column("Failure per shot", Align.Right), new Column("Standard error", Align.Right), new Column("Changes made", Align.Right));
        foreach (LevelEstimate level in estimate.Levels)
        {
            table.Add(
                Show.Significant(level.Noise, 3), Show.Significant(level.Probability, 3), Show.Percent(level.RelativeStandardError), Show.Percent(level.Acceptance));
        }

        return table.Build();
    }

    private static ImmutableArray<Bullet> Method(RareQuestion question, LadderPlan plan, RareEventEstimate estimate) =>
    [
        new("Method", "Splitting (Bravyi 2013, arXiv:1308.6270): plain Monte Carlo where failures are common, then ratios between neighbouring noise levels; see docs/simulation.md."),
        new("Decoder", "At every level that of the target, so failures at the levels above are a means to an end."),
        new("Work", $"{plan.Ladders} independent ladders of {plan.Walkers} chains; their spread is the error bar. {Show.Significant(estimate.StartShots, 3)} shots at the first level, at most {Show.Significant(estimate.Decodings, 3)} decodings in all. Seed {plan.Seed}."),
        new("The law", question.LawRemark),
        new("Check", $"Ratios that look down only, free of bias however slowly chains move, give {Show.Significant(estimate.ForwardProbability, 3)} ± {Show.Percent(estimate.ForwardRelativeStandardError)} per shot. If that differs by more than both errors, chains were trapped."),
    ];
}
