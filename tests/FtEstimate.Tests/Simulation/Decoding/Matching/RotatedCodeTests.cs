using System.Numerics;
using FtEstimate.Simulation.Decoding.Matching;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Tests.Simulation.Decoding.Matching;

/// <summary>
/// The rotated code under bit flips with perfect checks. A stabiliser flips an even number of data qubits and the logical operator an odd one, so
/// that the least weights of the two classes never tie: counts do not depend on how a decoder breaks ties.
/// </summary>
public sealed class RotatedCodeTests
{
    // exact enumeration of all sets of flipped data qubits with a minimum-weight decoder
    private static readonly long[] FailingSetsAtDistance3 = [0, 0, 18, 56, 57, 69, 28, 18, 9, 1];
    private static readonly long[] FirstFailingSetsAtDistance5 = [0, 0, 0, 292, 4333, 25814];

    private static readonly Lazy<long[]> AtDistance5 = new(() => FailingSets(5));

    [Fact]
    public void The_failing_sets_of_distance_3_are_those_of_exact_enumeration() =>
        Assert.Equal(FailingSetsAtDistance3, FailingSets(3));

    [Fact]
    public void The_smallest_failing_sets_of_distance_5_are_those_of_exact_enumeration() =>
        Assert.Equal(FirstFailingSetsAtDistance5, AtDistance5.Value[..6]);

    // exact enumeration; 13 digits were printed
    [Theory]
    [InlineData(0.05, 2.453237357405e-2)]
    [InlineData(0.1, 1.244161807390e-1)]
    public void The_failure_of_distance_5_is_that_of_exact_enumeration(double probability, double expected)
    {
        double sum = 0;
        for (int weight = 0; weight <= 25; weight++)
        {
            sum += AtDistance5.Value[weight] * Math.Pow(probability, weight) * Math.Pow(1 - probability, 25 - weight);
        }

        Assert.Equal(expected, sum, 1e-12 * expected);
    }

    // a set fails or its complement by a logical operator does, and every set is counted once
    [Fact]
    public void Half_of_all_sets_fail_at_distance_5() => Assert.Equal(1L << 24, AtDistance5.Value.Sum());

    private static long[] FailingSets(int distance)
    {
        DetectorGraph graph = RotatedCode.WithPerfectChecks(distance, 0.05);
        Assert.Equal(((distance * distance) - 1) / 2, graph.VertexCount);
        bool[] answers = Answers(graph);
        long[] failing = new long[graph.Edges.Length + 1];
        int syndrome = 0;
        bool isFlipped = false;
        for (uint step = 1; step <= 1u << graph.Edges.Length; step++)
        {
            // in Gray code order one data qubit changes at a time
            uint set = (step - 1) ^ ((step - 1) >> 1);
            failing[BitOperations.PopCount(set)] += answers[syndrome] != isFlipped ? 1 : 0;
            GraphEdge edge = graph.Edges[Math.Min(BitOperations.TrailingZeroCount(step), graph.Edges.Length - 1)];
            syndrome ^= (1 << edge.A) ^ (edge.MeetsBoundary ? 0 : 1 << edge.B);
            isFlipped ^= edge.FlipsObservable;
        }

        return failing;
    }

    private static bool[] Answers(DetectorGraph graph)
    {
        MatchingDecoder decoder = new(graph);
        bool[] answers = new bool[1 << graph.VertexCount];
        for (int syndrome = 0; syndrome < answers.Length; syndrome++)
        {
            int[] defects = [.. Enumerable.Range(0, graph.VertexCount).Where(vertex => (syndrome >> vertex & 1) == 1)];
            answers[syndrome] = decoder.Decode(defects, []);
        }

        return answers;
    }
}
