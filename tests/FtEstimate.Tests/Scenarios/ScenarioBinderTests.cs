using FtEstimate.Machines;
using FtEstimate.Scenarios;
using FtEstimate.Tests.Files.Scenarios;
using FtEstimate.Workloads;

namespace FtEstimate.Tests.Scenarios;

public class ScenarioBinderTests
{
    private static readonly Scenario Sample = Reading.Of().Scenario!;

    [Fact]
    public void Changing_an_input_and_binding_again_changes_that_figure_only()
    {
        Scenario changed = ScenarioBinder.Bind(Sample.Inputs.With("machine.gates.cz_time_us", 0.5));

        AtomArray before = (AtomArray)Sample.Machine.Apparatus;
        AtomArray after = (AtomArray)changed.Machine.Apparatus;
        Assert.Equal(before.Gates with { Cz = before.Gates.Cz with { Seconds = 0.5e-6 } }, after.Gates);
        Assert.Equal(before.Readout, after.Readout);
        Assert.Equal(Sample.Goal, changed.Goal);
    }

    [Fact]
    public void A_draw_with_more_loss_than_raw_error_leaves_no_negative_error()
    {
        string raw = Reading.Changed(SampleFiles.Machine, "cz_error = { likely = 3e-3, low = 2e-3, high = 4.5e-3, source = \"bench log, 60 pairs\" }", "cz_raw_error = 5e-3");
        InputSet inputs = Reading.Of(machine: raw).Scenario!.Inputs;

        AtomArray atoms = (AtomArray)ScenarioBinder.Bind(inputs.With("machine.gates.cz_loss", 6e-3)).Machine.Apparatus;

        Assert.Equal(0, atoms.Gates.Cz.Infidelity);
    }

    [Fact]
    public void A_zone_refill_stands_in_for_the_pulse_gap()
    {
        string machine = Reading.Changed(SampleFiles.Machine, "pulse_gap_us = 3", "zone_refill_us = 40");

        MovedAtoms reach = (MovedAtoms)((AtomArray)Reading.Of(machine: machine).Scenario!.Machine.Apparatus).Reach;

        Assert.Equal(40e-6, reach.BetweenPulsesSeconds);
    }

    [Fact]
    public void A_number_for_the_exposure_goes_before_best()
    {
        Scenario fixedExposure = Reading.Of(settings: "machine.readout.shelve-one.exposure_us=250").Scenario!;

        Assert.Equal(250e-6, ((AtomArray)fixedExposure.Machine.Apparatus).Readout.Detector.ExposureSeconds);
        Assert.Null(((AtomArray)Sample.Machine.Apparatus).Readout.Detector.ExposureSeconds);
    }

    [Fact]
    public void Factoring_has_the_counts_of_its_generator()
    {
        Scenario scenario = Reading.Of(workload: "name = \"RSA\"\n[generate]\nfamily = \"factoring\"\nbits = 2048\nshots = 2").Scenario!;

        Assert.Equal(new Factoring(2048).Toffolis, scenario.Workload.Toffolis);
        Assert.Equal(2, scenario.Workload.Shots);
        Assert.Equal("RSA", scenario.Workload.Name);
    }

    [Fact]
    public void Unchecked_inputs_are_a_bug_and_throw() =>
        Assert.Throws<InvalidOperationException>(() => ScenarioBinder.Bind(new InputSet([])));
}
