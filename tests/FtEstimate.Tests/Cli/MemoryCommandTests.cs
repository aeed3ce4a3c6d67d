using System.Globalization;
using System.Text.Json;
using System.Text.RegularExpressions;
using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

public sealed class MemoryCommandTests
{
    [Fact]
    public async Task A_scenario_is_simulated_at_the_noise_of_its_machine()
    {
        CommandRun run = await CommandRun.Of("memory", CommandRun.FirstReport, "--distance", "3", "--rounds", "4", "--shots", "500");

        Assert.Equal((ExitStatus.Answer, ""), (run.Status, run.Error));
        Assert.StartsWith("# Simulated memory for Spin lattice on the Brindle Fell array\n", run.Output, StringComparison.Ordinal);
        Assert.Contains("the noise is that of the machine the report chooses, under its full load", run.Output, StringComparison.OrdinalIgnoreCase);
        Assert.Contains("| CZ gate ", run.Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("No machine meets the goal, so the noise is that of the machine that comes closest", "goal.atoms_at_most=1000")]
    [InlineData("No machine meets the goal, so the noise is that of a single patch", "machine.gates.cz_error=0.1")]
    public async Task Without_an_answer_the_noise_is_that_of_the_report(string whose, string setting)
    {
        CommandRun run = await CommandRun.Of("memory", CommandRun.FirstReport, "--distance", "3", "--rounds", "2", "--shots", "100", "--set", setting);

        Assert.Equal((ExitStatus.Answer, ""), (run.Status, run.Error));
        Assert.Contains(whose, run.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task An_abstract_machine_is_simulated_as_the_textbook_circuit()
    {
        CommandRun run = await CommandRun.Of(
            "memory", RepositoryFiles.At("scenarios", "published", "litinski-2019-fast.toml"), "--distance", "3", "--rounds", "2", "--shots", "100");

        Assert.Equal((ExitStatus.Answer, ""), (run.Status, run.Error));
        Assert.Contains("The machine is abstract", run.Output, StringComparison.Ordinal);
    }

    // published counts at p = 1e-3, distance 3, nine rounds: O'Rourke 2025 (arXiv:2409.14765), 7854 (Z) failures in a million shots; four standard errors of our 2e4
    [Fact]
    public async Task A_uniform_error_gives_the_published_failures()
    {
        using TemporaryFolder folder = new();
        await CommandRun.Of("memory", "--uniform", "1e-3", "--distance", "3", "--basis", "z", "--shots", "2e4", "--json", folder.At("m.json"));

        (long shots, long failures) = Assert.Single(MemoryRuns.CountsIn(folder.At("m.json")));

        double expected = shots * 7854e-6;
        Assert.Equal(20_000, shots);
        Assert.InRange(failures, expected - (4 * Math.Sqrt(expected)), expected + (4 * Math.Sqrt(expected)));
    }

    [Fact]
    public async Task The_figures_for_scripts_hold_what_the_page_promises()
    {
        using TemporaryFolder folder = new();
        await MemoryRuns.Of("--json", folder.At("m.json"));
        using JsonDocument json = JsonDocument.Parse(File.ReadAllText(folder.At("m.json")));
        JsonElement[] experiments = [.. json.RootElement.GetProperty("experiments").EnumerateArray()];

        Assert.Equal([(3, "z"), (3, "x"), (5, "z"), (5, "x")], experiments.Select(item => (item.GetProperty("distance").GetInt32(), item.GetProperty("basis").GetString()!)));
        Assert.All(experiments, item =>
        {
            double perShot = item.GetProperty("per_shot").GetDouble();
            Assert.Equal(3000, item.GetProperty("shots").GetInt64());
            Assert.Equal(item.GetProperty("failures").GetInt64() / 3000.0, perShot);
            Assert.InRange(perShot, item.GetProperty("low").GetDouble(), item.GetProperty("high").GetDouble());
            Assert.Equal((1 - Math.Pow(1 - (2 * perShot), 1.0 / 3)) / 2, item.GetProperty("per_round").GetDouble(), 1e-12);
        });
        JsonElement step = Assert.Single(json.RootElement.GetProperty("suppression").EnumerateArray());
        double[] rates = [.. experiments.Select(item => item.GetProperty("per_round").GetDouble())];
        Assert.Equal((3, 5), (step.GetProperty("from").GetInt32(), step.GetProperty("to").GetInt32()));
        Assert.Equal((rates[0] + rates[1]) / (rates[2] + rates[3]), step.GetProperty("measured").GetDouble(), 1e-12);
        Assert.True(step.GetProperty("error").GetDouble() > 0 && step.GetProperty("law").GetDouble() > 0);
    }

    [Theory]
    [InlineData("1")]
    [InlineData("2")]
    [InlineData("3")]
    public async Task Counts_and_report_are_the_same_for_any_number_of_threads_and_in_any_country(string threads)
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        CultureInfo commas = (CultureInfo)CultureInfo.InvariantCulture.Clone();
        commas.NumberFormat.NumberDecimalSeparator = ",";
        CommandRun plain = await MemoryRuns.Of("--threads", "1");
        try
        {
            CultureInfo.CurrentCulture = commas;

            Assert.Equal(WithoutTimes(plain.Output), WithoutTimes((await MemoryRuns.Of("--threads", threads)).Output));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Theory]
    [InlineData("50%")]
    [InlineData("0.5")]
    public async Task An_accuracy_ends_experiments_early(string accuracy)
    {
        using TemporaryFolder folder = new();
        CommandRun run = await CommandRun.Of(
            "memory", "--uniform", "1e-2", "--distance", "3", "--rounds", "1", "--basis", "z", "--decoder", "union-find", "--shots", "1e7", "--accuracy", accuracy, "--json", folder.At("m.json"));

        // the first look comes after 64 blocks of 256 shots
        Assert.Equal(ExitStatus.Answer, run.Status);
        Assert.All(MemoryRuns.CountsIn(folder.At("m.json")), count => Assert.Equal(16_384, count.Shots));
    }

    [Fact]
    public async Task Few_failures_give_bounds_and_words_but_no_strange_numbers()
    {
        CommandRun run = await CommandRun.Of("memory", "--uniform", "1e-6", "--distance", "3,5", "--rounds", "1", "--shots", "10");

        Assert.Contains("not enough failures", run.Output, StringComparison.Ordinal);
        Assert.Contains("\\< 0.31", run.Output, StringComparison.Ordinal);
        Assert.DoesNotMatch(@"(?i)\bnan\b|infinity|∞|n/a", run.Output);
    }

    [Fact]
    public async Task A_page_and_a_picture_are_written_where_they_are_asked_for()
    {
        using TemporaryFolder folder = new();
        await MemoryRuns.Of("--out", folder.At("m.md"), "--html", folder.At("m.html"));

        Assert.Contains("<svg", File.ReadAllText(folder.At("m.html")), StringComparison.Ordinal);
        Assert.DoesNotContain("NaN", File.ReadAllText(Path.Combine(folder.Root, "m-pictures", "memory.svg")), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Progress_is_told_when_it_is_asked_for_and_nowhere_else()
    {
        Assert.Empty((await MemoryRuns.Of()).Error);
        Assert.Matches(@"^distance 3, basis z: \d+ % of its shots, \d+ failures; ", (await MemoryRuns.Of("--progress")).Error);
    }

    // the last column is the time; its width follows it
    private static string WithoutTimes(string report) =>
        Regex.Replace(Regex.Replace(report, @"\|[^|\n]* (ns|µs|ms|s|minutes?) *\|$", "|", RegexOptions.Multiline), @"[ -]*(Time|:) *\|$", "", RegexOptions.Multiline)
            .Replace("-", "", StringComparison.Ordinal);
}
