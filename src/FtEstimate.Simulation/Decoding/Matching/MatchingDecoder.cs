using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.Decoding.Matching;

/// <summary>
/// Pairs the defects with each other or with the boundary such that the paths between them weigh least, and answers with the parity of the
/// observable flips along these paths: exact minimum-weight perfect matching.
/// </summary>
/// <remarks>
/// Weights are ln((1−p)/p), rounded to 2⁻¹⁷. The algorithm is that of Edmonds (1965), with regions that grow on the detector graph itself
/// (Higgott 2025, arXiv:2303.15933). A defect with no partner and no boundary within reach stays alone, and the answer is then arbitrary.
/// </remarks>
public sealed class MatchingDecoder : IDecoder
{
    private readonly WeightedEdges edges;
    private readonly AlternatingForest forest;

    /// <summary>Prepares the working memory.</summary>
    /// <param name="graph">Detectors and mechanisms.</param>
    public MatchingDecoder(DetectorGraph graph)
    {
        edges = new WeightedEdges(graph);
        forest = new AlternatingForest(edges, graph.VertexCount);
    }

    /// <summary>The optimum of the last shot as the dual variables have it, in units of weight.</summary>
    internal long LastDual => forest.Dual;

    /// <summary>The paths of the last shot, each once.</summary>
    internal ReadOnlySpan<TightPath> LastPaths => forest.Paths;

    /// <summary>The dual variables of the last shot.</summary>
    internal AlternatingForest LastForest => forest;

    /// <inheritdoc/>
    public bool Decode(ReadOnlySpan<int> defects, ReadOnlySpan<ToldEdge> told)
    {
        if (defects.IsEmpty)
        {
            forest.Forget();
            return false;
        }

        edges.Override(told);
        bool flipped = forest.Match(defects);
        edges.Restore(told);
        return flipped;
    }
}
