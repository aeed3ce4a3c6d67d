using FtEstimate.Cli;

namespace FtEstimate.Tests.Cli;

public sealed class CommandLineTests
{
    [Fact]
    public async Task Without_arguments_the_help_lists_the_commands()
    {
        CommandRun run = await CommandRun.Of();

        Assert.Equal((ExitStatus.Answer, ""), (run.Status, run.Error));
        Assert.All((string[])["report", "workload", "factories", "memory"], name => Assert.Contains($"\n  {name} ", run.Output.ReplaceLineEndings("\n"), StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("report")]
    [InlineData("workload")]
    [InlineData("factories")]
    [InlineData("memory")]
    public async Task Every_command_explains_itself(string command)
    {
        CommandRun run = await CommandRun.Of(command, "--help");

        Assert.Equal((ExitStatus.Answer, ""), (run.Status, run.Error));
        Assert.All((string[])["--out", "--html", "--json", "--set"], option => Assert.Contains(option, run.Output, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("reprot")]
    [InlineData("report")]
    [InlineData("workload")]
    [InlineData("report", "a.toml", "b.toml")]
    [InlineData("report", "a.toml", "--otu", "r.md")]
    [InlineData("report", "a.toml", "--out")]
    [InlineData("report", "a.toml", "--set")]
    [InlineData("report", "@a.toml")]
    [InlineData("report", "")]
    [InlineData("--frobnicate")]
    public async Task A_wrong_command_line_is_explained_on_standard_error_only(params string[] args)
    {
        CommandRun run = await CommandRun.Of(args);

        Assert.Equal((ExitStatus.WrongInput, ""), (run.Status, run.Output));
        Assert.NotEmpty(run.Error.Trim());
        Assert.DoesNotContain("   at ", run.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_misspelt_command_brings_the_nearest_one() =>
        Assert.Contains("report", (await CommandRun.Of("reprot")).Error, StringComparison.Ordinal);
}
