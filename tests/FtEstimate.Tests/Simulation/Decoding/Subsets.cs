namespace FtEstimate.Tests.Simulation.Decoding;

/// <summary>Subsets of the first whole numbers.</summary>
internal static class Subsets
{
    /// <summary>All of one size, each ascending.</summary>
    public static IEnumerable<int[]> OfSize(int size, int count) => size == 0
        ? [[]]
        : Enumerable.Range(size - 1, count - size + 1).SelectMany(last => OfSize(size - 1, last).Select(set => (int[])[.. set, last]));

    /// <summary>The members named by the bits of a number.</summary>
    public static int[] OfBits(int bits, int count) => [.. Enumerable.Range(0, count).Where(index => (bits >> index & 1) == 1)];
}
