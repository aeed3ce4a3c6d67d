using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.Sampling;

/// <summary>Draws the losses of a shot, the random Pauli errors that lost atoms carry, and what the decoder is told of them.</summary>
internal sealed class LossSampler
{
    private readonly DetectorGraph graph;
    private readonly EqualGroups groups;
    private readonly LossWindow[] windows;
    private readonly double[][] lostBy;
    private readonly int[] next;
    private readonly ToldLosses told;

    /// <summary>Sorts the windows of a model into groups of equal loss probability.</summary>
    public LossSampler(MemoryModel model)
    {
        graph = model.Graph;
        groups = new EqualGroups([.. model.Windows.Select(window => window.LossProbability)]);
        windows = [.. groups.Order.Select(index => model.Windows[index])];
        lostBy = [.. windows.Select(LostBy)];
        next = new int[groups.Count];
        told = new ToldLosses(graph);
    }

    /// <summary>Starts a block of shots.</summary>
    public void Begin(ref RandomBits random) => groups.Begin(next, ref random);

    /// <summary>Adds the losses of the next shot to it; gives what the decoder is told.</summary>
    public ReadOnlySpan<ToldEdge> NextShot(ref RandomBits random, ShotBuffer shot)
    {
        for (int group = 0; group < next.Length; group++)
        {
            int position = next[group];
            int end = groups.Starts[group + 1];
            while (position < end)
            {
                Lose(position, ref random, shot);
                position += 1 + groups.Gap(group, ref random);
            }

            next[group] = position - (end - groups.Starts[group]);
        }

        return told.Take();
    }

    private void Lose(int position, ref RandomBits random, ShotBuffer shot)
    {
        LossWindow window = windows[position];
        int lostAt = StepOfLoss(lostBy[position], random.NextUnit());
        for (int index = lostAt; index < window.Steps.Length; index++)
        {
            LossStep step = window.Steps[index];
            bool drawn = index == lostAt || step.LossProbability == 0;
            if (drawn && step.Edge >= 0 && (random.NextBits() >> 63) != 0)
            {
                shot.Flip(graph.Edges[step.Edge]);
            }
        }

        if (window.Told)
        {
            told.Add(window);
        }
    }

    private static int StepOfLoss(double[] cumulative, double chosen)
    {
        int step = 0;
        while (step < cumulative.Length - 1 && cumulative[step] < chosen)
        {
            step++;
        }

        return step;
    }

    /// <summary>Probability that the atom was lost at or before each step, given that it was lost in the window.</summary>
    private static double[] LostBy(LossWindow window)
    {
        double[] cumulative = new double[window.Steps.Length];
        double lost = window.LossProbability;
        double kept = 1;
        for (int index = 0; index < cumulative.Length; index++)
        {
            kept *= 1 - window.Steps[index].LossProbability;
            cumulative[index] = (1 - kept) / lost;
        }

        return cumulative;
    }
}
