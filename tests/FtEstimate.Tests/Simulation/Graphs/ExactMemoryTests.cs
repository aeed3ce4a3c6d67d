using System.Globalization;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Tests.Simulation.Graphs;

/// <summary>
/// The textbook memory of distance 3 in basis Z against the exact enumeration of another implementation (Published/circuit-level-exact.csv) and against the
/// exact value of its own graph.
/// </summary>
public sealed class ExactMemoryTests
{
    private static readonly (double Error, int Rounds, double? RawFlip, double Failure)[] Table = Read();

    public static TheoryData<double, int, double> Failures { get; } = Theory(row => row.Failure);

    public static TheoryData<double, int, double> RawFlips { get; } = Theory(row => row.RawFlip);

    // ten digits are given
    [Theory]
    [MemberData(nameof(RawFlips))]
    public void The_uncorrected_observable_flips_as_often_as_enumerated(double error, int rounds, double rawFlip) =>
        Assert.Equal(rawFlip, ExactMemory.RawFlip(GraphOf(error, rounds)), 1e-8 * rawFlip);

    // the reference has no noise on one data atom while checks are read: of the nine, only this one meets all rows. Ten digits are given
    [Theory]
    [MemberData(nameof(Failures))]
    public void Least_weight_decoding_fails_as_often_as_enumerated_where_one_atom_does_not_wait(double error, int rounds, double failure)
    {
        const int DoesNotWait = 3;
        Circuit circuit = TextbookCircuit.Of(3, rounds, PauliBasis.Z, UniformNoise.EveryPlace(error), DoesNotWait);

        (double low, double high) = ExactMemory.LeastWeightFailure(FaultPropagation.Of(circuit).Graph);

        Assert.InRange(failure, low * (1 - 1e-8), high * (1 + 1e-8));
    }

    // three standard errors: one run in 370 would fail by chance, and the seed is fixed
    [Theory]
    [InlineData(1, 1_000_000)]
    [InlineData(2, 1_000_000)]
    [InlineData(3, 500_000)]
    [InlineData(4, 500_000)]
    public void The_matching_decoder_fails_as_often_as_least_weight_decoding_of_the_same_graph(int rounds, int shots) =>
        AssertSampledWithin(1e-3, rounds, shots);

    [Theory]
    [Trait("Category", "Long")]
    [InlineData(1e-3, 1)]
    [InlineData(1e-3, 2)]
    [InlineData(1e-3, 3)]
    [InlineData(1e-3, 4)]
    [InlineData(1e-2, 4)]
    public void The_matching_decoder_fails_as_often_in_many_shots(double error, int rounds) => AssertSampledWithin(error, rounds, 10_000_000);

    private static void AssertSampledWithin(double error, int rounds, int shots)
    {
        MemoryExperiment experiment = MemoryExperiment.Of(
            TextbookCircuit.Of(3, rounds, PauliBasis.Z, UniformNoise.EveryPlace(error)), DecoderKind.Matching);
        (double low, double high) = ExactMemory.LeastWeightFailure(experiment.Model.Graph);
        Assert.True(high < 1.2 * low, "too many ties for a test");

        ShotCount count = MemoryRun.Run(experiment, new MemoryPlan(shots, 17, Shard.Whole), default, 2, null, CancellationToken.None).Count;

        double margin = 3 * Math.Sqrt(high * shots);
        Assert.InRange(count.Failures, (low * shots) - margin, (high * shots) + margin);
    }

    private static DetectorGraph GraphOf(double error, int rounds) =>
        FaultPropagation.Of(TextbookCircuit.Of(3, rounds, PauliBasis.Z, UniformNoise.EveryPlace(error))).Graph;

    private static TheoryData<double, int, double> Theory(Func<(double Error, int Rounds, double? RawFlip, double Failure), double?> column)
    {
        TheoryData<double, int, double> rows = [];
        foreach ((double Error, int Rounds, double? RawFlip, double Failure) row in Table)
        {
            if (column(row) is { } value)
            {
                rows.Add(row.Error, row.Rounds, value);
            }
        }

        return rows;
    }

    private static (double Error, int Rounds, double? RawFlip, double Failure)[] Read()
    {
        using Stream stream = typeof(ExactMemoryTests).Assembly.GetManifestResourceStream("Published.circuit-level-exact.csv")!;
        using StreamReader reader = new(stream);
        return
        [
            .. reader.ReadToEnd().Split('\n', StringSplitOptions.RemoveEmptyEntries).Skip(1).Select(line => line.Split(','))
                .Select(cells => (Number(cells[0]), (int)Number(cells[1]), cells[2].Length == 0 ? (double?)null : Number(cells[2]), Number(cells[3]))),
        ];
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
