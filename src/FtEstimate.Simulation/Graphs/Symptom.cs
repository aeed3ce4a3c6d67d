namespace FtEstimate.Simulation.Graphs;

/// <summary>What one error changes: at most two detectors of the type looked at, and perhaps the observable.</summary>
/// <param name="First">The lower detector, or <see cref="Nobody"/>.</param>
/// <param name="Second">The higher detector, or <see cref="Nobody"/>.</param>
/// <param name="Observable">Whether the observable is flipped.</param>
internal readonly record struct Symptom(int First, int Second, bool Observable)
{
    /// <summary>No detector.</summary>
    public const int Nobody = -1;

    /// <summary>Nothing changes.</summary>
    public static readonly Symptom None = new(Nobody, Nobody, false);

    /// <summary>Whether nothing changes.</summary>
    public bool IsNone => First == Nobody && !Observable;

    /// <summary>One detector.</summary>
    public static Symptom Of(int detector) => new(detector, Nobody, false);

    /// <summary>What two errors change together.</summary>
    /// <exception cref="InvalidOperationException">More than two detectors of one type are flipped: the circuit is no surface-code circuit.</exception>
    public static Symptom operator ^(Symptom a, Symptom b)
    {
        Span<int> flipped = stackalloc int[4];
        int count = 0;
        ReadOnlySpan<int> all = [a.First, a.Second, b.First, b.Second];
        foreach (int detector in all)
        {
            if (detector == Nobody)
            {
                continue;
            }

            int at = flipped[..count].IndexOf(detector);
            if (at < 0)
            {
                flipped[count++] = detector;
            }
            else
            {
                flipped[at] = flipped[--count];
            }
        }

        bool observable = a.Observable ^ b.Observable;
        return count switch
        {
            0 => new Symptom(Nobody, Nobody, observable),
            1 => new Symptom(flipped[0], Nobody, observable),
            2 => new Symptom(Math.Min(flipped[0], flipped[1]), Math.Max(flipped[0], flipped[1]), observable),
            _ => throw new InvalidOperationException("an error flips more than two detectors of one type"),
        };
    }
}
