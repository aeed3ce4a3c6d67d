using System.Globalization;
using FtEstimate.Scenarios;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Files.Scenarios;

/// <summary>What the writer of an unknown key may have meant.</summary>
/// <param name="Message">The hint, to stand after "unknown key"; empty: none.</param>
/// <param name="Meant">The known key of the same table that was probably meant; null: none.</param>
internal readonly record struct Suggestion(string Message, string? Meant)
{
    /// <summary>Looks for the key with another unit, then for the nearest spelling, then for the key in other tables.</summary>
    /// <param name="name">The unknown key.</param>
    /// <param name="number">The number that stands there, if it is one.</param>
    /// <param name="table">Path of the table.</param>
    /// <param name="keys">Keys and names of tables that are known there.</param>
    public static Suggestion For(string name, double? number, string table, IReadOnlyCollection<string> keys)
    {
        if (WithOtherUnit(name, number, keys) is Suggestion slip)
        {
            return slip;
        }

        if (Nearest(name, keys) is string near)
        {
            return new Suggestion($"; did you mean {near}?", near);
        }

        foreach (TableDefinition other in ScenarioKeys.Tables)
        {
            if (other.Find(name) is not null && other.Path != table)
            {
                string place = other.Path.Length == 0 ? "to the top of the scenario" : $"to {other.Path}";
                return new Suggestion($"; it belongs {place}", null);
            }
        }

        return new Suggestion($"; known here are {string.Join(", ", keys)}", null);
    }

    /// <summary>The nearest spelling, if it is near enough.</summary>
    public static string? Nearest(string name, IReadOnlyCollection<string> keys)
    {
        string? nearest = null;
        int least = Math.Max(1, name.Length / 4) + 1;
        foreach (string key in keys)
        {
            int distance = EditDistance(name.ToUpperInvariant(), key.ToUpperInvariant());
            if (distance < least)
            {
                least = distance;
                nearest = key;
            }
        }

        return nearest;
    }

    private static Suggestion? WithOtherUnit(string name, double? number, IReadOnlyCollection<string> keys)
    {
        UnitSuffix? written = UnitSuffix.Of(name);
        foreach (string key in keys)
        {
            if (UnitSuffix.Of(key) is not UnitSuffix expected || UnitSuffix.StemOf(key) != UnitSuffix.StemOf(name))
            {
                continue;
            }

            if (written is null)
            {
                return new Suggestion($"; keys carry their unit: did you mean {key}?", key);
            }

            if (written.Dimension == expected.Dimension)
            {
                string value = number is double given && double.IsFinite(given)
                    ? string.Create(CultureInfo.InvariantCulture, $" = {given * written.ToSi / expected.ToSi:G6}")
                    : "";
                return new Suggestion($"; the unit is part of the key: did you mean {key}{value}?", key);
            }
        }

        return null;
    }

    // letters changed, added, left out, or swapped with their neighbour
    private static int EditDistance(string a, string b)
    {
        int[,] cost = new int[a.Length + 1, b.Length + 1];
        for (int i = 0; i <= a.Length; i++)
        {
            for (int j = 0; j <= b.Length; j++)
            {
                cost[i, j] = (i, j) switch
                {
                    (_, 0) => i,
                    (0, _) => j,
                    _ => Math.Min(
                        Math.Min(cost[i - 1, j], cost[i, j - 1]) + 1,
                        cost[i - 1, j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1)),
                };
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                {
                    cost[i, j] = Math.Min(cost[i, j], cost[i - 2, j - 2] + 1);
                }
            }
        }

        return cost[a.Length, b.Length];
    }
}
