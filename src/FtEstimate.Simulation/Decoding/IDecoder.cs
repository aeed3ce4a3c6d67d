namespace FtEstimate.Simulation.Decoding;

/// <summary>Guesses from the detectors that fired whether the logical observable was flipped.</summary>
/// <remarks>
/// A decoder keeps working memory and so serves one thread; it allocates nothing per shot once warm. The same input gives the same answer
/// whatever was decoded before.
/// </remarks>
public interface IDecoder
{
    /// <summary>Whether the most plausible errors flip the observable.</summary>
    /// <param name="defects">Detectors that fired, ascending, each once.</param>
    /// <param name="told">Mechanisms whose weight is another one in this shot, each edge at most once: where atoms are known to be lost.</param>
    bool Decode(ReadOnlySpan<int> defects, ReadOnlySpan<ToldEdge> told);
}

/// <summary>What a known loss says of one mechanism in one shot.</summary>
/// <param name="Edge">Index of the edge in its graph.</param>
/// <param name="Weight">ln((1−p)/p) with the probability p given the loss, 0 or more; 0 for an erasure.</param>
public readonly record struct ToldEdge(int Edge, double Weight);
