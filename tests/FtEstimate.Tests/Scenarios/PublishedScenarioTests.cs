using FtEstimate.Files.Scenarios;
using FtEstimate.MagicStates;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Scenarios;

/// <summary>The scenarios that come with the tool.</summary>
public sealed class PublishedScenarioTests
{
    private static readonly FactoryCatalogue Catalogue = new();

    private static readonly string FirstReport = RepositoryFiles.At("scenarios", "first-report.toml");

    public static TheoryData<string> Files =>
    [
        .. Directory.GetFiles(RepositoryFiles.At("scenarios"), "*.toml").Select(path => Path.GetFileName(path)),
        .. Directory.GetFiles(RepositoryFiles.At("scenarios", "published"), "*.toml").Select(path => $"published/{Path.GetFileName(path)}"),
    ];

    [Theory]
    [MemberData(nameof(Files))]
    public void Every_scenario_reads_without_a_fault_and_finds_a_machine(string file)
    {
        SizingResult result = Sized(RepositoryFiles.At(["scenarios", .. file.Split('/')]));

        Assert.True(result.Best!.Failure.Total <= result.Space.Scenario.Goal.FailureProbability);
    }

    // the trade-off the demonstration is to show: checks of a second species are read while the next round runs, at the price of atoms
    [Fact]
    public void The_second_species_is_faster_with_more_atoms_and_loses_more_than_are_delivered()
    {
        SizedMachine shelved = Sized(FirstReport).Best!;
        SizingResult supplied = Sized(FirstReport, "machine.readout.use=second-one");
        SizedMachine lifted = Sized(FirstReport, "machine.readout.use=second-one", "machine.supply.atoms_per_s=1e9").Best!;

        Assert.True(lifted.Atoms.Total > shelved.Atoms.Total);
        Assert.True(lifted.RunSeconds < shelved.RunSeconds);
        Assert.True(lifted.Clock.RoundSeconds < shelved.Clock.RoundSeconds);
        Assert.True(shelved.LossPerSecond < 200_000);
        Assert.True(lifted.LossPerSecond > 200_000);
        Assert.True(supplied.Best is null || supplied.Best.RunSeconds > shelved.RunSeconds);
    }

    private static SizingResult Sized(string path, params string[] settings)
    {
        ScenarioReading reading = ScenarioReader.Read(path, settings);
        Assert.Empty(reading.Faults);
        return new MachineSizing(Catalogue).Find(reading.Scenario!);
    }
}
