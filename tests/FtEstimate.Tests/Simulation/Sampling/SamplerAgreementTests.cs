using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Memory;
using FtEstimate.Simulation.Sampling;
using FtEstimate.Tests.Simulation.Circuits;
using FtEstimate.Tests.Simulation.Graphs;
using MathNet.Numerics.Distributions;

namespace FtEstimate.Tests.Simulation.Sampling;

/// <summary>
/// Running the circuit and drawing its mechanisms are two ways to the same shots. Seeds are fixed; with fresh ones each of these tests would fail by chance
/// once in ten thousand runs.
/// </summary>
public sealed class SamplerAgreementTests
{
    private const double FalseAlarm = 1e-4;

    private static readonly RoundErrors Everywhere = TestCircuits.EverywhereOnAtoms(0.004);
    private static readonly PauliChannel OnlyZ = new(0, 0, 0.02);

    private static readonly Dictionary<string, RoundErrors> Noises = new()
    {
        ["Pauli errors everywhere"] = Everywhere,
        ["only Z"] = new RoundErrors { WaitingInLayer = OnlyZ, OnData = OnlyZ, OnCheckBetweenLayers = OnlyZ, OnCheckOutsideLayers = OnlyZ },
        ["only Y"] = new RoundErrors { WaitingInLayer = new PauliChannel(0, 0.02, 0) },
        ["uneven"] = new RoundErrors { WaitingInLayer = new PauliChannel(0.02, 0.001, 0.01), OnData = new PauliChannel(0.03, 0.01, 0) },
        ["readout and reset"] = new RoundErrors { CheckFlip = 0.05, CheckReset = 0.03 },
        ["untold loss, looks every round"] = Everywhere with { DataLossPerSlot = 0.01 },
        ["untold loss, looks every third round"] = Everywhere with { DataLossPerSlot = 0.01, RoundsBetweenLooks = 3 },
        ["told loss, looks every round"] = Everywhere with { DataLossPerSlot = 0.01, DataLossTold = true },
        ["told loss, looks every third round"] = Everywhere with { DataLossPerSlot = 0.01, DataLossTold = true, RoundsBetweenLooks = 3 },
        ["told loss alone"] = new RoundErrors { DataLossPerSlot = 0.01, DataLossTold = true, RoundsBetweenLooks = 2 },
        ["told loss of checks"] = Everywhere with { CheckLossPerSlot = 0.02, CheckLossTold = true },
        ["untold loss of checks, told of data"] = Everywhere with { CheckLossPerSlot = 0.01, DataLossPerSlot = 0.01, DataLossTold = true },
    };

    public static TheoryData<string, PauliBasis> Cases { get; } = Pairs.Of<string, PauliBasis>([.. Noises.Keys], [PauliBasis.X, PauliBasis.Z]);

    [Theory]
    [MemberData(nameof(Cases))]
    public void Both_samplers_see_everything_alone_and_in_pairs_equally_often(string noise, PauliBasis basis)
    {
        Circuit circuit = AtomCircuit.Of(3, 4, basis, Noises[noise]);
        AssertAgree(circuit, HasTold(noise) ? 5_000 : 20_000);
    }

    [Theory]
    [InlineData(PauliBasis.X)]
    [InlineData(PauliBasis.Z)]
    public void They_agree_on_the_textbook_circuit(PauliBasis basis) =>
        AssertAgree(TextbookCircuit.Of(5, 3, basis, UniformNoise.SlowReadout(0.004)), 20_000);

    [Theory]
    [Trait("Category", "Long")]
    [MemberData(nameof(Cases))]
    public void They_agree_in_many_shots_at_distance_5(string noise, PauliBasis basis) =>
        AssertAgree(AtomCircuit.Of(5, 4, basis, Noises[noise]), HasTold(noise) ? 5_000 : 50_000);

    // chi-square over all 2⁹ outcomes of one round, cells expected less than ten times thrown together
    [Theory]
    [InlineData(PauliBasis.X)]
    [InlineData(PauliBasis.Z)]
    public void Both_samplers_follow_the_exact_distribution_of_all_outcomes(PauliBasis basis)
    {
        Circuit circuit = TextbookCircuit.Of(3, 1, basis, UniformNoise.EveryPlace(0.02));
        MemoryModel model = FaultPropagation.Of(circuit);
        double[] exact = ExactMemory.Distribution(model.Graph);

        Assert.InRange(ChanceOf(new MechanismSampler(model), model.Graph.VertexCount, exact), FalseAlarm, 1);
        Assert.InRange(ChanceOf(new FrameSampler(circuit, model), model.Graph.VertexCount, exact), FalseAlarm, 1);
    }

    // the bound holds for the largest of all deviations: 28 detectors or so, each within 4.9 standard errors
    [Theory]
    [InlineData("Pauli errors everywhere")]
    [InlineData("uneven")]
    [InlineData("untold loss, looks every third round")]
    public void Detectors_fire_as_often_as_their_mechanisms_say(string noise)
    {
        const int Shots = 200_000;
        const double Widest = 4.9;
        Circuit circuit = AtomCircuit.Of(3, 6, PauliBasis.Z, Noises[noise]);
        MemoryModel model = FaultPropagation.Of(circuit);
        bool hasLoss = !model.Windows.IsEmpty;
        long[] fired = new long[model.Graph.VertexCount];
        FrameSampler sampler = new(circuit, model);
        sampler.Begin(41, 0);
        for (int shot = 0; shot < Shots; shot++)
        {
            foreach (int defect in sampler.NextShot().Defects)
            {
                fired[defect]++;
            }
        }

        for (int detector = 0; detector < fired.Length; detector++)
        {
            double exact = ExactMemory.FiringRate(model.Graph, detector);

            // a loss strikes several mechanisms of one detector together, which the formula takes as independent
            double slack = hasLoss ? 0.05 * exact : 0;
            Assert.InRange((double)fired[detector] / Shots, exact - slack - (Widest * Sigma(exact)), exact + slack + (Widest * Sigma(exact)));
        }

        static double Sigma(double rate) => Math.Sqrt(rate * (1 - rate) / Shots);
    }

    // two proportions, four standard errors
    [Theory]
    [InlineData("Pauli errors everywhere", DecoderKind.Matching)]
    [InlineData("told loss, looks every third round", DecoderKind.Matching)]
    [InlineData("untold loss of checks, told of data", DecoderKind.UnionFind)]
    public void Decoding_fails_equally_often_with_either_sampler(string noise, DecoderKind kind)
    {
        const int Shots = 60_000;
        Circuit circuit = AtomCircuit.Of(3, 3, PauliBasis.Z, Noises[noise]);
        MemoryModel model = FaultPropagation.Of(circuit);
        int byFrames = Failures(new FrameSampler(circuit, model), Decoders.Make(kind, model.Graph), Shots);
        int byMechanisms = Failures(new MechanismSampler(model), Decoders.Make(kind, model.Graph), Shots);

        Assert.True(byFrames > 500);
        Assert.InRange(byMechanisms - byFrames, -4 * Math.Sqrt(byFrames + byMechanisms), 4 * Math.Sqrt(byFrames + byMechanisms));
    }

    /// <summary>A told loss names many edges, and the number of pairs grows with their square.</summary>
    private static bool HasTold(string noise) => Noises[noise].DataLossTold || Noises[noise].CheckLossTold;

    private static int Failures(IShotSampler sampler, IDecoder decoder, int shots)
    {
        sampler.Begin(43, 0);
        int failures = 0;
        for (int shot = 0; shot < shots; shot++)
        {
            SampledShot sampled = sampler.NextShot();
            failures += decoder.Decode(sampled.Defects, sampled.Told) != sampled.ObservableFlipped ? 1 : 0;
        }

        return failures;
    }

    private static void AssertAgree(Circuit circuit, int shots)
    {
        MemoryModel model = FaultPropagation.Of(circuit);
        Dictionary<(string Kind, int Number, long Weight), int> numbers = [];
        ShotStatistics frames = ShotStatistics.Of(new FrameSampler(circuit, model), 31, shots, numbers);
        ShotStatistics mechanisms = ShotStatistics.Of(new MechanismSampler(model), 37, shots, numbers);

        Assert.True(numbers.Count > 0, "nothing was seen");
        double chance = frames.ChanceOfSame(mechanisms, out string where);
        Assert.True(chance > FalseAlarm, $"{where}, chance {chance:E1}");
    }

    private static double ChanceOf(IShotSampler sampler, int detectors, double[] exact)
    {
        const int Shots = 400_000;
        const double FewestExpected = 10;
        int[] counts = new int[exact.Length];
        sampler.Begin(47, 0);
        for (int shot = 0; shot < Shots; shot++)
        {
            SampledShot sampled = sampler.NextShot();
            int state = sampled.ObservableFlipped ? 1 << detectors : 0;
            foreach (int defect in sampled.Defects)
            {
                state |= 1 << defect;
            }

            counts[state]++;
        }

        double square = 0;
        int cells = 0;
        double expectedRest = 0;
        double rest = 0;
        for (int state = 0; state < exact.Length; state++)
        {
            double expected = exact[state] * Shots;
            if (expected < FewestExpected)
            {
                expectedRest += expected;
                rest += counts[state];
                continue;
            }

            cells++;
            square += (counts[state] - expected) * (counts[state] - expected) / expected;
        }

        square += (rest - expectedRest) * (rest - expectedRest) / expectedRest;
        return 1 - ChiSquared.CDF(cells, square);
    }
}
