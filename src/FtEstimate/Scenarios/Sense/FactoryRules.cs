using System.Globalization;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios.Sense;

/// <summary>The text that names a magic-state factory.</summary>
internal static class FactoryRules
{
    private const string Tile = "tile-15-to-1";
    private const string Expected = "expected \"tile-15-to-1\", \"15-to-1:17,7,7\", or two levels such as \"15-to-1:13,5,5*6 > 15-to-1:29,11,13\"";

    private static readonly string Factory = MethodKeys.Method.PathOf(MethodKeys.Factory);
    private static readonly string[] Protocols = ["15-to-1", "20-to-4", "8-to-ccz"];

    public static void Check(ScenarioDraft draft, List<SenseFault> faults)
    {
        if (draft.Text(Factory) is string text && text != Tile && Problem(text) is string problem)
        {
            faults.Add(new SenseFault(Factory, $"{problem}; {Expected}"));
        }
    }

    private static string? Problem(string text)
    {
        string[] levels = text.Split('>');
        return levels.Length > 2 ? "a design has one or two levels" : levels.Select(LevelProblem).FirstOrDefault(problem => problem is not null);
    }

    private static string? LevelProblem(string level)
    {
        string[] parts = level.Split(':');
        if (parts.Length != 2 || !Protocols.Contains(parts[0].Trim()))
        {
            return $"no protocol in \"{level.Trim()}\" (protocols are {string.Join(", ", Protocols)})";
        }

        string[] sizes = parts[1].Split('*');
        if (sizes.Length > 2 || (sizes.Length == 2 && Whole(sizes[1]) is not > 0))
        {
            return $"no whole count after the star in \"{level.Trim()}\"";
        }

        string[] distances = sizes[0].Split(',');
        return distances.Length == 3 && distances.All(distance => Whole(distance) is int whole && whole > 0 && int.IsOddInteger(whole))
            ? null
            : $"the distances in \"{level.Trim()}\" are not three whole odd numbers";
    }

    private static int? Whole(string text) =>
        int.TryParse(text, NumberStyles.AllowLeadingWhite | NumberStyles.AllowTrailingWhite, CultureInfo.InvariantCulture, out int whole) ? whole : null;
}
