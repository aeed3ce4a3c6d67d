using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

public sealed class MemoryBadInputTests
{
    [Theory]
    [InlineData("memory: give either a scenario file, or --uniform P, or --merge FILE ...")]
    [InlineData("memory: give either a scenario file, or --uniform P, or --merge FILE ...", "--uniform", "1e-3", "some.toml")]
    [InlineData("--noise: says how rates follow from P and needs --uniform P", "some.toml", "--noise", "slow-readout")]
    [InlineData("--noise: expected every-place or slow-readout, found 'loud'", "--uniform", "1e-3", "--noise", "loud")]
    [InlineData("--set: replaces inputs of a scenario", "--uniform", "1e-3", "--set", "goal.failure_probability=0.1")]
    [InlineData("--uniform: expected a number between 1e-7 and 0.5, found '0'", "--uniform", "0")]
    [InlineData("--uniform: expected a number between 1e-7 and 0.5, found '-1e-3'", "--uniform=-1e-3")]
    [InlineData("--uniform: expected a number between 1e-7 and 0.5, found '0.5'", "--uniform", "0.5")]
    [InlineData("--uniform: expected a number between 1e-7 and 0.5, found '1,5'", "--uniform", "1,5")]
    [InlineData("--uniform: expected a number between 1e-7 and 0.5, found 'nan'", "--uniform", "nan")]
    [InlineData("--uniform: expected a number between 1e-7 and 0.1, found '0.1'", "--uniform", "0.1", "--noise", "slow-readout")]
    [InlineData("--distance: expected odd distances from 3 to 51 such as 3,5,7, found '4'", "--uniform", "1e-3", "--distance", "3,4")]
    [InlineData("found '1'", "--uniform", "1e-3", "--distance", "1")]
    [InlineData("found '53'", "--uniform", "1e-3", "--distance", "53")]
    [InlineData("found ''", "--uniform", "1e-3", "--distance", "3,")]
    [InlineData("--rounds: expected a whole number from 1 to 10000, found '0'", "--uniform", "1e-3", "--rounds", "0")]
    [InlineData("--shots: expected a whole number from 1 to 1e15, found '0'", "--uniform", "1e-3", "--shots", "0")]
    [InlineData("found '-5'", "--uniform", "1e-3", "--shots=-5")]
    [InlineData("found '2.5'", "--uniform", "1e-3", "--shots", "2.5")]
    [InlineData("found '1e16'", "--uniform", "1e-3", "--shots", "1e16")]
    [InlineData("found '1e99'", "--uniform", "1e-3", "--shots", "1e99")]
    [InlineData("found 'many'", "--uniform", "1e-3", "--shots", "many")]
    [InlineData("--basis: expected both or z or x, found 'y'", "--uniform", "1e-3", "--basis", "y")]
    [InlineData("--decoder: expected matching or union-find, found 'luck'", "--uniform", "1e-3", "--decoder", "luck")]
    [InlineData("--seed: expected a whole number from 0 to 18446744073709551615, found '1.5'", "--uniform", "1e-3", "--seed", "1.5")]
    [InlineData("--threads: expected a whole number from 1 to 1024, found '0'", "--uniform", "1e-3", "--threads", "0")]
    [InlineData("--accuracy: expected a relative error between 0 and 1 such as 5% or 0.05, found '0%'", "--uniform", "1e-3", "--accuracy", "0%")]
    [InlineData("--accuracy: expected a relative error between 0 and 1 such as 5% or 0.05, found '5'", "--uniform", "1e-3", "--accuracy", "5")]
    [InlineData("--shard: expected a share such as 1/4, from 1/4 to 4/4, found '0/4'", "--uniform", "1e-3", "--counts", "c.json", "--shard", "0/4")]
    [InlineData("found '5/4'", "--uniform", "1e-3", "--counts", "c.json", "--shard", "5/4")]
    [InlineData("found '1'", "--uniform", "1e-3", "--counts", "c.json", "--shard", "1")]
    [InlineData("--shard: needs --counts FILE", "--uniform", "1e-3", "--shard", "1/4")]
    [InlineData("--resume: writes back to its file; leave --counts out", "--uniform", "1e-3", "--counts", "c.json", "--resume", "d.json")]
    [InlineData("no such file", "--uniform", "1e-3", "--resume", "nowhere.json")]
    [InlineData("no such file", "--merge", "nowhere.json")]
    [InlineData("no such file", "nowhere.toml")]
    [InlineData("--merge: adds up counts that are there; it goes with no --uniform, --seed, a scenario", "a.toml", "--uniform", "1e-3", "--seed", "2", "--merge", "nowhere.json")]
    [InlineData("its folder does not exist", "--uniform", "1e-3", "--counts", "nowhere/c.json")]
    [InlineData("cannot be written twice", "--uniform", "1e-3", "--counts", "c.json", "--json", "c.json")]
    public async Task A_question_that_cannot_be_is_refused(string why, params string[] args)
    {
        using TemporaryFolder folder = new();

        CommandRun run = await CommandRun.Of(["memory", .. args, "--html", folder.At("m.html")]);

        Assert.Equal((ExitStatus.WrongInput, ""), (run.Status, run.Output));
        Assert.Contains(why, run.Error, StringComparison.Ordinal);
        Assert.DoesNotContain("   at ", run.Error, StringComparison.Ordinal);
        Assert.Empty(Directory.GetFileSystemEntries(folder.Root));
        Assert.False(File.Exists("c.json"));
    }

    [Fact]
    public async Task All_faults_come_at_once_those_of_files_included()
    {
        CommandRun run = await CommandRun.Of(
            "memory", CommandRun.FirstReport, "--set", "machine.gates.cz_error=2", "--distance", "4,6", "--shots", "0", "--basis", "q", "--resume", "nowhere.json", "--out", "nowhere/r.md");

        Assert.All(
            (string[])["--set: machine.gates.cz_error", "found '4'", "found '6'", "--shots", "--basis", "nowhere.json: no such file", "its folder does not exist"],
            expected => Assert.Contains(expected, run.Error, StringComparison.Ordinal));
    }

    [Fact]
    public async Task Outputs_do_not_replace_the_counts_that_are_added_up()
    {
        using TemporaryFolder folder = new();
        await MemoryRuns.Of("--counts", folder.At("c.json"));

        CommandRun run = await CommandRun.Of("memory", "--merge", folder.At("c.json"), "--json", folder.At("c.json"));

        Assert.Equal(ExitStatus.WrongInput, run.Status);
        Assert.Contains("it is an input of this report", run.Error, StringComparison.Ordinal);
    }
}
