namespace FtEstimate.Simulation.Decoding.UnionFind;

/// <summary>Events in order of time, then vertex: a binary heap.</summary>
internal struct EventQueue(int capacity)
{
    private ulong[] keys = new ulong[capacity];

    /// <summary>Number of events.</summary>
    public int Count { get; private set; }

    /// <summary>Forgets all events.</summary>
    public void Clear() => Count = 0;

    /// <summary>Adds an event.</summary>
    public void Push(int time, int vertex)
    {
        if (Count == keys.Length)
        {
            Array.Resize(ref keys, 2 * Count);
        }

        ulong key = ((ulong)(uint)time << 32) | (uint)vertex;
        int place = Count++;
        ulong[] heap = keys;
        while (place > 0)
        {
            int parent = (place - 1) >> 1;
            if (heap[parent] <= key)
            {
                break;
            }

            heap[place] = heap[parent];
            place = parent;
        }

        heap[place] = key;
    }

    /// <summary>Takes the earliest event; there must be one.</summary>
    public (int Time, int Vertex) Pop()
    {
        ulong[] heap = keys;
        ulong first = heap[0];
        int count = --Count;
        ulong key = heap[count];
        int place = 0;
        for (int child = 1; child < count; child = (2 * place) + 1)
        {
            if (child + 1 < count && heap[child + 1] < heap[child])
            {
                child++;
            }

            if (heap[child] >= key)
            {
                break;
            }

            heap[place] = heap[child];
            place = child;
        }

        heap[place] = key;
        return ((int)(first >> 32), (int)(uint)first);
    }
}
