using FtEstimate.Simulation.Decoding;

namespace FtEstimate.Simulation.Sampling;

/// <summary>Draws shots of a memory experiment one after another. Keeps working memory, so it serves one thread.</summary>
public interface IShotSampler
{
    /// <summary>Starts a block of shots: the same seed and block give the same shots, whatever came before.</summary>
    void Begin(ulong seed, ulong block);

    /// <summary>The next shot; valid until the next call.</summary>
    SampledShot NextShot();
}

/// <summary>One shot as a decoder gets it, and the truth.</summary>
/// <param name="defects">Detectors that fired, ascending.</param>
/// <param name="told">What told losses say of the mechanisms.</param>
/// <param name="observableFlipped">Whether the observable was in fact flipped.</param>
public readonly ref struct SampledShot(ReadOnlySpan<int> defects, ReadOnlySpan<ToldEdge> told, bool observableFlipped)
{
    /// <summary>Detectors that fired, ascending.</summary>
    public ReadOnlySpan<int> Defects { get; } = defects;

    /// <summary>What told losses say of the mechanisms.</summary>
    public ReadOnlySpan<ToldEdge> Told { get; } = told;

    /// <summary>Whether the observable was in fact flipped.</summary>
    public bool ObservableFlipped { get; } = observableFlipped;
}
