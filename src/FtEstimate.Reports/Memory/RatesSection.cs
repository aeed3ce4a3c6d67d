using FtEstimate.Noise;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Estimate;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Reports.Memory;

/// <summary>The rates of the circuit, place by place.</summary>
internal static class RatesSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(MemoryNoise noise) => new(
        "Rates of the circuit",
        noise switch
        {
            TextbookMemoryNoise textbook => [TableOf(textbook.Rates)],
            AtomMemoryNoise atoms => [TableOf(atoms.Errors), new Paragraph(Looks(atoms.Errors))],
            _ => throw new ArgumentOutOfRangeException(nameof(noise)),
        });

    private static Table TableOf(UniformNoise rates)
    {
        TableBuilder table = new(new Column("Place"), new Column("Probability each time", Align.Right));
        table.Add("Gate on two atoms", Show.Probability(rates.Pair));
        table.Add("Gate on one atom", Show.Probability(rates.OneQubit));
        table.Add("Atom without a gate in a layer of gates", Show.Probability(rates.WaitingPerLayer));
        table.Add("Data atom while checks are read and reset", Show.Probability(rates.WaitingInReadout));
        table.Add("Reset to the wrong state", Show.Probability(rates.ResetFlip));
        table.Add("Wrong result of a readout", Show.Probability(rates.ReadoutFlip));
        return table.Build();
    }

    private static Table TableOf(RoundErrors errors)
    {
        TableBuilder table = new(
            new Column("Place"),
            new Column("Probability each time", Align.Right),
            new Column("X", Align.Right),
            new Column("Y", Align.Right),
            new Column("Z", Align.Right));
        table.Add("CZ gate", Show.Probability(errors.CzGate), "", "", "");
        table.Add("One-qubit gate on a data atom", Show.Probability(errors.GateOnData), "", "", "");
        Add("Every atom in a CZ layer", errors.WaitingInLayer);
        Add("Each data atom once per round, after the gates", errors.OnData);
        Add("Each check once before and once after its layers", errors.OnCheckOutsideLayers);
        Add("Each check at each of its five moves", errors.OnCheckBetweenLayers);
        table.Add("Check read wrongly", Show.Probability(errors.CheckFlip), "", "", "");
        table.Add("Check that starts in the wrong state", Show.Probability(errors.CheckReset), "", "", "");
        table.Add($"Data atom lost, per gate slot{Told(errors.DataLossTold)}", Show.Probability(errors.DataLossPerSlot), "", "", "");
        table.Add($"Check lost, per gate slot{Told(errors.CheckLossTold)}", Show.Probability(errors.CheckLossPerSlot), "", "", "");
        return table.Build();

        void Add(string place, PauliChannel channel) => table.Add(
            place, Show.Probability(channel.Total), Show.Probability(channel.X), Show.Probability(channel.Y), Show.Probability(channel.Z));
    }

    private static string Told(bool isTold) => isTold ? " (the decoder is told)" : " (nobody tells)";

    private static string Looks(RoundErrors errors) => errors.DataLossPerSlot > 0
        ? $"A round has four gate slots. Lost data atoms are looked for and replaced {(errors.RoundsBetweenLooks == 1 ? "in every round" : $"every {Words.Whole(errors.RoundsBetweenLooks)} rounds")}, lost checks in every round."
        : "No atoms are lost.";
}
