using System.Diagnostics.CodeAnalysis;
using System.Globalization;

namespace FtEstimate.MagicStates;

/// <summary>Reads the notation of <see cref="FactoryDesign"/>.</summary>
internal static class FactoryNotation
{
    private const int SmallestDistance = 3;
    private const int LargestDistance = 199;
    private const int LargestCount = 64;
    private const string Example = "15-to-1:17,7,7 or 15-to-1:13,5,5*6 > 15-to-1:29,11,13";

    public static bool TryParse(
        string? text,
        [NotNullWhen(true)] out FactoryDesign? design,
        [NotNullWhen(false)] out string? fault)
    {
        design = null;
        if (string.IsNullOrWhiteSpace(text))
        {
            fault = $"a factory design is empty; write for instance {Example}";
            return false;
        }

        string[] levels = text.Split('>');
        if (levels.Length > 2)
        {
            fault = $"\"{text.Trim()}\": factories of more than two levels are not modelled yet";
            return false;
        }

        if (!TryParseLevel(levels[^1], isLast: true, out FeederBlocks last, out fault))
        {
            return false;
        }

        if (levels.Length == 1)
        {
            design = new FactoryDesign(last.Block);
            return true;
        }

        if (!TryParseLevel(levels[0], isLast: false, out FeederBlocks feeders, out fault))
        {
            return false;
        }

        design = new FactoryDesign(last.Block, feeders);
        return true;
    }

    private static bool TryParseLevel(string text, bool isLast, out FeederBlocks level, [NotNullWhen(false)] out string? fault)
    {
        level = default;
        string shown = $"\"{text.Trim()}\"";
        string[] parts = text.Split(':');
        if (parts.Length != 2)
        {
            fault = $"{shown}: expected a protocol, a colon and three distances; write for instance {Example}";
            return false;
        }

        if (parts[0].Trim() != "15-to-1")
        {
            fault = $"{shown}: protocol \"{parts[0].Trim()}\" is not modelled yet; only 15-to-1 is";
            return false;
        }

        string[] factors = parts[1].Split('*');
        if (factors.Length != (isLast ? 1 : 2))
        {
            fault = isLast
                ? $"{shown}: the last level is a single block; leave out the *count"
                : $"{shown}: the first of two levels needs the number of its blocks, as in 15-to-1:13,5,5*6";
            return false;
        }

        if (!TryParseDistances(factors[0], shown, out PatchDistances distances, out fault))
        {
            return false;
        }

        int count = 1;
        if (!isLast && !(TryParseNumber(factors[1], out count) && count is >= 2 and <= LargestCount && count % 2 == 0))
        {
            fault = $"{shown}: the number of blocks must be even, from 2 to {LargestCount}, not \"{factors[1].Trim()}\"";
            return false;
        }

        level = new FeederBlocks(new DistillationBlock(DistillationProtocol.FifteenToOne, distances), count);
        return true;
    }

    private static bool TryParseDistances(string text, string shown, out PatchDistances distances, [NotNullWhen(false)] out string? fault)
    {
        distances = default;
        string[] numbers = text.Split(',');
        if (numbers.Length != 3)
        {
            fault = $"{shown}: expected three distances dX,dZ,dm";
            return false;
        }

        Span<int> values = stackalloc int[3];
        for (int i = 0; i < values.Length; i++)
        {
            if (!TryParseNumber(numbers[i], out int value) || value is < SmallestDistance or > LargestDistance || value % 2 == 0)
            {
                fault = $"{shown}: a distance must be odd, from {SmallestDistance} to {LargestDistance}, not \"{numbers[i].Trim()}\"";
                return false;
            }

            values[i] = value;
        }

        distances = new PatchDistances(values[0], values[1], values[2]);
        fault = null;
        return true;
    }

    private static bool TryParseNumber(string text, out int value) =>
        int.TryParse(text.Trim(), NumberStyles.None, CultureInfo.InvariantCulture, out value);
}
