using System.Diagnostics;
using System.Text;
using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

/// <summary>Wrong input: exit status 2, every fault at once on standard error, nothing written.</summary>
public sealed class BadInputTests
{
    private const string Machine = "machines/brindle-fell.toml";
    private const string Scenario = "first-report.toml";

    [Theory]
    [InlineData(Machine, "cz_error =", "cz_eror = 1e-3", "machine.gates.cz_eror: unknown key; did you mean cz_error?")]
    [InlineData(Machine, "cz_time_us =", "cz_time_ns = 270", "machine.gates.cz_time_ns: unknown key; the unit is part of the key: did you mean cz_time_us = 0.27?")]
    [InlineData(Machine, "cz_time_us =", "cz_time_us = \"fast\"", "machine.gates.cz_time_us: expected a number greater than 0, found the text \"fast\"")]
    [InlineData(Machine, "cz_time_us =", "cz_time_us = nan", "machine.gates.cz_time_us: expected a number greater than 0, found NaN")]
    [InlineData(Machine, "cz_time_us =", "cz_time_us = inf", "machine.gates.cz_time_us: expected a number greater than 0, found Infinity")]
    [InlineData(Machine, "cz_time_us =", "cz_time_us = -0.27", "machine.gates.cz_time_us: expected a number greater than 0, found -0.27")]
    [InlineData(Machine, "cz_time_us =", "cz_time_us = 0,27", "one key or table per line; nothing more was expected here")]
    [InlineData(Machine, "cz_time_us =", "cz_time_us = 0.27\ncz_time_us = 0.28", "duplicate key: cz_time_us stands already on line")]
    [InlineData(Scenario, "failure_probability =", "failure_probability = 1.5", "goal.failure_probability: expected a number greater than 0 and at most 0.99, found 1.5")]
    [InlineData(Scenario, "machine =", "machine = \"machines/brindle-hill.toml\"", "no such file")]
    [InlineData(Scenario, "machine =", "machine = \"first-report.toml\"", "names a file that is already read here")]
    [InlineData(Scenario, "machine =", "machine = \"machines\"", "this is a folder, not a file")]
    public async Task A_fault_in_a_file_is_named_with_its_line_and_nothing_is_written(string file, string start, string changed, string expected)
    {
        using TemporaryFolder folder = new();
        CopyScenario(folder);
        int line = ChangeLine(folder.At(file), start, changed);

        CommandRun run = await ReportIntoOldFiles(folder, folder.At(Scenario));

        // a second line stands one below
        Assert.Contains(run.Faults, fault => fault.Contains(expected, StringComparison.Ordinal)
            && fault.StartsWith(FormattableString.Invariant($"{folder.At(file)}({line + changed.Count(letter => letter == '\n')},"), StringComparison.Ordinal));
    }

    [Fact]
    public async Task Faults_of_all_files_and_settings_and_outputs_come_at_once()
    {
        using TemporaryFolder folder = new();
        CopyScenario(folder);
        ChangeLine(folder.At(Scenario), "prefer =", "prefers = 1");
        ChangeLine(folder.At(Machine), "cz_error =", "cz_eror = 1e-3");
        ChangeLine(folder.At(Machine), "banks =", "banks = 3");
        ChangeLine(folder.At("workloads/spin-lattice.toml"), "rows =", "rows = -10");

        CommandRun run = await ReportIntoOldFiles(folder, folder.At(Scenario), "--set", "machine.gates.cz_loss=2", "--json", folder.At("nowhere/r.json"));

        // the misspelt cz_error counts once, not as a missing key too
        Assert.All(
            (string[])["goal.prefers", "cz_eror", "banks", "workload.generate.rows", "--set: machine.gates.cz_loss", "its folder does not exist"],
            expected => Assert.Single(run.Faults, line => line.Contains(expected, StringComparison.Ordinal)));
        Assert.Contains($"{run.Faults.Length} faults; nothing was computed.", run.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_missing_scenario_is_a_fault()
    {
        using TemporaryFolder folder = new();
        Assert.Equal([$"{folder.At("nothing.toml")}: no such file"], (await ReportIntoOldFiles(folder, folder.At("nothing.toml"))).Faults);
    }

    [Fact]
    public async Task A_folder_is_no_scenario()
    {
        using TemporaryFolder folder = new();
        Assert.Equal([$"{folder.Root}: this is a folder, not a file"], (await ReportIntoOldFiles(folder, folder.Root)).Faults);
    }

    [Fact]
    public async Task An_empty_file_is_no_scenario()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("s.toml", "");
        Assert.Equal([$"{path}: the file is empty"], (await ReportIntoOldFiles(folder, path)).Faults);
    }

    [Fact]
    public async Task A_binary_file_is_no_scenario()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("s.toml", [0x7F, (byte)'E', (byte)'L', (byte)'F', 0, 0, 0xFF, 0xFE]);
        Assert.Equal([$"{path}: this is a binary file; expected TOML text"], (await ReportIntoOldFiles(folder, path)).Faults);
    }

    [Fact]
    public async Task A_huge_file_is_refused_at_once()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("s.toml", new byte[10 << 20]);
        Stopwatch watch = Stopwatch.StartNew();

        CommandRun run = await ReportIntoOldFiles(folder, path);

        // a person waits a second without wondering; it takes a few milliseconds
        Assert.InRange(watch.Elapsed.TotalSeconds, 0, 1);
        Assert.EndsWith("the file is larger than 1 MiB; input files are short texts", Assert.Single(run.Faults), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("a = 1\n")]
    [InlineData("= \n")]
    [InlineData("a =\n[\n")]
    [InlineData("[[x]]\n")]
    [InlineData("\"")]
    [InlineData("{[")]
    [InlineData("a.")]
    public async Task The_largest_file_that_is_read_is_judged_quickly_whatever_nonsense_it_repeats(string nonsense)
    {
        using TemporaryFolder folder = new();
        string text = new StringBuilder().Insert(0, nonsense, 1_000_000 / Encoding.UTF8.GetByteCount(nonsense)).ToString();
        string path = folder.Write("s.toml", text);
        Stopwatch watch = Stopwatch.StartNew();

        CommandRun run = await ReportIntoOldFiles(folder, path);

        // it takes a tenth of a second; the bound leaves room for a busy machine and still catches quadratic work
        Assert.InRange(watch.Elapsed.TotalSeconds, 0, 5);
        Assert.InRange(run.Faults.Length, 1, 210);
    }

    [Theory]
    [InlineData("machine.gates.cz_error")]
    [InlineData("=1")]
    [InlineData("machine.gates.cz_error=")]
    [InlineData("machine.gates.cz_error=1,5e-3")]
    [InlineData("machine.gates.cz_error=nan")]
    [InlineData("machine.gates.cz_error=0.1.2")]
    [InlineData("machine.gates.cz_error={ likely = 1e-3")]
    [InlineData("machine.gates=5")]
    [InlineData("machine.gates.cz_error.x=5")]
    [InlineData("machine.readout.use=nothing-like-that")]
    [InlineData("machine=nowhere.toml")]
    [InlineData("goal.prefer=cheapest")]
    [InlineData("...=1")]
    public async Task A_setting_that_cannot_be_is_a_fault(string setting)
    {
        using TemporaryFolder folder = new();

        CommandRun run = await ReportIntoOldFiles(folder, CommandRun.FirstReport, "--set", setting);

        Assert.All(run.Faults, fault => Assert.StartsWith("--set: ", fault, StringComparison.Ordinal));
    }

    /// <summary>Asks for all three outputs where old files stand, and holds the run to what every wrong input must give.</summary>
    private static async Task<CommandRun> ReportIntoOldFiles(TemporaryFolder folder, string scenario, params string[] more)
    {
        string[] outputs = [folder.At("r.md"), folder.At("r.html"), folder.At("r.json")];
        Array.ForEach(outputs, path => File.WriteAllText(path, "old"));
        string[] before = Directory.GetFileSystemEntries(folder.Root);
        string[] figures = more.Contains("--json") ? [] : ["--json", outputs[2]];

        CommandRun run = await CommandRun.Of(["report", scenario, "--out", outputs[0], "--html", outputs[1], .. figures, .. more]);

        Assert.Equal(ExitStatus.WrongInput, run.Status);
        Assert.Empty(run.Output);
        Assert.NotEmpty(run.Faults);
        Assert.DoesNotContain("   at ", run.Error, StringComparison.Ordinal);
        Assert.DoesNotContain("Exception", run.Error, StringComparison.Ordinal);
        Assert.All(outputs, path => Assert.Equal("old", File.ReadAllText(path)));
        Assert.Equal(before.Order(StringComparer.Ordinal), Directory.GetFileSystemEntries(folder.Root).Order(StringComparer.Ordinal));
        return run;
    }

    private static void CopyScenario(TemporaryFolder folder)
    {
        foreach (string name in (string[])[Scenario, Machine, "workloads/spin-lattice.toml"])
        {
            folder.Write(name, File.ReadAllText(RepositoryFiles.At(["scenarios", .. name.Split('/')])).ReplaceLineEndings("\n"));
        }
    }

    /// <summary>Replaces the one line that starts like that; gives its number.</summary>
    private static int ChangeLine(string path, string start, string changed)
    {
        string[] lines = File.ReadAllLines(path);
        int index = Array.IndexOf(lines, lines.Single(line => line.StartsWith(start, StringComparison.Ordinal)));
        lines[index] = changed;
        File.WriteAllLines(path, lines);
        return index + 1;
    }
}
