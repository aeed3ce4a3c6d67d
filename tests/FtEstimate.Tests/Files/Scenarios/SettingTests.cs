using FtEstimate.Files.Scenarios;
using FtEstimate.Machines;
using FtEstimate.Scenarios;

namespace FtEstimate.Tests.Files.Scenarios;

public class SettingTests
{
    private const string Source = "--set on the command line";

    [Theory]
    [InlineData("machine.gates.cz_error=1e-3", "machine.gates.cz_error", 1e-3)]
    [InlineData(" machine.gates.cz_error = 0.001 ", "machine.gates.cz_error", 1e-3)]
    [InlineData("goal.atoms_at_most=1_000_000", "goal.atoms_at_most", 1e6)]
    [InlineData("machine.cycle.layer_time_us=800", "machine.cycle.layer_time_us", 800.0)]
    [InlineData("method.gates_per_round=3", "method.gates_per_round", 3.0)]
    public void A_number_is_replaced_or_added_without_range_and_with_its_source(string setting, string path, double value)
    {
        Assert.Equal(new Input(path, value, Source: Source), Set(setting).Inputs.Find(path));
    }

    [Theory]
    [InlineData("machine.readout.use=second-one")]
    [InlineData("machine.readout.use=\"second-one\"")]
    [InlineData("machine.readout.use='second-one'")]
    public void A_text_needs_no_quotes(string setting)
    {
        AtomArray atoms = (AtomArray)Set(setting).Machine.Apparatus;

        Assert.Equal("second-one", atoms.Readout.Name);
        Assert.Equal(["shelve-one", "apart", "bare"], atoms.OtherReadouts.Select(scheme => scheme.Name));
    }

    [Fact]
    public void A_text_may_look_like_a_number() => Assert.Equal("2048", Set("workload.name=2048").Workload.Name);

    [Fact]
    public void A_flag_is_true_or_false() =>
        Assert.False(((MovedAtoms)((AtomArray)Set("machine.reach.check_grids_move_together=false").Machine.Apparatus).Reach).CheckGridsMoveTogether);

    [Fact]
    public void A_range_may_be_set() => Assert.Equal(
        new Input("machine.coherence.t2_s", 2, Low: 1, High: 4, Source: Source),
        Set("machine.coherence.t2_s={ likely = 2, low = 1, high = 4 }").Inputs.Find("machine.coherence.t2_s"));

    [Fact]
    public void One_end_of_a_range_may_be_set() =>
        Assert.Equal(9e-3, Set("machine.gates.cz_error.high=9e-3").Inputs.Find("machine.gates.cz_error")!.High);

    [Fact]
    public void The_last_of_two_settings_of_a_key_holds() =>
        Assert.Equal(0.2, Set("goal.failure_probability=0.1", "goal.failure_probability=0.2").Goal.FailureProbability);

    [Fact]
    public void Another_machine_file_can_be_taken_and_changed()
    {
        using TemporaryFolder folder = new();
        folder.Write("machines/other.toml", SampleFiles.AbstractMachine);
        folder.Write("workloads/spin-lattice.toml", SampleFiles.Workload);
        string path = folder.Write("s.toml", SampleFiles.Scenario);

        ScenarioReading reading = ScenarioReader.Read(path, ["machine.abstract.round_time_us=1000", "machine=machines/other.toml"]);

        Assert.Empty(reading.Faults);
        Assert.Equal(new AbstractApparatus(1e-3, 1e-3, 10e-6), reading.Scenario!.Machine.Apparatus);
    }

    [Fact]
    public void A_setting_can_mend_a_file()
    {
        string machine = Reading.Changed(SampleFiles.Machine, "t1_s = 119", "t1_s = -1");

        Assert.Empty(Reading.Of(machine: machine, settings: "machine.coherence.t1_s=100").Faults);
    }

    [Theory]
    [InlineData("machine.gates.cz_eror=1e-3", "--set: machine.gates.cz_eror: unknown key; did you mean cz_error?")]
    [InlineData("gates.cz_error=1e-3", "--set: gates: unknown table; known here are title, machine, workload, goal, method")]
    [InlineData("machine.gates.cz_error=1,5", "--set: machine.gates.cz_error: expected a number between 0 and 0.75, found the text \"1,5\"")]
    [InlineData("machine.gates.cz_error=nan", "--set: machine.gates.cz_error: expected a number between 0 and 0.75, found NaN")]
    [InlineData("machine.gates.cz_error=", "--set: machine.gates.cz_error: expected a number between 0 and 0.75, found the text \"\"")]
    [InlineData("machine.gates.cz_error={ likely = ", "--set: machine.gates.cz_error: the value cannot be read; expected a number, a text, true, false, or { likely = ..., low = ..., high = ... }")]
    [InlineData("machine.gates.cz_error", "--set: machine.gates.cz_error: expected key=value, such as machine.gates.cz_error=1e-3")]
    [InlineData("=5", "--set: expected key=value, such as machine.gates.cz_error=1e-3")]
    [InlineData("machine.gates.cz_time_us.x=5", "--set: machine.gates.cz_time_us.x: machine.gates.cz_time_us is no table, so nothing stands inside it")]
    [InlineData("machine.gates=5", "--set: machine.gates: expected a table, found 5")]
    [InlineData("machine=nowhere.toml", "--set: machine: nowhere.toml: no such file")]
    public void A_wrong_setting_is_a_fault_of_the_command_line(string setting, string expected) =>
        Assert.Contains(expected, Reading.Faults(Reading.Of(settings: setting)));

    [Fact]
    public void A_setting_replaces_a_whole_table_only_by_a_table() =>
        Assert.Single(Reading.Of(settings: "machine.gates=5").Faults);

    private static Scenario Set(params string[] settings)
    {
        ScenarioReading reading = Reading.Of(settings: settings);
        Assert.Empty(reading.Faults);
        return reading.Scenario!;
    }
}
