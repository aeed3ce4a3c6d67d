using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

public sealed class OutputPlacesTests
{
    [Fact]
    public async Task Places_in_missing_folders_are_all_named_and_no_folder_is_made()
    {
        using TemporaryFolder folder = new();

        CommandRun run = await CommandRun.FirstReportWith(
            "--out", folder.At("a/r.md"), "--html", folder.At("b/r.html"), "--json", folder.At("c/r.json"));

        Assert.Equal((ExitStatus.WrongInput, ""), (run.Status, run.Output));
        Assert.Equal(3, run.Faults.Length);
        Assert.All(run.Faults, fault => Assert.EndsWith("cannot be written: its folder does not exist", fault, StringComparison.Ordinal));
        Assert.Empty(Directory.GetFileSystemEntries(folder.Root));
    }

    [Theory]
    [InlineData("--out")]
    [InlineData("--html")]
    [InlineData("--json")]
    public async Task A_place_below_a_file_is_a_fault(string option)
    {
        using TemporaryFolder folder = new();
        string file = folder.Write("plain.txt", "kept");

        CommandRun run = await CommandRun.FirstReportWith(option, Path.Combine(file, "r.x"));

        Assert.Equal(ExitStatus.WrongInput, run.Status);
        Assert.Contains("cannot be written", Assert.Single(run.Faults), StringComparison.Ordinal);
        Assert.Equal("kept", File.ReadAllText(file));
    }

    [Theory]
    [InlineData("--out")]
    [InlineData("--html")]
    [InlineData("--json")]
    public async Task A_folder_is_no_place_for_an_output(string option)
    {
        using TemporaryFolder folder = new();

        CommandRun run = await CommandRun.FirstReportWith(option, folder.Root);

        Assert.Equal(ExitStatus.WrongInput, run.Status);
        Assert.Equal([$"{folder.Root}: cannot be written: it is a folder"], run.Faults);
        Assert.Empty(Directory.GetFileSystemEntries(folder.Root));
    }

    [Fact]
    public async Task An_output_never_replaces_an_input()
    {
        using TemporaryFolder folder = new();
        const string text = "name = \"w\"\n[counts]\nlogical_qubits = 1\nlogical_layers = 1\n";
        string path = folder.Write("w.toml", text);

        CommandRun run = await CommandRun.Of("workload", path, "--out", folder.At("./w.toml"));

        Assert.Equal(ExitStatus.WrongInput, run.Status);
        Assert.EndsWith("cannot be written: it is an input of this report", Assert.Single(run.Faults), StringComparison.Ordinal);
        Assert.Equal(text, File.ReadAllText(path));
    }

    [Fact]
    public async Task Two_outputs_cannot_share_a_file()
    {
        using TemporaryFolder folder = new();

        CommandRun run = await CommandRun.FirstReportWith("--out", folder.At("r"), "--html", folder.At("./r"));

        Assert.Equal(ExitStatus.WrongInput, run.Status);
        Assert.Contains("cannot be written twice", Assert.Single(run.Faults), StringComparison.Ordinal);
        Assert.Empty(Directory.GetFileSystemEntries(folder.Root));
    }
}
