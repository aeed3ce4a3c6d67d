using FtEstimate.Files.Scenarios;
using FtEstimate.Machines;
using FtEstimate.Scenarios;

namespace FtEstimate.Tests.Files.Scenarios;

public class ScenarioReaderTests
{
    private static readonly Scenario Sample = Reading.Of().Scenario!;
    private static readonly AtomArray Atoms = (AtomArray)Sample.Machine.Apparatus;

    [Fact]
    public void A_good_scenario_has_no_faults_and_lists_its_files()
    {
        ScenarioReading reading = Reading.Of();

        Assert.Empty(reading.Faults);
        Assert.Equal<string>(["s.toml", "machines/brindle-fell.toml", "workloads/spin-lattice.toml"], reading.Files);
    }

    [Fact]
    public void Goal_and_method_are_read_with_their_defaults()
    {
        Assert.Equal("Spin lattice on the Brindle Fell array", Sample.Title);
        Assert.Equal(new Goal(0.05, Preference.LeastAtomHours, 300_000, 30 * 86_400.0), Sample.Goal);
        Assert.Equal(
            new Method("published-fit", "2d^2-1", null, null, null, null, null, null, "joint", "repeat-until-success", 0.5, null),
            Sample.Method);
    }

    [Fact]
    public void Geometry_gates_and_coherence_are_in_si_units()
    {
        Assert.Equal(new ArrayGeometry(12e-6, 150e-6, 1.5e-3, 1.4e-3, 1.1), Atoms.Geometry);
        Assert.Equal(
            new Gates(new EntanglingGate(3e-3, 8.7e-4, 0.27e-6), new EntanglingGate(2e-2, 1e-3, 0.5e-6), 500, 3e-4, 2e-6, double.PositiveInfinity, 1e-3, 10e-6),
            Atoms.Gates);
        Assert.Equal(new Coherence(119, 1.5, 2, 1374, new DataLossCheck(LossCheckMethod.Swap, 4)), Atoms.Coherence);
    }

    [Fact]
    public void Reach_is_in_si_units() => Assert.Equal(
        new MovedAtoms(MoveProfile.Cubic, 8250, 150e-6, 1e-3, 5e-4, 2000, true, 3e-6, null),
        Atoms.Reach);

    [Fact]
    public void Control_supply_and_running_are_in_si_units()
    {
        Assert.Equal(new Control(50e-6, 100e-6), Sample.Machine.Control);
        Assert.Equal(new Supply(15_000, 0.05), Sample.Machine.Supply);
        Assert.Equal(new Running(360_000, 3600, 5, 0.1), Sample.Machine.Running);
    }

    [Fact]
    public void The_scheme_in_use_takes_its_detector_from_the_detection_table()
    {
        PhotonCounting detector = new(100e3, 4e3, 10, 4, 0, null, 200e-6, false);

        Assert.Equal(new Shelved("shelve-one", detector, 300e-6, 20e-6, 1e-3, 6e-6, 1e-3, 400, 0, 1.6, 1.0, 1), Atoms.Readout);
    }

    [Fact]
    public void Other_schemes_state_what_is_different_about_their_detectors()
    {
        Assert.Equal<ReadoutScheme>(
            [
                new SecondSpecies("second-one", new PhotonCounting(80e3, 4e3, 20, 4, 0, null, 200e-6, false), 300e-6, 1, 2, 0.1),
                new MovedApart("apart", new StatedReadout(4.6e-3, 4.6e-3, 2.4e-3, 500e-6, 200e-6, false), 300e-6, 100e-6, null, true, 1, 2),
                new InPlace("bare", new PhotonCounting(100e3, 4e3, 10, 4, 0, null, 200e-6, false), 300e-6, 1e6),
            ],
            Atoms.OtherReadouts);
    }

    [Fact]
    public void A_generated_workload_has_the_name_of_the_file_and_the_counts_of_the_generator()
    {
        // 100 sites and 180 bonds of the open 10 × 10 lattice
        Assert.Equal("Spin lattice, 10 by 10", Sample.Workload.Name);
        Assert.Equal(100, Sample.Workload.LogicalQubits);
        Assert.Equal(0, (Sample.Workload.Rotations - 180) % 280);
        Assert.Null(Sample.Workload.RotationError);
    }

    [Fact]
    public void A_counted_workload_is_read_as_it_stands()
    {
        Scenario scenario = Reading.Of(workload: SampleFiles.CountedWorkload).Scenario!;

        Assert.Equal((100.0, 1e8, 0.0, 0.0), (scenario.Workload.LogicalQubits, scenario.Workload.TStates, scenario.Workload.Toffolis, scenario.Workload.Rotations));
        Assert.Equal((1e6, 3.0), (scenario.Workload.ReactionDepth, scenario.Workload.Shots));
        Assert.Null(scenario.Workload.LogicalLayers);
    }

    [Fact]
    public void An_abstract_machine_needs_no_bench()
    {
        Scenario scenario = Reading.Of(machine: SampleFiles.AbstractMachine).Scenario!;

        AbstractApparatus apparatus = Assert.IsType<AbstractApparatus>(scenario.Machine.Apparatus);
        Assert.Equal(new AbstractApparatus(1e-3, 1e-6, 10e-6), apparatus);
    }

    [Fact]
    public void Inputs_keep_their_range_and_source_in_the_unit_of_the_key()
    {
        Assert.Equal(
            new Input("machine.gates.cz_error", 3e-3, Low: 2e-3, High: 4.5e-3, Source: "bench log, 60 pairs"),
            Sample.Inputs.Find("machine.gates.cz_error"));
        Assert.Equal(
            new Input("machine.reach.check_grids_move_together", Flag: true, Source: "two deflector pairs, installed in May"),
            Sample.Inputs.Find("machine.reach.check_grids_move_together"));
        Assert.Null(Sample.Inputs.Find("machine.gates.cz_time_us")!.Source);
    }

    [Fact]
    public void A_machine_may_stand_inside_the_scenario()
    {
        string inside = Reading.Changed(SampleFiles.Scenario, "machine = \"machines/brindle-fell.toml\"\n", "") + """

            [machine]
            name = "Inside"
            [machine.abstract]
            uniform_error = 1e-4
            round_time_us = 1
            reaction_time_us = 10
            """;

        ScenarioReading reading = Reading.Of(scenario: inside);

        Assert.Empty(reading.Faults);
        Assert.Equal("Inside", reading.Scenario!.Machine.Name);
    }

    [Fact]
    public void A_raw_gate_error_holds_the_loss()
    {
        string raw = Reading.Changed(SampleFiles.Machine, "cz_error = { likely = 3e-3, low = 2e-3, high = 4.5e-3, source = \"bench log, 60 pairs\" }", "cz_raw_error = 5e-3");

        AtomArray atoms = (AtomArray)Reading.Of(machine: raw).Scenario!.Machine.Apparatus;

        Assert.Equal(5e-3 - 8.7e-4, atoms.Gates.Cz.Infidelity, 15);
    }

    [Fact]
    public void A_byte_order_mark_and_windows_line_ends_do_no_harm()
    {
        string windows = "\uFEFF" + SampleFiles.Scenario.Replace("\n", "\r\n", StringComparison.Ordinal);

        Assert.Empty(Reading.Of(scenario: windows).Faults);
    }

    [Fact]
    public void A_workload_file_can_be_read_alone()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("w.toml", SampleFiles.CountedWorkload);

        WorkloadReading reading = ScenarioReader.ReadWorkload(path, ["workload.counts.shots=7"]);

        Assert.Empty(reading.Faults);
        Assert.Equal(7, reading.Workload!.Shots);
    }

    [Fact]
    public void Settings_for_a_workload_file_stay_below_workload()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("w.toml", SampleFiles.CountedWorkload);

        WorkloadReading reading = ScenarioReader.ReadWorkload(path, ["goal.failure_probability=0.1"]);

        Assert.Equal("--set: goal: a workload file has only keys below workload", Assert.Single(reading.Faults).ToString());
    }
}
