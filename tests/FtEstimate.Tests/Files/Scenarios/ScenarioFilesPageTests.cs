using FtEstimate.Files.Scenarios;

namespace FtEstimate.Tests.Files.Scenarios;

public class ScenarioFilesPageTests
{
    private const string Begin = "<!-- keys: generated; run the tests with UPDATE_GOLDEN=1 to renew -->\n";
    private const string End = "<!-- end of keys -->\n";

    private static readonly string Page = RepositoryFiles.At("docs", "scenario-files.md");

    [Fact]
    public void The_page_lists_exactly_the_keys_that_are_read()
    {
        string page = File.ReadAllText(Page).ReplaceLineEndings("\n");
        int begin = page.IndexOf(Begin, StringComparison.Ordinal) + Begin.Length;
        int end = page.IndexOf(End, StringComparison.Ordinal);
        string renewed = $"{page[..begin]}\n{ScenarioKeysTable.Render()}\n{page[end..]}";
        if (RepositoryFiles.AreRenewed)
        {
            File.WriteAllText(Page, renewed);
        }
        else
        {
            Assert.Equal(renewed, page);
        }
    }

    [Theory]
    [InlineData("cz_eror = 5e-3", "unknown key; did you mean cz_error?")]
    [InlineData("cz_time_ns = 270", "unknown key; the unit is part of the key: did you mean cz_time_us = 0.27?")]
    public void The_faults_the_page_shows_are_the_ones_the_reader_gives(string line, string message)
    {
        string[] faults = Reading.FaultsOfMachine("[gates]", "[gates]\n" + line);

        Assert.Contains(faults, fault => fault.EndsWith(message, StringComparison.Ordinal));
        Assert.Contains(message, File.ReadAllText(Page), StringComparison.Ordinal);
    }
}
