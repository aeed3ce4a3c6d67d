using System.Text.RegularExpressions;
using FtEstimate.Cli;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Tests.Cli;

public sealed class RareCommandTests
{
    // 5 combined standard errors; at distance 3 plain Monte Carlo still sees the failures
    [Fact]
    public async Task The_rare_failure_agrees_with_plain_counting_where_both_can_see_it()
    {
        CommandRun run = await CommandRun.Of("rare", "--uniform", "5e-4", "--distance", "3", "--walkers", "32", "--threads", "2");
        double perRound = double.Parse(Regex.Match(run.Output, @"error per round is ([0-9.e-]+),").Groups[1].Value, System.Globalization.CultureInfo.InvariantCulture);
        double standardError = double.Parse(Regex.Match(run.Output, @"standard error of ([0-9.]+) %").Groups[1].Value, System.Globalization.CultureInfo.InvariantCulture) / 100;
        MemoryExperiment experiment = MemoryExperiment.Of(TextbookCircuit.Of(3, 9, PauliBasis.Z, UniformNoise.EveryPlace(5e-4)), DecoderKind.Matching);
        ShotCount counted = MemoryRun.Run(experiment, new MemoryPlan(1_000_000, 3, Shard.Whole), default, 2, null, CancellationToken.None).Count;

        Assert.Equal(ExitStatus.Answer, run.Status);
        double expected = ErrorEstimate.PerShot(counted).PerRound(9).Value;
        Assert.InRange(perRound / expected, 1 - (5 * (standardError + 0.023)), 1 + (5 * (standardError + 0.023)));
        Assert.InRange(standardError, 0.001, 0.2);
    }

    [Theory]
    [InlineData("--distance", "4", "odd number from 3 to 51")]
    [InlineData("--walkers", "1", "at least 2")]
    [InlineData("--threads", "0", "at least 1")]
    [InlineData("--uniform", "0", "between 1E-05 and 0.02")]
    [InlineData("--rounds", "100000", "at most 1000")]
    [InlineData("--uniform", "0.015", "failures are not rare")]
    [InlineData("--seed", "1.5", "whole number")]
    public async Task A_question_that_cannot_be_asked_is_refused(string option, string value, string reason)
    {
        string[] uniform = option == "--uniform" ? [] : ["--uniform", "1e-3"];
        CommandRun run = await CommandRun.Of(["rare", .. uniform, option, value]);

        Assert.Equal(ExitStatus.WrongInput, run.Status);
        Assert.Contains(reason, run.Error, StringComparison.Ordinal);
        Assert.Empty(run.Output);
    }
}
