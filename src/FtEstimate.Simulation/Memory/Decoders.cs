using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Decoding.Matching;
using FtEstimate.Simulation.Decoding.UnionFind;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.Memory;

/// <summary>Which decoder reads a memory experiment.</summary>
public enum DecoderKind
{
    /// <summary>Exact minimum-weight perfect matching.</summary>
    Matching,

    /// <summary>Weighted union-find: faster, somewhat less accurate.</summary>
    UnionFind,
}

/// <summary>Makes decoders.</summary>
public static class Decoders
{
    /// <summary>A decoder for one thread.</summary>
    public static IDecoder Make(DecoderKind kind, DetectorGraph graph) => kind switch
    {
        DecoderKind.Matching => new MatchingDecoder(graph),
        DecoderKind.UnionFind => new UnionFindDecoder(graph),
        _ => throw new ArgumentOutOfRangeException(nameof(kind)),
    };

    /// <summary>The name used on the command line and in result files.</summary>
    public static string NameOf(DecoderKind kind) => kind switch
    {
        DecoderKind.Matching => "matching",
        DecoderKind.UnionFind => "union-find",
        _ => throw new ArgumentOutOfRangeException(nameof(kind)),
    };
}
