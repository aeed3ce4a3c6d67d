using FtEstimate.Simulation.Memory;

namespace FtEstimate.Simulation.Calibration;

/// <summary>Runs the experiments of the calibration.</summary>
public static class CalibrationRun
{
    /// <summary>Relative standard error at which an experiment is good enough: the law itself is not better than that.</summary>
    public const double RelativeError = 0.04;

    /// <summary>Most shots of an experiment of distance 3; larger ones get fewer, as their shots take longer.</summary>
    private const double MostShots = 1.6e7;

    /// <summary>Runs one experiment of the grid; its seed is its number, counted from 1.</summary>
    /// <param name="index">Its place in the grid.</param>
    /// <param name="threads">Threads, at least 1.</param>
    /// <param name="cancel">Interrupts it.</param>
    public static CalibrationResult Run(int index, int threads, CancellationToken cancel)
    {
        CalibrationCell cell = CalibrationGrid.Cells[index];
        ulong seed = (ulong)index + 1;
        return new CalibrationResult(cell, seed, MemoryRun.Run(cell.Experiment(), PlanOf(cell, seed), default, threads, null, cancel).Count);
    }

    /// <summary>Shots and accuracy of an experiment.</summary>
    public static MemoryPlan PlanOf(CalibrationCell cell, ulong seed) =>
        new((long)(MostShots * Math.Pow(3.0 / cell.Distance, 2)), seed, Shard.Whole, RelativeError);
}
