using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.RareEvents;

/// <summary>The levels from the start to the target, and the one decoder graph that says at every level what a failure is.</summary>
internal sealed class NoiseLadder
{
    /// <summary>Failing sets hold a few mechanisms even where none are expected; without this the steps at low noise would be too long.</summary>
    private const double FewestFaults = 3;

    /// <summary>Builds the levels; each lies below the one before by 2^(1/√w) with w mechanisms expected, so that their failing sets overlap.</summary>
    /// <exception cref="ArgumentException">Mechanisms differ between levels in more than their probabilities, or atoms may be lost.</exception>
    public NoiseLadder(Func<double, MemoryModel> modelAt, LadderPlan plan)
    {
        MemoryModel target = modelAt(plan.Target);
        DecoderGraph = target.Graph;
        Order = [.. Enumerable.Range(0, DecoderGraph.Edges.Length)
            .Where(edge => DecoderGraph.Edges[edge].Probability > 0)
            .OrderBy(edge => DecoderGraph.Edges[edge].MeetsBoundary
                ? DecoderGraph.Edges[edge].A
                : Math.Min(DecoderGraph.Edges[edge].A, DecoderGraph.Edges[edge].B))];
        List<NoiseLevel> levels = [LevelOf(plan.Start, modelAt(plan.Start))];
        while (levels[^1].Noise > plan.Target)
        {
            double next = levels[^1].Noise * Math.Pow(2, -1 / Math.Sqrt(Math.Max(levels[^1].ExpectedFaults, FewestFaults)));
            levels.Add(next > plan.Target ? LevelOf(next, modelAt(next)) : LevelOf(plan.Target, target));
        }

        Levels = [.. levels];
        Rank = new int[DecoderGraph.Edges.Length];
        Array.Fill(Rank, -1);
        for (int rank = 0; rank < Order.Length; rank++)
        {
            Rank[Order[rank]] = rank;
        }
    }

    /// <summary>Levels, most noise first.</summary>
    public NoiseLevel[] Levels { get; }

    /// <summary>Graph with the probabilities of the target: the decoder uses its weights at all levels, else the failing sets would differ.</summary>
    public DetectorGraph DecoderGraph { get; }

    /// <summary>Edges that can happen, by their lowest detector: neighbours in space and time are close.</summary>
    public int[] Order { get; }

    /// <summary>Place of each edge in <see cref="Order"/>; −1 for those that cannot happen.</summary>
    public int[] Rank { get; }

    private NoiseLevel LevelOf(double noise, MemoryModel model)
    {
        if (!model.Windows.IsEmpty)
        {
            throw new ArgumentException("splitting needs independent mechanisms; this experiment loses atoms");
        }

        if (model.Graph.VertexCount != DecoderGraph.VertexCount || model.Graph.Edges.Length != DecoderGraph.Edges.Length)
        {
            throw new ArgumentException("the levels differ in more than their probabilities");
        }

        for (int edge = 0; edge < DecoderGraph.Edges.Length; edge++)
        {
            GraphEdge here = model.Graph.Edges[edge];
            GraphEdge there = DecoderGraph.Edges[edge];
            bool bothHappen = here.Probability is > 0 and < 1 && there.Probability is > 0 and < 1;
            bool neitherHappens = here.Probability == 0 && there.Probability == 0;
            if (here.A != there.A || here.B != there.B || here.FlipsObservable != there.FlipsObservable || !(bothHappen || neitherHappens))
            {
                throw new ArgumentException($"mechanism {edge} differs between levels in more than its probability");
            }
        }

        return new NoiseLevel(noise, model.Graph, Order);
    }
}
