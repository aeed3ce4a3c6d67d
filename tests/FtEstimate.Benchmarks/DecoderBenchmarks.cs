using BenchmarkDotNet.Attributes;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Memory;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Benchmarks;

/// <summary>How long a decoder takes for one shot: the textbook circuit with noise at every place, three rounds per distance.</summary>
[MemoryDiagnoser]
public class DecoderBenchmarks
{
    private const int Shots = 1000;

    private readonly int[][] _shots = new int[Shots][];
    private IDecoder _decoder = null!;

    [Params(DecoderKind.Matching, DecoderKind.UnionFind)]
    public DecoderKind Kind { get; set; }

    [Params(5, 11, 17)]
    public int Distance { get; set; }

    [Params(1e-3, 5e-3)]
    public double Error { get; set; }

    [GlobalSetup]
    public void Draw()
    {
        MemoryModel model = FaultPropagation.Of(TextbookCircuit.Of(Distance, 3 * Distance, PauliBasis.Z, UniformNoise.EveryPlace(Error)));
        var sampler = new MechanismSampler(model);
        sampler.Begin(1, 0);
        for (int shot = 0; shot < Shots; shot++)
        {
            _shots[shot] = sampler.NextShot().Defects.ToArray();
        }

        _decoder = Decoders.Make(Kind, model.Graph);
    }

    [Benchmark(OperationsPerInvoke = Shots)]
    public int Decode()
    {
        int flips = 0;
        foreach (int[] defects in _shots)
        {
            flips += _decoder.Decode(defects, []) ? 1 : 0;
        }

        return flips;
    }
}
