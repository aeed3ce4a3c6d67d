using FtEstimate.Scenarios;
using FtEstimate.Tests.Files.Scenarios;

namespace FtEstimate.Tests.Scenarios;

public class PhysicalSenseTests
{
    private const string OwnSignal = "ensemble_atoms = 1\nsignal_counts_per_ms = 80\n";

    [Theory]
    [InlineData("shelved_t2_s = 1.0", "shelved_t2_s = 3.3", "machine.readout.shelve-one.shelved_t2_s: T2 cannot exceed twice T1; expected at most 3.2 s, found 3.3 s")]
    [InlineData("t1_s = 119", "t1_s = 0.7", "machine.coherence.t2_s: T2 cannot exceed twice T1; expected at most 1.4 s, found 1.5 s")]
    [InlineData("cz_error = { likely = 3e-3, low = 2e-3, high = 4.5e-3, source = \"bench log, 60 pairs\" }", "cz_raw_error = 8e-4", "machine.gates.cz_raw_error: the raw error holds the loss, so it cannot be below cz_loss = 0.00087; found 0.0008")]
    [InlineData("\ncz_time_us = 0.27", "\ncz_time_us = 0.27\ncz_raw_error = 5e-3", "machine.gates.cz_raw_error: give cz_error or cz_raw_error, not both")]
    [InlineData("cz_error = { likely = 3e-3, low = 2e-3, high = 4.5e-3, source = \"bench log, 60 pairs\" }", "", "machine.gates.cz_error: missing key; expected cz_error, or cz_raw_error with the loss in it")]
    [InlineData("between_species_cz_loss = 1e-3\n", "", "machine.gates.between_species_cz_loss: missing key; a second species needs the gate between the species")]
    [InlineData("pulse_gap_us = 3", "pulse_gap_us = 3\nzone_refill_us = 4", "machine.reach.zone_refill_us: give pulse_gap_us or zone_refill_us, not both")]
    [InlineData("use = \"shelve-one\"", "use = \"shelve-two\"", "machine.readout.use: no scheme is called \"shelve-two\"; described are shelve-one, second-one, apart, bare")]
    [InlineData(OwnSignal, "", "machine.readout.second-one.signal_counts_per_ms: missing key; another species has a signal of its own, or a flip_error of its own")]
    [InlineData("flip_error = 4.6e-3\nloss_per_look = 2.4e-3\nexposure_us = 500", "flip_error = 4.6e-3\nloss_per_look = 2.4e-3", "machine.detection.exposure_us: a measured flip error holds for one exposure; expected a number")]
    [InlineData("flip_error = 4.6e-3\n", "flip_error = 4.6e-3\ndark_flip = 1e-3\nbright_flip = 1e-3\n", "machine.readout.apart.flip_error: give flip_error, or dark_flip and bright_flip, not both")]
    [InlineData("flip_error = 4.6e-3\n", "dark_flip = 1e-3\n", "machine.readout.apart.bright_flip: missing key; dark_flip and bright_flip go together")]
    [InlineData("flip_error = 4.6e-3\nloss_per_look = 2.4e-3\n", "flip_error = 4.6e-3\n", "machine.readout.apart.loss_per_look: missing key; needed beside a measured flip error")]
    [InlineData("flip_error = 4.6e-3\n", "flip_error = 4.6e-3\nloss_per_ms = 0.1\n", "machine.readout.apart.flip_error: flip_error is a measured error and loss_per_ms a photon count; a detector is known by one or the other")]
    [InlineData("depump_per_ms = 0.01\n", "", "machine.detection.depump_per_ms: missing key; needed beside a signal")]
    [InlineData("distance_um = 100", "distance_um = 100\nexchange_time_us = 200", "machine.readout.apart.exchange_time_us: give distance_um or exchange_time_us, not both")]
    [InlineData("distance_um = 100", "", "machine.readout.apart.distance_um: missing key; expected distance_um, or exchange_time_us")]
    [InlineData("hours_to_restart = 1\n", "", "machine.running.hours_to_restart: missing key; needed with mean_hours_between_stops")]
    [InlineData("data_loss_check = \"swap\"\n", "", "machine.running.data_loss_check: missing key; machine.gates.cz_loss loses atoms, so say how lost data atoms are found, and how often")]
    [InlineData("[supply]", "[abstract]\nuniform_error = 1e-3\nround_time_us = 1\nreaction_time_us = 10\n[supply]", "machine.gates: an abstract machine has no bench tables; leave out this table or [abstract]")]
    public void Inputs_that_contradict_or_need_each_other_are_faults(string old, string changed, string expected) =>
        Assert.Contains(Reading.FaultsOfMachine(old, changed), fault => fault.EndsWith(expected, StringComparison.Ordinal));

    [Fact]
    public void T2_of_exactly_twice_T1_is_allowed() =>
        Assert.Empty(Reading.FaultsOfMachine("t1_s = 119", "t1_s = 0.75"));

    [Fact]
    public void Steered_beams_give_no_time_for_a_distance()
    {
        int begin = SampleFiles.Machine.IndexOf("[reach]", StringComparison.Ordinal);
        int end = SampleFiles.Machine.IndexOf("[coherence]", StringComparison.Ordinal);
        string machine = SampleFiles.Machine[..begin] + "[reach]\nkind = \"steered-beams\"\nbeam_switch_us = 1\n" + SampleFiles.Machine[end..];

        string fault = Assert.Single(Reading.Faults(Reading.Of(machine: machine)));

        Assert.EndsWith("machine.readout.apart.distance_um: steered beams move no atoms, so a distance gives no time; expected exchange_time_us", fault, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("[counts]\nlogical_qubits = 10", "workload.counts: nothing to run: t_states, toffolis, rotations and logical_layers are all 0")]
    [InlineData("", "workload: missing table; expected [counts] or [generate]")]
    [InlineData("[counts]\nlogical_qubits = 10\nt_states = 1\n[generate]\nfamily = \"factoring\"\nbits = 2048", "workload.generate: give [counts] or [generate], not both")]
    [InlineData("[generate]\nfamily = \"spin-lattice\"\nrows = 2\ncolumns = 2\ntime_in_inverse_coupling = 1", "workload.generate.trotter_error: missing key; expected trotter_error, or steps")]
    [InlineData("[generate]\nfamily = \"spin-lattice\"\nrows = 2\ncolumns = 2\ntime_in_inverse_coupling = 1\nsteps = 5\ntrotter_error = 0.1", "workload.generate.steps: give trotter_error or steps, not both")]
    public void A_workload_is_counted_or_generated(string tables, string expected) => Assert.EndsWith(
        expected,
        Assert.Single(Reading.Faults(Reading.Of(workload: "name = \"W\"\n" + tables))),
        StringComparison.Ordinal);

    [Theory]
    [InlineData("tile-15-to-1")]
    [InlineData("15-to-1:17,7,7")]
    [InlineData("15-to-1:13,5,5 * 6 > 15-to-1:29,11,13")]
    public void A_factory_has_a_name_or_a_design(string design) =>
        Assert.Empty(Reading.Of(settings: $"method.factory={design}").Faults);

    [Theory]
    [InlineData("15-to-1:17,7,8", "a distance must be odd, from 3 to 199, not \"8\"")]
    [InlineData("15-to-1:17,7", "expected three distances dX,dZ,dm")]
    [InlineData("15-to-1:17.5,7,7", "a distance must be odd, from 3 to 199, not \"17.5\"")]
    [InlineData("15-to-1:13,5,5*0 > 15-to-1:29,11,13", "the number of blocks must be even, from 2 to 64, not \"0\"")]
    [InlineData("14-to-1:17,7,7", "protocol \"14-to-1\" is not modelled yet; only 15-to-1 is")]
    [InlineData("15-to-1:13,5,5*6 > 20-to-4:29,11,13", "protocol \"20-to-4\" is not modelled yet; only 15-to-1 is")]
    [InlineData("15-to-1:5,3,3>15-to-1:5,3,3>15-to-1:5,3,3", "factories of more than two levels are not modelled yet")]
    public void A_factory_that_cannot_be_built_is_a_fault(string design, string problem) => Assert.Contains(
        $"{problem}; expected",
        Assert.Single(Reading.Faults(Reading.Of(settings: $"method.factory={design}"))),
        StringComparison.Ordinal);

    [Fact]
    public void A_fault_of_its_own_silences_what_depends_on_it()
    {
        ScenarioDraft draft = new(new InputSet([]), new HashSet<string> { "", "goal", "machine" }, new HashSet<string> { "machine" });

        Assert.Empty(PhysicalSense.Check(draft));
    }

    [Fact]
    public void The_tables_of_a_draft_follow_from_its_inputs()
    {
        Scenario sample = Reading.Of().Scenario!;

        Assert.Empty(PhysicalSense.Check(ScenarioDraft.Of(sample.Inputs)));
        Assert.Contains("machine.readout.shelve-one", ScenarioDraft.Of(sample.Inputs).Tables);
    }
}
