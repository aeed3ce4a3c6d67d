using System.Diagnostics;
using System.Globalization;
using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

/// <summary>Signals to the built program: Ctrl-C, and what a batch system sends when the time is up.</summary>
public sealed class MemorySignalTests
{
    [Theory]
    [InlineData("-INT")]
    [InlineData("-TERM")]
    public async Task A_signal_ends_the_run_with_its_counts_and_its_report(string signal)
    {
        if (OperatingSystem.IsWindows())
        {
            return;
        }

        using TemporaryFolder folder = new();
        string[] args = [.. MemoryRuns.Small, "--shots", "1e9", "--counts", folder.At("c.json"), "--progress"];
        args = [.. args.Where((_, i) => i != Array.IndexOf(args, "3e3") && i != Array.IndexOf(args, "3e3") - 1)];
        ProcessStartInfo start = new("dotnet", [Path.Combine(AppContext.BaseDirectory, "FtEstimate.Cli.dll"), .. args])
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            StandardOutputEncoding = System.Text.Encoding.UTF8,
        };
        using Process process = Process.Start(start)!;
        Task<string> output = process.StandardOutput.ReadToEndAsync();
        Assert.StartsWith("distance 3, basis z: 0 % of its shots", await process.StandardError.ReadLineAsync(), StringComparison.Ordinal);

        using Process kill = Process.Start("kill", [signal, process.Id.ToString(CultureInfo.InvariantCulture)]);
        Task<string> error = process.StandardError.ReadToEndAsync();
        await process.WaitForExitAsync();

        Assert.Equal(ExitStatus.Interrupted, process.ExitCode);
        Assert.Contains("interrupted; the same command with --resume", await error, StringComparison.Ordinal);
        Assert.Contains("of 4,000,000,000 shots were run", await output, StringComparison.Ordinal);
        Assert.Null(FtEstimate.Files.Counts.CountsFile.Read(folder.At("c.json")).Fault);
    }
}
