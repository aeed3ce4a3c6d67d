using System.Collections.Immutable;
using FtEstimate.Noise;

namespace FtEstimate.Simulation.Graphs;

/// <summary>Collects mechanisms; merges those that cannot be told apart.</summary>
internal sealed class MechanismTable
{
    private readonly Dictionary<Symptom, int> indices = [];
    private readonly List<Symptom> symptoms = [];
    private readonly List<double> probabilities = [];

    /// <summary>Probabilities of the mechanisms so far, in order of their numbers.</summary>
    public IReadOnlyList<double> Probabilities => probabilities;

    /// <summary>Number of a mechanism; made with probability 0 if it is new. −1 for one that changes nothing.</summary>
    public int IndexOf(Symptom symptom)
    {
        if (symptom.IsNone)
        {
            return -1;
        }

        if (symptom.First == Symptom.Nobody)
        {
            throw new InvalidOperationException("an error flips the observable and no detector");
        }

        if (!indices.TryGetValue(symptom, out int index))
        {
            index = symptoms.Count;
            indices.Add(symptom, index);
            symptoms.Add(symptom);
            probabilities.Add(0);
        }

        return index;
    }

    /// <summary>Adds an independent cause of a symptom; one that never happens makes no mechanism.</summary>
    public void Add(Symptom symptom, double probability)
    {
        if (probability == 0)
        {
            return;
        }

        int index = IndexOf(symptom);
        if (index >= 0)
        {
            probabilities[index] = EitherNotBoth(probabilities[index], probability);
        }
    }

    /// <summary>
    /// Adds two errors and their product, of which at most one happens. They are replaced by three independent flips with the same distribution, exact
    /// wherever the flips' probabilities are not negative.
    /// </summary>
    public void AddExclusive(Symptom a, Symptom b, double onlyA, double onlyB, double both)
    {
        if (a.IsNone || b.IsNone || a == b)
        {
            // only one thing can be seen: no choice is left
            (Symptom seen, double probability) = a.IsNone ? (b, onlyB + both) : b.IsNone ? (a, onlyA + both) : (a, onlyA + onlyB);
            Add(seen, probability);
            return;
        }

        double signA = 1 - (2 * (onlyA + both));
        double signB = 1 - (2 * (onlyB + both));
        double signAB = 1 - (2 * (onlyA + onlyB));
        Add(a, FlipFrom(signA * signAB / signB));
        Add(b, FlipFrom(signB * signAB / signA));
        Add(a ^ b, FlipFrom(signA * signB / signAB));
    }

    /// <summary>Adds a channel on one atom whose X and Z errors have these symptoms.</summary>
    public void AddChannel(Symptom ofX, Symptom ofZ, PauliChannel channel) => AddExclusive(ofX, ofZ, channel.X, channel.Z, channel.Y);

    /// <summary>The edges with the given probabilities, or the collected ones, in order of their numbers.</summary>
    public ImmutableArray<GraphEdge> Edges(IReadOnlyList<double> edgeProbabilities)
    {
        var edges = ImmutableArray.CreateBuilder<GraphEdge>(symptoms.Count);
        for (int index = 0; index < symptoms.Count; index++)
        {
            Symptom symptom = symptoms[index];
            int other = symptom.Second == Symptom.Nobody ? DetectorGraph.Boundary : symptom.Second;
            edges.Add(new GraphEdge(symptom.First, other, edgeProbabilities[index], symptom.Observable));
        }

        return edges.MoveToImmutable();
    }

    /// <summary>Probability that exactly one of two independent things happens.</summary>
    public static double EitherNotBoth(double p, double q) => (p * (1 - q)) + (q * (1 - p));

    /// <summary>p of the square (1 − 2p)², without loss of digits for small p.</summary>
    private static double FlipFrom(double square)
    {
        double distance = 1 - square;
        return distance <= 0 ? 0 : distance / (2 * (1 + Math.Sqrt(Math.Max(square, 0))));
    }
}
