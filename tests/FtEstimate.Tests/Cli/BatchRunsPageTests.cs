using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

public sealed class BatchRunsPageTests
{
    [Fact]
    public void The_page_quotes_the_script_as_it_is()
    {
        string page = File.ReadAllText(RepositoryFiles.At("docs", "batch-runs.md")).ReplaceLineEndings("\n");
        string script = File.ReadAllText(RepositoryFiles.At("docs", "slurm-array.sh")).ReplaceLineEndings("\n");

        Assert.Contains($"```sh\n{script}```\n", page, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Options_on_the_page_exist()
    {
        string page = File.ReadAllText(RepositoryFiles.At("docs", "batch-runs.md"));
        string help = (await CommandRun.Of("memory", "--help")).Output;
        string[] slurm = ["--array", "--cpus-per-task", "--job-name", "--time", "--signal", "--requeue", "--open-mode", "--output"];
        string[] named = [.. System.Text.RegularExpressions.Regex.Matches(page, @"--[a-z][a-z-]+").Select(match => match.Value).Distinct().Except(slurm)];

        Assert.NotEmpty(named);
        Assert.All(named, option => Assert.Contains(option, help, StringComparison.Ordinal));
    }
}
