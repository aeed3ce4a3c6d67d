using System.Collections.Immutable;
using System.Globalization;
using FtEstimate.Files;
using FtEstimate.Files.Counts;
using FtEstimate.Quantities;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Cli;

/// <summary>Reads the words of the memory command; what is wrong is collected, and a default stands in for it.</summary>
/// <param name="faults">Collects what is wrong.</param>
internal sealed class MemoryArguments(List<Fault> faults)
{
    private const int SmallestDistance = 3;
    private const int LargestDistance = 51;

    // block numbers and sums of shots stay far inside 64 bits
    private const long MostShots = 1_000_000_000_000_000;

    /// <summary>Distances, each once, smallest first.</summary>
    public ImmutableArray<int> Distances(string option, string text)
    {
        var distances = ImmutableSortedSet.CreateBuilder<int>();
        foreach (string part in text.Split(','))
        {
            if (int.TryParse(part.Trim(), NumberStyles.None, CultureInfo.InvariantCulture, out int distance)
                && distance is >= SmallestDistance and <= LargestDistance && int.IsOddInteger(distance))
            {
                distances.Add(distance);
            }
            else
            {
                Add(option, $"expected odd distances from {SmallestDistance} to {LargestDistance} such as 3,5,7, found '{part.Trim()}'");
            }
        }

        return [.. distances];
    }

    /// <summary>A whole number; powers of ten such as 1e6 are read too.</summary>
    public long Whole(string option, string? text, long standard, long low = 1, long high = MostShots)
    {
        if (text is null)
        {
            return standard;
        }

        bool isNumber = decimal.TryParse(
            text, NumberStyles.AllowExponent | NumberStyles.AllowDecimalPoint | NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out decimal value);
        if (isNumber && value == decimal.Truncate(value) && value >= low && value <= high)
        {
            return (long)value;
        }

        Add(option, string.Create(CultureInfo.InvariantCulture, $"expected a whole number from {low} to {(high < MostShots ? high : Show.Significant(high, 1))}, found '{text}'"));
        return standard;
    }

    /// <summary>A seed: a whole number of 64 bits.</summary>
    public ulong Seed(string option, string? text)
    {
        ulong seed = 1;
        if (text is not null && !ulong.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out seed))
        {
            Add(option, $"expected a whole number from 0 to {ulong.MaxValue}, found '{text}'");
        }

        return seed;
    }

    /// <summary>A number between two bounds, both excluded.</summary>
    public double Between(string option, string text, double low, double high)
    {
        if (double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double value) && value > low && value < high)
        {
            return value;
        }

        Add(option, string.Create(CultureInfo.InvariantCulture, $"expected a number between {Show.Significant(low, 1)} and {high}, found '{text}'"));
        return low;
    }

    /// <summary>A relative error, as a fraction or in per cent; 0 where none is wanted.</summary>
    public double Accuracy(string option, string? text)
    {
        if (text is null)
        {
            return 0;
        }

        bool isPercent = text.TrimEnd().EndsWith('%');
        string number = isPercent ? text.TrimEnd().TrimEnd('%').TrimEnd() : text;
        if (double.TryParse(number, NumberStyles.Float, CultureInfo.InvariantCulture, out double value)
            && (isPercent ? value / 100 : value) is var fraction and > 0 and < 1)
        {
            return fraction;
        }

        Add(option, $"expected a relative error between 0 and 1 such as 5% or 0.05, found '{text}'");
        return 0;
    }

    /// <summary>One of several names.</summary>
    public T Choice<T>(string option, string? text, params ReadOnlySpan<(string Name, T Value)> choices)
    {
        string[] names = new string[choices.Length];
        for (int i = 0; i < choices.Length; i++)
        {
            names[i] = choices[i].Name;
            if (text == choices[i].Name)
            {
                return choices[i].Value;
            }
        }

        if (text is not null)
        {
            Add(option, $"expected {string.Join(" or ", names)}, found '{text}'");
        }

        return choices[0].Value;
    }

    /// <summary>A share of the run.</summary>
    public Shard Shard(string option, string? text)
    {
        if (text is null)
        {
            return Simulation.Memory.Shard.Whole;
        }

        if (ShardText.Parse(text) is { } shard)
        {
            return shard;
        }

        Add(option, $"expected a share such as 1/4, from 1/4 to 4/4, found '{text}'");
        return Simulation.Memory.Shard.Whole;
    }

    /// <summary>The rates that follow from a uniform error; none of them reaches one half.</summary>
    public UniformNoise Uniform(MemoryOptions options, string text, string? kind, out double error)
    {
        Func<double, UniformNoise> rates = Choice<Func<double, UniformNoise>>(
            options.Noise.Name, kind, ("every-place", UniformNoise.EveryPlace), ("slow-readout", UniformNoise.SlowReadout));
        UniformNoise unit = rates(1);
        double largest = Math.Max(Math.Max(unit.ReadoutFlip, unit.Pair), Math.Max(unit.ResetFlip, unit.WaitingInReadout));
        error = Between(options.Uniform.Name, text, SmallestError, 0.5 / largest);
        return rates(error);
    }

    // below, no number of shots ever sees a failure
    private const double SmallestError = 1e-7;

    private void Add(string option, string message) => faults.Add(new Fault(option, 0, 0, "", message));
}
