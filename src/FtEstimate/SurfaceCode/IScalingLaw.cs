namespace FtEstimate.SurfaceCode;

/// <summary>How the logical error of a surface-code patch falls with its distance.</summary>
/// <remarks>
/// The noise enters as a strength x: 1 at the threshold, below 1 where a larger patch is better. A law is a pure
/// function, safe to call from many threads, and never decreases when x grows.
/// </remarks>
public interface IScalingLaw
{
    /// <summary>The name used in scenario files, such as "published-fit".</summary>
    public string Name { get; }

    /// <summary>One sentence saying where the law comes from: first author, year, arXiv number.</summary>
    public string Source { get; }

    /// <summary>The Pauli error probability of every location of the uniform textbook circuit at which x is 1.</summary>
    public double Threshold { get; }

    /// <summary>Probability of any logical error of one patch in one round, 0 to 0.5.</summary>
    /// <param name="x">Noise strength, the same in both bases, 0 or more.</param>
    /// <param name="distance">Code distance; the range is the law's own.</param>
    /// <exception cref="ArgumentOutOfRangeException">The distance is below the law's smallest.</exception>
    public double LogicalErrorPerRound(double x, int distance);

    /// <summary>Whether the law rests on data at this point or is carried beyond it.</summary>
    public LawReach Reach(double x, int distance);
}

/// <summary>Whether a law rests on data at some point.</summary>
/// <param name="Inside">False where the law is extrapolated.</param>
/// <param name="Sentence">The range and what is known of the error, to print as it is.</param>
public readonly record struct LawReach(bool Inside, string Sentence);
