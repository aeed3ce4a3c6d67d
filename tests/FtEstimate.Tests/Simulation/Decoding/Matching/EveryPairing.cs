namespace FtEstimate.Tests.Simulation.Decoding.Matching;

/// <summary>Least weight of all ways to pair defects with each other or with the boundary, for each parity of the observable, over all subsets.</summary>
internal static class EveryPairing
{
    public static (long Even, long Odd) LeastWeights(ReadOnlySpan<int> defects, ShortestPaths paths)
    {
        int count = defects.Length;
        long[] least = new long[2 << count];
        Array.Fill(least, ShortestPaths.None);
        least[0] = 0;
        for (int set = 1; set < 1 << count; set++)
        {
            int first = int.TrailingZeroCount(set);
            int rest = set & (set - 1);
            Improve(least, set, rest, defects[first], -1, paths);
            for (int others = rest; others != 0; others &= others - 1)
            {
                int second = int.TrailingZeroCount(others);
                Improve(least, set, rest & ~(1 << second), defects[first], defects[second], paths);
            }
        }

        return (least[^2], least[^1]);
    }

    private static void Improve(long[] least, int set, int rest, int defect, int end, ShortestPaths paths)
    {
        for (int parity = 0; parity < 2; parity++)
        {
            long even = least[2 * rest] + paths.Length(defect, end, parity);
            long odd = least[(2 * rest) + 1] + paths.Length(defect, end, 1 - parity);
            least[(2 * set) + parity] = Math.Min(least[(2 * set) + parity], Math.Min(even, odd));
        }
    }
}
