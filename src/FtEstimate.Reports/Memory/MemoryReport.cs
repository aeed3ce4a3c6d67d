using FtEstimate.Reports.Documents;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Reports.Memory;

/// <summary>The report on simulated memory experiments, beside what the scaling law says at the same noise.</summary>
public static class MemoryReport
{
    /// <summary>The report.</summary>
    /// <param name="results">What was counted; experiments without shots are named as such.</param>
    public static ReportDocument Of(MemoryResults results) => new(
        results.Origin.Title,
        [
            MemorySummary.Of(results),
            SimulatedSection.Of(results),
            ExperimentsSection.Of(results),
            LawSection.Of(results),
            RatesSection.Of(results.Question.Noise),
            Limits,
        ]);

    private static ReportSection Limits => new(
        "What is not simulated",
        [
            new BulletList(
            [
                new Bullet("Logic", "One patch at rest: no lattice surgery, no transversal gates, no magic states."),
                new Bullet("Noise", "Independent Pauli errors and, where atoms can be lost, independent losses. No leakage, no errors that several atoms share, no drift, no coherent build-up."),
                new Bullet("Size", "All distances run at the same rates. A larger machine may have slower rounds and so larger rates."),
                new Bullet("Decoder", "It knows all rates exactly, reads X and Z checks apart, and has all the time it wants."),
            ]),
        ]);
}
