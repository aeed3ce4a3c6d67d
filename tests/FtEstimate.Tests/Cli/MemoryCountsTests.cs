using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

/// <summary>Keeping, continuing and adding up counts.</summary>
public sealed class MemoryCountsTests
{
    [Fact]
    public async Task An_interrupted_and_resumed_run_equals_an_uninterrupted_one()
    {
        using TemporaryFolder folder = new();
        await MemoryRuns.Of("--json", folder.At("whole.json"));

        CommandRun interrupted = await MemoryRuns.InterruptedOf("--counts", folder.At("c.json"), "--json", folder.At("part.json"));
        CommandRun resumed = await MemoryRuns.Of("--resume", folder.At("c.json"), "--json", folder.At("resumed.json"));

        Assert.Equal(ExitStatus.Interrupted, interrupted.Status);
        Assert.Contains($"interrupted; the same command with --resume {folder.At("c.json")} continues", interrupted.Error, StringComparison.Ordinal);
        Assert.Contains("of 12,000 shots were run", interrupted.Output, StringComparison.Ordinal);
        Assert.InRange(MemoryRuns.CountsIn(folder.At("part.json")).Sum(count => count.Shots), 256, 11_999);
        Assert.Equal((ExitStatus.Answer, ""), (resumed.Status, resumed.Error));
        Assert.Equal(MemoryRuns.CountsIn(folder.At("whole.json")), MemoryRuns.CountsIn(folder.At("resumed.json")));
    }

    [Fact]
    public async Task A_finished_run_is_resumed_without_a_shot()
    {
        using TemporaryFolder folder = new();
        await MemoryRuns.Of("--counts", folder.At("c.json"));
        string counts = File.ReadAllText(folder.At("c.json"));

        Assert.Equal(ExitStatus.Answer, (await MemoryRuns.Of("--resume", folder.At("c.json"))).Status);
        Assert.Equal(counts, File.ReadAllText(folder.At("c.json")));
    }

    [Fact]
    public async Task Shards_added_up_equal_the_whole_and_some_of_them_say_so()
    {
        using TemporaryFolder folder = new();
        await MemoryRuns.Of("--json", folder.At("whole.json"));
        for (int shard = 1; shard <= 3; shard++)
        {
            string file = FormattableString.Invariant($"{shard}.json");
            Assert.Equal(ExitStatus.Answer, (await MemoryRuns.Of("--shard", FormattableString.Invariant($"{shard}/3"), "--counts", folder.At(file))).Status);
        }

        CommandRun some = await CommandRun.Of("memory", "--merge", folder.At("3.json"), folder.At("1.json"));
        CommandRun all = await CommandRun.Of(
            "memory", "--merge", folder.At("1.json"), folder.At("3.json"), folder.At("2.json"), "--json", folder.At("merged.json"));

        Assert.Matches(@"\d{4} of 12,000 shots were run, from 2 counts files", some.Output);
        Assert.Equal((ExitStatus.Answer, ""), (all.Status, all.Error));
        Assert.DoesNotContain("shots were run", all.Output, StringComparison.Ordinal);
        Assert.Equal(MemoryRuns.CountsIn(folder.At("whole.json")), MemoryRuns.CountsIn(folder.At("merged.json")));
    }

    [Theory]
    [InlineData("decoder: union-find there, matching here", "--decoder", "matching")]
    [InlineData("seed: 5 there, 6 here", "--seed", "6")]
    [InlineData("shots: 3000 there, 4000 here", "--shots", "4000")]
    [InlineData("uniform.pair: 0.01 there, 0.02 here", "--uniform", "2e-2")]
    [InlineData("uniform.name: every-place there, slow-readout here", "--noise", "slow-readout")]
    [InlineData("distance 3 rounds 4 basis z", "--rounds", "4")]
    [InlineData("shard: 1/1 there, 1/2 here", "--shard", "1/2")]
    public async Task Counts_of_another_question_are_not_continued(string difference, string option, string value)
    {
        using TemporaryFolder folder = new();
        await MemoryRuns.Of("--counts", folder.At("c.json"));
        string[] asked = [.. MemoryRuns.Small];
        int place = Array.IndexOf(asked, option);
        asked = place < 0 ? [.. asked, option, value] : [.. asked[..(place + 1)], value, .. asked[(place + 2)..]];

        await RefusedAndUntouched(folder, difference, [.. asked, "--resume", folder.At("c.json")]);
    }

    [Fact]
    public async Task A_damaged_file_is_neither_continued_nor_added()
    {
        using TemporaryFolder folder = new();
        await MemoryRuns.Of("--counts", folder.At("c.json"));
        string text = File.ReadAllText(folder.At("c.json"));
        folder.Write("cut.json", text[..(text.Length / 2)]);
        folder.Write("edited.json", text.Replace("\"failures\": ", "\"failures\": 1", StringComparison.Ordinal));

        await RefusedAndUntouched(folder, "its end is missing", [.. MemoryRuns.Small, "--resume", folder.At("cut.json")]);
        await RefusedAndUntouched(folder, "the file was edited or damaged", [.. MemoryRuns.Small, "--resume", folder.At("edited.json")]);
        CommandRun merge = await RefusedAndUntouched(
            folder, "2 faults; nothing was computed", "memory", "--merge", folder.At("cut.json"), folder.At("c.json"), folder.At("edited.json"));
        Assert.Contains("its end is missing", merge.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Shards_with_common_shots_and_other_questions_are_not_added()
    {
        using TemporaryFolder folder = new();
        await MemoryRuns.Of("--shard", "1/2", "--counts", folder.At("a.json"));
        await MemoryRuns.Of("--shard", "3/4", "--counts", folder.At("b.json"));
        await MemoryRuns.Of("--shard", "2/2", "--basis", "z", "--counts", folder.At("c.json"));

        CommandRun run = await RefusedAndUntouched(
            folder, "2 faults; nothing was computed", "memory", "--merge", folder.At("a.json"), folder.At("b.json"), folder.At("c.json"));

        Assert.Contains($"{folder.At("b.json")}: shard 3/4 has shots in common with shard 1/2 in {folder.At("a.json")}", run.Error, StringComparison.Ordinal);
        Assert.Contains($"{folder.At("c.json")}: answers another question than {folder.At("a.json")}: experiments: ", run.Error, StringComparison.Ordinal);
    }

    private static async Task<CommandRun> RefusedAndUntouched(TemporaryFolder folder, string why, params string[] args)
    {
        Dictionary<string, string> before = Directory.GetFiles(folder.Root).ToDictionary(path => path, File.ReadAllText);
        CommandRun run = await CommandRun.Of([.. args, "--json", folder.At("new.json")]);

        Assert.Equal((ExitStatus.WrongInput, ""), (run.Status, run.Output));
        Assert.Contains(why, run.Error, StringComparison.Ordinal);
        Assert.Equal(before, Directory.GetFiles(folder.Root).ToDictionary(path => path, File.ReadAllText));
        return run;
    }
}
