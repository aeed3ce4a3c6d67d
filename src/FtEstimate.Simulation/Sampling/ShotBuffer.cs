using System.Numerics;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.Sampling;

/// <summary>One shot: which detectors fired, which losses were told, whether the observable flipped. Reused from shot to shot.</summary>
/// <param name="detectorCount">Number of detectors.</param>
internal sealed class ShotBuffer(int detectorCount)
{
    private readonly ulong[] fired = new ulong[(detectorCount + 63) / 64];
    private readonly int[] defects = new int[detectorCount];

    /// <summary>Whether the observable was flipped.</summary>
    public bool ObservableFlipped { get; private set; }

    /// <summary>Flips a detector.</summary>
    public void Flip(int detector) => fired[detector >> 6] ^= 1UL << (detector & 63);

    /// <summary>Flips what a mechanism flips.</summary>
    public void Flip(in GraphEdge mechanism)
    {
        Flip(mechanism.A);
        if (!mechanism.MeetsBoundary)
        {
            Flip(mechanism.B);
        }

        ObservableFlipped ^= mechanism.FlipsObservable;
    }

    /// <summary>Flips the observable if asked to.</summary>
    public void FlipObservable(bool flips) => ObservableFlipped ^= flips;

    /// <summary>Reads the detectors that fired, ascending, and clears the shot for the next one.</summary>
    public ReadOnlySpan<int> TakeDefects(out bool observableFlipped)
    {
        int count = 0;
        for (int word = 0; word < fired.Length; word++)
        {
            ulong bits = fired[word];
            if (bits == 0)
            {
                continue;
            }

            fired[word] = 0;
            do
            {
                defects[count++] = (word << 6) + BitOperations.TrailingZeroCount(bits);
                bits &= bits - 1;
            }
            while (bits != 0);
        }

        observableFlipped = ObservableFlipped;
        ObservableFlipped = false;
        return defects.AsSpan(0, count);
    }
}
