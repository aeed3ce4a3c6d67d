using System.Collections.Immutable;
using FtEstimate.MagicStates;
using FtEstimate.Noise;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Estimate;

namespace FtEstimate.Reports.Listings;

/// <summary>What a catalogue of factories was worked out for.</summary>
/// <param name="Title">Heading of the report.</param>
/// <param name="LawName">Scaling law.</param>
/// <param name="Strength">Noise strength, in units of the threshold.</param>
/// <param name="InjectedError">Pauli probability of an injected state.</param>
/// <param name="ErrorAtMost">Largest output error of use, when only such factories are listed; null: all are.</param>
public sealed record FactoryQuestion(
    string Title, string LawName, NoiseStrength Strength, double InjectedError, double? ErrorAtMost = null);

/// <summary>The catalogue of magic-state factories at one noise.</summary>
public static class FactoriesReport
{
    /// <summary>The report.</summary>
    /// <param name="question">The noise.</param>
    /// <param name="entries">The factories to list, in order.</param>
    public static ReportDocument Of(FactoryQuestion question, ImmutableArray<CatalogueEntry> entries)
    {
        int unbeaten = 0;
        foreach (CatalogueEntry entry in entries)
        {
            unbeaten += entry.Dominated ? 0 : 1;
        }

        return new ReportDocument(
            question.Title,
            [
                new ReportSection(
                    "Magic-state factories",
                    [
                        new Paragraph(
                            $"{Words.Count(entries.Length, "factory", "factories")}, {Words.Whole(unbeaten)} unbeaten: no other is at least as good in atoms, rounds per state and error at once. " +
                            $"The noise is at {Show.Significant(question.Strength.Mean, 3)} of the threshold by the law {question.LawName}, and an injected state errs " +
                            $"with probability {Show.Probability(question.InjectedError)}.{Needed(question)}"),
                        CatalogueTable(entries),
                        new Paragraph(
                            "Names give the distances dX, dZ and dm of a block; *n is the number of blocks that feed the next level. A round is one syndrome cycle. " +
                            "Designs and their error sums follow Litinski 2019 (arXiv:1905.06903)."),
                    ]),
            ]);
    }

    private static string Needed(FactoryQuestion question) => question.ErrorAtMost is { } most
        ? $" Listed is what is of use to the workload: a state may err with probability {Show.Probability(most)} at most, and less than a hundredth of that buys nothing."
        : "";

    private static Table CatalogueTable(ImmutableArray<CatalogueEntry> entries)
    {
        TableBuilder table = new(
            new Column("Factory", Verbatim: true),
            new Column("Atoms", Align.Right),
            new Column("Rounds per state", Align.Right),
            new Column("Rounds per batch", Align.Right),
            new Column("Output error", Align.Right),
            new Column("Batches accepted", Align.Right),
            new Column("Unbeaten"));
        foreach (CatalogueEntry entry in entries)
        {
            Factory factory = entry.Factory;
            table.Add(
                factory.Name,
                Show.Atoms(factory.Atoms),
                Show.Significant(factory.RoundsPerOutput, 3),
                Show.Significant(factory.RoundsPerBatch, 3),
                Show.Probability(factory.OutputError),
                Show.Percent(factory.Acceptance),
                entry.Dominated ? "" : "yes");
        }

        return table.Build();
    }
}
