namespace FtEstimate.Simulation.Sampling;

/// <summary>Things that may happen, in groups of equal probability: gaps between those that do are geometric and take one draw each.</summary>
/// <remarks>Shared by all threads. Probabilities that differ by less than rounding count as equal.</remarks>
internal sealed class EqualGroups
{
    /// <summary>Far above rounding, far below any meaning.</summary>
    private const double SameWithin = 1e-9;

    /// <summary>More than any group holds.</summary>
    private const int LongestGap = 1 << 29;

    private readonly double[] inverseLogOfKept;

    /// <summary>Groups things by probability; those with probability 0 are left out.</summary>
    public EqualGroups(IReadOnlyList<double> probabilities)
    {
        Order = [.. Enumerable.Range(0, probabilities.Count).Where(item => probabilities[item] > 0).OrderBy(item => probabilities[item])];
        List<int> starts = [];
        List<double> ofGroup = [];
        for (int position = 0; position < Order.Length; position++)
        {
            double probability = probabilities[Order[position]];
            if (ofGroup.Count == 0 || probability > ofGroup[^1] * (1 + SameWithin))
            {
                starts.Add(position);
                ofGroup.Add(probability);
            }
        }

        starts.Add(Order.Length);
        Starts = [.. starts];
        inverseLogOfKept = [.. ofGroup.Select(probability => 1 / Quantities.ElementaryFunctions.LogOnePlus(-probability))];
        for (int group = 0; group < Count; group++)
        {
            Array.Sort(Order, Starts[group], Starts[group + 1] - Starts[group]);
        }
    }

    /// <summary>The things, group by group, each group ascending.</summary>
    public int[] Order { get; }

    /// <summary>Where each group begins in the order, and the end of the last.</summary>
    public int[] Starts { get; }

    /// <summary>Number of groups.</summary>
    public int Count => inverseLogOfKept.Length;

    /// <summary>How many things of a group do not happen before the next one that does.</summary>
    public int Gap(int group, ref RandomBits random) => (int)Math.Min(Math.Log(random.NextUnit()) * inverseLogOfKept[group], LongestGap);

    /// <summary>First thing of each group that happens in a stream of shots.</summary>
    public void Begin(int[] next, ref RandomBits random)
    {
        for (int group = 0; group < next.Length; group++)
        {
            next[group] = Starts[group] + Gap(group, ref random);
        }
    }
}
