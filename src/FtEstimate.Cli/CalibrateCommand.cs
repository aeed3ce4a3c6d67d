using System.Collections.Immutable;
using System.CommandLine;
using FtEstimate.Files;
using FtEstimate.Files.Calibration;
using FtEstimate.Reports.Listings;
using FtEstimate.Reports.Writers;
using FtEstimate.Simulation.Calibration;

namespace FtEstimate.Cli;

/// <summary>`calibrate FOLDER`: runs the experiments behind the simulated law, fits it, and writes both into the folder.</summary>
internal static class CalibrateCommand
{
    /// <summary>The command.</summary>
    public static Command Create()
    {
        Argument<string> folder = new("folder") { Description = $"Folder that holds, or gets, {CalibrationTable.FileName} and {FittedLawFile.FileName}" };
        Option<string?> page = new("--page") { Description = "Also write the fit as a Markdown page", HelpName = "FILE" };
        Option<int> threads = new("--threads") { Description = "Threads; default: one for each processor", DefaultValueFactory = _ => Environment.ProcessorCount };
        Command command = new("calibrate", "Run the memory experiments behind the simulated law and fit it: what is done already is kept") { folder, threads, page };
        command.Validators.Add(result =>
        {
            if (result.GetResult(threads) is { Implicit: false } && result.GetValue(threads) < 1)
            {
                result.AddError("--threads: expected at least 1");
            }
        });
        command.SetAction((parsed, cancel) => Task.FromResult(Run(
            parsed.GetRequiredValue(folder), parsed.GetValue(threads), parsed.GetValue(page), parsed.InvocationConfiguration.Error, cancel)));
        return command;
    }

    private static int Run(string folder, int threads, string? page, TextWriter error, CancellationToken cancel)
    {
        CalibrationReading reading = CalibrationTable.ReadFile(Path.Combine(folder, CalibrationTable.FileName));
        if (FaultOutput.Stop(reading.Faults, error))
        {
            return ExitStatus.WrongInput;
        }

        using Interruption interruption = new(cancel);
        List<CalibrationResult> results = [.. reading.Results];
        while (results.Count < CalibrationGrid.Cells.Length)
        {
            int index = results.Count;
            CalibrationResult result = CalibrationRun.Run(index, threads, interruption.Token);
            if (interruption.Token.IsCancellationRequested)
            {
                return ExitStatus.Interrupted;
            }

            results.Add(result);
            if (FaultOutput.Stop(Faults(CalibrationTable.WriteFile(folder, results)), error))
            {
                return ExitStatus.WrongInput;
            }

            error.WriteLine(FormattableString.Invariant(
                $"{results.Count} of {CalibrationGrid.Cells.Length}: {result.Cell.Mix}, distance {result.Cell.Distance}, {result.Cell.Basis}: {result.Count.Failures} of {result.Count.Shots}"));
        }

        FittedLaw law = LawFit.Of([.. results]);
        ImmutableArray<Fault> faults =
        [
            .. Faults(FittedLawFile.Write(folder, law)),
            .. page is null ? [] : Faults(AtomicFile.Write(page, MarkdownWriter.Write(LawReport.Of(law)))),
        ];
        return FaultOutput.Stop(faults, error) ? ExitStatus.WrongInput : ExitStatus.Answer;
    }

    private static ImmutableArray<Fault> Faults(Fault? fault) => fault is null ? [] : [fault];
}
