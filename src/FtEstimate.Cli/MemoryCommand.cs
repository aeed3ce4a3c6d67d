using System.Collections.Immutable;
using System.CommandLine;
using FtEstimate.Files;
using FtEstimate.Files.Counts;
using FtEstimate.Files.Scenarios;
using FtEstimate.MagicStates;
using FtEstimate.Reports.Json;
using FtEstimate.Reports.Memory;
using FtEstimate.Simulation.Memory;
using FtEstimate.Sizing;

namespace FtEstimate.Cli;

/// <summary>`memory SCENARIO` or `memory --uniform P`: simulates memory experiments and holds them against the scaling law.</summary>
internal static class MemoryCommand
{
    /// <summary>The command.</summary>
    public static Command Create()
    {
        MemoryOptions options = new();
        OutputOptions output = new();
        Command command = new("memory", "Simulate memory experiments of this machine's round, and hold them against the scaling law");
        options.AddTo(command);
        output.AddTo(command);
        command.SetAction((parsed, cancel) => Task.Run(() => Run(parsed, options, output, cancel), CancellationToken.None));
        return command;
    }

    private static int Run(ParseResult parsed, MemoryOptions options, OutputOptions output, CancellationToken cancel)
    {
        TextWriter error = parsed.InvocationConfiguration.Error;
        List<Fault> faults = [];
        MemoryRequest request = MemoryRequest.Of(parsed, options, output, faults);
        OutputPlaces places = output.Places(parsed) with { Counts = request.CountsPath };
        if (request.Merge.Length > 0)
        {
            ImmutableArray<MemoryCounts> shards = CountsMerge.Read(request.Merge, faults);
            return FaultOutput.Stop([.. faults, .. places.Faults(request.Merge)], error)
                ? ExitStatus.WrongInput
                : Report(MemoryResults.Of(shards), places, parsed.InvocationConfiguration);
        }

        ScenarioReading? reading = request.Scenario is { } path ? ScenarioReader.Read(path, output.Settings(parsed)) : null;
        CountsReading? old = request is { Continues: true, CountsPath: { } oldPath } ? CountsFile.Read(oldPath) : null;
        faults.InsertRange(0, reading?.Faults ?? []);
        faults.AddRange(old?.Fault is { } fault ? [fault] : []);
        faults.AddRange(places.Faults(reading?.Files ?? []));
        if (FaultOutput.Stop(faults, error))
        {
            return ExitStatus.WrongInput;
        }

        MemorySubject subject = reading?.Scenario is { } scenario
            ? MemorySubject.Of(new MachineSizing(new FactoryCatalogue()).Find(scenario))
            : request.Uniform!;
        MemoryQuestion question = new(subject.Noise, request.Settings, request.Decoder, request.Shots, request.Seed);
        if (old?.Counts is { } counted && FaultOutput.Stop(CountsMerge.FaultsOfResuming(request.CountsPath!, counted, question, request.Shard), error))
        {
            return ExitStatus.WrongInput;
        }

        using MemoryProgress progress = MemoryProgress.To(error, parsed.GetValue(options.Progress));
        MemorySession session = new(question, request.Threads, request.RelativeError, progress);
        MemoryCounts begun = MemoryCounts.Begin(question, subject.Origin, request.Shard);
        return Finish(session, old?.Counts is { } kept ? begun with { Experiments = kept.Experiments } : begun, places, parsed.InvocationConfiguration, cancel);
    }

    private static int Finish(
        MemorySession session, MemoryCounts begun, OutputPlaces places, InvocationConfiguration io, CancellationToken cancel)
    {
        MemoryCounts counts;
        bool isInterrupted;
        using (Interruption interruption = new(cancel))
        {
            counts = session.Run(begun, interruption.Token);
            isInterrupted = interruption.Token.IsCancellationRequested && !session.IsDone(counts);
        }

        Fault? fault = places.Counts is { } path ? AtomicFile.Write(path, CountsFile.Text(counts)) : null;
        int status = Report(MemoryResults.Of([counts]), places, io);
        if (fault is not null)
        {
            FaultOutput.Write([fault], io.Error);
            return ExitStatus.WrongInput;
        }

        if (isInterrupted)
        {
            io.Error.WriteLine(places.Counts is { } kept
                ? $"interrupted; the same command with --resume {kept} continues"
                : "interrupted; the report holds what was counted so far");
        }

        return status == ExitStatus.Answer && isInterrupted ? ExitStatus.Interrupted : status;
    }

    private static int Report(MemoryResults results, OutputPlaces places, InvocationConfiguration io) =>
        ReportOutput.Write(MemoryReport.Of(results), () => JsonFigures.Of(results), places, io.Output, io.Error) ? ExitStatus.Answer : ExitStatus.WrongInput;
}
