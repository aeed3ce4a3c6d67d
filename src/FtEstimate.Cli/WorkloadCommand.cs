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
            string path = parsed.GetRequiredValue(file);
            OutputPlaces places = options.Places(parsed);
            WorkloadReading reading = ScenarioReader.ReadWorkload(path, options.Settings(parsed));
            if (FaultOutput.Stop([.. reading.Faults, .. places.Faults([path])], error) || reading.Workload is not { } workload)
            {
                return ExitStatus.WrongInput;
            }

            bool written = ReportOutput.Write(WorkloadReport.Of(workload), () => JsonFigures.Of(workload), places, output, error);
            return written ? ExitStatus.Answer : ExitStatus.WrongInput;
        });
        return command;
    }
}
