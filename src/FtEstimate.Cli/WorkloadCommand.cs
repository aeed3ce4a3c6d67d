using System.CommandLine;
using FtEstimate.Files.Scenarios;
using FtEstimate.Reports.Json;
using FtEstimate.Reports.Listings;

namespace FtEstimate.Cli;

/// <summary>`workload FILE`: how big an algorithm is.</summary>
internal static class WorkloadCommand
{
    /// <summary>The command.</summary>
    public static Command Create()
    {
        Argument<string> file = new("file") { Description = "Workload file (TOML)" };
        OutputOptions options = new();
        Command command = new("workload", "How big an algorithm is: qubits, T states, Toffolis, rotations, depth, with their formulas") { file };
        options.AddTo(command);
        command.SetAction(parsed =>
        {
            TextWriter output = parsed.InvocationConfiguration.Output;
            TextWriter error = parsed.InvocationConfiguration.Error;
            WorkloadReading reading = ScenarioReader.ReadWorkload(parsed.GetRequiredValue(file), options.Settings(parsed));
            if (reading.Workload is not { } workload)
            {
                FaultOutput.Write(reading.Faults, error);
                return ExitStatus.WrongInput;
            }

            bool written = ReportOutput.Write(
                WorkloadReport.Of(workload), () => JsonFigures.Of(workload), options.Places(parsed), output, error);
            return written ? ExitStatus.Answer : ExitStatus.WrongInput;
        });
        return command;
    }
}
