using System.Collections.Immutable;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;

namespace FtEstimate.Simulation.Calibration;

/// <summary>The experiments that the law and its weights are fitted to.</summary>
/// <remarks>
/// The uniform textbook circuit; three mixtures of causes at several strengths; one mixture with more of a single cause at a time; and, not fitted but
/// kept to see how far the law may be off, single causes alone. Strengths are set with rounded weights of an earlier simulation; the fit does not depend on them.
/// </remarks>
public static class CalibrationGrid
{
    private static readonly double[] UniformErrors = [1e-3, 1.5e-3, 2e-3, 3e-3, 4e-3];
    private static readonly double[] MixtureStrengths = [0.2, 0.3, 0.45, 0.6];
    private static readonly double[] AddedStrengths = [0.1, 0.25];
    private static readonly int[] Distances = [3, 5, 7, 9];
    private static readonly int[] FurtherDistances = [3, 5, 7, 9, 11, 13];
    private const double AloneStrength = 0.35;
    private const double BaseStrength = 0.25;
    private const double UniformThreshold = 0.0056;

    /// <summary>Shots with told losses take several times as long.</summary>
    private const int LargestWithLosses = 11;


    private static readonly ImmutableArray<Cause> Causes =
    [
        new("cz", 92, (e, p) => e with { CzGate = e.CzGate + p }, Alone: true),
        new("waiting-x", 107, (e, p) => e with { WaitingInLayer = e.WaitingInLayer.Then(new PauliChannel(p, 0, 0)) }, Alone: true),
        new("waiting-z", 107, (e, p) => e with { WaitingInLayer = e.WaitingInLayer.Then(new PauliChannel(0, 0, p)) }, Alone: true),
        new("data", 23, (e, p) => e with { OnData = e.OnData.Then(PauliChannel.Depolarising(p)) }, Alone: false),
        new("data-z", 34, (e, p) => e with { OnData = e.OnData.Then(new PauliChannel(0, 0, p)) }, Alone: false),
        new("gate-on-data", 66, (e, p) => e with { GateOnData = e.GateOnData + p }, Alone: false),
        new("check-outside", 10, (e, p) => e with { OnCheckOutsideLayers = e.OnCheckOutsideLayers.Then(PauliChannel.Depolarising(p)) }, Alone: false),
        new("check-between", 60, (e, p) => e with { OnCheckBetweenLayers = e.OnCheckBetweenLayers.Then(PauliChannel.Depolarising(p)) }, Alone: false),
        new("flip", 5.5, (e, p) => e with { CheckFlip = e.CheckFlip + p }, Alone: false),
        new("reset", 5.5, (e, p) => e with { CheckReset = e.CheckReset + p }, Alone: false),
        new("told-data-1", 23, (e, p) => e with { DataLossPerSlot = p, DataLossTold = true, RoundsBetweenLooks = 1 }, Alone: false),
        new("told-data-2", 28, (e, p) => e with { DataLossPerSlot = p, DataLossTold = true, RoundsBetweenLooks = 2 }, Alone: false),
        new("told-data-4", 36, (e, p) => e with { DataLossPerSlot = p, DataLossTold = true, RoundsBetweenLooks = 4 }, Alone: false),
        new("told-checks", 23, (e, p) => e with { CheckLossPerSlot = p, CheckLossTold = true }, Alone: false),
        new("untold-data-1", 92, (e, p) => e with { DataLossPerSlot = p, RoundsBetweenLooks = 1 }, Alone: false),
        new("untold-data-4", 200, (e, p) => e with { DataLossPerSlot = p, RoundsBetweenLooks = 4 }, Alone: false),
        new("untold-checks", 92, (e, p) => e with { CheckLossPerSlot = p }, Alone: false),
    ];

    /// <summary>Much like a good atom array, most of its noise from gates; strength about 1.</summary>
    private static readonly RoundErrors Gates = new()
    {
        CzGate = 0.42 / 92,
        WaitingInLayer = new PauliChannel(0.01 / 107, 0.01 / 107, 0.15 / 107),
        OnData = new PauliChannel(0.02 / 34, 0.02 / 34, 0.1 / 34),
        GateOnData = 0.12 / 66,
        OnCheckOutsideLayers = PauliChannel.Depolarising(0.05 / 10),
        CheckFlip = 0.06 / 5.5,
        CheckReset = 0.06 / 5.5,
    };

    /// <summary>A long readout: most of the noise from dephasing while data atoms wait.</summary>
    private static readonly RoundErrors Waiting = Gates with
    {
        CzGate = 0.2 / 92,
        OnData = new PauliChannel(0.06 / 34, 0.06 / 34, 0.35 / 34),
        CheckFlip = 0.1 / 5.5,
    };

    /// <summary>Atoms that are lost as often as they err, seen by a readout that tells.</summary>
    private static readonly RoundErrors Losses = Gates with
    {
        CzGate = 0.25 / 92,
        DataLossPerSlot = 0.25 / 28,
        DataLossTold = true,
        CheckLossPerSlot = 0.15 / 23,
        CheckLossTold = true,
        RoundsBetweenLooks = 2,
    };

    /// <summary>All experiments, cheap ones first.</summary>
    public static ImmutableArray<CalibrationCell> Cells { get; } =
    [
        .. Uniform()
            .Concat(Mixture("gates", Gates))
            .Concat(Mixture("waiting", Waiting))
            .Concat(Mixture("losses", Losses).Where(cell => cell.Distance <= LargestWithLosses))
            .Concat(Added())
            .Concat(Alone())
            .OrderBy(cell => cell.Distance),
    ];

    private static IEnumerable<CalibrationCell> Uniform() =>
        from p in UniformErrors
        from distance in FurtherDistances
        where WillFail(distance, p / UniformThreshold)
        from cell in BothBases($"uniform {p:0.####}", p, new RoundErrors(), distance)
        select cell;

    private static IEnumerable<CalibrationCell> Mixture(string name, RoundErrors errors) =>
        from strength in MixtureStrengths
        from distance in FurtherDistances
        where WillFail(distance, strength)
        from cell in BothBases($"{name} {strength:0.##}", 0, Taken(errors, strength), distance)
        select cell;

    private static IEnumerable<CalibrationCell> Added() =>
        from cause in Causes
        from strength in AddedStrengths
        from distance in Distances
        from cell in BothBases(
            $"gates {BaseStrength:0.##} + {cause.Name} {strength:0.##}", 0, cause.Add(Taken(Gates, BaseStrength), strength / cause.NominalWeight), distance)
        select cell;

    private static IEnumerable<CalibrationCell> Alone() =>
        from cause in Causes
        where cause.Alone
        from distance in Distances
        from cell in BothBases(
            $"{CalibrationCell.AloneMark}{cause.Name} {AloneStrength:0.##}", 0, cause.Add(new RoundErrors(), AloneStrength / cause.NominalWeight), distance)
        select cell;

    /// <summary>Large patches with little noise would not fail once in all their shots.</summary>
    private static bool WillFail(int distance, double strength) => strength >= distance switch
    {
        >= 13 => 0.4,
        >= 11 => 0.28,
        _ => 0,
    };

    private static IEnumerable<CalibrationCell> BothBases(FormattableString mix, double uniformError, RoundErrors errors, int distance)
    {
        string name = FormattableString.Invariant(mix);
        yield return new CalibrationCell(name, uniformError, errors, distance, PauliBasis.X);
        yield return new CalibrationCell(name, uniformError, errors, distance, PauliBasis.Z);
    }

    private static RoundErrors Taken(RoundErrors errors, double strength) => errors with
    {
        CzGate = errors.CzGate * strength,
        WaitingInLayer = errors.WaitingInLayer.Times(strength),
        OnData = errors.OnData.Times(strength),
        GateOnData = errors.GateOnData * strength,
        OnCheckOutsideLayers = errors.OnCheckOutsideLayers.Times(strength),
        CheckFlip = errors.CheckFlip * strength,
        CheckReset = errors.CheckReset * strength,
        DataLossPerSlot = errors.DataLossPerSlot * strength,
        CheckLossPerSlot = errors.CheckLossPerSlot * strength,
    };

    private sealed record Cause(string Name, double NominalWeight, Func<RoundErrors, double, RoundErrors> Add, bool Alone);
}
