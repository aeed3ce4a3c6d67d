using System.Collections.Immutable;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Tests.Simulation.Decoding;

/// <summary>Detector graphs of the rotated surface code, made by hand, for tests of decoders: bit flips, checks of one type, the observable along the top row.</summary>
internal static class SurfaceCodeGraphs
{
    /// <summary>Perfect checks, read once: one edge for each data qubit, row by row.</summary>
    public static DetectorGraph OfPerfectChecks(int distance, double flip)
    {
        var layer = new Layer(distance);
        return new DetectorGraph(layer.CheckCount, [.. layer.Qubits.Select(ends => Edge(ends.A, ends.B, flip, ends.IsTop))]);
    }

    /// <summary>Rounds of noisy checks and one perfect one: qubits flip before each, checks are misread in all but the last.</summary>
    public static DetectorGraph OfNoisyChecks(int distance, int rounds, double flip, double misread) =>
        OfCircuit(distance, rounds, flip, misread, 0, 0);

    /// <summary>
    /// The same with mechanisms that flip a check and its neighbour one round later, as gates in the middle of a round do: for each qubit along its edge,
    /// and to the next check of the row, which does not shorten the way from top to bottom. Up to twelve edges at a vertex.
    /// </summary>
    public static DetectorGraph OfCircuit(int distance, int rounds, double flip, double misread, double diagonal, double hook)
    {
        var layer = new Layer(distance);
        int checks = layer.CheckCount;
        ImmutableArray<GraphEdge>.Builder edges = ImmutableArray.CreateBuilder<GraphEdge>();
        for (int round = 0; round <= rounds; round++)
        {
            int now = round * checks;
            foreach ((int a, int b, bool isTop) in layer.Qubits)
            {
                edges.Add(Edge(now + a, b < 0 ? b : now + b, flip, isTop));
            }

            if (round == rounds)
            {
                break;
            }

            edges.AddRange(Enumerable.Range(0, checks).Select(check => Edge(now + check, now + checks + check, misread, false)));
            if (diagonal > 0)
            {
                edges.AddRange(layer.Qubits.Where(ends => ends.B >= 0).Select(ends => Edge(now + ends.A, now + checks + ends.B, diagonal, ends.IsTop)));
            }

            if (hook > 0)
            {
                edges.AddRange(layer.Straight.Select(ends => Edge(now + ends.A, now + checks + ends.B, hook, false)));
            }
        }

        return new DetectorGraph((rounds + 1) * checks, edges.ToImmutable());
    }

    private static GraphEdge Edge(int a, int b, double probability, bool flips) => new(a, b < 0 ? DetectorGraph.Boundary : b, probability, flips);

    // checks sit on every second corner between qubits, and at the left and right sides; top and bottom are boundaries
    private sealed class Layer
    {
        private readonly Dictionary<(int Row, int Column), int> checks = [];

        public Layer(int distance)
        {
            for (int row = 1; row < distance; row++)
            {
                for (int column = 0; column <= distance; column++)
                {
                    if ((row + column) % 2 == 1)
                    {
                        checks.Add((row, column), checks.Count);
                    }
                }
            }

            for (int row = 0; row < distance; row++)
            {
                for (int column = 0; column < distance; column++)
                {
                    int[] ends = [.. At(row, column), .. At(row, column + 1), .. At(row + 1, column), .. At(row + 1, column + 1)];
                    Qubits.Add((ends[0], ends.Length > 1 ? ends[1] : -1, row == 0));
                }
            }

            foreach (((int row, int column), int check) in checks)
            {
                Straight.AddRange(At(row, column + 2).Select(right => (check, right)));
            }
        }

        public int CheckCount => checks.Count;

        public List<(int A, int B, bool IsTop)> Qubits { get; } = [];

        public List<(int A, int B)> Straight { get; } = [];

        private IEnumerable<int> At(int row, int column) => checks.TryGetValue((row, column), out int check) ? [check] : [];
    }
}
