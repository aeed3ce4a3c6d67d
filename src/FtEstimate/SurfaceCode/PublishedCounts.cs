namespace FtEstimate.SurfaceCode;

/// <summary>Failures and shots of one published memory experiment at one uniform error.</summary>
internal readonly record struct MemoryCount(double UniformError, double FailuresX, double ShotsX, double FailuresZ, double ShotsZ);

/// <summary>
/// Published counts of the rotated memory of 3d rounds with every location noisy, uncorrelated matching:
/// O'Rourke 2025 (arXiv:2409.14765), data repository.
/// </summary>
internal sealed record PublishedCounts(int Distance, MemoryCount[] Rows)
{
    public static readonly PublishedCounts Distance3 = new(3,
    [
        new(0.0005, 1885, 1_000_000, 2010, 1_000_000),
        new(0.001, 7479, 1_000_000, 7854, 1_000_000),
        new(0.003, 57_508, 1_000_000, 59_957, 1_000_000),
        new(0.005, 100_412, 746_012, 100_289, 722_737),
    ]);

    public static readonly PublishedCounts Distance5 = new(5,
    [
        new(0.0005, 1065, 4_600_922, 1001, 4_143_105),
        new(0.001, 1796, 1_000_000, 1811, 1_000_000),
        new(0.003, 41_021, 1_000_000, 41_544, 1_000_000),
        new(0.005, 100_217, 695_585, 100_004, 692_609),
    ]);

    public static readonly PublishedCounts Distance7 = new(7,
    [
        new(0.0005, 1045, 45_799_091, 1060, 47_990_435),
        new(0.001, 1011, 2_892_828, 1068, 3_020_988),
        new(0.003, 24_794, 1_000_000, 25_066, 1_000_000),
        new(0.005, 100_204, 733_008, 100_280, 728_249),
    ]);

    /// <summary>The sum of both bases per round against noise strength.</summary>
    public LogLogCurve ToCurve(double threshold)
    {
        double[] strengths = new double[Rows.Length];
        double[] errors = new double[Rows.Length];
        for (int i = 0; i < Rows.Length; i++)
        {
            MemoryCount row = Rows[i];
            strengths[i] = row.UniformError / threshold;
            errors[i] = PerRound(row.FailuresX / row.ShotsX) + PerRound(row.FailuresZ / row.ShotsZ);
        }

        return new LogLogCurve(strengths, errors);
    }

    private double PerRound(double failure) => MemoryError.PerRound(failure, 3 * Distance);
}
