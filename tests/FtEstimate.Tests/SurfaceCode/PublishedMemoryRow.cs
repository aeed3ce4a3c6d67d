using System.Globalization;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Tests.SurfaceCode;

/// <summary>One row of Published/memory-uniform-noise.csv: a rotated memory of 3d rounds in both bases.</summary>
internal sealed record PublishedMemoryRow(
    string Noise,
    double Error,
    int Distance,
    double FailuresX,
    double ShotsX,
    double FailuresZ,
    double ShotsZ)
{
    public static IReadOnlyList<PublishedMemoryRow> All { get; } = Read();

    /// <summary>Every location noisy at the same rate, waiting included ("SD" in the paper).</summary>
    public static IEnumerable<PublishedMemoryRow> EveryPlace => All.Where(row => row.Noise == "SD");

    /// <summary>Quiet gates on one qubit, slow and noisy readout ("SI" in the paper).</summary>
    public static IEnumerable<PublishedMemoryRow> SlowReadout => All.Where(row => row.Noise == "SI");

    /// <summary>Any logical error of one patch in one round: the sum of both bases.</summary>
    public double PerRound =>
        MemoryError.PerRound(FailuresX / ShotsX, 3 * Distance) + MemoryError.PerRound(FailuresZ / ShotsZ, 3 * Distance);

    private static List<PublishedMemoryRow> Read()
    {
        using Stream stream = typeof(PublishedMemoryRow).Assembly.GetManifestResourceStream("Published.memory-uniform-noise.csv")!;
        using StreamReader reader = new(stream);
        return [.. reader.ReadToEnd().Split('\n', StringSplitOptions.RemoveEmptyEntries).Skip(1).Select(Parse)];
    }

    private static PublishedMemoryRow Parse(string line)
    {
        string[] cells = line.Split(',');
        return new PublishedMemoryRow(
            cells[0],
            Number(cells[1]),
            int.Parse(cells[2], CultureInfo.InvariantCulture),
            Number(cells[3]),
            Number(cells[4]),
            Number(cells[5]),
            Number(cells[6]));
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
