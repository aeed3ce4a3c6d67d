using System.Text.Json;
using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

public sealed class FactoriesCommandTests
{
    // Litinski 2019 (arXiv:1905.06903), table 1, in print to two or three digits: half a unit of the last one, 2 % for the errors in two digits
    [Theory]
    [InlineData("1e-3", "15-to-1:17,7,7", 4620, 42.6, 4.5e-8)]
    [InlineData("1e-4", "15-to-1:7,3,3", 810, 18.1, 4.4e-8)]
    [InlineData("1e-3", "15-to-1:11,5,5*6 > 15-to-1:25,11,11", 30700, 82.5, 2.7e-12)]
    public async Task One_design_has_the_numbers_of_its_published_row(string error, string design, double atoms, double rounds, double outputError)
    {
        using TemporaryFolder folder = new();

        CommandRun run = await CommandRun.Of("factories", "--uniform", error, "--design", design, "--json", folder.At("f.json"));

        Assert.Equal(ExitStatus.Answer, run.Status);
        JsonElement factory = Assert.Single(Factories(folder.At("f.json")));
        Assert.Equal(design, factory.GetProperty("name").GetString());
        Assert.InRange(factory.GetProperty("atoms").GetDouble() / atoms, 0.995, 1.005);
        Assert.InRange(factory.GetProperty("rounds_per_output").GetDouble() / rounds, 0.995, 1.005);
        Assert.InRange(factory.GetProperty("output_error").GetDouble() / outputError, 0.98, 1.02);
        Assert.Contains($"`{design}`", run.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task The_list_holds_only_factories_that_no_other_beats_in_everything()
    {
        using TemporaryFolder folder = new();
        await CommandRun.Of("factories", "--uniform", "1e-3", "--json", folder.At("f.json"));
        Offer[] offers = [.. Factories(folder.At("f.json")).Select(Offer.Of)];

        Assert.True(offers.Length > 10);
        Assert.All(offers, offer => Assert.DoesNotContain(offers, other => other.Beats(offer)));
    }

    [Fact]
    public async Task The_whole_grid_holds_the_list_and_marks_it()
    {
        using TemporaryFolder folder = new();
        await CommandRun.Of("factories", "--uniform", "1e-3", "--json", folder.At("list.json"));
        await CommandRun.Of("factories", "--uniform", "1e-3", "--all", "--json", folder.At("all.json"));
        JsonElement[] all = Factories(folder.At("all.json"));

        Assert.True(all.Length > 1000);
        Assert.Equal(
            Factories(folder.At("list.json")).Select(NameOf).Order(StringComparer.Ordinal),
            all.Where(factory => factory.GetProperty("unbeaten").GetBoolean()).Select(NameOf).Order(StringComparer.Ordinal));
    }

    [Fact]
    public async Task A_scenario_gives_the_factories_at_its_own_noise()
    {
        CommandRun run = await CommandRun.Of("factories", CommandRun.FirstReport);

        Assert.Equal((ExitStatus.Answer, ""), (run.Status, run.Error));
        Assert.StartsWith("# Magic states for Spin lattice on the Brindle Fell array\n", run.Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("Give either a scenario file or --uniform P.")]
    [InlineData("Give either a scenario file or --uniform P.", "--uniform", "1e-3", "some.toml")]
    [InlineData("Give either --all or --design.", "--uniform", "1e-3", "--all", "--design", "15-to-1:17,7,7")]
    [InlineData("--set replaces inputs of a scenario", "--uniform", "1e-3", "--set", "goal.failure_probability=0.1")]
    [InlineData("found '1,5'", "--uniform", "1,5")]
    [InlineData("found '0'", "--uniform", "0")]
    [InlineData("found '-1e-3'", "--uniform=-1e-3")]
    [InlineData("found '0.5'", "--uniform", "0.5")]
    [InlineData("found 'nan'", "--uniform", "nan")]
    [InlineData("expected three distances", "--uniform", "1e-3", "--design", "15-to-1:17,7")]
    [InlineData("a distance must be odd", "--uniform", "1e-3", "--design", "15-to-1:16,7,7")]
    [InlineData("protocol \"20-to-4\" is not modelled", "--uniform", "1e-3", "--design", "20-to-4:17,7,7")]
    public async Task A_question_that_cannot_be_is_refused(string why, params string[] args)
    {
        CommandRun run = await CommandRun.Of(["factories", .. args]);

        Assert.Equal((ExitStatus.WrongInput, ""), (run.Status, run.Output));
        Assert.Contains(why, run.Error, StringComparison.Ordinal);
    }

    private static JsonElement[] Factories(string path)
    {
        using JsonDocument json = JsonDocument.Parse(File.ReadAllText(path));
        return [.. json.RootElement.Clone().GetProperty("factories").EnumerateArray()];
    }

    private static string NameOf(JsonElement factory) => factory.GetProperty("name").GetString()!;

    private sealed record Offer(double Atoms, double Rounds, double Error)
    {
        public static Offer Of(JsonElement factory) => new(
            factory.GetProperty("atoms").GetDouble(), factory.GetProperty("rounds_per_output").GetDouble(), factory.GetProperty("output_error").GetDouble());

        public bool Beats(Offer other) => this != other && Atoms <= other.Atoms && Rounds <= other.Rounds && Error <= other.Error;
    }
}
