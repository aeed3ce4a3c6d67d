using FtEstimate.Files.Scenarios;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Scenarios;

public sealed class LogicRulesTests
{
    [Fact]
    public void Transversal_gates_need_a_machine_that_moves_atoms()
    {
        ScenarioReading reading = Demo(
            "machine.reach={ kind = \"steered-beams\", beam_switch_us = 1 }", "method.style=transversal");

        Assert.Contains(reading.Faults, fault => fault.Key == "method.style" && fault.Message.Contains("moved-atoms", StringComparison.Ordinal));
    }

    [Fact]
    public void A_floor_plan_has_a_patch_for_each_logical_qubit()
    {
        ScenarioReading reading = Demo("workload={ name = \"w\", counts = { logical_qubits = 100 } }", "method.patches=50");

        Assert.Contains(reading.Faults, fault => fault.Key == "method.patches");
    }

    private static ScenarioReading Demo(params string[] settings) =>
        ScenarioReader.Read(RepositoryFiles.At("scenarios", "first-report.toml"), settings);
}
