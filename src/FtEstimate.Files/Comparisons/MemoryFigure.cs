using FtEstimate.Cycles;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;
using FtEstimate.Sizing;

namespace FtEstimate.Files.Comparisons;

/// <summary>Figures simulated for a comparison: few shots, a fixed seed, so that the page is the same every time.</summary>
internal static class MemoryFigure
{
    private const long Shots = 200_000;
    private const int PublishedRounds = 4;

    /// <summary>Any logical error per round of the textbook circuit: both bases added, 3 d rounds, matching. Null for an unknown kind of noise.</summary>
    public static double? PerRound(string noise, double error, int distance)
    {
        UniformNoise? rates = noise switch
        {
            "every-place" => UniformNoise.EveryPlace(error),
            "slow-readout" => UniformNoise.SlowReadout(error),
            _ => null,
        };
        return rates is null ? null : Sum(basis => TextbookCircuit.Of(distance, 3 * distance, basis, rates), 3 * distance);
    }

    /// <summary>Simulated Λ from distance 3 to 5 of one patch of a machine in a memory of four rounds; null for an abstract machine.</summary>
    public static double? SuppressionFromThree(SizedMachine machine)
    {
        if (machine.Point is not AtomOperatingPoint point)
        {
            return null;
        }

        RoundErrors errors = point.Noise.Errors(point.Times(MachineLoad.SinglePatch));
        return OfDistance(3) / OfDistance(5);

        double OfDistance(int distance) => Sum(basis => AtomCircuit.Of(distance, PublishedRounds, basis, errors), PublishedRounds);
    }

    private static double Sum(Func<PauliBasis, Circuit> circuit, int rounds) => PerRound(circuit(PauliBasis.X), rounds) + PerRound(circuit(PauliBasis.Z), rounds);

    private static double PerRound(Circuit circuit, int rounds)
    {
        MemoryPlan plan = new(Shots, 1, Shard.Whole);
        MemoryTally tally = MemoryRun.Run(MemoryExperiment.Of(circuit, DecoderKind.Matching), plan, default, Environment.ProcessorCount, null, CancellationToken.None);
        return ErrorEstimate.PerShot(tally.Count).PerRound(rounds).Value;
    }
}
