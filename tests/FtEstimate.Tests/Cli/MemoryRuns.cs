using System.Globalization;
using System.Text.Json;
using FtEstimate.Cli;

namespace FtEstimate.Tests.Cli;

/// <summary>Small runs of the memory command.</summary>
internal static class MemoryRuns
{
    public static readonly string[] Small = ["memory", "--uniform", "1e-2", "--distance", "3,5", "--rounds", "3", "--shots", "3e3", "--decoder", "union-find", "--seed", "5"];

    public static Task<CommandRun> Of(params string[] more) => CommandRun.Of([.. Small, .. more]);

    /// <summary>Interrupts the run at its first line of progress.</summary>
    public static async Task<CommandRun> InterruptedOf(params string[] more)
    {
        using CancellationTokenSource interruption = new();
        using StringWriter output = new(CultureInfo.InvariantCulture);
        using InterruptingWriter error = new(interruption);
        int status = await App.RunAsync([.. Small, "--progress", .. more], output, error, interruption.Token);
        return new CommandRun(status, output.ToString(), error.ToString());
    }

    /// <summary>Shots and failures of each experiment in a file of figures.</summary>
    public static (long Shots, long Failures)[] CountsIn(string path)
    {
        using JsonDocument json = JsonDocument.Parse(File.ReadAllText(path));
        return [.. json.RootElement.GetProperty("experiments").EnumerateArray().Select(item => (item.GetProperty("shots").GetInt64(), item.GetProperty("failures").GetInt64()))];
    }

    private sealed class InterruptingWriter(CancellationTokenSource interruption) : StringWriter(CultureInfo.InvariantCulture)
    {
        public override void WriteLine(string? value)
        {
            base.WriteLine(value);
            interruption.Cancel();
        }
    }
}
