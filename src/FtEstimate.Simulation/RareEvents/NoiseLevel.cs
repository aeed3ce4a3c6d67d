using FtEstimate.Quantities;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.RareEvents;

/// <summary>The probabilities of all mechanisms at one noise level, in the forms that chains need.</summary>
internal sealed class NoiseLevel
{
    private readonly double[] logOdds;

    /// <summary>Prepares a level.</summary>
    /// <param name="noise">The number that names the level.</param>
    /// <param name="graph">Mechanisms with their probabilities at this level.</param>
    /// <param name="order">The mechanisms that can happen, neighbours close together.</param>
    public NoiseLevel(double noise, DetectorGraph graph, int[] order)
    {
        Noise = noise;
        Odds = new double[graph.Edges.Length];
        logOdds = new double[graph.Edges.Length];
        HazardBefore = new double[order.Length + 1];
        for (int rank = 0; rank < order.Length; rank++)
        {
            double probability = graph.Edges[order[rank]].Probability;
            Odds[order[rank]] = probability / (1 - probability);
            logOdds[order[rank]] = Math.Log(Odds[order[rank]]);
            HazardBefore[rank + 1] = HazardBefore[rank] - ElementaryFunctions.LogOnePlus(-probability);
            ExpectedFaults += probability;
        }
    }

    /// <summary>The number that names the level.</summary>
    public double Noise { get; }

    /// <summary>Mean number of mechanisms that happen in a shot.</summary>
    public double ExpectedFaults { get; }

    /// <summary>p/(1−p) of each mechanism, by edge.</summary>
    public double[] Odds { get; }

    /// <summary>Sum of −ln(1−p) over the mechanisms before each rank; the last entry is that of all.</summary>
    public double[] HazardBefore { get; }

    /// <summary>−ln(1−p) of the mechanism of a rank; 0 for those that cannot happen, which have none.</summary>
    public double HazardOf(int rank) => rank < 0 ? 0 : HazardBefore[rank + 1] - HazardBefore[rank];

    /// <summary>ln of the probability that these mechanisms happen and no others.</summary>
    public double LogProbabilityOf(ReadOnlySpan<int> faults)
    {
        double sum = -HazardBefore[^1];
        foreach (int edge in faults)
        {
            sum += logOdds[edge];
        }

        return sum;
    }

    /// <summary>Rank of the mechanism under a point of the summed hazard.</summary>
    /// <param name="point">0 to below the sum over all.</param>
    public int RankAt(double point)
    {
        int found = Array.BinarySearch(HazardBefore, point);
        return Math.Min(found >= 0 ? found : ~found - 1, HazardBefore.Length - 2);
    }
}
