using CsCheck;
using FtEstimate.Cycles;
using FtEstimate.Machines;
using FtEstimate.Noise;
using FtEstimate.SurfaceCode;
using FtEstimate.Tests.Cycles;

namespace FtEstimate.Tests.Noise;

public sealed class AtomNoiseTests
{
    private static readonly MachineLoad OnePatch = MachineLoad.Of(2 * 25, 5);

    [Fact]
    public void The_causes_of_the_ledger_sum_to_the_strength() =>
        Gen.Select(MachineGenerators.Arrays, MachineGenerators.Loads).Sample((array, load) =>
        {
            AtomNoise noise = BenchMachine.Noise(array, 0.00529);
            CycleTimes times = noise.Cycle.Times(load);
            NoiseStrength strength = noise.Strength(times);
            ErrorLedger ledger = noise.Ledger(times);

            Assert.Equal(strength.X, ledger.Channels.Sum(channel => channel.Strength.X), 1e-12 * strength.X);
            Assert.Equal(strength.Z, ledger.Channels.Sum(channel => channel.Strength.Z), 1e-12 * strength.Z);
            Assert.Equal(1, ledger.Channels.Sum(ledger.Share), 1e-12);
        });

    [Fact]
    public void The_ledger_lists_the_largest_share_first() =>
        Gen.Select(MachineGenerators.Arrays, MachineGenerators.Loads).Sample((array, load) =>
        {
            AtomNoise noise = BenchMachine.Noise(array, 0.00529);
            ErrorLedger ledger = noise.Ledger(noise.Cycle.Times(load));
            return ledger.Channels.Zip(ledger.Channels.Skip(1)).All(pair => pair.First.Strength.Mean >= pair.Second.Strength.Mean);
        });

    // exact for depolarising noise
    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    public void Infidelities_become_pauli_probabilities(int qubits)
    {
        // F_avg = (d F_e + 1)/(d + 1) with entanglement fidelity F_e = 1 - p, hence p = r (d + 1)/d
        double dimension = Math.Pow(2, qubits);
        double expected = 1e-3 * (dimension + 1) / dimension;

        double error = qubits == 2 ? new EntanglingGate(1e-3, 0, 0).PauliError : Gates.PauliErrorOfOneQubit(1e-3);

        Assert.Equal(expected, error, 1e-18);
    }

    // an image taken after the round takes atoms that are no longer in the code; gates, moves and vacuum still count
    [Theory]
    [InlineData(LossCheckMethod.None)]
    [InlineData(LossCheckMethod.Swap)]
    public void Loss_in_a_later_image_leaves_the_other_losses_of_checks_as_they_are(LossCheckMethod lossCheck)
    {
        ErrorChannel without = ChecksLostInALaterImage(0);
        ErrorChannel with = ChecksLostInALaterImage(0.01);

        Assert.True(without.PerLocation > 0.5e-4, "more than the half of cz_loss that falls on a check");
        Assert.Equal(without.PerLocation, with.PerLocation, 1e-15);

        ErrorChannel ChecksLostInALaterImage(double lossPerLook)
        {
            AtomArray array = BenchMachine.Array with
            {
                Coherence = BenchMachine.Array.Coherence with { LossCheck = new DataLossCheck(lossCheck, 2) },
                Readout = BenchMachine.Apart with
                {
                    Detector = new StatedReadout(1e-3, 1e-3, lossPerLook, 100e-6, 0, TellsLoss: true),
                    DistanceMetres = null,
                    ExchangeSeconds = 1e-3,
                    ReadInRound = false,
                },
            };
            AtomNoise noise = BenchMachine.Noise(array, 0.00529);
            return noise.Ledger(noise.Cycle.Times(OnePatch)).Channels.Single(channel => channel.Name == "Loss of check atoms");
        }
    }

    // relaxation is neglected, so waiting is pure Z and flips logical X alone
    [Fact]
    public void Waiting_during_readout_counts_in_one_basis_only_when_nothing_relaxes()
    {
        AtomArray array = BenchMachine.Array with { Coherence = BenchMachine.Array.Coherence with { T1Seconds = double.PositiveInfinity } };
        AtomNoise noise = BenchMachine.Noise(array, 0.00529);

        ErrorChannel waiting = noise.Ledger(noise.Cycle.Times(OnePatch)).Channels.Single(channel => channel.Name == "Waiting outside the layers");

        Assert.True(waiting.Strength.X > 0);
        Assert.Equal(0, waiting.Strength.Z);
    }

    // half of the loss of a pair falls on each atom; four gate slots a round; three rounds more than one between looks
    [Fact]
    public void Told_gate_loss_counts_per_atom_and_with_the_rounds_between_looks()
    {
        AtomArray array = BenchMachine.Array with
        {
            Gates = BenchMachine.Array.Gates with { Cz = new EntanglingGate(5e-4, 2e-3, 0.3e-6) },
            Reach = BenchMachine.Carried with { LossPerMove = 0 },
            Coherence = BenchMachine.Array.Coherence with { VacuumLifetimeSeconds = double.PositiveInfinity, LossCheck = new DataLossCheck(LossCheckMethod.None, 4) },
            Readout = BenchMachine.Apart with { Detector = BenchMachine.Stated with { LossPerLook = 0 } },
        };
        AtomNoise noise = BenchMachine.Noise(array, FittedNumbers.UniformThreshold);
        ErrorLedger ledger = noise.Ledger(noise.Cycle.Times(OnePatch));
        ChannelWeights weights = ChannelWeights.Fitted;

        Assert.Equal(1e-3 * (weights[NoiseWeight.ToldLossOfData] + (3 * weights[NoiseWeight.ToldLossOfDataPerRound])), Mean("Loss of data atoms"), 1e-12);
        Assert.Equal(1e-3 * weights[NoiseWeight.ToldLossOfChecks], Mean("Loss of check atoms"), 1e-12);

        double Mean(string name) => ledger.Channels.Single(channel => channel.Name == name).Strength.Mean;
    }

    // cz + 2 one-qubit + reset + a round of waiting + loss of a gate and of a round (vacuum, a quarter of a look and of a gate by the swap
    // every fourth round), added up by hand
    [Fact]
    public void An_injected_state_carries_one_of_everything()
    {
        AtomNoise noise = BenchMachine.Noise(BenchMachine.Array, 0.00529);
        CycleTimes times = noise.Cycle.Times(OnePatch);
        PauliChannel waiting = PauliChannel.Waiting(times.RoundSeconds, 20, 2);
        double vacuum = 1 - Math.Exp(-times.RoundSeconds / 600);
        double expected = (1.25 * 5e-4) + (2 * 1.5 * 5e-5) + 1e-3 + waiting.Total + (0.5 * 1e-4) + vacuum + (1e-3 / 4) + (0.5 * 1e-4 / 4);

        Assert.Equal(expected, noise.InjectedError(times), 1e-9);
    }

    // The mean of both bases. One basis alone may gain: with two banks a longer gate sequence fills time that data atoms would have waited anyway, and there errors
    // spread over both bases instead of all flipping logical X.
    [Fact]
    public void No_single_worse_input_lowers_the_mean_strength() =>
        Gen.Select(MachineGenerators.Arrays, Gen.Int[0, ArrayChanges.All.Count - 1], Gen.Double[1, 4], MachineGenerators.Loads).Sample(
            (array, change, factor, load) =>
            {
                AtomArray worse = ArrayChanges.All[change].Worse(array, factor);
                double before = StrengthOf(array, load).Mean;
                double after = StrengthOf(worse, load).Mean;
                Assert.True(after >= before * (1 - 1e-12), $"{ArrayChanges.All[change].Name}: {before} to {after}");
            },
            iter: 2000);

    // Bluvstein 2025 (arXiv:2506.20661) measured 2.14(13) from d = 3 to 5. The model says 2.4 to 2.7 for coherence of 1 to 2 s, and its simulation 2.8. It is not tuned: the
    // experiment ran four rounds only (fewer ways to fail at d = 3), its decoder was not the uniform-noise matching of the law, and
    // correlated errors, leakage, drifts and inhomogeneity are not in the ledger.
    [Theory]
    [InlineData(1)]
    [InlineData(1.5)]
    [InlineData(2)]
    public void The_suppression_of_todays_published_machine_is_near_the_measured_one(double t2Seconds)
    {
        AtomNoise noise = BenchMachine.Noise(BenchMachine.Bluvstein2025(t2Seconds), ScalingLaws.Simulated.Threshold);
        NoiseStrength strength = noise.Strength(noise.Cycle.Times(OnePatch));

        Assert.InRange(PatchError.SuppressionFactor(ScalingLaws.Simulated, strength, 3), 2.2, 3.1);
    }

    private static NoiseStrength StrengthOf(AtomArray array, MachineLoad load)
    {
        AtomNoise noise = BenchMachine.Noise(array, 0.00529);
        return noise.Strength(noise.Cycle.Times(load));
    }
}
