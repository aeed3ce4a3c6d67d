using BenchmarkDotNet.Attributes;
using FtEstimate.Simulation.Decoding.UnionFind;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;
using FtEstimate.Tests.Simulation.Decoding;

namespace FtEstimate.Benchmarks;

/// <summary>How long a decoder takes for one shot of a memory of distance 17 over 51 rounds, with noise like that of gates.</summary>
[MemoryDiagnoser]
public class DecoderBenchmarks
{
    private const int Shots = 1000;

    private UnionFindDecoder _decoder = null!;
    private int[][] _shots = [];

    /// <summary>Two-qubit error; about 100 detectors fire at 1e-3.</summary>
    [Params(1e-3, 3e-3)]
    public double Error { get; set; }

    [GlobalSetup]
    public void Draw()
    {
        DetectorGraph graph = SurfaceCodeGraphs.OfCircuit(17, 51, 1.5 * Error, 2.1 * Error, 0.8 * Error, 0.53 * Error);
        var random = new RandomBits(1, 0);
        _shots = [.. Enumerable.Range(0, Shots).Select(_ => ErrorSet.Sample(graph, ref random).Defects)];
        _decoder = new UnionFindDecoder(graph);
    }

    [Benchmark(OperationsPerInvoke = Shots)]
    public int UnionFind()
    {
        int flips = 0;
        foreach (int[] defects in _shots)
        {
            flips += _decoder.Decode(defects, []) ? 1 : 0;
        }

        return flips;
    }
}
