using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Sampling;
using MathNet.Numerics.Distributions;

namespace FtEstimate.Tests.Simulation.Sampling;

/// <summary>How often everything that can be seen of a shot happens, alone and in pairs: defects, the observable, told edges with their weights.</summary>
internal sealed class ShotStatistics
{
    private readonly Dictionary<(string Kind, int Number, long Weight), int> numbers;
    private readonly Dictionary<long, int> counts = [];

    /// <param name="numbers">Numbers of what was seen, shared by the statistics that are to be compared.</param>
    public ShotStatistics(Dictionary<(string Kind, int Number, long Weight), int> numbers) => this.numbers = numbers;

    public int Shots { get; private set; }

    public static ShotStatistics Of(IShotSampler sampler, ulong seed, int shots, Dictionary<(string Kind, int Number, long Weight), int> numbers)
    {
        ShotStatistics statistics = new(numbers);
        sampler.Begin(seed, 0);
        for (int shot = 0; shot < shots; shot++)
        {
            statistics.Add(sampler.NextShot());
        }

        return statistics;
    }

    /// <summary>
    /// The smallest chance that a difference as large as one of those found arises between two samples of one distribution, times the number of
    /// comparisons: below α in at most a fraction α of all runs (Bonferroni).
    /// </summary>
    public double ChanceOfSame(ShotStatistics other, out string where)
    {
        Assert.Equal(Shots, other.Shots);
        long[] keys = [.. counts.Keys.Union(other.counts.Keys)];
        double least = 1;
        long leastAt = 0;
        foreach (long key in keys)
        {
            int here = counts.GetValueOrDefault(key);
            int both = here + other.counts.GetValueOrDefault(key);

            // given the sum, each count is binomial with ½ (exact for rare things, too wide for frequent ones)
            double below = Binomial.CDF(0.5, both, Math.Min(here, both - here));
            if (2 * below < least)
            {
                least = 2 * below;
                leastAt = key;
            }
        }

        where = $"{Name(leastAt)}: {counts.GetValueOrDefault(leastAt)} and {other.counts.GetValueOrDefault(leastAt)} of {Shots}";
        return least * keys.Length;
    }

    private void Add(SampledShot shot)
    {
        Shots++;
        List<int> seen = [];
        foreach (int defect in shot.Defects)
        {
            seen.Add(NumberOf(("detector", defect, 0)));
        }

        foreach (ToldEdge edge in shot.Told)
        {
            seen.Add(NumberOf(("told", edge.Edge, (long)Math.Round(edge.Weight * 1e6))));
        }

        if (shot.ObservableFlipped)
        {
            seen.Add(NumberOf(("observable", 0, 0)));
        }

        seen.Sort();
        for (int first = 0; first < seen.Count; first++)
        {
            Count(seen[first]);
            for (int second = 0; second < first; second++)
            {
                Count(((long)(seen[second] + 1) << 32) | (uint)seen[first]);
            }
        }
    }

    private void Count(long key) => counts[key] = counts.GetValueOrDefault(key) + 1;

    private int NumberOf((string Kind, int Number, long Weight) name)
    {
        if (!numbers.TryGetValue(name, out int number))
        {
            number = numbers.Count;
            numbers.Add(name, number);
        }

        return number;
    }

    private string Name(long key)
    {
        string Of(long number) => $"{numbers.First(entry => entry.Value == number).Key}";
        return key >> 32 == 0 ? Of(key) : $"{Of((key >> 32) - 1)} with {Of(key & uint.MaxValue)}";
    }
}
