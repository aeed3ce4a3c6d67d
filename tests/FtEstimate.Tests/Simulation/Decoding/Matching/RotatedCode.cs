using System.Collections.Immutable;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Tests.Simulation.Decoding.Matching;

/// <summary>
/// Detector graphs of the rotated surface code: one check of one type a vertex, one data qubit an edge, the observable a row of data qubits at a boundary.
/// </summary>
internal static class RotatedCode
{
    /// <summary>Bit flips only and perfect checks. Edge d·y + x is the data qubit in column x and row y.</summary>
    public static DetectorGraph WithPerfectChecks(int distance, double probability) => WithLayers(distance, 1, probability);

    /// <summary>Several rounds with errors in space, in time and across both, unequally likely; twelve edges at a vertex of the bulk.</summary>
    public static DetectorGraph WithLayers(int distance, int layers, double probability)
    {
        Dictionary<(int X, int Y), int> checks = [];
        for (int y = 1; y < distance; y++)
        {
            for (int x = y % 2; x <= distance; x += 2)
            {
                checks[(x, y)] = checks.Count;
            }
        }

        var edges = ImmutableArray.CreateBuilder<GraphEdge>();
        for (int layer = 0; layer < layers; layer++)
        {
            int first = layer * checks.Count;
            int next = layer + 1 < layers ? first + checks.Count : -1;
            AddDataErrors(edges, checks, distance, first, next, probability);
            foreach (((int x, int y), int check) in checks)
            {
                if (next >= 0)
                {
                    edges.Add(new GraphEdge(first + check, next + check, 1.2 * probability, false));
                    if (checks.TryGetValue((x + 2, y), out int beyond))
                    {
                        edges.Add(new GraphEdge(first + check, next + beyond, 0.13 * probability, false));
                    }
                }
            }
        }

        return new DetectorGraph(checks.Count * layers, edges.ToImmutable());
    }

    private static void AddDataErrors(
        ImmutableArray<GraphEdge>.Builder edges, Dictionary<(int X, int Y), int> checks, int distance, int first, int next, double probability)
    {
        for (int y = 0; y < distance; y++)
        {
            for (int x = 0; x < distance; x++)
            {
                (int X, int Y)[] corners = [(x, y), (x + 1, y), (x, y + 1), (x + 1, y + 1)];
                int[] flipped = [.. corners.Where(checks.ContainsKey).Select(corner => checks[corner])];
                int other = flipped.Length == 2 ? first + flipped[1] : DetectorGraph.Boundary;
                edges.Add(new GraphEdge(first + flipped[0], other, probability, y == 0));
                if (flipped.Length == 2 && next >= 0)
                {
                    edges.Add(new GraphEdge(first + flipped[0], next + flipped[1], 0.25 * probability, y == 0));
                }
            }
        }
    }
}
