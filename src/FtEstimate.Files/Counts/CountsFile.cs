using System.Collections.Immutable;
using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using FtEstimate.Noise;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Files.Counts;

/// <summary>The counts of a file, or what is wrong with it.</summary>
/// <param name="Counts">The counts; null: there is a fault.</param>
/// <param name="Fault">What is wrong; null: nothing.</param>
public sealed record CountsReading(MemoryCounts? Counts, Fault? Fault);

/// <summary>Reads and writes the counts of memory experiments, so that a run can be continued or added to others.</summary>
public static class CountsFile
{
    private const string Format = "memory counts 1";
    private static readonly string NoChecksum = new('0', 64);

    private static readonly JsonSerializerOptions Options = new()
    {
        WriteIndented = true,
        NewLine = "\n",
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        IgnoreReadOnlyProperties = true,
        UnmappedMemberHandling = JsonUnmappedMemberHandling.Disallow,
        RespectNullableAnnotations = true,
        RespectRequiredConstructorParameters = true,
    };

    /// <summary>The text of a counts file.</summary>
    public static string Text(MemoryCounts counts)
    {
        MemoryOrigin origin = counts.Origin;
        CountsContent content = new(
            Format,
            MemoryRun.Version,
            QuestionContent.Of(counts.Question),
            ShardText.Of(counts.Shard),
            new OriginContent(origin.Title, origin.Sentence, origin.LawName, origin.Strength.X, origin.Strength.Z),
            [
                .. counts.Experiments.Select(experiment => new CountContent(
                    experiment.Tally.BlocksDone, experiment.Tally.Count.Shots, experiment.Tally.Count.Failures, experiment.Seconds)),
            ],
            NoChecksum);
        string text = JsonSerializer.Serialize(content, Options) + "\n";
        return ReplaceLast(text, NoChecksum, ChecksumOf(text));
    }

    /// <summary>Reads a counts file, without ever throwing for what it holds.</summary>
    public static CountsReading Read(string path)
    {
        InputText input = InputText.Read(path);
        return input.Text is { } text
            ? Parse(path, text)
            : Failed(path, (input.Problem ?? "").Replace("expected TOML text", "expected a counts file", StringComparison.Ordinal));
    }

    /// <summary>In what two questions differ, field by field; empty when they are the same.</summary>
    /// <param name="inFile">The question of the file.</param>
    /// <param name="asked">The question asked.</param>
    public static ImmutableArray<string> Differences(MemoryQuestion inFile, MemoryQuestion asked)
    {
        var there = FieldsOf(inFile);
        var here = FieldsOf(asked);
        return
        [
            .. there.Keys.Union(here.Keys).Where(name => there.GetValueOrDefault(name, "none") != here.GetValueOrDefault(name, "none"))
                .Select(name => $"{name}: {there.GetValueOrDefault(name, "none")} there, {here.GetValueOrDefault(name, "none")} here"),
        ];
    }

    private static CountsReading Parse(string path, string text)
    {
        try
        {
            using JsonDocument json = JsonDocument.Parse(text);
            if (json.RootElement.ValueKind != JsonValueKind.Object
                || !json.RootElement.TryGetProperty("format", out JsonElement format) || format.ValueKind != JsonValueKind.String || format.GetString() != Format
                || !json.RootElement.TryGetProperty("checksum", out JsonElement checksum) || checksum.GetString() is not { Length: > 0 } sum)
            {
                return Failed(path, "this is no counts file of this program");
            }

            if (ChecksumOf(ReplaceLast(text, sum, NoChecksum)) != sum)
            {
                return Failed(path, "the checksum does not fit the content: the file was edited or damaged");
            }

            return json.RootElement.TryGetProperty("simulation_version", out JsonElement version) && version.TryGetInt32(out int number) && number != MemoryRun.Version
                ? Failed(path, string.Create(CultureInfo.InvariantCulture, $"counted by version {number} of the simulator; this is version {MemoryRun.Version}, whose counts cannot be added"))
                : CountsOf(JsonSerializer.Deserialize<CountsContent>(text, Options)) is { } counts ? new CountsReading(counts, null)
                : Failed(path, "its numbers contradict each other");
        }
        catch (Exception problem) when (problem is JsonException or InvalidOperationException)
        {
            return Failed(path, "this is no counts file, or its end is missing");
        }
    }

    private static MemoryCounts? CountsOf(CountsContent? content)
    {
        if (content?.Question.ToQuestion() is not { } question || ShardText.Parse(content.Shard) is not { } shard
            || content.Counts.IsDefault || content.Counts.Length != question.Settings.Length)
        {
            return null;
        }

        for (int i = 0; i < content.Counts.Length; i++)
        {
            if (content.Counts[i] is not { } count)
            {
                return null;
            }

            MemoryPlan plan = question.PlanOf(question.Settings[i], shard);
            bool isSound = count.Blocks >= 0 && count.Blocks <= plan.BlocksOfShard && count.Shots == ShotsOf(plan, count.Blocks)
                && count.Failures >= 0 && count.Failures <= count.Shots && count.Seconds >= 0;
            if (!isSound)
            {
                return null;
            }
        }

        OriginContent origin = content.Origin;
        return new MemoryCounts(
            question,
            new MemoryOrigin(origin.Title, origin.Sentence, origin.Law, new NoiseStrength(origin.StrengthX, origin.StrengthZ)),
            shard,
            [.. content.Counts.Select(count => new ExperimentCount(new MemoryTally(count.Blocks, new ShotCount(count.Shots, count.Failures)), count.Seconds))]);
    }

    // all blocks are full but the last one of the run
    private static long ShotsOf(MemoryPlan plan, long blocks) =>
        blocks == 0 ? 0 : ((blocks - 1) * MemoryPlan.ShotsPerBlock) + plan.ShotsOfBlock(plan.BlockNumber(blocks - 1));

    private static SortedDictionary<string, string> FieldsOf(MemoryQuestion question)
    {
        SortedDictionary<string, string> fields = new(StringComparer.Ordinal);
        AddFields(fields, "", JsonSerializer.SerializeToElement(QuestionContent.Of(question), Options));
        return fields;
    }

    private static void AddFields(SortedDictionary<string, string> fields, string path, JsonElement element)
    {
        if (element.ValueKind == JsonValueKind.Object)
        {
            foreach (JsonProperty property in element.EnumerateObject())
            {
                AddFields(fields, path.Length == 0 ? property.Name : $"{path}.{property.Name}", property.Value);
            }
        }
        else if (element.ValueKind != JsonValueKind.Null)
        {
            // the list of experiments is short and reads best as a whole
            fields[path] = element.ValueKind == JsonValueKind.Array
                ? string.Join("; ", element.EnumerateArray().Select(item => string.Join(' ', item.EnumerateObject().Select(field => $"{field.Name} {field.Value}"))))
                : element.ToString();
        }
    }

    private static string ChecksumOf(string text) => Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(text)));

    private static string ReplaceLast(string text, string part, string by)
    {
        int place = text.LastIndexOf(part, StringComparison.Ordinal);
        return place < 0 ? text : string.Concat(text.AsSpan(0, place), by, text.AsSpan(place + part.Length));
    }

    private static CountsReading Failed(string path, string why) => new(null, new Fault(path, 0, 0, "", why));
}
