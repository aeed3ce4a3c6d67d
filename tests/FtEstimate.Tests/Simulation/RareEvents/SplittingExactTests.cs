using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Memory;
using FtEstimate.Simulation.RareEvents;
using FtEstimate.Tests.Simulation.Decoding.Matching;

namespace FtEstimate.Tests.Simulation.RareEvents;

/// <summary>Splitting against failure probabilities that are known exactly.</summary>
public sealed class SplittingExactTests
{
    // bit flips on the rotated code of distance 5, perfect checks, p = 0.1/256: exact enumeration of all sets of flipped qubits; 13 digits were printed
    private const double PerfectChecksAtTheTarget = 1.735589217363e-8;
    private const double Start = 0.1;
    private const double Target = 0.1 / 256;
    private const int Seeds = 12;

    private static readonly Lazy<RareEventEstimate[]> BitFlips = new(() =>
    [
        .. Enumerable.Range(1, Seeds).Select(seed => RareEventCases.Run(
            WithPerfectChecks, new LadderPlan(Start, Target, (ulong)seed, Ladders: 12, StartFailures: 128, Walkers: 32, SamplesPerLevel: 4, MovesPerSample: 8))),
    ]);

    [Fact]
    public void All_runs_together_give_the_exact_probability_over_seven_decades()
    {
        double mean = BitFlips.Value.Average(run => run.Probability);
        double error = Math.Sqrt(BitFlips.Value.Sum(run => Math.Pow(run.RelativeStandardError, 2))) / Seeds;

        // else the test could not see an error of a tenth
        Assert.InRange(error, 0, 0.025);
        Assert.Equal(1, mean / PerfectChecksAtTheTarget, 3.5 * error);
    }

    // chi-square with 12 degrees of freedom lies between 2.2 and 32.9 but for one case in a thousand at either end; a little more for Student's tails
    [Fact]
    public void Runs_scatter_about_the_exact_probability_as_their_error_bars_say()
    {
        double chiSquare = BitFlips.Value.Sum(run =>
            Math.Pow((run.Probability - PerfectChecksAtTheTarget) / (run.Probability * run.RelativeStandardError), 2));

        Assert.InRange(chiSquare, 2.2, 38);
    }

    // 12 runs, 95 % each: fewer than 9 once in 500 cases
    [Fact]
    public void The_interval_nearly_always_holds_the_exact_probability() =>
        Assert.InRange(
            BitFlips.Value.Count(run => run.PerShot() is { } shot && shot.Low < PerfectChecksAtTheTarget && PerfectChecksAtTheTarget < shot.High), 9, Seeds);

    [Fact]
    public void Ratios_that_look_down_only_agree_with_the_exact_probability()
    {
        double mean = BitFlips.Value.Average(run => run.ForwardProbability);
        double error = Math.Sqrt(BitFlips.Value.Sum(run => Math.Pow(run.ForwardRelativeStandardError, 2))) / Seeds;

        Assert.InRange(error, 0, 0.03);
        Assert.Equal(1, mean / PerfectChecksAtTheTarget, 3.5 * error);
    }

    // the circuit has hundreds of unequal mechanisms; twelve detectors leave few enough syndromes to add up
    [Theory]
    [InlineData(PauliBasis.X)]
    [InlineData(PauliBasis.Z)]
    public void Every_level_of_a_noisy_circuit_has_its_exact_probability(PauliBasis basis) =>
        EveryLevelIsExact(p => RareEventCases.Textbook(3, 2, basis, p), new LadderPlan(0.02, 2e-4, 3, Ladders: 32, StartFailures: 512, MovesPerSample: 8));

    // mechanisms that grow with different powers of the noise: the weights of the target are then wrong at the start, and the same failing sets count
    [Fact]
    public void Levels_may_change_mechanisms_unequally() =>
        EveryLevelIsExact(Uneven, new LadderPlan(0.1, 0.003, 4, Ladders: 32, StartFailures: 512, MovesPerSample: 8));

    private static void EveryLevelIsExact(Func<double, MemoryModel> modelAt, LadderPlan plan)
    {
        DetectorGraph weights = modelAt(plan.Target).Graph;
        RareEventEstimate estimate = RareEventCases.Run(modelAt, plan);

        Assert.True(estimate.Levels.Length > 5);
        Assert.All(estimate.Levels, level =>
        {
            double exact = ExactFailure.Of(modelAt(level.Noise).Graph, weights);

            // small enough to see a change without the probability of its way back, which is wrong by a tenth;
            // Student with 31 degrees of freedom is beyond four once in 2700 cases, and neighbouring levels share their errors
            Assert.InRange(level.RelativeStandardError, 0, 0.035);
            Assert.Equal(1, level.Probability / exact, 4 * level.RelativeStandardError);
        });
    }

    private static MemoryModel WithPerfectChecks(double p) => RareEventCases.ModelOf(RotatedCode.WithPerfectChecks(5, p));

    private static MemoryModel Uneven(double p)
    {
        DetectorGraph graph = RotatedCode.WithLayers(3, 3, p);
        return RareEventCases.ModelOf(new DetectorGraph(
            graph.VertexCount,
            [.. graph.Edges.Select((edge, index) => index % 3 == 0 ? edge with { Probability = 8 * edge.Probability * edge.Probability } : edge)]));
    }
}
