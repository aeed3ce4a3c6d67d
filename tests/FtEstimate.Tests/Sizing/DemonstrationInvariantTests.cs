using System.Globalization;
using FtEstimate.Files.Scenarios;
using FtEstimate.MagicStates;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Sizing;

/// <summary>The demonstration, whose exposure and rotation errors the search chooses, made worse one input at a time.</summary>
public sealed class DemonstrationInvariantTests
{
    /// <summary>Exposures are tried where they shorten a round by 2 %, sizes in steps; the sum is what the search may miss.</summary>
    private const double Resolution = 0.03;

    private static readonly MachineSizing Sizing = new(new FactoryCatalogue());

    [Theory]
    [InlineData("machine.detection.signal_counts_per_ms", 1 / 1.4)]
    [InlineData("machine.detection.background_counts_per_ms", 1.8)]
    [InlineData("machine.detection.depump_per_ms", 2)]
    [InlineData("machine.detection.loss_per_ms", 1.5)]
    [InlineData("machine.gates.cz_error", 1.15)]
    [InlineData("machine.gates.cz_loss", 1.4)]
    [InlineData("machine.coherence.t2_s", 1 / 1.6)]
    [InlineData("machine.readout.shelve-one.shelve_error", 1.4)]
    [InlineData("machine.readout.shelve-one.select_at_once", 1 / 1.5)]
    [InlineData("machine.readout.shelve-one.recool_time_us", 1.5)]
    [InlineData("machine.gates.cz_pairs_at_once", 1 / 1.5)]
    [InlineData("workload.generate.steps", 1.5)]
    [InlineData("goal.failure_probability", 1 / 2.0)]
    public void A_worse_input_never_makes_the_machine_better(string key, double factor)
    {
        // without a limit on supply: a slower machine loses fewer atoms a second, which may be what it lacked
        Scenario scenario = Read("machine.supply.atoms_per_s=1e12");
        double value = scenario.Inputs.Find(key)!.Number!.Value;
        double before = 0;
        for (int step = 0; step < 5; step++, value *= factor)
        {
            string setting = key.EndsWith("steps", StringComparison.Ordinal)
                ? $"{key}={Math.Round(value).ToString(CultureInfo.InvariantCulture)}"
                : $"{key}={value.ToString("R", CultureInfo.InvariantCulture)}";
            SizedMachine? machine = Sizing.Find(Read("machine.supply.atoms_per_s=1e12", setting)).Best;
            double measure = machine?.AtomHours ?? double.PositiveInfinity;

            Assert.True(measure >= before * (1 - Resolution), $"{setting}: {before} to {measure} atom hours");
            before = Math.Max(before, measure);
        }
    }

    private static Scenario Read(params string[] settings) =>
        ScenarioReader.Read(RepositoryFiles.At("scenarios", "first-report.toml"), settings).Scenario
        ?? throw new InvalidOperationException("the demonstration cannot be read");
}
