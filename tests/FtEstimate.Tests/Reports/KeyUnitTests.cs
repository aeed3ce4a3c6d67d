using FtEstimate.Reports.Estimate;

namespace FtEstimate.Tests.Reports;

public sealed class KeyUnitTests
{
    [Theory]
    [InlineData("machine.gates.cz_time_us", "µs")]
    [InlineData("machine.control.decode_us_per_round", "µs per round")]
    [InlineData("machine.coherence.echo_pulses_per_round", "per round")]
    [InlineData("machine.array.pitch_um", "µm")]
    [InlineData("machine.array.trap_power_mw", "mW")]
    [InlineData("machine.reach.peak_acceleration_m_s2", "m/s²")]
    [InlineData("machine.detection.signal_counts_per_ms", "counts per ms")]
    [InlineData("machine.detection.loss_per_ms", "per ms")]
    [InlineData("machine.supply.atoms_per_s", "atoms per s")]
    [InlineData("machine.running.mean_hours_between_stops", "hours")]
    [InlineData("machine.running.hours_to_restart", "hours")]
    [InlineData("machine.running.data_loss_check_every_rounds", "rounds")]
    [InlineData("machine.coherence.t2_s", "s")]
    [InlineData("goal.run_at_most_days", "days")]
    [InlineData("machine.gates.cz_error", "")]
    [InlineData("workload.counts.t_states", "")]
    [InlineData("workload.counts.toffolis", "")]
    [InlineData("workload.counts.shots", "")]
    [InlineData("workload.counts.logical_qubits", "")]
    public void A_key_names_its_unit(string path, string unit) => Assert.Equal(unit, KeyUnit.Of(path));
}
