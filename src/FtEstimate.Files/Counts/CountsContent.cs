using System.Collections.Immutable;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Files.Counts;

/// <summary>A counts file as it is written; names in the file are in lower case with underscores.</summary>
/// <param name="Format">Says what the file is.</param>
/// <param name="SimulationVersion">Version of the simulator that counted.</param>
/// <param name="Question">What was asked.</param>
/// <param name="Shard">Which share of it, such as "1/4".</param>
/// <param name="Origin">Where the noise comes from.</param>
/// <param name="Counts">What was counted, one entry per experiment.</param>
/// <param name="Checksum">SHA-256 of the file with this value replaced by zeros.</param>
internal sealed record CountsContent(
    string Format,
    int SimulationVersion,
    QuestionContent Question,
    string Shard,
    OriginContent Origin,
    ImmutableArray<CountContent> Counts,
    string Checksum);

/// <summary>What was asked: everything that decides the counts.</summary>
internal sealed record QuestionContent(
    string Circuit,
    UniformNoise? Uniform,
    double? UniformError,
    RoundErrors? Atoms,
    string Decoder,
    long Shots,
    ulong Seed,
    ImmutableArray<ExperimentContent> Experiments)
{
    private const string Textbook = "textbook";
    private const string AtomArray = "atom-array";

    /// <summary>A question as it is written.</summary>
    public static QuestionContent Of(MemoryQuestion question)
    {
        TextbookMemoryNoise? textbook = question.Noise as TextbookMemoryNoise;
        return new QuestionContent(
            textbook is null ? AtomArray : Textbook,
            textbook?.Rates,
            textbook?.Error,
            (question.Noise as AtomMemoryNoise)?.Errors,
            Decoders.NameOf(question.Decoder),
            question.Shots,
            question.Seed,
            [.. question.Settings.Select(setting => new ExperimentContent(setting.Distance, setting.Rounds, setting.Basis == PauliBasis.X ? "x" : "z"))]);
    }

    /// <summary>The question; null where it cannot be one.</summary>
    public MemoryQuestion? ToQuestion()
    {
        MemoryNoise? noise = (Circuit, Uniform, UniformError, Atoms) switch
        {
            (Textbook, { } rates, { } error, null) => new TextbookMemoryNoise(rates, error),
            (AtomArray, null, null, { } errors) => new AtomMemoryNoise(errors),
            _ => null,
        };
        DecoderKind[] decoders = [.. Enum.GetValues<DecoderKind>().Where(kind => Decoders.NameOf(kind) == Decoder)];
        bool isSound = noise is not null && decoders.Length == 1 && Shots >= 1 && !Experiments.IsDefaultOrEmpty
            && Experiments.All(experiment => experiment is { Distance: >= 3, Rounds: >= 1, Basis: "x" or "z" } && int.IsOddInteger(experiment.Distance));
        return isSound ? new MemoryQuestion(noise!, [.. Experiments.Select(experiment => experiment.ToSetting())], decoders[0], Shots, Seed) : null;
    }
}

/// <summary>One experiment.</summary>
internal sealed record ExperimentContent(int Distance, int Rounds, string Basis)
{
    /// <summary>Its setting.</summary>
    public MemorySetting ToSetting() => new(Distance, Rounds, Basis == "x" ? PauliBasis.X : PauliBasis.Z);
}

/// <summary>Where the noise comes from.</summary>
internal sealed record OriginContent(string Title, string Sentence, string Law, double StrengthX, double StrengthZ);

/// <summary>What was counted of one experiment.</summary>
internal sealed record CountContent(long Blocks, long Shots, long Failures, double Seconds);
