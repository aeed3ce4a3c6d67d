using System.Text.Json;
using CsCheck;
using FtEstimate.Cli;
using FtEstimate.Files.Scenarios;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

public sealed class RandomSettingsTests
{
    private static readonly Given[] Numbers =
    [
        .. ScenarioReader.Read(CommandRun.FirstReport, []).Scenario!.Inputs.InOrder
            .Where(input => input.Number is not null)
            .Select(input => new Given(input.Path, input.Number!.Value)),
    ];

    // numbers of the demonstration, up to a thousand times larger or smaller, up to three at a time
    private static readonly Gen<string[]> Settings =
        from changes in Gen.Select(Gen.Int[0, Numbers.Length - 1], Gen.Double[-3, 3]).Array[1, 3]
        select changes.SelectMany(change => Setting(Numbers[change.Item1], change.Item2)).ToArray();

    [Fact]
    public void Any_numbers_give_an_answer_a_reason_or_a_fault_and_never_a_number_that_is_none() => Settings.Sample(
        settings =>
        {
            using TemporaryFolder folder = new();
            CommandRun run = CommandRun.FirstReportWith([.. settings, "--json", folder.At("r.json")]).GetAwaiter().GetResult();
            if (run.Status == ExitStatus.WrongInput)
            {
                Assert.NotEmpty(run.Faults);
                Assert.Empty(run.Output);
                return;
            }

            Assert.Contains(run.Status, (int[])[ExitStatus.Answer, ExitStatus.NoMachine]);
            Assert.DoesNotMatch("NaN|∞|Infinity", run.Output);
            using JsonDocument json = JsonDocument.Parse(File.ReadAllText(folder.At("r.json")));
            Assert.Equal(run.Status == ExitStatus.NoMachine, json.RootElement.GetProperty("answer").ValueKind == JsonValueKind.Null);
        },
        iter: 40,
        threads: 1);

    private static string[] Setting(Given input, double exponent)
    {
        double value = input.Value * Math.Pow(10, exponent);
        return ["--set", FormattableString.Invariant($"{input.Path}={(input.Value == Math.Round(input.Value) ? Math.Ceiling(value) : value)}")];
    }

    private sealed record Given(string Path, double Value);
}
