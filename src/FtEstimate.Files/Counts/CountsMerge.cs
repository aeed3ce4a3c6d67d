using System.Collections.Immutable;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Files.Counts;

/// <summary>Which counts may be continued, and which may be added up.</summary>
public static class CountsMerge
{
    /// <summary>Reads counts files that are to be added up.</summary>
    /// <param name="paths">The files.</param>
    /// <param name="faults">Collects what is wrong: unreadable files, different questions, shards with blocks in common.</param>
    /// <returns>The counts of every file that could be read.</returns>
    public static ImmutableArray<MemoryCounts> Read(ImmutableArray<string> paths, List<Fault> faults)
    {
        List<(string Path, MemoryCounts Counts)> read = [];
        foreach (string path in paths)
        {
            CountsReading reading = CountsFile.Read(path);
            if (reading.Fault is { } fault)
            {
                faults.Add(fault);
            }
            else if (reading.Counts is { } counts)
            {
                AddFaults(faults, read, path, counts);
                read.Add((path, counts));
            }
        }

        return [.. read.Select(file => file.Counts)];
    }

    /// <summary>What speaks against continuing counts.</summary>
    /// <param name="path">Their file.</param>
    /// <param name="counts">The counts.</param>
    /// <param name="asked">The question asked now.</param>
    /// <param name="shard">The share asked now.</param>
    public static ImmutableArray<Fault> FaultsOfResuming(string path, MemoryCounts counts, MemoryQuestion asked, Shard shard)
    {
        ImmutableArray<string> differences = CountsFile.Differences(counts.Question, asked);
        if (counts.Shard != shard)
        {
            differences = differences.Add($"shard: {ShardText.Of(counts.Shard)} there, {ShardText.Of(shard)} here");
        }

        return differences.IsEmpty ? [] : [OtherQuestion(path, "the counts answer another question", differences)];
    }

    private static void AddFaults(List<Fault> faults, List<(string Path, MemoryCounts Counts)> before, string path, MemoryCounts counts)
    {
        if (before.Count == 0)
        {
            return;
        }

        ImmutableArray<string> differences = CountsFile.Differences(counts.Question, before[0].Counts.Question);
        if (!differences.IsEmpty)
        {
            faults.Add(OtherQuestion(path, $"answers another question than {before[0].Path}", differences));
            return;
        }

        foreach ((string otherPath, MemoryCounts other) in before)
        {
            if (Shards.Overlap(other.Shard, counts.Shard))
            {
                faults.Add(new Fault(
                    path, 0, 0, "", $"shard {ShardText.Of(counts.Shard)} has shots in common with shard {ShardText.Of(other.Shard)} in {otherPath}"));
            }
        }
    }

    private static Fault OtherQuestion(string path, string what, ImmutableArray<string> differences) =>
        new(path, 0, 0, "", $"{what}: {string.Join("; ", differences)}");
}
