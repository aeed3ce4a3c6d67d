using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.Sampling;

/// <summary>
/// Draws shots directly from the independent mechanisms: in each group of equal probability the gaps between those that happen are geometric, so the
/// cost goes with the number of errors and not with the size of the circuit.
/// </summary>
public sealed class MechanismSampler : IShotSampler
{
    private readonly EqualGroups groups;
    private readonly GraphEdge[] mechanisms;
    private readonly int[] next;
    private readonly ShotBuffer shot;
    private readonly LossSampler? losses;
    private RandomBits random;

    /// <summary>A sampler of a model.</summary>
    public MechanismSampler(MemoryModel model)
    {
        groups = new EqualGroups(model.PauliProbabilities);
        mechanisms = [.. groups.Order.Select(edge => model.Graph.Edges[edge])];
        next = new int[groups.Count];
        shot = new ShotBuffer(model.Graph.VertexCount);
        losses = model.Windows.IsEmpty ? null : new LossSampler(model);
    }

    /// <inheritdoc/>
    public void Begin(ulong seed, ulong block)
    {
        random = new RandomBits(seed, block);
        groups.Begin(next, ref random);
        losses?.Begin(ref random);
    }

    /// <inheritdoc/>
    public SampledShot NextShot()
    {
        int[] starts = groups.Starts;
        for (int group = 0; group < next.Length; group++)
        {
            int position = next[group];
            int end = starts[group + 1];
            while (position < end)
            {
                shot.Flip(mechanisms[position]);
                position += 1 + groups.Gap(group, ref random);
            }

            // what is left of the gap reaches into the next shot
            next[group] = position - (end - starts[group]);
        }

        ReadOnlySpan<Decoding.ToldEdge> told = losses is null ? [] : losses.NextShot(ref random, shot);
        ReadOnlySpan<int> defects = shot.TakeDefects(out bool observableFlipped);
        return new SampledShot(defects, told, observableFlipped);
    }
}
