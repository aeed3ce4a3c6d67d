using System.Collections.Immutable;
using System.CommandLine;
using FtEstimate.Files;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Cli;

/// <summary>What the memory command is asked to do.</summary>
/// <param name="Scenario">Scenario file; null: none.</param>
/// <param name="Uniform">Textbook circuit and its origin instead of a scenario; null: none.</param>
/// <param name="Settings">The experiments.</param>
/// <param name="Decoder">The decoder.</param>
/// <param name="Shots">Shots of each.</param>
/// <param name="Seed">Seed.</param>
/// <param name="Threads">Threads.</param>
/// <param name="RelativeError">Where an experiment ends early; 0: it does not.</param>
/// <param name="Shard">Which share.</param>
/// <param name="CountsPath">Where counts go; null: nowhere.</param>
/// <param name="Continues">Whether counts are read from there first.</param>
/// <param name="Merge">Counts files to add up; empty: simulate.</param>
internal sealed record MemoryRequest(
    string? Scenario,
    MemorySubject? Uniform,
    ImmutableArray<MemorySetting> Settings,
    DecoderKind Decoder,
    long Shots,
    ulong Seed,
    int Threads,
    double RelativeError,
    Shard Shard,
    string? CountsPath,
    bool Continues,
    ImmutableArray<string> Merge)
{
    private const int MostRounds = 10_000;
    private const int MostThreads = 1024;

    /// <summary>Reads the command line; what is wrong is added to the faults.</summary>
    public static MemoryRequest Of(ParseResult parsed, MemoryOptions options, OutputOptions output, List<Fault> faults)
    {
        MemoryArguments read = new(faults);
        string? scenario = parsed.GetValue(options.Scenario);
        string? uniform = parsed.GetValue(options.Uniform);
        ImmutableArray<string> merge = [.. parsed.GetValue(options.Merge) ?? []];
        AddContradictions(parsed, options, output, faults);
        ImmutableArray<int> distances = read.Distances(options.Distance.Name, parsed.GetValue(options.Distance) ?? "3,5,7");
        string? rounds = parsed.GetValue(options.Rounds);
        int sameRounds = (int)read.Whole(options.Rounds.Name, rounds, 1, high: MostRounds);
        ImmutableArray<PauliBasis> bases = read.Choice<ImmutableArray<PauliBasis>>(
            options.Basis.Name, parsed.GetValue(options.Basis), ("both", [PauliBasis.Z, PauliBasis.X]), ("z", [PauliBasis.Z]), ("x", [PauliBasis.X]));
        return new MemoryRequest(
            scenario,
            uniform is null ? null : MemorySubject.Of(read.Uniform(options, uniform, parsed.GetValue(options.Noise), out double error), error),
            [.. from distance in distances from basis in bases select new MemorySetting(distance, rounds is null ? 3 * distance : sameRounds, basis)],
            read.Choice(options.Decoder.Name, parsed.GetValue(options.Decoder), Named(DecoderKind.Matching), Named(DecoderKind.UnionFind)),
            read.Whole(options.Shots.Name, parsed.GetValue(options.Shots), 100_000),
            read.Seed(options.Seed.Name, parsed.GetValue(options.Seed)),
            (int)read.Whole(options.Threads.Name, parsed.GetValue(options.Threads), Environment.ProcessorCount, high: MostThreads),
            read.Accuracy(options.Accuracy.Name, parsed.GetValue(options.Accuracy)),
            read.Shard(options.Shard.Name, parsed.GetValue(options.Shard)),
            parsed.GetValue(options.Resume) ?? parsed.GetValue(options.Counts),
            parsed.GetValue(options.Resume) is not null,
            merge);
    }

    private static (string Name, DecoderKind Value) Named(DecoderKind kind) => (Decoders.NameOf(kind), kind);

    private static void AddContradictions(ParseResult parsed, MemoryOptions options, OutputOptions output, List<Fault> faults)
    {
        bool hasScenario = parsed.GetValue(options.Scenario) is not null;
        bool hasUniform = Has(options.Uniform);
        if (parsed.GetResult(options.Merge) is not null)
        {
            string[] others =
            [
                .. options.OfSimulation.Where(Has).Select(option => option.Name),
                .. hasScenario ? ["a scenario"] : Array.Empty<string>(),
                .. parsed.GetResult(output.Set) is not null ? [output.Set.Name] : Array.Empty<string>(),
            ];
            AddIf(others.Length > 0, options.Merge.Name, $"adds up counts that are there; it goes with no {string.Join(", ", others)}");
            return;
        }

        AddIf(hasScenario == hasUniform, "memory", "give either a scenario file, or --uniform P, or --merge FILE ...");
        AddIf(Has(options.Noise) && !hasUniform, options.Noise.Name, "says how rates follow from P and needs --uniform P; a scenario has rates of its own");
        AddIf(parsed.GetResult(output.Set) is not null && hasUniform, output.Set.Name, "replaces inputs of a scenario; with --uniform there are none");
        AddIf(Has(options.Counts) && Has(options.Resume), options.Resume.Name, "writes back to its file; leave --counts out");
        AddIf(Has(options.Shard) && !Has(options.Counts) && !Has(options.Resume), options.Shard.Name, "needs --counts FILE, to be added to the other shares later");

        bool Has(Option<string?> option) => parsed.GetValue(option) is not null;

        void AddIf(bool isWrong, string option, string message)
        {
            if (isWrong)
            {
                faults.Add(new Fault(option, 0, 0, "", message));
            }
        }
    }
}
