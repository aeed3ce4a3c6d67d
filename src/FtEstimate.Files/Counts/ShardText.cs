using System.Globalization;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Files.Counts;

/// <summary>Shards as people write them: "1/4" is the first of four.</summary>
public static class ShardText
{
    /// <summary>The shard, or null where the text names none.</summary>
    public static Shard? Parse(string text)
    {
        string[] parts = text.Split('/');
        return parts.Length == 2
            && int.TryParse(parts[0], NumberStyles.None, CultureInfo.InvariantCulture, out int number)
            && int.TryParse(parts[1], NumberStyles.None, CultureInfo.InvariantCulture, out int count)
            && number >= 1 && number <= count
            ? new Shard(number - 1, count)
            : null;
    }

    /// <summary>The shard as text.</summary>
    public static string Of(Shard shard) => string.Create(CultureInfo.InvariantCulture, $"{shard.Index + 1}/{shard.Count}");
}
