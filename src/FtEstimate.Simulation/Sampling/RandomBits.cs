using System.Numerics;

namespace FtEstimate.Simulation.Sampling;

/// <summary>A stream of random bits: xoshiro256++ (Blackman 2021, arXiv:1805.01407), seeded through SplitMix64.</summary>
/// <remarks>A value type without shared state: streams of different blocks are independent, whatever thread draws from them.</remarks>
public struct RandomBits
{
    private ulong s0;
    private ulong s1;
    private ulong s2;
    private ulong s3;

    /// <summary>The stream of one block of a run.</summary>
    /// <param name="seed">Seed of the run.</param>
    /// <param name="block">Number of the block.</param>
    public RandomBits(ulong seed, ulong block)
    {
        ulong state = Mix(seed) ^ Mix(block + 0x632BE59BD9B4E019UL);
        s0 = Mix(state += 0x9E3779B97F4A7C15UL);
        s1 = Mix(state += 0x9E3779B97F4A7C15UL);
        s2 = Mix(state += 0x9E3779B97F4A7C15UL);
        s3 = Mix(state + 0x9E3779B97F4A7C15UL);
    }

    /// <summary>The next 64 bits.</summary>
    public ulong NextBits()
    {
        ulong result = BitOperations.RotateLeft(s0 + s3, 23) + s0;
        ulong t = s1 << 17;
        s2 ^= s0;
        s3 ^= s1;
        s1 ^= s2;
        s0 ^= s3;
        s2 ^= t;
        s3 = BitOperations.RotateLeft(s3, 45);
        return result;
    }

    /// <summary>A number above 0 and at most 1, evenly spread.</summary>
    public double NextUnit() => ((NextBits() >> 11) + 1) * (1.0 / (1UL << 53));

    /// <summary>A whole number from 0 to below a bound.</summary>
    public int NextBelow(int bound) => (int)Math.BigMul(NextBits(), (ulong)bound, out _);

    private static ulong Mix(ulong value)
    {
        value = (value ^ (value >> 30)) * 0xBF58476D1CE4E5B9UL;
        value = (value ^ (value >> 27)) * 0x94D049BB133111EBUL;
        return value ^ (value >> 31);
    }
}
