using System.Text.Json;
using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

public sealed class WorkloadCommandTests
{
    private static readonly string SpinLattice = RepositoryFiles.At("scenarios", "workloads", "spin-lattice.toml");

    // 10 × 10 sites, 180 bonds on an open lattice, 500 second-order steps: 500 × (180 + 100) rotations, up to the first and last half-step
    [Fact]
    public async Task The_lattice_has_a_qubit_a_site_and_a_rotation_a_term_and_step()
    {
        using TemporaryFolder folder = new();

        CommandRun run = await CommandRun.Of("workload", SpinLattice, "--json", folder.At("w.json"));

        Assert.Equal((ExitStatus.Answer, ""), (run.Status, run.Error));
        using JsonDocument json = JsonDocument.Parse(File.ReadAllText(folder.At("w.json")));
        Assert.Equal(100, json.RootElement.GetProperty("logical_qubits").GetDouble());
        Assert.InRange(json.RootElement.GetProperty("rotations").GetDouble(), 140_000, 140_180);
        Assert.NotEqual(0, json.RootElement.GetProperty("derivations").GetArrayLength());
        Assert.Contains("## Where the numbers come from", run.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_setting_changes_the_workload()
    {
        CommandRun run = await CommandRun.Of("workload", SpinLattice, "--set", "workload.generate.rows=20");

        Assert.Matches(@"\| Logical qubits +\| 200 ", run.Output);
    }

    [Fact]
    public async Task A_scenario_is_no_workload()
    {
        CommandRun run = await CommandRun.Of("workload", CommandRun.FirstReport);

        Assert.Equal((ExitStatus.WrongInput, ""), (run.Status, run.Output));
        Assert.Contains(run.Faults, fault => fault.EndsWith("workload: missing table; expected [counts] or [generate]", StringComparison.Ordinal));
    }
}
