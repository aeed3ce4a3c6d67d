using System.Numerics;

namespace FtEstimate.Simulation.Decoding.Matching;

/// <summary>Events by time, none of them before the last one taken: a radix heap (Ahuja 1990, from memory).</summary>
internal sealed class EventQueue
{
    private readonly QueuedEvent[][] buckets = new QueuedEvent[65][];
    private readonly int[] counts = new int[65];
    private ulong occupied;
    private long now;

    public EventQueue()
    {
        for (int bucket = 0; bucket < buckets.Length; bucket++)
        {
            buckets[bucket] = new QueuedEvent[16];
        }
    }

    public void Clear()
    {
        while (occupied != 0)
        {
            counts[BitOperations.TrailingZeroCount(occupied)] = 0;
            occupied &= occupied - 1;
        }

        now = 0;
    }

    /// <summary>Adds an event, not before the last one taken.</summary>
    public void Add(long time, int subject)
    {
        // bucket 0 holds the present, bucket k what differs from it first in bit k - 1
        int bucket = 64 - BitOperations.LeadingZeroCount((ulong)(time ^ now));
        int count = counts[bucket];
        if (count == buckets[bucket].Length)
        {
            Array.Resize(ref buckets[bucket], 2 * count);
        }

        buckets[bucket][count] = new QueuedEvent(time, subject);
        counts[bucket] = count + 1;
        occupied |= 1UL << bucket;
    }

    /// <summary>Takes an event of the earliest time; false if there is none.</summary>
    public bool Take(out QueuedEvent taken)
    {
        if (occupied == 0)
        {
            taken = default;
            return false;
        }

        int bucket = BitOperations.TrailingZeroCount(occupied);
        if (bucket > 0)
        {
            Spread(bucket);
        }

        int last = --counts[0];
        if (last == 0)
        {
            occupied &= ~1UL;
        }

        taken = buckets[0][last];
        return true;
    }

    private void Spread(int bucket)
    {
        ReadOnlySpan<QueuedEvent> events = buckets[bucket].AsSpan(0, counts[bucket]);
        long earliest = long.MaxValue;
        foreach (QueuedEvent queued in events)
        {
            earliest = Math.Min(earliest, queued.Time);
        }

        now = earliest;
        counts[bucket] = 0;
        occupied &= ~(1UL << bucket);
        foreach (QueuedEvent queued in events)
        {
            Add(queued.Time, queued.Subject);
        }
    }
}

/// <summary>When something may happen, and to what: a vertex, or the complement of a region.</summary>
internal readonly record struct QueuedEvent(long Time, int Subject);
