namespace FtEstimate.MagicStates;

/// <summary>A design of the grid with what is known of it before any noise.</summary>
/// <param name="Design">The design.</param>
/// <param name="Atoms">Its atoms.</param>
/// <param name="LeastRounds">Its rounds per state if nothing were rejected.</param>
/// <param name="FeederIndex">Index of its feeder block in <see cref="CatalogueGrid.Feeders"/>; −1 at one level.</param>
/// <param name="Index">Place in the order of listing, which settles ties.</param>
internal sealed record GridEntry(FactoryDesign Design, int Atoms, double LeastRounds, int FeederIndex, int Index);

/// <summary>
/// The designs that the catalogue looks at.
/// </summary>
/// <remarks>
/// One level: dX = 7, 9, ..., 61; dZ odd, 0.33 to 0.55 of dX; dm = dZ, dZ+2, dZ+4.
/// Two levels: feeders with dX = 7, 9, ..., 21, 25, 29, ..., 41, dZ = dm the odd number next to 0.4 dX; last block with dX from 1.5 to 3 times
/// the feeder's (in steps of 2 up to 33, of 4 up to 61), dZ the odd number next to 0.35, 0.42 and 0.5 of it, dm = dZ, dZ+2; 4, 6, 8, ...
/// feeders, up to the first number that would keep up with the last block if 30 % of their batches were rejected.
/// </remarks>
internal static class CatalogueGrid
{
    private const int LargestDistance = 61;

    private static ReadOnlySpan<double> LastRatios => [0.35, 0.42, 0.5];

    /// <summary>Distances of the feeder blocks.</summary>
    public static PatchDistances[] Feeders { get; } =
    [
        new(7, 3, 3), new(9, 3, 3), new(11, 5, 5), new(13, 5, 5), new(15, 7, 7), new(17, 7, 7), new(19, 7, 7),
        new(21, 9, 9), new(25, 11, 11), new(29, 11, 11), new(33, 13, 13), new(37, 15, 15), new(41, 17, 17),
    ];

    /// <summary>All designs in order of atoms, then of least rounds, then as listed above.</summary>
    public static GridEntry[] Entries { get; } = InOrder();

    private static GridEntry[] InOrder()
    {
        List<GridEntry> entries = [];
        AddOneLevel(entries);
        AddTwoLevels(entries);

        entries.Sort(static (left, right) =>
            left.Atoms != right.Atoms ? left.Atoms.CompareTo(right.Atoms)
            : left.LeastRounds != right.LeastRounds ? left.LeastRounds.CompareTo(right.LeastRounds)
            : left.Index.CompareTo(right.Index));
        return [.. entries];
    }

    private static void AddOneLevel(List<GridEntry> entries)
    {
        for (int x = 7; x <= LargestDistance; x += 2)
        {
            for (int z = 3; z <= 0.55 * x; z += 2)
            {
                for (int m = z; z >= 0.33 * x && m <= z + 4; m += 2)
                {
                    Add(entries, FactoryDesign.OneLevel(new PatchDistances(x, z, m)), feeder: -1);
                }
            }
        }
    }

    private static void AddTwoLevels(List<GridEntry> entries)
    {
        for (int feeder = 0; feeder < Feeders.Length; feeder++)
        {
            for (int x = 7; x <= LargestDistance; x += x < 33 ? 2 : 4)
            {
                if (x >= 1.5 * Feeders[feeder].X && x <= 3 * Feeders[feeder].X)
                {
                    AddTwoLevels(entries, feeder, x);
                }
            }
        }
    }

    private static void AddTwoLevels(List<GridEntry> entries, int feeder, int x)
    {
        int previous = 0;
        foreach (double ratio in LastRatios)
        {
            int z = OddNextTo(ratio * x);
            for (int m = z; z != previous && m <= z + 2; m += 2)
            {
                PatchDistances last = new(x, z, m);
                for (int count = 4; count == 4 || !KeepsUp(Feeders[feeder], count - 2, last); count += 2)
                {
                    Add(entries, FactoryDesign.TwoLevels(Feeders[feeder], count, last), feeder);
                }
            }

            previous = z;
        }
    }

    private static bool KeepsUp(PatchDistances feeder, int count, PatchDistances last) =>
        FactoryEvaluation.FirstLevelSteps * feeder.M / (count / 2.0 * 0.7) <= last.M;

    private static int OddNextTo(double value) => 2 * (int)Math.Floor(value / 2) + 1;

    private static void Add(List<GridEntry> entries, FactoryDesign design, int feeder) =>
        entries.Add(new GridEntry(
            design, design.Atoms, FactoryEvaluation.RoundsWithoutRejection(design), feeder, entries.Count));
}
