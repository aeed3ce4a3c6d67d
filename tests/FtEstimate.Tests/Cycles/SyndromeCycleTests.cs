using CsCheck;
using FtEstimate.Cycles;
using FtEstimate.Machines;

namespace FtEstimate.Tests.Cycles;

public sealed class SyndromeCycleTests
{
    private static readonly MachineLoad OnePatch = MachineLoad.Of(2 * 25, 5);

    // exact for the rotated code: d(d-1) pairs in each of four layers, 4 d (d-1) gates per round
    [Theory]
    [InlineData(3)]
    [InlineData(5)]
    [InlineData(21)]
    public void A_layer_of_one_patch_holds_d_times_d_minus_1_pairs(int distance) =>
        Assert.Equal(distance * (distance - 1), MachineLoad.Of(2 * distance * distance, distance).PairsPerLayer, 1e-9);

    // Bluvstein 2025 (arXiv:2506.20661): "each QEC round was 4.45 ms ... 0.47 ms time between gates, and a total of 2.57 ms from moving the ancilla atoms"
    [Fact]
    public void The_published_round_lasts_4_45_ms()
    {
        SyndromeCycle cycle = BenchMachine.Cycle(BenchMachine.Bluvstein2025(t2Seconds: 1.5));

        Assert.Equal(4.45e-3, cycle.Times(OnePatch).RoundSeconds, 1e-9);
        Assert.Equal(0.47e-3, cycle.Times(OnePatch).LayerSeconds, 1e-9);
    }

    [Fact]
    public void Phases_follow_one_another_and_the_longer_of_both_tracks_is_the_round() =>
        Gen.Select(MachineGenerators.Arrays, MachineGenerators.Loads).Sample((array, load) =>
        {
            SyndromeCycle cycle = BenchMachine.Cycle(array);
            CycleTimes times = cycle.Times(load);
            double path = 0;
            double beside = 0;
            foreach (CyclePhase phase in cycle.Phases(load))
            {
                double clock = phase.Data == DataState.Beside ? beside : path;
                Assert.Equal(clock, phase.StartSeconds, 1e-12 * (clock + 1e-9));
                path += phase.Data == DataState.Beside ? 0 : phase.Seconds;
                beside += phase.Data == DataState.Beside ? phase.Seconds : 0;
            }

            Assert.Equal(Math.Max(path, beside), times.RoundSeconds, 1e-12 * times.RoundSeconds);
        });

    // every moment of a data atom is spent in gates, waiting or shelved
    [Fact]
    public void The_times_of_a_data_atom_sum_to_the_round() =>
        Gen.Select(MachineGenerators.Arrays, MachineGenerators.Loads).Sample((array, load) =>
        {
            CycleTimes times = BenchMachine.Cycle(array).Times(load);
            double sum = (4 * times.LayerSeconds) + times.WaitingSeconds + times.ShelvedSeconds;
            Assert.Equal(times.RoundSeconds, sum, 1e-12 * times.RoundSeconds);
        });

    [Fact]
    public void A_larger_machine_never_has_a_shorter_round() =>
        Gen.Select(MachineGenerators.Arrays, MachineGenerators.Loads, Gen.Double[1, 30]).Sample((array, load, growth) =>
        {
            SyndromeCycle cycle = BenchMachine.Cycle(array);
            MachineLoad larger = new(load.DataAtoms * growth, load.CheckSites * growth, load.PairsPerLayer * growth);

            // where a long readout sets the pace both rounds are the same up to rounding
            return cycle.Times(larger).RoundSeconds >= cycle.Times(load).RoundSeconds * (1 - 1e-12);
        });

    [Theory]
    [InlineData("pairs")]
    [InlineData("moves")]
    [InlineData("one-qubit gates")]
    [InlineData("selecting")]
    public void A_machine_wide_limit_lengthens_the_round_as_the_machine_grows(string limit)
    {
        SyndromeCycle cycle = BenchMachine.Cycle(Limited(limit, 100));
        double small = cycle.Times(MachineLoad.Of(2 * 9, 3)).RoundSeconds;
        double large = cycle.Times(MachineLoad.Of(2000, 3)).RoundSeconds;
        double larger = cycle.Times(MachineLoad.Of(20_000, 3)).RoundSeconds;

        Assert.True(small < large && large < larger, $"{small}, {large}, {larger}");
    }

    [Fact]
    public void Unlimited_parallel_work_makes_every_machine_as_fast_as_one_patch() =>
        Gen.Select(MachineGenerators.Arrays, MachineGenerators.Loads).Sample((array, load) =>
        {
            AtomArray free = array with
            {
                Gates = array.Gates with { CzPairsAtOnce = double.PositiveInfinity, OneQubitAtOnce = double.PositiveInfinity },
                Reach = array.Reach is MovedAtoms moved ? moved with { MovedAtOnce = double.PositiveInfinity } : array.Reach,
                Readout = array.Readout is Shelved shelved ? shelved with { SelectAtOnce = double.PositiveInfinity } : array.Readout,
            };
            SyndromeCycle cycle = BenchMachine.Cycle(free);
            return cycle.Times(load) == cycle.Times(MachineLoad.Of(2 * 9, 3));
        });

    // groups one after another: three groups of pairs point the beams three times, in each of four layers
    [Fact]
    public void Steered_beams_serve_pairs_group_by_group()
    {
        AtomArray array = BenchMachine.Array with
        {
            Reach = new SteeredBeams(4e-6, null),
            Gates = BenchMachine.Array.Gates with { CzPairsAtOnce = 40 },
            Coherence = BenchMachine.Array.Coherence with { LossCheck = new DataLossCheck(LossCheckMethod.None, 1) },
        };
        SyndromeCycle cycle = BenchMachine.Cycle(array);

        // d = 11: 110 pairs
        Assert.Equal(3 * (4e-6 + 0.3e-6), cycle.Times(MachineLoad.Of(2 * 121, 11)).LayerSeconds, 1e-12);
    }

    // five legs of 0.71, 1, 1.41, 1, 0.71 pitch by the cubic profile, one pick-up, one drop, a pulse and a gap in each layer
    [Fact]
    public void A_check_walks_half_a_diagonal_a_side_a_diagonal_a_side_and_back()
    {
        SyndromeCycle cycle = BenchMachine.Cycle(BenchMachine.Array);
        double legs = new[] { Math.Sqrt(0.5), 1, Math.Sqrt(2), 1, Math.Sqrt(0.5) }.Sum(leg => Math.Sqrt(6 * leg * 5e-6 / 8000));

        Assert.Equal(legs + (2 * 50e-6) + (4 * 1.3e-6), 4 * cycle.Times(OnePatch).LayerSeconds, 1e-12);
    }

    [Fact]
    public void A_second_bank_of_checks_never_lengthens_the_round() =>
        Gen.Select(MachineGenerators.Arrays, MachineGenerators.Loads).Sample((array, load) =>
        {
            CycleTimes one = BenchMachine.Cycle(array with { Readout = WithBanks(array.Readout, 1) }).Times(load);
            CycleTimes two = BenchMachine.Cycle(array with { Readout = WithBanks(array.Readout, 2) }).Times(load);
            return two.RoundSeconds <= one.RoundSeconds * (1 + 1e-12);
        });

    // with two banks the round is the longer of gates and readout
    [Fact]
    public void With_two_banks_a_short_readout_hides_behind_the_gates_and_a_long_one_sets_the_pace()
    {
        AtomArray array = WithCheck(LossCheckMethod.None, 1) with { Readout = BenchMachine.SecondElement with { BankCount = 2 } };
        double gates = BenchMachine.Cycle(array).Times(OnePatch).RoundSeconds;
        AtomArray slow = array with { Readout = BenchMachine.SecondElement with { BankCount = 2, RecoolSeconds = 1 } };
        AtomArray swift = array with { Readout = BenchMachine.SecondElement with { BankCount = 2, RecoolSeconds = 0, Detector = BenchMachine.Stated with { StatedExposureSeconds = 1e-6 } } };
        double gatesAlone = BenchMachine.Cycle(swift).Times(OnePatch).RoundSeconds;

        // recooling for 1 s and exposing for 200 us
        Assert.Equal(1.0002, BenchMachine.Cycle(slow).Times(OnePatch).RoundSeconds, 1e-9);
        Assert.Equal(Math.Max(gatesAlone, 500e-6), gates, 1e-12);
    }

    [Fact]
    public void A_loss_check_costs_less_time_the_rarer_it_is()
    {
        double[] rounds = [.. new double[] { 1, 2, 5, 50 }.Select(every => BenchMachine.Cycle(WithCheck(LossCheckMethod.ExtraCheck, every)).Times(OnePatch).RoundSeconds)];
        double without = BenchMachine.Cycle(WithCheck(LossCheckMethod.None, 1)).Times(OnePatch).RoundSeconds;

        Assert.Equal((rounds[0] - without) / 2, rounds[1] - without, 1e-12);
        Assert.Equal((rounds[0] - without) / 50, rounds[3] - without, 1e-12);
    }

    private static AtomArray WithCheck(LossCheckMethod method, double every) => BenchMachine.Array with
    {
        Coherence = BenchMachine.Array.Coherence with { LossCheck = new DataLossCheck(method, every) },
    };

    private static ReadoutScheme WithBanks(ReadoutScheme scheme, int banks) => scheme switch
    {
        SecondSpecies second => second with { BankCount = banks },
        MovedApart apart => apart with { BankCount = banks },
        _ => scheme,
    };

    private static AtomArray Limited(string limit, double atOnce) => limit switch
    {
        "pairs" => BenchMachine.Array with { Gates = BenchMachine.Array.Gates with { CzPairsAtOnce = atOnce } },
        "moves" => BenchMachine.Array with { Reach = BenchMachine.Carried with { MovedAtOnce = atOnce } },
        "one-qubit gates" => BenchMachine.Array with { Gates = BenchMachine.Array.Gates with { OneQubitAtOnce = atOnce } },
        _ => BenchMachine.Array with { Readout = BenchMachine.Shelf with { SelectAtOnce = atOnce } },
    };
}
