using System.Numerics;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.RareEvents;

/// <summary>A set of mechanisms that happen together, with the detectors they fire, kept up to date mechanism by mechanism.</summary>
/// <param name="graph">The mechanisms.</param>
internal sealed class FaultSet(DetectorGraph graph)
{
    private readonly GraphEdge[] edges = [.. graph.Edges];
    private readonly int[] placeOf = Enumerable.Repeat(-1, graph.Edges.Length).ToArray();
    private readonly int[] faults = new int[graph.Edges.Length];
    private readonly ulong[] fired = new ulong[(graph.VertexCount + 63) / 64];
    private readonly int[] defects = new int[graph.VertexCount];

    /// <summary>Number of mechanisms in the set.</summary>
    public int Count { get; private set; }

    /// <summary>Whether they flip the observable.</summary>
    public bool ObservableFlipped { get; private set; }

    /// <summary>Edges of the set, in no order.</summary>
    public ReadOnlySpan<int> Faults => faults.AsSpan(0, Count);

    /// <summary>Whether a mechanism is in the set.</summary>
    public bool Has(int edge) => placeOf[edge] >= 0;

    /// <summary>Puts a mechanism in, or takes it out.</summary>
    public void Toggle(int edge)
    {
        GraphEdge mechanism = edges[edge];
        fired[mechanism.A >> 6] ^= 1UL << (mechanism.A & 63);
        if (!mechanism.MeetsBoundary)
        {
            fired[mechanism.B >> 6] ^= 1UL << (mechanism.B & 63);
        }

        ObservableFlipped ^= mechanism.FlipsObservable;
        int place = placeOf[edge];
        if (place < 0)
        {
            placeOf[edge] = Count;
            faults[Count++] = edge;
            return;
        }

        int last = faults[--Count];
        faults[place] = last;
        placeOf[last] = place;
        placeOf[edge] = -1;
    }

    /// <summary>Makes the set hold these mechanisms only.</summary>
    public void SetTo(ReadOnlySpan<int> content)
    {
        while (Count > 0)
        {
            Toggle(faults[Count - 1]);
        }

        foreach (int edge in content)
        {
            Toggle(edge);
        }
    }

    /// <summary>The detectors that fire, ascending; valid until the next call.</summary>
    public ReadOnlySpan<int> Defects()
    {
        int count = 0;
        for (int word = 0; word < fired.Length; word++)
        {
            for (ulong bits = fired[word]; bits != 0; bits &= bits - 1)
            {
                defects[count++] = (word << 6) + BitOperations.TrailingZeroCount(bits);
            }
        }

        return defects.AsSpan(0, count);
    }
}
