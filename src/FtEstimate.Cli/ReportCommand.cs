using System.CommandLine;
using FtEstimate.Files.Scenarios;
using FtEstimate.MagicStates;
using FtEstimate.Reports.Estimate;
using FtEstimate.Reports.Json;
using FtEstimate.Sizing;

namespace FtEstimate.Cli;

/// <summary>`report SCENARIO`: how many atoms, how long, and why.</summary>
internal static class ReportCommand
{
    /// <summary>The command.</summary>
    public static Command Create()
    {
        Argument<string> scenario = new("scenario") { Description = "Scenario file (TOML)" };
        OutputOptions options = new();
        Command command = new("report", "How many atoms, how long, and why: the report on one scenario") { scenario };
        options.AddTo(command);
        command.SetAction(parsed => Run(
            parsed.GetRequiredValue(scenario),
            options.Settings(parsed),
            options.Places(parsed),
            parsed.InvocationConfiguration.Output,
            parsed.InvocationConfiguration.Error));
        return command;
    }

    private static int Run(
        string path, IReadOnlyList<string> settings, OutputPlaces places, TextWriter output, TextWriter error)
    {
        // a second core compiles the factory sums while this one reads files
        _ = Task.Run(FactoryCatalogue.WarmUp);
        ScenarioReading reading = ScenarioReader.Read(path, settings);
        if (FaultOutput.Stop([.. reading.Faults, .. places.Faults(reading.Files)], error) || reading.Scenario is not { } scenario)
        {
            return ExitStatus.WrongInput;
        }

        SizingResult result = new MachineSizing(new FactoryCatalogue()).Find(scenario);
        if (!ReportOutput.Write(EstimateReport.Of(result), () => JsonFigures.Of(result), places, output, error))
        {
            return ExitStatus.WrongInput;
        }

        return result.Best is null ? ExitStatus.NoMachine : ExitStatus.Answer;
    }
}
