using System.Globalization;
using FtEstimate.Cli;
using FtEstimate.Files.Comparisons;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

public sealed class ValidationPageTests
{
    private static readonly string Published = RepositoryFiles.At("scenarios", "published");

    [Fact]
    public async Task The_page_shows_what_is_computed_today()
    {
        string page = RepositoryFiles.At("docs", "validation.md");
        CommandRun run = await CommandRun.Of("validation", Published);

        Assert.Equal((ExitStatus.Answer, ""), (run.Status, run.Error));
        if (RepositoryFiles.AreRenewed)
        {
            File.WriteAllText(page, run.Output);
        }

        Assert.Equal(File.ReadAllText(page).ReplaceLineEndings("\n"), run.Output);
    }

    // papers print two or three digits: half a unit of the second digit is up to 5 % of a number that starts with 1, so 3 % tells agreement from disagreement
    [Fact]
    public void A_figure_that_differs_by_more_than_three_per_cent_comes_with_its_reason()
    {
        ComparisonReading reading = ComparisonTable.Read(Published);

        Assert.Empty(reading.Faults);
        Assert.True(reading.Comparisons.Length > 30);
        Assert.All(
            reading.Comparisons.Where(comparison => Math.Abs(comparison.Deviation) > 0.03),
            comparison => Assert.False(
                string.IsNullOrWhiteSpace(comparison.Figure.Remark),
                string.Create(CultureInfo.InvariantCulture, $"{comparison.Figure.Subject} {comparison.Figure.Figure}: {comparison.Deviation:P1} and no remark")));
    }

    [Fact]
    public async Task A_folder_without_published_figures_is_a_fault()
    {
        using TemporaryFolder folder = new();
        CommandRun run = await CommandRun.Of("validation", folder.Root);

        Assert.Equal((ExitStatus.WrongInput, ""), (run.Status, run.Output));
        Assert.EndsWith("comparisons.csv: no such file", Assert.Single(run.Faults), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("T,scenario,nowhere.toml,atoms,1,s,")]
    [InlineData("T,factory,15-to-1:7,atoms,1,s,")]
    [InlineData("T,factory,\"15-to-1:7,3,3\",atoms,1,s,")]
    [InlineData("T,factory,\"15-to-1:7,3,3 @ much\",atoms,1,s,")]
    [InlineData("T,law,textbook @ 1e-3,per_round,1,s,")]
    [InlineData("T,law,textbook @ 1e-3 @ 2,per_round,1,s,")]
    [InlineData("T,law,nobody @ 1e-3 @ 3,per_round,1,s,")]
    [InlineData("T,distance,textbook @ 2e-2 @ 1e-15,code_distance,1,s,")]
    [InlineData("T,factoring,many,toffolis,1,s,")]
    [InlineData("T,rotation,ross,t_states,1,s,")]
    [InlineData("T,move,cubic @ 5500,seconds,1,s,")]
    [InlineData("T,move,cubic @ 0 @ 55,seconds,1,s,")]
    [InlineData("T,magic,x,y,1,s,")]
    [InlineData("T,law,textbook @ 1e-3 @ 3,per_round,many,s,")]
    [InlineData("T,law,textbook @ 1e-3 @ 3,per_round,nan,s,")]
    [InlineData("T,law,textbook @ 1e-3 @ 3,per_round,0,s,")]
    [InlineData("T,law")]
    public async Task A_line_that_gives_no_figure_is_a_fault_with_its_line(string line)
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("comparisons.csv", $"topic,kind,subject,figure,published,source,remark\n{line}\n");

        CommandRun run = await CommandRun.Of("validation", folder.Root);

        Assert.Equal((ExitStatus.WrongInput, ""), (run.Status, run.Output));
        Assert.StartsWith($"{path}(2,1): ", Assert.Single(run.Faults), StringComparison.Ordinal);
    }
}
