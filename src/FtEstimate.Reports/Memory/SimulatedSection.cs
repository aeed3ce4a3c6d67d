using System.Collections.Immutable;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Estimate;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Reports.Memory;

/// <summary>What was simulated, in words.</summary>
internal static class SimulatedSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(MemoryResults results)
    {
        MemoryQuestion question = results.Question;
        return new ReportSection(
            "What was simulated",
            [
                new Paragraph(
                    "A patch of the rotated surface code is prepared in a logical state, its checks are read for some rounds, then all data atoms are read. " +
                    "A shot fails when the decoder guesses the logical result wrongly."),
                new BulletList(
                [
                    new Bullet("Circuit", Circuit(question.Noise)),
                    new Bullet("Noise", results.Origin.Sentence),
                    new Bullet("Rounds", Rounds(question.Settings)),
                    new Bullet("Decoder", question.Decoder == DecoderKind.Matching
                        ? "Minimum-weight perfect matching, exact, of X and Z checks apart."
                        : "Union-find with weights, of X and Z checks apart: faster than matching and a little less accurate."),
                    new Bullet("Shots", Shots(question)),
                    new Bullet(
                        "Seed",
                        $"{question.Seed.ToString(System.Globalization.CultureInfo.InvariantCulture)}. Each experiment derives a seed of its own from it, from its distance and from its basis, so that experiments are independent. " +
                        "The same seed gives the same counts, whatever the number of threads or shares."),
                ]),
            ]);
    }

    private static string Circuit(MemoryNoise noise) => noise switch
    {
        TextbookMemoryNoise textbook =>
            $"The textbook circuit: CNOT gates in four layers, Hadamards on X checks, readout and reset of all checks at once (O'Rourke 2025, arXiv:2409.14765). {Kind(textbook)}",
        _ => "The circuit of an atom array: CZ gates in four layers with turns of checks and data atoms between them; errors and losses strike place by place as in the error ledger.",
    };

    private static string Kind(TextbookMemoryNoise noise)
    {
        string p = Show.Significant(noise.Error, 3);
        return noise.Rates.OneQubit == noise.Rates.ReadoutFlip
            ? $"Every place errs with probability {p}, waiting included."
            : $"Readout is slow and bad, short waits and one-qubit gates are good, gates on two atoms err with probability {p}.";
    }

    private static string Rounds(ImmutableArray<MemorySetting> settings) => settings.All(setting => setting.Rounds == 3 * setting.Distance)
        ? "Three times the distance."
        : string.Join(", ", settings.Select(setting => Words.Whole(setting.Rounds)).Distinct()) + ".";

    private static string Shots(MemoryQuestion question) =>
        $"{Words.Count(question.Shots, "shot", "shots")} of each experiment asked for, drawn in blocks of {Words.Whole(MemoryPlan.ShotsPerBlock)}.";
}
