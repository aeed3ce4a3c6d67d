using System.CommandLine;

namespace FtEstimate.Cli;

/// <summary>The options of the memory command, as text: all their faults are told at once, together with those of files.</summary>
internal sealed class MemoryOptions
{
    /// <summary>The scenario.</summary>
    public Argument<string?> Scenario { get; } = new("scenario") { Description = "Scenario file (TOML): simulate the round of its machine", Arity = ArgumentArity.ZeroOrOne };

    /// <summary>Uniform error instead of a scenario.</summary>
    public Option<string?> Uniform { get; } = Of("--uniform", "P", "Simulate the textbook circuit at error probability P, instead of a scenario");

    /// <summary>How rates follow from P.</summary>
    public Option<string?> Noise { get; } = Of("--noise", "KIND", "How rates follow from P: every-place (default) or slow-readout");

    /// <summary>Distances.</summary>
    public Option<string?> Distance { get; } = Of("--distance", "D,D,...", "Odd code distances from 3 to 51 (default 3,5,7)");

    /// <summary>Rounds.</summary>
    public Option<string?> Rounds { get; } = Of("--rounds", "N", "Syndrome rounds (default: three times the distance)");

    /// <summary>Bases.</summary>
    public Option<string?> Basis { get; } = Of("--basis", "z|x|both", "Logical basis of the memory (default both)");

    /// <summary>Shots.</summary>
    public Option<string?> Shots { get; } = Of("--shots", "N", "Shots of each experiment, such as 1e6 (default 1e5)");

    /// <summary>Decoder.</summary>
    public Option<string?> Decoder { get; } = Of("--decoder", "NAME", "matching (default) or union-find");

    /// <summary>Seed.</summary>
    public Option<string?> Seed { get; } = Of("--seed", "N", "Whole number; the same seed gives the same counts (default 1)");

    /// <summary>Threads.</summary>
    public Option<string?> Threads { get; } = Of("--threads", "N", "Threads; counts do not depend on them (default: all processors)");

    /// <summary>Accuracy.</summary>
    public Option<string?> Accuracy { get; } = Of("--accuracy", "FRACTION", "End an experiment early at this relative standard error, such as 5% or 0.05");

    /// <summary>Where counts go.</summary>
    public Option<string?> Counts { get; } = Of("--counts", "FILE", "Write the counts to FILE, also when interrupted");

    /// <summary>Counts to continue.</summary>
    public Option<string?> Resume { get; } = Of("--resume", "FILE", "Continue the counts in FILE, with the same question, and write back to it");

    /// <summary>Share of the run.</summary>
    public Option<string?> Shard { get; } = Of("--shard", "K/N", "Run only share K of N; needs --counts");

    /// <summary>Counts to add up.</summary>
    public Option<string[]> Merge { get; } = new("--merge")
    {
        Description = "Add up counts files of different shards and report, without simulating",
        HelpName = "FILE ...",
        Arity = ArgumentArity.OneOrMore,
        AllowMultipleArgumentsPerToken = true,
    };

    /// <summary>Progress without a terminal.</summary>
    public Option<bool> Progress { get; } = new("--progress") { Description = "Tell the progress on standard error even where that is no terminal, a line every ten seconds" };

    /// <summary>The options that belong to a simulation, not to adding up.</summary>
    public IEnumerable<Option<string?>> OfSimulation =>
        [Uniform, Noise, Distance, Rounds, Basis, Shots, Decoder, Seed, Threads, Accuracy, Counts, Resume, Shard];

    /// <summary>Adds the options to a command.</summary>
    public void AddTo(Command command)
    {
        command.Arguments.Add(Scenario);
        foreach (Option<string?> option in OfSimulation)
        {
            command.Options.Add(option);
        }

        command.Options.Add(Merge);
        command.Options.Add(Progress);
    }

    private static Option<string?> Of(string name, string value, string description) => new(name) { Description = description, HelpName = value };
}
