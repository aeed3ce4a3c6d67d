using System.Collections.Immutable;
using FtEstimate.Scenarios;
using FtEstimate.Workloads;

namespace FtEstimate.Sizing;

/// <summary>A way to do logic: how many tiles it takes and how fast it consumes T states.</summary>
/// <param name="Style">Lattice surgery or transversal gates.</param>
/// <param name="Name">Printed in reports.</param>
/// <param name="Tiles">Tiles outside the factories.</param>
/// <param name="StepsPerT">Logical steps to consume one T state.</param>
/// <param name="Lanes">T states consumed side by side.</param>
/// <param name="GatesPerRound">Transversal gates per syndrome round; 0 for lattice surgery, whose step is d rounds.</param>
public sealed record LogicLayout(
    LogicStyle Style,
    string Name,
    double Tiles,
    double StepsPerT,
    double Lanes,
    double GatesPerRound)
{
    /// <summary>Rise of the noise strength per transversal gate and round (Zhou 2025, arXiv:2505.15907; from memory; it gives the published optimum of 3 gates per round at d = 5).</summary>
    public const double NoisePerTransversalGate = 1.0 / 6;

    private static readonly double[] GatesPerRoundToTry = [0.5, 1, 2, 4];

    /// <summary>Factor on the noise strength.</summary>
    public double NoiseFactor => 1 + (NoisePerTransversalGate * GatesPerRound);

    /// <summary>The layouts a scenario leaves open, in a fixed order.</summary>
    /// <param name="workload">The workload.</param>
    /// <param name="method">What is fixed.</param>
    /// <param name="synthesis">How rotations are made of T gates.</param>
    /// <param name="movesAtoms">Whether the machine can bring patches together, which transversal gates need.</param>
    public static ImmutableArray<LogicLayout> ToTry(Workload workload, Method method, RotationSynthesis synthesis, bool movesAtoms)
    {
        var layouts = ImmutableArray.CreateBuilder<LogicLayout>();
        if (method.Style is null or LogicStyles.Surgery)
        {
            layouts.AddRange(SurgeryBlocks(workload.LogicalQubits, method));
        }

        bool transversal = method.Style == LogicStyles.Transversal
            || (method.Style is null && movesAtoms && method.Block is null && method.Patches is null);
        if (transversal)
        {
            AddTransversal(layouts, workload, method, synthesis);
        }

        return layouts.ToImmutable();
    }

    /// <summary>
    /// The three blocks of Litinski 2019 (arXiv:1808.02892): tiles and steps per T state for n logical qubits.
    /// Compact ⌈1.5n+3⌉ tiles and 9 steps, intermediate 2n+4 and 5, fast ⌈2n+√(8n)+1⌉ and 1.
    /// </summary>
    private static IEnumerable<LogicLayout> SurgeryBlocks(double qubits, Method method)
    {
        LogicLayout[] blocks =
        [
            Surgery("compact", Math.Ceiling((1.5 * qubits) + 3), 9),
            Surgery("intermediate", Math.Ceiling((2 * qubits) + 4), 5),
            Surgery("fast", Math.Ceiling((2 * qubits) + Math.Sqrt(8 * qubits) + 1), 1),
        ];
        return blocks
            .Where(block => method.Block is null || block.Name == method.Block)
            .Select(block => method.Patches is { } patches ? block with { Tiles = patches } : block);
    }

    private static LogicLayout Surgery(string name, double tiles, double stepsPerT) =>
        new(LogicStyle.LatticeSurgery, name, tiles, stepsPerT, 1, 0);

    /// <summary>One more patch per T lane; lanes double up to the parallelism of the workload.</summary>
    private static void AddTransversal(
        ImmutableArray<LogicLayout>.Builder layouts, Workload workload, Method method, RotationSynthesis synthesis)
    {
        double parallelism = Math.Max(1, TStateDemand.Parallelism(workload, synthesis));
        double patches = method.Patches ?? Math.Ceiling(workload.LogicalQubits * (1 + method.RoutingFraction));
        double[] gates = method.GatesPerRound is { } fixedGates ? [fixedGates] : GatesPerRoundToTry;
        for (double lanes = 1; lanes <= parallelism; lanes *= 2)
        {
            foreach (double perRound in gates)
            {
                string name = FormattableString.Invariant(
                    $"transversal, {lanes} T {(lanes > 1 ? "lanes" : "lane")}, {perRound} {(perRound > 1 ? "gates" : "gate")} per round");
                layouts.Add(new LogicLayout(LogicStyle.Transversal, name, patches + lanes, 2, lanes, perRound));
            }
        }
    }
}

/// <summary>How logical gates are done.</summary>
public enum LogicStyle
{
    /// <summary>Patches are merged and split; a step takes d rounds.</summary>
    LatticeSurgery,

    /// <summary>Patches are moved onto each other; a step takes about a round.</summary>
    Transversal,
}

/// <summary>The styles as written in scenario files.</summary>
public static class LogicStyles
{
    /// <summary>Lattice surgery.</summary>
    public const string Surgery = "lattice-surgery";

    /// <summary>Transversal gates.</summary>
    public const string Transversal = "transversal";

    /// <summary>The style as written in scenario files.</summary>
    public static string NameOf(LogicStyle style) => style == LogicStyle.LatticeSurgery ? Surgery : Transversal;
}
