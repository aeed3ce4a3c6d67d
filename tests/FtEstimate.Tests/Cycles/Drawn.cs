using CsCheck;

namespace FtEstimate.Tests.Cycles;

/// <summary>Draws the same random cases in every run, for checks that cost too much to repeat often or hold within a tolerance only.</summary>
internal static class Drawn
{
    public static IReadOnlyList<T> Cases<T>(Gen<T> generator, int count, ulong seed)
    {
        PCG random = new(stream: 1, seed);
        return [.. Enumerable.Range(0, count).Select(_ => generator.Generate(random, null, out Size _))];
    }
}
