using BenchmarkDotNet.Attributes;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Decoding.Matching;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Benchmarks;

/// <summary>Exact matching of memory shots with noise at every place, three rounds per distance; one operation is one shot.</summary>
[MemoryDiagnoser]
public class MatchingBenchmarks
{
    private const int ShotCount = 1000;

    private readonly int[][] shots = new int[ShotCount][];
    private MatchingDecoder decoder = null!;

    /// <summary>Code distance.</summary>
    [Params(5, 11, 17)]
    public int Distance { get; set; }

    /// <summary>Error probability at every place.</summary>
    [Params(1e-3, 5e-3)]
    public double Probability { get; set; }

    /// <summary>Draws the shots.</summary>
    [GlobalSetup]
    public void Prepare()
    {
        MemoryModel model = FaultPropagation.Of(
            TextbookCircuit.Of(Distance, 3 * Distance, PauliBasis.Z, UniformNoise.EveryPlace(Probability)));
        MechanismSampler sampler = new(model);
        sampler.Begin(seed: 3, block: 0);
        for (int shot = 0; shot < ShotCount; shot++)
        {
            shots[shot] = sampler.NextShot().Defects.ToArray();
        }

        decoder = new MatchingDecoder(model.Graph);
    }

    /// <summary>Decodes them.</summary>
    [Benchmark(OperationsPerInvoke = ShotCount)]
    public int Decode()
    {
        int flips = 0;
        foreach (int[] defects in shots)
        {
            flips += decoder.Decode(defects, []) ? 1 : 0;
        }

        return flips;
    }
}
