namespace FtEstimate.Simulation.RareEvents;

/// <summary>The samples of one level of one ladder: failing sets, and from which starting shot each descends.</summary>
internal sealed class SamplePool
{
    private readonly List<int> starts = [0];
    private readonly List<int> roots = [];
    private int[] faults = new int[1024];
    private int used;

    /// <summary>Number of samples.</summary>
    public int Count => roots.Count;

    /// <summary>Forgets all samples.</summary>
    public void Clear()
    {
        starts.Clear();
        starts.Add(0);
        roots.Clear();
        used = 0;
    }

    /// <summary>Adds a sample.</summary>
    public void Add(ReadOnlySpan<int> set, int root)
    {
        if (used + set.Length > faults.Length)
        {
            Array.Resize(ref faults, 2 * (used + set.Length));
        }

        set.CopyTo(faults.AsSpan(used));
        used += set.Length;
        starts.Add(used);
        roots.Add(root);
    }

    /// <summary>The mechanisms of a sample.</summary>
    public ReadOnlySpan<int> At(int sample) => faults.AsSpan(starts[sample]..starts[sample + 1]);

    /// <summary>The starting shot from which a sample descends.</summary>
    public int RootOf(int sample) => roots[sample];

    /// <summary>How many starting shots have descendants here.</summary>
    public int DistinctRoots() => roots.Distinct().Count();
}
